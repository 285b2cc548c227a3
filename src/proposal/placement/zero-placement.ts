/** A frequency where a placement touches the mask. */
export interface ActiveMargin {
  readonly omega: number;
  readonly marginDb: number;
  /** What this frequency costs: decibels of margin lost for each decibel that the mask rises here; all weights add up to 1. */
  readonly weight: number;
  /** Index of the mask piece it belongs to. */
  readonly piece: number;
}

/** The best transmission zeros for a mask, and the proof that none are better. */
export interface ZeroPlacement {
  readonly order: number;
  /** Finite zeros, normalized, ascending. */
  readonly transmissionZeros: readonly number[];
  readonly atInfinity: number;
  /** Smallest margin over the whole mask, dB, lossless. */
  readonly marginDb: number;
  /** The best margin that any placement has lies in [lowestDb, highestDb]. */
  readonly lowestDb: number;
  readonly highestDb: number;
  readonly active: readonly ActiveMargin[];
  /** Zeros that stand on the bound `closestZero`. */
  readonly pinned: readonly number[];
}
