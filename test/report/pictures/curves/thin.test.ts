import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Point, thinned as thinnedTrack } from '../../../../src/report/pictures/curves/thin.js';

/** Thins points; what comes back are the same points. */
function thinned(points: readonly Point[]): readonly Point[] {
  const kept = thinnedTrack(
    Float64Array.from(points, ([x]) => x),
    Float64Array.from(points, ([, y]) => y),
  );
  return kept.map(([x, y]) => points.find((point) => point[0] === x && point[1] === y)!);
}

function distance([px, py]: Point, [ax, ay]: Point, [bx, by]: Point): number {
  const [dx, dy] = [bx - ax, by - ay];
  const length = dx * dx + dy * dy;
  const t = length === 0 ? 0 : Math.max(0, Math.min(1, ((px - ax) * dx + (py - ay) * dy) / length));
  return Math.hypot(px - ax - t * dx, py - ay - t * dy);
}

describe('thinned(points)', () => {
  it('stays within an eighth of a pixel of every point, keeps the ends and the order', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -50, max: 400, noNaN: true }), { minLength: 1, maxLength: 300 }), (ys) => {
        const points = ys.map((y, n): Point => [n * 0.7, y]);
        const kept = thinned(points);
        expect(kept[0]).toBe(points[0]);
        expect(kept.at(-1)).toBe(points.at(-1));
        const places = kept.map((point) => points.indexOf(point));
        expect(places.every((place, n) => n === 0 || place > places[n - 1]!)).toBe(true);
        for (const point of points) {
          const near = kept.slice(1).map((end, n) => distance(point, kept[n]!, end));
          expect(kept.length === 1 ? 0 : Math.min(...near)).toBeLessThanOrEqual(0.1201);
        }
      }),
      { seed: 20261201, numRuns: 200 },
    );
  });

  it('makes two points of a straight line and less than a tenth of a smooth curve', () => {
    const line = Array.from({ length: 1000 }, (_, n): Point => [n / 2, 3 + n / 7]);
    expect(thinned(line)).toHaveLength(2);
    const wave = Array.from({ length: 2001 }, (_, n): Point => [n / 4, 100 * Math.sin(n / 100)]);
    expect(thinned(wave).length).toBeLessThan(200);
  });
});
