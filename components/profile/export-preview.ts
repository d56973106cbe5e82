import { profileCsv } from '@/lib/files/write-profile-csv';
import type { CarrierProfile, ProfilePoint } from '@/lib/inversion/index';

import type { ExportChoice } from './export-choice';

const PREVIEW_DIGITS = 4;

/**
 * The heading and the first rows of the file. On a uniform grid the rows are interpolated between
 * the depths of the fit, to few digits: the file itself is computed anew at every depth.
 */
export function exportPreview(
  profile: CarrierProfile,
  choice: ExportChoice,
  stepNm: number | null,
  rows: number,
): string[] {
  const points =
    stepNm === null
      ? profile.points.slice(0, rows)
      : Array.from({ length: rows }, (_, row) => pointAt(profile.points, row * stepNm));
  const text = profileCsv({
    head: [],
    profile: { ...profile, points },
    depthUnit: choice.depthUnit,
    concentrationUnit: choice.concentrationUnit,
    grid: choice.grid,
  });
  return text.split('\r\n').filter((line) => line !== '' && !line.startsWith('#'));
}

function pointAt(points: readonly ProfilePoint[], depthNm: number): ProfilePoint {
  const after = points.findIndex((point) => point.depthNm >= depthNm);
  const right = points[after] ?? points.at(-1);
  const left = points[Math.max(after - 1, 0)] ?? right;
  if (!left || !right) throw new Error('A profile without points cannot be previewed.');
  const span = right.depthNm - left.depthNm;
  const share = span > 0 ? (depthNm - left.depthNm) / span : 1;
  const between = (a: number | null, b: number | null) =>
    a === null || b === null ? null : rounded(a + (b - a) * share);
  return {
    depthNm,
    value: rounded(left.value + (right.value - left.value) * share),
    lower68: between(left.lower68, right.lower68),
    upper68: between(left.upper68, right.upper68),
    lower95: between(left.lower95, right.lower95),
    upper95: between(left.upper95, right.upper95),
    flag: right.flag,
  };
}

const rounded = (value: number): number => Number(value.toPrecision(PREVIEW_DIGITS));
