import type { CouplingMatrix } from '../forms/index.js';
import { type FilterFailure, refusal } from '../numerics/index.js';

/** Working copy of a coupling matrix: rows of doubles that a routine may write. */
export type Rows = Float64Array[];

/**
 * Checks a coupling matrix at the room's door and copies it into rows of doubles.
 *
 * @throws FilterFailure E_MATRIX_SHAPE, E_TYPE, E_NOT_FINITE, E_ENTRY_RANGE, E_NOT_SYMMETRIC
 */
export function rowsOf(matrix: CouplingMatrix): Rows {
  const size = matrix?.order + 2;
  if (!Number.isInteger(matrix?.order) || matrix.order < 1) {
    throw shapeFailure(
      'matrix.order',
      matrix?.order,
      'a whole number of resonators, 1 or more',
      'give order and values of one matrix',
    );
  }
  if (!Array.isArray(matrix.values) || matrix.values.length !== size) {
    throw shapeFailure(
      'matrix.values',
      matrix.values?.length,
      `${size} rows for order ${matrix.order}`,
      'add or remove rows',
    );
  }
  checkFiniteZeros(matrix.finiteZeros, matrix.order);
  const rows = matrix.values.map((row, i) => rowOf(row, i, size));
  rows.forEach((row, i) => {
    for (let j = 0; j < i; j++) checkSymmetry(rows, row, i, j);
  });
  return rows;
}

function checkFiniteZeros(finiteZeros: unknown, order: number): void {
  if (finiteZeros === undefined) return;
  if (Number.isInteger(finiteZeros) && (finiteZeros as number) >= 0 && (finiteZeros as number) <= order) return;
  throw refusal(
    'E_TYPE',
    'matrix.finiteZeros',
    finiteZeros,
    `a whole number, 0 to ${order}`,
    'leave it out where it is not known',
  );
}

function rowOf(row: ArrayLike<number>, i: number, size: number): Float64Array {
  if (typeof row !== 'object' || row === null || row.length !== size) {
    throw shapeFailure(`matrix.values[${i}]`, row?.length, `${size} entries in every row`, 'make the matrix square');
  }
  const values = new Float64Array(size);
  for (let j = 0; j < size; j++) {
    const value: unknown = row[j];
    // Adding 0 makes -0 a plain 0; the place of an entry is spelled out only for a faulty one.
    values[j] =
      typeof value === 'number' && isUsable(value) ? value + 0 : refuseEntry(value, `matrix.values[${i}][${j}]`);
  }
  return values;
}

/** Entries of a normalized matrix lie near 1; beyond these sizes squares leave the range of doubles. */
const LARGEST_ENTRY = 1e8;
const SMALLEST_ENTRY = 1e-100;

function isUsable(value: number): boolean {
  const size = Math.abs(value);
  return size === 0 || (size <= LARGEST_ENTRY && size >= SMALLEST_ENTRY);
}

function refuseEntry(value: unknown, where: string): never {
  if (typeof value !== 'number') throw refusal('E_TYPE', where, value, 'numbers only', 'replace the entry by a number');
  if (!Number.isFinite(value)) throw refusal('E_NOT_FINITE', where, value, 'finite numbers', 'replace the entry');
  throw refusal(
    'E_ENTRY_RANGE',
    where,
    value,
    `0 or sizes of ${SMALLEST_ENTRY} to ${LARGEST_ENTRY}`,
    'check the scale: couplings are normalized',
  );
}

function checkSymmetry(rows: Rows, row: Float64Array, i: number, j: number): void {
  const mirror = rows[j]?.[i];
  if (row[j] !== mirror) {
    throw refusal(
      'E_NOT_SYMMETRIC',
      `matrix.values[${i}][${j}]`,
      row[j],
      `${mirror}, the value of entry (${j},${i})`,
      'make the two entries equal: the network is reciprocal',
    );
  }
}

function shapeFailure(argument: string, value: unknown, limit: string, hint: string): FilterFailure {
  return refusal('E_MATRIX_SHAPE', argument, value, limit, hint);
}

/** Rows back to a frozen-by-type coupling matrix; the upper triangle rules, so that (i,j) and (j,i) never differ. */
export function matrixFrom(rows: Rows, finiteZeros: number | undefined): CouplingMatrix {
  const values = rows.map((_, i) => rows.map((_, j) => normalZero((i <= j ? rows[i]?.[j] : rows[j]?.[i]) as number)));
  const order = rows.length - 2;
  return finiteZeros === undefined ? { order, values } : { order, values, finiteZeros };
}

const normalZero = (value: number): number => (value === 0 ? 0 : value);

/** Largest absolute row sum: a bound of the 2-norm that costs nothing. */
export function normOf(rows: Rows): number {
  return Math.max(...rows.map((row) => row.reduce((sum, value) => sum + Math.abs(value), 0)));
}
