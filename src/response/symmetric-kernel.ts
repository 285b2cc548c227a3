import type { Curves } from './curves.js';
import type { ModeForm, ModeTerms } from './pole-form.js';

/**
 * Sweep of a network with S11 = S22 and one common loss: O(N) a point, one division a resonance.
 *
 * With `p = w/(d^2 + loss^2)`, `d = omega - lambda`, a mode needs only the sums of `p*d`, `p`, `p/(d^2+loss^2)` and
 * `p*d/(d^2+loss^2)`: they give x and dx/domega, complex. Then `S_mode = -1 - 2j*g`, `g = 1/(x - j)`, and
 * `dS_mode/domega = 2j*x'*g^2`. One long function on purpose: scalars in registers, and both modes in one loop so that
 * their divisions overlap; the shorter mode is padded with resonances of weight 0.
 */
export function sweepSymmetric(modes: ModeForm, loss: number, omega: Float64Array, out: Curves): void {
  const count = Math.max(modes.even.lambda.length, modes.odd.lambda.length);
  const even = padded(modes.even, count);
  const odd = padded(modes.odd, count);
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
    let qd = 0;
    let q = 0;
    let qi = 0;
    let qdi = 0;
    for (let k = 0; k < count; k++) {
      const d = w - (evenLambda[k] as number);
      const e = w - (oddLambda[k] as number);
      const dInverse = 1 / (d * d + lossSquare);
      const eInverse = 1 / (e * e + lossSquare);
      const dTerm = (evenWeight[k] as number) * dInverse;
      const eTerm = (oddWeight[k] as number) * eInverse;
      const dScaled = dTerm * dInverse;
      const eScaled = eTerm * eInverse;
      p += dTerm;
      q += eTerm;
      pd += dTerm * d;
      qd += eTerm * e;
      pi += dScaled;
      qi += eScaled;
      pdi += dScaled * d;
      qdi += eScaled * e;
    }
    // x - j = xr + j*xi for the even mode, y - j for the odd one
    const xr = even.constant - pd;
    const yr = odd.constant - qd;
    const xi = -loss * p - 1;
    const yi = -loss * q - 1;
    const xSquare = xr * xr + xi * xi;
    const ySquare = yr * yr + yi * yi;
    const xInverse = 1 / xSquare;
    const yInverse = 1 / ySquare;
    const gr = xr * xInverse;
    const gi = -xi * xInverse;
    const hr = yr * yInverse;
    const hi = -yi * yInverse;
    s11Re[n] = gi + hi - 1;
    s11Im[n] = -gr - hr;
    const tr = gi - hi;
    const ti = hr - gr;
    s21Re[n] = tr;
    s21Im[n] = ti;
    // u = x'*g^2, v = y'*h^2; dS21/domega = j*(u - v)
    const xSlopeRe = p - 2 * lossSquare * pi;
    const xSlopeIm = 2 * loss * pdi;
    const ySlopeRe = q - 2 * lossSquare * qi;
    const ySlopeIm = 2 * loss * qdi;
    const ggr = gr * gr - gi * gi;
    const ggi = 2 * gr * gi;
    const hhr = hr * hr - hi * hi;
    const hhi = 2 * hr * hi;
    const differenceRe = xSlopeRe * ggr - xSlopeIm * ggi - (ySlopeRe * hhr - ySlopeIm * hhi);
    const differenceIm = xSlopeRe * ggi + xSlopeIm * ggr - (ySlopeRe * hhi + ySlopeIm * hhr);
    delay[n] = -(differenceIm * ti + differenceRe * tr) / (tr * tr + ti * ti);
  }
}

/** The terms of a mode with resonances of weight 0 added; they stand where no frequency of a grid can meet them. */
function padded({ constant, lambda, weight }: ModeTerms, count: number): ModeTerms {
  const longer = new Float64Array(count).fill(Number.MAX_VALUE ** 0.4);
  const heavier = new Float64Array(count);
  longer.set(lambda);
  heavier.set(weight);
  return { constant, lambda: longer, weight: heavier };
}
