import type { FineRoot } from '../../forms/index.js';
import { type Complex, complex, divide, EPS, magnitude, refusal } from '../../numerics/index.js';
import { checkRequest } from '../request.js';
import { readCoefficients, rootsOf } from './coefficient-roots.js';
import { fittedResponse, type GivenResponse } from './from-roots.js';
import { checkHurwitz, readPositive } from './read-roots.js';
import type { ReflectionSides } from './sides.js';

/** Coefficients in ascending order of s, numbers or complex; any leading coefficient but 0. */
export interface CoefficientsRequest {
  /** E; absent when `f` is given and the poles are to be found. */
  readonly e?: readonly (number | Complex)[];
  /** F; absent when `e` is given and the reflection zeros are to be found. */
  readonly f?: readonly (number | Complex)[];
  /** P; without it there is no finite transmission zero. */
  readonly p?: readonly (number | Complex)[];
  /** `S21 = P/(epsilon*E)`, default 1. */
  readonly epsilon?: number;
  /** `S11 = F/(epsilonR*E)`, default 1. */
  readonly epsilonR?: number;
  /** On which side of the axis reflection zeros lie that are to be found; default left. */
  readonly reflectionZeros?: ReflectionSides;
  /** As in `responseFromRoots`. */
  readonly tolerance?: number;
}

/**
 * A lossless reciprocal response from the coefficients of its polynomials: their roots, then as `responseFromRoots`.
 *
 * Constants go with the coefficients as given: `S21 = p/(epsilon*e)`; leading coefficients of another size are taken into them.
 * A common phase of S11, S22 and S21 is taken off, which turns the reference planes. Above order 20 or so coefficients in
 * doubles no longer determine a response; what the polynomials then contradict each other by is refused or stated.
 *
 * @throws FilterFailure E_NOT_HURWITZ, E_NOT_RECIPROCAL, E_NOT_LOSSLESS, E_ILL_CONDITIONED, E_NO_CONVERGENCE, E_CHOICE,
 *   E_ORDER_RANGE, E_POLYNOMIALS, E_TYPE, E_NOT_FINITE
 *
 * @example
 * const flat = responseFromCoefficients({ e: [1, Math.SQRT2, 1], f: [0, 0, 1], epsilon: 1, epsilonR: 1 });
 * flat.poles[0].re.toFixed(6); // '-0.707107'
 */
export function responseFromCoefficients(request: CoefficientsRequest): GivenResponse {
  checkRequest(request);
  const e = request.e === undefined ? undefined : readCoefficients('e', request.e);
  const f = request.f === undefined ? undefined : readCoefficients('f', request.f);
  const p = readCoefficients('p', request.p ?? [1]);
  const poles = e === undefined ? undefined : rootsOf(e);
  if (poles !== undefined) checkHurwitz(poles, 'e: roots');
  const zeros = f === undefined ? undefined : rootsOf(f);
  const transmissionZeros = rootsOf(p);
  const order = poles?.length ?? Math.max(zeros?.length ?? 0, transmissionZeros.length);
  const lead = (list: readonly Complex[] | undefined): Complex => list?.at(-1) ?? complex(1, 0);
  const share = (list: readonly Complex[]): number => magnitude(lead(e)) / magnitude(lead(list));
  const { tolerance } = request;
  const reflectionZeros = zeros ?? request.reflectionZeros;
  return fittedResponse(
    {
      ...(poles === undefined ? {} : { poles }),
      ...(reflectionZeros === undefined ? {} : { reflectionZeros }),
      transmissionZeros,
      epsilon: readPositive('epsilon', request.epsilon ?? 1) * share(p),
      ...(f === undefined ? {} : { epsilonR: readPositive('epsilonR', request.epsilonR ?? 1) * share(f) }),
      ...(tolerance === undefined ? {} : { tolerance }),
    },
    {
      ...(request.p === undefined
        ? {}
        : { lead: leadOf(divide(lead(p), lead(f ?? e)), order + transmissionZeros.length) }),
      open: e === undefined || poles === undefined ? 0 : openShare(e, poles),
    },
  );
}

/** Share of power that rounding of the coefficients of E leaves open: `4 eps sum |c_k omega^k| / |E|`, on every resonance. */
function openShare(e: readonly Complex[], poles: readonly FineRoot[]): number {
  return poles.reduce((worst, { im }) => {
    const sum = e.reduceRight((total, { re, im: part }) => total * Math.abs(im) + Math.hypot(re, part), 0);
    const size = poles.reduce(
      (product, pole) => product * Math.hypot(pole.re, pole.im - im),
      magnitude(e.at(-1) as Complex),
    );
    return Math.max(worst, (4 * EPS * sum) / size);
  }, 0);
}

/** Phases may be off by the rounding of six digits. */
const PHASE_ROOM = 1e-5;

/** +-1 or +-j, which of them by the degrees: a lossless reciprocal P against a monic F has no other phase. */
function leadOf(quotient: Complex, degrees: number): Complex {
  const size = magnitude(quotient);
  const [re, im] = [quotient.re / size, quotient.im / size];
  const isReal = degrees % 2 === 1;
  const off = Math.abs(isReal ? im : re);
  if (off <= PHASE_ROOM) return isReal ? complex(Math.sign(re), 0) : complex(0, Math.sign(im));
  throw refusal(
    'E_NOT_RECIPROCAL',
    'p',
    `a leading coefficient ${re.toPrecision(6)}, ${im.toPrecision(6)} against that of F`,
    isReal ? '1 or -1 in phase' : 'j or -j in phase',
    `P of this degree is para-conjugate with no other phase; it is off by ${off.toPrecision(3)}`,
  );
}
