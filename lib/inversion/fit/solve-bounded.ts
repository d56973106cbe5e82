/** A pivot this much smaller than its diagonal is rounding: the unknown is then not determined. */
const SINGULAR = 1e-12;
/** Above this share of the product of the diagonal, Cramer's rule keeps its digits. */
const WELL_APART = 1e-6;

const FREE = 0;
const AT_LOWER = 1;
const AT_UPPER = 2;
const HELD = 3;

/** Scratch for up to three unknowns. */
const state = new Uint8Array(3);
const trial = new Float64Array(3);
const matrix = new Float64Array(9);
const rhs = new Float64Array(3);
const index = new Int32Array(3);

/**
 * Exact minimum of cᵀGc − 2hᵀc over lower ≤ c ≤ upper for up to three unknowns, G positive semidefinite (row-major n×n).
 * A convex quadratic over a box has its minimum in the interior or on a face whose own minimum is feasible, so after
 * the unconstrained solve all faces are tried: at most 27. An unknown that G does not determine takes `fallback`
 * (clamped). Unknowns with held[k] = 1 keep the value that c carries on entry.
 *
 * @returns cᵀGc − 2hᵀc at the answer, written to c.
 */
export function solveBounded(
  n: number,
  gram: Float64Array,
  moment: Float64Array,
  lower: Float64Array,
  upper: Float64Array,
  offset: number,
  held: Uint8Array,
  fallback: number,
  c: Float64Array,
): number {
  if (n === 2 && !held[0] && !held[1]) {
    const value = solvePair(gram, moment, lower, upper, offset, c);
    if (value !== null) return value;
  }
  for (let k = 0; k < n; k++) {
    state[k] = held[k] ? HELD : FREE;
    trial[k] = c[k]!;
  }
  if (solveFace(n, gram, moment, lower, upper, offset, fallback)) return keep(n, gram, moment, c);
  let best = Infinity;
  const faces = n === 1 ? 3 : n === 2 ? 9 : 27;
  for (let face = 1; face < faces; face++) {
    if (!enterFace(n, face, lower, upper, offset, held, c)) continue;
    if (!solveFace(n, gram, moment, lower, upper, offset, fallback)) continue;
    const value = objective(n, gram, moment, trial);
    if (value < best) {
      best = value;
      for (let k = 0; k < n; k++) bestTrial[k] = trial[k]!;
    }
  }
  for (let k = 0; k < n; k++) c[k] = bestTrial[k]!;
  return best;
}

/**
 * The usual case, two free levels, without lists of faces: Cramer's rule, and where that leaves the box the best point on its
 * four sides (along a side the quadratic is a parabola, whose lowest point is clamped to the ends). Null where the two levels
 * can hardly be told apart.
 */
function solvePair(
  gram: Float64Array,
  moment: Float64Array,
  lower: Float64Array,
  upper: Float64Array,
  offset: number,
  c: Float64Array,
): number | null {
  const g00 = gram[0]!;
  const g01 = gram[1]!;
  const g11 = gram[3]!;
  const h0 = moment[0]!;
  const h1 = moment[1]!;
  const determinant = g00 * g11 - g01 * g01;
  if (!(determinant > WELL_APART * g00 * g11)) return null;
  const low0 = lower[offset]!;
  const high0 = upper[offset]!;
  const low1 = lower[offset + 1]!;
  const high1 = upper[offset + 1]!;
  const free0 = (g11 * h0 - g01 * h1) / determinant;
  const free1 = (g00 * h1 - g01 * h0) / determinant;
  if (free0 >= low0 && free0 <= high0 && free1 >= low1 && free1 <= high1) {
    c[0] = free0;
    c[1] = free1;
    return -(h0 * free0 + h1 * free1);
  }
  let best = Infinity;
  for (let side = 0; side < 4; side++) {
    const fixed = side === 0 ? low0 : side === 1 ? high0 : side === 2 ? low1 : high1;
    if (!Number.isFinite(fixed)) continue;
    const first = side < 2 ? fixed : Math.min(Math.max((h0 - g01 * fixed) / g00, low0), high0);
    const second = side < 2 ? Math.min(Math.max((h1 - g01 * fixed) / g11, low1), high1) : fixed;
    const value =
      first * (g00 * first + 2 * (g01 * second - h0)) + second * (g11 * second - 2 * h1);
    if (value >= best) continue;
    best = value;
    c[0] = first;
    c[1] = second;
  }
  return best;
}

