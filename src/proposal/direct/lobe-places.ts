import { EPS, refusal } from '../../numerics/index.js';
import { denseSolve } from '../placement/dense-solve.js';
import { kernelSlope, omegaFromLine } from '../placement/line.js';
import { type LineProblem, type Lobe, lobeOf } from '../placement/lobes.js';
import { potentialFor, rejectionSlope } from '../placement/rejection-level.js';

/** The direct problem, checked: lobe levels from the band outward, on both sides. */
export interface LobeProblem {
  readonly above: readonly number[];
  readonly below: readonly number[];
  readonly atInfinity: number;
  readonly kappa: number;
}

/** Rounds before the search is given up; 5,000 random sets of levels took 6 in the median and 13 at most. */
const MOST_ROUNDS = 100;

/** How much one step may change the distance of two neighbors: by these factors. */
const SHRINK = 0.3;
const STRETCH = 3;

/**
 * Zeros, ascending in omega, whose lobes have the given levels. Unknown are the distances on the line between neighbors (a
 * side ends at infinity, t = 0); Newton on the levels, the distances kept positive.
 *
 * @throws FilterFailure E_NO_CONVERGENCE
 */
export function lobePlaces(problem: LobeProblem): readonly number[] {
  // From infinity outward to the band on each side: the order of the distances.
  const levels = { above: [...problem.above].reverse(), below: [...problem.below].reverse() };
  const wanted = [...levels.below, ...levels.above];
  let gaps = wanted.map((level, k) => firstGap(problem, level, k === 0 || k === levels.below.length));
  let best = Number.POSITIVE_INFINITY;
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const { nodes, lobes, rows } = linearized(problem, gaps, levels.below.length);
    const missing = lobes.map(({ marginDb }, k) => (wanted[k] as number) - marginDb);
    const error = Math.max(0, ...missing.map(Math.abs));
    const settled = error <= 32 * EPS * Math.max(1, ...wanted) || (error < 1e-10 && error >= best);
    if (settled) return nodes.map(omegaFromLine).sort((a, b) => a - b);
    best = Math.min(best, error);
    const step = denseSolve(rows, missing);
    if (step === undefined) break;
    gaps = gaps.map((gap, k) => Math.min(Math.max(gap + (step[k] as number), SHRINK * gap), STRETCH * gap));
  }
  throw refusal(
    'E_NO_CONVERGENCE',
    'above and below',
    `no zeros found for ${wanted.length} lobes`,
    'levels that can be reached',
    'bring the levels closer together',
  );
}

/** The pitch of an endless row of zeros with this level; the first distance carries the zeros at infinity too. */
function firstGap({ atInfinity, kappa }: LobeProblem, level: number, first: boolean): number {
  const pitch = (Math.PI * Math.PI) / 4 / (potentialFor(level, kappa) + 0.7);
  return first ? pitch * (1 + atInfinity / 2) : pitch;
}

/** Zeros, lobes and the derivatives of the lobe levels with respect to the distances. */
function linearized(
  { atInfinity, kappa }: LobeProblem,
  gaps: readonly number[],
  belowCount: number,
): { nodes: readonly number[]; lobes: readonly Lobe[]; rows: number[][] } {
  const nodes: number[] = [];
  gaps.forEach((gap, k) => {
    const before = k === 0 || k === belowCount ? 0 : (nodes[k - 1] as number);
    nodes.push(k < belowCount ? before - gap : before + gap);
  });
  const sorted = [...nodes].sort((a, b) => a - b);
  const field = [{ at: 0, weight: atInfinity }];
  const lobes = nodes.map((node, k) => {
    const inner = k === 0 || k === belowCount ? 0 : (nodes[k - 1] as number);
    const segment = { low: Math.min(node, inner), high: Math.max(node, inner), level: 0, source: k };
    const problem: LineProblem = { count: nodes.length, field, segments: [segment], kappa };
    // The lobe above a zero has the next rank, the one below it the rank of the zero.
    const rank = sorted.indexOf(node) + (node < inner ? 1 : 0);
    return lobeOf(problem, sorted, rank);
  });
  const rows = lobes.map(({ at, potential }) => {
    const slope = rejectionSlope(potential, kappa);
    const byNode = nodes.map((node) => -slope * kernelSlope(at - node));
    return gaps.map((_, k) => {
      const below = k < belowCount;
      const end = below ? belowCount : nodes.length;
      let sum = 0;
      for (let j = k; j < end; j++) sum += byNode[j] as number;
      return below ? -sum : sum;
    });
  });
  return { nodes, lobes, rows };
}
