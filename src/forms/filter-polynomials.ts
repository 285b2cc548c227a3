import type { Complex } from '../numerics/index.js';

/**
 * A root whose imaginary part may be known beyond a double: `im + imRest` is the value, `im` its rounding, `imRest` 0 when
 * absent. Close to the band edge poles lie so near the axis that half an ulp of `im` is the largest error of a response.
 */
export interface FineRoot extends Complex {
  readonly imRest?: number;
}

/** Which law a transfer function obeys, and so which certificates apply; `lossless` = none but losslessness. */
export type Family = 'generalizedChebyshev' | 'butterworth' | 'inverseChebyshev' | 'elliptic' | 'bessel' | 'lossless';

/**
 * A lossless reciprocal two-port response in product form, low-pass prototype variable s = j*omega.
 *
 * `S21 = P/(epsilon*E)`, `S11 = F/(epsilonR*E)`; E and F are monic with the roots `poles` and
 * `reflectionZeros`; P has the roots `transmissionZeros` (finite ones only) and the leading coefficient
 * `transmissionLead`, which is +-1 or +-j.
 */
export interface FilterPolynomials {
  readonly family: Family;
  readonly order: number;
  readonly poles: readonly FineRoot[];
  readonly reflectionZeros: readonly FineRoot[];
  readonly transmissionZeros: readonly Complex[];
  readonly transmissionLead: Complex;
  readonly epsilon: number;
  readonly epsilonR: number;
  /** Return-loss level of the equiripple band, or of the edges of a flat one, dB; absent where the family has none. */
  readonly returnLossDb?: number;
  /** Rejection at the ripple peaks of the stop band, dB; absent where the family has none. */
  readonly rejectionDb?: number;
  /** Normalized frequency from which on the stop band keeps its rejection. */
  readonly stopBandEdge?: number;
  /** What the frequency scale of a flat-delay response is set by: half power at omega = 1, or the delay 1 at omega = 0. */
  readonly edge?: 'halfPower' | 'unitDelay';
}
