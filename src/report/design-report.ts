import type { HandOver } from '../bandpass/index.js';
import type { Certificate, CouplingMatrix, MaskRow } from '../forms/index.js';
import type { Specification } from '../specification/index.js';

/** What this room needs of a design; the whole result of `design` is one. */
export interface DesignReport {
  readonly version: string;
  readonly specification: Specification;
  readonly matrix: CouplingMatrix;
  readonly handOver: HandOver;
  readonly mask: readonly MaskRow[];
  readonly certificates: readonly Certificate[];
}
