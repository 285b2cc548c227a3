/** Response: scattering parameters and group delay of polynomials and coupling matrices.
 *  Takes    FilterPolynomials or CouplingMatrix, normalized frequencies, loss
 *  Gives    S11, S21, S12, S22 and the group delay of S21, at one frequency or over a grid
 *  Refuses  E_TYPE, E_NOT_FINITE, E_LOSS, E_MATRIX_SHAPE, E_NOT_SYMMETRIC, E_SINGULAR
 *  Source   R. J. Cameron, Advanced coupling matrix synthesis techniques for microwave filters, IEEE Trans. MTT 51(1), 2003 (from memory) */
export type { ComplexSamples, Curves } from './curves.js';
export type { Landmark } from './landmarks.js';
export { landmarks } from './landmarks.js';
export type { Model } from './model.js';
export { checkFrequencies, isMatrix } from './model.js';
export { scatteringAt } from './scattering-at.js';
export type { Sweep, SweepOptions } from './sweep.js';
export { sweep, sweeper } from './sweep.js';
