/** Gauss-Legendre on [−1, 1] with 5 points, exact for polynomials up to degree 9 (Abramowitz and Stegun, table 25.4). */
export const GAUSS_NODES = [
  -0.906179845938664, -0.5384693101056831, 0, 0.5384693101056831, 0.906179845938664,
] as const;
export const GAUSS_WEIGHTS = [
  0.23692688505618908, 0.47862867049936647, 0.5688888888888889, 0.47862867049936647,
  0.23692688505618908,
] as const;
