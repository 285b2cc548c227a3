import type { Decimal } from 'decimal.js';
import { expect, test } from 'vitest';
import { EPS, FilterFailure, inverseColumns, type ShiftedMatrix } from '../../src/numerics/index.js';
import { Exact, exact } from '../support/exact.js';
import { logUniform, seeded } from '../support/random.js';

interface Pair {
  re: Decimal;
  im: Decimal;
}

const times = (a: Pair, b: Pair): Pair => ({
  re: a.re.times(b.re).minus(a.im.times(b.im)),
  im: a.re.times(b.im).plus(a.im.times(b.re)),
});
const over = (a: Pair, b: Pair): Pair => {
  const square = b.re.times(b.re).plus(b.im.times(b.im));
  const product = times(a, { re: b.re, im: b.im.neg() });
  return { re: product.re.div(square), im: product.im.div(square) };
};
const sizeOf = (a: Pair): Decimal => a.re.times(a.re).plus(a.im.times(a.im)).sqrt();

/** One column of the inverse by elimination in 100 digits. */
function exactColumn({ rows, shiftRe, shiftIm }: ShiftedMatrix, column: number): Pair[] {
  const n = rows.length;
  const zero = new Exact(0);
  const a: Pair[][] = rows.map((row, i) => [
    ...Array.from(row, (value, j) => ({
      re: i === j ? exact(value).plus(exact(shiftRe[i]!)) : exact(value),
      im: i === j ? exact(shiftIm[i]!) : zero,
    })),
    { re: new Exact(i === column ? 1 : 0), im: zero },
  ]);
  for (let k = 0; k < n; k++) {
    let best = k;
    for (let i = k + 1; i < n; i++) if (sizeOf(a[i]![k]!).gt(sizeOf(a[best]![k]!))) best = i;
    [a[k], a[best]] = [a[best]!, a[k]!];
    for (let i = 0; i < n; i++) {
      if (i === k) continue;
      const factor = over(a[i]![k]!, a[k]![k]!);
      for (let j = k; j <= n; j++) {
        const part = times(factor, a[k]![j]!);
        a[i]![j] = { re: a[i]![j]!.re.minus(part.re), im: a[i]![j]!.im.minus(part.im) };
      }
    }
  }
  return a.map((row, i) => over(row[n]!, row[i]!));
}

/** Largest error of a column over its largest entry, in eps. */
function columnError(matrix: ShiftedMatrix, column: number): number {
  const reference = exactColumn(matrix, column);
  const [x] = inverseColumns(matrix, [column]);
  const size = reference.reduce((largest, value) => Exact.max(largest, sizeOf(value)), new Exact(0));
  const error = reference.reduce(
    (largest, value, i) =>
      Exact.max(largest, sizeOf({ re: value.re.minus(exact(x!.re[i]!)), im: value.im.minus(exact(x!.im[i]!)) })),
    new Exact(0),
  );
  return error.div(size).toNumber() / EPS;
}

function randomShifted(random: () => number, n: number, grade: number): ShiftedMatrix {
  const noise = (): number => 2 * random() - 1;
  const scale = Array.from({ length: n }, () => logUniform(random, grade, 1));
  const rows = Array.from({ length: n }, () => new Float64Array(n));
  for (let i = 0; i < n; i++)
    for (let j = 0; j <= i; j++) rows[i]![j] = rows[j]![i] = noise() * Math.sqrt(scale[i]! * scale[j]!);
  const port = (i: number): boolean => i === 0 || i === n - 1;
  return {
    rows,
    shiftRe: Float64Array.from({ length: n }, (_, i) => (port(i) ? 0 : noise())),
    shiftIm: Float64Array.from({ length: n }, (_, i) => (port(i) ? -1 : -random() * (random() < 0.5 ? 0 : 1))),
  };
}

test('inverseColumns(matrix, columns) of well-scaled matrices is right to 2 ulp against 100 digits', () => {
  const random = seeded(31);
  for (let turn = 0; turn < 12; turn++) {
    const n = 2 + (turn % 6);
    expect(columnError(randomShifted(random, n, 1), turn % n)).toBeLessThan(2);
  }
});

test('inverseColumns(matrix, columns) of graded matrices is right to 2 ulp against 100 digits', () => {
  const random = seeded(32);
  for (let turn = 0; turn < 12; turn++) {
    const n = 3 + (turn % 5);
    expect(columnError(randomShifted(random, n, 1e-8), turn % n)).toBeLessThan(2);
  }
});

test('inverseColumns(matrix, columns) next to a singular point (condition 1e10) is right to 2 ulp against 100 digits', () => {
  const random = seeded(33);
  for (let turn = 0; turn < 6; turn++) {
    const n = 4;
    const matrix = randomShifted(random, n, 1);
    // Row 2 repeats row 1 but for 1e-10 on the diagonal; no loss there.
    for (let j = 0; j < n; j++) matrix.rows[2]![j] = matrix.rows[j]![2] = matrix.rows[1]![j]!;
    matrix.rows[2]![2] = matrix.rows[1]![2] = matrix.rows[2]![1] = matrix.rows[1]![1]!;
    matrix.shiftRe.set([0, 0, 1e-10, 0]);
    matrix.shiftIm.set([-1, 0, 0, -1]);
    expect(columnError(matrix, 0)).toBeLessThan(2);
  }
});

test('inverseColumns(matrix, columns) of a 2 x 2 matrix is the closed form', () => {
  // A = [[-j, 1], [1, -j]]: determinant -2, inverse = [[-j, -1], [-1, -j]]/-2.
  const matrix = {
    rows: [Float64Array.of(0, 1), Float64Array.of(1, 0)],
    shiftRe: new Float64Array(2),
    shiftIm: Float64Array.of(-1, -1),
  };
  const [first, second] = inverseColumns(matrix, [0, 1]);
  expect(Array.from(first!.re)).toEqual([0, 0.5]);
  expect(Array.from(first!.im)).toEqual([0.5, 0]);
  expect(Array.from(second!.re)).toEqual([0.5, 0]);
  expect(Array.from(second!.im)).toEqual([0, 0.5]);
});

test('inverseColumns(matrix, columns) needs a pivot search and has one', () => {
  const matrix = {
    rows: [Float64Array.of(0, 2, 0), Float64Array.of(2, 0, 1), Float64Array.of(0, 1, 0)],
    shiftRe: Float64Array.of(0, 0, 4),
    shiftIm: new Float64Array(3),
  };
  expect(columnError(matrix, 0)).toBeLessThan(2);
});

test('inverseColumns(singular, columns) throws E_SINGULAR', () => {
  const matrix = {
    rows: [Float64Array.of(1, 1), Float64Array.of(1, 1)],
    shiftRe: new Float64Array(2),
    shiftIm: new Float64Array(2),
  };
  expect(() => inverseColumns(matrix, [0])).toThrowError(expect.objectContaining({ code: 'E_SINGULAR' }));
  expect(() => inverseColumns(matrix, [0])).toThrowError(FilterFailure);
});

test('inverseColumns does not write its argument', () => {
  const matrix = randomShifted(seeded(34), 5, 1);
  const copy = structuredClone(matrix);
  inverseColumns(matrix, [0, 4]);
  expect(matrix).toEqual(copy);
});
