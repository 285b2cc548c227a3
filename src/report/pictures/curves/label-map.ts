import type { Point } from './thin.js';

/** A rectangle in a drawing, pixels. */
export interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** What is taken in a drawing, in cells of a few pixels; labels look for free places in it. */
export interface LabelMap {
  readonly frame: Box;
  readonly columns: number;
  readonly rows: number;
  readonly taken: Uint8Array;
}

const CELL = 3;

/** An empty map of a frame. */
export function labelMap(frame: Box): LabelMap {
  const columns = Math.ceil((frame.right - frame.left) / CELL);
  const rows = Math.ceil((frame.bottom - frame.top) / CELL);
  return { frame, columns, rows, taken: new Uint8Array(columns * rows) };
}

/** First and last cell on each side that a box touches, cut to the map. */
function cellsOf({ frame, columns, rows }: LabelMap, box: Box): readonly [number, number, number, number] {
  const at = (value: number, from: number, count: number): number =>
    Math.min(Math.max(Math.floor((value - from) / CELL), 0), count - 1);
  return [
    at(box.left, frame.left, columns),
    at(box.right, frame.left, columns),
    at(box.top, frame.top, rows),
    at(box.bottom, frame.top, rows),
  ];
}

/** Takes a rectangle. */
export function takeBox(map: LabelMap, box: Box): void {
  const { frame } = map;
  if (box.right < frame.left || box.left > frame.right || box.bottom < frame.top || box.top > frame.bottom) return;
  const [c0, c1, r0, r1] = cellsOf(map, box);
  for (let row = r0; row <= r1; row += 1) map.taken.fill(1, row * map.columns + c0, row * map.columns + c1 + 1);
}

/** Takes a line. */
export function takeLine(map: LabelMap, points: readonly Point[]): void {
  points.forEach(([x, y], n) => {
    const [px, py] = points[Math.max(0, n - 1)] as Point;
    const steps = Math.max(1, Math.ceil(Math.hypot(x - px, y - py) / CELL));
    for (let k = 0; k <= steps; k += 1) {
      const [qx, qy] = [px + ((x - px) * k) / steps, py + ((y - py) * k) / steps];
      takeBox(map, { left: qx, right: qx, top: qy, bottom: qy });
    }
  });
}

/** Whether a rectangle lies in the frame and nothing is there yet. */
export function isFree(map: LabelMap, box: Box): boolean {
  const { frame, columns, taken } = map;
  if (box.left < frame.left || box.right > frame.right || box.top < frame.top || box.bottom > frame.bottom)
    return false;
  const [c0, c1, r0, r1] = cellsOf(map, box);
  for (let row = r0; row <= r1; row += 1)
    for (let column = c0; column <= c1; column += 1) if (taken[row * columns + column] === 1) return false;
  return true;
}

/** A box grown on every side. */
export function grown({ left, right, top, bottom }: Box, by: number): Box {
  return { left: left - by, right: right + by, top: top - by, bottom: bottom + by };
}

/** Whether a box lies in the map and is free; then it is taken. */
export function claim(map: LabelMap, box: Box): boolean {
  if (!isFree(map, box)) return false;
  takeBox(map, box);
  return true;
}
