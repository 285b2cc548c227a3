import { localMinimum } from '../numerics/index.js';

/** Where a margin is smallest, and how small. */
export interface WorstPoint {
  readonly hz: number;
  readonly margin: number;
}

/**
 * Smallest value of a margin over sorted sample frequencies: every sample that is no higher than its neighbors is followed
 * down between them, the first and the last one too: a margin may fall just inside the end of its span.
 */
export function worstPoint(points: Float64Array, margins: Float64Array, marginAt: (hz: number) => number): WorstPoint {
  let worst: WorstPoint = { hz: points[0] as number, margin: margins[0] as number };
  const keep = (hz: number, margin: number): void => {
    if (margin < worst.margin) worst = { hz, margin };
  };
  for (let n = 0; n < points.length; n++) {
    const here = margins[n] as number;
    keep(points[n] as number, here);
    const [before, after] = [Math.max(n - 1, 0), Math.min(n + 1, points.length - 1)];
    if (before === after || here > (margins[before] as number) || here > (margins[after] as number)) continue;
    const found = localMinimum(marginAt, points[before] as number, points[after] as number);
    keep(found.x, found.value);
  }
  return worst;
}
