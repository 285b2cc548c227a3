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
  const { frame, columns, rows, taken } = map;
  for (let n = 0; n < points.length; n += 1) {
    const here = points[n] as Point;
    const before = points[Math.max(0, n - 1)] as Point;
    const dx = here[0] - before[0];
    const dy = here[1] - before[1];
    const steps = Math.max(1, Math.ceil(Math.max(Math.abs(dx), Math.abs(dy)) / CELL));
    for (let k = 0; k <= steps; k += 1) {
      const column = Math.floor((before[0] + (dx * k) / steps - frame.left) / CELL);
      const row = Math.floor((before[1] + (dy * k) / steps - frame.top) / CELL);
      if (column >= 0 && column < columns && row >= 0 && row < rows) taken[row * columns + column] = 1;
    }
  }
}

/** Whether a rectangle lies in the frame and nothing is there yet. */
export function isFree(map: LabelMap, box: Box): boolean {
  const { frame, columns, taken } = map;
  if (!isInside(frame, box)) return false;
  const [c0, c1, r0, r1] = cellsOf(map, box);
  for (let row = r0; row <= r1; row += 1)
    for (let column = c0; column <= c1; column += 1) if (taken[row * columns + column] === 1) return false;
  return true;
}

function isInside(frame: Box, { left, right, top, bottom }: Box): boolean {
  return left >= frame.left && right <= frame.right && top >= frame.top && bottom <= frame.bottom;
}

/** A map prepared for many questions: how many cells are taken above and left of each corner. */
export interface CountedMap {
  readonly map: LabelMap;
  readonly counts: Int32Array;
}

/** Counts the taken cells of a map as it is now. */
export function countedMap(map: LabelMap): CountedMap {
  const { columns, rows, taken } = map;
  const width = columns + 1;
  const counts = new Int32Array(width * (rows + 1));
  for (let row = 0; row < rows; row += 1) {
    let sum = 0;
    for (let column = 0; column < columns; column += 1) {
      sum += taken[row * columns + column] as number;
      const at = (row + 1) * width + column + 1;
      counts[at] = (counts[at - width] as number) + sum;
    }
  }
  return { map, counts };
}

/** `isFree` at the cost of four looks. */
export function isCountedFree({ map, counts }: CountedMap, box: Box): boolean {
  if (!isInside(map.frame, box)) return false;
  const [c0, c1, r0, r1] = cellsOf(map, box);
  const width = map.columns + 1;
  const at = (row: number, column: number): number => counts[row * width + column] as number;
  return at(r1 + 1, c1 + 1) - at(r0, c1 + 1) - at(r1 + 1, c0) + at(r0, c0) === 0;
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
