import erfc from '@stdlib/math-base-special-erfc';

/** Beyond this |t| the standard normal distribution is 0 or 1 to the last bit of a share. */
export const NORMAL_REACH = 8.5;

const PER_UNIT = 32;
const TERMS = 8;
const NODES = 2 * NORMAL_REACH * PER_UNIT + 1;
const STRIDE = TERMS + 1;

/**
 * Row k: Φ(t_k) from erfc, then the Taylor coefficients (−1)ʲ Heⱼ(t_k) φ(t_k)/j! of φ about t_k
 * (Heⱼ: probabilists' Hermite polynomials, Abramowitz and Stegun 26.2.31 to 26.2.32). With |t − t_k| ≤ 1/64 the
 * first term left out is below 1e-17, so that a look-up is as good as erfc itself and several times quicker.
 */
const table = buildTable();

function buildTable(): Float64Array {
  const rows = new Float64Array(NODES * STRIDE);
  for (let k = 0; k < NODES; k++) {
    const t = k / PER_UNIT - NORMAL_REACH;
    const at = k * STRIDE;
    rows[at] = 0.5 * erfc(-t / Math.SQRT2);
    let hermite = Math.exp(-0.5 * t * t) / Math.sqrt(2 * Math.PI);
    let before = 0;
    for (let j = 0; j < TERMS; j++) {
      rows[at + 1 + j] = hermite;
      // c_{j+1} = −(t·c_j + c_{j−1})/(j+1), the recurrence of Heⱼ with the factorials divided in.
      const next = -(t * hermite + before) / (j + 1);
      before = hermite;
      hermite = next;
    }
  }
  return rows;
}

/**
 * Φ(t) and φ(t) of the standard normal distribution, written to out[at] and out[at + 1]. Absolute error below 4e-16.
 * Φ(t) = ½ erfc(−t/√2).
 */
export function normalInto(t: number, out: Float64Array, at: number): void {
  if (!(t > -NORMAL_REACH)) {
    out[at] = 0;
    out[at + 1] = 0;
    return;
  }
  if (t >= NORMAL_REACH) {
    out[at] = 1;
    out[at + 1] = 0;
    return;
  }
  const k = Math.round((t + NORMAL_REACH) * PER_UNIT);
  const d = t + NORMAL_REACH - k / PER_UNIT;
  const r = k * STRIDE;
  const c0 = table[r + 1]!;
  const c1 = table[r + 2]!;
  const c2 = table[r + 3]!;
  const c3 = table[r + 4]!;
  const c4 = table[r + 5]!;
  const c5 = table[r + 6]!;
  const c6 = table[r + 7]!;
  const c7 = table[r + 8]!;
  out[at + 1] = c0 + d * (c1 + d * (c2 + d * (c3 + d * (c4 + d * (c5 + d * (c6 + d * c7))))));
  out[at] =
    table[r]! +
    d *
      (c0 +
        d *
          (c1 / 2 +
            d *
              (c2 / 3 + d * (c3 / 4 + d * (c4 / 5 + d * (c5 / 6 + d * (c6 / 7 + (d * c7) / 8)))))));
}
