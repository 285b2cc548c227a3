import { refusal } from '../../numerics/index.js';
import { checkOrder, checkReturnLoss } from '../../specification/index.js';
import { kappaOf, rejectionDb } from '../placement/rejection-level.js';
import { lobePlaces } from './lobe-places.js';

/** What `placeZerosForLobes` is asked for. */
export interface LobeRequest {
  readonly order: number;
  readonly returnLossDb: number;
  /** Level in dB of each rejection lobe above the band, from the band outward: one zero a lobe, the last lobe reaches to infinity. */
  readonly above?: readonly number[];
  /** The same below the band. */
  readonly below?: readonly number[];
}

/**
 * Transmission zeros, normalized and ascending, that give the rejection lobes of a lossless equiripple response the stated
 * smallest levels.
 *
 * Between two neighboring zeros, and between the last zero of a side and infinity, the rejection has one minimum: its level is
 * given. `order` 1 to 100, fewer zeros than that (at least one stays at infinity), levels above the ripple of the passband to
 * 1000 dB. Cost: below 1 ms.
 *
 * @throws FilterFailure E_TYPE, E_ORDER_RANGE, E_RL_RANGE, E_ZERO_COUNT, E_MASK, E_NO_CONVERGENCE
 *
 * @example
 * const zeros = placeZerosForLobes({ order: 4, returnLossDb: 22, above: [30, 30] });
 * zeros.map((omega) => omega.toFixed(4)); // ['1.3217', '1.8082']
 */
export function placeZerosForLobes(request: LobeRequest): readonly number[] {
  if (typeof request !== 'object' || request === null)
    throw refusal('E_TYPE', 'request', request, 'an object', 'give order, returnLossDb, and above or below');
  const order = checkOrder(request.order);
  const kappa = kappaOf(checkReturnLoss(request.returnLossDb));
  const floor = rejectionDb(0, kappa);
  const above = levelsOf(request.above, 'above', floor);
  const below = levelsOf(request.below, 'below', floor);
  const count = above.length + below.length;
  if (count >= order)
    throw refusal(
      'E_ZERO_COUNT',
      'above and below',
      `${count} lobes`,
      `fewer than the order, ${order}`,
      'a lobe that reaches to infinity needs a zero there',
    );
  return lobePlaces({ above, below, atInfinity: order - count, kappa });
}

function levelsOf(levels: unknown, name: string, floor: number): readonly number[] {
  if (levels === undefined) return [];
  if (!Array.isArray(levels)) throw refusal('E_TYPE', name, levels, 'a list of levels in dB', 'give a list');
  levels.forEach((level, n) => {
    if (typeof level === 'number' && level > floor && level <= 1000) return;
    const allowed = `above ${floor.toPrecision(3)} dB, the ripple of the band, to 1000 dB`;
    throw refusal('E_MASK', `${name}[${n}]`, level, allowed, 'give the smallest rejection of the lobe in positive dB');
  });
  return [...levels];
}
