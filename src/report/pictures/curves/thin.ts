/** A point of a drawing, pixels. */
export type Point = readonly [number, number];

/** Largest distance, pixels, between a curve and its thinned form. */
const TOLERANCE = 0.12;

/** Square of the distance of `p` from the segment a-b. */
function distanceSquared([px, py]: Point, [ax, ay]: Point, [bx, by]: Point): number {
  const [dx, dy] = [bx - ax, by - ay];
  const length = dx * dx + dy * dy;
  const t = length === 0 ? 0 : Math.max(0, Math.min(1, ((px - ax) * dx + (py - ay) * dy) / length));
  return (px - ax - t * dx) ** 2 + (py - ay - t * dy) ** 2;
}

/** The point between two that lies farthest from the straight line through them. */
function farthest(points: readonly Point[], from: number, to: number): { readonly at: number; readonly size: number } {
  let [at, size] = [from, 0];
  for (let n = from + 1; n < to; n += 1) {
    const here = distanceSquared(points[n] as Point, points[from] as Point, points[to] as Point);
    if (here > size) [at, size] = [n, here];
  }
  return { at, size };
}

/**
 * The fewest of the given points whose line stays within a tenth of a pixel of the whole.
 *
 * Source: D. H. Douglas, T. K. Peucker, Algorithms for the reduction of the number of points required to represent a
 * digitized line, Cartographica 10(2), 1973 (from memory).
 */
export function thinned(points: readonly Point[]): readonly Point[] {
  if (points.length < 3) return points;
  const keep = new Uint8Array(points.length);
  keep[0] = 1;
  keep[points.length - 1] = 1;
  const open: (readonly [number, number])[] = [[0, points.length - 1]];
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    const [from, to] = next;
    const { at, size } = farthest(points, from, to);
    if (size <= TOLERANCE * TOLERANCE) continue;
    keep[at] = 1;
    open.push([from, at], [at, to]);
  }
  return points.filter((_, n) => keep[n] === 1);
}
