/** Synthesis: from a transfer function in product form to a coupling matrix.
 *  Takes    FilterPolynomials of any lossless reciprocal response, S11 = S22 or not
 *  Gives    CouplingMatrix, (N+2) x (N+2), transversal form, complex S11, S21 and S22 equal to those of the polynomials
 *  Refuses  E_NOT_HURWITZ, E_NOT_RECIPROCAL, E_NOT_LOSSLESS, E_ILL_CONDITIONED, and what is no set of polynomials
 *  Source   R. J. Cameron, Advanced coupling matrix synthesis techniques for microwave filters, IEEE Trans. MTT 51(1), 2003 (the form; from memory); F. T. Smith, Lifetime matrix in collision theory, Phys. Rev. 118, 1960 (monotone eigenphases; from memory) */
export { transversal } from './transversal.js';
