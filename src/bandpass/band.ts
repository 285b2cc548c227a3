import type { Band } from '../forms/index.js';
import { checkBand, checkUnloadedQ } from '../specification/index.js';

/** A band with the quality of its resonators: one unloaded Q for all, or one a resonator; absent = lossless. */
export interface LossyBand extends Band {
  readonly unloadedQ?: number | readonly number[];
}

/** Only center and width of a band, checked. @throws FilterFailure E_BAND, E_TYPE, E_NOT_FINITE, E_MISSING */
export function bandOf(band: Band): Band {
  return checkBand({ centerHz: band?.centerHz, bandwidthHz: band?.bandwidthHz });
}

/** Normalized loss of each resonator, `f0/(B*Qu)`. @throws FilterFailure E_Q_RANGE, E_TYPE, E_NOT_FINITE */
export function lossOf({ centerHz, bandwidthHz, unloadedQ }: LossyBand, order: number): number | readonly number[] {
  if (unloadedQ === undefined) return 0;
  const quality = checkUnloadedQ(unloadedQ, order);
  const loss = (one: number): number => centerHz / (bandwidthHz * one);
  return typeof quality === 'number' ? loss(quality) : quality.map(loss);
}
