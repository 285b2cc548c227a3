import { checkPolynomials, type FilterPolynomials } from '../forms/index.js';
import { type Complex, coefficientsFromRoots, multiply, refusal } from '../numerics/index.js';

/** The polynomials of a response as coefficients, ascending: `e[0] + e[1]*s + ...`. */
export interface PolynomialCoefficients {
  readonly e: readonly Complex[];
  readonly f: readonly Complex[];
  readonly p: readonly Complex[];
  readonly epsilon: number;
  readonly epsilonR: number;
}

/**
 * E, F and P as coefficients in ascending order of s: an output for tables and other tools; the engine never computes with
 * them, because above about order 20 coefficients in doubles no longer determine the response.
 *
 * E and F are monic, P has the leading coefficient `transmissionLead`. Each coefficient is the expansion of the given roots
 * rounded once. Cost O(order^2).
 *
 * @throws FilterFailure E_TYPE, E_NOT_FINITE, E_POLYNOMIALS
 *
 * @example
 * const { e } = coefficients(butterworth({ order: 2 }));
 * e[1].re.toFixed(6); // '1.414214'
 */
export function coefficients(polynomials: FilterPolynomials): PolynomialCoefficients {
  checkPolynomials(polynomials);
  const p = coefficientsFromRoots(polynomials.transmissionZeros);
  const result = {
    e: coefficientsFromRoots(polynomials.poles),
    f: coefficientsFromRoots(polynomials.reflectionZeros),
    p: p.map((coefficient) => withPlusZeros(multiply(coefficient, polynomials.transmissionLead))),
    epsilon: polynomials.epsilon,
    epsilonR: polynomials.epsilonR,
  };
  const finite = [result.e, result.f, result.p].every((list) => list.every(({ re, im }) => Number.isFinite(re + im)));
  if (finite) return result;
  throw refusal(
    'E_NOT_FINITE',
    'polynomials',
    'roots whose coefficients exceed 1e308',
    'smaller roots',
    'use the roots themselves',
  );
}

const withPlusZeros = ({ re, im }: Complex): Complex => ({ re: re + 0, im: im + 0 });
