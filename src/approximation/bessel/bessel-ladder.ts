import type { Complex } from '../../numerics/index.js';
import { delayPolynomial, reflectionPolynomial, reflectionRoots } from './delay-polynomials.js';
import {
  complexQuotient,
  complexRoot,
  doubleFrom,
  type Long,
  type LongComplex,
  longFrom,
  longProduct,
  longQuotient,
} from './long-numbers.js';
import { longValues } from './whole-roots.js';

/** The ladder loses about two digits, seven bits, an order (measured to order 30); as many again for roots and products. */
const BITS_AN_ORDER = 16;
const LEAST_BITS = 256;

/**
 * Elements g1 to gN of the flat-delay ladder between equal terminations of 1, unit delay: the continued fraction of
 * `(E + F)/(E - F)` in long numbers; F has its zeros in the closed left half plane, so the largest element comes first.
 *
 * `bits` behind the point; the default leaves more than 30 digits at order 30.
 */
export function delayLadder(order: number, bits: number = LEAST_BITS + BITS_AN_ORDER * order): readonly number[] {
  const e = delayPolynomial(order).map((coefficient) => coefficient << BigInt(bits));
  const f = reflectionNumerator(order, bits);
  let above = e.map((coefficient, k) => coefficient + (f[k] as Long));
  let below = e.slice(0, -1).map((coefficient, k) => coefficient - (f[k] as Long));
  const elements: number[] = [];
  for (let n = 0; n < order; n++) {
    const element = longQuotient(above.at(-1) as Long, below.at(-1) as Long, bits);
    elements.push(doubleFrom(element, bits));
    // above - element*s*below; its two highest coefficients vanish.
    const rest = above.map((coefficient, k) =>
      k === 0 ? coefficient : coefficient - longProduct(element, below[k - 1] as Long, bits),
    );
    above = below;
    below = rest.slice(0, Math.max(1, below.length - 1));
  }
  return elements;
}

/** Monic polynomial with the zeros of S11: one at the center, the others in the left half plane. */
function reflectionNumerator(order: number, bits: number): readonly Long[] {
  const y = reflectionPolynomial(order);
  let polynomial: readonly Long[] = [0n, 1n << BigInt(bits)];
  for (const start of reflectionRoots(order)) {
    const root = polished(y, start, bits);
    const s = complexRoot({ re: -root.re >> 2n, im: -root.im >> 2n }, bits);
    // (s + r) for a real zero, s^2 + 2*Re(r)*s + |r|^2 for a pair, Re(r) > 0.
    const one = 1n << BigInt(bits);
    const square = longProduct(s.re, s.re, bits) + longProduct(s.im, s.im, bits);
    polynomial = multiplied(polynomial, start.im === 0 ? [s.re, one] : [square, 2n * s.re, one], bits);
  }
  return polynomial;
}

/** Newton's iteration from a double to all bits: the number of right digits doubles with each step. */
function polished(coefficients: readonly bigint[], start: Complex, bits: number): LongComplex {
  let z: LongComplex = { re: longFrom(start.re, bits), im: longFrom(start.im, bits) };
  for (let right = 40; right < 2 * bits; right *= 2) {
    const { value, slope } = longValues(coefficients, z, bits);
    const step = complexQuotient(value, slope, bits);
    z = { re: z.re - step.re, im: start.im === 0 ? 0n : z.im - step.im };
  }
  return z;
}

function multiplied(a: readonly Long[], b: readonly Long[], bits: number): readonly Long[] {
  const product = new Array<Long>(a.length + b.length - 1).fill(0n);
  a.forEach((x, i) => {
    b.forEach((y, k) => {
      product[i + k] = (product[i + k] as Long) + longProduct(x, y, bits);
    });
  });
  return product;
}
