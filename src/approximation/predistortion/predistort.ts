import { checkPolynomials, type FilterPolynomials, type FineRoot } from '../../forms/index.js';
import { refusal } from '../../numerics/index.js';
import { fittedResponse, type GivenResponse } from '../given/from-roots.js';
import { largestRatio } from '../given/peak.js';
import { ONE } from '../given/power-sum.js';
import { readNumber } from '../given/read-roots.js';
import type { ReflectionSides } from '../given/sides.js';
import { checkRequest } from '../request.js';

/** What a response is to be predistorted for. */
export interface PredistortionRequest {
  /** Normalized loss `f0/(B*Qu)`, one for all resonators. */
  readonly loss: number;
  /** Share of the loss whose effect is taken out, above 0 to 1; default 1. */
  readonly share?: number;
  /** On which side of the axis reflection zeros lie; default left. */
  readonly reflectionZeros?: ReflectionSides;
}

/** A predistorted response and what it costs. */
export interface Predistortion {
  /** The lossless response to build. */
  readonly polynomials: GivenResponse;
  /** By how much all poles moved to the right: share times loss. */
  readonly shift: number;
  /** Loss, dB, by which the response with the share of the loss lies below the given lossless one, the same at all frequencies. */
  readonly flatLossDb: number;
}

/**
 * Predistortion of an all-pole response: with the loss of its resonators the result has the shape that the given one has
 * without loss, lower by a flat loss.
 *
 * A common loss replaces s by `s + loss`, which moves every pole to the left; so they are moved right by `share*loss` before.
 * The constant is the largest that keeps |S21| at most 1, reached at one frequency at least, and F follows by
 * spectral factorization. What is paid is the flat loss, and return loss: power that is not passed is reflected. Cost as
 * `responseFromRoots`.
 *
 * Refused: finite transmission zeros (E_ZERO_COUNT), since no shift of poles keeps them on the axis, so that the shape
 * cannot be exact; a shift that reaches the pole next to the axis (E_LOSS), with both numbers.
 *
 * @throws FilterFailure E_LOSS, E_ZERO_COUNT, E_CHOICE, E_ILL_CONDITIONED, E_NO_CONVERGENCE, E_POLYNOMIALS, E_TYPE, E_NOT_FINITE
 *
 * Source: M. Dishal, Design of dissipative band-pass filters producing desired exact amplitude-frequency characteristics,
 * Proc. IRE 37, 1949 (from memory).
 *
 * @example
 * const { flatLossDb } = predistort(butterworth({ order: 1 }), { loss: 0.5 });
 * flatLossDb.toFixed(4); // '6.0206'
 */
export function predistort(polynomials: FilterPolynomials, request: PredistortionRequest): Predistortion {
  const { order, poles, transmissionZeros, transmissionLead, epsilon } = checkPolynomials(polynomials);
  checkRequest(request);
  if (transmissionZeros.length > 0) refuseZeros(transmissionZeros.length);
  const shift = shiftOf(request);
  checkReach(poles, shift);
  const moved: readonly FineRoot[] = poles.map((pole) => ({ ...pole, re: pole.re + shift }));
  const unit = 2 ** Math.round(Math.log2(Math.max(...moved.map(({ re, im }) => Math.hypot(re, im)))));
  const small = moved.map(({ re, im, imRest = 0 }) => ({ re: re / unit, im: im / unit, imRest: imRest / unit }));
  const peak = largestRatio({ constant: ONE, roots: [] }, { constant: ONE, roots: small });
  const largest = Math.sqrt(peak.value) * unit ** -order;
  const { reflectionZeros } = request;
  const side = reflectionZeros === undefined ? {} : { reflectionZeros };
  return {
    polynomials: fittedResponse({ poles: moved, epsilon: largest, ...side }, { lead: transmissionLead }),
    shift,
    flatLossDb: (20 * Math.log(largest / epsilon)) / Math.LN10 + 0,
  };
}

function shiftOf(request: PredistortionRequest): number {
  const loss = readNumber('loss', request.loss);
  if (loss < 0) throw refusal('E_LOSS', 'loss', loss, 'numbers >= 0', 'drop the sign: loss is f0/(B*Qu)');
  const share = request.share === undefined ? 1 : readNumber('share', request.share);
  if (share > 0 && share <= 1) return share * loss;
  throw refusal('E_LOSS', 'share', share, 'above 0 to 1', 'give the share of the loss that is to be taken out');
}

function refuseZeros(count: number): never {
  throw refusal(
    'E_ZERO_COUNT',
    'polynomials.transmissionZeros',
    `${count} finite transmission zeros`,
    'none: loss moves them off the axis, and no lossless reciprocal network has the zeros that would bring them back, so the exact shape is impossible',
    'take an all-pole response',
  );
}

function checkReach(poles: readonly FineRoot[], shift: number): void {
  const least = Math.min(...poles.map(({ re }) => -re));
  if (shift < least) return;
  const share = Number((least / shift).toPrecision(2));
  throw refusal(
    'E_LOSS',
    'share*loss',
    shift,
    `less than ${least}, the distance of the nearest pole from the axis`,
    `resonators of a higher Q, a wider band, or less than ${share} of this share`,
  );
}
