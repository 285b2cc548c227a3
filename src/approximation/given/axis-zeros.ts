import type { FineRoot } from '../../forms/index.js';
import { EPS } from '../../numerics/index.js';
import { lookingPoints } from './peak.js';
import { type PowerSum, powerRatio, sumAt } from './power-sum.js';

/** What the data leave open: power of the sum up to `at` a frequency, as a share of its first power; `lift` is the larger of that and what was added to it. */
export interface AxisRoom {
  readonly lift: number;
  readonly at: (omega: number) => number;
}

/**
 * The same half roots, those put on the axis that the data cannot tell from roots on it.
 *
 * Runs of neighbors are tried from the longest down: m roots become one m-fold zero at their mean when the sum vanishes there
 * within the room, and they either lie on the half circle that a lift makes of such a zero, or the zero changes the power by
 * no more than the room at any frequency looked at. A zero alone goes to where the sum is smallest, if it is within the room
 * there. All others are corrected once more without the lift. Where the data leave so much open that the power of the result is
 * another one, no zero is placed alone, or the lifted roots stay: they have the power of the data to the size of the lift. Cost O(N^4) at worst.
 */
export function axisZeros(sum: PowerSum, lifted: readonly FineRoot[], room: AxisRoom): readonly FineRoot[] {
  const test = fitTest(sum, lifted.length);
  const merged = mergedRuns(sum, lifted, room, test);
  const placed = merged.map((root) => {
    if (root.re === 0) return root;
    const im = smallestNear(sum, root);
    if (im === undefined || shareAt(sum, im) > room.at(im)) return root;
    // A root as far from the axis as its lift explains: there the sum has grown by no more than the lift.
    return shareAt(sum, im - root.re) <= EXPLAINED * room.lift ? { re: 0, im } : root;
  });
  const finish = (roots: readonly FineRoot[]): readonly FineRoot[] =>
    roots.map((root) => (root.re === 0 ? root : corrected(sum, root)));
  const finished = finish(placed);
  if (test(finished) <= LARGEST_CHANGE * room.lift) return finished;
  const unplaced = finish(merged);
  return test(unplaced) <= test(lifted) ? unplaced : lifted;
}

/** Units of the lift that a root it moved may show, its own curvature and the rounding of the data included. */
const EXPLAINED = 4;

/**
 * Lifts by which roots together may change the power: each adds its own over the power that is reflected, in a band of 60 dB
 * a million lifts; beyond it the roots are not those of the data.
 */
const LARGEST_CHANGE = 1e3;

/** The sum at a real frequency as a share of its first power. */
function shareAt(sum: PowerSum, omega: number): number {
  const { value, size } = sumAt(sum, { re: omega, im: 0 });
  // Where they cancel each power is half of the size; where not, the share is of size 1 anyway.
  return (2 * Math.abs(value.re)) / size;
}

function mergedRuns(
  sum: PowerSum,
  lifted: readonly FineRoot[],
  room: AxisRoom,
  test: (roots: readonly FineRoot[]) => number,
): readonly FineRoot[] {
  let roots = [...lifted].sort((a, b) => a.im - b.im);
  for (let length = roots.length; length >= 2; length--) {
    for (let start = 0; start + length <= roots.length; start++) {
      const run = roots.slice(start, start + length);
      if (run.some(({ re }) => re === 0)) continue;
      const im = run.reduce((total, root) => total + root.im, 0) / length;
      if (!(shareAt(sum, im) <= room.at(im))) continue;
      const tried = roots.map((root, n) => (n >= start && n < start + length ? { re: 0, im } : root));
      if (isHalfCircle(run, im) || test(tried) <= EXPLAINED * room.lift) roots = tried;
    }
  }
  return roots;
}

/** A lifted m-fold zero becomes the m roots of `(w - a)^(2m) = -r^(2m)` above the axis, evenly spaced on half a circle. */
function isHalfCircle(run: readonly FineRoot[], center: number): boolean {
  const count = run.length;
  const radius = run.reduce((sum, { re, im }) => sum + Math.hypot(re, im - center), 0) / count;
  return run.every(({ re, im }, n) => {
    const angle = ((2 * (count - n) - 1) * Math.PI) / (2 * count);
    const off = Math.hypot(im - center - radius * Math.cos(angle), -re - radius * Math.sin(angle));
    return off <= (ROUNDNESS * radius) / count;
  });
}

/** Of the distance between neighbors on the circle; other factors bend it by their own share of the radius. */
const ROUNDNESS = 0.25;

/** Largest difference between the power of a sum and that of its half roots, as a share of the first power of the sum. */
function fitTest({ first, second }: PowerSum, count: number): (roots: readonly FineRoot[]) => number {
  const points = lookingPoints(first.roots);
  const given = points.map((omega) => 1 + powerRatio(second, first, omega));
  const isFull = second.roots.length === count;
  const lead = isFull ? 1 + second.constant.hi + second.constant.lo : 1;
  return (roots) => {
    const power = { constant: { hi: lead, lo: 0 }, roots };
    return points.reduce((worst, omega, n) => {
      const off = Math.abs(powerRatio(power, first, omega) - (given[n] as number));
      return Math.max(off, worst);
    }, 0);
  };
}

/** A lift moves a double zero straight off the axis; sideways only by its square, and by rounding. */
const REACH = 0.5;
const SETTLED = 1e-12;

/** Real frequency next to a root where the slope of the sum vanishes, by secants; undefined where they lead away. */
function smallestNear(sum: PowerSum, root: FineRoot): number | undefined {
  // A slope is known in a unit of its own; the size of the sum there, which hardly changes so near, takes it out.
  const slopeAt = (x: number): number => {
    const { slope, size } = sumAt(sum, { re: x, im: 0 });
    return slope.re / size;
  };
  let [last, x] = [root.im - Math.max(-root.re, 1e-9 * Math.hypot(root.re, root.im)), root.im];
  let [before, now] = [slopeAt(last), slopeAt(x)];
  for (let turn = 0; turn < 8 && now !== before; turn++) {
    const next = x - (now * (x - last)) / (now - before);
    if (!(Math.abs(next - root.im) <= REACH * -root.re + SETTLED * Math.abs(root.im))) return undefined;
    const isSettled = Math.abs(next - x) <= EPS * Math.abs(x);
    [last, before, x] = [x, now, next];
    if (isSettled) break;
    now = slopeAt(x);
  }
  return x;
}

/** Corrections after the lift is taken off: each halves the distance from the axis at most, the last ones are quadratic. */
const CORRECTIONS = 12;

/** A root off the axis without the lift; left where it is when its step is no small one. */
function corrected(sum: PowerSum, start: FineRoot): FineRoot {
  let at = { re: start.im, im: -start.re };
  for (let turn = 0; turn < CORRECTIONS; turn++) {
    const { value, slope } = sumAt(sum, at);
    const square = slope.re * slope.re + slope.im * slope.im;
    const re = (value.re * slope.re + value.im * slope.im) / square;
    const im = (value.im * slope.re - value.re * slope.im) / square;
    if (!(Math.hypot(re, im) <= LARGEST_SHARE * at.im)) return start;
    at = { re: at.re - re, im: at.im - im };
  }
  return { re: -at.im, im: at.re };
}

/** Of the distance from the axis: next to its mirror image a lifted root goes down by half of it, never by more. */
const LARGEST_SHARE = 0.6;
