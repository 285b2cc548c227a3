import type { Level } from '../../forms/index.js';
import { refusal } from '../../numerics/index.js';
import { checkOrder, checkReturnLoss } from '../../specification/index.js';
import type { LevelOverOmega, MaskPiece } from './mask-pieces.js';
import { placeOnMask } from './place-on-mask.js';
import type { ZeroPlacement } from './zero-placement.js';

/** Rejection wanted over a stretch outside the band, normalized frequencies; an absent end is open. */
export interface RejectionPiece {
  readonly fromOmega?: number;
  readonly toOmega?: number;
  /** One value in dB, or [at fromOmega, at toOmega], straight in omega between. */
  readonly rejectionDb: Level;
}

/** What `placeZeros` is asked for. */
export interface PlaceZerosRequest {
  readonly order: number;
  readonly zeroCount: number;
  readonly returnLossDb: number;
  readonly rejection: readonly RejectionPiece[];
  /** Pairs +-w only. */
  readonly symmetric?: boolean;
  /** No zero closer to the band than |omega| = this, above 1: closer ones need stronger couplings than can be built. */
  readonly closestZero?: number;
  /** At most this many of the zeros above the band and the rest at most below it; what does not fit goes to infinity. */
  readonly zerosAbove?: number;
}

/**
 * The transmission zeros that clear a rejection mask by the largest smallest margin, and the proof of it: no placement of as
 * many zeros on the axis has a margin above `highestDb`, and this one reaches `lowestDb`.
 *
 * `order` 1 to 100, `zeroCount` 0 to `order`, `returnLossDb` as in `generalizedChebyshev`, lossless. Where the zeros fall,
 * above or below the band or at infinity, is an outcome; one of no use may come out very far away. Under `closestZero` or `zerosAbove` the enclosure holds for the zeros
 * that are not on a bound, and each one that is has been checked to press against it. Cost: about 0.2 ms for five zeros.
 *
 * @throws FilterFailure E_TYPE, E_NOT_FINITE, E_ORDER_RANGE, E_RL_RANGE, E_ZERO_COUNT, E_ZERO_IN_PASSBAND, E_MASK, E_NO_CONVERGENCE
 *
 * Source: the margin is a minimax problem for sums of translates of one convex kernel, whose optimum is unique and has equal
 * lobes, and of two placements neither has all lobes better: P. C. Fenton, A min-max theorem for sums of translates of a
 * function, J. Math. Anal. Appl. 244, 2000; B. Farkas, B. Nagy, S. G. Revesz, Fenton type minimax problems for sum of
 * translates functions, arXiv 2210.04348, 2022; T. Nikiforova, arXiv 2405.08561, 2024, on the real axis (all from memory). Here the mask is the field and infinity an ordinary point.
 *
 * @example
 * const rejection = [{ toOmega: -1.5, rejectionDb: 30 }, { fromOmega: 1.3, rejectionDb: 40 }];
 * const placed = placeZeros({ order: 6, zeroCount: 3, returnLossDb: 20, rejection });
 * placed.transmissionZeros.length; // 3
 * placed.highestDb - placed.lowestDb < 1e-9; // true
 */
export function placeZeros(request: PlaceZerosRequest): ZeroPlacement {
  if (typeof request !== 'object' || request === null)
    throw refusal('E_TYPE', 'request', request, 'an object', 'give order, zeroCount, returnLossDb and rejection');
  const order = checkOrder(request.order);
  const returnLossDb = checkReturnLoss(request.returnLossDb);
  const symmetric = request.symmetric === true;
  const zeroCount = checkCount(request.zeroCount, order, 'zeroCount');
  if (symmetric && zeroCount % 2 === 1)
    throw refusal('E_ZERO_COUNT', 'zeroCount', zeroCount, 'an even number for pairs', 'add or drop a zero');
  if (request.zerosAbove !== undefined) checkCount(request.zerosAbove, zeroCount, 'zerosAbove');
  if (symmetric && request.zerosAbove !== undefined)
    throw refusal(
      'E_CHOICE',
      'zerosAbove',
      request.zerosAbove,
      'no split beside symmetric',
      'leave one of the two out',
    );
  const { closestZero } = request;
  if (closestZero !== undefined && !(typeof closestZero === 'number' && closestZero > 1 && closestZero < 1e4))
    throw refusal(
      'E_ZERO_IN_PASSBAND',
      'closestZero',
      closestZero,
      'a number above 1, to 1e4',
      'give the least |omega|',
    );
  const pieces = piecesOf(request.rejection);
  return placeOnMask({
    order,
    zeroCount,
    returnLossDb,
    pieces,
    symmetric,
    closestZero,
    zerosAbove: request.zerosAbove,
  });
}

function checkCount(count: unknown, most: number, name: string): number {
  if (typeof count === 'number' && Number.isInteger(count) && count >= 0 && count <= most) return count;
  throw refusal('E_ZERO_COUNT', name, count, `a whole number, 0 to ${most}`, 'change the number of zeros');
}

function piecesOf(rejection: readonly RejectionPiece[]): readonly MaskPiece[] {
  if (!Array.isArray(rejection))
    throw refusal('E_TYPE', 'rejection', rejection, 'a list of pieces', 'give a list, also for one piece');
  if (rejection.length === 0)
    throw refusal(
      'E_MASK',
      'rejection',
      'no piece',
      'at least one',
      'say where the filter has to reject, and how much',
    );
  return rejection.map(pieceOf);
}

function pieceOf(piece: RejectionPiece, source: number): MaskPiece {
  const name = `rejection[${source}]`;
  if (typeof piece !== 'object' || piece === null)
    throw refusal('E_TYPE', name, piece, 'an object', 'give fromOmega, toOmega and rejectionDb');
  const { fromOmega = Number.NEGATIVE_INFINITY, toOmega = Number.POSITIVE_INFINITY, rejectionDb } = piece;
  for (const end of [piece.fromOmega, piece.toOmega])
    if (end !== undefined && !Number.isFinite(end))
      throw refusal('E_NOT_FINITE', name, end, 'finite frequencies', 'leave an open end out');
  const outside = fromOmega <= toOmega && (fromOmega > 1 || toOmega < -1);
  if (!outside)
    throw refusal(
      'E_MASK',
      name,
      `rejection from ${fromOmega} to ${toOmega}`,
      'stretches above 1 or below -1',
      'the passband from -1 to 1 transmits: end the piece outside it',
    );
  return { fromOmega, toOmega, level: levelOf(rejectionDb, fromOmega, toOmega, name), source };
}

function levelOf(level: Level, from: number, to: number, name: string): number | LevelOverOmega {
  const values: readonly unknown[] = Array.isArray(level) ? level : [level];
  const usable = values.every((value) => typeof value === 'number' && value > 0 && value <= 1000);
  if (!usable || values.length === 0 || values.length > 2)
    throw refusal('E_MASK', `${name}.rejectionDb`, level, 'above 0 to 1000 dB, or a pair', 'give positive decibels');
  const [low, high] = values as readonly number[];
  if (high === undefined || low === high) return low as number;
  if (!Number.isFinite(to - from) || from === to)
    throw refusal('E_MASK', name, 'a pair on an open span or a point', 'a pair with two ends', 'give both ends');
  const slope = (high - (low as number)) / (to - from);
  return (omega) => (low as number) + slope * (omega - from);
}
