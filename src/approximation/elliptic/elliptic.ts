import type { FilterPolynomials } from '../../forms/index.js';
import { complex, refusal } from '../../numerics/index.js';
import { checkOrder, checkReturnLoss } from '../../specification/index.js';
import { conjugate } from '../half-band.js';
import { checkRequest } from '../request.js';
import { transmissionLead } from '../transmission-lead.js';
import { upperHalf } from './elliptic-roots.js';
import { modulusOfDecay, partOfQuarterPeriod } from './modulus.js';
import { selectivity } from './request.js';

/** What an elliptic response is asked for: the stop band by its level or by its edge, one of the two. */
export interface EllipticRequest {
  readonly order: number;
  readonly returnLossDb: number;
  readonly rejectionDb?: number;
  /** Normalized frequency where the stop band starts; the pass band ends at 1. */
  readonly stopBandEdge?: number;
  /** Even orders: the largest pair of transmission zeros goes to infinity, so that no direct coupling is needed. */
  readonly largestPairAtInfinity?: boolean;
}

/**
 * Elliptic response: equal ripple in the pass band and in the stop band, the steepest edge for its order.
 *
 * `order` 1 to 100; `returnLossDb` 0.01 to 100 dB, reached at omega = +-1 and at every ripple peak between; the stop band
 * by `rejectionDb` (0.1 to 300 dB) or by `stopBandEdge`, which must start 2.2e-5 above the pass band at least. An odd order has
 * N-1 finite zeros, an even one N (and so a direct coupling), or N-2 with `largestPairAtInfinity`: the same ripples with a
 * stop band that starts a little later. The result states the level and the edge that the stop band has.
 * Cost O(order), under 1 ms at order 60.
 *
 * @throws FilterFailure E_ORDER_RANGE, E_RL_RANGE, E_REJECTION_RANGE, E_STOP_BAND, E_TYPE, E_NOT_FINITE, E_MISSING
 *
 * Method: elliptic functions by theta products in the nome, where the degree equation is a power; nothing is solved or
 * expanded. Source: W. Cauer, Theorie der linearen Wechselstromschaltungen, 1941 (from memory).
 *
 * @example
 * const response = elliptic({ order: 5, returnLossDb: 20, rejectionDb: 50 });
 * response.transmissionZeros.length; // 4
 * response.stopBandEdge?.toFixed(4); // '1.8046'
 */
export function elliptic(request: EllipticRequest): FilterPolynomials {
  checkRequest(request);
  const order = checkOrder(request.order);
  const returnLossDb = checkReturnLoss(request.returnLossDb);
  const largestPairAtInfinity = checkMove(request.largestPairAtInfinity, order);
  const kappa = Math.sqrt(Math.expm1((returnLossDb * Math.LN10) / 10));
  const { rejectionDb, stopBandEdge } = request;
  const selected = selectivity({ order, kappa, rejectionDb, stopBandEdge, largestPairAtInfinity });
  const ripple = modulusOfDecay(order * selected.modulus.decay);
  const part = partOfQuarterPeriod(kappa, ripple);
  const rest = partOfQuarterPeriod(selected.stopRatio, ripple);
  const half = upperHalf(order, selected.modulus, part, rest, largestPairAtInfinity);
  const zeros = [...half.transmissionZeros, ...half.transmissionZeros.map((w) => -w).reverse()].map((w) =>
    complex(0, w),
  );
  return {
    family: 'elliptic',
    order,
    poles: mirrored(half.poles, order),
    reflectionZeros: mirrored(half.reflectionZeros, order),
    transmissionZeros: zeros.sort((a, b) => b.im - a.im),
    transmissionLead: transmissionLead(order, zeros),
    ...rippleConstants(zeros.length === order, half.ratioAtEdge / kappa, selected.stopRatio),
    returnLossDb,
    rejectionDb: selected.rejectionDb,
    stopBandEdge: stopBandEdge ?? half.stopBandEdge,
  };
}

function checkMove(value: unknown, order: number): boolean {
  if (value === undefined || value === false) return false;
  const name = 'largestPairAtInfinity';
  if (value !== true) throw refusal('E_TYPE', name, value, 'true or false', 'leave it out, or write true');
  if (order % 2 === 0) return true;
  throw refusal(
    'E_ORDER_RANGE',
    name,
    `true with order ${order}`,
    'even orders',
    'an odd order needs no direct coupling',
  );
}

/** The upper half with its mirror image in the real axis, by falling frequency; the middle root of an odd order is its own. */
function mirrored<Root extends { readonly re: number; readonly im: number }>(upper: readonly Root[], order: number) {
  const pairs = upper.slice(0, Math.floor(order / 2));
  return [...upper, ...pairs.map(conjugate).reverse()].sort((a, b) => b.im - a.im);
}

/** A fully canonical response keeps, at infinite frequency, the ratio that its stop band has at its ripple peaks. */
function rippleConstants(
  isCanonical: boolean,
  ratio: number,
  stopRatio: number,
): { epsilon: number; epsilonR: number } {
  if (!isCanonical) return { epsilon: ratio, epsilonR: 1 };
  const epsilon = Math.hypot(1, stopRatio);
  return { epsilon, epsilonR: epsilon / stopRatio };
}
