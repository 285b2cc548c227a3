import type { CouplingMatrix, Rotation } from '../forms/index.js';
import { refusal } from '../numerics/index.js';
import { matrixFrom, type Rows, rowsOf } from './matrix-shape.js';
import { checkPivot, turn } from './rotate.js';

/** Which entry to annihilate by a rotation of which pair of resonators. */
export interface Annihilation {
  readonly pivot: readonly [number, number];
  readonly element: readonly [number, number];
}

/**
 * The rotation of `pivot` that makes `element` zero, and the matrix after it.
 *
 * The element either shares exactly one index with the pivot (angle in (-pi/2, pi/2]) or is the pivot itself (angle in
 * (-pi/4, pi/4]); its other index may be a port. Where both entries involved are 0 the angle is 0. The annihilated entry of
 * the returned matrix is exactly 0.
 *
 * @throws FilterFailure E_PIVOT, E_ELEMENT, E_MATRIX_SHAPE, E_TYPE, E_NOT_FINITE, E_NOT_SYMMETRIC
 *
 * Source: R. J. Cameron, Advanced coupling matrix synthesis techniques for microwave filters, IEEE Trans. MTT 51(1), 2003
 * (from memory).
 *
 * @example
 * const start = transversal(chebyshev({ order: 3, returnLossDb: 20 }));
 * const { matrix, rotation } = annihilate(start, { pivot: [2, 3], element: [0, 3] });
 * matrix.values[0][3]; // 0
 */
export function annihilate(
  matrix: CouplingMatrix,
  request: Annihilation,
): { readonly matrix: CouplingMatrix; readonly rotation: Rotation } {
  const rows = rowsOf(matrix);
  checkPivot(request?.pivot, matrix.order, 'annihilate');
  const angle = annihilationAngle(rows, request.pivot, request.element);
  const rotation: Rotation = { pivot: [request.pivot[0], request.pivot[1]], angle };
  clear(rows, rotation, request.element);
  return { matrix: matrixFrom(rows, matrix.finiteZeros), rotation };
}

/** Turns in place and writes the annihilated entry as exact 0. */
export function clear(rows: Rows, rotation: Rotation, element: readonly [number, number]): void {
  turn(rows, rotation.pivot[0], rotation.pivot[1], rotation.angle);
  (rows[element[0]] as Float64Array)[element[1]] = 0;
  (rows[element[1]] as Float64Array)[element[0]] = 0;
}

/** Angle in the principal range that annihilates an entry. */
export function annihilationAngle(
  rows: Rows,
  [i, j]: readonly [number, number],
  element: readonly [number, number],
): number {
  const [k, l] = orderedElement(rows, element, i, j);
  const value = (a: number, b: number): number => (rows[a] as Float64Array)[b] as number;
  if (l === undefined) return halfTurn(2 * value(i, j), value(j, j) - value(i, i)) / 2;
  return k === i ? halfTurn(value(i, l), value(j, l)) : halfTurn(-value(j, l), value(i, l));
}

/** The element as [shared pivot node, other node]; [i] alone when it is the pivot. */
function orderedElement(
  rows: Rows,
  element: readonly [number, number],
  i: number,
  j: number,
): readonly [number, number?] {
  if (!Array.isArray(element) || element.length !== 2)
    throw refusal('E_TYPE', 'element', element, 'a pair [k, l]', 'name one entry of the matrix');
  const [k, l] = element;
  const inside = (node: number): boolean => Number.isInteger(node) && node >= 0 && node < rows.length;
  if (inside(k) && inside(l)) {
    if ((k === i && l === j) || (k === j && l === i)) return [i];
    const kShared = k === i || k === j;
    const lShared = l === i || l === j;
    if (kShared && !lShared) return [k, l];
    if (lShared && !kShared) return [l, k];
  }
  throw refusal(
    'E_ELEMENT',
    'element',
    `(${k},${l})`,
    `the pivot (${i},${j}) itself or an entry that shares exactly one index with it`,
    'choose another entry or another pivot',
  );
}

/** `atan(y/x)` in (-pi/2, pi/2]; 0 when both are 0. */
function halfTurn(y: number, x: number): number {
  if (y === 0) return 0;
  if (x === 0) return Math.PI / 2;
  const angle = Math.atan(y / x);
  return angle === -Math.PI / 2 ? Math.PI / 2 : angle;
}
