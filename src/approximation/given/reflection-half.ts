import type { FineRoot } from '../../forms/index.js';
import { doubledAdd } from '../../numerics/index.js';
import { axisZeros } from './axis-zeros.js';
import { halfRoots } from './half-roots.js';
import { lookingPoints, roundingOf } from './peak.js';
import { inverseSquare, negated, ONE, type PowerSum } from './power-sum.js';

/** What a response transmits. */
export interface Transmission {
  readonly poles: readonly FineRoot[];
  readonly transmissionZeros: readonly FineRoot[];
  readonly epsilon: number;
}

/**
 * Roots of `|E|^2 - |P|^2/epsilon^2` in the closed left half plane: what a reflection zero and its mirror image may be.
 *
 * Where all power passes the difference has a double root on the axis, which rounding of the data moves by its square root,
 * eight digits. So the iteration runs on data lifted off the axis by a few of their own roundings, and zeros that the data
 * cannot tell from zeros on the axis are put there, where they are right to the last digits again (`axisZeros`).
 * `excess` is by how much power exceeds 1 somewhere, `tolerance` how far the data may be off; both 0 for exact data.
 *
 * @throws FilterFailure E_NO_CONVERGENCE
 */
export function reflectionHalf(transmission: Transmission, excess: number, tolerance: number): readonly FineRoot[] {
  const { poles, transmissionZeros, epsilon } = transmission;
  const taken = { constant: negated(inverseSquare(epsilon)), roots: transmissionZeros };
  const atPoles = Math.max(...lookingPoints(poles).map((omega) => roundingOf(poles, omega)));
  const lift = LIFT_UNITS * Math.max(atPoles, excess);
  const lifted: PowerSum = {
    first: { constant: doubledAdd(ONE, { hi: lift, lo: 0 }), roots: poles },
    second: taken,
  };
  // Not on a symmetric figure: an exactly symmetric iteration cannot separate two roots on the real axis.
  const starts = poles.map(({ re, im }, n) => ({ re: re * (0.5 + 0.01 * n), im: im - 0.003 * n * re }));
  const exact: PowerSum = { first: { constant: ONE, roots: poles }, second: taken };
  return axisZeros(exact, halfRoots(lifted, starts), {
    lift: Math.max(lift, tolerance),
    at: (omega) => ALLOWED * Math.max(roundingOf(poles, omega), excess, tolerance),
  });
}

/** Lift in units of the rounding of the data: enough that no double root splits along the axis. */
const LIFT_UNITS = 2;

/** A sum that should vanish may be off by this many roundings of the poles: theirs, and as much for zeros and constant. */
const ALLOWED = 2;
