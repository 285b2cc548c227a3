import type { Certificate, CouplingMatrix } from '../forms/index.js';
import { checkMatrix } from './arguments.js';
import { matrixEnergy } from './energy.js';
import { matrixResponse } from './matrix-response.js';

/** Chebyshev points over the reach of the matrix's resonances, beside a few points each far out. */
const POINTS = 1001;
const FAR: readonly number[] = [3, 10, 100, 1000];

/**
 * Certificates of a matrix of which nothing else is known: C1, that its computed response is lossless, orthogonal and
 * reciprocal. Every resonance lies within the largest absolute row sum, which sets the span looked at. Cost O(order^3) a
 * point at 1009 points: 10 ms at order 10.
 *
 * @throws FilterFailure E_TYPE, E_NOT_FINITE, E_MATRIX_SHAPE, E_NOT_SYMMETRIC
 *
 * @example
 * const half = Math.SQRT1_2;
 * certifyMatrix({ order: 1, values: [[0, half, 0], [half, 0, half], [0, half, 0]] }).length; // 3
 */
export function certifyMatrix(matrix: CouplingMatrix): Certificate[] {
  checkMatrix('matrix', matrix, matrix?.order);
  const rowSum = (row: readonly number[]): number => row.reduce((sum, value) => sum + Math.abs(value), 0);
  const reach = Math.max(1, ...matrix.values.map(rowSum));
  const near = Array.from({ length: POINTS }, (_, k) => reach * Math.cos((Math.PI * k) / (POINTS - 1)));
  const far = FAR.flatMap((factor) => [factor * reach, -factor * reach]);
  return matrixEnergy(matrixResponse(matrix, Float64Array.from([...near, ...far])));
}
