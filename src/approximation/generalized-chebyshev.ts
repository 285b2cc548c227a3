import type { FilterPolynomials } from '../forms/index.js';
import { type Complex, complex, FilterFailure, magnitude, refusal } from '../numerics/index.js';
import { checkOrder, checkReturnLoss, checkTransmissionZeros } from '../specification/index.js';
import { type BandRoots, bandRoots } from './band-roots.js';
import { checkLossless } from './lossless.js';
import { checkRequest } from './request.js';
import { transmissionLead } from './transmission-lead.js';

/** A transmission zero: a bare number `w` means `s = j*w`, a complex number lies in the s-plane. */
export type TransmissionZero = number | Complex;

/** What a generalized Chebyshev response is asked for. */
export interface GeneralizedChebyshevRequest {
  readonly order: number;
  readonly returnLossDb: number;
  readonly transmissionZeros?: readonly TransmissionZero[];
}

/**
 * Equiripple response with prescribed transmission zeros: reflection zeros, poles and ripple constants in product form.
 *
 * `order` 1 to 100; `returnLossDb` 0.01 to 100 dB, reached at omega = +-1 and at every ripple peak between; up to `order`
 * `transmissionZeros` (normalized): on the axis outside the band, or in pairs mirrored in the imaginary axis.
 * The result lists poles and reflection zeros by falling frequency. Cost: O(order^2), 1 ms at order 40.
 *
 * @throws FilterFailure E_ORDER_RANGE, E_RL_RANGE, E_TYPE, E_NOT_FINITE, E_ZERO_COUNT, E_ZERO_IN_PASSBAND, E_ZERO_ON_EDGE,
 *   E_ZERO_PAIR, E_ZERO_RANGE, E_ILL_CONDITIONED, E_NO_CONVERGENCE
 *
 * Method: the phase description of `band-phase.ts`; nothing is expanded. Source of the filtering function: R. J. Cameron,
 * General coupling matrix synthesis methods for Chebyshev filtering functions, IEEE Trans. MTT 47(4), 1999 (from memory).
 *
 * @example
 * const response = generalizedChebyshev({ order: 4, returnLossDb: 22, transmissionZeros: [1.3217, 1.8082] });
 * response.epsilon.toFixed(4); // '1.1547'
 */
export function generalizedChebyshev(request: GeneralizedChebyshevRequest): FilterPolynomials {
  checkRequest(request);
  const order = checkOrder(request.order);
  const returnLossDb = checkReturnLoss(request.returnLossDb);
  const { zeros } = checkTransmissionZeros(
    request.transmissionZeros === undefined ? [] : request.transmissionZeros,
    order,
  );
  const kappa = Math.sqrt(Math.expm1((returnLossDb * Math.LN10) / 10));
  const { reflection, poles } = bandRoots(order, zeros.map(omegaOf), kappa);
  return checkLossless({
    family: 'generalizedChebyshev',
    order,
    poles,
    reflectionZeros: reflection.map(({ zero }) => zero),
    transmissionZeros: zeros,
    transmissionLead: transmissionLead(order, zeros),
    ...rippleConstants(zeros, reflection, kappa),
    returnLossDb,
  });
}

/**
 * Equiripple all-pole response: `generalizedChebyshev` without finite transmission zeros.
 *
 * @throws FilterFailure E_ORDER_RANGE, E_RL_RANGE
 *
 * @example
 * const response = chebyshev({ order: 3, returnLossDb: 20 });
 * response.reflectionZeros[0].im.toFixed(6); // '0.866025'
 */
export function chebyshev(request: { readonly order: number; readonly returnLossDb: number }): FilterPolynomials {
  checkRequest(request);
  const zeros: unknown = Reflect.get(request, 'transmissionZeros');
  if (zeros !== undefined && (!Array.isArray(zeros) || zeros.length > 0)) {
    throw refusal(
      'E_ZERO_COUNT',
      'transmissionZeros',
      zeros,
      'none: this family is all-pole',
      'call generalizedChebyshev',
    );
  }
  return generalizedChebyshev({ order: request.order, returnLossDb: request.returnLossDb });
}

/** s-plane to omega-plane, `w = -j*s`. */
const omegaOf = (zero: Complex): Complex => complex(zero.im, zero.re === 0 ? 0 : -zero.re);

/**
 * `epsilon` and `epsilonR` from distances at s = j; factors are taken in pairs so that no partial product leaves the range
 * of doubles before the result does.
 */
function rippleConstants(
  zeros: readonly Complex[],
  reflection: BandRoots['reflection'],
  kappa: number,
): { epsilon: number; epsilonR: number } {
  // In an order of their own, so that the order in which zeros are given cannot change a bit.
  const sorted = [...zeros].sort((a, b) => a.im - b.im || a.re - b.re);
  let ratio = 1 / kappa;
  reflection.forEach(({ oneMinus }, n) => {
    const zero = sorted[n];
    ratio *= (zero === undefined ? 1 : magnitude(complex(zero.re, 1 - zero.im))) / oneMinus;
  });
  if (!Number.isFinite(ratio)) {
    throw new FilterFailure(
      'E_ZERO_RANGE',
      'E_ZERO_RANGE transmissionZeros: found zeros so far out that the ripple constant exceeds 1e308; allowed products below that; leave distant zeros at infinity out',
      {
        argument: 'transmissionZeros',
        value: ratio,
        limit: Number.MAX_VALUE,
        hint: 'leave distant zeros at infinity out',
      },
    );
  }
  if (zeros.length < reflection.length) return { epsilon: ratio, epsilonR: 1 };
  const epsilon = Math.hypot(1, ratio);
  return { epsilon, epsilonR: epsilon / ratio };
}
