import type { Band, MaskLine } from '../../forms/index.js';
import { refusal } from '../../numerics/index.js';
import {
  checkBand,
  checkMask,
  checkOrder,
  checkReturnLoss,
  checkUnloadedQ,
  type MaskLineInput,
  type PassbandInput,
} from '../../specification/index.js';
import { refuseContradictions } from './contradictions.js';
import { widened } from './drift.js';

/** Margins wanted beyond the mask, each 0 when absent, and the drift in either direction. */
export interface WantedMargins {
  readonly rejectionDb?: number;
  readonly returnLossDb?: number;
  readonly insertionLossDb?: number;
  readonly insertionLossVariationDb?: number;
  readonly groupDelayVariationSeconds?: number;
  /** Temperature, life and setting: every line is widened by this much at both ends. */
  readonly driftHz?: number;
}

/** What `propose` is asked for. */
export interface ProposeRequest {
  readonly passband: PassbandInput;
  /** Level of the equiripple band of the design, dB; at least what the mask asks for. */
  readonly returnLossDb: number;
  readonly unloadedQ?: number;
  readonly mask: readonly MaskLineInput[];
  readonly margins?: WantedMargins;
  /** Largest order looked at, 20 when absent. */
  readonly largestOrder?: number;
  /** Most zeros of one design; order - 2, what a path through two resonators leaves, when absent. */
  readonly largestZeroCount?: number;
  /** Told after every step; `total` is an estimate that may grow. */
  readonly onProgress?: (done: number, total: number) => void;
  /** Asked at every step; true ends the search with E_STOPPED. */
  readonly shouldStop?: () => boolean;
}

/** A request with every default filled in. */
export interface CheckedRequest {
  readonly band: Band;
  readonly returnLossDb: number;
  readonly unloadedQ: number | undefined;
  readonly sigma: number;
  readonly mask: readonly MaskLine[];
  readonly margins: Readonly<Record<keyof WantedMargins, number>>;
  readonly largestOrder: number;
  readonly largestZeroCount: number;
}

const MARGIN_KEYS: readonly (keyof WantedMargins)[] = [
  'rejectionDb',
  'returnLossDb',
  'insertionLossDb',
  'insertionLossVariationDb',
  'groupDelayVariationSeconds',
  'driftHz',
];

const DEFAULT_LARGEST_ORDER = 20;

/** @throws FilterFailure what the doors of the specification refuse, and E_MASK, E_MARGIN, E_ZERO_COUNT, E_TYPE */
export function checkProposeRequest(request: ProposeRequest): CheckedRequest {
  if (typeof request !== 'object' || request === null)
    throw refusal('E_TYPE', 'request', request, 'an object', 'give passband, returnLossDb and mask');
  const band = checkBand(request.passband);
  const returnLossDb = checkReturnLoss(request.returnLossDb);
  const margins = marginsOf(request.margins);
  const given = checkMask(request.mask, band);
  const mask = margins.driftHz === 0 ? given : checkMask(widened(given, margins.driftHz), band);
  refuseContradictions(mask, band, returnLossDb);
  const unloadedQ = qualityOf(request.unloadedQ);
  return {
    band,
    returnLossDb,
    unloadedQ,
    sigma: unloadedQ === undefined ? 0 : band.centerHz / (band.bandwidthHz * unloadedQ),
    mask,
    margins,
    largestOrder: request.largestOrder === undefined ? DEFAULT_LARGEST_ORDER : checkOrder(request.largestOrder),
    largestZeroCount: zeroCountOf(request.largestZeroCount),
  };
}

function qualityOf(unloadedQ: unknown): number | undefined {
  if (unloadedQ === undefined) return undefined;
  if (Array.isArray(unloadedQ))
    throw refusal('E_Q_RANGE', 'unloadedQ', unloadedQ, 'one number', 'the number of resonators is an outcome here');
  return checkUnloadedQ(unloadedQ, 1) as number;
}

function zeroCountOf(count: unknown): number {
  if (count === undefined) return Number.POSITIVE_INFINITY;
  if (typeof count === 'number' && Number.isInteger(count) && count >= 0) return count;
  throw refusal(
    'E_ZERO_COUNT',
    'largestZeroCount',
    count,
    'a whole number, 0 or more',
    'give the most zeros of a design',
  );
}

function marginsOf(margins: WantedMargins = {}): CheckedRequest['margins'] {
  if (typeof margins !== 'object' || margins === null)
    throw refusal('E_TYPE', 'margins', margins, 'an object', 'give margins such as { rejectionDb: 2 }');
  for (const [key, value] of Object.entries(margins)) {
    if (!(MARGIN_KEYS as readonly string[]).includes(key))
      throw refusal('E_UNKNOWN_KEY', `margins.${key.slice(0, 40)}`, key, MARGIN_KEYS.join(', '), 'check the spelling');
    if (value !== undefined && !(typeof value === 'number' && value >= 0 && value < 1e15))
      throw refusal('E_MARGIN', `margins.${key}`, value, 'a number of 0 or more', 'margins are positive');
  }
  return Object.fromEntries(MARGIN_KEYS.map((key) => [key, margins[key] ?? 0])) as CheckedRequest['margins'];
}
