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
