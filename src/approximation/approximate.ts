import type { Complex, FilterPolynomials } from '../forms/index.js';
import type { Specification } from '../specification/index.js';
import { bessel } from './bessel/bessel.js';
import { butterworth } from './butterworth.js';
import { elliptic } from './elliptic/elliptic.js';
import { generalizedChebyshev } from './generalized-chebyshev.js';
import { inverseChebyshev } from './inverse-chebyshev.js';

/** What of a checked specification decides its transfer function. */
export type ResponseRequest = Pick<
  Specification,
  | 'family'
  | 'order'
  | 'returnLossDb'
  | 'transmissionZeros'
  | 'rejectionDb'
  | 'stopBandEdge'
  | 'largestPairAtInfinity'
  | 'reflectionSide'
>;

/** The transfer function that a checked specification asks for: the one place where its family is chosen. */
export function approximate(specification: ResponseRequest): FilterPolynomials {
  const { family, order, transmissionZeros } = specification;
  // The check of the specification has seen to it that each family has its levels.
  const returnLossDb = specification.returnLossDb as number;
  switch (family) {
    case 'butterworth':
      return butterworth({ order });
    case 'bessel':
      return bessel({ order, edge: 'halfPower', reflectionZeros: specification.reflectionSide ?? 'left' });
    case 'inverseChebyshev':
      return inverseChebyshev({ order, returnLossDb, rejectionDb: specification.rejectionDb as number });
    case 'elliptic':
      return elliptic(ellipticRequest(specification, returnLossDb));
    default:
      return generalizedChebyshev({ order, returnLossDb, transmissionZeros });
  }
}

function ellipticRequest(specification: ResponseRequest, returnLossDb: number): Parameters<typeof elliptic>[0] {
  const { order, rejectionDb, stopBandEdge, largestPairAtInfinity = false } = specification;
  const common = { order, returnLossDb, largestPairAtInfinity };
  return stopBandEdge === undefined ? { ...common, rejectionDb: rejectionDb as number } : { ...common, stopBandEdge };
}

/** The zeros that a specification asked for, to be certified; undefined where its family places them itself. */
export function zerosAskedFor({
  family,
  transmissionZeros,
}: Pick<Specification, 'family' | 'transmissionZeros'>): readonly Complex[] | undefined {
  return family === 'inverseChebyshev' || family === 'elliptic' ? undefined : transmissionZeros;
}
