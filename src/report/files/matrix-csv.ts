import type { CouplingMatrix } from '../../forms/index.js';
import { checkMatrix } from '../check-design.js';
import { nodeNames } from '../words/nodes.js';
import { csvText } from './csv.js';

/**
 * The whole coupling matrix as CSV: a head row and a head column with S, 1..N, L; numbers with 12 significant digits.
 *
 * @example
 * const { matrix } = folded(transversal(chebyshev({ order: 2, returnLossDb: 20 })));
 * matrixCsv(matrix).split('\r\n')[0]; // 'node,S,1,2,L'
 */
export function matrixCsv(given: CouplingMatrix): string {
  const matrix = checkMatrix(given);
  const names = nodeNames(matrix.order);
  return csvText([['node', ...names], ...matrix.values.map((row, node) => [names[node] ?? '', ...row])]);
}
