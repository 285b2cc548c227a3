/** Certification: what a synthesized filter proves about itself, from the returned numbers alone.
 *  Takes    FilterPolynomials, CouplingMatrix; optionally the matrix before a rotation, the leftover clamped to 0, the stated structure, the zeros asked for
 *  Gives    Certificate[]: check, value, limit, holds; checks that do not apply are left out
 *  Refuses  E_TYPE, E_NOT_FINITE, E_MATRIX_SHAPE, E_NOT_SYMMETRIC (a wrong result is no refusal: it comes back with holds = false)
 *  Source   B. T. Smith, Error bounds for zeros of a polynomial based upon Gerschgorin's theorems, J. ACM 17(4), 1970 (root disks; from memory); the other checks are identities derived in their files */
export { certify } from './certify.js';
export { certifyMatrix } from './certify-matrix.js';
export type { CertificationContext, Structure } from './context.js';
