import type { CouplingMatrix } from '../forms/index.js';
import type { EliminationStep } from './elimination-step.js';
import { type Reduced, reduce } from './reduction.js';

/**
 * Folded form: two rows of resonators, 1..N from the source and back to the load, with couplings across.
 *
 * Reached by N(N-1)/2 rotations: the row of the source from right to left, the column of the load from top to bottom, the
 * next row, the next column, outside in. Normal signs: `M_12 ... M_(N-1,N)` and `M_NL` >= 0. A response with nz finite
 * zeros keeps only the nz innermost cross-couplings; where the matrix states its `finiteZeros` the others are exactly 0,
 * and `leftover` is the largest of them before they were cleared, relative to the norm. Synchronous designs have an exactly
 * zero diagonal. `rotations` replay with `applyRotations`; a last step with angle 0 and `flip` holds the choice of signs.
 * Cost O(order^3): see the README's table of times.
 *
 * @throws FilterFailure E_MATRIX_SHAPE, E_TYPE, E_NOT_FINITE, E_NOT_SYMMETRIC
 *
 * Sources: J. D. Rhodes, A low-pass prototype network for microwave linear phase filters, IEEE Trans. MTT 18(6), 1970;
 * R. J. Cameron, General coupling matrix synthesis methods for Chebyshev filtering functions, IEEE Trans. MTT 47(4), 1999
 * (both from memory).
 *
 * @example
 * const response = generalizedChebyshev({ order: 4, returnLossDb: 22, transmissionZeros: [1.3217, 1.8082] });
 * const { matrix } = folded(transversal(response));
 * matrix.values[0][3]; // 0
 */
export function folded(matrix: CouplingMatrix): Reduced {
  return reduce(matrix, (order) => ({
    steps: foldedSteps(order),
    precision: 'corrected',
    structuralZeros: (finiteZeros) => crossEntries(order).filter((_, resonators) => resonators < order - finiteZeros),
    positive: Array.from({ length: order }, (_, n) => ({ entry: [order - n, order - n + 1] as const, by: order - n })),
  }));
}

function foldedSteps(order: number): readonly EliminationStep[] {
  const steps: EliminationStep[] = [];
  for (let first = 1, last = order; first < last; first++, last--) {
    for (let k = last; k > first; k--) steps.push({ element: [first - 1, k], pivot: [k - 1, k], against: first });
    for (let k = first + 1; k < last; k++) steps.push({ element: [last + 1, k], pivot: [k, k + 1], against: last });
  }
  return steps;
}

/**
 * The entries across the fold from the outermost inward, (S,L), (1,L), (1,N), (2,N), ...: entry number n closes a path of
 * n resonators from source to load, so with nz finite zeros those with n < N - nz must be 0 (minimum-path rule).
 */
function crossEntries(order: number): readonly (readonly [number, number])[] {
  const entries: (readonly [number, number])[] = [];
  let row = 0;
  let column = order + 1;
  while (column - row > 1) {
    entries.push([row, column]);
    if (entries.length % 2 === 1) row++;
    else column--;
  }
  return entries;
}
