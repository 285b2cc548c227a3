import type { Certificate, CouplingMatrix, Rotation } from '../forms/index.js';
import { atMost, EPSILON } from './verdict.js';

/** C7: replayed in doubles, a list of N(N-1)/2 rotations reaches the matrix to its rounding; a wrong step misses by far more. */
const REPLAY_LIMIT = 1e-10;

/** C7: rounding of one rotation in the product of all, in units of eps; they add up like a random walk, so N stands for sqrt(N^2). */
const ROUNDING_PER_ORDER = 30;

/**
 * C7: the listed rotations turn the matrix before into the matrix after, and their product is orthogonal.
 *
 * Replayed here entry by entry on dense rows: `M' = R M R^T`, `R_ii = R_jj = cos`, `R_ij = -sin`, `R_ji = sin`, then the sign
 * changes of `flip`. The difference is relative to the largest entry. Cost O(N) a rotation.
 */
export function replay(before: CouplingMatrix, after: CouplingMatrix, rotations: readonly Rotation[]): Certificate[] {
  const matrix = before.values.map((row) => [...row]);
  const basis = matrix.map((row, i) => row.map((_, j) => (i === j ? 1 : 0)));
  for (const { pivot, angle, flip } of rotations) {
    turnRows(matrix, pivot, angle);
    turnColumns(matrix, pivot, angle);
    turnRows(basis, pivot, angle);
    for (const node of flip ?? []) flipNode(matrix, node);
  }
  const largest = Math.max(...after.values.flat().map(Math.abs));
  const gap = Math.max(
    ...after.values.flatMap((row, i) => row.map((value, j) => Math.abs(value - (matrix[i]?.[j] ?? Number.NaN)))),
  );
  return [
    atMost('C7 rotations replayed against the matrix', largest === 0 ? gap : gap / largest, REPLAY_LIMIT),
    atMost(
      'C7 orthogonality of the rotations, units of rounding',
      defectOf(basis) / (EPSILON * basis.length),
      ROUNDING_PER_ORDER,
    ),
  ];
}

function turnRows(matrix: number[][], [i, j]: readonly [number, number], angle: number): void {
  const [a, b] = [matrix[i] ?? [], matrix[j] ?? []];
  if (i === j) return;
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  for (let k = 0; k < a.length; k++)
    [a[k], b[k]] = [c * (a[k] ?? NaN) - s * (b[k] ?? NaN), s * (a[k] ?? NaN) + c * (b[k] ?? NaN)];
}

function turnColumns(matrix: number[][], [i, j]: readonly [number, number], angle: number): void {
  if (i === j) return;
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  for (const row of matrix)
    [row[i], row[j]] = [c * (row[i] ?? NaN) - s * (row[j] ?? NaN), s * (row[i] ?? NaN) + c * (row[j] ?? NaN)];
}

function flipNode(matrix: number[][], node: number): void {
  const row = matrix[node] ?? [];
  for (let k = 0; k < row.length; k++) row[k] = -(row[k] ?? NaN);
  for (const each of matrix) each[node] = -(each[node] ?? NaN);
}

/** Largest entry of Q Q^T - 1. */
function defectOf(basis: readonly (readonly number[])[]): number {
  let largest = 0;
  basis.forEach((a, i) => {
    basis.forEach((b, j) => {
      const product = a.reduce((sum, value, k) => sum + value * (b[k] ?? NaN), 0);
      largest = Math.max(largest, Math.abs(product - (i === j ? 1 : 0)));
    });
  });
  return largest;
}
