/**
 * A complex number in pairs with its derivative, the running value of a product of linear factors:
 * `[re.hi, re.lo, im.hi, im.lo]`, then the same four of the derivative. The one thing in this room that is written in place:
 * the inner loops of a refinement go through ten thousands of these steps.
 */
export type DoubledProduct = Float64Array;

/** Multiplier that splits a double into two halves of 26 bits (Dekker). */
const SPLITTER = 134217729;

/** A product that starts at a real constant `hi + lo`; pass an old one to use its memory again. */
export function doubledProduct(hi: number, lo: number, product: DoubledProduct = new Float64Array(8)): DoubledProduct {
  product.fill(0);
  product[0] = hi;
  product[1] = lo;
  return product;
}

/**
 * Multiplies value and derivative by a linear factor `re + j*im` of unit slope: `(X r)' = X' r + X`. Relative error of the
 * value in norm: a few 2^-104.
 */
export function timesLinear(product: DoubledProduct, re: number, reLo: number, im: number, imLo: number): void {
  timesPair(product, 4, re, reLo, im, imLo);
  addPair(product, 4, product[0] as number, product[1] as number);
  addPair(product, 6, product[2] as number, product[3] as number);
  timesPair(product, 0, re, reLo, im, imLo);
}

/** Multiplies the value alone by `re + j*im`. */
export function timesConstant(product: DoubledProduct, re: number, reLo: number, im: number, imLo: number): void {
  timesPair(product, 0, re, reLo, im, imLo);
}

/** Multiplies value and derivative by a power of two, which is exact. */
export function timesPowerOfTwo(product: DoubledProduct, power: number): void {
  for (let i = 0; i < product.length; i++) product[i] = (product[i] as number) * power;
}

/** What rounding left over of `sum = a + b`. */
export function sumRest(a: number, b: number, sum: number): number {
  const part = sum - a;
  return a - (sum - part) + (b - part);
}

/** Adds `hi + lo` to the pair at `at`. */
function addPair(x: DoubledProduct, at: number, hi: number, lo: number): void {
  const a = x[at] as number;
  const sum = a + hi;
  const rest = sumRest(a, hi, sum) + ((x[at + 1] as number) + lo);
  const value = sum + rest;
  x[at] = value;
  x[at + 1] = rest - (value - sum);
}

/** `(a + j*b)(c + j*d)` in place at `at`; each of a, b, c, d is split once for two products. */
function timesPair(x: DoubledProduct, at: number, c: number, cLo: number, d: number, dLo: number): void {
  const a = x[at] as number;
  const aLo = x[at + 1] as number;
  const b = x[at + 2] as number;
  const bLo = x[at + 3] as number;
  const aBig = SPLITTER * a;
  const aHigh = aBig - (aBig - a);
  const aLow = a - aHigh;
  const bBig = SPLITTER * b;
  const bHigh = bBig - (bBig - b);
  const bLow = b - bHigh;
  const cBig = SPLITTER * c;
  const cHigh = cBig - (cBig - c);
  const cLow = c - cHigh;
  const dBig = SPLITTER * d;
  const dHigh = dBig - (dBig - d);
  const dLow = d - dHigh;
  const ac = a * c;
  const acRest = aLow * cLow - (ac - aHigh * cHigh - aLow * cHigh - aHigh * cLow) + (a * cLo + aLo * c);
  const bd = b * d;
  const bdRest = bLow * dLow - (bd - bHigh * dHigh - bLow * dHigh - bHigh * dLow) + (b * dLo + bLo * d);
  const ad = a * d;
  const adRest = aLow * dLow - (ad - aHigh * dHigh - aLow * dHigh - aHigh * dLow) + (a * dLo + aLo * d);
  const bc = b * c;
  const bcRest = bLow * cLow - (bc - bHigh * cHigh - bLow * cHigh - bHigh * cLow) + (b * cLo + bLo * c);
  const re = ac - bd;
  const reRest = sumRest(ac, -bd, re) + (acRest - bdRest);
  const im = ad + bc;
  const imRest = sumRest(ad, bc, im) + (adRest + bcRest);
  const reValue = re + reRest;
  const imValue = im + imRest;
  x[at] = reValue;
  x[at + 1] = reRest - (reValue - re);
  x[at + 2] = imValue;
  x[at + 3] = imRest - (imValue - im);
}
