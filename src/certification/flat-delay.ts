import type { Certificate, Complex, FilterPolynomials } from '../forms/index.js';
import { rootResponse } from './root-response.js';
import { squared } from './series.js';
import { atMost, EPSILON, exactly } from './verdict.js';

/** A root rounded to a double changes its m-th inverse power by m units of rounding; 30 as everywhere in this room. */
const ROUNDING_LIMIT = 30;

/** C4: the half-power edge, as |S21|^2, to the limit that C6 sets for S. */
const EDGE_LIMIT = 1e-9;

/**
 * C4, Bessel only: the group delay is flat at the center up to its derivative of order 2N-1, and the stated scale holds.
 *
 * `delay(omega) = Re sum 1/(j*omega - p)`. Its Taylor coefficients at 0 are the sums of odd inverse powers of the poles
 * (the even ones drop out of a response that is symmetric about 0): those of p^-3, p^-5, ... p^-(2N-1) must vanish, and the
 * delay at the center is minus the sum of p^-1.
 */
export function flatDelay(polynomials: FilterPolynomials): Certificate[] {
  const { family, order, poles, transmissionZeros, edge } = polynomials;
  if (family !== 'bessel') return [];
  const inverse = poles.map(reciprocal);
  let [powers, worst] = [inverse, 0];
  for (let m = 3; m < 2 * order; m += 2) {
    powers = powers.map((power, k) => product(product(power, inverse[k] as Complex), inverse[k] as Complex));
    const size = powers.reduce((sum, { re, im }) => sum + Math.hypot(re, im), 0);
    worst = Math.max(worst, Math.abs(sumOf(powers)) / (m * EPSILON * size));
  }
  const mirror = poles.filter(({ re, im }) => poles.some((other) => other.re === re && other.im === -im)).length;
  const halfPower = squared(rootResponse(polynomials, Float64Array.of(1)).s21, 0);
  const scale = edge === 'unitDelay' ? -sumOf(inverse) - 1 : halfPower - 0.5;
  return [
    exactly(
      'C4 poles with their mirror images, no transmission zero',
      transmissionZeros.length === 0 ? mirror : 0,
      order,
    ),
    atMost('C4 derivatives of the delay at the center, units of rounding', worst, ROUNDING_LIMIT),
    atMost(
      edge === 'unitDelay' ? 'C4 delay at the center' : 'C4 half power at the edges',
      edge === undefined ? Number.NaN : Math.abs(scale),
      EDGE_LIMIT,
    ),
  ];
}

function reciprocal({ re, im }: Complex): Complex {
  const norm = re * re + im * im;
  return { re: re / norm, im: -im / norm };
}

function product(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
}

/** Real part of the sum; the imaginary part cancels in pairs. */
function sumOf(list: readonly Complex[]): number {
  return list.reduce((sum, { re }) => sum + re, 0);
}
