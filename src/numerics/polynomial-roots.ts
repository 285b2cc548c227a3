import { Complex as ComplexNumber } from 'complex.js';
import type { Complex } from './complex-type.js';
import { FilterFailure, refusal } from './failure.js';
import { EPS } from './limits.js';

/** A root with its backward error: `|p(root)| / (eps * sum |c_k| |root|^k)`; below 4 nothing more is in the coefficients. */
export interface PolynomialRoot extends Complex {
  readonly backwardError: number;
}

/** A sweep moves every root at most once; clusters need up to about 60 (measured), so this cap is never met in practice. */
const SWEEPS = 500;

/** Accepted backward error, in the unit of `PolynomialRoot`. */
const ACCEPTED = 4;

/**
 * All roots of a polynomial with complex coefficients in ascending order, found together.
 *
 * The last coefficient must not be 0; degree 1 and more. What a caller can rely on is the backward error of each root: how
 * far a root of ill-conditioned coefficients lies from the true one, nothing can tell. Cost O(n^2) a sweep, about 20 sweeps.
 *
 * @throws FilterFailure E_POLYNOMIAL, E_NO_CONVERGENCE
 *
 * Sources: O. Aberth, Iteration methods for finding all zeros of a polynomial simultaneously, Math. Comp. 27, 1973;
 * starts on circles from the convex hull of the coefficients as in D. A. Bini, Numerical computation of polynomial zeros by
 * means of Aberth's method, Numer. Algorithms 13, 1996 (both from memory).
 *
 * @example
 * const roots = polynomialRoots([{ re: 2, im: 0 }, { re: 3, im: 0 }, { re: 1, im: 0 }]);
 * Math.min(...roots.map((root) => root.re)); // -2
 */
export function polynomialRoots(coefficients: readonly Complex[]): readonly PolynomialRoot[] {
  const given = checked(coefficients);
  // Roots at 0 are read off: there neither a value nor its bound has a size to compare.
  const atZero = given.findIndex((coefficient) => coefficient.abs() !== 0);
  const ascending = given.slice(atZero);
  const zeros = Array.from({ length: atZero }, () => ({ re: 0, im: 0, backwardError: 0 }));
  if (ascending.length === 1) return zeros;
  const roots = startingPoints(ascending);
  const settled = new Array<boolean>(roots.length).fill(false);
  for (let sweep = 0; sweep < SWEEPS && settled.includes(false); sweep++) {
    roots.forEach((root, k) => {
      if (settled[k]) return;
      const { newton, backwardError } = evaluate(ascending, root);
      if (backwardError <= ACCEPTED || newton === undefined) {
        settled[k] = true;
        return;
      }
      const repulsion = roots.reduce(
        (sum, other, i) => (i === k ? sum : sum.add(root.sub(other).inverse())),
        new ComplexNumber(0, 0),
      );
      roots[k] = root.sub(newton.div(new ComplexNumber(1, 0).sub(newton.mul(repulsion))));
    });
  }
  const found = roots.map((root) => {
    const { backwardError } = evaluate(ascending, root);
    if (!(backwardError <= ACCEPTED)) {
      throw new FilterFailure(
        'E_NO_CONVERGENCE',
        `E_NO_CONVERGENCE coefficients: found a root with backward error ${backwardError.toPrecision(3)}; allowed ${ACCEPTED}; scale the variable so that the roots lie near size 1`,
        { argument: 'coefficients', value: backwardError, limit: ACCEPTED, hint: 'scale the variable' },
      );
    }
    return { re: root.re, im: root.im, backwardError };
  });
  if (zeros.length + found.length !== given.length - 1) {
    throw refusal(
      'E_NO_CONVERGENCE',
      'coefficients',
      'coefficients too different in size',
      'coefficients within 1e300 of one another',
      'scale the variable',
    );
  }
  return [...zeros, ...found];
}

