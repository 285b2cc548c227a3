import type { Band } from '../forms/index.js';
import { LEAST_HZ, MOST_HZ, readFrequency } from './band.js';
import type { Fault } from './faults.js';
import type { SweepInput, SweepRange } from './specification.js';

const LEAST_POINTS = 2;
const MOST_POINTS = 100_001;
/** Below this the dissipation f0/(B*Qu) could overflow. */
const LEAST_Q = 1e-6;
/** Above this dissipation f0/(B*Qu) the midband loss is so large that a unit was probably mistaken. */
const LARGE_LOSS = 0.1;

/** Adds the faults of an unloaded Q: positive and finite, one or `order` values. */
export function readUnloadedQ(q: number | readonly number[], order: number | undefined, faults: Fault[]): void {
  const allowed = 'a positive number, or a list with one for each resonator';
  const isList = typeof q !== 'number';
  if (isList && order !== undefined && q.length !== order) {
    const advice = `give ${order} values, or one number for all`;
    const found = `${q.length} values for order ${order}`;
    faults.push({ code: 'E_Q_RANGE', path: ['unloadedQ'], found, allowed, advice, value: q.length, limit: order });
  }
  (isList ? q : [q]).forEach((value, index) => {
    if (value >= LEAST_Q) return;
    const path = isList ? ['unloadedQ', index] : ['unloadedQ'];
    const advice = 'write a positive Q, or leave the key out for a lossless filter';
    faults.push({ code: 'E_Q_RANGE', path, found: String(value), allowed, advice, value });
  });
}

/** A remark when the resonators are too lossy for so narrow a band. */
export function lossRemarks(q: number | readonly number[] | undefined, band: Band): readonly string[] {
  if (q === undefined) return [];
  const worst = typeof q === 'number' ? q : Math.min(...q);
  const loss = band.centerHz / (band.bandwidthHz * worst);
  if (!(loss > LARGE_LOSS)) return [];
  return [`unloadedQ: ${worst} gives f0/(B*Qu) = ${loss.toPrecision(3)}, a large loss at the center: check the units`];
}

/** Reads the frequencies of the predicted response. */
export function readSweep(sweep: SweepInput, faults: Fault[]): SweepRange | undefined {
  const fromHz = readFrequency(sweep.fromHz, ['sweep', 'fromHz'], faults);
  const toHz = readFrequency(sweep.toHz, ['sweep', 'toHz'], faults);
  const { points } = sweep;
  const base = { code: 'E_SWEEP', path: ['sweep'] };
  const rightCount = Number.isInteger(points) && points >= LEAST_POINTS && points <= MOST_POINTS;
  if (!rightCount) {
    const allowed = `a whole number, ${LEAST_POINTS} to ${MOST_POINTS}`;
    const advice = 'give the number of frequencies, both ends included';
    faults.push({ ...base, path: ['sweep', 'points'], found: String(points), allowed, advice, value: points });
  }
  if (fromHz === undefined || toHz === undefined) return undefined;
  if (!(fromHz >= LEAST_HZ && toHz > fromHz && toHz <= MOST_HZ)) {
    const allowed = `${LEAST_HZ} <= fromHz < toHz <= ${MOST_HZ}`;
    const advice = fromHz > toHz ? 'exchange fromHz and toHz?' : 'give two different positive frequencies';
    faults.push({ ...base, found: `${fromHz} Hz to ${toHz} Hz`, allowed, advice, value: sweep });
    return undefined;
  }
  return rightCount ? { fromHz, toHz, points } : undefined;
}
