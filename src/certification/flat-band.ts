import type { Certificate, FilterPolynomials } from '../forms/index.js';
import { logRatio } from './ripple-search.js';
import { atMost, exactly } from './verdict.js';

/** C4: levels are stated to 1e-6 dB at most; a hundredth of that. */
const LEVEL_LIMIT_DB = 1e-8;

/** C4, inverse Chebyshev only: all N reflection zeros at the center, and the return loss at both edges of the pass band. */
export function flatBand(polynomials: FilterPolynomials): Certificate[] {
  const { family, order, reflectionZeros, returnLossDb } = polynomials;
  if (family !== 'inverseChebyshev') return [];
  const centered = reflectionZeros.filter(({ re, im }) => re === 0 && im === 0).length;
  const off = [-1, 1].map((omega) => Math.abs(returnLossAt(polynomials, omega) - (returnLossDb ?? Number.NaN)));
  return [
    exactly('C4 reflection zeros at the center', centered, order),
    atMost('C4 return loss at the edges, dB', Math.max(...off), LEVEL_LIMIT_DB),
  ];
}

/** `-20 lg |S11|` from |S11/S21|: 1/|S11|^2 = 1 + |S21/S11|^2. */
function returnLossAt(polynomials: FilterPolynomials, omega: number): number {
  return (10 / Math.LN10) * Math.log1p(Math.exp(-2 * logRatio(polynomials, 1 / omega)));
}
