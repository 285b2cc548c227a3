import type { Decimal } from 'decimal.js';
import { expect, test } from 'vitest';
import {
  type DoubledProduct,
  doubledProduct,
  sumRest,
  timesConstant,
  timesLinear,
  timesPowerOfTwo,
} from '../../src/numerics/index.js';
import { Exact, exact, scaled } from '../support/exact.js';
import { seeded } from '../support/random.js';

interface Whole {
  readonly re: Decimal;
  readonly im: Decimal;
}

const times = (a: Whole, b: Whole): Whole => ({
  re: a.re.times(b.re).minus(a.im.times(b.im)),
  im: a.re.times(b.im).plus(a.im.times(b.re)),
});

const plus = (a: Whole, b: Whole): Whole => ({ re: a.re.plus(b.re), im: a.im.plus(b.im) });

const valueAt = (product: DoubledProduct, at: number): Whole => ({
  re: exact(product[at]!).plus(exact(product[at + 1]!)),
  im: exact(product[at + 2]!).plus(exact(product[at + 3]!)),
});

const size = ({ re, im }: Whole): Decimal => re.times(re).plus(im.times(im)).sqrt();

const gap = (a: Whole, b: Whole): Decimal => size({ re: a.re.minus(b.re), im: a.im.minus(b.im) });

test('a product of linear factors and its derivative keep 30 digits, against decimals of 100', () => {
  const random = seeded(21);
  const part = (): [number, number] => {
    const hi = 4 * random() - 2;
    return [hi, hi * 2 ** -54 * (2 * random() - 1)];
  };
  let [worst, worstSlope] = [0, 0];
  for (let turn = 0; turn < 60; turn++) {
    const product = doubledProduct(1.5, 2 ** -60);
    let value: Whole = { re: exact(1.5).plus(exact(2 ** -60)), im: new Exact(0) };
    let slope: Whole = { re: new Exact(0), im: new Exact(0) };
    let slopeSize = new Exact(0);
    for (let n = 0; n < 40; n++) {
      const [re, reLo] = part();
      const [im, imLo] = part();
      const factor = { re: exact(re).plus(exact(reLo)), im: exact(im).plus(exact(imLo)) };
      // The derivative is a sum; its error is relative to the sizes of what is added.
      slopeSize = slopeSize.times(size(factor)).plus(size(value));
      slope = plus(times(slope, factor), value);
      value = times(value, factor);
      timesLinear(product, re, reLo, im, imLo);
    }
    worst = Math.max(worst, gap(valueAt(product, 0), value).div(size(value)).toNumber());
    worstSlope = Math.max(worstSlope, gap(valueAt(product, 4), slope).div(slopeSize).toNumber());
  }
  // 40 factors of a few 2^-104 each.
  expect(worst).toBeLessThan(40 * 8 * 2 ** -104);
  expect(worstSlope).toBeLessThan(40 * 8 * 2 ** -104);
  expect(worst).toBeGreaterThan(0);
});

test('timesConstant changes the value and leaves the derivative', () => {
  const product = doubledProduct(3, 0);
  timesLinear(product, 2, 0, 1, 0);
  timesConstant(product, 0, 0, 2, 0);
  expect([...product]).toEqual([-6, 0, 12, 0, 3, 0, 0, 0]);
});

test('timesPowerOfTwo is exact, and a product may use the memory of an old one', () => {
  const product = doubledProduct(1 / 3, 2 ** -60);
  timesLinear(product, 0.1, 0, 0.7, 0);
  const before = [...product];
  timesPowerOfTwo(product, 2 ** -200);
  expect([...product]).toEqual(before.map((value) => value * 2 ** -200));
  expect(doubledProduct(5, 1e-20, product)).toBe(product);
  expect([...product]).toEqual([5, 1e-20, 0, 0, 0, 0, 0, 0]);
});

test('sumRest is what rounding left over of a sum, as whole numbers say', () => {
  const random = seeded(22);
  for (let turn = 0; turn < 500; turn++) {
    const a = (2 * random() - 1) * 10 ** (20 * random() - 10);
    const b = (2 * random() - 1) * 10 ** (20 * random() - 10);
    expect(scaled(sumRest(a, b, a + b))).toBe(scaled(a) + scaled(b) - scaled(a + b));
  }
});
