import { Decimal } from 'decimal.js';

/** Every finite double is a whole multiple of 2^-1074: that multiple, as an exact whole number. */
export function scaled(x: number): bigint {
  const view = new DataView(new ArrayBuffer(8));
  view.setFloat64(0, x);
  const bits = view.getBigUint64(0);
  const exponent = Number((bits >> 52n) & 0x7ffn);
  const fraction = bits & 0xfffffffffffffn;
  const size = exponent === 0 ? fraction : (fraction | 0x10000000000000n) << BigInt(exponent - 1);
  return x < 0 ? -size : size;
}

/** Decimal arithmetic of 100 digits. */
export const Exact: typeof Decimal = Decimal.clone({ precision: 100, minE: -9e15, maxE: 9e15 });

/** The exact value of a double, all digits. */
export function exact(x: number): Decimal {
  return new Exact(scaled(x).toString()).div(new Exact(2).pow(1074));
}

/** `|value - reference| / size` as a double; 0/0 counts as 0. */
export function relativeError(value: number, reference: Decimal, size: Decimal): number {
  const error = exact(value).minus(reference).abs();
  return error.isZero() ? 0 : error.div(size).toNumber();
}
