/**
 * Moves labels along a line so that neighbors keep a distance and all stay between two ends; the order is kept, and no label
 * moves where none is in the way. Positions ascend; there must be room for all of them.
 */
export function spread(positions: readonly number[], spacing: number, least: number, most: number): number[] {
  const placed: number[] = [];
  positions.forEach((position, n) => {
    placed.push(Math.max(position, n === 0 ? least : (placed[n - 1] as number) + spacing));
  });
  for (let n = placed.length - 1; n >= 0; n--) {
    placed[n] = Math.min(placed[n] as number, n === placed.length - 1 ? most : (placed[n + 1] as number) - spacing);
  }
  return placed;
}

/** At most so many items of a list, evenly picked, first and last among them. */
export function thinned<T>(items: readonly T[], most: number): T[] {
  if (items.length <= most) return [...items];
  if (most < 1) return [];
  const step = most === 1 ? 0 : (items.length - 1) / (most - 1);
  return Array.from({ length: most }, (_, n) => items[Math.round(n * step)] as T);
}
