import type { PolynomialCoefficients } from '../approximation/index.js';
import type { HandOver } from '../bandpass/index.js';
import type { Certificate, CouplingMatrix, FilterPolynomials, MaskRow, Rotation } from '../forms/index.js';
import type { Specification } from '../specification/index.js';

/** What this room needs of a design; the whole result of `design` is one. */
export interface DesignReport {
  readonly version: string;
  readonly specification: Specification;
  readonly polynomials: FilterPolynomials;
  readonly coefficients: PolynomialCoefficients;
  readonly matrix: CouplingMatrix;
  readonly rotations: readonly Rotation[];
  readonly handOver: HandOver;
  readonly mask: readonly MaskRow[];
  readonly certificates: readonly Certificate[];
}
