/** Topology: coupling matrices by plane rotations, the response unchanged.
 *  Takes    CouplingMatrix, pivots, angles, entries to annihilate
 *  Gives    rotated matrices, folded and arrow forms with the rotations that led there and what was left over
 *  Refuses  E_MATRIX_SHAPE, E_TYPE, E_NOT_FINITE, E_NOT_SYMMETRIC, E_PIVOT, E_ELEMENT
 *  Source   R. J. Cameron, Advanced coupling matrix synthesis techniques for microwave filters, IEEE Trans. MTT 51(1), 2003 (from memory) */
export type { Annihilation } from './annihilate.js';
export { annihilate } from './annihilate.js';
export { arrow } from './arrow.js';
export { folded } from './folded.js';
export { rowsOf } from './matrix-shape.js';
export type { Reduced } from './reduction.js';
export { applyRotations, rotate } from './rotate.js';
export type { RotationRequest, RotationTrace, TraceStep } from './trace.js';
export { traceRotations } from './trace.js';