function checked(coefficients: readonly Complex[]): readonly ComplexNumber[] {
  const given: unknown = coefficients;
  if (!Array.isArray(given))
    throw refusal('E_TYPE', 'coefficients', given, 'an array of complex numbers', 'give [{ re, im }, ...]');
  const finite = given.every((each) => Number.isFinite(each?.re) && Number.isFinite(each?.im));
  const last = coefficients[coefficients.length - 1];
  if (coefficients.length < 2 || !finite || last === undefined || (last.re === 0 && last.im === 0)) {
    throw new FilterFailure(
      'E_POLYNOMIAL',
      'E_POLYNOMIAL coefficients: found a constant, a leading 0 or a number that is not finite; allowed two or more finite coefficients, ascending, the last not 0; trim the list',
      { argument: 'coefficients', hint: 'trim the list' },
    );
  }
  // One power of two for all: roots stay to the bit, and neither the smallest nor the largest coefficient leaves the range of doubles.
  const largest = Math.max(...coefficients.map(({ re, im }) => Math.max(Math.abs(re), Math.abs(im))));
  const scale = 2 ** Math.floor(Math.log2(largest));
  return coefficients.map(({ re, im }) => new ComplexNumber(re / scale, im / scale));
}

/** Newton step p/p' and backward error at z; outside the unit circle through the reversed polynomial, which cannot overflow. */
function evaluate(
  ascending: readonly ComplexNumber[],
  z: ComplexNumber,
): { newton: ComplexNumber | undefined; backwardError: number } {
  const outside = z.abs() > 1;
  const n = ascending.length - 1;
  const x = outside ? z.inverse() : z;
  let value = new ComplexNumber(0, 0);
  let slope = new ComplexNumber(0, 0);
  let size = 0;
  for (let k = 0; k <= n; k++) {
    const coefficient = ascending[outside ? k : n - k] as ComplexNumber;
    slope = slope.mul(x).add(value);
    value = value.mul(x).add(coefficient);
    size = size * x.abs() + coefficient.abs();
  }
  const backwardError = value.abs() / (EPS * size);
  // With q(x) = x^n p(1/x): p/p' = q / (x*(n*q - x*q')) at x = 1/z.
  const below = outside ? x.mul(value.mul(n).sub(x.mul(slope))) : slope;
  return { newton: below.abs() === 0 ? undefined : value.div(below), backwardError };
}

/** One circle for every edge of the upper convex hull of (k, log |c_k|): as many starts as the edge is long. */
function startingPoints(ascending: readonly ComplexNumber[]): ComplexNumber[] {
  const heights = ascending.map((coefficient) => Math.log(coefficient.abs()));
  const hull: number[] = [];
  heights.forEach((height, k) => {
    if (height === Number.NEGATIVE_INFINITY) return;
    while (hull.length > 1 && isBelow(heights, hull[hull.length - 2] as number, hull[hull.length - 1] as number, k))
      hull.pop();
    hull.push(k);
  });
  const starts: ComplexNumber[] = [];
  for (let edge = 1; edge < hull.length; edge++) {
    const [from, to] = [hull[edge - 1] as number, hull[edge] as number];
    const radius = Math.exp(((heights[from] as number) - (heights[to] as number)) / (to - from));
    for (let k = from; k < to; k++) {
      // An irrational turn keeps the starts of different circles and of symmetric polynomials apart.
      const angle = (2 * Math.PI * (k - from)) / (to - from) + 0.7 + edge;
      starts.push(new ComplexNumber(radius * Math.cos(angle), radius * Math.sin(angle)));
    }
  }
  return starts;
}

/** Is point `middle` on or below the chord from `left` to `right`? */
function isBelow(heights: readonly number[], left: number, middle: number, right: number): boolean {
  const [a, b, c] = [heights[left] as number, heights[middle] as number, heights[right] as number];
  return (b - a) * (right - left) <= (c - a) * (middle - left);
}
