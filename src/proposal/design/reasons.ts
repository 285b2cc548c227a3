import { FilterFailure } from '../../numerics/index.js';
import type { BestZeros, BestZerosTable } from './best-zeros.js';
import { lineWords, missWords } from './line-words.js';
import type { CheckedRequest } from './request.js';

/** A zero farther out is not worth its coupling, nor one that gains less. */
const FARTHEST_USEFUL = 6;
const LEAST_GAIN_DB = 0.3;

/** The rejection that the best zeros of one order and count miss, in words. */
export function missedRejection(
  order: number,
  zeroCount: number,
  { mask, margins }: CheckedRequest,
  table: BestZerosTable,
): string | undefined {
  const zeros = attempt(() => table.best(order, zeroCount));
  if (typeof zeros === 'string') return zeros;
  const missing = margins.rejectionDb - zeros.marginDb;
  if (missing <= 1e-9) return undefined;
  const dearest = zeros.costs.reduce((most, cost) => (cost.weight > most.weight ? cost : most));
  const line = mask[dearest.line] as (typeof mask)[number];
  return `the rejection is missed by ${missWords(line, missing)}, first at ${lineWords(line, dearest.line)}`;
}

/** Why the last zero is not worth it: too far out, or too little gained where the mask is met without it. */
export function uselessZero(zeros: BestZeros, request: CheckedRequest, table: BestZerosTable): string | undefined {
  const { order, zeroCount, transmissionZeros, marginDb } = zeros;
  const farthest = transmissionZeros.reduce((far, omega) => (Math.abs(omega) > Math.abs(far) ? omega : far), 0);
  if (Math.abs(farthest) > FARTHEST_USEFUL || transmissionZeros.length < zeroCount)
    return `a zero ${Math.abs(farthest) > FARTHEST_USEFUL ? `at omega = ${farthest.toFixed(1)}` : 'at infinity'} is of no use: farther out than ${FARTHEST_USEFUL}`;
  if (zeroCount === 0) return undefined;
  const before = attempt(() => table.best(order, zeroCount - 1));
  if (typeof before === 'string' || before.marginDb < request.margins.rejectionDb) return undefined;
  const gain = marginDb - before.marginDb;
  if (gain >= LEAST_GAIN_DB) return undefined;
  return `the last zero changes the margin by ${gain.toFixed(2)} dB only, and the mask is met without it`;
}

/** A value, or the message of a refusal that concerns this one design: others go on. A stop ends everything. */
export function attempt<T extends object>(find: () => T): T | string {
  try {
    return find();
  } catch (error) {
    if (error instanceof FilterFailure && error.code !== 'E_STOPPED') return error.message;
    throw error;
  }
}
