import type { FineRoot } from '../../forms/index.js';
import {
  type Complex,
  type Doubled,
  type DoubledProduct,
  doubledDivide,
  doubledMultiply,
  doubledProduct,
  sumRest,
  timesLinear,
  timesPowerOfTwo,
} from '../../numerics/index.js';

/** A power as a function of frequency: `constant * prod |j*omega - r|^2`, the roots in the s-plane. */
export interface Power {
  readonly constant: Doubled;
  readonly roots: readonly FineRoot[];
}

/** The sum of two powers, of which the second may have a negative constant. It is real on the frequency axis. */
export interface PowerSum {
  readonly first: Power;
  readonly second: Power;
}

export const ONE: Doubled = { hi: 1, lo: 0 };

export const negated = ({ hi, lo }: Doubled): Doubled => ({ hi: -hi, lo: -lo });

/** `1/constant^2` to 30 digits. */
export function inverseSquare(constant: number): Doubled {
  const x = { hi: constant, lo: 0 };
  return doubledDivide(ONE, doubledMultiply(x, x));
}

/** What a sum is at a complex frequency, all in one common unit: its value, its slope, and the size that cancelled. */
export interface SumValue {
  readonly value: Complex;
  readonly slope: Complex;
  readonly size: number;
}

/** Running products are brought back here by an exact power of two. */
const LARGE: number = 2 ** 200;

/**
 * Value and slope of a sum at the complex frequency `re + j*(im)`, in doubled precision: both powers as products of
 * differences, so that what is left after they cancel is right to 1e-31 of their size. Cost O(N).
 */
export function sumAt({ first, second }: PowerSum, at: FineRoot): SumValue {
  const a = doubledProduct(first.constant.hi, first.constant.lo);
  const b = doubledProduct(second.constant.hi, second.constant.lo);
  const count = Math.max(first.roots.length, second.roots.length);
  for (let n = 0; n < count; n++) {
    timesRoot(a, first.roots[n], at);
    timesRoot(b, second.roots[n], at);
    const size = Math.max(sizeOf(a), sizeOf(b));
    if (size > LARGE || (size < 1 / LARGE && size > 0)) {
      const power = size > LARGE ? 1 / LARGE : LARGE;
      timesPowerOfTwo(a, power);
      timesPowerOfTwo(b, power);
    }
  }
  const part = (k: number): number => {
    const [x, y] = [a[k] as number, b[k] as number];
    const sum = x + y;
    return sum + (sumRest(x, y, sum) + ((a[k + 1] as number) + (b[k + 1] as number)));
  };
  return {
    value: { re: part(0), im: part(2) },
    slope: { re: part(4), im: part(6) },
    size: sizeOf(a) + sizeOf(b),
  };
}

const sizeOf = (x: DoubledProduct): number => Math.abs(x[0] as number) + Math.abs(x[2] as number);

/** Multiplies by `(w - u)(w - conj u)`, `u = -j*r = im - j*re` of a root in the s-plane; `w = re + j*im`, im known finer. */
function timesRoot(product: DoubledProduct, root: FineRoot | undefined, at: FineRoot): void {
  if (root === undefined) return;
  const x = at.re - root.im;
  const xRest = sumRest(at.re, -root.im, x) - (root.imRest ?? 0);
  const above = at.im + root.re;
  const below = at.im - root.re;
  timesLinear(product, x, xRest, above, sumRest(at.im, root.re, above));
  timesLinear(product, x, xRest, below, sumRest(at.im, -root.re, below));
}

/** Size of one factor at a real frequency. */
export function distance({ re, im, imRest = 0 }: FineRoot, omega: number): number {
  const above = omega - im - imRest;
  return Math.sqrt(re * re + above * above);
}

/** A quotient of two powers at a real frequency, in doubles, by factors in turn. */
export function powerRatio(above: Power, below: Power, omega: number): number {
  let ratio = 1;
  for (let n = 0; n < Math.max(above.roots.length, below.roots.length); n++) {
    const [up, down] = [above.roots[n], below.roots[n]];
    if (up !== undefined) ratio *= distance(up, omega);
    if (down !== undefined) ratio /= distance(down, omega);
  }
  return ratio * ratio * ((above.constant.hi + above.constant.lo) / (below.constant.hi + below.constant.lo));
}
