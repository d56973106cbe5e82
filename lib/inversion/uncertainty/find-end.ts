/**
 * A rise this close to the target, relative, is corrected by the slope and bend of √Φ and not evaluated again: that moves an end
 * by half of it, and what is left by the third order, a few ten-thousandths of the half-width.
 */
const TARGET_TOLERANCE = 0.015;
/** The same where the bend at the minimum is not known. */
const BLIND_TOLERANCE = 0.005;
/** How far a bend may lead from the straight line, to look for an end and to state one. */
const FAR = 0.9;
const CLOSE = 0.02;
/** After so many steps outward Φ is flat, and strides are long. */
const SHORT_STEPS = 2;
const STRIDE = 1.15;
const MOST_STEPS = 40;

/** Φ along one parameter, everything else at its best. */
export interface Line {
  /** Rise of the profiled Φ over the minimum at θ_k = x. */
  rise: (x: number) => number;
  /** σ of θ_k at the minimum: √Φ sets out with the slope 1/σ. null where there is none. */
  sigma: number | null;
  step: number;
  better: Float64Array | null;
}

export interface Point {
  x: number;
  rise: number;
}

/**
 * Where √Φ reaches the target if it goes on as √rise = d/σ + b·d², b from the point known; straight on where σ is not known, and
 * where the two differ by more than `trust`: σ says nothing where a bound or a kink has changed the slope on the way.
 */
function reachOfTarget(
  sigma: number | null,
  reach: number,
  rise: number,
  target: number,
  trust: number,
): number {
  const straight = reach * Math.sqrt(target / Math.max(rise, target / 9));
  if (sigma === null) return straight;
  const goal = Math.sqrt(target);
  const bend = (Math.sqrt(rise) - reach / sigma) / (reach * reach);
  const root = 1 / (sigma * sigma) + 4 * bend * goal;
  const bent = root > 0 ? (2 * goal) / (1 / sigma + Math.sqrt(root)) : Infinity;
  return Math.abs(bent / straight - 1) < trust ? bent : straight;
}

function toleranceOf({ sigma }: Line): number {
  return sigma === null ? BLIND_TOLERANCE : TARGET_TOLERANCE;
}

/** Walks outward until Φ has risen by the target; null when the bound comes first. */
export function findBracket(
  line: Line,
  centre: number,
  from: Point,
  target: number,
  direction: 1 | -1,
  bound: number,
): { inside: Point; outside: Point } | null {
  let inside = from;
  let reach = Math.max(Math.abs(from.x - centre), 0);
  let next =
    reach > 0
      ? reachOfTarget(line.sigma, reach, from.rise, target, FAR)
      : line.step * Math.sqrt(target);
  for (let step = 0; step < MOST_STEPS; step++) {
    if (inside.x === bound) return null;
    let x = centre + direction * Math.max(next, reach * (step > SHORT_STEPS ? STRIDE : 1.001));
    if (direction * (x - bound) > 0) x = bound;
    const rise = line.rise(x);
    if (line.better) return null;
    if (rise >= target * (1 - toleranceOf(line))) return { inside, outside: { x, rise } };
    inside = { x, rise };
    reach = Math.abs(x - centre);
    next = reachOfTarget(line.sigma, reach, rise, target, FAR);
  }
  return null;
}

/**
 * Crossing of the target between two points: √Φ rises nearly linearly, so the secant on it, kept inside the bracket by the
 * Illinois rule, needs few steps, and the last of them none at all.
 */
export function findRoot(
  line: Line,
  centre: number,
  inside: Point,
  outside: Point,
  target: number,
): number {
  const goal = Math.sqrt(target);
  const height = ({ rise }: Point): number => Math.sqrt(rise) - goal;
  let before = inside;
  let last = outside;
  // Ends of the bracket; the Illinois rule halves the height of an end that stays.
  let low = { x: inside.x, height: height(inside) };
  let high = { x: outside.x, height: height(outside) };
  for (let step = 0; step < MOST_STEPS; step++) {
    if (Math.abs(last.rise - target) <= toleranceOf(line) * target) {
      const reach = Math.abs(last.x - centre);
      return (
        centre +
        Math.sign(last.x - centre) * reachOfTarget(line.sigma, reach, last.rise, target, CLOSE)
      );
    }
    const x = low.x - (low.height * (high.x - low.x)) / (high.height - low.height);
    if (!(Math.abs(high.x - low.x) > 1e-12 * Math.abs(x))) return x;
    before = last;
    last = { x, rise: line.rise(x) };
    const end = { x, height: height(last) };
    const sameSide = end.height * height(before) > 0;
    if (end.height < 0) {
      low = end;
      if (sameSide) high = { x: high.x, height: high.height / 2 };
    } else {
      high = end;
      if (sameSide) low = { x: low.x, height: low.height / 2 };
    }
  }
  return last.x;
}
