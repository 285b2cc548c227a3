import type { Certificate, CouplingMatrix } from '../forms/index.js';
import type { Structure } from './context.js';
import { atMost } from './verdict.js';

/** Largest entry, relative to the norm, that a chain of rotations may leave where the structure wants 0. */
const LEFTOVER_LIMIT = 1e-10;

/** C8: every entry that the stated structure forbids is exactly 0, ports' own entries included. */
export function structuralZeros(matrix: CouplingMatrix, structure: Structure, finiteZeros: number): Certificate {
  let largest = 0;
  for (let i = 0; i < matrix.order + 2; i++) {
    for (let j = i; j < matrix.order + 2; j++) {
      if (mayCouple(structure, matrix.order, finiteZeros, i, j)) continue;
      largest = Math.max(largest, Math.abs(matrix.values[i]?.[j] ?? Number.NaN));
    }
  }
  return atMost(`C8 largest entry outside the ${structure} structure`, largest, 0);
}

/** C8: what was there before it was set to 0, relative to the norm of the matrix, as told by the caller. */
export function leftoverBelow(leftover: number): Certificate {
  return atMost('C8 largest entry set to 0, relative to the norm', Math.abs(leftover), LEFTOVER_LIMIT);
}

/**
 * Whether nodes i <= j may be coupled.
 *
 * Arrow: row after row is cleared, so a line from source to resonator N remains, and the load column; a path through
 * k resonators allows N-k finite zeros, which leaves the load couplings of the last `finiteZeros + 1` nodes before it.
 * Folded: rows and columns are cleared in turn from outside in, which leaves the line S-1-..-N-L and the entries with
 * i + j = N+1 or N+2; of these the ones that shorten the path to no less than N - finiteZeros resonators.
 */
function mayCouple(structure: Structure, order: number, finiteZeros: number, i: number, j: number): boolean {
  const load = order + 1;
  if (i === j) return i > 0 && i < load;
  const onLine = j === i + 1;
  switch (structure) {
    case 'inline':
      return onLine;
    case 'arrow':
      return onLine || (j === load && i >= order - finiteZeros);
    case 'folded':
      return onLine || ((i + j === load || i + j === load + 1) && j - i - 1 <= finiteZeros);
    case 'transversal':
      return i === 0 && j === load ? finiteZeros >= order : i === 0 || j === load;
  }
}
