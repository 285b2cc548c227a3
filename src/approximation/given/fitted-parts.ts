import type { FineRoot } from '../../forms/index.js';
import { refusal } from '../../numerics/index.js';
import { largestDefect, type Parts, polesOf, reflectionZerosOf } from './fit.js';
import type { ReadRequest } from './read-request.js';

/** Largest defect of power that is let out: the limit of the certificates for the response. */
const LARGEST_DEFECT = 1e-9;

/**
 * Roots that fit each other to the last digit: reflection zeros found where there are none, poles refitted to the zeros. Done at
 * frequencies of size 1, an exact power of two away. `tolerance` is the largest contradiction, `open` what the data leave open.
 *
 * @throws FilterFailure E_NOT_LOSSLESS, E_ILL_CONDITIONED, E_NO_CONVERGENCE, E_CHOICE
 */
export function fittedParts(given: ReadRequest, tolerance: number, open: number): Parts {
  const { order, sides } = given;
  const roots = [...(given.poles ?? []), ...(given.reflectionZeros ?? []), ...given.transmissionZeros];
  const largest = Math.max(...roots.map(({ re, im }) => Math.hypot(re, im)));
  const unit = 2 ** Math.round(Math.log2(largest > 0 ? largest : sizeOf(given)));
  const down = (list: readonly FineRoot[]): readonly FineRoot[] => list.map((root) => times(root, 1 / unit));
  const transmissionZeros = down(given.transmissionZeros);
  const epsilon = given.epsilon * unit ** (order - transmissionZeros.length);
  const poles = given.poles === undefined ? undefined : down(given.poles);
  const reflectionZeros =
    given.reflectionZeros === undefined
      ? reflectionZerosOf({ poles: poles ?? [], transmissionZeros, epsilon }, sides, { limit: tolerance, open })
      : down(given.reflectionZeros);
  const epsilonR = given.epsilonR * unit ** (order - reflectionZeros.length);
  const zeros = { reflectionZeros, transmissionZeros, epsilon, epsilonR };
  if (poles !== undefined) checkAgreement({ poles, ...zeros }, unit, tolerance);
  const fitted = { poles: polesOf(zeros, poles), ...zeros };
  checkFitted(fitted, unit);
  const up = (list: readonly FineRoot[]): readonly FineRoot[] => list.map((root) => times(root, unit));
  return {
    poles: up(fitted.poles),
    reflectionZeros: given.reflectionZeros ?? up(reflectionZeros),
    transmissionZeros: given.transmissionZeros,
    epsilon: given.epsilon,
    epsilonR: given.epsilonR,
  };
}

/** Radius of the poles when all zeros lie at 0: `epsilon^(-1/N)`. */
const sizeOf = ({ order, epsilon }: ReadRequest): number => epsilon ** (-1 / order);

function times({ re, im, imRest }: FineRoot, factor: number): FineRoot {
  const scaled = { re: re === 0 ? 0 : re * factor, im: im * factor };
  return imRest === undefined ? scaled : { ...scaled, imRest: imRest * factor };
}

function checkAgreement(parts: Parts, unit: number, limit: number): void {
  const { omega, value } = largestDefect(parts);
  if (value <= limit) return;
  throw refusal(
    'E_NOT_LOSSLESS',
    'roots',
    `a power balance off by ${value.toPrecision(3)}`,
    limit,
    `it is so at omega = ${(omega * unit).toPrecision(6)}; poles, zeros and constants contradict each other: leave one of them out`,
  );
}

/** Roots whose rounding alone breaks the balance: poles within rounding of the axis. */
function checkFitted(parts: Parts, unit: number): void {
  const { omega, value } = largestDefect(parts);
  if (value <= LARGEST_DEFECT && parts.poles.every(({ re }) => re < 0)) return;
  throw refusal(
    'E_ILL_CONDITIONED',
    'roots',
    `a power balance off by ${value.toPrecision(3)}`,
    LARGEST_DEFECT,
    `it is rounding of the roots next to omega = ${(omega * unit).toPrecision(6)}; move zeros there further from the axis`,
  );
}
