import fc from 'fast-check';
import { expect, test } from 'vitest';
import { doubledDot, EPS } from '../../src/numerics/index.js';
import { scaled } from '../support/exact.js';
import { logUniform, seeded } from '../support/random.js';

const UNIT = EPS / 2;

/** Exact sum a[i]*(hi[i] + lo[i]) as a multiple of 2^-2148. */
function exactDot(a: Float64Array, hi: Float64Array, lo?: Float64Array): { sum: bigint; sizes: bigint } {
  let sum = 0n;
  let sizes = 0n;
  a.forEach((x, i) => {
    const product = scaled(x) * (scaled(hi[i]!) + (lo === undefined ? 0n : scaled(lo[i]!)));
    sum += product;
    sizes += product < 0n ? -product : product;
  });
  return { sum, sizes };
}

const abs = (x: bigint): bigint => (x < 0n ? -x : x);
const ratio = (x: bigint, y: bigint): number => (y === 0n ? 0 : Number((x << 256n) / y) / 2 ** 256);

/** Error of the pair in units of n^2 u^2 * sum of sizes, and of its high part in ulp of the exact sum beyond that. */
function errors(a: Float64Array, hi: Float64Array, lo?: Float64Array): { pair: number; high: number } {
  const { sum, sizes } = exactDot(a, hi, lo);
  const value = doubledDot(a, hi, lo);
  const n = a.length;
  const pair = abs(((scaled(value.hi) + scaled(value.lo)) << 1074n) - sum);
  const high = abs((scaled(value.hi) << 1074n) - sum);
  const room = ratio(sizes, abs(sum)) * n * n * UNIT * UNIT;
  return { pair: ratio(pair, sizes) / (n * n * UNIT * UNIT), high: ratio(high, abs(sum)) / (UNIT + 4 * room) };
}

/** A vector pair whose products cancel to about 1/condition of their size. */
function hardPair(random: () => number, n: number, condition: number): [Float64Array, Float64Array] {
  const a = Float64Array.from({ length: n }, () => (2 * random() - 1) * logUniform(random, 1, Math.sqrt(condition)));
  const b = Float64Array.from({ length: n }, () => (2 * random() - 1) * logUniform(random, 1, Math.sqrt(condition)));
  let sum = 0;
  for (let i = 0; i < n - 1; i++) sum += a[i]! * b[i]!;
  a[n - 1] = 1;
  b[n - 1] = -sum;
  return [a, b];
}

test('doubledDot(a, b) is as good as a sum in twice the precision, against exact whole numbers', () => {
  const random = seeded(11);
  for (let turn = 0; turn < 300; turn++) {
    const [a, b] = hardPair(random, 2 + Math.floor(random() * 60), 10 ** (20 * random()));
    const { pair, high } = errors(a, b);
    expect(pair).toBeLessThan(1);
    expect(high).toBeLessThan(1.01);
  }
});

test('doubledDot(a, hi, lo) takes the low parts into account', () => {
  const random = seeded(12);
  for (let turn = 0; turn < 200; turn++) {
    const [a, b] = hardPair(random, 2 + Math.floor(random() * 40), 10 ** (12 * random()));
    const low = b.map((value) => value * UNIT * (2 * random() - 1) * 0.9);
    const { pair } = errors(a, b, low);
    expect(pair).toBeLessThan(2);
  }
});

test('doubledDot(a, b) of whole numbers with a cancelling middle is exact', () => {
  const value = doubledDot(Float64Array.of(1, 2 ** 60, -(2 ** 60), 3), Float64Array.of(1, 2 ** 50, 2 ** 50, 1));
  expect(value).toEqual({ hi: 4, lo: 0 });
});

test('doubledDot(a, b) keeps in lo what hi cannot hold', () => {
  const value = doubledDot(Float64Array.of(1, 1), Float64Array.of(1, 2 ** -80));
  expect(value).toEqual({ hi: 1, lo: 2 ** -80 });
  const square = doubledDot(Float64Array.of(1 + EPS), Float64Array.of(1 + EPS));
  expect(square).toEqual({ hi: 1 + 2 * EPS, lo: EPS * EPS });
});

test('doubledDot of an empty vector is 0 and zeros add nothing', () => {
  expect(doubledDot(new Float64Array(0), new Float64Array(0))).toEqual({ hi: 0, lo: 0 });
  expect(doubledDot(Float64Array.of(0, 5, -0), Float64Array.of(7, 0, 1))).toEqual({ hi: 0, lo: 0 });
});

test('doubledDot(a, b) and doubledDot(b, a) give the same bits', () => {
  const vector = fc.array(fc.double({ min: -1e100, max: 1e100, noNaN: true }), { minLength: 1, maxLength: 20 });
  fc.assert(
    fc.property(vector, vector, (x, y) => {
      const n = Math.min(x.length, y.length);
      const [a, b] = [Float64Array.from(x.slice(0, n)), Float64Array.from(y.slice(0, n))];
      expect(doubledDot(a, b)).toEqual(doubledDot(b, a));
    }),
    { seed: 13, numRuns: 200 },
  );
});
