import { type Complex, complex, polynomialRoots, refusal } from '../../numerics/index.js';
import type { Factors } from './square-polynomial.js';

/** How far two roots that should be one may lie apart, and coefficients of a square from it, as a share of their size. */
const SQUARE_SHARE = 2e-5;

/**
 * Roots in x of the polynomial Q where `numerator = lead * x^k * Q^2`, those at 0 left out.
 *
 * @throws FilterFailure E_NOT_RECIPROCAL when it is no such square, with the size of what is left
 */
export function halved(numerator: Factors): readonly Complex[] {
  return numerator.coefficients.length > 0 ? halvedCoefficients(numerator.coefficients) : halvedRoots(numerator.roots);
}

function halvedCoefficients(coefficients: readonly number[]): readonly Complex[] {
  const square = coefficients.slice(coefficients.findIndex((each) => each !== 0));
  const degree = square.length - 1;
  if (degree === 0) return [];
  if (degree % 2 === 1) refuseNoSquare(`a degree ${degree} in omega^2 beside powers of it`);
  const lead = square[degree] as number;
  const half = degree / 2;
  // Square root by powers from the top: every coefficient but the lower half's is used once.
  const root = new Array<number>(half + 1).fill(0);
  root[half] = 1;
  for (let i = 1; i <= half; i++) {
    let rest = (square[degree - i] as number) / lead;
    for (let j = 1; j < i; j++) rest -= (root[half - j] as number) * (root[half - i + j] as number);
    root[half - i] = rest / 2;
  }
  for (let k = 0; k < half; k++) {
    let [value, size] = [-(square[k] as number) / lead, Math.abs((square[k] as number) / lead)];
    for (let j = 0; j <= k; j++) {
      const product = (root[j] as number) * (root[k - j] as number);
      value += product;
      size += Math.abs(product);
    }
    if (Math.abs(value) > SQUARE_SHARE * size)
      refuseNoSquare(`coefficient ${k} off that of a square by ${(Math.abs(value) / size).toPrecision(3)} of its size`);
  }
  return polynomialRoots(root.map((each) => complex(each, 0)));
}

function halvedRoots(roots: readonly Complex[]): readonly Complex[] {
  const open = roots.filter(({ re, im }) => re !== 0 || im !== 0);
  const halves: Complex[] = [];
  for (let root = open.pop(); root !== undefined; root = open.pop()) {
    const { re, im } = root;
    const gaps = open.map((other) => Math.hypot(other.re - re, other.im - im));
    const gap = Math.min(...gaps);
    if (!(gap <= SQUARE_SHARE * Math.hypot(re, im)))
      refuseNoSquare(`a simple root ${re.toPrecision(6)}, ${im.toPrecision(6)}`);
    const other = open.splice(gaps.indexOf(gap), 1)[0] as Complex;
    halves.push(complex((re + other.re) / 2, (im + other.im) / 2));
  }
  return halves;
}

function refuseNoSquare(found: string): never {
  throw refusal(
    'E_NOT_RECIPROCAL',
    'numerator',
    found,
    'a square in omega^2, times a power of it',
    'P is para-conjugate, so its power is a square; multiply numerator and denominator by what is missing',
  );
}
