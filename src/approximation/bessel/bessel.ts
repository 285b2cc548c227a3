import type { FilterPolynomials } from '../../forms/index.js';
import { type Complex, complex, magnitude, monotoneRoot, refusal } from '../../numerics/index.js';
import { checkOrder } from '../../specification/index.js';
import { checkRequest } from '../request.js';
import { transmissionLead } from '../transmission-lead.js';
import { delayPoles, delayReflectionZeros, powerTerm } from './delay-polynomials.js';
import { doubleFrom, longQuotient } from './long-numbers.js';

/** What a flat-delay response is asked for. */
export interface BesselRequest {
  readonly order: number;
  /** What sets the frequency scale: half power (3.0103 dB) at omega = 1, or the delay 1 at omega = 0. */
  readonly edge: 'halfPower' | 'unitDelay';
  /** In which half plane the reflection zeros beside the one at the center lie; default left. */
  readonly reflectionZeros?: 'left' | 'right' | 'alternating';
}

/** Largest order of this family: beyond it nobody has compared the roots with a reference. */
export const MAX_BESSEL_ORDER = 60;

/**
 * Bessel response: maximally flat group delay, no finite transmission zero.
 *
 * `order` 1 to 60. Seen from its ports the filter is not symmetric: S11 and S22 differ in phase (above order 1), and all
 * reflection zeros but the one at the center lie off the axis, in mirrored pairs of which either half may belong to S11:
 * `left` (default) puts all into the left half plane, `right` exchanges the ports, `alternating` changes side from pair to pair.
 * With all zeros on one side the energy sits at one end of the filter; matrices in doubles are certified to order 48 then, and
 * to order 60 with alternating zeros. Cost O(order^2) whole-number products, 0.2 s at order 60.
 *
 * @throws FilterFailure E_ORDER_RANGE, E_CHOICE, E_TYPE, E_NOT_FINITE, E_MISSING
 *
 * Method: roots of polynomials known as whole numbers, evaluated in whole numbers. Source: W. E. Thomson, Delay networks
 * having maximally flat frequency characteristics, Proc. IEE 96 part III, 1949 (from memory).
 *
 * @example
 * const response = bessel({ order: 2, edge: 'unitDelay' });
 * response.poles[0].re.toFixed(6); // '-1.500000'
 * response.reflectionZeros[0].re.toFixed(6); // '-1.732051'
 */
export function bessel(request: BesselRequest): FilterPolynomials {
  checkRequest(request);
  const order = checkBesselOrder(request.order);
  const scale = besselScale(order, checkEdge(request.edge));
  const side = request.reflectionZeros === undefined ? 'left' : checkSide(request.reflectionZeros);
  const poles = withConjugates(delayPoles(order).map((pole) => scaled(pole, 1 / scale)));
  return {
    family: 'bessel',
    order,
    poles,
    reflectionZeros: withConjugates(placed(delayReflectionZeros(order), side).map((zero) => scaled(zero, 1 / scale))),
    transmissionZeros: [],
    transmissionLead: transmissionLead(order, []),
    epsilon: poles.reduce((product, pole) => product / magnitude(pole), 1),
    epsilonR: 1,
    edge: request.edge,
  };
}

/** @throws FilterFailure E_ORDER_RANGE, E_TYPE, E_NOT_FINITE, E_MISSING */
export function checkBesselOrder(value: unknown, most: number = MAX_BESSEL_ORDER): number {
  const order = checkOrder(value);
  if (order <= most) return order;
  throw refusal('E_ORDER_RANGE', 'order', order, `1 to ${most} with a flat delay`, 'lower it');
}

/** The frequency, with unit delay at the center, that becomes omega = 1: where half the power is left, or 1 itself. */
export function besselScale(order: number, edge: 'halfPower' | 'unitDelay'): number {
  if (edge === 'unitDelay' || order === 1) return 1;
  const [lead] = [powerTerm(order, 0)];
  const terms = Array.from({ length: order }, (_, k) =>
    doubleFrom(longQuotient(powerTerm(order, k + 1), lead, BITS), BITS),
  );
  // 1/|S21|^2 - 2 is a sum of positive terms less 1: it rises, and loses no digit where it vanishes.
  const excess = (omega: number): { value: number; slope: number } => {
    const y = 4 * omega * omega;
    let [value, slope] = [0, 0];
    for (let k = order; k >= 1; k--) {
      value = (value + (terms[k - 1] as number)) * y;
      slope = slope * y + k * (terms[k - 1] as number);
    }
    return { value: value - 1, slope: 8 * omega * slope };
  };
  // Far from its end the response is near exp(-omega^2/(2N-1)), a Gaussian curve: a good start.
  return monotoneRoot(excess, 0, 2 * order, Math.sqrt((2 * order - 1) * Math.LN2));
}

/** The smallest quotient, at order 60, is 1e-230. */
const BITS = 900;

/** @throws FilterFailure E_CHOICE */
export function checkEdge(value: unknown): 'halfPower' | 'unitDelay' {
  if (value === 'halfPower' || value === 'unitDelay') return value;
  throw refusal('E_CHOICE', 'edge', value, '"halfPower" or "unitDelay"', 'write one of these');
}

function checkSide(value: unknown): 'left' | 'right' | 'alternating' {
  if (value === 'left' || value === 'right' || value === 'alternating') return value;
  throw refusal('E_CHOICE', 'reflectionZeros', value, '"left", "right" or "alternating"', 'write one of these');
}

/** The zero at the center and the others, upper half, each on its side; alternation starts at the left with the highest. */
function placed(zeros: readonly Complex[], side: 'left' | 'right' | 'alternating'): readonly Complex[] {
  const sorted = [...zeros].sort((a, b) => b.im - a.im);
  const turned = sorted.map(({ re, im }, n) =>
    side === 'right' || (side === 'alternating' && n % 2 === 1) ? complex(-re, im) : complex(re, im),
  );
  return [...turned, complex(0, 0)];
}

/** Roots of the closed upper half plane with their conjugates, by falling frequency. */
function withConjugates(upper: readonly Complex[]): readonly Complex[] {
  const above = upper.filter(({ im }) => im > 0).sort((a, b) => b.im - a.im || a.re - b.re);
  const real = upper.filter(({ im }) => im === 0).sort((a, b) => a.re - b.re);
  return [...above, ...real, ...above.map(({ re, im }) => complex(re, -im)).reverse()];
}

const scaled = ({ re, im }: Complex, factor: number): Complex => complex(re * factor, im * factor);
