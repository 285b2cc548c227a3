/** Numerics: arithmetic that knows no trade word.
 *  Takes    numbers, plain complex numbers, arrays of doubles
 *  Gives    complex arithmetic, monotone roots, doubled-precision sums and products, complex solves, symmetric eigenvalues, the failure class
 *  Refuses  through FilterFailure only
 *  Source   T. J. Dekker, A floating-point technique for extending the available precision, Numer. Math. 18, 1971 (from memory) */
export {
  add,
  complex,
  conjugate,
  divide,
  logarithm,
  magnitude,
  multiply,
  powerOfJ,
  scale,
  squareRoot,
  subtract,
} from './complex.js';
export type { ComplexRows } from './complex-eigen.js';
export { complexEigenvalues } from './complex-eigen.js';
export type { ComplexVector, ShiftedMatrix } from './complex-solve.js';
export { inverseColumns } from './complex-solve.js';
export type { Complex } from './complex-type.js';
export type { Doubled } from './doubled.js';
export { doubledAdd, doubledDivide, doubledDot, doubledMultiply, doubledSquareRoot } from './doubled.js';
export type { DoubledProduct } from './doubled-product.js';
export { doubledProduct, sumRest, timesConstant, timesLinear, timesPowerOfTwo } from './doubled-product.js';
export type { FailureDetail } from './failure.js';
export { FilterFailure, refusal } from './failure.js';
export { EPS } from './limits.js';
export { localMinimum } from './local-minimum.js';
export type { RisingFunction } from './monotone-root.js';
export { monotoneRoot } from './monotone-root.js';
export { coefficientsFromRoots } from './polynomial.js';
export type { PolynomialRoot } from './polynomial-roots.js';
export { polynomialRoots } from './polynomial-roots.js';
export type { SymmetricEigen } from './symmetric-eigen.js';
export { symmetricEigen } from './symmetric-eigen.js';
