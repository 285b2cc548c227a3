import type { Complex } from './complex-type.js';
import { EPS } from './limits.js';

/** A square complex matrix as rows of real and of imaginary parts. */
export interface ComplexRows {
  readonly re: readonly Float64Array[];
  readonly im: readonly Float64Array[];
}

/** Steps for one eigenvalue; two or three are usual. What has not settled by then is taken as it stands. */
const STEPS = 60;

/** A plane rotation `[c, s; -conj(s), c]`, c real. */
interface Turn {
  readonly c: number;
  readonly re: number;
  readonly im: number;
}

const at = (rows: readonly Float64Array[], i: number, j: number): number => rows[i]?.[j] as number;

function size({ re, im }: ComplexRows, i: number, j: number): number {
  return Math.hypot(at(re, i, j), at(im, i, j));
}

/** The rotation of rows p and q that makes entry (q, column) zero. */
function turnFor(a: ComplexRows, p: number, q: number, column: number): Turn {
  const [x, y] = [size(a, p, column), size(a, q, column)];
  if (y === 0) return { c: 1, re: 0, im: 0 };
  const [br, bi] = [at(a.re, q, column) / y, at(a.im, q, column) / y];
  if (x === 0) return { c: 0, re: br, im: -bi };
  const r = Math.hypot(x, y);
  const [ar, ai] = [at(a.re, p, column) / x, at(a.im, p, column) / x];
  return { c: x / r, re: ((ar * br + ai * bi) * y) / r, im: ((ai * br - ar * bi) * y) / r };
}

/** `(x, y) <- (c*x + s*y, -conj(s)*x + c*y)` for one pair of entries. */
function turnPair(
  xRe: Float64Array,
  xIm: Float64Array,
  yRe: Float64Array,
  yIm: Float64Array,
  x: number,
  y: number,
  turn: Turn,
): void {
  const { c, re, im } = turn;
  const [a, b, d, e] = [xRe[x] as number, xIm[x] as number, yRe[y] as number, yIm[y] as number];
  xRe[x] = c * a + re * d - im * e;
  xIm[x] = c * b + re * e + im * d;
  yRe[y] = c * d - re * a - im * b;
  yIm[y] = c * e - re * b + im * a;
}

function turnRows({ re, im }: ComplexRows, p: number, q: number, from: number, to: number, turn: Turn): void {
  const [xRe, xIm, yRe, yIm] = [re[p], im[p], re[q], im[q]] as [Float64Array, Float64Array, Float64Array, Float64Array];
  for (let k = from; k <= to; k++) turnPair(xRe, xIm, yRe, yIm, k, k, turn);
}

/** The same rotation from the right, conjugate transposed. */
function turnColumns(
  { re, im }: ComplexRows,
  p: number,
  q: number,
  from: number,
  to: number,
  { c, re: sRe, im: sIm }: Turn,
): void {
  const conjugate = { c, re: sRe, im: -sIm };
  for (let k = from; k <= to; k++) {
    const [rowRe, rowIm] = [re[k], im[k]] as [Float64Array, Float64Array];
    turnPair(rowRe, rowIm, rowRe, rowIm, p, q, conjugate);
  }
}

/** Similarity to upper Hessenberg form, in place. */
function toHessenberg(a: ComplexRows): void {
  const last = a.re.length - 1;
  for (let column = 0; column < last - 1; column++) {
    for (let q = column + 2; q <= last; q++) {
      const turn = turnFor(a, column + 1, q, column);
      turnRows(a, column + 1, q, column, last, turn);
      turnColumns(a, column + 1, q, 0, last, turn);
    }
  }
}

/** Where the unreduced block that ends at `high` begins. */
function blockStart(a: ComplexRows, high: number, norm: number): number {
  let low = high;
  while (low > 0) {
    const scale = size(a, low - 1, low - 1) + size(a, low, low) || norm;
    if (size(a, low, low - 1) <= EPS * scale) break;
    low -= 1;
  }
  return low;
}

