/**
 * The coordinate in which every transmission zero has the same shape.
 *
 * Outside the band `omega = coth(2t)`, t real: t > 0 above the band, t < 0 below, t = 0 at infinity, the band edges at
 * t = +-infinity. A zero at s adds `g(t - s)`, `g(u) = -ln tanh|u|`, to the `acosh` of the filtering function, wherever it
 * stands: so a zero may pass through infinity to the other side, and the split above/below is an outcome, not a choice.
 * Derived from `x_k = (omega - 1/w_k)/(1 - omega/w_k) = coth 2(t - s_k)`; filtering function: R. J. Cameron, General
 * coupling matrix synthesis methods for Chebyshev filtering functions, IEEE Trans. MTT 47(4), 1999 (from memory).
 */

/** A zero, or several in one place: a finite one in the field that free zeros move in, or those at infinity. */
export interface Charge {
  readonly at: number;
  readonly weight: number;
}

/** Frequency outside the band to t; both infinities give 0. */
export function lineFromOmega(omega: number): number {
  if (!Number.isFinite(omega)) return 0;
  return (Math.sign(omega) * Math.log1p(2 / (Math.abs(omega) - 1))) / 4;
}

/** t to frequency; t = 0 gives +Infinity. */
export function omegaFromLine(t: number): number {
  if (t === 0) return Number.POSITIVE_INFINITY;
  return Math.sign(t) * (1 + 2 / Math.expm1(4 * Math.abs(t)));
}

/**
 * The same for pairs +-w: with `u = -ln(1 - 1/w^2)/4 >= 0` the two zeros of a pair at v together add `g(u - v)`, and m zeros
 * at infinity add `(m/2)*g(u)` (from tanh(t - s)*tanh(t + s) = tanh(u - v), `exp(2u) = cosh(2t)`).
 */
export function pairLineFromOmega(omega: number): number {
  if (!Number.isFinite(omega)) return 0;
  // 1/w^2 near 1 is formed from the distance to the edge, which keeps its digits.
  const size = Math.abs(omega);
  return -Math.log(((size - 1) / size) * ((size + 1) / size)) / 4;
}

/** Positive frequency of a pair at u >= 0. */
export function omegaFromPairLine(u: number): number {
  return u === 0 ? Number.POSITIVE_INFINITY : 1 / Math.sqrt(-Math.expm1(-4 * u));
}

/** `acosh` of the filtering function at t; infinite on a zero. */
export function potentialValue(t: number, nodes: readonly number[], field: readonly Charge[]): number {
  let product = 1;
  let value = 0;
  for (const node of nodes) product *= Math.tanh(Math.abs(t - node));
  for (const { at, weight } of field) if (weight !== 0) value -= weight * Math.log(Math.tanh(Math.abs(t - at)));
  return value - Math.log(product);
}

/** Slope and its derivative: `g'(u) = -2/sinh(2u)`, `g''(u) = 4 cosh(2u)/sinh^2(2u) > 0`. */
export function potentialSlope(
  t: number,
  nodes: readonly number[],
  field: readonly Charge[],
): { readonly value: number; readonly slope: number } {
  let value = 0;
  let slope = 0;
  const put = (distance: number, weight: number): void => {
    const sinh = Math.sinh(2 * distance);
    value -= (2 * weight) / sinh;
    slope += (4 * weight * Math.sqrt(1 + sinh * sinh)) / (sinh * sinh);
  };
  for (const node of nodes) put(t - node, 1);
  for (const { at, weight } of field) if (weight !== 0) put(t - at, weight);
  return { value, slope };
}

/** Derivative of one zero's share with respect to t. */
export function kernelSlope(distance: number): number {
  return -2 / Math.sinh(2 * distance);
}
