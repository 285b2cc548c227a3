/** A pair of nodes that may couple. */
export type NodePair = readonly [number, number];

/** Names of the patterns that need not be spelled out. */
export const PATTERN_NAMES = ['folded', 'arrow'] as const;

/** Name of a pattern. */
export type PatternName = (typeof PATTERN_NAMES)[number];

/**
 * Node pairs that the folded or arrow form of an order may couple. With n finite zeros the shortest way from source to load
 * passes at least N - n resonators, so a coupling may skip n nodes at most.
 */
export function patternPairs(name: PatternName, order: number, finiteZeros: number): readonly NodePair[] {
  const pairs: NodePair[] = [];
  for (let i = 0; i <= order; i += 1) {
    for (let j = i + 1; j <= order + 1; j += 1) {
      const across = name === 'folded' ? i + j === order + 1 || i + j === order + 2 : j === order + 1;
      if (j === i + 1 || (across && j - i <= finiteZeros + 1)) pairs.push([i, j]);
    }
  }
  return pairs;
}
