import type { Fault, Path } from './faults.js';
import { failureOf, kindFault } from './faults.js';

/**
 * Least and largest rejection of a stop band, dB: below a tenth of a decibel it stops nothing; at 300 dB |S21| is 1e-15, and
 * the reflection of the stop band is 1 to the last digit many times over.
 */
export const REJECTION_DB: readonly [number, number] = [0.1, 300];
const [MIN_REJECTION_DB, MAX_REJECTION_DB] = REJECTION_DB;
const REJECTION_ALLOWED = `a positive number of dB, ${MIN_REJECTION_DB} to ${MAX_REJECTION_DB}`;

/** Zeros farther out than this are refused wherever they are given; no stop band starts beyond. */
const MAX_EDGE = 1e4;
const EDGE_ALLOWED = `a normalized frequency above 1, to ${MAX_EDGE}`;

/** The fault of the rejection of a stop band, if it has one. */
export function rejectionFault(value: unknown, path: Path = ['rejectionDb']): Fault | undefined {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    return kindFault(path, value, REJECTION_ALLOWED, 'give the least rejection of the stop band');
  }
  if (value >= MIN_REJECTION_DB && value <= MAX_REJECTION_DB) return undefined;
  return {
    code: 'E_REJECTION_RANGE',
    path,
    found: String(value),
    allowed: REJECTION_ALLOWED,
    advice: value < 0 ? `drop the sign: did you mean ${-value}?` : value < MIN_REJECTION_DB ? 'raise it' : 'lower it',
    value,
    limit: [MIN_REJECTION_DB, MAX_REJECTION_DB],
  };
}

/** The fault of the edge of a stop band (normalized, the pass band ends at 1), if it has one. */
export function stopBandEdgeFault(value: unknown, path: Path = ['stopBandEdge']): Fault | undefined {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    return kindFault(path, value, EDGE_ALLOWED, 'give the normalized frequency where the stop band starts');
  }
  if (value > 1 && value <= MAX_EDGE) return undefined;
  return {
    code: 'E_STOP_BAND',
    path,
    found: String(value),
    allowed: EDGE_ALLOWED,
    advice: 'the pass band ends at 1: write where the stop band starts, such as 1.2',
    value,
    limit: [1, MAX_EDGE],
  };
}

/**
 * Checks the rejection of an equiripple stop band in decibels: a positive number, 0.1 to 300.
 *
 * @param value anything; the argument is called `rejectionDb` in the message
 * @returns the level itself, dB
 * @throws FilterFailure E_REJECTION_RANGE, E_TYPE, E_NOT_FINITE or E_MISSING
 * @example
 * checkRejection(60); // 60
 */
export function checkRejection(value: unknown): number {
  const fault = rejectionFault(value);
  if (fault !== undefined) throw failureOf(fault);
  return value as number;
}

/**
 * Checks the normalized edge of a stop band: above 1, to 10000.
 *
 * @param value anything; the argument is called `stopBandEdge` in the message
 * @returns the edge itself
 * @throws FilterFailure E_STOP_BAND, E_TYPE, E_NOT_FINITE or E_MISSING
 * @example
 * checkStopBandEdge(1.2); // 1.2
 */
export function checkStopBandEdge(value: unknown): number {
  const fault = stopBandEdgeFault(value);
  if (fault !== undefined) throw failureOf(fault);
  return value as number;
}
