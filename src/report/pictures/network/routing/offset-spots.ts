import type { Point } from './geometry.js';
import type { Disc, Spot } from './layout.js';

/** Distance of an offset from its disc, px: usual, and past the labels of a line. */
const NEAR = 4;
const FAR = 22;
const FARTHEST = 36;

/**
 * Where the offset of a resonator may stand: straight above or below it, on the side away from the middle of the figure
 * first; then beside it; then past the labels of its lines.
 */
export function offsetSpots(
  discs: readonly Disc[],
  order: number,
  center: Point,
): ReadonlyMap<number, readonly Spot[]> {
  const resonators = discs.filter(({ node }) => node > 0 && node <= order);
  return new Map(resonators.map((each) => [each.node, spotsOf(each, each.y > center[1] ? 1 : -1)]));
}

function spotsOf({ x, y, radius, reach }: Disc, out: number): Spot[] {
  const spot = (dx: number, dy: number, gap: number): Spot => {
    const length = Math.hypot(dx, dy);
    const toward: Point = [dx / length, dy / length];
    // From the rim on: the lines of the resonator itself are behind.
    const rim = radius + Math.abs(toward[0]) * reach[0] + Math.abs(toward[1]) * reach[1] + 0.5;
    return { at: [x + toward[0] * rim, y + toward[1] * rim], toward, off: gap };
  };
  const straight = [spot(0, out, NEAR), spot(0, -out, NEAR)];
  const beside = [spot(1, 0, NEAR), spot(-1, 0, NEAR)];
  const slanted = [spot(1, out, 0), spot(-1, out, 0), spot(1, -out, 0), spot(-1, -out, 0)];
  const far = [FAR, FARTHEST].flatMap((gap) => [spot(0, out, gap), spot(0, -out, gap)]);
  return [...straight, ...beside, ...slanted, ...far, spot(1, 0, FAR), spot(-1, 0, FAR)];
}
