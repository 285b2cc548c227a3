import { Complex as Reference } from 'complex.js';
import type { Decimal } from 'decimal.js';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  add,
  type Complex,
  complex,
  conjugate,
  divide,
  EPS,
  logarithm,
  magnitude,
  multiply,
  powerOfJ,
  scale,
  squareRoot,
  subtract,
} from '../../src/numerics/index.js';
import { Exact, exact } from '../support/exact.js';

const part = fc
  .tuple(fc.double({ min: 1, max: 2, noNaN: true }), fc.integer({ min: -120, max: 120 }), fc.boolean())
  .map(([m, e, negative]) => (negative ? -m : m) * 2 ** e);
const number = fc.record({ re: part, im: part });
const whole = fc.record({ re: fc.integer({ min: -1e6, max: 1e6 }), im: fc.integer({ min: -1e6, max: 1e6 }) });

interface ExactComplex {
  readonly re: Decimal;
  readonly im: Decimal;
}

const exactly = (a: Complex): ExactComplex => ({ re: exact(a.re), im: exact(a.im) });
const exactSize = (a: ExactComplex): Decimal => a.re.times(a.re).plus(a.im.times(a.im)).sqrt();

/** Distance of a result from its exact value over the size of that value, in units of eps. */
function normError(value: Complex, reference: ExactComplex): number {
  const v = exactly(value);
  const error = exactSize({ re: v.re.minus(reference.re), im: v.im.minus(reference.im) });
  return error.isZero() ? 0 : error.div(exactSize(reference)).toNumber() / EPS;
}

test('add, subtract, multiply of whole numbers are exact', () => {
  fc.assert(
    fc.property(whole, whole, (a, b) => {
      const [p, q, r, s] = [BigInt(a.re), BigInt(a.im), BigInt(b.re), BigInt(b.im)];
      expect(add(a, b)).toEqual({ re: Number(p + r), im: Number(q + s) });
      expect(subtract(a, b)).toEqual({ re: Number(p - r), im: Number(q - s) });
      const product = multiply(a, b);
      expect(BigInt(product.re)).toBe(p * r - q * s);
      expect(BigInt(product.im)).toBe(p * s + q * r);
    }),
    { seed: 1, numRuns: 200 },
  );
});

test('multiply(a, b) is within 2 eps of the exact product', () => {
  fc.assert(
    fc.property(number, number, (a, b) => {
      const [x, y] = [exactly(a), exactly(b)];
      const product = { re: x.re.times(y.re).minus(x.im.times(y.im)), im: x.re.times(y.im).plus(x.im.times(y.re)) };
      expect(normError(multiply(a, b), product)).toBeLessThan(2);
    }),
    { seed: 2, numRuns: 300 },
  );
});

test('divide(a, b) is within 4 eps of the exact quotient', () => {
  fc.assert(
    fc.property(number, number, (a, b) => {
      const [x, y] = [exactly(a), exactly(b)];
      const square = y.re.times(y.re).plus(y.im.times(y.im));
      const quotient = {
        re: x.re.times(y.re).plus(x.im.times(y.im)).div(square),
        im: x.im.times(y.re).minus(x.re.times(y.im)).div(square),
      };
      expect(normError(divide(a, b), quotient)).toBeLessThan(4);
    }),
    { seed: 3, numRuns: 300 },
  );
});

test('divide(a, b) survives parts whose squares leave the range of doubles', () => {
  expect(divide(complex(1e200, 1e200), complex(1e200, 1e200))).toEqual({ re: 1, im: 0 });
  expect(divide(complex(1e-200, 1e-200), complex(1e-200, 1e-200))).toEqual({ re: 1, im: 0 });
  expect(divide(complex(3, 4), complex(0, 2))).toEqual({ re: 2, im: -1.5 });
  expect(divide(complex(3, 4), complex(2, 0))).toEqual({ re: 1.5, im: 2 });
});

test('squareRoot(a) is within 4 eps of the exact root in each part', () => {
  fc.assert(
    fc.property(number, (a) => {
      const x = exactly(a);
      // (|a| - |re|)/2 would cancel: the smaller part is |im| over twice the larger.
      const larger = exactSize(x).plus(x.re.abs()).div(2).sqrt();
      const smaller = x.im.abs().div(larger.times(2));
      const [re, im] = a.re >= 0 ? [larger, smaller] : [smaller, larger];
      const root = squareRoot(a);
      expect(root.re).toBeGreaterThanOrEqual(0);
      expect(Math.sign(root.im)).toBe(Math.sign(a.im));
      const off = (value: number, reference: Decimal): number =>
        exact(Math.abs(value)).minus(reference).abs().div(reference).toNumber() / EPS;
      expect(off(root.re, re)).toBeLessThan(4);
      expect(off(root.im, im)).toBeLessThan(4);
    }),
    { seed: 4, numRuns: 300 },
  );
});

test('squareRoot(a) of squares of small whole numbers is exact', () => {
  expect(squareRoot(complex(0, 0))).toEqual({ re: 0, im: 0 });
  expect(squareRoot(complex(-4, 0))).toEqual({ re: 0, im: 2 });
  expect(squareRoot(complex(9, 0))).toEqual({ re: 3, im: 0 });
  expect(squareRoot(complex(3, 4))).toEqual({ re: 2, im: 1 });
  expect(squareRoot(complex(3, -4))).toEqual({ re: 2, im: -1 });
  expect(squareRoot(complex(-3, 4))).toEqual({ re: 1, im: 2 });
  expect(squareRoot(complex(-3, -4))).toEqual({ re: 1, im: -2 });
});

test('logarithm(a) agrees with complex.js and with the exact real part', () => {
  fc.assert(
    fc.property(number, (a) => {
      const value = logarithm(a);
      const reference = new Reference(a.re, a.im).log();
      expect(value.im).toBe(Math.atan2(a.im, a.re));
      expect(Math.abs(value.im - reference.im)).toBeLessThan(4 * EPS);
      const real = Exact.ln(exactSize(exactly(a)));
      expect(exact(value.re).minus(real).abs().toNumber()).toBeLessThan(4 * EPS * Math.max(1, Math.abs(value.re)));
    }),
    { seed: 5, numRuns: 100 },
  );
});

test('powerOfJ(exponent) is the exact power of j for every whole exponent', () => {
  let power = complex(1, 0);
  for (let exponent = 0; exponent <= 12; exponent++) {
    expect(distanceOf(powerOfJ(exponent), power)).toBe(0);
    expect(distanceOf(powerOfJ(-exponent), conjugate(power))).toBe(0);
    power = multiply(power, complex(0, 1));
  }
});

test('magnitude, conjugate and scale', () => {
  expect(magnitude(complex(3, -4))).toBe(5);
  expect(magnitude(complex(3e200, 4e200)) / 5e200).toBeCloseTo(1, 14);
  expect(conjugate(complex(1, 2))).toEqual({ re: 1, im: -2 });
  expect(scale(complex(1, -2), -3)).toEqual({ re: -3, im: 6 });
});

const distanceOf = (a: Complex, b: Complex): number => Math.abs(a.re - b.re) + Math.abs(a.im - b.im);
