import type { FilterPolynomials, FineRoot } from '../forms/index.js';
import { refusal } from '../numerics/index.js';

/** Largest defect of `|S11|^2 + |S21|^2 = 1` that is let out: the limit of the certificates for the response. */
const LARGEST_DEFECT = 1e-9;

/**
 * Refuses a response whose roots, as doubles, no longer balance the power: zeros so close to the axis inside the band that
 * their poles lie within rounding of it. Looked at where it would show, beside every pole and at the band edges; O(N^2).
 *
 * @throws FilterFailure E_ILL_CONDITIONED
 */
export function checkLossless(polynomials: FilterPolynomials): FilterPolynomials {
  const defect = [-1, 1, ...polynomials.poles.map(({ im }) => im)].reduce(
    (largest, omega) => Math.max(largest, Math.abs(power(polynomials, omega) - 1)),
    0,
  );
  if (defect <= LARGEST_DEFECT) return polynomials;
  const hint = 'move the transmission zeros near the axis inside the band further from it';
  throw refusal(
    'E_ILL_CONDITIONED',
    'transmissionZeros',
    `a power balance off by ${defect.toPrecision(2)}`,
    LARGEST_DEFECT,
    hint,
  );
}

/** |S11|^2 + |S21|^2 from magnitudes, squared last: epsilon^2 may leave the range of doubles where epsilon does not. */
function power(
  { poles, reflectionZeros, transmissionZeros, epsilon, epsilonR }: FilterPolynomials,
  omega: number,
): number {
  let reflected = 1 / epsilonR;
  let transmitted = 1 / epsilon;
  poles.forEach((pole, n) => {
    const below = distance(pole, omega);
    reflected *= distance(reflectionZeros[n] as FineRoot, omega) / below;
    const zero = transmissionZeros[n];
    transmitted *= (zero === undefined ? 1 : distance(zero, omega)) / below;
  });
  return reflected * reflected + transmitted * transmitted;
}

function distance({ re, im, imRest = 0 }: FineRoot, omega: number): number {
  const above = omega - im - imRest;
  return Math.sqrt(re * re + above * above);
}
