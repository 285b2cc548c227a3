import { EPS, refusal } from '../../numerics/index.js';
import { checkRejection, checkStopBandEdge, REJECTION_DB } from '../../specification/index.js';
import { type JacobiValues, jacobi } from './jacobi.js';
import { type Modulus, modulusOf, modulusOfDecay } from './modulus.js';

/** The stop band as asked for: its level, or its edge. */
export interface StopBandRequest {
  readonly order: number;
  /** `sqrt(10^(returnLossDb/10) - 1)`: |S21/S11| at the ripple peaks of the pass band. */
  readonly kappa: number;
  readonly rejectionDb?: unknown;
  readonly stopBandEdge?: unknown;
  readonly largestPairAtInfinity: boolean;
}

/** What the two ways of asking come down to. */
export interface Selectivity {
  /** `k` is the inverse of the edge that the stop band has while all zeros are finite. */
  readonly modulus: Modulus;
  /** `sqrt(10^(rejectionDb/10) - 1)`: |S11/S21| at the ripple peaks of the stop band. */
  readonly stopRatio: number;
  readonly rejectionDb: number;
}

/** Relative error of S that the rounding of a transmission zero may cause at the edge of the pass band. */
const ZERO_ROUNDING = 1e-11;

/** A zero rounded by EPS moves its distance from the band edge by EPS/distance, relatively. */
const LEAST_GAP = EPS / ZERO_ROUNDING;

/**
 * The modulus k of the elliptic functions, and the ratio of the stop band.
 *
 * The degree equation `N*K'/K = K1'/K1` ties k to the modulus `k1 = 1/(kappa*stopRatio)` of the ripple: in nomes q^N = q1.
 *
 * @throws FilterFailure E_REJECTION_RANGE, E_STOP_BAND, E_TYPE, E_NOT_FINITE, E_MISSING
 */
export function selectivity(request: StopBandRequest): Selectivity {
  const { order, kappa, rejectionDb, stopBandEdge } = request;
  if ((rejectionDb === undefined) === (stopBandEdge === undefined)) {
    const found = rejectionDb === undefined ? 'neither' : 'both';
    const hint = 'give one; the other follows from it';
    throw refusal('E_STOP_BAND', 'request', found, 'one of rejectionDb and stopBandEdge', hint);
  }
  const found =
    stopBandEdge === undefined
      ? fromRejection(order, kappa, checkRejection(rejectionDb))
      : fromEdge(request, checkStopBandEdge(stopBandEdge));
  const { k, kPrime } = found.modulus;
  // 1/k - 1 without cancellation.
  const gap = (kPrime * kPrime) / (k * (1 + k));
  if (gap >= LEAST_GAP) {
    if (stopBandEdge !== undefined) checkFollowing(found.rejectionDb, stopBandEdge);
    return found;
  }
  throw refusal(
    'E_STOP_BAND',
    stopBandEdge === undefined ? 'rejectionDb' : 'stopBandEdge',
    `a gap of ${gap.toExponential(1)} to the stop band`,
    `${LEAST_GAP.toExponential(1)} at least, for zeros held as doubles`,
    stopBandEdge === undefined ? 'raise the rejection, or lower the order' : 'move the edge outward',
  );
}

/** kappa*stopRatio must exceed 1, or the stop band would pass more than the pass band reflects. */
export function stopRatioOf(kappa: number, rejectionDb: number): number {
  const ratio = Math.sqrt(Math.expm1((rejectionDb * Math.LN10) / 10));
  if (kappa * ratio > 1) return ratio;
  const least = (10 / Math.LN10) * Math.log1p(1 / (kappa * kappa));
  throw refusal(
    'E_REJECTION_RANGE',
    'rejectionDb',
    rejectionDb,
    `above ${least.toPrecision(6)} with this return loss`,
    'raise it',
  );
}

function fromRejection(order: number, kappa: number, rejectionDb: number): Selectivity {
  const stopRatio = stopRatioOf(kappa, rejectionDb);
  const k = 1 / (kappa * stopRatio);
  const ripple = modulusOf(k, Math.sqrt((1 - k) * (1 + k)));
  return { modulus: modulusOfDecay(ripple.decay / order), stopRatio, rejectionDb };
}

function fromEdge({ order, kappa, largestPairAtInfinity }: StopBandRequest, edge: number): Selectivity {
  const beyond = Math.sqrt((edge - 1) * (edge + 1));
  const modulus = largestPairAtInfinity ? movedModulus(order, edge, beyond) : modulusOf(1 / edge, beyond / edge);
  // ln(1/k1) of the ripple, from its nome: k1 itself may be too small for a double.
  const decay = order * modulus.decay;
  const logRatio = decay > FAR_DECAY ? decay / 2 - Math.log(4 * kappa) : -Math.log(modulusOfDecay(decay).k * kappa);
  const stopRatio = Math.exp(logRatio);
  const rejectionDb = logRatio > 30 ? (20 / Math.LN10) * logRatio : (10 / Math.LN10) * Math.log1p(stopRatio ** 2);
  return { modulus, stopRatio, rejectionDb };
}

/** A stop band that starts at a given edge may come out deeper, or shallower, than any that can be asked for by its level. */
function checkFollowing(rejectionDb: number, edge: unknown): void {
  const [least, most] = REJECTION_DB;
  if (rejectionDb >= least && rejectionDb <= most) return;
  throw refusal(
    'E_STOP_BAND',
    'stopBandEdge',
    `${edge}, which gives ${rejectionDb.toPrecision(3)} dB`,
    `an edge that gives ${least} to ${most} dB of rejection with this order and return loss`,
    rejectionDb > most ? 'move the edge inward, or lower the order' : 'move the edge outward, or raise the order',
  );
}

/** Beyond this k1 = 4*sqrt(q1) to the last digit: the next factor is 1 - 4*q1. */
const FAR_DECAY = 80;

/**
 * The modulus whose stop band starts at `edge` once the largest pair of zeros has moved to infinity: it then starts at
 * `1/(k*cd(K/N))`, so that `k*cd/dn'` with `dn'^2 = 1 - k^2*cd^2` equals 1/sqrt(edge^2 - 1). Halving, to the last digit.
 */
function movedModulus(order: number, edge: number, beyond: number): Modulus {
  const reach = (decay: number): number => {
    const modulus = modulusOfDecay(decay);
    const { sn, dn }: JacobiValues = jacobi((order - 1) / order, 1 / order, modulus);
    return (modulus.k * sn) / dn;
  };
  const target = 1 / beyond;
  // A stop band that starts farther out without the move starts farther out with it: the unmoved modulus is one bound.
  let high = modulusOf(1 / edge, beyond / edge).decay * 2;
  while (reach(high) > target) high *= 2;
  let low = high / 2;
  while (reach(low) < target && low > LEAST_DECAY) low /= 2;
  for (;;) {
    const middle = low + (high - low) / 2;
    if (middle === low || middle === high) return modulusOfDecay(middle);
    if (reach(middle) > target) low = middle;
    else high = middle;
  }
}

/** Far below the decay of any stop band that LEAST_GAP lets through. */
const LEAST_DECAY = 0.05;
