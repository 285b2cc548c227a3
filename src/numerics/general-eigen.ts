import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import type { Complex } from './complex-type.js';

/** Eigenvalues of a real square matrix of finite numbers, in no particular order. From ml-matrix; no balancing. */
export function generalEigenvalues(rows: readonly (readonly number[])[]): readonly Complex[] {
  const decomposition = new EigenvalueDecomposition(new Matrix(rows.map((row) => [...row])));
  return decomposition.realEigenvalues.map((re, k) => ({ re, im: decomposition.imaginaryEigenvalues[k] ?? 0 }));
}
