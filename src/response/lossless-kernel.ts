import type { Curves } from './curves.js';
import type { ModeForm, ModeTerms } from './pole-form.js';

/**
 * Lossless sweep of a network with S11 = S22: each mode is a real reactance x, `S_mode = -(x + j)/(x - j)`, and the delay of
 * S21 is the mean of the modes' delays, `x'/(1 + x^2)` each, which stays finite where S21 = 0. O(N) a point.
 */
export function sweepLosslessSymmetric(modes: ModeForm, omega: Float64Array, out: Curves): void {
  const points = omega.length;
  out.s11.re.fill(-1);
  addMode(modes.even, 1, omega, out, points);
  addMode(modes.odd, -1, omega, out, points);
}

/** Adds half of one mode, `sign` = its share in S21. */
function addMode(
  { constant, lambda, weight }: ModeTerms,
  sign: 1 | -1,
  omega: Float64Array,
  out: Curves,
  points: number,
): void {
  const { re: s11Re, im: s11Im } = out.s11;
  const { re: s21Re, im: s21Im } = out.s21;
  const delay = out.groupDelay;
  for (let n = 0; n < points; n++) {
    const w = omega[n] as number;
    let x = constant;
    let slope = 0;
    for (let k = 0; k < lambda.length; k++) {
      const inverse = 1 / (w - (lambda[k] as number));
      const term = (weight[k] as number) * inverse;
      x -= term;
      slope += term * inverse;
    }
    const square = 1 / (x * x + 1);
    const re = x * square;
    s11Re[n] = (s11Re[n] as number) + square;
    s11Im[n] = (s11Im[n] as number) - re;
    s21Re[n] = (s21Re[n] as number) + sign * square;
    s21Im[n] = (s21Im[n] as number) - sign * re;
    delay[n] = (delay[n] as number) + slope * square;
  }
}