/** The eigenvalue of the last 2 x 2 block that is nearer to its last entry. */
function shiftOf({ re, im }: ComplexRows, high: number): Complex {
  const k = high - 1;
  const [dRe, dIm] = [(at(re, k, k) - at(re, high, high)) / 2, (at(im, k, k) - at(im, high, high)) / 2];
  const [bRe, bIm, cRe, cIm] = [at(re, k, high), at(im, k, high), at(re, high, k), at(im, high, k)];
  const [productRe, productIm] = [bRe * cRe - bIm * cIm, bRe * cIm + bIm * cRe];
  const [squareRe, squareIm] = [dRe * dRe - dIm * dIm + productRe, 2 * dRe * dIm + productIm];
  const length = Math.hypot(squareRe, squareIm);
  let rootRe = Math.sqrt(Math.max(0, (length + squareRe) / 2));
  let rootIm = Math.sqrt(Math.max(0, (length - squareRe) / 2)) * (squareIm < 0 ? -1 : 1);
  if (rootRe * dRe + rootIm * dIm < 0) [rootRe, rootIm] = [-rootRe, -rootIm];
  const [sumRe, sumIm] = [dRe + rootRe, dIm + rootIm];
  const norm = sumRe * sumRe + sumIm * sumIm;
  if (norm === 0) return { re: at(re, high, high), im: at(im, high, high) };
  const quotientRe = (productRe * sumRe + productIm * sumIm) / norm;
  const quotientIm = (productIm * sumRe - productRe * sumIm) / norm;
  return { re: at(re, high, high) - quotientRe, im: at(im, high, high) - quotientIm };
}

function addToDiagonal({ re, im }: ComplexRows, low: number, high: number, value: Complex): void {
  for (let k = low; k <= high; k++) {
    const [rowRe, rowIm] = [re[k], im[k]] as [Float64Array, Float64Array];
    rowRe[k] = (rowRe[k] as number) + value.re;
    rowIm[k] = (rowIm[k] as number) + value.im;
  }
}

function qrStep(a: ComplexRows, low: number, high: number, shift: Complex): void {
  addToDiagonal(a, low, high, { re: -shift.re, im: -shift.im });
  const turns: Turn[] = [];
  for (let k = low; k < high; k++) {
    const turn = turnFor(a, k, k + 1, k);
    turnRows(a, k, k + 1, k, high, turn);
    turns.push(turn);
  }
  turns.forEach((turn, n) => {
    turnColumns(a, low + n, low + n + 1, low, Math.min(low + n + 2, high), turn);
  });
  addToDiagonal(a, low, high, shift);
}

/**
 * Eigenvalues of a square complex matrix of finite numbers, in no particular order; backward stable. Cost O(n^3).
 *
 * Method: Hessenberg form by plane rotations, then QR steps with the shift of the last 2 x 2 block, an odd shift after every
 * ten steps without success, and never more than 60 steps an eigenvalue.
 *
 * Source: G. H. Golub, C. F. Van Loan, Matrix Computations, section on the QR algorithm (from memory).
 */
export function complexEigenvalues(matrix: ComplexRows): readonly Complex[] {
  const a = { re: matrix.re.map((row) => Float64Array.from(row)), im: matrix.im.map((row) => Float64Array.from(row)) };
  toHessenberg(a);
  const norm = Math.max(...a.re.map((row, i) => row.reduce((sum, _, j) => sum + size(a, i, j), 0)));
  const values: Complex[] = [];
  let steps = 0;
  for (let high = a.re.length - 1; high >= 0; ) {
    const low = blockStart(a, high, norm);
    if (low === high || steps === STEPS) {
      values.push({ re: at(a.re, high, high), im: at(a.im, high, high) });
      high -= 1;
      steps = 0;
      continue;
    }
    steps += 1;
    const odd = { re: at(a.re, high, high) + size(a, high, high - 1), im: at(a.im, high, high) };
    qrStep(a, low, high, steps % 10 === 0 ? odd : shiftOf(a, high));
  }
  return values;
}
