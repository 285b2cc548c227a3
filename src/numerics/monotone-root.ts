import { EPS } from './limits.js';

/** Value and slope of a rising function at one point. */
export type RisingFunction = (x: number) => { readonly value: number; readonly slope: number };

/**
 * The one root of a rising function inside [low, high]: Newton steps, a bisection whenever a step leaves the bracket or is
 * not half of the last one.
 *
 * The caller guarantees value(low) <= 0 <= value(high). Stops when a step no longer moves x by more than 2 ulp; a bracket
 * of doubles cannot be halved more often than about 2100 times, so the loop ends. A step function (sharp resonances) would
 * lead plain bracketed Newton into creeping: hence the second condition.
 */
export function monotoneRoot(f: RisingFunction, low: number, high: number, start: number): number {
  let a = low;
  let b = high;
  let x = start > a && start < b ? start : (a + b) / 2;
  let lastStep = b - a;
  for (;;) {
    const { value, slope } = f(x);
    if (value === 0) return x;
    const step = value / slope;
    // Tested before the bracket test: at the rounding floor a good step may point just outside.
    if (Math.abs(step) <= 2 * EPS * Math.abs(x)) return x - step;
    if (value < 0) a = x;
    else b = x;
    const newton = x - step;
    const useful = newton > a && newton < b && Math.abs(step) <= Math.abs(lastStep) / 2;
    const next = useful ? newton : a + (b - a) / 2;
    if (next === a || next === b) return next;
    lastStep = next - x;
    x = next;
  }
}
