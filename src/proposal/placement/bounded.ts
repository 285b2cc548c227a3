import { type Equalized, equalize, lobeGradients } from './equalize.js';
import type { LineProblem } from './lobes.js';
import { lobeWeights } from './multipliers.js';

/** Where one free zero may stand, ends included. */
export interface NodeBounds {
  readonly low: number;
  readonly high: number;
}

/** A zero on its bound; side 1 where that is the upper one. */
export interface Pinned extends NodeBounds {
  readonly at: number;
  readonly side: 1 | -1;
}

/** A placement under bounds: free zeros with equal lobes, and zeros that stand on a bound. */
export interface Bounded extends Equalized {
  readonly pinned: readonly Pinned[];
  /** Share of each lobe in the best margin; they add up to 1. */
  readonly weights: readonly number[];
}

/** A pinned zero is held when the margin grows by less than this, dB, for each unit it moves inside. */
const LOOSE = 1e-6;

/**
 * The best placement with every zero inside its bounds, which are given from below and do not fall; undefined when the search
 * does not end.
 *
 * The zero farthest outside is put on its bound, where it becomes part of the field and its two lobes merge, and the others are
 * placed again, until none is outside; then a zero that the margin pulls off its bound is set free again. What remains is
 * optimal for the free zeros by the theorem, and every pinned one presses against its bound.
 */
export function placeBounded(problem: LineProblem, bounds: readonly NodeBounds[]): Bounded | undefined {
  let free = bounds;
  let pinned: readonly Pinned[] = [];
  for (let turn = 0; turn <= 4 * bounds.length; turn++) {
    const own = withField(problem, free.length, pinned);
    const placed = equalize(own);
    const outside = farthestOutside(placed.nodes, free);
    if (outside !== undefined) {
      free = free.filter((_, j) => j !== outside.index);
      pinned = [...pinned, outside.pinned];
      continue;
    }
    const weights = lobeWeights(lobeGradients(own, placed.nodes, placed.lobes));
    if (weights === undefined) return undefined;
    const loose = loosest(own, placed, weights, pinned);
    if (loose === undefined) return { ...placed, pinned, weights };
    pinned = pinned.filter((each) => each !== loose);
    free = [...free, loose].sort((a, b) => a.low - b.low || a.high - b.high);
  }
  return undefined;
}

function withField(problem: LineProblem, count: number, pinned: readonly Pinned[]): LineProblem {
  return { ...problem, count, field: [...problem.field, ...pinned.map(({ at }) => ({ at, weight: 1 }))] };
}

function farthestOutside(
  nodes: readonly number[],
  bounds: readonly NodeBounds[],
): { readonly index: number; readonly pinned: Pinned } | undefined {
  let worst: { index: number; pinned: Pinned } | undefined;
  let excess = 0;
  nodes.forEach((node, index) => {
    const { low, high } = bounds[index] as NodeBounds;
    if (low - node > excess) [worst, excess] = [{ index, pinned: { low, high, at: low, side: -1 } }, low - node];
    if (node - high > excess) [worst, excess] = [{ index, pinned: { low, high, at: high, side: 1 } }, node - high];
  });
  return worst;
}

/** The pinned zero that gains most by moving inside, if one gains at all: derivative of the best margin by the lobe weights. */
function loosest(
  problem: LineProblem,
  { lobes }: Equalized,
  weights: readonly number[],
  pinned: readonly Pinned[],
): Pinned | undefined {
  let loosestOne: Pinned | undefined;
  let gain = LOOSE;
  for (const each of pinned) {
    const slopes = lobeGradients(problem, [each.at], lobes);
    const inside = -each.side * slopes.reduce((sum, [slope], i) => sum + (weights[i] as number) * (slope as number), 0);
    if (inside > gain) [loosestOne, gain] = [each, inside];
  }
  return loosestOne;
}
