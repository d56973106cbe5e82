export interface RunsTest {
  runs: number;
  expected: number;
  /** Exact probability of so few runs or fewer in a random order. */
  pValue: number;
}

/**
 * Wald-Wolfowitz runs test for too few runs, exact: with m and n of either sign the number of arrangements with 2k runs is
 * 2·C(m−1, k−1)·C(n−1, k−1), with 2k + 1 runs C(m−1, k)·C(n−1, k−1) + C(m−1, k−1)·C(n−1, k), of C(m+n, m) in all (A. Wald and
 * J. Wolfowitz, Ann. Math. Stat. 11, 147, 1940).
 *
 * @returns null when all signs are equal and there are fewer than 5: nothing can be said.
 */
export function runsTest(signs: readonly boolean[]): RunsTest | null {
  const m = signs.filter(Boolean).length;
  const n = signs.length - m;
  if (signs.length < 5) return null;
  const runs = signs.reduce(
    (count, sign, i) => (i === 0 || sign !== signs[i - 1] ? count + 1 : count),
    0,
  );
  // One sign only: as likely as a coin that falls one way every time.
  if (m === 0 || n === 0)
    return { runs, expected: 1 + signs.length / 2, pValue: 2 ** (1 - signs.length) };
  let pValue = 0;
  for (let r = 2; r <= runs; r++) pValue += arrangements(m, n, r);
  return {
    runs,
    expected: 1 + (2 * m * n) / (m + n),
    pValue: Math.min(1, pValue / choose(m + n, m)),
  };
}

function arrangements(m: number, n: number, runs: number): number {
  const k = Math.floor(runs / 2);
  if (runs % 2 === 0) return 2 * choose(m - 1, k - 1) * choose(n - 1, k - 1);
  return choose(m - 1, k) * choose(n - 1, k - 1) + choose(m - 1, k - 1) * choose(n - 1, k);
}

function choose(n: number, k: number): number {
  if (k < 0 || k > n) return 0;
  let value = 1;
  for (let i = 1; i <= k; i++) value = (value * (n - k + i)) / i;
  return value;
}
