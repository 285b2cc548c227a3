import { equalizeNear } from '../placement/equalize.js';
import type { LineProblem } from '../placement/lobes.js';
import type { Coordinate } from '../placement/mask-pieces.js';
import { rejectionDb } from '../placement/rejection-level.js';
import { bestStep } from './linear-program.js';
import { type LossyMinimum, type LossySegment, lossyMinima } from './lossy-minima.js';
import { attenuationDb, gradientOf, type LossyResponse, lossyResponse } from './lossy-response.js';

/** A placement problem with loss. */
export interface LossyProblem {
  readonly order: number;
  readonly returnLossDb: number;
  readonly sigma: number;
  readonly line: LineProblem;
  readonly segments: readonly LossySegment[];
  readonly coordinate: Coordinate;
  /** Called before every step: a chance to stop. */
  readonly step?: () => void;
}

/** Zeros with their lossy minima and the local certificate: weights of the minima, and what a small move still promises. */
export interface Refined {
  readonly nodes: readonly number[];
  readonly marginDb: number;
  readonly minima: readonly (LossyMinimum & { readonly weight: number })[];
  /** First-order gain, dB, that a move of every zero by at most `CHECK_RADIUS` on the line promises. */
  readonly promisedDb: number;
  readonly steps: number;
}

interface Point {
  readonly nodes: readonly number[];
  readonly response: LossyResponse;
  readonly minima: readonly LossyMinimum[];
  readonly marginDb: number;
}

/** First and largest move of a zero in one step, on the line; the smallest below which the search ends. */
const FIRST_RADIUS = 0.02;
const LARGEST_RADIUS = 0.1;
const SMALLEST_RADIUS = 1e-8;

/** Radius of the final check: 0.1 % of a usual distance from the band edge. */
const CHECK_RADIUS = 1e-4;

/** Promised gains below this, dB, end the search. */
const SETTLED_DB = 1e-7;

/** Steps that are slow where loss leaves fewer minima than zeros; usual ones need three. */
const MOST_STEPS = 150;

/** Rounds with held loss, how far its change settles, and how equal the lobes are made: the linear program does the rest. */
const FROZEN_ROUNDS = 8;
const FROZEN_DB = 1e-3;
const FROZEN_SPREAD_DB = 1e-4;

/**
 * The best zeros with loss near those without: first the lossless placement again with the loss at each lobe held, then steps
 * of a linear program over all local minima of the true curve, in a trust region. The multipliers of the last one are a local
 * certificate; the global one of the lossless problem does not cover loss.
 */
export function refineWithLoss(problem: LossyProblem, start: readonly number[]): Refined {
  const frozen = withFrozenLoss(problem, start);
  let here = better(pointAt(problem, start), pointAt(problem, frozen));
  let radius = FIRST_RADIUS;
  let steps = 0;
  while (steps < MOST_STEPS && radius > SMALLEST_RADIUS && problem.line.count > 0) {
    steps++;
    problem.step?.();
    const { step, smallest } = bestStep(modelAt(problem, here), radius);
    const promised = smallest - here.marginDb;
    if (promised < SETTLED_DB) break;
    const tried = pointAt(
      problem,
      here.nodes.map((node, j) => node + (step[j] as number)),
    );
    const share = (tried.marginDb - here.marginDb) / promised;
    if (share > 0.05) here = tried;
    if (share > 0.7) radius = Math.min(2 * radius, LARGEST_RADIUS);
    else if (share < 0.3) radius = 0.3 * Math.min(radius, Math.max(...step.map(Math.abs)));
  }
  const { weights, smallest } = bestStep(modelAt(problem, here), CHECK_RADIUS);
  return {
    nodes: here.nodes,
    marginDb: here.marginDb,
    minima: here.minima.map((minimum, k) => ({ ...minimum, weight: Math.max(0, weights[k] as number) })),
    promisedDb: Math.max(0, smallest - here.marginDb),
    steps,
  };
}

/** Lossless lobes with the loss at each lobe added as a constant, until the constants settle or Newton fails. */
function withFrozenLoss(problem: LossyProblem, start: readonly number[]): readonly number[] {
  let nodes = start;
  let offsets: readonly number[] = [];
  for (let round = 0; round < FROZEN_ROUNDS && problem.line.count > 0; round++) {
    const placed = equalizeNear({ ...problem.line, offsets }, nodes, FROZEN_SPREAD_DB);
    if (placed === undefined) return nodes;
    nodes = placed.nodes;
    const response = lossyResponse(problem.order, problem.returnLossDb, placesOf(problem, nodes), problem.sigma);
    const next = placed.lobes.map(({ at, potential, source }) => {
      const segment = problem.segments.find((each) => each.source === source) as LossySegment;
      const omega = segment.side * problem.coordinate.toOmega(at);
      const reference = segment.relative ? attenuationDb(response, 0) : 0;
      return attenuationDb(response, omega) - reference - rejectionDb(potential, problem.line.kappa);
    });
    if (!next.every(Number.isFinite)) return nodes;
    const change = Math.max(...next.map((offset, i) => Math.abs(offset - (offsets[i] ?? 0))));
    offsets = next;
    if (change < FROZEN_DB) return nodes;
  }
  return nodes;
}

/** Places of single zeros on the line: a pair is two of them. */
export function placesOf(
  { coordinate }: Pick<LossyProblem, 'coordinate'>,
  nodes: readonly number[],
): readonly number[] {
  if (!coordinate.pairs) return nodes;
  return nodes.flatMap((u) => {
    const t = Math.acosh(Math.max(1, Math.exp(2 * u))) / 2;
    return [t, -t];
  });
}

function pointAt(problem: LossyProblem, nodes: readonly number[]): Point {
  const response = lossyResponse(problem.order, problem.returnLossDb, placesOf(problem, nodes), problem.sigma);
  const minima = lossyMinima(response, problem.segments, problem.coordinate, nodes);
  return { nodes, response, minima, marginDb: Math.min(...minima.map(({ marginDb }) => marginDb)) };
}

function modelAt(
  { coordinate }: LossyProblem,
  { response, minima, nodes }: Point,
): {
  values: readonly number[];
  gradients: readonly (readonly number[])[];
} {
  const gradient = gradientOf(response);
  const atCenter = minima.some(({ relative }) => relative) ? gradient(0) : [];
  const gradients = minima.map(({ omega, relative }) => {
    const bySingle = gradient(omega).map((each, j) => each - (relative ? (atCenter[j] as number) : 0));
    if (!coordinate.pairs) return bySingle;
    // dt/du = omega for the upper zero of a pair, from exp(2u) = cosh(2t).
    return nodes.map((u, j) => coordinate.toOmega(u) * ((bySingle[2 * j] as number) - (bySingle[2 * j + 1] as number)));
  });
  return { values: minima.map(({ marginDb }) => marginDb), gradients };
}

const better = (a: Point, b: Point): Point => (b.marginDb > a.marginDb ? b : a);
