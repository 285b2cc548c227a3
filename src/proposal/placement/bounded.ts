import { type Equalized, equalize, lobeGradients } from './equalize.js';
import type { LineProblem } from './lobes.js';

/** Bounds of the free zeros, by their rank from below. */
export interface NodeBounds {
  readonly low: readonly number[];
  readonly high: readonly number[];
}

/** A placement under bounds: free zeros with equal lobes, and zeros that stand on a bound. */
export interface Bounded extends Equalized {
  /** The problem of the free zeros alone; the pinned ones are part of its field. */
  readonly free: LineProblem;
  readonly pinned: readonly number[];
  /** For each pinned zero, 1 where its bound is an upper one, -1 where a lower one. */
  readonly sides: readonly (1 | -1)[];
}

/**
 * The best placement with every zero inside its bounds: the zero farthest outside is put on its bound, where it becomes part
 * of the field and its two lobes merge, and the others are placed again, until none is outside.
 *
 * What remains is optimal for the free zeros by the same theorem; the pinned ones are checked by the caller through
 * `pullOf`.
 */
export function placeBounded(problem: LineProblem, bounds: NodeBounds): Bounded {
  let low = [...bounds.low];
  let high = [...bounds.high];
  let free = problem;
  const pinned: number[] = [];
  const sides: (1 | -1)[] = [];
  for (;;) {
    const placed = equalize(free);
    const [worst, at, side] = farthestOutside(placed.nodes, low, high);
    if (worst === undefined) return { ...placed, free, pinned, sides };
    pinned.push(at);
    sides.push(side);
    low = low.filter((_, j) => j !== worst);
    high = high.filter((_, j) => j !== worst);
    free = { ...free, count: free.count - 1, field: [...free.field, { at, weight: 1 }] };
  }
}

function farthestOutside(
  nodes: readonly number[],
  low: readonly number[],
  high: readonly number[],
): readonly [number | undefined, number, 1 | -1] {
  let worst: number | undefined;
  let excess = 0;
  let bound = 0;
  let side: 1 | -1 = 1;
  nodes.forEach((node, j) => {
    for (const [outside, at, end] of [
      [(low[j] as number) - node, low[j] as number, -1],
      [node - (high[j] as number), high[j] as number, 1],
    ] as const) {
      if (outside > excess) [worst, excess, bound, side] = [j, outside, at, end];
    }
  });
  return [worst, bound, side];
}

/** Derivative of the best margin, dB, with respect to the position of a pinned zero, from the weights of the lobes. */
export function pullOf({ free, lobes }: Bounded, weights: readonly number[], at: number): number {
  const slopes = lobeGradients(free, [at], lobes);
  return slopes.reduce((sum, [slope], i) => sum + (weights[i] as number) * (slope as number), 0);
}
