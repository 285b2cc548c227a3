import { butterworth, chebyshev, coefficients, generalizedChebyshev } from '../../src/approximation/index.js';
import { denormalize, sweepHz } from '../../src/bandpass/index.js';
import { scatteringAt, sweep } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { annihilate, applyRotations, arrow, folded, rotate } from '../../src/topology/index.js';

/** The public functions that the laws speak about; a law takes them from here, so that it can be tried on a faulty engine. */
export interface Engine {
  readonly butterworth: typeof butterworth;
  readonly chebyshev: typeof chebyshev;
  readonly generalizedChebyshev: typeof generalizedChebyshev;
  readonly coefficients: typeof coefficients;
  readonly transversal: typeof transversal;
  readonly folded: typeof folded;
  readonly arrow: typeof arrow;
  readonly rotate: typeof rotate;
  readonly annihilate: typeof annihilate;
  readonly applyRotations: typeof applyRotations;
  readonly scatteringAt: typeof scatteringAt;
  readonly sweep: typeof sweep;
  readonly denormalize: typeof denormalize;
  readonly sweepHz: typeof sweepHz;
}

/** The engine as it is shipped. */
export const ENGINE: Engine = {
  butterworth,
  chebyshev,
  generalizedChebyshev,
  coefficients,
  transversal,
  folded,
  arrow,
  rotate,
  annihilate,
  applyRotations,
  scatteringAt,
  sweep,
  denormalize,
  sweepHz,
};
