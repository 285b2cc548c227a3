import type { Certificate } from '../forms/index.js';

/** Distance from 1 to the next double, 2^-52: the unit in which rounding is counted in this room. */
export const EPSILON: number = Number.EPSILON;

/** A size that must not exceed its limit. A value that is not a number is reported as infinitely large and never holds. */
export function atMost(check: string, value: number, limit: number): Certificate {
  return { check, value: Number.isNaN(value) ? Infinity : value, limit, holds: value <= limit };
}

/** A size that must reach its limit. A value that is not a number is reported as 0 and never holds. */
export function atLeast(check: string, value: number, limit: number): Certificate {
  return { check, value: Number.isNaN(value) ? 0 : value, limit, holds: value >= limit };
}

/** A count that must be met exactly. */
export function exactly(check: string, value: number, limit: number): Certificate {
  return { check, value, limit, holds: value === limit };
}
