/** A point of a drawing, pixels, y downward. */
export type Point = readonly [number, number];

/** An upright rectangle. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** The box, larger by a margin on every side. */
export function grown({ left, top, right, bottom }: Box, margin: number): Box {
  return { left: left - margin, top: top - margin, right: right + margin, bottom: bottom + margin };
}

/** Do two boxes share an area? */
export function boxesMeet(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}

/** Does a straight line pass through a box? Clips the line against the four sides. */
export function lineMeetsBox([x0, y0]: Point, [x1, y1]: Point, box: Box): boolean {
  let [from, to] = [0, 1];
  const sides: readonly (readonly [number, number, number])[] = [
    [x0, x1 - x0, box.left],
    [-x0, x0 - x1, -box.right],
    [y0, y1 - y0, box.top],
    [-y0, y0 - y1, -box.bottom],
  ];
  for (const [start, change, limit] of sides) {
    if (change === 0) {
      if (start <= limit) return false;
      continue;
    }
    const at = (limit - start) / change;
    if (change > 0) from = Math.max(from, at);
    else to = Math.min(to, at);
  }
  return from < to;
}

/** Does a polyline pass through a box? */
export function routeMeetsBox(points: readonly Point[], box: Box): boolean {
  return points.some((point, n) => n > 0 && lineMeetsBox(points[n - 1] as Point, point, box));
}

/** On which side of the line a-b a point lies. */
function sideOf([ax, ay]: Point, [bx, by]: Point, [x, y]: Point): number {
  return Math.sign((bx - ax) * (y - ay) - (by - ay) * (x - ax));
}

/** Do two straight lines share a range of x (axis 0) or of y (axis 1)? */
function rangesMeet(a: Point, b: Point, c: Point, d: Point, axis: number): boolean {
  const at = (point: Point): number => point[axis] as number;
  return Math.max(at(a), at(b)) >= Math.min(at(c), at(d)) && Math.max(at(c), at(d)) >= Math.min(at(a), at(b));
}

/** Does a polyline cross the straight line from a to b? Touching an end counts as crossing. */
export function routeCrosses(points: readonly Point[], a: Point, b: Point): boolean {
  return points.some((end, n) => {
    const start = points[n - 1];
    if (start === undefined) return false;
    // Lines on one straight line cross only where they overlap.
    if (![0, 1].every((axis) => rangesMeet(start, end, a, b, axis))) return false;
    const parts = sideOf(start, end, a) * sideOf(start, end, b) <= 0;
    return parts && sideOf(a, b, start) * sideOf(a, b, end) <= 0;
  });
}

/** The point at a share of the length of a straight line. */
export function between([x0, y0]: Point, [x1, y1]: Point, share: number): Point {
  return [x0 + (x1 - x0) * share, y0 + (y1 - y0) * share];
}

/** The unit normal of a line that has the direction to its left when y points down: for a line to the right it points up. */
export function normalOf([x0, y0]: Point, [x1, y1]: Point): Point {
  const length = Math.hypot(x1 - x0, y1 - y0) || 1;
  return [(y1 - y0) / length, (x0 - x1) / length];
}

/** The smallest box round boxes; all zero for none. */
export function boxAround(boxes: readonly Box[]): Box {
  if (boxes.length === 0) return { left: 0, top: 0, right: 0, bottom: 0 };
  return {
    left: Math.min(...boxes.map(({ left }) => left)),
    top: Math.min(...boxes.map(({ top }) => top)),
    right: Math.max(...boxes.map(({ right }) => right)),
    bottom: Math.max(...boxes.map(({ bottom }) => bottom)),
  };
}
