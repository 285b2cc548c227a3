import type { Curves } from './curves.js';
import type { PoleForm } from './pole-form.js';

/**
 * Sweep of any coupling matrix with one common loss: O(N) a point.
 *
 * The 2 x 2 port matrix `X - j` and its derivative come from twelve sums over the resonances; then `S = -1 - 2j*(X - j)^-1`.
 * Close to a resonance without loss X grows without bound and its determinant cancels; such points are marked by NaN in the
 * delay and solved directly by the caller. One long function on purpose: scalars in registers.
 */
export function sweepGeneral(
  { lambda, source, load, ports }: PoleForm,
  loss: number,
  omega: Float64Array,
  out: Curves,
): void {
  const count = lambda.length;
  const ss = source.map((value) => value * value);
  const sl = source.map((value, k) => value * (load[k] as number));
  const ll = load.map((value) => value * value);
  const lossSquare = loss * loss;
  for (let n = 0; n < omega.length; n++) {
    const w = omega[n] as number;
    let ssD = 0;
    let ss1 = 0;
    let ssDI = 0;
    let ssI = 0;
    let slD = 0;
    let sl1 = 0;
    let slDI = 0;
    let slI = 0;
    let llD = 0;
    let ll1 = 0;
    let llDI = 0;
    let llI = 0;
    for (let k = 0; k < count; k++) {
      const d = w - (lambda[k] as number);
      const inverse = 1 / (d * d + lossSquare);
      const di = d * inverse;
      const ii = inverse * inverse;
      const dii = d * ii;
      const a = ss[k] as number;
      const b = sl[k] as number;
      const c = ll[k] as number;
      ssD += a * di;
      ss1 += a * inverse;
      ssDI += a * dii;
      ssI += a * ii;
      slD += b * di;
      sl1 += b * inverse;
      slDI += b * dii;
      slI += b * ii;
      llD += c * di;
      ll1 += c * inverse;
      llDI += c * dii;
      llI += c * ii;
    }
    // X - j: a = 11, b = 12, c = 22
    const ar = ports.ss - ssD;
    const ai = -loss * ss1 - 1;
    const br = ports.sl - slD;
    const bi = -loss * sl1;
    const cr = ports.ll - llD;
    const ci = -loss * ll1 - 1;
    const dr = ar * cr - ai * ci - br * br + bi * bi;
    const di = ar * ci + ai * cr - 2 * br * bi;
    const square = 1 / (dr * dr + di * di);
    const er = dr * square;
    const ei = -di * square;
    // G = (X - j)^-1: g = 11, h = 12, k = 22
    const gr = cr * er - ci * ei;
    const gi = cr * ei + ci * er;
    const hr = -(br * er - bi * ei);
    const hi = -(br * ei + bi * er);
    const kr = ar * er - ai * ei;
    const ki = ar * ei + ai * er;
    const s21Re = 2 * hi;
    const s21Im = -2 * hr;
    out.s11.re[n] = -1 + 2 * gi;
    out.s11.im[n] = -2 * gr;
    out.s21.re[n] = s21Re;
    out.s21.im[n] = s21Im;
    out.s22.re[n] = -1 + 2 * ki;
    out.s22.im[n] = -2 * kr;
    const xSize = Math.abs(ar) + Math.abs(cr) + Math.abs(ai) + Math.abs(ci);
    if (!(xSize < LARGEST_X)) {
      out.groupDelay[n] = Number.NaN;
      continue;
    }
    // X': u = 11, v = 12, t = 22
    const ur = ss1 - 2 * lossSquare * ssI;
    const ui = 2 * loss * ssDI;
    const vr = sl1 - 2 * lossSquare * slI;
    const vi = 2 * loss * slDI;
    const tr = ll1 - 2 * lossSquare * llI;
    const ti = 2 * loss * llDI;
    if (loss === 0) {
      // |x|^2 + |y|^2 = trace of G^H X' G
      const g2 = gr * gr + gi * gi + hr * hr + hi * hi;
      const k2 = kr * kr + ki * ki + hr * hr + hi * hi;
      out.groupDelay[n] = ur * g2 + tr * k2 + 2 * vr * (gr * hr + gi * hi + hr * kr + hi * ki);
      continue;
    }
    // S21' = 2j*(G X' G)_12, (G X' G)_12 = g*(u*h + v*k) + h*(v*h + t*k)
    const pr = ur * hr - ui * hi + vr * kr - vi * ki;
    const pi = ur * hi + ui * hr + vr * ki + vi * kr;
    const qr = vr * hr - vi * hi + tr * kr - ti * ki;
    const qi = vr * hi + vi * hr + tr * ki + ti * kr;
    const zr = gr * pr - gi * pi + hr * qr - hi * qi;
    const zi = gr * pi + gi * pr + hr * qi + hi * qr;
    out.groupDelay[n] = (-2 * (zr * s21Re + zi * s21Im)) / (s21Re * s21Re + s21Im * s21Im);
  }
}

/** Above this size the determinant of X may lose 1e3 of its 2^53 digits; such a point is solved directly instead. */
const LARGEST_X = 1024;
