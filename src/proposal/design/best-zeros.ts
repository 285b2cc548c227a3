import { refineWithLoss } from '../loss/refine.js';
import type { LineProblem } from '../placement/lobes.js';
import { type MaskPiece, PAIRS, SINGLE, segmentsOf, sideOf } from '../placement/mask-pieces.js';
import { placeOnMask } from '../placement/place-on-mask.js';
import { kappaOf } from '../placement/rejection-level.js';
import { upperEnvelope } from '../placement/segments.js';
import type { ZeroPlacement } from '../placement/zero-placement.js';
import type { MaskProblem } from './mask-problem.js';
import type { CheckedRequest } from './request.js';

/** The best zeros at one order and count, with loss where there is any. */
export interface BestZeros {
  readonly order: number;
  readonly zeroCount: number;
  readonly symmetric: boolean;
  readonly transmissionZeros: readonly number[];
  readonly marginDb: number;
  readonly lossless: ZeroPlacement;
  readonly promisedDb?: number;
  readonly costs: readonly Place[];
}

/** A place of the mask near which the margin is small. */
export interface Place {
  readonly line: number;
  readonly omega: number;
  readonly marginDb: number;
  readonly weight: number;
}

/** Finds best zeros, each asked-for pair of numbers once. */
export interface BestZerosTable {
  readonly lossless: (order: number, zeroCount: number, symmetric?: boolean) => ZeroPlacement;
  readonly best: (order: number, zeroCount: number, symmetric?: boolean) => BestZeros;
}

/** `step` is called before every search that takes time. */
export function bestZerosTable(request: CheckedRequest, problem: MaskProblem, step: () => void): BestZerosTable {
  const lossless = remembered((order, zeroCount, symmetric) => {
    step();
    const { returnLossDb } = request;
    return placeOnMask({ order, zeroCount, returnLossDb, pieces: problem.absolute, symmetric });
  });
  const best = remembered((order, zeroCount, symmetric) => {
    const placed = lossless(order, zeroCount, symmetric);
    const found = { order, zeroCount, symmetric, lossless: placed };
    if (request.sigma === 0) {
      const costs = placed.active.map(({ piece, ...place }) => ({ ...place, line: piece }));
      const { transmissionZeros, marginDb } = placed;
      return { ...found, transmissionZeros, marginDb, costs } satisfies BestZeros;
    }
    step();
    return { ...found, ...withLoss(request, problem, placed, symmetric, step) };
  });
  return { lossless, best };
}

function withLoss(
  { returnLossDb, sigma }: CheckedRequest,
  problem: MaskProblem,
  placed: ZeroPlacement,
  symmetric: boolean,
  step: () => void,
): Pick<BestZeros, 'transmissionZeros' | 'marginDb' | 'promisedDb' | 'costs'> {
  const coordinate = symmetric ? PAIRS : SINGLE;
  const { order } = placed;
  const start = placed.transmissionZeros
    .filter((omega) => !symmetric || omega > 0)
    .map(coordinate.fromOmega)
    .sort((a, b) => a - b);
  const share = symmetric ? 2 : 1;
  const line: LineProblem = {
    count: start.length,
    field: [{ at: 0, weight: order / share - start.length }],
    segments: upperEnvelope(segmentsOf(problem.pieces, coordinate)),
    kappa: kappaOf(returnLossDb),
  };
  // Stretches of different sides or references do not hide one another once loss counts: then all are kept.
  const apart = symmetric || problem.pieces.some(({ source }) => problem.relative(source));
  const segments = (apart ? segmentsOf(problem.pieces, coordinate) : line.segments).map((segment) => ({
    ...segment,
    relative: problem.relative(segment.source),
    side: symmetric
      ? sideOf(problem.pieces.find(({ source }) => source === segment.source) as MaskPiece)
      : (1 as const),
  }));
  const refined = refineWithLoss({ order, returnLossDb, sigma, line, segments, coordinate, step }, start);
  const zeros = refined.nodes.map(coordinate.toOmega);
  return {
    transmissionZeros: (symmetric ? zeros.flatMap((w) => [w, -w]) : zeros).sort((a, b) => a - b),
    marginDb: refined.marginDb,
    promisedDb: refined.promisedDb,
    costs: refined.minima.map(({ source, omega, marginDb, weight }) => ({ line: source, omega, marginDb, weight })),
  };
}

function remembered<T>(
  find: (order: number, zeroCount: number, symmetric: boolean) => T,
): (order: number, zeroCount: number, symmetric?: boolean) => T {
  const known = new Map<string, T>();
  return (order, zeroCount, symmetric = false) => {
    const key = `${order} ${zeroCount} ${symmetric}`;
    const before = known.get(key);
    if (before !== undefined) return before;
    const found = find(order, zeroCount, symmetric);
    known.set(key, found);
    return found;
  };
}
