import type { FineRoot } from '../../forms/index.js';
import { refusal } from '../../numerics/index.js';
import { losslessConstants } from './constants.js';
import type { RootsRequest } from './from-roots.js';
import { checkHurwitz, checkNoCommon, readRoots } from './read-roots.js';
import type { ReflectionSides } from './sides.js';

/** A request whose lists and constants have been checked one by one; what is absent is to be found. */
export interface ReadRequest {
  readonly order: number;
  readonly poles: readonly FineRoot[] | undefined;
  readonly reflectionZeros: readonly FineRoot[] | undefined;
  readonly transmissionZeros: readonly FineRoot[];
  readonly sides: ReflectionSides | undefined;
  readonly epsilon: number;
  readonly epsilonR: number;
}

/** @throws FilterFailure E_NOT_HURWITZ, E_NOT_LOSSLESS, E_ORDER_RANGE, E_POLYNOMIALS, E_TYPE, E_NOT_FINITE */
export function readRequest(request: RootsRequest): ReadRequest {
  const transmissionZeros = readRoots('transmissionZeros', request.transmissionZeros ?? []);
  const poles = request.poles === undefined ? undefined : readRoots('poles', request.poles);
  const sides = poles === undefined ? undefined : sidesIn(request.reflectionZeros);
  const isOpen = poles !== undefined && (request.reflectionZeros === undefined || sides !== undefined);
  const reflectionZeros = isOpen ? undefined : readRoots('reflectionZeros', request.reflectionZeros);
  const most = Math.max(reflectionZeros?.length ?? 0, transmissionZeros.length);
  const order = poles?.length ?? most;
  const reflectionCount = reflectionZeros?.length ?? order;
  const transmissionCount = transmissionZeros.length;
  if (order < 1 || Math.max(reflectionCount, transmissionCount) !== order)
    refuseCounts(order, reflectionCount, transmissionCount);
  if (poles !== undefined) checkHurwitz(poles);
  if (reflectionZeros !== undefined) checkNoCommon(reflectionZeros, transmissionZeros);
  const { epsilon, epsilonR } = request;
  const constants = losslessConstants({ order, reflectionCount, transmissionCount, epsilon, epsilonR });
  return { order, poles, reflectionZeros, transmissionZeros, sides, ...constants };
}

/** A word or a list of signs says on which side zeros lie; a list of roots, also an empty one, are the zeros. */
function sidesIn(value: RootsRequest['reflectionZeros']): ReflectionSides | undefined {
  if (!Array.isArray(value)) return value as ReflectionSides | undefined;
  return value.some((each) => typeof each === 'number') ? (value as readonly number[]) : undefined;
}

function refuseCounts(order: number, reflection: number, transmission: number): never {
  throw refusal(
    'E_POLYNOMIALS',
    'roots',
    `${order} poles, ${reflection} and ${transmission} zeros`,
    'at least 1 pole, as many zeros of one kind and no more of the other',
    'complete the lists',
  );
}
