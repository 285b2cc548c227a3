import type { FilterPolynomials } from '../forms/index.js';
import { complex } from '../numerics/index.js';
import { checkOrder } from '../specification/index.js';
import { checkRequest } from './request.js';
import { transmissionLead } from './transmission-lead.js';

/**
 * Maximally flat response, half-power edge (3.0103 dB) at omega = 1; `order` 1 to 100. Poles by falling frequency.
 *
 * @throws FilterFailure E_ORDER_RANGE
 *
 * Source: S. Butterworth, On the theory of filter amplifiers, 1930: poles on the unit circle (from memory).
 *
 * @example
 * const response = butterworth({ order: 2 });
 * response.poles[0].re.toFixed(6); // '-0.707107'
 */
export function butterworth(request: { readonly order: number }): FilterPolynomials {
  checkRequest(request);
  const order = checkOrder(request.order);
  const poles = Array.from({ length: order }, (_, n) => circlePole(order, n + 1));
  return {
    family: 'butterworth',
    order,
    poles,
    reflectionZeros: poles.map(() => complex(0, 0)),
    transmissionZeros: [],
    transmissionLead: transmissionLead(order, []),
    epsilon: 1,
    epsilonR: 1,
  };
}

/** Pole k of N: `-sin(theta) + j*cos(theta)`, `theta = (2k-1)*pi/(2N)`; the lower half mirrors the upper one exactly. */
function circlePole(order: number, k: number): { re: number; im: number } {
  const opposite = order + 1 - k;
  if (opposite === k) return complex(-1, 0);
  const theta = ((2 * Math.min(k, opposite) - 1) * Math.PI) / (2 * order);
  return complex(-Math.sin(theta), k < opposite ? Math.cos(theta) : -Math.cos(theta));
}
