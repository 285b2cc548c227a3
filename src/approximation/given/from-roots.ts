import { checkPolynomials, type FilterPolynomials, type FineRoot } from '../../forms/index.js';
import { type Complex, EPS } from '../../numerics/index.js';
import type { TransmissionZero } from '../generalized-chebyshev.js';
import { checkRequest } from '../request.js';
import { transmissionLead } from '../transmission-lead.js';
import { movesOf, type Parts, SIX_DIGITS } from './fit.js';
import { fittedParts } from './fitted-parts.js';
import { refuseOpenZeros } from './open-zeros.js';
import { type ReadRequest, readRequest } from './read-request.js';
import { mirroredPairs, readPositive } from './read-roots.js';
import type { ReflectionSides } from './sides.js';

/** What is known of a response. Roots lie in the s-plane of the low-pass prototype; P has a leading coefficient of size 1. */
export interface RootsRequest {
  /** Absent: they follow from the zeros. */
  readonly poles?: readonly FineRoot[];
  /** Roots of F; or, with poles alone, on which side of the axis those lie that are found (default left). */
  readonly reflectionZeros?: readonly FineRoot[] | ReflectionSides;
  /** Finite roots of P, default none; a bare number `w` means `s = j*w`. */
  readonly transmissionZeros?: readonly TransmissionZero[];
  /** `S21 = P/(epsilon*E)`; needed unless there are as many transmission zeros as poles and `epsilonR` is given. */
  readonly epsilon?: number;
  /** `S11 = F/(epsilonR*E)`; 1 unless there are as many transmission zeros as poles. */
  readonly epsilonR?: number;
  /** Largest share of power by which the data may contradict each other or exceed 1; default 1e-4, which six digits hold. */
  readonly tolerance?: number;
}

/** By how much the data had to move to fit each other; lists go with those of the response, absent where nothing was given. Reflection zeros that are given never move. */
export interface Moves {
  readonly poles?: readonly number[];
  readonly transmissionZeros: readonly number[];
  /** Relative. */
  readonly epsilon?: number;
  readonly epsilonR?: number;
}

/** A lossless response made from given data, with how far those were moved. */
export interface GivenResponse extends FilterPolynomials {
  readonly moved: Moves;
}

/**
 * A lossless reciprocal response from the roots that a caller has, with the missing ones found by spectral factorization.
 *
 * Reflection and transmission zeros: the poles follow. Poles and transmission zeros: reflection zeros follow, those off the
 * axis on the side that `reflectionZeros` says; zeros that the data cannot tell from zeros on the axis, multiple ones
 * included, lie on it. All three: the poles are refitted to the zeros. Data of six and more digits are taken as they
 * are and fitted to each other to the last digit; `moved` says by how much each root moved. Poles are listed by falling
 * frequency; data exactly symmetric about omega = 0 give a response that is.
 *
 * Poles and transmission zeros alone leave reflection zeros open where the band reflects little more power than they are
 * rounded to: equal-ripple responses keep them to 1e-11 at 60 dB of return loss; where a change in the last digit of the data
 * moves S11 by more than 1e-7 they are refused (E_ILL_CONDITIONED). Cost O(order^2) a sweep of about thirty, 15 ms at order
 * 30, twice that where reflection zeros are found.
 *
 * Refused: poles not on the left or a common root of F and P on the axis (E_NOT_HURWITZ), zeros without mirror image
 * (E_NOT_RECIPROCAL), |S21| above 1 or data that contradict each other, with the size (E_NOT_LOSSLESS), roots that
 * nearly coincide (E_NO_CONVERGENCE, E_ILL_CONDITIONED).
 *
 * @throws FilterFailure E_NOT_HURWITZ, E_NOT_RECIPROCAL, E_NOT_LOSSLESS, E_ILL_CONDITIONED, E_NO_CONVERGENCE, E_CHOICE,
 *   E_ORDER_RANGE, E_POLYNOMIALS, E_TYPE, E_NOT_FINITE
 *
 * Source: R. Feldtkeller, Einfuehrung in die Siebschaltungstheorie der elektrischen Nachrichtentechnik, 1939 (the power
 * balance; from memory).
 *
 * @example
 * const flat = responseFromRoots({ reflectionZeros: [{ re: 0, im: 0 }, { re: 0, im: 0 }], epsilon: 1 });
 * flat.poles[0].re.toFixed(6); // '-0.707107'
 */
export function responseFromRoots(request: RootsRequest): GivenResponse {
  checkRequest(request);
  return fittedResponse(request);
}

/** What other forms of data know beside the roots. */
export interface Known {
  /** Leading coefficient of P, where it is not the usual one. */
  readonly lead?: Complex | undefined;
  /** Share of power that the data leave open: zeros that it can tell from no zero on the axis are put there. */
  readonly open?: number;
}

/** A response from roots and what else is known; refused where the data leave the reflection zeros open. */
export function fittedResponse(request: RootsRequest, known: Known = {}): GivenResponse {
  const found = fittedToData(request, known);
  const { poles, reflectionZeros, epsilon, epsilonR, tolerance = 0 } = request;
  const isGiven = Array.isArray(reflectionZeros) && typeof reflectionZeros[0] === 'object';
  if (poles === undefined || isGiven) return found;
  const nudge = 1 + EPS;
  const constants = {
    ...(epsilon === undefined ? {} : { epsilon: epsilon * nudge }),
    ...(epsilonR === undefined || epsilon !== undefined ? {} : { epsilonR: epsilonR * nudge }),
  };
  refuseOpenZeros(found, fittedToData({ ...request, ...constants }, known), tolerance);
  return found;
}

/** The response itself, whatever the data leave open. */
export function fittedToData(request: RootsRequest, { lead, open }: Known = {}): GivenResponse {
  const tolerance = request.tolerance === undefined ? undefined : readPositive('tolerance', request.tolerance);
  const given = readRequest(request);
  const transmissionZeros = mirroredPairs(given.transmissionZeros);
  const parts = fittedParts(
    { ...given, transmissionZeros },
    tolerance ?? SIX_DIGITS,
    Math.max(open ?? 0, tolerance ?? 0),
  );
  const { poles, reflectionZeros, epsilon, epsilonR } = parts;
  const { order } = given;
  const polynomials: FilterPolynomials = {
    family: 'lossless',
    order,
    poles,
    reflectionZeros,
    transmissionZeros: transmissionZeros.map(({ re, im }) => ({ re, im })),
    transmissionLead: lead ?? transmissionLead(order, transmissionZeros),
    epsilon,
    epsilonR,
  };
  return { ...checkPolynomials(polynomials), moved: movesFrom(request, given, parts) };
}

function movesFrom(request: RootsRequest, given: ReadRequest, parts: Parts): Moves {
  const relative = (value: number, old: number): number => Math.abs(value / old - 1);
  return {
    ...(given.poles === undefined ? {} : { poles: movesOf(parts.poles, given.poles) }),
    transmissionZeros: parts.transmissionZeros.map(({ re, im }, n) => {
      const old = given.transmissionZeros[n] as FineRoot;
      return Math.hypot(re - old.re, im - old.im);
    }),
    ...(request.epsilon === undefined ? {} : { epsilon: relative(parts.epsilon, request.epsilon) }),
    ...(request.epsilonR === undefined ? {} : { epsilonR: relative(parts.epsilonR, request.epsilonR) }),
  };
}
