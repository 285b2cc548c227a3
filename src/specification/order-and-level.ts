import type { Fault, Path } from './faults.js';
import { failureOf, kindFault } from './faults.js';

/** Largest order whose certificates pass in this package's tests. */
export const MAX_ORDER = 100;
const MIN_RETURN_LOSS_DB = 0.01;
const MAX_RETURN_LOSS_DB = 100;

const ORDER_ALLOWED = `a number, whole, 1 to ${MAX_ORDER}`;
const LEVEL_ALLOWED = `a positive number of dB, ${MIN_RETURN_LOSS_DB} to ${MAX_RETURN_LOSS_DB}`;

/** The fault of an order, if it has one. */
export function orderFault(value: unknown, path: Path = ['order']): Fault | undefined {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    return kindFault(path, value, ORDER_ALLOWED, 'give the number of resonators');
  }
  if (Number.isInteger(value) && value >= 1 && value <= MAX_ORDER) return undefined;
  const advice =
    value > MAX_ORDER
      ? `lower it: ${MAX_ORDER} is the largest order whose certificates pass in the tests`
      : 'give the number of resonators as a whole number';
  return {
    code: 'E_ORDER_RANGE',
    path,
    found: String(value),
    allowed: ORDER_ALLOWED,
    advice,
    value,
    limit: [1, MAX_ORDER],
  };
}

function levelAdvice(value: number): string {
  if (value === 0) return 'did you mean 20?';
  if (value < 0) return `drop the sign: did you mean ${-value}?`;
  if (value > MAX_RETURN_LOSS_DB) return 'lower it';
  return 'raise it: below this level the filter reflects nearly everything';
}

/** The fault of a return loss, if it has one. */
export function returnLossFault(value: unknown, path: Path = ['returnLossDb']): Fault | undefined {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    return kindFault(path, value, LEVEL_ALLOWED, 'give the return loss of the equiripple band');
  }
  if (value >= MIN_RETURN_LOSS_DB && value <= MAX_RETURN_LOSS_DB) return undefined;
  return {
    code: 'E_RL_RANGE',
    path,
    found: String(value),
    allowed: `${LEVEL_ALLOWED} (abs(S11)^2 falls under the rounding unit near 157 dB)`,
    advice: levelAdvice(value),
    value,
    limit: [MIN_RETURN_LOSS_DB, MAX_RETURN_LOSS_DB],
  };
}

/**
 * Checks a filter order: a whole number, 1 to 100 (the largest order whose certificates pass in the tests).
 *
 * @param value anything; the argument is called `order` in the message
 * @returns the order itself
 * @throws FilterFailure E_ORDER_RANGE, E_TYPE, E_NOT_FINITE or E_MISSING
 * @example
 * checkOrder(6); // 6
 */
export function checkOrder(value: unknown): number {
  const fault = orderFault(value);
  if (fault !== undefined) throw failureOf(fault);
  return value as number;
}

/**
 * Checks a return loss in decibels: a positive number, 0.01 to 100.
 *
 * @param value anything; the argument is called `returnLossDb` in the message
 * @returns the level itself, dB
 * @throws FilterFailure E_RL_RANGE, E_TYPE, E_NOT_FINITE or E_MISSING
 * @example
 * checkReturnLoss(22); // 22
 */
export function checkReturnLoss(value: unknown): number {
  const fault = returnLossFault(value);
  if (fault !== undefined) throw failureOf(fault);
  return value as number;
}

/** A remark on a return loss that is hard to hold, or that looks like another quantity. */
export function levelRemarks(returnLossDb: number | undefined): readonly string[] {
  if (returnLossDb === undefined || (returnLossDb >= 6 && returnLossDb <= 40)) return [];
  const hard = 'couplings would have to be held far better than is usual';
  const odd = 'low for a filter: check that it is dB and not a ratio or a ripple';
  return [`returnLossDb: ${returnLossDb} dB is ${returnLossDb > 40 ? `high, ${hard}` : odd}`];
}
