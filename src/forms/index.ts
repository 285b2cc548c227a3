/** Forms: the nouns that every other room speaks, as plain readonly data, and the maps between hertz and omega.
 *  Takes    plain values
 *  Gives    Complex, FilterPolynomials, CouplingMatrix, Rotation, Scattering, Certificate, mask lines, Band and its maps
 *  Refuses  E_TYPE, E_NOT_FINITE, E_POLYNOMIALS for polynomials that are none, E_BAND, E_FREQUENCY; rooms check the rest themselves
 *  Source   R. J. Cameron, Advanced coupling matrix synthesis techniques for microwave filters, IEEE Trans. MTT 51(1), 2003 (the (N+2) matrix; from memory) */

export type { Complex } from '../numerics/index.js';
export type { Certificate } from './certificate.js';
export { checkPolynomials } from './check-polynomials.js';
export type { CouplingMatrix, Rotation } from './coupling-matrix.js';
export type { Family, FilterPolynomials, FineRoot } from './filter-polynomials.js';
export type { Band } from './frequency-map.js';
export { bandFromEdges, edgesOfBand, hzFromOmega, omegaFromHz } from './frequency-map.js';
export type { Level, MaskLine, MaskRow, Span } from './mask.js';
export type { Scattering } from './scattering.js';
