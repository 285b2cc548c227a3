import type { FilterPolynomials } from '../forms/index.js';

/** Points inside the band; the order adds more, so that they always exceed the 2N+1 which fix a polynomial of degree 2N. */
const LEAST_IN_BAND = 501;

/** Relative steps off the band edges and off each transmission zero, where S turns fastest. */
const STEPS_BEYOND_EDGE: readonly number[] = [
  1e-3, 3e-3, 1e-2, 3e-2, 0.1, 0.2, 0.3, 0.5, 0.7, 1, 2, 4, 9, 29, 99, 299, 999,
];
const STEP_BESIDE_ZERO = 1e-3;

/**
 * The real omega at which responses are compared: Chebyshev points in the band with both edges, three points on the
 * resonance of every pole (center and half-power points, so that no resonance is too narrow to be met), every
 * transmission zero and both its sides, and points outside to |omega| = 1000.
 */
export function samplePoints(polynomials: FilterPolynomials): Float64Array {
  const points: number[] = [];
  const intervals = Math.max(LEAST_IN_BAND, 4 * polynomials.order + 1) - 1;
  for (let k = 0; k <= intervals; k++) points.push(Math.cos((Math.PI * k) / intervals));
  for (const step of STEPS_BEYOND_EDGE) points.push(1 + step, -1 - step);
  for (const { re, im } of polynomials.poles) points.push(im, im - re, im + re);
  for (const { re, im } of polynomials.transmissionZeros) {
    const step = Math.abs(re) + STEP_BESIDE_ZERO * Math.abs(im);
    points.push(im, im - step, im + step);
  }
  return Float64Array.from(points);
}
