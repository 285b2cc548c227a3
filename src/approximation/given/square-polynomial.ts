import { type Complex, complex, polynomialRoots, refusal } from '../../numerics/index.js';
import { readNumber, readRoots } from './read-roots.js';

/** A real polynomial in x = omega^2: ascending coefficients, or roots (conjugates both listed) and a leading coefficient, default 1. */
export type SquarePolynomial =
  | { readonly coefficients: readonly number[] }
  | { readonly roots: readonly (number | Complex)[]; readonly lead?: number };

/** The same, read. Coefficients are empty where roots were given. */
export interface Factors {
  readonly roots: readonly Complex[];
  readonly lead: number;
  readonly coefficients: readonly number[];
}

/** @throws FilterFailure E_TYPE, E_NOT_FINITE, E_POLYNOMIALS, E_NO_CONVERGENCE */
export function readSquare(name: string, value: unknown): Factors {
  const given: object = typeof value === 'object' && value !== null ? value : {};
  const coefficients: unknown = Reflect.get(given, 'coefficients');
  if (coefficients !== undefined) return fromCoefficients(name, coefficients);
  const roots: unknown = Reflect.get(given, 'roots');
  if (!Array.isArray(roots)) {
    const hint = 'pass { coefficients: [1, 0, 1] } or { roots: [-1], lead: 1 }';
    throw refusal('E_TYPE', name, value, 'an object with coefficients or roots in omega^2', hint);
  }
  const lead: unknown = Reflect.get(given, 'lead');
  // A bare number is a real root here, not a place on the axis.
  const list = roots.map((root: unknown) => (typeof root === 'number' ? complex(root, 0) : root));
  const read = readRoots(`${name}.roots`, list).map(({ re, im }) => complex(re, im));
  checkConjugate(name, read);
  return { roots: read, lead: lead === undefined ? 1 : readNumber(`${name}.lead`, lead), coefficients: [] };
}

function fromCoefficients(name: string, value: unknown): Factors {
  if (!Array.isArray(value))
    throw refusal(
      'E_TYPE',
      `${name}.coefficients`,
      value,
      'a list of numbers',
      'list them by rising powers of omega^2',
    );
  const all = value.map((each: unknown, n) => readNumber(`${name}.coefficients[${n}]`, each));
  const coefficients = all.slice(0, 1 + all.findLastIndex((each) => each !== 0));
  const lead = coefficients.at(-1);
  if (lead === undefined)
    throw refusal('E_POLYNOMIALS', `${name}.coefficients`, 0, 'a coefficient that is not 0', 'give the polynomial');
  const roots = coefficients.length === 1 ? [] : polynomialRoots(coefficients.map((each) => complex(each, 0)));
  return { roots: roots.map(({ re, im }) => complex(re, im)), lead, coefficients };
}

/** Data of six digits: conjugates may differ by the rounding of both. */
const PAIR_SHARE = 2e-5;

function checkConjugate(name: string, roots: readonly Complex[]): void {
  const open = [...roots];
  for (let root = open.pop(); root !== undefined; root = open.pop()) {
    const { re, im } = root;
    if (Math.abs(im) <= PAIR_SHARE * Math.hypot(re, im)) continue;
    const index = open.findIndex(
      (other) => Math.hypot(other.re - re, other.im + im) <= PAIR_SHARE * Math.hypot(re, im),
    );
    if (index < 0)
      throw refusal(
        'E_POLYNOMIALS',
        `${name}.roots`,
        `${re}, ${im} without its conjugate`,
        'roots in conjugate pairs, or real',
        'a power is real',
      );
    open.splice(index, 1);
  }
}
