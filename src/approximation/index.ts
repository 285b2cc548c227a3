/** Approximation: from order, return loss and transmission zeros to a transfer function in product form.
 *  Takes    order, return loss in dB, transmission zeros (normalized), rejection in dB or edge of a stop band
 *  Gives    FilterPolynomials: poles, reflection zeros, transmission zeros, ripple constants; elements of ladders, their in-line matrix
 *  Refuses  E_ORDER_RANGE, E_RL_RANGE, E_REJECTION_RANGE, E_STOP_BAND, E_RIPPLE_RANGE, E_CHOICE, E_ELEMENT, E_NOT_RECIPROCAL,
 *           E_ZERO_COUNT, E_ZERO_IN_PASSBAND, E_ZERO_ON_EDGE, E_ZERO_PAIR, E_ZERO_RANGE,
 *           E_NOT_HURWITZ, E_NOT_LOSSLESS, E_ILL_CONDITIONED, E_LOSS for given roots, coefficients and loss
 *  Source   R. J. Cameron, General coupling matrix synthesis methods for Chebyshev filtering functions, IEEE Trans. MTT 47(4), 1999 (from memory) */
export { approximate, zerosAskedFor } from './approximate.js';
export { bandstop } from './bandstop.js';
export type { BesselRequest } from './bessel/bessel.js';
export { bessel } from './bessel/bessel.js';
export { butterworth } from './butterworth.js';
export type { PolynomialCoefficients } from './coefficients.js';
export { coefficients } from './coefficients.js';
export type { EllipticRequest } from './elliptic/elliptic.js';
export { elliptic } from './elliptic/elliptic.js';
export type { GeneralizedChebyshevRequest, TransmissionZero } from './generalized-chebyshev.js';
export { chebyshev, generalizedChebyshev } from './generalized-chebyshev.js';
export type { CoefficientsRequest } from './given/from-coefficients.js';
export { responseFromCoefficients } from './given/from-coefficients.js';
export type { MagnitudeRequest } from './given/from-magnitude.js';
export { responseFromMagnitude } from './given/from-magnitude.js';
export type { GivenResponse, Moves, RootsRequest } from './given/from-roots.js';
export { responseFromRoots } from './given/from-roots.js';
export type { ReflectionSides } from './given/sides.js';
export type { SquarePolynomial } from './given/square-polynomial.js';
export { inlineMatrix } from './inline-matrix.js';
export type { InverseChebyshevRequest } from './inverse-chebyshev.js';
export { inverseChebyshev } from './inverse-chebyshev.js';
export type { Predistortion, PredistortionRequest } from './predistortion/predistort.js';
export { predistort } from './predistortion/predistort.js';
export type { PrototypeElements, PrototypeRequest } from './prototype-elements.js';
export { prototypeElements } from './prototype-elements.js';
