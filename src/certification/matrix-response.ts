import type { CouplingMatrix } from '../forms/index.js';
import { cell, eliminate, rowAt } from './elimination.js';
import { emptySeries, type Response } from './series.js';

/** The response of a matrix, and at each point the larger of |x|^2 over the two port columns x of A^-1. */
export interface MatrixResponse extends Response {
  readonly reach: Float64Array;
}

/**
 * S of the coupling matrix at real omega, solved from `A = M + omega*U - j*R` point by point; cost N^3/3 real multiplications a point.
 *
 * The columns of A that belong to resonators are real, and so is every row operation on them. With those columns
 * eliminated first (port rows take part in the choice of pivots, so an omega at an eigenvalue of the resonator block
 * is an ordinary point), the two imaginary entries -j travel as -j times the right-hand side. Table: N resonator
 * columns, the real parts of the port columns, the unit vectors of the ports.
 */
export function matrixResponse(matrix: CouplingMatrix, omega: Float64Array): MatrixResponse {
  const n = matrix.order;
  const shape = { rows: n + 2, columns: n + 4, pivots: n };
  const start = portsLast(matrix, shape.columns);
  const table = new Float64Array(start.length);
  const offsets = new Int32Array(shape.rows);
  const solution = new Float64Array(2 * (n + 2));
  const points = omega.length;
  const [s11, s21, s12, s22] = [emptySeries(points), emptySeries(points), emptySeries(points), emptySeries(points)];
  const reach = new Float64Array(points);
  for (let i = 0; i < points; i++) {
    table.set(start);
    for (let k = 0; k < n; k++)
      table[k * shape.columns + k] = cell(start, k * shape.columns + k) + (omega[i] as number);
    eliminate(table, offsets, shape);
    const fromSource = solvePort(table, offsets, n, 0, solution);
    s11.re[i] = -1 + 2 * cell(solution, 2 * n + 1);
    s11.im[i] = -2 * cell(solution, 2 * n);
    s21.re[i] = 2 * cell(solution, 2 * n + 3);
    s21.im[i] = -2 * cell(solution, 2 * n + 2);
    const fromLoad = solvePort(table, offsets, n, 1, solution);
    s12.re[i] = 2 * cell(solution, 2 * n + 1);
    s12.im[i] = -2 * cell(solution, 2 * n);
    s22.re[i] = -1 + 2 * cell(solution, 2 * n + 3);
    s22.im[i] = -2 * cell(solution, 2 * n + 2);
    reach[i] = Math.max(fromSource, fromLoad);
  }
  return { omega, s11, s21, s12, s22, reach };
}

/** The table at omega = 0: rows and columns in the order 1..N, source, load, then the two unit vectors. */
function portsLast(matrix: CouplingMatrix, columns: number): Float64Array {
  const n = matrix.order;
  const node = (position: number): number => (position < n ? position + 1 : position === n ? 0 : n + 1);
  const table = new Float64Array((n + 2) * columns);
  for (let r = 0; r < n + 2; r++) {
    for (let c = 0; c < n + 2; c++) table[r * columns + c] = matrix.values[node(r)]?.[node(c)] ?? Number.NaN;
  }
  table[n * columns + n + 2] = 1;
  table[(n + 1) * columns + n + 3] = 1;
  return table;
}

/** Solves for the column of A^-1 of one port into `x` (re, im in turn; resonators, source, load); returns |x|^2. */
function solvePort(table: Float64Array, offsets: Int32Array, n: number, port: 0 | 1, x: Float64Array): number {
  const upper = rowAt(offsets, n) + n;
  const lower = rowAt(offsets, n + 1) + n;
  // Two rows are left: (a - j*d) x_S + (b - j*e) x_L = d or e, with a, b, d, e in columns N .. N+3.
  const [a, b, d, e] = [cell(table, upper), cell(table, upper + 1), cell(table, upper + 2), cell(table, upper + 3)];
  const [f, g, h, k] = [cell(table, lower), cell(table, lower + 1), cell(table, lower + 2), cell(table, lower + 3)];
  const detRe = a * g - d * k - (b * f - e * h);
  const detIm = -(a * k + d * g) + (b * h + e * f);
  const [top, bottom] = port === 0 ? [d, h] : [e, k];
  divide(top * g - bottom * b, bottom * e - top * k, detRe, detIm, x, 2 * n);
  divide(bottom * a - top * f, top * h - bottom * d, detRe, detIm, x, 2 * n + 2);
  let norm = 0;
  for (let i = 2 * n; i < 2 * n + 4; i++) norm += cell(x, i) * cell(x, i);
  const [sRe, sIm, lRe, lIm] = [cell(x, 2 * n), cell(x, 2 * n + 1), cell(x, 2 * n + 2), cell(x, 2 * n + 3)];
  for (let r = n - 1; r >= 0; r--) {
    const row = rowAt(offsets, r);
    const [rs, rl, us, ul] = [
      cell(table, row + n),
      cell(table, row + n + 1),
      cell(table, row + n + 2),
      cell(table, row + n + 3),
    ];
    let re = (port === 0 ? us : ul) - rs * sRe - rl * lRe - us * sIm - ul * lIm;
    let im = us * sRe + ul * lRe - rs * sIm - rl * lIm;
    for (let c = r + 1; c < n; c++) {
      const entry = cell(table, row + c);
      re -= entry * cell(x, 2 * c);
      im -= entry * cell(x, 2 * c + 1);
    }
    const pivot = cell(table, row + r);
    x[2 * r] = re / pivot;
    x[2 * r + 1] = im / pivot;
    norm += cell(x, 2 * r) * cell(x, 2 * r) + cell(x, 2 * r + 1) * cell(x, 2 * r + 1);
  }
  return norm;
}

/** Writes (re + j*im)/(dRe + j*dIm) to out[i], out[i+1]; scaled, so that the square of the divisor cannot overflow. */
function divide(re: number, im: number, dRe: number, dIm: number, out: Float64Array, i: number): void {
  const scale = Math.max(Math.abs(dRe), Math.abs(dIm));
  const [c, d] = [dRe / scale, dIm / scale];
  const norm = (c * c + d * d) * scale;
  out[i] = (re * c + im * d) / norm;
  out[i + 1] = (im * c - re * d) / norm;
}
