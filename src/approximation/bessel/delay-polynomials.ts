import { type Complex, complex, FilterFailure, squareRoot } from '../../numerics/index.js';
import { wholeRoots } from './whole-roots.js';

/**
 * The reverse Bessel polynomial of order N, ascending: `a_k = (2N-k)!/(2^(N-k) k! (N-k)!)`, whole numbers, a_N = 1.
 *
 * Source: W. E. Thomson, Delay networks having maximally flat frequency characteristics, Proc. IEE 96 part III, 1949 (from
 * memory).
 */
export function delayPolynomial(order: number): readonly bigint[] {
  const coefficients = [1n];
  // From a_N downward: a_(k-1)/a_k = k*(2N-k+1)/(2*(N-k+1)), exact in this order.
  for (let k = order; k >= 1; k--) {
    const last = coefficients[0] as bigint;
    coefficients.unshift((last * BigInt(k) * BigInt(2 * order - k + 1)) / BigInt(2 * (order - k + 1)));
  }
  return coefficients;
}

/**
 * `(|theta(j*omega)|^2 - theta(0)^2)/omega^2` as a polynomial in `y = 4*omega^2`, times 4^(N-1), ascending: all coefficients are
 * positive whole numbers, `(2N-k)! (2N-2k)!/(k! ((N-k)!)^2)` at y^(k-1).
 *
 * Source: M. Abramowitz, I. A. Stegun, Handbook of Mathematical Functions, 1964, 10.1.27 (the modulus of the spherical
 * functions; from memory).
 */
export function reflectionPolynomial(order: number): readonly bigint[] {
  return Array.from({ length: order }, (_, n) => powerTerm(order, n + 1));
}

/** Coefficient of `(2*omega)^(2k)` in `4^N*|theta(j*omega)|^2`. */
export function powerTerm(order: number, k: number): bigint {
  const [below, half] = [factorial(k), factorial(order - k)];
  return (factorial(2 * order - k) * factorial(2 * (order - k))) / (below * half * half);
}

function factorial(n: number): bigint {
  let product = 1n;
  for (let k = 2; k <= n; k++) product *= BigInt(k);
  return product;
}

/** Bits behind the point: the terms of order N reach N^N while they cancel, and 192 more stay; 0.4 of these give the same doubles. */
export function bitsFor(order: number): number {
  return 192 + Math.ceil(order * Math.log2(4 * order + 4));
}

/** Poles of the response with unit delay, those with a positive imaginary part first, then the real one of an odd order. */
export function delayPoles(order: number): readonly Complex[] {
  // They crowd near half an ellipse that reaches from about -j*N over -2N/3 to j*N.
  const starts = Array.from({ length: Math.ceil(order / 2) }, (_, n) => {
    const angle = ((2 * n + 1) * Math.PI) / (2 * order);
    const isReal = 2 * n + 1 === order;
    return complex(-Math.sin(angle) * (0.66 * order + 0.5), isReal ? 0 : Math.cos(angle) * (order - 0.2));
  });
  return settled(wholeRoots(delayPolynomial(order), starts, bitsFor(order)), order);
}

/**
 * Zeros of S11 beside the one at the center, in the closed second quadrant (left half plane, imaginary part >= 0).
 * They solve `omega^2 = -s^2`; of the four values +-s, +-conj s one is given.
 */
export function delayReflectionZeros(order: number): readonly Complex[] {
  return reflectionRoots(order).map((y) => {
    const root = squareRoot(complex(-y.re / 4, -y.im / 4));
    return complex(-root.re, Math.abs(root.im));
  });
}

/** Roots of `reflectionPolynomial` with imaginary part >= 0. */
export function reflectionRoots(order: number): readonly Complex[] {
  const degree = order - 1;
  // In s they crowd near the same kind of curve as the poles; y = -4*s^2.
  const starts = Array.from({ length: Math.ceil(degree / 2) }, (_, n) => {
    const angle = ((2 * n + 1) * Math.PI) / (2 * degree);
    const isReal = 2 * n + 1 === degree;
    const s = complex(-Math.sin(angle) * (0.74 * order + 0.4), isReal ? 0 : Math.cos(angle) * order);
    return complex(-4 * (s.re * s.re - s.im * s.im), isReal ? 0 : -8 * s.re * s.im);
  });
  return settled(wholeRoots(reflectionPolynomial(order), starts, bitsFor(order)), order);
}

function settled(roots: readonly Complex[] | undefined, order: number): readonly Complex[] {
  if (roots !== undefined) return roots;
  const hint = 'report the order: every order that is allowed has been tried';
  throw new FilterFailure(
    'E_NO_CONVERGENCE',
    `E_NO_CONVERGENCE order: found roots of order ${order} that do not settle; allowed orders whose roots do; ${hint}`,
    { argument: 'order', value: order, hint },
  );
}
