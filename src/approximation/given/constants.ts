import { refusal } from '../../numerics/index.js';
import { SIX_DIGITS } from './fit.js';
import { readPositive } from './read-roots.js';

/** Counts and constants as a caller has them. */
export interface GivenConstants {
  readonly order: number;
  readonly reflectionCount: number;
  readonly transmissionCount: number;
  readonly epsilon?: unknown;
  readonly epsilonR?: unknown;
}

/**
 * Both constants, lossless at infinite frequency: 1 where the other response vanishes there; otherwise the larger of `1/epsilon`
 * and `1/epsilonR` follows from the smaller, which holds more digits of both.
 *
 * @throws FilterFailure E_NOT_LOSSLESS, E_POLYNOMIALS, E_TYPE, E_NOT_FINITE
 */
export function losslessConstants(given: GivenConstants): { readonly epsilon: number; readonly epsilonR: number } {
  const { order, reflectionCount, transmissionCount } = given;
  if (transmissionCount < order)
    return { epsilon: needed('epsilon', given.epsilon), epsilonR: one('epsilonR', given.epsilonR) };
  if (reflectionCount < order)
    return { epsilon: one('epsilon', given.epsilon), epsilonR: needed('epsilonR', given.epsilonR) };
  const epsilon = given.epsilon === undefined ? undefined : readPositive('epsilon', given.epsilon);
  const epsilonR = given.epsilonR === undefined ? undefined : readPositive('epsilonR', given.epsilonR);
  if (epsilon === undefined) {
    const only = above1('epsilonR', needed('epsilonR', epsilonR));
    return { epsilon: partner(only), epsilonR: only };
  }
  if (epsilonR === undefined) return { epsilon: above1('epsilon', epsilon), epsilonR: partner(epsilon) };
  const defect = Math.abs(1 / epsilon ** 2 + 1 / epsilonR ** 2 - 1);
  if (!(defect <= SIX_DIGITS)) refuseFar('epsilon', defect);
  return epsilon > epsilonR ? { epsilon, epsilonR: partner(epsilon) } : { epsilon: partner(epsilonR), epsilonR };
}

/** `1/x^2 + 1/partner^2 = 1`: `x/sqrt(x^2 - 1)`. */
const partner = (x: number): number => x / Math.sqrt((x - 1) * (x + 1));

function needed(name: string, value: unknown): number {
  if (value !== undefined) return readPositive(name, value);
  throw refusal('E_TYPE', name, value, 'a number above 0', 'the roots alone leave it open');
}

function one(name: string, value: unknown): number {
  if (value === undefined) return 1;
  const defect = Math.abs(readPositive(name, value) - 1);
  if (defect <= SIX_DIGITS) return 1;
  refuseFar(name, defect);
}

function above1(name: string, value: number): number {
  if (value > 1) return value;
  const hint =
    'with as many zeros as poles a constant of 1 leaves nothing for the other response at infinite frequency';
  throw refusal('E_NOT_LOSSLESS', name, value, 'a number above 1', hint);
}

function refuseFar(name: string, defect: number): never {
  throw refusal(
    'E_NOT_LOSSLESS',
    name,
    `a power balance off by ${defect.toPrecision(3)} at infinite frequency`,
    SIX_DIGITS,
    'E, F monic and P with a leading coefficient of size 1; the constants must fit their degrees',
  );
}
