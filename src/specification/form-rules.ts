import type { Fault } from './faults.js';
import type { PortCouplings, SpecificationFamily, Topology } from './specification.js';

/** What decides how many zeros a coupling form can hold. */
export interface FormRequest {
  readonly order: number;
  readonly zeros: number;
  readonly family: SpecificationFamily;
  /** An elliptic response of even order with its largest pair of zeros at infinity. */
  readonly isMoved: boolean;
  readonly topology: Topology;
  readonly portCouplings: PortCouplings;
}

function zerosText(count: number): string {
  return `${count} ${count === 1 ? 'zero' : 'zeros'}`;
}

/** How many zeros fewer than the order the ports leave room for. */
const PORT_COST: Readonly<Record<PortCouplings, number>> = { any: 0, noDirect: 1, single: 2 };

/** Families with a stop band of their own place their zeros themselves: an even number, the order less one for odd orders. */
function placesZeros(family: SpecificationFamily): boolean {
  return family === 'inverseChebyshev' || family === 'elliptic';
}

/** How many finite zeros the response has: those asked for, or those that its family places. */
function countOf({ order, zeros, family, isMoved }: FormRequest): number {
  if (!placesZeros(family)) return zeros;
  if (order % 2 === 1) return order - 1;
  return family === 'elliptic' && isMoved ? order - 2 : order;
}

/** What to do about zeros that are too many: they can be removed only where they were asked for. */
function fewer({ order, family, isMoved }: FormRequest, surplus: number): string {
  if (!placesZeros(family)) return `remove ${surplus}`;
  if (family === 'elliptic' && order % 2 === 0 && !isMoved && surplus <= 2) return 'set largestPairAtInfinity to true';
  return 'choose another family';
}

function familyFault({ zeros, family }: FormRequest): Fault | undefined {
  if (family === 'generalizedChebyshev' || zeros === 0) return undefined;
  return {
    code: 'E_ZERO_COUNT',
    path: ['transmissionZeros'],
    found: `${zerosText(zeros)} with family "${family}"`,
    allowed: placesZeros(family)
      ? 'none: this family places its own'
      : 'none: this family has all its zeros at infinity',
    advice: 'remove the zeros, or set family to "generalizedChebyshev"',
    value: zeros,
    limit: 0,
  };
}

function inlineFault(request: FormRequest): Fault | undefined {
  const { order, topology, family } = request;
  const zeros = countOf(request);
  if (topology !== 'inline' || zeros === 0) return undefined;
  return {
    code: 'E_TOPOLOGY_ZEROS',
    path: ['topology'],
    found: `${zerosText(zeros)} for an in-line chain, whose shortest path from source to load passes k = ${order} resonators`,
    allowed: `at most N-k = ${order}-${order} = 0 zeros`,
    advice: `${placesZeros(family) ? 'choose another family' : `remove ${zerosText(zeros)}`}, or set topology to "folded"`,
    value: zeros,
    limit: 0,
  };
}

function portAdvice(request: FormRequest, zeros: number, limit: number): string {
  const { order, portCouplings } = request;
  const remove = fewer(request, zeros - limit);
  const wider = portCouplings === 'single' && zeros <= order - 1 ? '"noDirect" or "any"' : '"any"';
  const why =
    zeros === order ? ' to turn the direct source-load coupling on' : ' to let the ports touch more resonators';
  return `set portCouplings to ${wider}${why}, or ${remove}`;
}

function portFault(request: FormRequest): Fault | undefined {
  const { order, portCouplings } = request;
  const zeros = countOf(request);
  const limit = Math.max(0, order - PORT_COST[portCouplings]);
  if (zeros <= limit) return undefined;
  const kind =
    portCouplings === 'single' ? 'source and load touching one resonator each' : 'no direct source-load coupling';
  return {
    code: 'E_ZERO_TOPOLOGY',
    path: ['portCouplings'],
    found: `${zerosText(zeros)} for order ${order} with ${kind}`,
    allowed: `at most N-${PORT_COST[portCouplings]} = ${limit}`,
    advice: portAdvice(request, zeros, limit),
    value: zeros,
    limit,
  };
}

/** A form whose ports touch several resonators by definition contradicts `single`. */
function singleFault(request: FormRequest): Fault | undefined {
  const { order, topology, portCouplings } = request;
  const zeros = countOf(request);
  if (portCouplings !== 'single' || order === 1) return undefined;
  const spread = topology === 'transversal' || (topology === 'arrow' && zeros > 0);
  if (!spread) return undefined;
  const touched =
    topology === 'transversal'
      ? 'both ports touch every resonator'
      : 'the load touches one resonator more for each zero';
  return {
    code: 'E_ZERO_TOPOLOGY',
    path: ['portCouplings'],
    found: `"single" with topology "${topology}", where ${touched}`,
    allowed: '"any" or "noDirect" with this topology',
    advice: 'turn on more port couplings, or set topology to "folded"',
    value: portCouplings,
  };
}

/** What the family, the form of the matrix and its ports refuse about the number of zeros; the first reason only. */
export function formFaults(request: FormRequest): readonly Fault[] {
  if (request.zeros > request.order) return [];
  const fault = familyFault(request) ?? inlineFault(request) ?? portFault(request) ?? singleFault(request);
  return fault === undefined ? [] : [fault];
}
