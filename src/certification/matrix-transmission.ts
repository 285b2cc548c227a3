import type { Complex, CouplingMatrix } from '../forms/index.js';
import { cell, eliminate, rowAt } from './elimination.js';

/**
 * |S21| of the matrix at a complex s, `omega = -j*s`: 2*|[A^-1](N+1, 0)| by the real system [[Re A, -Im A], [Im A, Re A]].
 *
 * Nodes in the order 1..N, source, load; the unknowns of the load come last, so two steps of back substitution give them.
 */
export function transmissionAt(matrix: CouplingMatrix, s: Complex): number {
  const size = matrix.order + 2;
  const shape = { rows: 2 * size, columns: 2 * size + 1, pivots: 2 * size };
  const table = new Float64Array(shape.rows * shape.columns);
  const node = (position: number): number =>
    position < size - 2 ? position + 1 : position === size - 2 ? 0 : size - 1;
  for (let r = 0; r < size; r++) {
    for (let c = 0; c < size; c++) {
      const onDiagonal = r === c;
      const resonator = r < size - 2;
      const re = (matrix.values[node(r)]?.[node(c)] ?? Number.NaN) + (onDiagonal && resonator ? s.im : 0);
      const im = onDiagonal ? (resonator ? -s.re : -1) : 0;
      table[2 * r * shape.columns + 2 * c] = re;
      table[2 * r * shape.columns + 2 * c + 1] = -im;
      table[(2 * r + 1) * shape.columns + 2 * c] = im;
      table[(2 * r + 1) * shape.columns + 2 * c + 1] = re;
    }
  }
  table[(2 * (size - 2) + 1) * shape.columns - 1] = 1;
  const offsets = new Int32Array(shape.rows);
  eliminate(table, offsets, shape);
  const last = 2 * size - 1;
  const [row, above] = [rowAt(offsets, last), rowAt(offsets, last - 1)];
  const im = cell(table, row + last + 1) / cell(table, row + last);
  const re = (cell(table, above + last + 1) - cell(table, above + last) * im) / cell(table, above + last - 1);
  return 2 * Math.sqrt(re * re + im * im);
}
