interface Run {
  readonly mean: number;
  readonly count: number;
}

/**
 * Moves labels along a line so that neighbors keep a distance and all stay between two ends; the order is kept, no label
 * moves where none is in the way, and labels that crowd stand evenly about the middle of their places. Positions ascend;
 * there must be room for all of them.
 *
 * Least squares under an order (pool adjacent violators; R. E. Barlow and others, Statistical Inference under Order
 * Restrictions, 1972; from memory).
 */
export function spread(positions: readonly number[], spacing: number, least: number, most: number): number[] {
  // With the distance taken off, positions have to ascend only.
  const runs: Run[] = [];
  positions.forEach((position, n) => {
    let run: Run = { mean: position - n * spacing, count: 1 };
    for (let before = runs.at(-1); before !== undefined && before.mean > run.mean; before = runs.at(-1)) {
      runs.pop();
      const count = before.count + run.count;
      run = { mean: (before.mean * before.count + run.mean * run.count) / count, count };
    }
    runs.push(run);
  });
  const highest = most - (positions.length - 1) * spacing;
  const shifts = runs.flatMap(({ mean, count }) => Array.from({ length: count }, () => mean));
  return shifts.map((shift, n) => Math.max(Math.min(shift, highest), least) + n * spacing);
}

/** At most so many items of a list, evenly picked, first and last among them. */
export function thinned<T>(items: readonly T[], most: number): T[] {
  if (items.length <= most) return [...items];
  if (most < 1) return [];
  const step = most === 1 ? 0 : (items.length - 1) / (most - 1);
  return Array.from({ length: most }, (_, n) => items[Math.round(n * step)] as T);
}
