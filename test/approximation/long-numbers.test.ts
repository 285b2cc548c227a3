import fc from 'fast-check';
import { expect, test } from 'vitest';
import { delayPolynomial, powerTerm, reflectionPolynomial } from '../../src/approximation/bessel/delay-polynomials.js';
import {
  complexProduct,
  complexQuotient,
  complexRoot,
  doubleFrom,
  longFrom,
  longRoot,
} from '../../src/approximation/bessel/long-numbers.js';
import { wholeRoots } from '../../src/approximation/bessel/whole-roots.js';

const BITS = 400;
const numbers = fc.double({ min: -1e9, max: 1e9, noNaN: true, noDefaultInfinity: true });

test('doubles go to long numbers and back unchanged', () => {
  fc.assert(
    fc.property(numbers, (x) => {
      fc.pre(x === 0 || Math.abs(x) > 1e-60);
      expect(doubleFrom(longFrom(x, BITS), BITS) + 0).toBe(x + 0);
    }),
    { seed: 1, numRuns: 500 },
  );
  // Far beyond the range of doubles on the way, and at its ends.
  expect(doubleFrom(1n << 1400n, 400)).toBe(2 ** 1000);
  expect(doubleFrom(3n, 1070)).toBe(3 * 2 ** -1070);
});

test('quotient and root undo product and square', () => {
  fc.assert(
    fc.property(numbers, numbers, numbers, numbers, (a, b, c, d) => {
      fc.pre(Math.hypot(c, d) > 1e-6);
      const [x, y] = [
        { re: longFrom(a, BITS), im: longFrom(b, BITS) },
        { re: longFrom(c, BITS), im: longFrom(d, BITS) },
      ];
      const back = complexQuotient(complexProduct(x, y, BITS), y, BITS);
      // Cut off at 2^-400, then divided by something above 1e-6.
      const room = 1n << 60n;
      expect(back.re - x.re < room && x.re - back.re < room && back.im - x.im < room && x.im - back.im < room).toBe(
        true,
      );
      const root = complexRoot(y, BITS);
      expect(root.re >= 0n).toBe(true);
      const square = complexProduct(root, root, BITS);
      const off = (p: bigint, q: bigint): number => Math.abs(doubleFrom(p - q, BITS));
      expect(Math.max(off(square.re, y.re), off(square.im, y.im))).toBeLessThan(1e-100);
    }),
    { seed: 2, numRuns: 300 },
  );
  expect(longRoot(0n, BITS)).toBe(0n);
  // The root is cut off after its last bit.
  const two = longRoot(2n << 400n, BITS);
  expect(two * two <= 2n << 800n && (two + 1n) ** 2n > 2n << 800n).toBe(true);
});

test('reverse Bessel polynomials obey their recurrence, and their power its closed form', () => {
  const at = (coefficients: readonly bigint[], k: number): bigint => coefficients[k] ?? 0n;
  for (let order = 2; order <= 60; order++) {
    // theta_N = (2N-1) theta_(N-1) + s^2 theta_(N-2)
    const [now, last, before] = [delayPolynomial(order), delayPolynomial(order - 1), delayPolynomial(order - 2)];
    for (let k = 0; k <= order; k++) expect(at(now, k)).toBe(BigInt(2 * order - 1) * at(last, k) + at(before, k - 2));
    // 4^N |theta(j omega)|^2, multiplied out, in (2 omega)^2.
    for (let k = 0; k <= order; k++) {
      let sum = 0n;
      for (let i = Math.max(0, 2 * k - order); i <= Math.min(order, 2 * k); i++) {
        const product = at(now, i) * at(now, 2 * k - i);
        sum += (i + k) % 2 === 0 ? product : -product;
      }
      expect(powerTerm(order, k)).toBe(sum * 4n ** BigInt(order - k));
    }
    expect(reflectionPolynomial(order).length).toBe(order);
  }
});

test('roots of a polynomial that doubles cannot tell apart: (x - 1)(x - 2)...(x - 20)', () => {
  // J. H. Wilkinson, The evaluation of the zeros of ill-conditioned polynomials, 1959 (from memory).
  let coefficients: bigint[] = [1n];
  for (let root = 1n; root <= 20n; root++) {
    const shifted = [0n, ...coefficients];
    coefficients = shifted.map((c, k) => c - root * (coefficients[k] ?? 0n));
  }
  const starts = Array.from({ length: 20 }, (_, n) => ({ re: n + 1.3, im: 0 }));
  const roots = wholeRoots(coefficients, starts, 200)!
    .map(({ re }) => re)
    .sort((a, b) => a - b);
  roots.forEach((root, n) => {
    expect(Math.abs(root - n - 1)).toBeLessThan(1e-14);
  });
});
