import { add, type Complex, complex, divide, magnitude, subtract } from '../../numerics/index.js';
import { complexProduct, complexQuotient, doubleFrom, type LongComplex, longFrom } from './long-numbers.js';

/** Sweeps over all roots; from the starting points of this room fifteen are enough at order 60. */
const MOST_SWEEPS = 100;

/**
 * All roots of a polynomial with whole coefficients (ascending), none of them multiple, as doubles correct to their last
 * digit or two: Aberth's simultaneous iteration, where the polynomial is evaluated with as many bits as its terms cancel.
 *
 * `starts` are points of the closed upper half plane, one for each root there; conjugates are implied for those off the
 * real axis. Undefined when the roots do not settle.
 *
 * Source: O. Aberth, Iteration methods for finding all zeros of a polynomial simultaneously, Math. Comp. 27, 1973 (from
 * memory).
 */
export function wholeRoots(
  coefficients: readonly bigint[],
  starts: readonly Complex[],
  bits: number,
): readonly Complex[] | undefined {
  const roots = [...starts];
  const settled = roots.map(() => false);
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    for (let k = 0; k < roots.length; k++) {
      const z = roots[k] as Complex;
      if (settled[k]) continue;
      const step = aberthStep(newtonStep(coefficients, z, bits), roots, k);
      const moved = subtract(z, step);
      roots[k] = z.im === 0 ? complex(moved.re, 0) : moved;
      // The step from here on is quadratically smaller: one more sweep ends at the last digit.
      settled[k] = magnitude(step) <= 1e-12 * magnitude(z);
    }
    if (settled.every((each) => each)) return roots.map((z) => upper(subtract(z, newtonStep(coefficients, z, bits))));
  }
  return undefined;
}

/** `p/p'` at a double, both sums carried in whole numbers: the quotient is right even where p is all cancellation. */
function newtonStep(coefficients: readonly bigint[], z: Complex, bits: number): Complex {
  const { value, slope } = longValues(coefficients, { re: longFrom(z.re, bits), im: longFrom(z.im, bits) }, bits);
  const { re, im } = complexQuotient(value, slope, bits);
  return complex(doubleFrom(re, bits), z.im === 0 ? 0 : doubleFrom(im, bits));
}

/** A polynomial and its derivative at a long number, by Horner's rule. */
export function longValues(
  coefficients: readonly bigint[],
  z: LongComplex,
  bits: number,
): { readonly value: LongComplex; readonly slope: LongComplex } {
  let value: LongComplex = { re: 0n, im: 0n };
  let slope = value;
  for (let k = coefficients.length - 1; k >= 0; k--) {
    const turned = complexProduct(slope, z, bits);
    slope = { re: turned.re + value.re, im: turned.im + value.im };
    const next = complexProduct(value, z, bits);
    value = { re: next.re + ((coefficients[k] as bigint) << BigInt(bits)), im: next.im };
  }
  return { value, slope };
}

/** Newton's step turned away from all other roots and their conjugates. */
function aberthStep(newton: Complex, roots: readonly Complex[], k: number): Complex {
  const z = roots[k] as Complex;
  let sum = complex(0, 0);
  roots.forEach((root, n) => {
    if (n !== k) sum = add(sum, divide(complex(1, 0), subtract(z, root)));
    if (root.im !== 0) sum = add(sum, divide(complex(1, 0), subtract(z, complex(root.re, -root.im))));
  });
  if (z.im === 0) sum = complex(sum.re, 0);
  const turned = { re: 1 - (newton.re * sum.re - newton.im * sum.im), im: -(newton.re * sum.im + newton.im * sum.re) };
  return divide(newton, turned);
}

/** A root may have crossed the real axis on its way, past its own conjugate. */
const upper = ({ re, im }: Complex): Complex => complex(re, Math.abs(im));
