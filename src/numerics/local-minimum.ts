/** Inverse golden ratio squared: where a section splits its interval. */
const GOLDEN = (3 - Math.sqrt(5)) / 2;

/**
 * A local minimum of `f` inside [low, high]: golden sections, shortened by parabolas where they behave.
 *
 * Stops at an interval of `1e-9` of its start plus rounding of the abscissa, where the value of a smooth function is settled
 * to 1e-16 of its curvature; 80 turns at most. Ends of the interval are not candidates: the caller has sampled them.
 *
 * Source: R. P. Brent, Algorithms for minimization without derivatives, 1973, chapter 5 (from memory).
 */
export function localMinimum(
  f: (x: number) => number,
  low: number,
  high: number,
): { readonly x: number; readonly value: number } {
  let [a, b] = [low, high];
  let x = a + GOLDEN * (b - a);
  let fx = f(x);
  let [w, fw, v, fv] = [x, fx, x, fx];
  let step = 0;
  let before = 0;
  const room = 1e-9 * (high - low);
  for (let turn = 0; turn < 80; turn++) {
    const middle = (a + b) / 2;
    const tolerance = room + 1e-15 * Math.abs(x);
    if (Math.abs(x - middle) <= 2 * tolerance - (b - a) / 2) break;
    const parabolic = parabolaStep(x, w, v, fx, fw, fv);
    const usable = Math.abs(parabolic) < Math.abs(before) / 2 && x + parabolic > a && x + parabolic < b;
    before = usable ? step : x < middle ? b - x : a - x;
    step = usable ? parabolic : GOLDEN * before;
    const u = x + (Math.abs(step) >= tolerance ? step : step < 0 ? -tolerance : tolerance);
    const fu = f(u);
    if (fu <= fx) {
      if (u < x) b = x;
      else a = x;
      [v, fv, w, fw, x, fx] = [w, fw, x, fx, u, fu];
    } else {
      if (u < x) a = u;
      else b = u;
      if (fu <= fw || w === x) [v, fv, w, fw] = [w, fw, u, fu];
      else if (fu <= fv || v === x || v === w) [v, fv] = [u, fu];
    }
  }
  return { x, value: fx };
}

/** Step to the vertex of the parabola through three points; NaN when they lie on a line, which no comparison accepts. */
function parabolaStep(x: number, w: number, v: number, fx: number, fw: number, fv: number): number {
  const r = (x - w) * (fx - fv);
  const q = (x - v) * (fx - fw);
  return ((x - w) * r - (x - v) * q) / (2 * (q - r));
}
