import { type CouplingMatrix, checkPolynomials, type FilterPolynomials } from '../forms/index.js';
import { refusal } from '../numerics/index.js';

/** Anything with a response: a transfer function in product form or a coupling matrix. */
export type Model = FilterPolynomials | CouplingMatrix;

/** Tells a matrix from polynomials. @throws FilterFailure E_TYPE, and for polynomials what `checkPolynomials` refuses */
export function isMatrix(model: Model): model is CouplingMatrix {
  if (typeof model !== 'object' || model === null || !('values' in model || 'poles' in model)) {
    throw refusal(
      'E_TYPE',
      'model',
      model,
      'filter polynomials or a coupling matrix',
      'pass what a family function or a synthesis function returned',
    );
  }
  if ('values' in model) return true;
  checkPolynomials(model);
  return false;
}

/** Most frequencies of one sweep: 80 MB a curve. */
const LONGEST_GRID = 1e7;

/** A copy of a grid, checked. @throws FilterFailure E_TYPE, E_NOT_FINITE */
export function checkFrequencies(omega: ArrayLike<number>, name: string): Float64Array {
  if (typeof omega !== 'object' || omega === null || !(omega.length >= 0 && omega.length <= LONGEST_GRID)) {
    throw refusal('E_TYPE', name, omega, 'an array of at most 1e7 numbers', 'give an array, also for one frequency');
  }
  const grid = new Float64Array(omega.length);
  for (let n = 0; n < grid.length; n++) {
    const value = omega[n];
    // The name of the entry is spelled out only for a faulty one: this loop is part of every sweep.
    grid[n] = typeof value === 'number' && Number.isFinite(value) ? value : checkFrequency(value, `${name}[${n}]`);
  }
  return grid;
}

/** @throws FilterFailure E_TYPE, E_NOT_FINITE */
export function checkFrequency(omega: unknown, name: string): number {
  if (typeof omega !== 'number') throw refusal('E_TYPE', name, omega, 'numbers only', 'replace the entry by a number');
  if (!Number.isFinite(omega)) throw refusal('E_NOT_FINITE', name, omega, 'finite numbers', 'replace the entry');
  return omega;
}

/** Loss `f0/(B*Qu)`: one number, or one a resonator. @throws FilterFailure E_TYPE, E_NOT_FINITE, E_LOSS */
export function checkLoss(loss: number | ArrayLike<number> | undefined, order: number): number | Float64Array {
  if (loss === undefined) return 0;
  if (typeof loss === 'number') return checkOneLoss(loss, 'loss');
  if (typeof loss !== 'object' || loss === null || loss.length !== order) {
    throw refusal(
      'E_LOSS',
      'loss',
      loss?.length === undefined ? loss : `${loss.length} values`,
      `a number or ${order} numbers, one a resonator`,
      'match the order',
    );
  }
  const values = Float64Array.from({ length: order }, (_, n) => checkOneLoss(loss[n], `loss[${n}]`));
  return values.every((value) => value === values[0]) ? (values[0] as number) : values;
}

function checkOneLoss(given: unknown, name: string): number {
  const value = checkFrequency(given, name);
  if (value < 0) throw refusal('E_LOSS', name, value, 'numbers >= 0', 'drop the sign: loss is f0/(B*Qu)');
  return value;
}
