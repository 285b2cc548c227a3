import type { FilterPolynomials, FineRoot } from '../forms/index.js';
import { complex } from '../numerics/index.js';
import { checkOrder, checkRejection, checkReturnLoss } from '../specification/index.js';
import { stopRatioOf } from './elliptic/request.js';
import { checkRequest } from './request.js';
import { transmissionLead } from './transmission-lead.js';

/** What an inverse Chebyshev response is asked for. */
export interface InverseChebyshevRequest {
  readonly order: number;
  /** Return loss at omega = +-1, the edges of the pass band; it is larger everywhere between. */
  readonly returnLossDb: number;
  /** Rejection at every ripple peak of the stop band. */
  readonly rejectionDb: number;
}

/**
 * Inverse Chebyshev response: maximally flat pass band, equal ripple in the stop band.
 *
 * `order` 1 to 100; `returnLossDb` 0.01 to 100 dB, reached at omega = +-1; `rejectionDb` 0.1 to 300 dB, reached from
 * `stopBandEdge` on, which the result states. All reflection zeros lie at the center; an odd order has N-1 finite
 * transmission zeros, an even one N (and so a direct coupling). Cost O(order).
 *
 * @throws FilterFailure E_ORDER_RANGE, E_RL_RANGE, E_REJECTION_RANGE, E_TYPE, E_NOT_FINITE, E_MISSING
 *
 * Closed form: `|S11/S21| = stopRatio/T_N(edge/omega)` with the Chebyshev polynomial T_N; its value at omega = 1 gives the
 * edge. Source: common practice, no source.
 *
 * @example
 * const response = inverseChebyshev({ order: 5, returnLossDb: 20, rejectionDb: 50 });
 * response.stopBandEdge?.toFixed(4); // '2.9626'
 */
export function inverseChebyshev(request: InverseChebyshevRequest): FilterPolynomials {
  checkRequest(request);
  const order = checkOrder(request.order);
  const returnLossDb = checkReturnLoss(request.returnLossDb);
  const rejectionDb = checkRejection(request.rejectionDb);
  const kappa = Math.sqrt(Math.expm1((returnLossDb * Math.LN10) / 10));
  const stopRatio = stopRatioOf(kappa, rejectionDb);
  const edge = Math.cosh(Math.acosh(kappa * stopRatio) / order);
  const angles = Array.from({ length: order }, (_, n) => angleOf(order, n));
  const zeros = angles.filter(({ cosine }) => cosine !== 0).map(({ cosine }) => complex(0, edge / cosine));
  const width = Math.sinh(Math.asinh(stopRatio) / order);
  const epsilon = order % 2 === 1 ? stopRatio / (order * edge) : Math.hypot(1, stopRatio);
  return {
    family: 'inverseChebyshev',
    order,
    poles: angles.map((angle) => poleAt(angle, edge, width)).sort((a, b) => b.im - a.im || a.re - b.re),
    reflectionZeros: angles.map(() => complex(0, 0)),
    transmissionZeros: [...zeros].sort((a, b) => b.im - a.im),
    transmissionLead: transmissionLead(order, zeros),
    epsilon,
    epsilonR: order % 2 === 1 ? 1 : epsilon / stopRatio,
    returnLossDb,
    rejectionDb,
    stopBandEdge: edge,
  };
}

interface Angle {
  readonly sine: number;
  readonly cosine: number;
}

/** Sine and cosine of (2n+1)*pi/(2N), the second half an exact mirror image of the first. */
function angleOf(order: number, n: number): Angle {
  const opposite = order - 1 - n;
  if (opposite === n) return { sine: 1, cosine: 0 };
  const near = Math.min(n, opposite);
  const unit = Math.PI / (2 * order);
  const cosine = Math.sin((order - 1 - 2 * near) * unit);
  return { sine: Math.sin((2 * near + 1) * unit), cosine: n < opposite ? cosine : -cosine };
}

/** `s = j*edge/x`, x a root of `T_N(x) = +-j*stopRatio`: x = cosine*sqrt(1 + width^2) -+ j*sine*width. */
function poleAt({ sine, cosine }: Angle, edge: number, width: number): FineRoot {
  const scaleBy = edge / (cosine * cosine + width * width);
  return complex(-sine * width * scaleBy, cosine * Math.hypot(1, width) * scaleBy);
}
