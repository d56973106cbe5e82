import type { StoppingProfile } from '../types';

/** Corners of a piecewise linear cumulative stopping fraction: share[k] is reached at depthNm[k]. */
interface Staircase {
  share: Float64Array;
  depthNm: Float64Array;
  count: number;
}

function cumulativeCorners({ edgesNm, mass }: StoppingProfile): Staircase {
  const share = new Float64Array(edgesNm.length);
  let total = 0;
  for (let b = 0; b < mass.length; b++) share[b + 1] = total += mass[b]!;
  let first = 0;
  while (mass[first] === 0) first++;
  let last = mass.length;
  while (mass[last - 1] === 0) last--;
  for (let b = first; b <= last; b++) share[b] = share[b]! / total;
  return {
    share: share.subarray(first, last + 1),
    depthNm: edgesNm.subarray(first, last + 1),
    count: last - first + 1,
  };
}

/** Walks up the corners of one profile; `before` and `after` bracket a depth gap that holds no muons. */
function quantileWalker({
  share,
  depthNm,
  count,
}: Staircase): (u: number) => { before: number; after: number } {
  let k = 0;
  const answer = { before: 0, after: 0 };
  return (u) => {
    while (k < count - 1 && share[k + 1]! < u) k++;
    if (share[k + 1]! > u || k === count - 1) {
      const rise = k === count - 1 ? 0 : share[k + 1]! - share[k]!;
      const t = rise > 0 ? Math.max(0, (u - share[k]!) / rise) : 0;
      answer.before = answer.after =
        t === 0 ? depthNm[k]! : depthNm[k]! + t * (depthNm[k + 1]! - depthNm[k]!);
    } else {
      answer.before = depthNm[k + 1]!;
      let end = k + 1;
      while (end < count - 1 && share[end + 1]! <= u) end++;
      answer.after = depthNm[end]!;
    }
    return answer;
  };
}

/**
 * Q(u; E) = (1 − t)·Q(u; E₁) + t·Q(u; E₂) with t = ln(E/E₁)/ln(E₂/E₁), exactly: the inverse of each
 * cumulative fraction is piecewise linear, so their mean is piecewise linear on the union of their corners.
 * A depth gap without muons in either profile becomes an empty bin. The lost share is averaged with t too.
 */
export function interpolateByQuantiles(
  lower: StoppingProfile,
  upper: StoppingProfile,
  energyKeV: number,
): StoppingProfile {
  const t = Math.log(energyKeV / lower.energyKeV) / Math.log(upper.energyKeV / lower.energyKeV);
  const a = cumulativeCorners(lower);
  const b = cumulativeCorners(upper);
  const shares = Float64Array.from([...a.share, ...b.share]).sort();
  const walkA = quantileWalker(a);
  const walkB = quantileWalker(b);
  const edges: number[] = [];
  const mass: number[] = [];
  let previousShare = 0;
  for (let k = 0; k < shares.length; k++) {
    const u = shares[k]!;
    if (k > 0 && u === shares[k - 1]) continue;
    const qa = walkA(u);
    const qb = walkB(u);
    const before = (1 - t) * qa.before + t * qb.before;
    const after = (1 - t) * qa.after + t * qb.after;
    appendCorner(edges, mass, before, u - previousShare);
    if (after > before) appendCorner(edges, mass, after, 0);
    previousShare = u;
  }
  return {
    energyKeV,
    edgesNm: Float64Array.from(edges),
    mass: Float64Array.from(mass),
    lostShare:
      lower.lostShare === null || upper.lostShare === null
        ? null
        : (1 - t) * lower.lostShare + t * upper.lostShare,
    interpolatedBetween: [lower.energyKeV, upper.energyKeV],
  };
}

/** Rounding can close a bin to nothing; its mass then joins the bin before. */
function appendCorner(edges: number[], mass: number[], depthNm: number, binMass: number): void {
  const previous = edges[edges.length - 1];
  if (previous !== undefined && depthNm <= previous) {
    if (mass.length > 0) mass[mass.length - 1] = mass[mass.length - 1]! + binMass;
    return;
  }
  if (previous !== undefined) mass.push(binMass);
  edges.push(depthNm);
}
