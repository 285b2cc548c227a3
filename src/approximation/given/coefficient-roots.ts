import type { FineRoot } from '../../forms/index.js';
import { type Complex, EPS, polynomialRoots, refusal } from '../../numerics/index.js';
import { symmetrized } from './half-roots.js';
import { readNumber } from './read-roots.js';

/** Backward error that `polynomialRoots` accepts, in units of eps. */
const ACCEPTED = 4;

/**
 * Ascending coefficients as a caller gave them, numbers or complex; the last one is not 0.
 *
 * @throws FilterFailure E_TYPE, E_NOT_FINITE, E_POLYNOMIALS
 */
export function readCoefficients(name: string, value: unknown): readonly Complex[] {
  if (!Array.isArray(value))
    throw refusal('E_TYPE', name, value, 'a list of coefficients', 'pass numbers or { re, im }, ascending');
  const coefficients = value.map((each: unknown, n) => {
    if (typeof each !== 'object' || each === null) return { re: readNumber(`${name}[${n}]`, each), im: 0 };
    const [re, im] = [Reflect.get(each, 're'), Reflect.get(each, 'im')];
    return { re: readNumber(`${name}[${n}].re`, re), im: readNumber(`${name}[${n}].im`, im) };
  });
  const last = coefficients.at(-1);
  if (last !== undefined && (last.re !== 0 || last.im !== 0)) return coefficients;
  throw refusal(
    'E_POLYNOMIALS',
    name,
    last === undefined ? value : 0,
    'a last coefficient that is not 0',
    'leave it out',
  );
}

/**
 * Roots of a polynomial in s. Real parts within what the coefficients leave open are set to 0; real coefficients give roots
 * in exactly conjugate pairs.
 *
 * @throws FilterFailure E_NO_CONVERGENCE, E_POLYNOMIAL
 */
export function rootsOf(coefficients: readonly Complex[]): readonly FineRoot[] {
  if (coefficients.length === 1) return [];
  const roots = polynomialRoots(coefficients);
  const near = roots.map(({ re, im }, k) =>
    Math.abs(re) <= radiusOf(coefficients, roots, k) ? { re: 0, im: im + 0 } : { re, im: im + 0 },
  );
  return coefficients.every(({ im }) => im === 0) ? symmetrized(near) : near;
}

/** How far a root may lie from the true one when every coefficient is off by its rounding: `4 eps sum |c_k r^k| / |p'(r)|`. */
function radiusOf(coefficients: readonly Complex[], roots: readonly Complex[], k: number): number {
  const root = roots[k] as Complex;
  const size = Math.hypot(root.re, root.im);
  const sum = coefficients.reduceRight((total, { re, im }) => total * size + Math.hypot(re, im), 0);
  const { re, im } = coefficients.at(-1) as Complex;
  const slope = roots.reduce(
    (product, other, n) => (n === k ? product : product * Math.hypot(root.re - other.re, root.im - other.im)),
    Math.hypot(re, im),
  );
  return slope > 0 ? (ACCEPTED * EPS * sum) / slope : 0;
}
