import type { CarrierProfile, ProfilePoint } from '@/lib/inversion/index';

import { counted, type Pair } from './pair';
import type { Recomputed } from './recompute';

const COLUMNS = ['value', 'lower68', 'upper68', 'lower95', 'upper95'] as const;

/** Every number of a profile, depth by depth. */
export function* profilePairs(claimed: CarrierProfile, recomputed: Recomputed): Generator<Pair> {
  const { carrierProfile: profile, beside } = recomputed;
  yield { what: 'unit of the profile', claimed: claimed.unit, recomputed: profile.unit };
  yield { what: 'kind of the bands', claimed: claimed.bands, recomputed: profile.bands };
  yield { what: 'reach', claimed: claimed.reachNm, recomputed: profile.reachNm };
  yield { what: 'floor', claimed: claimed.floor, recomputed: profile.floor };
  yield counted('number of depths', claimed.points, profile.points);
  const scales = Object.fromEntries(
    COLUMNS.map((column) => [column, largest(profile.points, column)]),
  );
  for (const [index, ours] of profile.points.entries()) {
    const theirs = claimed.points[index];
    const neighbours = beside.flatMap((points) => points[index] ?? []);
    const at = `at depth ${ours.depthNm} nm`;
    yield { what: `depth ${index + 1}`, claimed: theirs?.depthNm, recomputed: ours.depthNm };
    for (const column of COLUMNS) {
      yield {
        what: `${column} ${at}`,
        claimed: theirs?.[column],
        recomputed: ours[column],
        scale: scales[column],
        beside: neighbours.map((point) => point[column]),
      };
    }
    yield {
      what: `flag ${at}`,
      claimed: theirs?.flag,
      recomputed: ours.flag,
      beside: neighbours.map(({ flag }) => flag),
    };
  }
}

function largest(points: readonly ProfilePoint[], column: (typeof COLUMNS)[number]): number {
  return points.reduce((most, point) => Math.max(most, Math.abs(point[column] ?? 0)), 0);
}
