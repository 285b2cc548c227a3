import { describe, expect, test } from 'vitest';
import { EPS, symmetricEigen } from '../../src/numerics/index.js';
import { logUniform, seeded } from '../support/random.js';

type Rows = Float64Array[];

const rowsFrom = (n: number, value: (i: number, j: number) => number): Rows => {
  const rows = Array.from({ length: n }, () => new Float64Array(n));
  for (let i = 0; i < n; i++) for (let j = 0; j <= i; j++) rows[i]![j] = rows[j]![i] = value(i, j);
  return rows;
};

const largest = (values: Iterable<number>): number => {
  let best = 0;
  for (const value of values) best = Math.max(best, Math.abs(value));
  return best;
};

const normOf = (rows: Rows): number =>
  Math.max(...rows.map((row) => row.reduce((sum, value) => sum + Math.abs(value), 0)));

/** `|A - V L V^T| / (|A| n eps)` and `|I - V V^T| / (n eps)`, largest row sums. */
function ratios(rows: Rows): { residual: number; orthogonality: number } {
  const n = rows.length;
  const { values, vectors } = symmetricEigen(rows);
  const rest = rows.map((row, i) =>
    row.map((value, j) => {
      let sum = value;
      for (let k = 0; k < n; k++) sum -= values[k]! * vectors[k]![i]! * vectors[k]![j]!;
      return sum;
    }),
  );
  const defect = vectors.map((v, k) =>
    Float64Array.from(vectors, (w, l) => v.reduce((sum, x, i) => sum + x * w[i]!, k === l ? -1 : 0)),
  );
  const norm = normOf(rows);
  return {
    residual: norm === 0 ? normOf(rest) : normOf(rest) / (norm * n * EPS),
    orthogonality: normOf(defect) / (n * EPS),
  };
}

const random = seeded(21);
const noise = (): number => 2 * random() - 1;
const rotationOf = (n: number, diagonal: readonly number[]): Rows => {
  // Householder reflection H D H keeps the spectrum.
  const v = Array.from({ length: n }, noise);
  const square = v.reduce((sum, x) => sum + x * x, 0);
  const h = (i: number, j: number): number => (i === j ? 1 : 0) - (2 * v[i]! * v[j]!) / square;
  return rowsFrom(n, (i, j) => diagonal.reduce((sum, d, k) => sum + h(i, k) * d * h(j, k), 0));
};

const families: readonly (readonly [string, (n: number) => Rows])[] = [
  ['random', (n) => rowsFrom(n, noise)],
  ['graded down by 10 a row', (n) => rowsFrom(n, (i, j) => noise() * 10 ** -(i + j))],
  ['graded up by 10 a row', (n) => rowsFrom(n, (i, j) => noise() * 10 ** (i + j))],
  [
    'clustered within 1e-12',
    (n) =>
      rotationOf(
        n,
        Array.from({ length: n }, (_, k) => 1 + 1e-12 * k),
      ),
  ],
  [
    'two exact clusters',
    (n) =>
      rotationOf(
        n,
        Array.from({ length: n }, (_, k) => (k % 2 === 0 ? 1 : -2)),
      ),
  ],
  [
    'eigenvalues over 16 decades',
    (n) =>
      rotationOf(
        n,
        Array.from({ length: n }, () => logUniform(random, 1e-16, 1)),
      ),
  ],
  ['all ones', (n) => rowsFrom(n, () => 1)],
  ['identity', (n) => rowsFrom(n, (i, j) => (i === j ? 1 : 0))],
  ['zero', (n) => rowsFrom(n, () => 0)],
  ['diagonal, unsorted', (n) => rowsFrom(n, (i, j) => (i === j ? noise() : 0))],
  ['chain', (n) => rowsFrom(n, (i, j) => (Math.abs(i - j) === 1 ? 0.5 : 0))],
  ['scaled to 1e150', (n) => rowsFrom(n, () => 1e150 * noise())],
  ['scaled to 1e-150', (n) => rowsFrom(n, () => 1e-150 * noise())],
];

describe.each(families)('symmetricEigen(%s)', (_, make) => {
  test('has residual and orthogonality within 50 n eps, orders 1 to 40', () => {
    for (const n of [1, 2, 3, 5, 10, 20, 40]) {
      const { residual, orthogonality } = ratios(make(n));
      expect(residual).toBeLessThan(50);
      expect(orthogonality).toBeLessThan(50);
    }
  });

  test('gives ascending values', () => {
    for (const n of [1, 2, 7, 20]) {
      const { values } = symmetricEigen(make(n));
      values.forEach((value, k) => {
        if (k > 0) expect(value).toBeGreaterThanOrEqual(values[k - 1]!);
      });
    }
  });
});

test('symmetricEigen(chain) has the closed-form values cos(k pi/(n+1))', () => {
  for (const n of [2, 3, 8, 33]) {
    const { values } = symmetricEigen(rowsFrom(n, (i, j) => (Math.abs(i - j) === 1 ? 0.5 : 0)));
    const gaps = values.map((value, k) => value - Math.cos(((n - k) * Math.PI) / (n + 1)));
    expect(largest(gaps)).toBeLessThan(10 * n * EPS);
  }
});

test('symmetricEigen does not write its argument', () => {
  const rows = rowsFrom(5, noise);
  const copy = rows.map((row) => Float64Array.from(row));
  symmetricEigen(rows);
  expect(rows).toEqual(copy);
});
