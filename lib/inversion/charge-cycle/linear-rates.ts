/** Weighted sums over one scan for a given dephased share g(T): w = 1/σ², y the observed rates. */
export interface ScanSums {
  gg: number;
  g1: number;
  gy: number;
}

/** Weighted sums over all points. */
export interface TotalSums {
  ones: number;
  y: number;
  yy: number;
}

/**
 * Best rates for given ν and E_A: least squares of y = λ₀ + Λ_c,i·g over all scans with λ₀ ≥ 0 and every Λ_c,i ≥ 0, exactly.
 * For a given λ₀ each Λ_c,i = max(0, (gy − λ₀·g1)/gg); what is left is convex and piecewise quadratic in λ₀ with a kink
 * where a Λ_c,i reaches 0, so its minimum is found by walking over the kinks (separable least squares, Golub and Pereyra,
 * SIAM J. Numer. Anal. 10, 413 (1973), with bounds).
 *
 * @param held λ₀ when it is held.
 */
export function linearRates(
  scans: readonly ScanSums[],
  total: TotalSums,
  held: number | null,
): { baseline: number; captures: number[]; chiSquare: number } {
  const baseline = held ?? bestBaseline(scans, total);
  let chiSquare = total.yy - 2 * baseline * total.y + baseline * baseline * total.ones;
  const captures = scans.map(({ gg, g1, gy }) => {
    const left = gy - baseline * g1;
    if (!(left > 0 && gg > 0)) return 0;
    chiSquare -= (left * left) / gg;
    return left / gg;
  });
  return { baseline, captures, chiSquare };
}

/** Slopes below this share of Σw are rounding: λ₀ and the Λ_c cannot be told apart, and λ₀ stays at the lower end. */
const FLAT = 1e-12;

function bestBaseline(scans: readonly ScanSums[], { ones, y }: TotalSums): number {
  // Half the derivative of χ² by λ₀ is slope·λ₀ − height between two kinks.
  let slope = ones;
  let height = y;
  const kinks: { at: number; slope: number; height: number }[] = [];
  for (const { gg, g1, gy } of scans) {
    if (!(gg > 0 && gy > 0)) continue;
    slope -= (g1 * g1) / gg;
    height -= (g1 * gy) / gg;
    kinks.push({ at: gy / g1, slope: (g1 * g1) / gg, height: (g1 * gy) / gg });
  }
  kinks.sort((one, other) => one.at - other.at);
  for (const kink of kinks) {
    if (slope * kink.at - height >= -FLAT * ones * kink.at) break;
    slope += kink.slope;
    height += kink.height;
  }
  return slope > FLAT * ones ? Math.max(0, height / slope) : 0;
}
