/** Synthesis: from a transfer function in product form to a coupling matrix.
 *  Takes    FilterPolynomials with S11 = S22 (reflection zeros on the imaginary axis)
 *  Gives    CouplingMatrix, (N+2) x (N+2), transversal form, complex S equal to that of the polynomials
 *  Refuses  E_NOT_SYMMETRIC_RESPONSE
 *  Source   R. J. Cameron, Advanced coupling matrix synthesis techniques for microwave filters, IEEE Trans. MTT 51(1), 2003 (from memory) */
export { transversal } from './transversal.js';
