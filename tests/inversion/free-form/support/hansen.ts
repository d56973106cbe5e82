import type { ColumnMatrix } from '@/lib/inversion/index';

export interface TestProblem {
  matrix: ColumnMatrix;
  /** The known solution. */
  solution: Float64Array;
}

/**
 * Test problems of P. C. Hansen, Regularization Tools, Numer. Algorithms 6, 1 (1994): the closed formulas of its routines of
 * the same names, written from memory. tests/reference/free-form.py has the same matrices from the integrals themselves.
 */
export const HANSEN: Readonly<Record<string, (n: number) => TestProblem>> = {
  shaw,
  phillips,
  deriv2,
  heat,
};

function fromEntries(n: number, entry: (i: number, j: number) => number): ColumnMatrix {
  const values = new Float64Array(n * n);
  for (let j = 0; j < n; j++) for (let i = 0; i < n; i++) values[j * n + i] = entry(i, j);
  return { rows: n, columns: n, values };
}

/** One-dimensional image restoration; midpoint rule on [−π/2, π/2]. */
function shaw(n: number): TestProblem {
  const h = Math.PI / n;
  const angle = (i: number): number => (i + 0.5) * h - Math.PI / 2;
  const sinc = (u: number): number => (Math.abs(u) < 1e-12 ? 1 : Math.sin(u) / u);
  return {
    matrix: fromEntries(
      n,
      (i, j) =>
        h *
        ((Math.cos(angle(i)) + Math.cos(angle(j))) *
          sinc(Math.PI * (Math.sin(angle(i)) + Math.sin(angle(j))))) **
          2,
    ),
    solution: Float64Array.from(
      { length: n },
      (_, i) => 2 * Math.exp(-6 * (angle(i) - 0.8) ** 2) + Math.exp(-2 * (angle(i) + 0.5) ** 2),
    ),
  };
}

/** Phillips' problem on [−6, 6], Galerkin with boxes; n a multiple of 4. */
function phillips(n: number): TestProblem {
  const h = 12 / n;
  const quarter = n / 4;
  const c = (k: number): number => Math.cos((k * 4 * Math.PI) / n);
  const lag = (k: number): number => {
    if (k > quarter) return 0;
    if (k === quarter) return h / 2 + (9 / (h * Math.PI ** 2)) * (c(1) - 1);
    return h + (9 / (h * Math.PI ** 2)) * (2 * c(k) - c(k - 1) - c(k + 1));
  };
  const third = Math.PI / 3;
  const solution = new Float64Array(n);
  for (let k = 0; k < quarter; k++) {
    const value =
      (h + (Math.sin((k + 1) * h * third) - Math.sin(k * h * third)) / third) / Math.sqrt(h);
    solution[2 * quarter + k] = value;
    solution[2 * quarter - 1 - k] = value;
  }
  return { matrix: fromEntries(n, (i, j) => lag(Math.abs(i - j))), solution };
}

/** Second derivative: Green's function on [0, 1], Galerkin with boxes, f(t) = t. */
function deriv2(n: number): TestProblem {
  const h = 1 / n;
  return {
    matrix: fromEntries(n, (row, column) => {
      const i = Math.max(row, column) + 1;
      const j = Math.min(row, column) + 1;
      return i === j
        ? h * h * ((i * i - i + 0.25) * h - (i - 2 / 3))
        : h * h * (j - 0.5) * ((i - 0.5) * h - 1);
    }),
    solution: Float64Array.from({ length: n }, (_, i) => h ** 1.5 * (i + 0.5)),
  };
}

/** Inverse heat equation, κ = 1: a Volterra equation of the first kind on [0, 1]. */
function heat(n: number): TestProblem {
  const h = 1 / n;
  const kernel = (t: number): number =>
    (h / (2 * Math.sqrt(Math.PI))) * t ** -1.5 * Math.exp(-1 / (4 * t));
  return {
    matrix: fromEntries(n, (i, j) => (i < j ? 0 : kernel((i - j + 0.5) * h))),
    solution: Float64Array.from({ length: n }, (_, i) => {
      if (i >= n / 2) return 0;
      const t = ((i + 1) * 20) / n;
      if (t < 2) return (0.75 * t * t) / 4;
      return t < 3 ? 0.75 + (t - 2) * (3 - t) : 0.75 * Math.exp(-2 * (t - 3));
    }),
  };
}
