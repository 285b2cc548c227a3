import type { CurveData } from './curve-data.js';

/** Numbers for the readout of a document, over one grid: decibels to 0.01 (attenuation and return loss positive), delay to 1 ps. */
export interface SweepData {
  readonly hz: readonly number[];
  readonly s21Db: readonly number[];
  readonly s11Db: readonly number[];
  readonly delayNs: readonly number[];
  /** Absent where the design states no loss. */
  readonly s21LosslessDb?: readonly number[];
  readonly s11LosslessDb?: readonly number[];
  readonly delayLosslessNs?: readonly number[];
}

/** Points that a reader can step through. */
const MOST_POINTS = 1201;

function rounded(values: Float64Array, picked: readonly number[], scale: number, digits: number): readonly number[] {
  return picked.map((n) => Number(((values[n] as number) * scale).toFixed(digits)));
}

/** Every k-th point of the grid, so that no more than the most are left. */
export function sweepData({ hz, lossy, lossless, hasLoss }: CurveData): SweepData {
  const stride = Math.ceil(hz.length / MOST_POINTS);
  const picked = Array.from({ length: Math.ceil(hz.length / stride) }, (_, n) => n * stride);
  const own = {
    hz: picked.map((n) => Number((hz[n] as number).toPrecision(10))),
    s21Db: rounded(lossy.attenuationDb, picked, 1, 2),
    s11Db: rounded(lossy.returnLossDb, picked, 1, 2),
    delayNs: rounded(lossy.delaySeconds, picked, 1e9, 3),
  };
  if (!hasLoss) return own;
  return {
    ...own,
    s21LosslessDb: rounded(lossless.attenuationDb, picked, 1, 2),
    s11LosslessDb: rounded(lossless.returnLossDb, picked, 1, 2),
    delayLosslessNs: rounded(lossless.delaySeconds, picked, 1e9, 3),
  };
}
