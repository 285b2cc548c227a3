import type { CouplingMatrix } from '../forms/index.js';
import type { EliminationStep } from './elimination-step.js';
import { folded } from './folded.js';
import { type Reduced, reduce } from './reduction.js';

/**
 * Arrow form: a chain source, 1, 2, ..., N, with the load coupled to resonator N and, for nz finite zeros, to the nz nodes
 * before it.
 *
 * Normal signs: `M_S1` and `M_12 ... M_(N-1,N)` >= 0; `M_NL` takes the sign that remains. Where the matrix states its
 * `finiteZeros` the load column has exactly nz+1 entries; `leftover` is the largest one cleared, relative to the norm.
 * Synchronous designs have an exactly zero diagonal. Cost O(order^3).
 *
 * Method: the classical elimination (row r = source, 1, 2, ...: pivots [r+1, k], k = N..r+2) started from the folded form
 * instead of the transversal one. Started from a transversal matrix it is as unstable as a one-sided Lanczos recursion:
 * the rounding of that matrix alone puts 0.5 into load couplings that should be 0 (order 64, 40 dB, four zeros; see the tests). In the folded form
 * each row couples only to nodes equally far from the source; rotations among those leave every structural zero exactly 0,
 * so the rounding that remains is that of a slightly different filter of the same kind.
 *
 * @throws FilterFailure E_MATRIX_SHAPE, E_TYPE, E_NOT_FINITE, E_NOT_SYMMETRIC
 *
 * Source: H. C. Bell, Canonical asymmetric coupled-resonator filters, IEEE Trans. MTT 30(9), 1982 (from memory).
 *
 * @example
 * const response = generalizedChebyshev({ order: 3, returnLossDb: 20, transmissionZeros: [1.8] });
 * const { matrix } = arrow(transversal(response));
 * matrix.values[1][4]; // 0
 */
export function arrow(matrix: CouplingMatrix): Reduced {
  const start = folded(matrix);
  const chased = reduce(start.matrix, (order) => ({
    steps: arrowSteps(order),
    precision: 'doubled',
    structuralZeros: (finiteZeros) =>
      Array.from({ length: order }, (_, k) => [k, order + 1] as const).filter(([k]) => k < order - finiteZeros),
    positive: Array.from({ length: order }, (_, n) => ({ entry: [n, n + 1] as const, by: n + 1 })),
  }));
  return {
    matrix: chased.matrix,
    rotations: [...start.rotations, ...chased.rotations],
    leftover: Math.max(start.leftover, chased.leftover),
  };
}

function arrowSteps(order: number): readonly EliminationStep[] {
  const steps: EliminationStep[] = [];
  for (let row = 0; row < order - 1; row++) {
    for (let k = order; k > row + 1; k--) steps.push({ element: [row, k], pivot: [row + 1, k], against: row + 1 });
  }
  return steps;
}
