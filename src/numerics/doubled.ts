/** Multiplier that splits a double into two halves of 26 bits (Dekker). */
const SPLITTER = 134217729;

/** A sum kept as an unevaluated pair: `hi` is the rounded value, `lo` what rounding left over. */
export interface Doubled {
  readonly hi: number;
  readonly lo: number;
}

/**
 * `sum a[i]*(bHi[i] + bLo[i])` as if computed in twice the precision; vectors of equal length, `bLo` omitted for plain doubles.
 *
 * Source: T. Ogita, S. M. Rump, S. Oishi, Accurate sum and dot product, SIAM J. Sci. Comput. 26, 2005, algorithm Dot2 (from
 * memory). Values must stay below 1e300 in size, or the splitting overflows.
 */
export function doubledDot(a: Float64Array, bHi: Float64Array, bLo?: Float64Array): Doubled {
  let hi = 0;
  let lo = 0;
  for (let i = 0; i < a.length; i++) {
    const x = a[i] as number;
    const y = bHi[i] as number;
    if (x === 0 || y === 0) continue;
    const product = x * y;
    const xBig = SPLITTER * x;
    const xHigh = xBig - (xBig - x);
    const xLow = x - xHigh;
    const yBig = SPLITTER * y;
    const yHigh = yBig - (yBig - y);
    const yLow = y - yHigh;
    const productError = xLow * yLow - (product - xHigh * yHigh - xLow * yHigh - xHigh * yLow);
    const sum = hi + product;
    const part = sum - hi;
    lo += hi - (sum - part) + (product - part) + productError;
    if (bLo !== undefined) lo += x * (bLo[i] as number);
    hi = sum;
  }
  const value = hi + lo;
  return { hi: value, lo: hi - value + lo };
}

const ZERO: Doubled = { hi: 0, lo: 0 };

/** Sum of two pairs, renormalized. */
export function doubledAdd(a: Doubled, b: Doubled): Doubled {
  const sum = a.hi + b.hi;
  const part = sum - a.hi;
  const error = a.hi - (sum - part) + (b.hi - part) + a.lo + b.lo;
  const hi = sum + error;
  return { hi, lo: sum - hi + error };
}

/** A pair times a double. */
function doubledTimes(a: Doubled, factor: number): Doubled {
  if (factor === 0 || a.hi === 0) return ZERO;
  const product = factor * a.hi;
  const xBig = SPLITTER * factor;
  const xHigh = xBig - (xBig - factor);
  const xLow = factor - xHigh;
  const yBig = SPLITTER * a.hi;
  const yHigh = yBig - (yBig - a.hi);
  const yLow = a.hi - yHigh;
  const rest = xLow * yLow - (product - xHigh * yHigh - xLow * yHigh - xHigh * yLow) + factor * a.lo;
  const hi = product + rest;
  return { hi, lo: product - hi + rest };
}

/** A complex number whose parts are pairs. */
export interface DoubledComplex {
  readonly re: Doubled;
  readonly im: Doubled;
}

/** `a - b*root` for pairs a, b and a root in doubles: one step of multiplying a polynomial by (s - root). */
export function doubledMinusProduct(
  a: DoubledComplex,
  b: DoubledComplex,
  root: { readonly re: number; readonly im: number },
): DoubledComplex {
  return {
    re: doubledAdd(a.re, doubledAdd(doubledTimes(b.re, -root.re), doubledTimes(b.im, root.im))),
    im: doubledAdd(a.im, doubledAdd(doubledTimes(b.re, -root.im), doubledTimes(b.im, -root.re))),
  };
}

export const DOUBLED_ZERO: DoubledComplex = { re: ZERO, im: ZERO };
export const DOUBLED_ONE: DoubledComplex = { re: { hi: 1, lo: 0 }, im: ZERO };

/** Product of two pairs. */
export function doubledMultiply(a: Doubled, b: Doubled): Doubled {
  const product = doubledTimes(a, b.hi);
  return doubledAdd(product, { hi: a.hi * b.lo, lo: 0 });
}

/** Quotient of two pairs: one division in doubles and one correction. */
export function doubledDivide(a: Doubled, b: Doubled): Doubled {
  const quotient = a.hi / b.hi;
  const rest = doubledAdd(a, doubledTimes(b, -quotient));
  return doubledAdd({ hi: quotient, lo: 0 }, { hi: rest.hi / b.hi, lo: 0 });
}

/** Square root of a positive pair: one root in doubles and one Newton correction. */
export function doubledSquareRoot(a: Doubled): Doubled {
  const root = Math.sqrt(a.hi);
  const rest = doubledAdd(a, doubledTimes({ hi: -root, lo: 0 }, root));
  return doubledAdd({ hi: root, lo: 0 }, { hi: rest.hi / (2 * root), lo: 0 });
}
