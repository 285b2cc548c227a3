/**
 * Fixed-point numbers of any length: `value` stands for `value/2^bits`, bits agreed upon by the caller.
 *
 * The polynomials of the flat-delay family are known as whole numbers; at order 30 their ladder loses sixty digits on the
 * way, which neither doubles nor pairs of doubles have. Whole numbers of the language carry as many as are asked for.
 */
export type Long = bigint;

/** A complex number with long parts. */
export interface LongComplex {
  readonly re: Long;
  readonly im: Long;
}

/** Every finite double is a whole multiple of 2^-1074; below 2^-bits it is cut off. */
export function longFrom(x: number, bits: number): Long {
  let rest = x;
  let value = 0n;
  let place = 0;
  // Pieces of 30 bits: each is a whole number after scaling, and taking it away is exact.
  while (rest !== 0 && place < bits) {
    const step = Math.min(30, bits - place);
    place += step;
    const scaled = rest * 2 ** step;
    const whole = Math.trunc(scaled);
    value = (value << BigInt(step)) + BigInt(whole);
    rest = scaled - whole;
  }
  return value << BigInt(bits - place);
}

/** The nearest double, to a unit in its last place. */
export function doubleFrom(value: Long, bits: number): number {
  const size = value < 0n ? -value : value;
  // 64 leading bits are enough; the power of 2 is applied in two halves, for a result near either end of the range.
  const surplus = Math.max(0, size.toString(16).length * 4 - 64);
  const lead = Number(size >> BigInt(surplus));
  const exponent = surplus - bits;
  const half = Math.trunc(exponent / 2);
  return (value < 0n ? -lead : lead) * 2 ** half * 2 ** (exponent - half);
}

export const longProduct = (a: Long, b: Long, bits: number): Long => (a * b) >> BigInt(bits);

export const longQuotient = (a: Long, b: Long, bits: number): Long => (a << BigInt(bits)) / b;

/** Square root of a number that is not negative: Newton's iteration from above, on whole numbers. */
export function longRoot(a: Long, bits: number): Long {
  if (a === 0n) return 0n;
  const square = a << BigInt(bits);
  let x = 1n << BigInt(Math.ceil((square.toString(16).length * 4) / 2) + 1);
  for (;;) {
    const next = (x + square / x) >> 1n;
    if (next >= x) return x;
    x = next;
  }
}

export function complexProduct(a: LongComplex, b: LongComplex, bits: number): LongComplex {
  const shift = BigInt(bits);
  return { re: (a.re * b.re - a.im * b.im) >> shift, im: (a.re * b.im + a.im * b.re) >> shift };
}

export function complexQuotient(a: LongComplex, b: LongComplex, bits: number): LongComplex {
  const shift = BigInt(bits);
  const norm = b.re * b.re + b.im * b.im;
  return {
    re: ((a.re * b.re + a.im * b.im) << shift) / norm,
    im: ((a.im * b.re - a.re * b.im) << shift) / norm,
  };
}

/** Principal square root: the larger part first, the other as a quotient. */
export function complexRoot({ re, im }: LongComplex, bits: number): LongComplex {
  const size = longRoot(longProduct(re, re, bits) + longProduct(im, im, bits), bits);
  const larger = longRoot((size + (re < 0n ? -re : re)) >> 1n, bits);
  if (larger === 0n) return { re: 0n, im: 0n };
  const smaller = longQuotient(im >> 1n, larger, bits);
  if (re >= 0n) return { re: larger, im: smaller };
  return im < 0n ? { re: -smaller, im: -larger } : { re: smaller, im: larger };
}
