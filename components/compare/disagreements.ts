import type { Fit } from '@/lib/schemas/fit';

import { PARAMETER_ORDER } from '@/components/review/parameter-words';

type FitParameter = Fit['answer']['parameters'][number];
type Interval = FitParameter['interval68'];

/** How far two results are apart, judged by their own intervals. */
export type Verdict = 'within 68 %' | 'beyond 68 %' | 'beyond 95 %';

export interface ResultDisagreement {
  name: FitParameter['name'];
  /** Positions of the two fits in the list. */
  first: number;
  second: number;
  verdict: Exclude<Verdict, 'within 68 %'>;
}

/**
 * Whether two intervals share a value; an open side reaches to infinity. Fits of one scan share its
 * noise, so intervals that do not meet speak of the assumptions, never of bad luck.
 */
export function intervalsMeet(a: Interval, b: Interval): boolean {
  const low = Math.max(a[0] ?? -Infinity, b[0] ?? -Infinity);
  const high = Math.min(a[1] ?? Infinity, b[1] ?? Infinity);
  return low <= high;
}

/** A held parameter is a single value; it disagrees with whatever does not contain it. */
const reach = (parameter: FitParameter, which: 'interval68' | 'interval95'): Interval =>
  parameter.held ? [parameter.value, parameter.value] : parameter[which];

export function verdictOn(a: FitParameter, b: FitParameter): Verdict {
  if (!intervalsMeet(reach(a, 'interval95'), reach(b, 'interval95'))) return 'beyond 95 %';
  return intervalsMeet(reach(a, 'interval68'), reach(b, 'interval68'))
    ? 'within 68 %'
    : 'beyond 68 %';
}

export function parameterOf(fit: Fit, name: FitParameter['name']): FitParameter | undefined {
  return fit.answer.parameters.find((parameter) => parameter.name === name);
}

/** Every pair of fits and parameter whose intervals do not meet. */
export function resultDisagreements(fits: readonly Fit[]): ResultDisagreement[] {
  return pairs(fits.length).flatMap(([first, second]) =>
    PARAMETER_ORDER.flatMap((name) => {
      const a = parameterOf(fits[first]!, name);
      const b = parameterOf(fits[second]!, name);
      // Two held values differ by choice: that is an assumption, and stands among those.
      if (!a || !b || (a.held && b.held)) return [];
      const verdict = verdictOn(a, b);
      return verdict === 'within 68 %' ? [] : [{ name, first, second, verdict }];
    }),
  );
}

export function pairs(count: number): [number, number][] {
  return Array.from({ length: count }, (_, first) =>
    Array.from({ length: count - first - 1 }, (_, step): [number, number] => [
      first,
      first + 1 + step,
    ]),
  ).flat();
}

export interface DepthRange {
  fromNm: number;
  toNm: number;
}

/**
 * Depths where the 95 % bands of two carrier profiles do not meet, down to the shallower of the
 * two reaches (below it neither profile claims anything). Bands are interpolated linearly to the
 * depths of both profiles. Null when a profile carries no bands or the units differ.
 */
export function bandsApart(first: Fit, second: Fit): DepthRange[] | null {
  const a = first.carrierProfile;
  const b = second.carrierProfile;
  if (a.unit !== b.unit || !a.bands || !b.bands) return null;
  const end = Math.min(a.reachNm, b.reachNm);
  const depths = [...new Set([...a.points, ...b.points].map((point) => point.depthNm))]
    .filter((depth) => depth <= end)
    .toSorted((x, y) => x - y);
  return rangesWhere(
    depths,
    (depth) => !intervalsMeet(bandAt(a.points, depth), bandAt(b.points, depth)),
  );
}

/** Runs of neighbouring depths at which something holds. */
export function rangesWhere(
  depths: readonly number[],
  holds: (depthNm: number) => boolean,
): DepthRange[] {
  const ranges: DepthRange[] = [];
  let open: DepthRange | null = null;
  for (const depth of depths) {
    if (!holds(depth)) {
      open = null;
    } else if (open) {
      open.toNm = depth;
    } else {
      open = { fromNm: depth, toNm: depth };
      ranges.push(open);
    }
  }
  return ranges;
}

function bandAt(points: Fit['carrierProfile']['points'], depthNm: number): Interval {
  const after = points.findIndex((point) => point.depthNm >= depthNm);
  const right = points[after === -1 ? points.length - 1 : after];
  const left = points[Math.max((after === -1 ? points.length : after) - 1, 0)] ?? right;
  if (!left || !right) return [null, null];
  const span = right.depthNm - left.depthNm;
  const share = span > 0 ? Math.min(Math.max((depthNm - left.depthNm) / span, 0), 1) : 1;
  return [between(left.lower95, right.lower95, share), between(left.upper95, right.upper95, share)];
}

function between(left: number | null, right: number | null, share: number): number | null {
  return left === null || right === null ? null : left + (right - left) * share;
}
