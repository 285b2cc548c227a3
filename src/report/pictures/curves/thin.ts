/** A point of a drawing, pixels. */
export type Point = readonly [number, number];

/** Largest distance, pixels, between a curve and its thinned form. */
const TOLERANCE = 0.12;

/** Coordinates in two arrays: this is the one loop of the pictures that thousands of points go through. */
interface Track {
  readonly xs: Float64Array;
  readonly ys: Float64Array;
}

/** The point between two that lies farthest from the segment through them, and the square of its distance. */
function farthest({ xs, ys }: Track, from: number, to: number): { readonly at: number; readonly size: number } {
  const ax = xs[from] as number;
  const ay = ys[from] as number;
  const dx = (xs[to] as number) - ax;
  const dy = (ys[to] as number) - ay;
  const length = dx * dx + dy * dy;
  let at = from;
  let size = 0;
  for (let n = from + 1; n < to; n += 1) {
    const px = (xs[n] as number) - ax;
    const py = (ys[n] as number) - ay;
    const share = length === 0 ? 0 : (px * dx + py * dy) / length;
    const t = Math.min(Math.max(share, 0), 1);
    const here = (px - t * dx) * (px - t * dx) + (py - t * dy) * (py - t * dy);
    if (here > size) {
      size = here;
      at = n;
    }
  }
  return { at, size };
}

/**
 * The fewest of the given points whose line stays within a tenth of a pixel of the whole.
 *
 * Source: D. H. Douglas, T. K. Peucker, Algorithms for the reduction of the number of points required to represent a
 * digitized line, Cartographica 10(2), 1973 (from memory).
 */
export function thinned(xs: Float64Array, ys: Float64Array): readonly Point[] {
  const keep = new Uint8Array(xs.length);
  const last = xs.length - 1;
  const open = last > 1 ? [0, last] : [];
  keep.fill(1, 0, Math.min(1, xs.length));
  if (last > 0) keep[last] = 1;
  while (open.length > 0) {
    const to = open.pop() as number;
    const from = open.pop() as number;
    const { at, size } = farthest({ xs, ys }, from, to);
    if (size <= TOLERANCE * TOLERANCE) continue;
    keep[at] = 1;
    open.push(from, at, at, to);
  }
  const points: Point[] = [];
  keep.forEach((isKept, n) => {
    if (isKept === 1) points.push([xs[n] as number, ys[n] as number]);
  });
  return points;
}
