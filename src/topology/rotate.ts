import type { CouplingMatrix, Rotation } from '../forms/index.js';
import { refusal } from '../numerics/index.js';
import { matrixFrom, type Rows, rowsOf } from './matrix-shape.js';

/**
 * One plane rotation of a coupling matrix, `M' = R M R^T`: the response does not change.
 *
 * `rotation.pivot` = [i, j], two different resonators (1..N); `rotation.angle` in radians; `R_ii = R_jj = cos(angle)`,
 * `R_ij = -sin(angle)`, `R_ji = sin(angle)`; resonators in `rotation.flip` then change sign. Entries (i,j) and (j,i) stay
 * equal to the last bit. Cost O(order).
 *
 * @throws FilterFailure E_PIVOT, E_NOT_FINITE, E_MATRIX_SHAPE, E_TYPE, E_NOT_SYMMETRIC
 *
 * Source: R. J. Cameron, General coupling matrix synthesis methods for Chebyshev filtering functions, IEEE Trans. MTT
 * 47(4), 1999 (from memory).
 *
 * @example
 * const start = transversal(chebyshev({ order: 3, returnLossDb: 20 }));
 * const turned = rotate(start, { pivot: [1, 2], angle: 0.3 });
 * scatteringAt(turned, 0.5).s21.re - scatteringAt(start, 0.5).s21.re; // 0 within rounding
 */
export function rotate(matrix: CouplingMatrix, rotation: Rotation): CouplingMatrix {
  return applyRotations(matrix, [rotation]);
}

/**
 * Replays rotations one after the other; see `rotate`. Cost O(order) a rotation.
 *
 * @throws FilterFailure E_PIVOT, E_NOT_FINITE, E_MATRIX_SHAPE, E_TYPE, E_NOT_SYMMETRIC
 *
 * @example
 * const start = transversal(chebyshev({ order: 4, returnLossDb: 20 }));
 * const { matrix, rotations } = folded(start);
 * const replayed = applyRotations(start, rotations);
 * replayed.values[1][2] - matrix.values[1][2]; // 0 within rounding
 */
export function applyRotations(matrix: CouplingMatrix, rotations: readonly Rotation[]): CouplingMatrix {
  const rows = rowsOf(matrix);
  if (!Array.isArray(rotations))
    throw refusal('E_TYPE', 'rotations', rotations, 'an array of rotations', 'give [{ pivot: [i, j], angle }]');
  rotations.forEach((rotation, n) => {
    checkRotation(rotation, matrix.order, `rotations[${n}]`);
    turn(rows, rotation.pivot[0], rotation.pivot[1], rotation.angle);
    for (const node of rotation.flip ?? []) flip(rows, node);
  });
  return matrixFrom(rows, matrix.finiteZeros);
}

/** Pivot nodes are resonators; [i, i] is allowed only for a step that turns nothing (angle 0) and flips. */
function checkRotation(rotation: Rotation, order: number, where: string): void {
  if (typeof rotation?.angle !== 'number')
    throw refusal('E_TYPE', `${where}.angle`, rotation?.angle, 'a number of radians', 'give { pivot: [i, j], angle }');
  if (!Number.isFinite(rotation.angle))
    throw refusal('E_NOT_FINITE', `${where}.angle`, rotation.angle, 'finite radians', 'replace the angle');
  checkPivot(rotation.pivot, order, where, rotation.angle === 0);
  const flips: unknown = rotation.flip ?? [];
  if (!Array.isArray(flips))
    throw refusal('E_TYPE', `${where}.flip`, flips, 'an array of resonators', 'leave flip out, or give [i]');
  for (const node of flips) checkResonator(node, order, `${where}.flip`);
}

/** @throws FilterFailure E_PIVOT unless the pivot names two different resonators. */
export function checkPivot(pivot: readonly [number, number], order: number, where: string, mayCoincide = false): void {
  if (!Array.isArray(pivot) || pivot.length !== 2)
    throw refusal('E_TYPE', `${where}.pivot`, pivot, 'a pair [i, j]', 'name two resonators');
  checkResonator(pivot[0], order, `${where}.pivot[0]`);
  checkResonator(pivot[1], order, `${where}.pivot[1]`);
  if (pivot[0] === pivot[1] && !mayCoincide) {
    throw refusal(
      'E_PIVOT',
      `${where}.pivot`,
      `[${pivot[0]}, ${pivot[1]}]`,
      'two different resonators',
      'change one of the two',
    );
  }
}

function checkResonator(node: number, order: number, where: string): void {
  if (Number.isInteger(node) && node >= 1 && node <= order) return;
  const what = node === 0 ? '0 (the source)' : node === order + 1 ? `${node} (the load)` : node;
  throw refusal(
    'E_PIVOT',
    where,
    what,
    `resonators 1..${order}`,
    'leave source and load alone: turning a port changes the response',
  );
}

/** `M <- R M R^T` in place, on both triangles. */
export function turn(rows: Rows, i: number, j: number, angle: number): void {
  if (angle === 0 || i === j) return;
  const c = Math.cos(angle);
  const s = Math.sin(angle);
  const rowI = rows[i] as Float64Array;
  const rowJ = rows[j] as Float64Array;
  const ii = rowI[i] as number;
  const ij = rowI[j] as number;
  const jj = rowJ[j] as number;
  for (let k = 0; k < rows.length; k++) {
    const a = rowI[k] as number;
    const b = rowJ[k] as number;
    const row = rows[k] as Float64Array;
    rowI[k] = row[i] = c * a - s * b;
    rowJ[k] = row[j] = s * a + c * b;
  }
  rowI[i] = c * c * ii - 2 * c * s * ij + s * s * jj;
  rowJ[j] = s * s * ii + 2 * c * s * ij + c * c * jj;
  rowI[j] = rowJ[i] = (c - s) * (c + s) * ij + c * s * (ii - jj);
}

/** Changes the sign of a resonator's row and column. */
export function flip(rows: Rows, node: number): void {
  const row = rows[node] as Float64Array;
  for (let k = 0; k < rows.length; k++) {
    if (k !== node) row[k] = (rows[k] as Float64Array)[node] = -(row[k] as number);
  }
}
