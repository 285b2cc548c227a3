import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Complex, coefficientsFromRoots, EPS, polynomialRoots } from '../../src/numerics/index.js';
import { scaled } from '../support/exact.js';
import { distance, size } from '../support/models.js';

const dyadic = fc.integer({ min: -4096, max: 4096 }).map((n) => n / 1024);
const root = fc.record({ re: dyadic, im: dyadic });

/** Exact coefficients of roots that are whole multiples of 1/1024, as multiples of 1024^-(n-k). */
function exactCoefficients(roots: readonly Complex[]): { re: bigint; im: bigint }[] {
  let list: { re: bigint; im: bigint }[] = [{ re: 1n, im: 0n }];
  for (const { re, im } of roots) {
    const [x, y] = [BigInt(re * 1024), BigInt(im * 1024)];
    // Descending: c_k <- c_k - root*c_(k-1).
    list = [...list, { re: 0n, im: 0n }].map((value, k) => {
      const before = k === 0 ? { re: 0n, im: 0n } : list[k - 1]!;
      return { re: value.re - (x * before.re - y * before.im), im: value.im - (x * before.im + y * before.re) };
    });
  }
  return list.reverse();
}

test('coefficientsFromRoots(roots) is the exact expansion, rounded once, in ascending order', () => {
  fc.assert(
    fc.property(fc.array(root, { minLength: 0, maxLength: 14 }), (roots) => {
      const ours = coefficientsFromRoots(roots);
      const theirs = exactCoefficients(roots);
      expect(ours).toHaveLength(roots.length + 1);
      expect(ours.at(-1)).toEqual({ re: 1, im: 0 });
      const largest = Math.max(...ours.map(size));
      ours.forEach((value, k) => {
        const unit = 1024n ** BigInt(roots.length - k);
        for (const part of ['re', 'im'] as const) {
          const error = scaled(value[part]) * unit - (theirs[k]![part] << 1074n);
          const room =
            BigInt(Math.ceil(2 ** 53 * (Math.abs(value[part]) * EPS + largest * EPS ** 1.9) * 2 ** 40)) *
            ((unit << 1074n) >> 93n);
          expect(error < 0n ? -error : error).toBeLessThanOrEqual(room);
        }
      });
    }),
    { seed: 101, numRuns: 150 },
  );
});

test('coefficientsFromRoots([]) is 1', () => {
  expect(coefficientsFromRoots([])).toEqual([{ re: 1, im: 0 }]);
});

test('polynomialRoots(coefficients) finds known roots of well-spaced polynomials', () => {
  const cases: readonly (readonly Complex[])[] = [
    [{ re: -1, im: 0 }],
    [
      { re: -1, im: 0 },
      { re: -2, im: 0 },
    ],
    [
      { re: 0, im: 1 },
      { re: 0, im: -1 },
      { re: 3, im: 0 },
    ],
    Array.from({ length: 12 }, (_, k) => ({ re: Math.cos(k), im: Math.sin(k) })),
  ];
  for (const roots of cases) {
    const found = polynomialRoots(coefficientsFromRoots(roots));
    expect(found).toHaveLength(roots.length);
    for (const each of roots) expect(Math.min(...found.map((other) => distance(each, other)))).toBeLessThan(1e-9);
    for (const each of found) expect(Math.min(...roots.map((other) => distance(each, other)))).toBeLessThan(1e-9);
  }
});

test('polynomialRoots(coefficients) has a backward error of rounding, clusters and wild scales included', () => {
  const coefficient = fc
    .tuple(
      fc.integer({ min: -1000, max: 1000 }),
      fc.integer({ min: -1000, max: 1000 }),
      fc.integer({ min: -30, max: 30 }),
    )
    .map(([re, im, e]) => ({ re: re * 2 ** e, im: im * 2 ** e }));
  const polynomial = fc.oneof(
    fc.array(coefficient, { minLength: 2, maxLength: 15 }).filter((list) => size(list.at(-1)!) > 0),
    fc
      .tuple(root, fc.integer({ min: 2, max: 8 }))
      .map(([z, n]) => coefficientsFromRoots(new Array<Complex>(n).fill(z))),
  );
  fc.assert(
    fc.property(polynomial, (coefficients) => {
      const roots = polynomialRoots(coefficients);
      expect(roots).toHaveLength(coefficients.length - 1);
      for (const z of roots) {
        let value: Complex = { re: 0, im: 0 };
        let sizes = 0;
        for (const c of [...coefficients].reverse()) {
          value = { re: value.re * z.re - value.im * z.im + c.re, im: value.re * z.im + value.im * z.re + c.im };
          sizes = sizes * size(z) + size(c);
        }
        expect(size(value)).toBeLessThanOrEqual(10 * coefficients.length * EPS * sizes);
      }
    }),
    { seed: 102, numRuns: 200 },
  );
});

test.each([
  [[]],
  [[{ re: 1, im: 0 }]],
  [
    [
      { re: 1, im: 0 },
      { re: 0, im: 0 },
    ],
  ],
  [
    [
      { re: Number.NaN, im: 0 },
      { re: 1, im: 0 },
    ],
  ],
])('polynomialRoots refuses %j', (coefficients) => {
  expect(() => polynomialRoots(coefficients)).toThrowError(expect.objectContaining({ name: 'FilterFailure' }));
});
