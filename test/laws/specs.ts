import fc from 'fast-check';
import type { GeneralizedChebyshevRequest, TransmissionZero } from '../../src/approximation/index.js';
import type { CouplingMatrix, FilterPolynomials, Rotation } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { randomMatrix, sharpness } from '../support/models.js';
import { seeded } from '../support/random.js';

export type Request = GeneralizedChebyshevRequest & { readonly transmissionZeros: readonly TransmissionZero[] };

/** Most requests are of order 1 to 16; one in twelve is longer. */
const LONGEST = 40;

const STEPS = 2 ** 30;

/** A number spread evenly over [min, max]; `fc.double` spreads over bit patterns, nearly all of them close to 0. */
export const uniform = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: 0, max: STEPS }).map((n) => min + ((max - min) * n) / STEPS);

const power = (min: number, max: number): fc.Arbitrary<number> => uniform(min, max).map((exponent) => 10 ** exponent);

/** A zero on the axis: |w| = 1 + 1e-3 ... 10, uniform in the logarithm, either side. */
export const axisZero: fc.Arbitrary<number> = fc
  .tuple(power(-3, 1), fc.boolean())
  .map(([beyond, above]) => (above ? 1 + beyond : -1 - beyond));

/** A pair off the axis, mirrored in it; real-axis pairs now and then. */
const pair: fc.Arbitrary<TransmissionZero[]> = fc
  .tuple(power(-2, 1), fc.oneof(fc.constant(0), uniform(-1.5, 1.5)))
  .map(([re, im]) => [
    { re, im },
    { re: -re, im },
  ]);

const group: fc.Arbitrary<TransmissionZero[]> = fc.oneof(
  { weight: 6, arbitrary: axisZero.map((w) => [w]) },
  { weight: 2, arbitrary: axisZero.map((w) => [w, -w]) },
  { weight: 1, arbitrary: axisZero.map((w) => [w, w]) },
  { weight: 2, arbitrary: pair },
);

function assemble(
  order: number,
  returnLossDb: number,
  groups: readonly TransmissionZero[][],
  canonical: boolean,
): Request {
  const zeros: TransmissionZero[] = [];
  for (const each of groups) if (zeros.length + each.length <= order) zeros.push(...each);
  for (let n = 0; canonical && zeros.length < order; n++) zeros.push((n % 2 === 0 ? 1 : -1) * (1.5 + 0.37 * n));
  return { order, returnLossDb, transmissionZeros: zeros };
}

const orders = (longest: number): fc.Arbitrary<number> =>
  longest <= 16
    ? fc.integer({ min: 1, max: longest })
    : fc.oneof(
        { weight: 11, arbitrary: fc.integer({ min: 1, max: 16 }) },
        { weight: 1, arbitrary: fc.integer({ min: 17, max: longest }) },
      );

/** Requests up to a given order: none to N zeros, one in eight fully canonical, return loss 3 to 40 dB. */
export const requests = (longest: number = LONGEST): fc.Arbitrary<Request> =>
  fc
    .tuple(
      orders(longest),
      uniform(3, 40),
      fc.array(group, { maxLength: 8 }),
      fc.oneof({ weight: 7, arbitrary: fc.constant(false) }, { weight: 1, arbitrary: fc.constant(true) }),
    )
    .map(([order, returnLossDb, groups, canonical]) => assemble(order, returnLossDb, groups, canonical));

/** Requests with zeros mirrored about the center. */
export const symmetricRequests: fc.Arbitrary<Request> = fc
  .tuple(
    fc.integer({ min: 2, max: 16 }),
    uniform(3, 40),
    fc.array(
      fc.oneof(
        axisZero.map((w) => [w, -w]),
        pair.map(([zero]) => {
          const re = (zero as { re: number }).re;
          return [
            { re, im: 0 },
            { re: -re, im: 0 },
          ];
        }),
      ),
      { maxLength: 4 },
    ),
  )
  .map(([order, returnLossDb, groups]) => assemble(order, returnLossDb, groups as TransmissionZero[][], false));

/** All-pole requests. */
export const plainRequests: fc.Arbitrary<Request> = fc
  .tuple(orders(LONGEST), uniform(3, 40))
  .map(([order, returnLossDb]) => ({ order, returnLossDb, transmissionZeros: [] }));

/** Requests with at least one zero on the axis. */
export const zeroRequests: fc.Arbitrary<Request> = fc
  .tuple(requests(), axisZero)
  .map(([request, zero]) =>
    request.transmissionZeros.some((each) => typeof each === 'number') ||
    request.transmissionZeros.length === request.order
      ? request
      : { ...request, transmissionZeros: [zero, ...request.transmissionZeros] },
  )
  .filter(({ transmissionZeros }) => transmissionZeros.some((each) => typeof each === 'number'));

/** A frequency in the band, around it, or far out. */
export const frequency: fc.Arbitrary<number> = fc.oneof(
  { weight: 4, arbitrary: uniform(-1, 1) },
  { weight: 3, arbitrary: uniform(-3, 3) },
  { weight: 1, arbitrary: axisZero },
  { weight: 1, arbitrary: fc.constantFrom(0, 1, -1, 30, -30) },
);

/**
 * A dense symmetric matrix with entries in (-1, 1), every node coupled to every other: S11 different from S22. Made from a
 * seed, because shrinking entries to 0 would cut resonators off, and what nothing damps has no response.
 */
export const matrices = (smallest: number, longest: number): fc.Arbitrary<CouplingMatrix> =>
  fc
    .tuple(fc.integer({ min: smallest, max: longest }), fc.nat(2 ** 31 - 1))
    .map(([order, seed]) => randomMatrix(order, seeded(seed)));

/** Chains of rotations for any order of at least 2: node numbers are taken modulo the order. */
export const chains: fc.Arbitrary<(order: number) => Rotation[]> = fc
  .array(fc.tuple(fc.nat(1000), fc.nat(1000), uniform(-4, 4), fc.boolean()), { minLength: 1, maxLength: 30 })
  .map(
    (steps) => (order: number) =>
      steps.map(([a, b, angle, flip]): Rotation => {
        const i = 1 + (a % order);
        const j = 1 + ((i + (b % (order - 1))) % order);
        return flip ? { pivot: [i, j], angle, flip: [j] } : { pivot: [i, j], angle };
      }),
  );

/** Room for rounding in a response of these polynomials: eps, times the order, times the magnification by the narrowest pole. */
export const roomOf = (polynomials: FilterPolynomials): number =>
  100 * (polynomials.order + 2) * EPS * sharpness(polynomials);

/** The request with every zero mirrored about omega = 0. */
export const mirroredRequest = (request: Request): Request => ({
  ...request,
  transmissionZeros: request.transmissionZeros.map((zero) =>
    typeof zero === 'number' ? -zero : { re: zero.re, im: -zero.im },
  ),
});
