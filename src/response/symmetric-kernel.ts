import type { Curves } from './curves.js';
import type { ModeForm } from './pole-form.js';

/**
 * Sweep of a network with S11 = S22 and one common loss: O(N) a point, one division a resonance.
 *
 * With `p = w/(d^2 + loss^2)`, `d = omega - lambda`, a mode needs only the sums of `p*d`, `p`, `p/(d^2+loss^2)` and
 * `p*d/(d^2+loss^2)`: they give x and dx/domega, complex. Then `S_mode = -(x + j)/(x - j)` and
 * `dS_mode/domega = 2j*x'/(x - j)^2`. One long function on purpose: scalars in registers are what makes it fast.
 */
export function sweepSymmetric({ even, odd }: ModeForm, loss: number, omega: Float64Array, out: Curves): void {
  const evenLambda = even.lambda;
  const evenWeight = even.weight;
  const oddLambda = odd.lambda;
  const oddWeight = odd.weight;
  const lossSquare = loss * loss;
  const { re: s11Re, im: s11Im } = out.s11;
  const { re: s21Re, im: s21Im } = out.s21;
  const delay = out.groupDelay;
  for (let n = 0; n < omega.length; n++) {
    const w = omega[n] as number;
    let pd = 0;
    let p = 0;
    let pi = 0;
    let pdi = 0;
    for (let k = 0; k < evenLambda.length; k++) {
      const d = w - (evenLambda[k] as number);
      const inverse = 1 / (d * d + lossSquare);
      const term = (evenWeight[k] as number) * inverse;
      const scaled = term * inverse;
      p += term;
      pd += term * d;
      pi += scaled;
      pdi += scaled * d;
    }
    // x = xr + j*xi, x' = ur + j*ui
    let xr = even.constant - pd;
    let xi = -loss * p - 1;
    let ur = p - 2 * lossSquare * pi;
    let ui = 2 * loss * pdi;
    // g = 1/(x - j); S = -1 - 2j*g; S' = 2j*x'*g^2
    let square = 1 / (xr * xr + xi * xi);
    let gr = xr * square;
    let gi = -xi * square;
    const evenRe = gi;
    const evenIm = -gr;
    let hr = gr * gr - gi * gi;
    let hi = 2 * gr * gi;
    const evenSlopeRe = -(ur * hi + ui * hr);
    const evenSlopeIm = ur * hr - ui * hi;
    pd = 0;
    p = 0;
    pi = 0;
    pdi = 0;
    for (let k = 0; k < oddLambda.length; k++) {
      const d = w - (oddLambda[k] as number);
      const inverse = 1 / (d * d + lossSquare);
      const term = (oddWeight[k] as number) * inverse;
      const scaled = term * inverse;
      p += term;
      pd += term * d;
      pi += scaled;
      pdi += scaled * d;
    }
    xr = odd.constant - pd;
    xi = -loss * p - 1;
    ur = p - 2 * lossSquare * pi;
    ui = 2 * loss * pdi;
    square = 1 / (xr * xr + xi * xi);
    gr = xr * square;
    gi = -xi * square;
    hr = gr * gr - gi * gi;
    hi = 2 * gr * gi;
    s11Re[n] = evenRe + gi - 1;
    s11Im[n] = evenIm - gr;
    const tr = evenRe - gi;
    const ti = evenIm + gr;
    s21Re[n] = tr;
    s21Im[n] = ti;
    // S' here is half of dS_mode, as S21 is half the difference of the modes.
    const slopeRe = evenSlopeRe + (ur * hi + ui * hr);
    const slopeIm = evenSlopeIm - (ur * hr - ui * hi);
    delay[n] = (slopeRe * ti - slopeIm * tr) / (tr * tr + ti * ti);
  }
}
