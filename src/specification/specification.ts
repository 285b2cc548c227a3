import type { Band, Complex, MaskLine } from '../forms/index.js';

/** Families that a specification can ask for; `chebyshev` is the all-pole one. */
export type SpecificationFamily =
  | 'generalizedChebyshev'
  | 'chebyshev'
  | 'butterworth'
  | 'inverseChebyshev'
  | 'elliptic'
  | 'bessel';

/** In which half plane the reflection zeros of a flat-delay response lie. */
export type ReflectionSide = 'left' | 'right' | 'alternating';

/** Forms of the coupling matrix that a specification can ask for. */
export type Topology = 'folded' | 'arrow' | 'inline' | 'transversal';

/**
 * What the ports may touch: `any` = what the zeros need, `noDirect` = no direct source-load coupling (at most N-1 zeros),
 * `single` = source and load touch one resonator each (at most N-2 zeros).
 */
export type PortCouplings = 'any' | 'noDirect' | 'single';

/** Frequencies for the predicted response, hertz, evenly spaced, both ends included. */
export interface SweepRange {
  readonly fromHz: number;
  readonly toHz: number;
  readonly points: number;
}

/** A checked specification: every default filled in, every frequency in hertz, every zero in the s-plane; deep-frozen. */
export interface Specification {
  readonly name?: string;
  readonly notes?: string;
  readonly revision?: string;
  /** Calendar date, YYYY-MM-DD. */
  readonly date?: string;
  /** Geometric center and width (equiripple, or half-power for `butterworth` and `bessel`). */
  readonly band: Band;
  readonly order: number;
  readonly family: SpecificationFamily;
  /** dB, positive; absent for `butterworth` and `bessel` only. */
  readonly returnLossDb?: number;
  /** Rejection of the stop band, dB: `inverseChebyshev`, and `elliptic` unless its edge is given. */
  readonly rejectionDb?: number;
  /** Normalized edge of the stop band: `elliptic` only. */
  readonly stopBandEdge?: number;
  /** Even orders of `elliptic`: the largest pair of transmission zeros lies at infinity. */
  readonly largestPairAtInfinity?: boolean;
  /** `bessel` only. */
  readonly reflectionSide?: ReflectionSide;
  /** Finite zeros, s-plane, normalized; those of families that place their own are filled in by the design. */
  readonly transmissionZeros: readonly Complex[];
  readonly topology: Topology;
  readonly portCouplings: PortCouplings;
  /** One value for all resonators, or one each. */
  readonly unloadedQ?: number | readonly number[];
  readonly mask: readonly MaskLine[];
  readonly sweep?: SweepRange;
  /** What was adjusted while reading, and what deserves a look. */
  readonly remarks: readonly string[];
}

/** A frequency as written: a number of hertz, or text with a unit such as `"3822 MHz"`. */
export type FrequencyInput = number | string;

/** A transmission zero as written: w (the zero s = jw), a point of the s-plane, or a band-pass frequency as text. */
export type ZeroInput = number | string | { readonly re: number; readonly im: number };

/** The passband as written: both edges, or center and width. */
export interface PassbandInput {
  readonly lowerHz?: FrequencyInput | undefined;
  readonly upperHz?: FrequencyInput | undefined;
  readonly centerHz?: FrequencyInput | undefined;
  readonly bandwidthHz?: FrequencyInput | undefined;
}

/** A level of a mask line as written: one value, or [at fromHz, at toHz]. */
export type LevelInput = number | readonly [number, number];

/** A mask line as written: a span, and exactly one level. */
export interface MaskLineInput {
  readonly fromHz?: FrequencyInput | undefined;
  readonly toHz?: FrequencyInput | undefined;
  readonly relativeTo?: 'center' | undefined;
  readonly rejectionDb?: LevelInput | undefined;
  readonly returnLossDb?: LevelInput | undefined;
  readonly insertionLossDb?: LevelInput | undefined;
  readonly insertionLossVariationDb?: number | undefined;
  readonly groupDelayVariationSeconds?: number | undefined;
}

/** A sweep as written. */
export interface SweepInput {
  readonly fromHz: FrequencyInput;
  readonly toHz: FrequencyInput;
  readonly points: number;
}

/** What a caller or a design file writes. */
export interface SpecificationInput {
  readonly name?: string | undefined;
  readonly notes?: string | undefined;
  readonly revision?: string | undefined;
  readonly date?: string | undefined;
  /** For editors; not read. */
  readonly $schema?: string | undefined;
  readonly passband: PassbandInput;
  readonly family?: SpecificationFamily | undefined;
  readonly order: number;
  readonly returnLossDb?: number | undefined;
  readonly rejectionDb?: number | undefined;
  readonly stopBandEdge?: number | undefined;
  readonly largestPairAtInfinity?: boolean | undefined;
  readonly reflectionSide?: ReflectionSide | undefined;
  readonly transmissionZeros?: readonly ZeroInput[] | undefined;
  readonly topology?: Topology | undefined;
  readonly portCouplings?: PortCouplings | undefined;
  readonly unloadedQ?: number | readonly number[] | undefined;
  readonly mask?: readonly MaskLineInput[] | undefined;
  readonly sweep?: SweepInput | undefined;
}
