import { textWidth } from '../../svg/words.js';
import { type Box, countedMap, grown, isCountedFree, isFree, type LabelMap } from './label-map.js';
import type { Point } from './thin.js';

/** Where the name of a curve stands, and the end of the leader to the curve when it stands apart. */
export interface NamePlace {
  readonly box: Box;
  readonly leader?: readonly [Point, Point];
}

const LINE_HEIGHT = 16;
const NEAR = 5;
/** Distances at which a name still belongs to its curve, with a leader. */
const APART: readonly number[] = [22, 34, 48, 64, 84, 110];
const DIRECTIONS: readonly Point[] = [
  [1, 0],
  [-1, 0],
  [0, 1],
  [0, -1],
  [1, 1],
  [-1, 1],
  [1, -1],
  [-1, -1],
];

/** Size of a text of one or more lines. */
export function textSize(lines: readonly string[], size = 13, isBold = false): readonly [number, number] {
  return [Math.max(...lines.map((text) => textWidth(text, size, isBold))), LINE_HEIGHT * lines.length];
}

/** Points about 7 pixels apart along a line, in the frame, those nearest to a wish first. */
function walked(points: readonly Point[], frame: Box, wish: Point): readonly Point[] {
  const found: { readonly point: Point; readonly away: number }[] = [];
  for (let n = 1; n < points.length; n += 1) {
    const from = points[n - 1] as Point;
    const to = points[n] as Point;
    const steps = Math.max(1, Math.round(Math.hypot(to[0] - from[0], to[1] - from[1]) / 7));
    for (let k = 1; k <= steps; k += 1) {
      const x = from[0] + ((to[0] - from[0]) * k) / steps;
      const y = from[1] + ((to[1] - from[1]) * k) / steps;
      if (x < frame.left || x > frame.right || y < frame.top || y > frame.bottom) continue;
      found.push({ point: [x, y], away: Math.hypot(x - wish[0], y - wish[1]) });
    }
  }
  return found.sort((a, b) => a.away - b.away).map(({ point }) => point);
}

function boxAt([x, y]: Point, [dx, dy]: Point, gap: number, [width, height]: readonly [number, number]): Box {
  const left = dx === 0 ? x - width / 2 : dx > 0 ? x + gap : x - gap - width;
  const top = dy === 0 ? y - height / 2 : dy > 0 ? y + gap : y - gap - height;
  return { left, right: left + width, top, bottom: top + height };
}

function isLeaderFree(map: LabelMap, [ax, ay]: Point, [bx, by]: Point): boolean {
  const length = Math.hypot(bx - ax, by - ay);
  for (let at = 8; at < length; at += 3) {
    const [x, y] = [ax + ((bx - ax) * at) / length, ay + ((by - ay) * at) / length];
    if (!isFree(map, { left: x, right: x, top: y, bottom: y })) return false;
  }
  return true;
}

/** Corner or side of a box that is nearest to a point. */
function nearestOf({ left, right, top, bottom }: Box, [x, y]: Point): Point {
  return [Math.min(Math.max(x, left), right), Math.min(Math.max(y, top), bottom)];
}

/**
 * A free place for the name of a curve: beside it where no other curve is near, or else apart with a leader. The curve
 * itself must be taken in the map. `wish` is where the name would best stand.
 */
export function namePlace(
  map: LabelMap,
  curve: readonly Point[],
  size: readonly [number, number],
  wish: Point,
): NamePlace | undefined {
  const counted = countedMap(map);
  const points = walked(curve, map.frame, wish);
  for (const room of [9, 3])
    for (const point of points)
      for (const direction of DIRECTIONS) {
        const box = boxAt(point, direction, NEAR, size);
        const away: Box = {
          left: box.left - (direction[0] > 0 ? 0 : room),
          right: box.right + (direction[0] < 0 ? 0 : room),
          top: box.top - (direction[1] > 0 ? 0 : room),
          bottom: box.bottom + (direction[1] < 0 ? 0 : room),
        };
        if (isCountedFree(counted, away)) return { box };
      }
  for (const gap of APART)
    for (const point of points)
      for (const direction of DIRECTIONS) {
        const box = boxAt(point, direction, gap, size);
        if (!isCountedFree(counted, grown(box, 5))) continue;
        const end = nearestOf(box, point);
        if (isLeaderFree(map, point, end)) return { box, leader: [end, point] };
      }
  return undefined;
}
