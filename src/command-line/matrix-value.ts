import type { CouplingMatrix } from '../forms/index.js';
import { type JsonValue, kindFault, type Path } from '../specification/index.js';
import { addFault, checkKeys, isMembers, type Reading } from './json-file.js';

const LEAST_SIZE = 3;
const MOST_SIZE = 102;
/** Normalized couplings of any filter lie far within; beyond, products overflow or vanish. */
const LARGEST = 1e4;
const SMALLEST = 1e-100;
const ALLOWED = 'a list of rows of numbers, or an object with order and values';

function shapeFault(reading: Reading, path: Path, found: string, allowed: string, advice: string): void {
  addFault(reading, { code: 'E_MATRIX_SHAPE', path, found, allowed, advice, value: found, limit: allowed });
}

function withinRange(reading: Reading, row: readonly number[], path: Path): readonly number[] | undefined {
  const column = row.findIndex((entry) => Math.abs(entry) > LARGEST || (entry !== 0 && Math.abs(entry) < SMALLEST));
  if (column < 0) return row;
  const allowed = `0, or normalized entries of size ${SMALLEST} to ${LARGEST}`;
  const isTiny = Math.abs(row[column] ?? 0) < 1;
  const advice = isTiny ? 'write 0' : 'check that the matrix is normalized, not in hertz';
  const fault = { code: 'E_ENTRY_RANGE', path: [...path, column], found: String(row[column]), allowed, advice };
  addFault(reading, { ...fault, value: row[column], limit: LARGEST });
  return undefined;
}

function readRow(
  reading: Reading,
  row: JsonValue | undefined,
  path: Path,
  size: number,
): readonly number[] | undefined {
  if (!Array.isArray(row)) {
    addFault(reading, kindFault(path, row, 'a row of numbers', 'write a list'));
    return undefined;
  }
  if (row.length !== size) {
    shapeFault(reading, path, `${row.length} entries in a matrix of ${size} rows`, `${size} entries`, 'make it square');
    return undefined;
  }
  const numbers = row.filter((entry) => typeof entry === 'number');
  if (numbers.length === size) return withinRange(reading, numbers, path);
  row.forEach((entry, column) => {
    if (typeof entry === 'number') return;
    addFault(reading, kindFault([...path, column], entry, 'a number', 'write a number; 0 where nothing couples'));
  });
  return undefined;
}

function checkSymmetry(reading: Reading, rows: readonly (readonly number[])[], path: Path): void {
  rows.forEach((row, i) => {
    for (let j = 0; j < i; j += 1) {
      const [here, mirrored] = [row[j] ?? 0, rows[j]?.[i] ?? 0];
      if (here === mirrored) continue;
      const found = `(${j},${i}) = ${mirrored} but (${i},${j}) = ${here}`;
      const allowed = 'equal entries across the diagonal: the network is reciprocal';
      const base = { code: 'E_NOT_SYMMETRIC', path: [...path, i, j], found, allowed };
      addFault(reading, { ...base, advice: 'make the two entries equal', value: here, limit: mirrored });
    }
  });
}

function readRows(reading: Reading, value: JsonValue | undefined, path: Path): CouplingMatrix | undefined {
  if (!Array.isArray(value)) {
    addFault(reading, kindFault(path, value, ALLOWED, 'write the rows as lists'));
    return undefined;
  }
  const size = value.length;
  if (size < LEAST_SIZE || size > MOST_SIZE) {
    const allowed = `${LEAST_SIZE} to ${MOST_SIZE} rows: source, 1 to ${MOST_SIZE - 2} resonators, load`;
    shapeFault(reading, path, `${size} rows`, allowed, 'add or remove rows');
    return undefined;
  }
  const rows = value.map((row, i) => readRow(reading, row, [...path, i], size));
  const whole = rows.filter((row) => row !== undefined);
  if (whole.length < size) return undefined;
  checkSymmetry(reading, whole, path);
  return { order: size - 2, values: whole };
}

/** Reads a coupling matrix given as rows, or as an object with order and values; all faults are told. */
export function readMatrix(reading: Reading, value: JsonValue | undefined, path: Path): CouplingMatrix | undefined {
  if (!isMembers(value)) return readRows(reading, value, path);
  checkKeys(reading, value, path, ['order', 'values', 'finiteZeros']);
  const matrix = readRows(reading, value.values, [...path, 'values']);
  const { order } = value;
  if (matrix === undefined || order === undefined || order === matrix.order) return matrix;
  const found = `order ${String(order)} beside a matrix of order ${matrix.order}`;
  shapeFault(reading, [...path, 'order'], found, `${matrix.order}`, 'correct the order, or the rows');
  return undefined;
}
