import { EPS } from '../../numerics/index.js';
import { denseSolve } from './dense-solve.js';
import { equilibriumStart } from './equilibrium-start.js';
import { kernelSlope } from './line.js';
import { type LineProblem, type Lobe, lobeOf, lobesOf } from './lobes.js';
import { rejectionSlope } from './rejection-level.js';

/** Free zeros with equal lobes, ascending, and the lobes. */
export interface Equalized {
  readonly nodes: readonly number[];
  readonly lobes: readonly Lobe[];
}

/** Rounds before the search is given up; 5,000 random masks took 6 in the median and 16 at most. */
const MOST_ROUNDS = 200;

/** Rounds that suffice from a good start. */
const FEW_ROUNDS = 12;

/** How far toward its neighboring minima a zero may go in one step: the order stays, and no lobe loses its mask. */
const CONFINEMENT = 0.8;

/**
 * Moves the free zeros until the smallest margins of all lobes are equal: the one placement that no other beats.
 *
 * Newton on the differences of neighboring lobes. Its matrix has a positive diagonal, negative entries elsewhere and positive
 * column sums (each zero raises the potential less the farther away it is), so it is regular for any placement. A step is
 * halved until the spread of the margins falls; where that fails, or a lobe has no mask, one sweep of `balanced` follows:
 * the difference of the two lobes beside a zero rises with its position alone.
 */
export function equalize(problem: LineProblem): Equalized {
  let nodes: readonly number[] = equilibriumStart(problem);
  let lobes = lobesOf(problem, nodes);
  let spread = spreadOf(lobes);
  let rounds = 0;
  let idle = 0;
  while (rounds < MOST_ROUNDS && problem.count > 0) {
    if (spread <= roundingOf(lobes)) break;
    rounds++;
    const stepped = newton(problem, nodes, lobes, spread);
    if (stepped !== undefined) {
      ({ nodes, lobes } = stepped);
      spread = spreadOf(lobes);
      idle = 0;
      continue;
    }
    // At the rounding floor neither method gains anything: two idle sweeps end the search.
    if (idle === 2) break;
    const swept = sweepOnce(problem, nodes);
    const sweptLobes = lobesOf(problem, swept);
    const sweptSpread = spreadOf(sweptLobes);
    idle = sweptSpread < 0.99 * spread || !Number.isFinite(spread) ? 0 : idle + 1;
    if (sweptSpread > spread) break;
    [nodes, lobes, spread] = [swept, sweptLobes, sweptSpread];
  }
  return { nodes, lobes };
}

/** A few Newton steps from zeros that are nearly right; undefined where Newton alone does not get the lobes within `spreadDb`. */
export function equalizeNear(problem: LineProblem, start: readonly number[], spreadDb: number): Equalized | undefined {
  let here = { nodes: start, lobes: lobesOf(problem, start) };
  for (let round = 0; round < FEW_ROUNDS; round++) {
    const spread = spreadOf(here.lobes);
    if (spread <= spreadDb) return here;
    const stepped = newton(problem, here.nodes, here.lobes, spread);
    if (stepped === undefined) return undefined;
    here = stepped;
  }
  return undefined;
}

/** Largest margin minus smallest; Infinity where a lobe has no mask. */
export function spreadOf(lobes: readonly Lobe[]): number {
  const margins = lobes.map(({ marginDb }) => marginDb);
  const spread = Math.max(...margins) - Math.min(...margins);
  return Number.isNaN(spread) ? Number.POSITIVE_INFINITY : spread;
}

/** Rounding of the margins: a sum of about one logarithm a zero, in units of the level itself. */
function roundingOf(lobes: readonly Lobe[]): number {
  return 4 * EPS * Math.max(...lobes.map(({ potential }) => 8.7 * potential), 1);
}

/** `dr_i/ds_j = -R'(G_i)*g'(t_i - s_j)`: by the envelope theorem the place of the minimum may be held. */
export function lobeGradients(problem: LineProblem, nodes: readonly number[], lobes: readonly Lobe[]): number[][] {
  return lobes.map(({ at, potential }) => {
    const slope = rejectionSlope(potential, problem.kappa);
    return nodes.map((node) => -slope * kernelSlope(at - node));
  });
}

function newton(
  problem: LineProblem,
  nodes: readonly number[],
  lobes: readonly Lobe[],
  spread: number,
): { nodes: readonly number[]; lobes: readonly Lobe[] } | undefined {
  if (!Number.isFinite(spread)) return undefined;
  const gradients = lobeGradients(problem, nodes, lobes);
  const differences = nodes.map((_, i) => margin(lobes, i) - margin(lobes, i + 1));
  const rows = nodes.map((_, i) =>
    nodes.map((__, j) => (gradients[i + 1]?.[j] as number) - (gradients[i]?.[j] as number)),
  );
  const step = denseSolve(rows, differences);
  if (step === undefined) return undefined;
  for (let part = 1; part > 1e-3; part /= 2) {
    const tried = nodes.map((node, j) => confined(lobes, j, node, part * (step[j] as number)));
    const triedLobes = lobesOf(problem, tried);
    if (spreadOf(triedLobes) < spread) return { nodes: tried, lobes: triedLobes };
  }
  return undefined;
}

const margin = (lobes: readonly Lobe[], i: number): number => (lobes[i] as Lobe).marginDb;

/** A step of zero j, at most most of the way to the minima of the lobes beside it. */
function confined(lobes: readonly Lobe[], j: number, node: number, step: number): number {
  const room = CONFINEMENT * ((lobes[step > 0 ? j + 1 : j] as Lobe).at - node);
  return node + (Math.abs(step) > Math.abs(room) ? room : step);
}

/** Balances the two lobes beside each zero in turn. */
function sweepOnce(problem: LineProblem, nodes: readonly number[]): readonly number[] {
  const mask = [
    Math.min(...problem.segments.map(({ low }) => low)),
    Math.max(...problem.segments.map(({ high }) => high)),
  ];
  return nodes.reduce<readonly number[]>((moved, _, j) => {
    const low = moved[j - 1] ?? (mask[0] as number);
    const high = moved[j + 1] ?? (mask[1] as number);
    const at = balanced(problem, moved, j, low, high);
    return moved.map((node, k) => (k === j ? at : node));
  }, nodes);
}

function balanced(problem: LineProblem, nodes: readonly number[], j: number, from: number, to: number): number {
  let [low, high] = [from, to];
  for (let turn = 0; turn < 100; turn++) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    const tried = nodes.map((node, k) => (k === j ? middle : node));
    const [before, after] = [lobeOf(problem, tried, j).marginDb, lobeOf(problem, tried, j + 1).marginDb];
    if (after > before) high = middle;
    else low = middle;
  }
  return (low + high) / 2;
}
