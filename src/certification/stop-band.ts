import type { Certificate, FilterPolynomials } from '../forms/index.js';
import { logRatio, turningPoint } from './ripple-search.js';
import { atMost, exactly } from './verdict.js';

/** C4: levels are stated to 1e-6 dB at most; a hundredth of that. */
const LEVEL_LIMIT_DB = 1e-8;

/**
 * C4, families with an equiripple stop band: all finite transmission zeros beyond the stated edge on the axis, as many as
 * the family has, and one level of |S21| at the edge, at the maxima between the zeros, and at infinite frequency where
 * the response does not vanish there.
 *
 * The search runs over 1/omega, where infinity is an ordinary point.
 */
export function stopBand(polynomials: FilterPolynomials): Certificate[] {
  const { family, order, rejectionDb, stopBandEdge } = polynomials;
  if (family !== 'inverseChebyshev' && family !== 'elliptic') return [];
  const check = 'C4 ripple level of the stop band against the rejection, dB';
  if (rejectionDb === undefined || stopBandEdge === undefined) return [atMost(check, Number.NaN, LEVEL_LIMIT_DB)];
  const zeros = polynomials.transmissionZeros;
  const above = zeros.filter(({ re, im }) => re === 0 && im > stopBandEdge).map(({ im }) => 1 / im);
  const below = zeros.filter(({ re, im }) => re === 0 && im < -stopBandEdge).map(({ im }) => 1 / im);
  const inverse = [...above, ...below].sort((a, b) => a - b);
  const level = (x: number): number => rejectionAt(polynomials, x);
  const edge = 1 / stopBandEdge;
  const atInfinity = zeros.length < order ? [0] : [];
  const nulls = [...inverse, ...atInfinity].sort((a, b) => a - b);
  let worst = Math.max(Math.abs(level(edge) - rejectionDb), Math.abs(level(-edge) - rejectionDb));
  for (let n = 1; n < nulls.length; n++) {
    const top = turningPoint((x) => -level(x), nulls[n - 1] ?? Number.NaN, nulls[n] ?? Number.NaN);
    worst = Math.max(worst, Math.abs(level(top) - rejectionDb));
  }
  return [
    exactly('C4 transmission zeros in the stop band', inverse.length, expectedZeros(polynomials)),
    atMost(check, worst, LEVEL_LIMIT_DB),
  ];
}

/** N-1 for odd orders; for even ones N, or N-2 of an elliptic response whose largest pair lies at infinity. */
function expectedZeros({ family, order, transmissionZeros }: FilterPolynomials): number {
  if (order % 2 === 1) return order - 1;
  return family === 'elliptic' && transmissionZeros.length === order - 2 ? order - 2 : order;
}

/** Rejection in dB at omega = 1/x, from |S11/S21|, which stays apart from rounding where |S21| and |S11| do not. */
function rejectionAt(polynomials: FilterPolynomials, x: number): number {
  const twice = 2 * logRatio(polynomials, x);
  return (10 / Math.LN10) * (twice > 60 ? twice : Math.log1p(Math.exp(twice)));
}
