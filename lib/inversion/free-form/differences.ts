import type { ColumnMatrix } from './penalised';

/**
 * First or second difference over uneven knots, as a matrix L by columns. First: (u_{j+1} − u_j)/√h_j with h_j = x_{j+1} − x_j,
 * so that ‖Lu‖² = Σ (Δu)²/h is ∫(u′)² dx exactly for u linear between knots (unit of u squared per nm). Second: the change of
 * slope at each inner knot over √h̄, h̄ = (h_{j−1} + h_j)/2, so that ‖Lu‖² = Σ (Δu′/h̄)²·h̄ approximates ∫(u″)² dx between the
 * middles of the first and the last interval (unit of u squared per nm³), and does so exactly for a parabola.
 */
export function differenceOperator(knotsNm: ArrayLike<number>, order: 1 | 2): ColumnMatrix {
  const columns = knotsNm.length;
  const rows = columns - order;
  const values = new Float64Array(rows * columns);
  for (let i = 0; i < rows; i++) {
    const h = knotsNm[i + 1]! - knotsNm[i]!;
    if (order === 1) {
      values[i * rows + i] = -1 / Math.sqrt(h);
      values[(i + 1) * rows + i] = 1 / Math.sqrt(h);
      continue;
    }
    const next = knotsNm[i + 2]! - knotsNm[i + 1]!;
    const root = Math.sqrt((h + next) / 2);
    values[i * rows + i] = 1 / (h * root);
    values[(i + 1) * rows + i] = -(1 / h + 1 / next) / root;
    values[(i + 2) * rows + i] = 1 / (next * root);
  }
  return { rows, columns, values };
}
