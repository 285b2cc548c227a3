import { lineFromOmega, omegaFromLine, omegaFromPairLine, pairLineFromOmega } from './line.js';
import type { Segment } from './segments.js';

/** A level in dB over normalized frequency. */
export type LevelOverOmega = (omega: number) => number;

/** A stretch of rejection on one side of the band, normalized frequencies; +-Infinity for an open end. */
export interface MaskPiece {
  readonly fromOmega: number;
  readonly toOmega: number;
  readonly level: number | LevelOverOmega;
  readonly source: number;
}

/** The coordinate that zeros are placed on: of single zeros, or of pairs +-w. */
export interface Coordinate {
  readonly fromOmega: (omega: number) => number;
  /** Frequency at a place; of a pair the positive one. */
  readonly toOmega: (t: number) => number;
  readonly pairs: boolean;
}

export const SINGLE: Coordinate = {
  fromOmega: lineFromOmega,
  toOmega: omegaFromLine,
  pairs: false,
};

export const PAIRS: Coordinate = {
  fromOmega: pairLineFromOmega,
  toOmega: omegaFromPairLine,
  pairs: true,
};

/** Mask pieces as segments of the line; for pairs both sides of the band are folded onto one. */
export function segmentsOf(pieces: readonly MaskPiece[], coordinate: Coordinate): readonly Segment[] {
  return pieces.map(({ fromOmega, toOmega, level, source }) => {
    const ends = [coordinate.fromOmega(fromOmega), coordinate.fromOmega(toOmega)] as const;
    const side = coordinate.pairs && sideOf({ fromOmega, toOmega }) < 0 ? -1 : 1;
    return {
      low: Math.min(...ends),
      high: Math.max(...ends),
      level: typeof level === 'number' ? level : (t: number) => level(side * coordinate.toOmega(t)),
      source,
    };
  });
}

/** 1 for a piece above the band, -1 below. */
export function sideOf({ fromOmega, toOmega }: Pick<MaskPiece, 'fromOmega' | 'toOmega'>): 1 | -1 {
  return fromOmega >= 1 && toOmega >= 1 ? 1 : -1;
}
