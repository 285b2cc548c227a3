import { doubledDot } from './doubled.js';
import { FilterFailure } from './failure.js';

/** A complex vector as two real ones. */
export interface ComplexVector {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** `A = M + diag(shiftRe + j*shiftIm)` with real M: rows of M and the two parts of the diagonal shift. */
export interface ShiftedMatrix {
  readonly rows: readonly Float64Array[];
  readonly shiftRe: Float64Array;
  readonly shiftIm: Float64Array;
}

/**
 * Columns `columns` of the inverse of a shifted matrix: Gaussian elimination with partial pivoting, then corrections with
 * the residual summed in doubled precision, so that the result is that of the given entries to a few ulp.
 *
 * @throws FilterFailure E_SINGULAR when a pivot vanishes
 */
export function inverseColumns(matrix: ShiftedMatrix, columns: readonly number[]): readonly ComplexVector[] {
  const factors = factorize(matrix);
  return columns.map((column) => {
    const x = unitVector(factors.size, column);
    solve(factors, x);
    for (let turn = 0; turn < 2; turn++) {
      const rest = residual(matrix, x, column);
      solve(factors, rest);
      for (let i = 0; i < factors.size; i++) {
        x.re[i] = (x.re[i] as number) + (rest.re[i] as number);
        x.im[i] = (x.im[i] as number) + (rest.im[i] as number);
      }
    }
    return x;
  });
}

interface Factors {
  readonly size: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly order: Int32Array;
}

function unitVector(size: number, column: number): ComplexVector {
  const re = new Float64Array(size);
  re[column] = 1;
  return { re, im: new Float64Array(size) };
}

function factorize({ rows, shiftRe, shiftIm }: ShiftedMatrix): Factors {
  const size = rows.length;
  const re = new Float64Array(size * size);
  const im = new Float64Array(size * size);
  rows.forEach((row, i) => {
    re.set(row, i * size);
    re[i * size + i] = (row[i] as number) + (shiftRe[i] as number);
    im[i * size + i] = shiftIm[i] as number;
  });
  const order = Int32Array.from({ length: size }, (_, i) => i);
  for (let k = 0; k < size; k++) {
    choosePivot(re, im, order, size, k);
    eliminateBelow(re, im, size, k);
  }
  return { size, re, im, order };
}

function choosePivot(re: Float64Array, im: Float64Array, order: Int32Array, size: number, k: number): void {
  let best = k;
  let bestSize = -1;
  for (let i = k; i < size; i++) {
    const value = Math.abs(re[i * size + k] as number) + Math.abs(im[i * size + k] as number);
    if (value > bestSize) {
      best = i;
      bestSize = value;
    }
  }
  if (!(bestSize > 0)) {
    throw new FilterFailure(
      'E_SINGULAR',
      `E_SINGULAR omega: found a frequency at which the network's equations are singular; allowed frequencies off the poles; shift the frequency or add loss`,
      { argument: 'omega', value: bestSize, limit: 0, hint: 'shift the frequency or add loss' },
    );
  }
  if (best === k) return;
  for (let j = 0; j < size; j++) {
    swap(re, k * size + j, best * size + j);
    swap(im, k * size + j, best * size + j);
  }
  swap(order, k, best);
}

/** 1/(a + j*b) by Smith's scaling: no square that could leave the range of doubles. */
function reciprocal(a: number, b: number): readonly [number, number] {
  if (Math.abs(a) >= Math.abs(b)) {
    const ratio = b / a;
    const below = a + b * ratio;
    return [1 / below, -ratio / below];
  }
  const ratio = a / b;
  const below = a * ratio + b;
  return [ratio / below, -1 / below];
}

function swap(values: Float64Array | Int32Array, i: number, j: number): void {
  const kept = values[i] as number;
  values[i] = values[j] as number;
  values[j] = kept;
}

function eliminateBelow(re: Float64Array, im: Float64Array, size: number, k: number): void {
  const [inverseRe, inverseIm] = reciprocal(re[k * size + k] as number, im[k * size + k] as number);
  for (let i = k + 1; i < size; i++) {
    const a = re[i * size + k] as number;
    const b = im[i * size + k] as number;
    if (a === 0 && b === 0) continue;
    const factorRe = a * inverseRe - b * inverseIm;
    const factorIm = a * inverseIm + b * inverseRe;
    re[i * size + k] = factorRe;
    im[i * size + k] = factorIm;
    for (let j = k + 1; j < size; j++) {
      const x = re[k * size + j] as number;
      const y = im[k * size + j] as number;
      re[i * size + j] = (re[i * size + j] as number) - factorRe * x + factorIm * y;
      im[i * size + j] = (im[i * size + j] as number) - factorRe * y - factorIm * x;
    }
  }
}

/** Solves in place: permutation, unit lower triangle, upper triangle. */
function solve({ size, re, im, order }: Factors, x: ComplexVector): void {
  const copyRe = Float64Array.from(order, (i) => x.re[i] as number);
  const copyIm = Float64Array.from(order, (i) => x.im[i] as number);
  for (let i = 0; i < size; i++) substitute(re, im, copyRe, copyIm, i * size, i, 0, i);
  for (let i = size - 1; i >= 0; i--) {
    substitute(re, im, copyRe, copyIm, i * size, i, i + 1, size);
    const [a, b] = reciprocal(re[i * size + i] as number, im[i * size + i] as number);
    const p = copyRe[i] as number;
    const q = copyIm[i] as number;
    copyRe[i] = p * a - q * b;
    copyIm[i] = p * b + q * a;
  }
  x.re.set(copyRe);
  x.im.set(copyIm);
}

/** `x[i] -= sum over j in [from, to) of L or U[i][j]*x[j]`. */
function substitute(
  re: Float64Array,
  im: Float64Array,
  xRe: Float64Array,
  xIm: Float64Array,
  row: number,
  i: number,
  from: number,
  to: number,
): void {
  let p = xRe[i] as number;
  let q = xIm[i] as number;
  for (let j = from; j < to; j++) {
    const a = re[row + j] as number;
    const b = im[row + j] as number;
    p -= a * (xRe[j] as number) - b * (xIm[j] as number);
    q -= a * (xIm[j] as number) + b * (xRe[j] as number);
  }
  xRe[i] = p;
  xIm[i] = q;
}

/** `e_column - A x`, each sum in doubled precision; the shift enters as two more terms of the sum. */
function residual({ rows, shiftRe, shiftIm }: ShiftedMatrix, x: ComplexVector, column: number): ComplexVector {
  const size = rows.length;
  const coefficients = new Float64Array(size + 3);
  const vector = new Float64Array(size + 3);
  const rest = { re: new Float64Array(size), im: new Float64Array(size) };
  vector[size + 2] = 1;
  for (let i = 0; i < size; i++) {
    coefficients.set(rows[i] as Float64Array);
    coefficients[size] = shiftRe[i] as number;
    vector.set(x.re);
    vector[size] = x.re[i] as number;
    coefficients[size + 1] = -(shiftIm[i] as number);
    vector[size + 1] = x.im[i] as number;
    coefficients[size + 2] = i === column ? -1 : 0;
    rest.re[i] = -doubledDot(coefficients, vector).hi;
    vector.set(x.im);
    vector[size] = x.im[i] as number;
    coefficients[size + 1] = shiftIm[i] as number;
    vector[size + 1] = x.re[i] as number;
    coefficients[size + 2] = 0;
    rest.im[i] = -doubledDot(coefficients, vector).hi;
  }
  return rest;
}
