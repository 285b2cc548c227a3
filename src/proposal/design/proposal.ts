import type { Band, MaskLine, MaskRow } from '../../forms/index.js';

/** What a design costs at one place of the mask. */
export interface MaskCost {
  /** Index of the mask line. */
  readonly line: number;
  readonly hz: number;
  /** Decibels of margin lost for each decibel that the line rises there; all of a design add up to 1. */
  readonly weight: number;
}

/** The best margin of a smaller design, dB beyond what is wanted: negative where it misses. */
export interface SmallerDesign {
  readonly order: number;
  readonly zeroCount: number;
  readonly marginDb: number;
}

/** A design that meets the whole mask. */
export interface ProposedDesign {
  readonly order: number;
  /** Normalized, ascending. */
  readonly transmissionZeros: readonly number[];
  /** Zeros in pairs +-w. */
  readonly symmetric: boolean;
  /** Smallest margin over all rejection lines, dB, loss included. */
  readonly marginDb: number;
  /** Lossless: no placement of as many zeros at this order (in pairs, where symmetric) has a margin above `highestDb`. */
  readonly lossless: { readonly lowestDb: number; readonly highestDb: number };
  /** With loss, a local certificate: first-order gain, dB, that a small move of all zeros still promises. */
  readonly promisedDb?: number;
  readonly mask: readonly MaskRow[];
  readonly insertionLossDb: { readonly center: number; readonly lowerEdge: number; readonly upperEdge: number };
  /** Peak to peak over the passband. */
  readonly groupDelayVariationSeconds: number;
  /** Dearest first. */
  readonly costs: readonly MaskCost[];
  /** One zero fewer, and one resonator fewer. */
  readonly smaller: readonly SmallerDesign[];
  readonly remarks: readonly string[];
}

/** A design that was looked at and left out, with the reason in words. */
export interface ExcludedDesign {
  readonly order: number;
  readonly zeroCount: number;
  readonly reason: string;
}

/** What `propose` found. */
export interface Proposal {
  readonly band: Band;
  readonly returnLossDb: number;
  readonly unloadedQ?: number;
  /** The lines that were judged: those given, widened by the drift. */
  readonly mask: readonly MaskLine[];
  /** By order, number of zeros, margin; never empty. */
  readonly designs: readonly ProposedDesign[];
  readonly excluded: readonly ExcludedDesign[];
  readonly remarks: readonly string[];
}
