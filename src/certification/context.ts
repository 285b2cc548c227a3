import type { Complex, CouplingMatrix, Rotation } from '../forms/index.js';

/** The forms of a coupling matrix whose zeros can be certified. */
export type Structure = 'folded' | 'arrow' | 'inline' | 'transversal';

/** What else is known about a result; each field adds the checks that need it. */
export interface CertificationContext {
  /** The matrix that was rotated into this one: eigenvalues, Markov numbers and port entries must be kept. */
  readonly before?: CouplingMatrix;
  /** The rotations that lead from `before` to this matrix; looked at only together with it. */
  readonly rotations?: readonly Rotation[];
  /** Largest entry that was set to 0 at the end of a rotation, relative to the norm. */
  readonly leftover?: number;
  /** The structure that the matrix claims: entries outside it must be exactly 0. */
  readonly structure?: Structure;
  /** The finite transmission zeros that were asked for, s-plane, in any order, as often as they were asked for. */
  readonly askedZeros?: readonly Complex[];
}