const bestTrial = new Float64Array(3);

function keep(n: number, gram: Float64Array, moment: Float64Array, c: Float64Array): number {
  for (let k = 0; k < n; k++) c[k] = trial[k]!;
  return objective(n, gram, moment, c);
}

/** Face number in base 3: digit k is free, at the lower or at the upper bound. False where the face does not exist. */
function enterFace(
  n: number,
  face: number,
  lower: Float64Array,
  upper: Float64Array,
  offset: number,
  held: Uint8Array,
  c: Float64Array,
): boolean {
  let rest = face;
  for (let k = 0; k < n; k++) {
    const digit = rest % 3;
    rest = (rest - digit) / 3;
    if (held[k]) {
      if (digit !== FREE) return false;
      state[k] = HELD;
      trial[k] = c[k]!;
      continue;
    }
    state[k] = digit;
    const bound =
      digit === AT_LOWER ? lower[offset + k]! : digit === AT_UPPER ? upper[offset + k]! : 0;
    if (!Number.isFinite(bound)) return false;
    if (digit !== FREE) trial[k] = bound;
  }
  return true;
}

/** Solves for the free unknowns of the face; true when they are feasible. */
function solveFace(
  n: number,
  gram: Float64Array,
  moment: Float64Array,
  lower: Float64Array,
  upper: Float64Array,
  offset: number,
  fallback: number,
): boolean {
  let m = 0;
  for (let k = 0; k < n; k++) if (state[k] === FREE) index[m++] = k;
  for (let a = 0; a < m; a++) {
    const i = index[a]!;
    let right = moment[i]!;
    for (let k = 0; k < n; k++) if (state[k] !== FREE) right -= gram[i * n + k]! * trial[k]!;
    rhs[a] = right;
    for (let b = 0; b < m; b++) matrix[3 * a + b] = gram[i * n + index[b]!]!;
  }
  eliminate(m);
  for (let a = m - 1; a >= 0; a--) {
    const i = index[a]!;
    if (matrix[3 * a + a]! <= SINGULAR * gram[i * n + i]! || gram[i * n + i]! <= Number.MIN_VALUE) {
      trial[i] = Math.min(Math.max(fallback, lower[offset + i]!), upper[offset + i]!);
      continue;
    }
    let value = rhs[a]!;
    for (let b = a + 1; b < m; b++) value -= matrix[3 * a + b]! * trial[index[b]!]!;
    value /= matrix[3 * a + a]!;
    if (!(value >= lower[offset + i]! && value <= upper[offset + i]!)) return false;
    trial[i] = value;
  }
  return true;
}

/** Gaussian elimination without exchange: G is symmetric positive semidefinite. A row without a pivot eliminates nothing. */
function eliminate(m: number): void {
  for (let a = 0; a < m; a++) {
    const pivot = matrix[3 * a + a]!;
    if (!(pivot > 0)) continue;
    for (let b = a + 1; b < m; b++) {
      const factor = matrix[3 * b + a]! / pivot;
      for (let c = a; c < m; c++)
        matrix[3 * b + c] = matrix[3 * b + c]! - factor * matrix[3 * a + c]!;
      rhs[b] = rhs[b]! - factor * rhs[a]!;
    }
  }
}

function objective(n: number, gram: Float64Array, moment: Float64Array, c: Float64Array): number {
  let value = 0;
  for (let i = 0; i < n; i++) {
    let row = -2 * moment[i]!;
    for (let k = 0; k < n; k++) row += gram[i * n + k]! * c[k]!;
    value += row * c[i]!;
  }
  return value;
}
