import { type Complex, refusal } from '../numerics/index.js';
import type { FilterPolynomials } from './filter-polynomials.js';

/**
 * Refuses what is no set of filter polynomials: missing or non-finite roots, wrong counts, constants that are not positive.
 * Whether they are lossless or stable is not judged here.
 *
 * @throws FilterFailure E_TYPE, E_NOT_FINITE, E_POLYNOMIALS
 */
export function checkPolynomials(polynomials: FilterPolynomials): FilterPolynomials {
  if (typeof polynomials !== 'object' || polynomials === null) {
    throw refusal(
      'E_TYPE',
      'polynomials',
      polynomials,
      'an object with poles, zeros and constants',
      'pass what a family function returned',
    );
  }
  const { order, poles, reflectionZeros, transmissionZeros, transmissionLead, epsilon, epsilonR } = polynomials;
  if (!Number.isInteger(order) || order < 1)
    throw refusal('E_POLYNOMIALS', 'polynomials.order', order, 'a whole number from 1', 'correct the order');
  checkRoots('poles', poles, order, order);
  checkRoots('transmissionZeros', transmissionZeros, 0, order);
  checkRoots('reflectionZeros', reflectionZeros, transmissionZeros.length === order ? 0 : order, order);
  checkBandstop(order, reflectionZeros);
  checkNumbers('transmissionLead', transmissionLead);
  for (const [name, value] of [
    ['epsilon', epsilon],
    ['epsilonR', epsilonR],
  ] as const) {
    if (typeof value !== 'number' || !(value > 0) || !Number.isFinite(value)) {
      throw refusal('E_POLYNOMIALS', `polynomials.${name}`, value, 'a finite number above 0', 'correct the constant');
    }
  }
  return polynomials;
}

/**
 * Fewer reflection zeros than the order: a band-stop response, whose S11 vanishes at infinite frequency. The form holds one
 * constant for S11 and S22, so they must be equal there: an even number is missing, and the others lie on the axis.
 */
function checkBandstop(order: number, zeros: readonly Complex[]): void {
  const missing = order - zeros.length;
  if (missing === 0 || (missing % 2 === 0 && zeros.every(({ re }) => re === 0))) return;
  throw refusal(
    'E_POLYNOMIALS',
    'polynomials.reflectionZeros.length',
    zeros.length,
    `${order}, or an even number fewer on the imaginary axis`,
    'match the order',
  );
}

function checkRoots(name: string, roots: readonly Complex[], least: number, most: number): void {
  if (!Array.isArray(roots))
    throw refusal('E_TYPE', `polynomials.${name}`, roots, 'an array of complex numbers', 'pass an array of { re, im }');
  if (roots.length < least || roots.length > most) {
    throw refusal(
      'E_POLYNOMIALS',
      `polynomials.${name}.length`,
      roots.length,
      least === most ? most : `${least} to ${most}`,
      'match the order',
    );
  }
  for (let n = 0; n < roots.length; n++) checkNumbers(`${name}[${n}]`, roots[n]);
}

function checkNumbers(name: string, value: Complex | undefined): void {
  for (const part of ['re', 'im'] as const) {
    const number: unknown = value?.[part];
    if (typeof number !== 'number')
      throw refusal('E_TYPE', `polynomials.${name}.${part}`, number, 'a number', 'pass { re, im }');
    if (!Number.isFinite(number))
      throw refusal('E_NOT_FINITE', `polynomials.${name}.${part}`, number, 'a finite number', 'replace it');
  }
}
