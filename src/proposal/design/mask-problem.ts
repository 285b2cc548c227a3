import { hzFromOmega, type Level, type MaskLine, omegaFromHz } from '../../forms/index.js';
import type { MaskPiece } from '../placement/mask-pieces.js';
import { kappaOf, rejectionDb } from '../placement/rejection-level.js';
import type { CheckedRequest } from './request.js';

/** The rejection lines of a mask on the normalized axis. */
export interface MaskProblem {
  /** Levels as written: what the response with loss is held against. */
  readonly pieces: readonly MaskPiece[];
  /** Levels for the lossless placement: those that count from the loss at the center, raised by the ripple of the band. */
  readonly absolute: readonly MaskPiece[];
  /** Whether a line counts from the loss at the center, by its index. */
  readonly relative: (source: number) => boolean;
  /** Most zeros that a best placement exists for: fewer than isolated frequencies where there is no stretch. */
  readonly mostZeros: number;
  readonly remarks: readonly string[];
}

export function maskProblem({ mask, band, returnLossDb }: CheckedRequest): MaskProblem {
  const ripple = rejectionDb(0, kappaOf(returnLossDb));
  const pieces = mask.flatMap((line, source) => {
    if (!('rejectionDb' in line) || greatest(line.rejectionDb) === 0) return [];
    return [{ ...endsOf(line, band), level: levelOf(line, line.rejectionDb, band), source }];
  });
  const relative = (source: number): boolean => mask[source]?.relativeTo === 'center';
  const points = new Set(pieces.map(({ fromOmega }) => fromOmega)).size;
  const isolated = pieces.every(({ fromOmega, toOmega }) => fromOmega === toOmega);
  return {
    pieces,
    absolute: pieces.map((piece) =>
      relative(piece.source) ? { ...piece, level: raised(piece.level, ripple) } : piece,
    ),
    relative,
    mostZeros: isolated ? points - 1 : Number.POSITIVE_INFINITY,
    remarks: isolated
      ? [
          `The rejection lines are ${points} isolated frequencies: ${points} zeros would null them one by one, and none is best. At most ${points - 1} were used; give stretches, or margins.driftHz, to allow more.`,
        ]
      : [],
  };
}

function endsOf({ fromHz, toHz }: MaskLine, band: CheckedRequest['band']): Pick<MaskPiece, 'fromOmega' | 'toOmega'> {
  return {
    fromOmega: fromHz === undefined ? Number.NEGATIVE_INFINITY : omegaFromHz(band, fromHz),
    toOmega: toHz === undefined ? Number.POSITIVE_INFINITY : omegaFromHz(band, toHz),
  };
}

/** A pair is straight in hertz, on the exact band-pass map. */
function levelOf({ fromHz, toHz }: MaskLine, level: Level, band: CheckedRequest['band']): MaskPiece['level'] {
  if (typeof level === 'number') return level;
  if (level[0] === level[1] || fromHz === undefined || toHz === undefined || fromHz === toHz) return greatest(level);
  const dbPerHz = (level[1] - level[0]) / (toHz - fromHz);
  return (omega) => level[0] + dbPerHz * (hzFromOmega(band, omega) - fromHz);
}

function raised(level: MaskPiece['level'], by: number): MaskPiece['level'] {
  return typeof level === 'number' ? level + by : (omega) => level(omega) + by;
}

const greatest = (level: Level): number => (typeof level === 'number' ? level : Math.max(...level));
