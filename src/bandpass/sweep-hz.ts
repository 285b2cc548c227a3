import { omegaFromHz } from '../forms/index.js';
import { refusal } from '../numerics/index.js';
import { type Curves, checkFrequencies, isMatrix, type Model, sweeper } from '../response/index.js';
import { bandOf, type LossyBand, lossOf } from './band.js';

/** A sweep in hertz; the delay is in seconds. */
export interface SweepHz extends Omit<Curves, 'groupDelay'> {
  readonly frequenciesHz: Float64Array;
  readonly groupDelaySeconds: Float64Array;
}

/** Everything at given hertz, on the exact band-pass map; made once for many grids. */
export function sweeperHz(model: Model, band: LossyBand): (frequenciesHz: Float64Array) => SweepHz {
  isMatrix(model);
  bandOf(band);
  const run = sweeper(model, { loss: lossOf(band, model.order) });
  return (frequenciesHz) => {
    const { groupDelay, ...rest } = run(frequenciesHz.map((hz) => omegaFromHz(band, hz)));
    const groupDelaySeconds = groupDelay.map((delay, n) => delay * secondsPerUnit(band, frequenciesHz[n] as number));
    return { frequenciesHz, ...rest, groupDelaySeconds };
  };
}

/** `d omega/d(2*pi*f)` = `(1 + (f0/f)^2)/(2*pi*B)`: turns normalized delay into seconds at f. */
function secondsPerUnit({ centerHz, bandwidthHz }: LossyBand, hz: number): number {
  return (1 + (centerHz / hz) ** 2) / (2 * Math.PI * bandwidthHz);
}

/**
 * S-parameters and group delay in seconds over a grid in hertz.
 *
 * `band` = { centerHz, bandwidthHz, unloadedQ? }: geometric center and equiripple width in hertz, unloaded Q as one number
 * or one a resonator (loss `f0/(B*Qu)`, constant over the band). Frequencies above 0, any order. The map
 * `omega = (f0/B)*(f/f0 - f0/f)` is exact for lumped resonators; port lengths, dispersion and spurious modes are not in it.
 *
 * @throws FilterFailure E_BAND, E_Q_RANGE, E_FREQUENCY, E_TYPE, E_NOT_FINITE and what `sweep` refuses
 *
 * @example
 * const response = chebyshev({ order: 3, returnLossDb: 20 });
 * const { s21, groupDelaySeconds } = sweepHz(response, { centerHz: 1e9, bandwidthHz: 20e6, unloadedQ: 2000 }, [0.99e9, 1e9]);
 * s21.re.length; // 2
 */
export function sweepHz(model: Model, band: LossyBand, frequenciesHz: ArrayLike<number>): SweepHz {
  const grid = checkFrequencies(frequenciesHz, 'frequenciesHz');
  grid.forEach((hz, n) => {
    if (!(hz > 0))
      throw refusal(
        'E_FREQUENCY',
        `frequenciesHz[${n}]`,
        hz,
        'frequencies above 0 Hz',
        'remove the entry: the band-pass map has no value there',
      );
  });
  return sweeperHz(model, band)(grid);
}
