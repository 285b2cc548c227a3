import type { LosslessForm, RootColumns } from './lossless-form.js';

/** Which of the two eigenphases of S: `psi + delta` or `psi - delta`. */
export type Branch = 1 | -1;

/** An eigenphase against its target, and its slope (never positive). */
export interface PhaseValue {
  readonly value: number;
  readonly slope: number;
}

/**
 * Eigenphase of S at omega, in doubles: `theta = psi +- delta`, `delta = atan2(hypot(beta, b), alpha)` for `a = alpha + j*beta`.
 *
 * Below one radian the difference from the target, an odd multiple of pi, is the argument of a product of unit numbers: it
 * keeps sqrt(N) ulp, a sum of N arctangents does not. Every factor is divided by the size of its pole's, which no argument
 * notices; derivatives go by the product rule, so that a zero on omega divides nothing by 0. Cost O(N).
 */
export function eigenphase(form: LosslessForm, omega: number, branch: Branch, target: number): PhaseValue {
  const { poles, reflectionZeros, transmissionZeros, parity } = form;
  let [psi, psiSlope, eRe, eIm] = [0, 0, 1, 0];
  const [startRe, startIm] = [form.turn.re * form.reflection.hi, form.turn.im * form.reflection.hi];
  const phi = { re: startRe, im: startIm, slopeRe: 0, slopeIm: 0 };
  const chi = { re: form.transmission.hi, im: 0, slopeRe: 0, slopeIm: 0 };
  for (let k = 0; k < form.order; k++) {
    const x = omega - (poles.im[k] as number) - (poles.imRest[k] as number);
    const y = poles.re[k] as number;
    const square = x * x + y * y;
    const over = 1 / Math.sqrt(square);
    psi -= Math.atan2(x, -y) + Math.PI / 2;
    psiSlope += y / square;
    [eRe, eIm] = [(eRe * x - eIm * y) * over, (eRe * y + eIm * x) * over];
    timesFactor(phi, reflectionZeros, k, omega, over);
    timesFactor(chi, transmissionZeros, k, omega, over);
  }
  const s = Math.sqrt(phi.im * phi.im + chi.re * chi.re);
  const sSlope = s === 0 ? Math.hypot(phi.slopeIm, chi.slopeRe) : (phi.im * phi.slopeIm + chi.re * chi.slopeRe) / s;
  const turn = branch * parity;
  const slope = psiSlope + (turn * (phi.re * sSlope - s * phi.slopeRe)) / (phi.re * phi.re + s * s);
  const coarse = psi + branch * Math.atan2(s, parity * phi.re) - target;
  if (!(Math.abs(coarse) < 1)) return { value: coarse, slope };
  const re = eRe * phi.re + eIm * turn * s;
  const im = eRe * turn * s - eIm * phi.re;
  return { value: Math.atan2(-im, -re), slope };
}

interface RunningProduct {
  re: number;
  im: number;
  slopeRe: number;
  slopeIm: number;
}

/** `X' <- X' r + X`, `X <- X r` for the factor of root k, times `over`; beyond the last root the factor is 1. */
function timesFactor(product: RunningProduct, roots: RootColumns, k: number, omega: number, over: number): void {
  const { re, im, slopeRe, slopeIm } = product;
  if (k >= roots.re.length) {
    product.re = re * over;
    product.im = im * over;
    product.slopeRe = slopeRe * over;
    product.slopeIm = slopeIm * over;
    return;
  }
  const x = (omega - (roots.im[k] as number) - (roots.imRest[k] as number)) * over;
  const y = (roots.re[k] as number) * over;
  product.slopeRe = slopeRe * x - slopeIm * y + re * over;
  product.slopeIm = slopeRe * y + slopeIm * x + im * over;
  product.re = re * x - im * y;
  product.im = re * y + im * x;
}
