import { refusal } from '../numerics/index.js';
import { checkOrder, checkReturnLoss } from '../specification/index.js';
import { besselScale, checkEdge } from './bessel/bessel.js';
import { delayLadder } from './bessel/bessel-ladder.js';
import { checkRequest } from './request.js';

/** A ladder to be found: the family, and for `chebyshev` one of ripple and return loss, for `bessel` its edge. */
export type PrototypeRequest =
  | { readonly family: 'butterworth'; readonly order: number }
  | { readonly family: 'chebyshev'; readonly order: number; readonly rippleDb: number }
  | { readonly family: 'chebyshev'; readonly order: number; readonly returnLossDb: number }
  | { readonly family: 'bessel'; readonly order: number; readonly edge?: 'halfPower' | 'unitDelay' };

/** The elements of a low-pass ladder: `values` holds g0 (source), g1 to gN, and g(N+1) (load). */
export interface PrototypeElements {
  readonly family: 'butterworth' | 'chebyshev' | 'bessel';
  readonly order: number;
  readonly values: readonly number[];
}

/** Largest order of the ladders: tables end far earlier. */
const MAX_LADDER_ORDER = 30;

/**
 * Element values of the low-pass ladder, g0 to g(N+1), edge at omega = 1: capacitances and inductances in turn, in farads
 * and henries with a source of 1 ohm.
 *
 * `order` 1 to 30. `butterworth`: half power at 1. `chebyshev`: the ripple `rippleDb` (1e-9 to 20 dB), or `returnLossDb`,
 * reached at 1; with an even order the load differs from the source. `bessel`: half power at 1 (default), or the delay 1 at
 * omega = 0 with `edge: 'unitDelay'`; equal terminations, the largest element first. Cost O(order), for `bessel` 50 ms at
 * order 30.
 *
 * @throws FilterFailure E_ORDER_RANGE, E_RL_RANGE, E_RIPPLE_RANGE, E_CHOICE, E_TYPE, E_NOT_FINITE, E_MISSING
 *
 * Source: G. L. Matthaei, L. Young, E. M. T. Jones, Microwave Filters, Impedance-Matching Networks, and Coupling
 * Structures, 1964, sections 4.05 and 4.07 (from memory).
 *
 * @example
 * prototypeElements({ family: 'butterworth', order: 2 }).values[1].toFixed(5); // '1.41421'
 * prototypeElements({ family: 'chebyshev', order: 3, rippleDb: 0.5 }).values[2].toFixed(4); // '1.0967'
 * prototypeElements({ family: 'bessel', order: 3, edge: 'unitDelay' }).values[3].toFixed(4); // '0.1922'
 */
export function prototypeElements(request: PrototypeRequest): PrototypeElements {
  checkRequest(request);
  const order = checkOrder(request.order);
  if (order > MAX_LADDER_ORDER) {
    throw refusal('E_ORDER_RANGE', 'order', order, `1 to ${MAX_LADDER_ORDER} for a ladder`, 'lower it');
  }
  const { family } = request;
  if (family === 'butterworth') return { family, order, values: [1, ...butterworthLadder(order), 1] };
  if (family === 'chebyshev') return { family, order, values: chebyshevLadder(order, kappaOf(request)) };
  if (family === 'bessel') {
    const scale = besselScale(order, request.edge === undefined ? 'halfPower' : checkEdge(request.edge));
    return { family, order, values: [1, ...delayLadder(order).map((value) => value * scale), 1] };
  }
  throw refusal('E_CHOICE', 'family', family, '"butterworth", "chebyshev" or "bessel"', 'write one of these');
}

/** `g_k = 2*sin((2k-1)*pi/(2N))`, the second half an exact mirror image of the first. */
function butterworthLadder(order: number): readonly number[] {
  return Array.from({ length: order }, (_, n) => {
    const near = Math.min(n, order - 1 - n);
    return 2 * Math.sin(((2 * near + 1) * Math.PI) / (2 * order));
  });
}

/** `g_1 = 2*a_1/gamma`, `g_k = 4*a_(k-1)*a_k/(b_(k-1)*g_(k-1))`, `gamma = sinh(asinh(kappa)/N)`, kappa the ratio |S21/S11| at the edge. */
function chebyshevLadder(order: number, kappa: number): readonly number[] {
  const height = Math.asinh(kappa);
  const gamma = Math.sinh(height / order);
  const a = (k: number): number => Math.sin(((2 * Math.min(k, order + 1 - k) - 1) * Math.PI) / (2 * order));
  const b = (k: number): number => gamma * gamma + Math.sin((Math.PI * Math.min(k, order - k)) / order) ** 2;
  const values = [1, (2 * a(1)) / gamma];
  for (let k = 2; k <= order; k++) values.push((4 * a(k - 1) * a(k)) / (b(k - 1) * (values[k - 1] as number)));
  values.push(order % 2 === 1 ? 1 : Math.tanh(height / 2) ** -2);
  return values;
}

/** Ripples beyond these are no pass band, or none that a double resolves. */
const RIPPLE_DB = { least: 1e-9, most: 20 };

/** `sqrt(10^(RL/10) - 1)`, or the same number from the ripple: `1/sqrt(10^(ripple/10) - 1)`. */
function kappaOf(request: object): number {
  const rippleDb: unknown = Reflect.get(request, 'rippleDb');
  const returnLossDb: unknown = Reflect.get(request, 'returnLossDb');
  if (rippleDb !== undefined && returnLossDb !== undefined) {
    throw refusal('E_CHOICE', 'request', 'both', 'one of rippleDb and returnLossDb', 'remove one');
  }
  if (rippleDb === undefined) return Math.sqrt(Math.expm1((checkReturnLoss(returnLossDb) * Math.LN10) / 10));
  if (typeof rippleDb !== 'number' || !(rippleDb >= RIPPLE_DB.least && rippleDb <= RIPPLE_DB.most)) {
    const allowed = `a number of dB, ${RIPPLE_DB.least} to ${RIPPLE_DB.most}`;
    throw refusal('E_RIPPLE_RANGE', 'rippleDb', rippleDb, allowed, 'give the ripple of the pass band');
  }
  return 1 / Math.sqrt(Math.expm1((rippleDb * Math.LN10) / 10));
}
