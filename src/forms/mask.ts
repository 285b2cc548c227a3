/** A level: one value over the whole span, or a pair [at fromHz, at toHz], straight in hertz between. */
export type Level = number | readonly [number, number];

/** The span of a mask line in hertz; an absent end is open, both ends equal is a point. */
export interface Span {
  readonly fromHz?: number;
  readonly toHz?: number;
  /** Levels are absolute (available power) unless they are relative to the loss at the center frequency. */
  readonly relativeTo?: 'center';
}

/** One line of a customer's mask. Decibels are positive numbers. */
export type MaskLine = Span &
  (
    | { readonly rejectionDb: Level }
    | { readonly returnLossDb: Level }
    | { readonly insertionLossDb: Level }
    | { readonly insertionLossVariationDb: number }
    | { readonly groupDelayVariationSeconds: number }
  );

/** The verdict on one mask line at its true worst point; `worstHz` is null where the worst is only approached at infinite frequency. */
export interface MaskRow {
  readonly line: MaskLine;
  readonly limit: number;
  readonly predicted: number;
  readonly margin: number;
  readonly worstHz: number | null;
}
