/** Bandpass: from the normalized prototype to hertz, seconds and hardware numbers, and against a mask.
 *  Takes    FilterPolynomials or CouplingMatrix, center and width in hertz, unloaded Q, mask lines
 *  Gives    sweeps in hertz, hand-over numbers (f_i, k, Qe, reflected delay), one verdict row a mask line
 *  Refuses  E_BAND, E_Q_RANGE, E_FREQUENCY, E_MASK and what the response room refuses
 *  Source   R. J. Cameron, C. M. Kudsia, R. R. Mansour, Microwave Filters for Communication Systems, 2007 (from memory) */
export type { LossyBand } from './band.js';
export type { CouplingRow, HandOver, PortCouplingRow, PortPair, ResonatorRow } from './denormalize.js';
export { denormalize } from './denormalize.js';
export { evaluateMask } from './evaluate-mask.js';
export { decibels } from './quantities.js';
export type { SweepHz } from './sweep-hz.js';
export { sweepHz } from './sweep-hz.js';
