/**
 * Brent's minimiser on [lower, upper] from a first guess (parabolic steps safeguarded by golden sections; R. P. Brent,
 * Algorithms for Minimization without Derivatives, 1973, chapter 5). Needs no derivative, so a kink does not stop it.
 */
export function minimiseOnLine(
  f: (x: number) => number,
  lower: number,
  start: number,
  upper: number,
  tolerance: number,
  maxIterations = 60,
): { x: number; value: number } {
  const golden = 0.3819660112501051;
  let a = lower;
  let b = upper;
  let x = Math.min(Math.max(start, a), b);
  let w = x;
  let v = x;
  let fx = f(x);
  let fw = fx;
  let fv = fx;
  let step = 0;
  let before = 0;
  for (let iteration = 0; iteration < maxIterations; iteration++) {
    const middle = (a + b) / 2;
    if (Math.abs(x - middle) <= 2 * tolerance - (b - a) / 2) break;
    const parabola = parabolicStep(x, w, v, fx, fw, fv);
    const fits =
      Math.abs(before) > tolerance &&
      Math.abs(parabola) < Math.abs(before / 2) &&
      x + parabola > a &&
      x + parabola < b;
    if (fits) {
      before = step;
      step = parabola;
      if (x + step - a < 2 * tolerance || b - (x + step) < 2 * tolerance)
        step = x < middle ? tolerance : -tolerance;
    } else {
      before = x < middle ? b - x : a - x;
      step = golden * before;
    }
    const u = Math.abs(step) >= tolerance ? x + step : x + (step > 0 ? tolerance : -tolerance);
    const fu = f(u);
    if (fu <= fx) {
      if (u >= x) a = x;
      else b = x;
      v = w;
      fv = fw;
      w = x;
      fw = fx;
      x = u;
      fx = fu;
    } else {
      if (u < x) a = u;
      else b = u;
      if (fu <= fw || w === x) {
        v = w;
        fv = fw;
        w = u;
        fw = fu;
      } else if (fu <= fv || v === x || v === w) {
        v = u;
        fv = fu;
      }
    }
  }
  return { x, value: fx };
}

function parabolicStep(
  x: number,
  w: number,
  v: number,
  fx: number,
  fw: number,
  fv: number,
): number {
  const r = (x - w) * (fx - fv);
  const q = (x - v) * (fx - fw);
  const p = (x - v) * q - (x - w) * r;
  const denominator = 2 * (q - r);
  return denominator === 0 ? Infinity : -p / denominator;
}
