import { EPS } from './limits.js';

/** Value and slope of a rising function at one point. */
export type RisingFunction = (x: number) => { readonly value: number; readonly slope: number };

/**
 * The one root of a rising function inside [low, high]: Newton steps, a bisection whenever a step leaves the bracket.
 *
 * The caller guarantees value(low) <= 0 <= value(high). Stops when a step no longer moves x by more than 2 ulp of the
 * scale; 60 bisections of any bracket reach that, so the loop is capped at 200 turns.
 */
export function monotoneRoot(f: RisingFunction, low: number, high: number, start: number): number {
  let a = low;
  let b = high;
  let x = start > a && start < b ? start : (a + b) / 2;
  for (let turn = 0; turn < 200; turn++) {
    const { value, slope } = f(x);
    if (value === 0) return x;
    const step = value / slope;
    // Tested before the bracket test: at the rounding floor a good step may point just outside.
    if (Math.abs(step) <= 2 * EPS * Math.abs(x)) return x - step;
    if (value < 0) a = x;
    else b = x;
    const next = x - step;
    x = next > a && next < b ? next : (a + b) / 2;
    if (b - a <= EPS * Math.max(Math.abs(a), Math.abs(b))) return x;
  }
  return x;
}
