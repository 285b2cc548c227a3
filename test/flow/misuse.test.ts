import { expect, it } from 'vitest';
import * as irisloom from '../../src/index.js';
import { FilterFailure } from '../../src/index.js';

const {
  arrow,
  applyRotations,
  butterworth,
  certify,
  chebyshev,
  coefficients,
  denormalize,
  evaluateMask,
  folded,
  generalizedChebyshev,
  rotate,
  scatteringAt,
  sweep,
  sweepHz,
  transversal,
} = irisloom;
const matrix = transversal(chebyshev({ order: 3, returnLossDb: 20 }));
const band = { centerHz: 1e9, bandwidthHz: 1e7 };
// Types are what a caller in plain JavaScript does not have.
const none = null as never;

it.each<readonly [string, () => unknown]>([
  ['sweep(null)', () => sweep(none, [0])],
  ['sweep(matrix, null)', () => sweep(matrix, none)],
  ['sweep with null options', () => sweep(matrix, [0], none)],
  ['sweep of text', () => sweep(matrix, 'abc' as never)],
  ['sweepHz(null)', () => sweepHz(none, band, [1e9])],
  ['sweepHz at 0 Hz', () => sweepHz(matrix, band, [0])],
  ['sweepHz without a band', () => sweepHz(matrix, none, [1e9])],
  ['scatteringAt(null)', () => scatteringAt(none, 0)],
  ['scatteringAt({})', () => scatteringAt({} as never, 0)],
  ['scatteringAt at NaN', () => scatteringAt(matrix, Number.NaN)],
  ['transversal(null)', () => transversal(none)],
  ['transversal of half polynomials', () => transversal({ ...butterworth({ order: 2 }), poles: [] })],
  ['coefficients(null)', () => coefficients(none)],
  ['generalizedChebyshev()', () => generalizedChebyshev(undefined as never)],
  ['chebyshev()', () => chebyshev(undefined as never)],
  ['butterworth(null)', () => butterworth(none)],
  ['chebyshev with zeros', () => chebyshev({ order: 3, returnLossDb: 20, transmissionZeros: [2] } as never)],
  ['zeros null', () => generalizedChebyshev({ order: 3, returnLossDb: 20, transmissionZeros: none })],
  ['folded(null)', () => folded(none)],
  ['folded of an endless order', () => folded({ order: Number.POSITIVE_INFINITY, values: [] })],
  ['folded of a large order without rows', () => folded({ order: 1e7, values: [] })],
  [
    'arrow of a lopsided matrix',
    () =>
      arrow({
        order: 1,
        values: [
          [0, 1, 0],
          [2, 0, 1],
          [0, 1, 0],
        ],
      }),
  ],
  ['rotate(null)', () => rotate(none, { pivot: [1, 2], angle: 1 })],
  ['rotate by null', () => rotate(matrix, none)],
  ['a flip that is no list', () => applyRotations(matrix, [{ pivot: [1, 2], angle: 1, flip: 3 as never }])],
  ['denormalize(null)', () => denormalize(none, band)],
  ['evaluateMask without a mask', () => evaluateMask(matrix, band, none)],
  ['certify(null)', () => certify(none, matrix)],
  ['a loss list of the wrong length', () => sweep(matrix, [0], { loss: [1] })],
  ['a negative loss', () => sweep(matrix, [0], { loss: -1 })],
  ['a loss list for polynomials', () => sweep(butterworth({ order: 2 }), [0], { loss: [1, 2] })],
])('%s is refused with a code, what was found, what is allowed and what to do', (_, run) => {
  let failure: unknown;
  try {
    run();
  } catch (error) {
    failure = error;
  }
  expect(failure).toBeInstanceOf(FilterFailure);
  const { code, message } = failure as FilterFailure;
  expect(code).toMatch(/^E_[A-Z_]+$/);
  expect(message.startsWith(code)).toBe(true);
  expect(message).toMatch(/found .*; allowed .*; \S/s);
});

it('a loss list may be a typed array', () => {
  const loss = [0.01, 0.02, 0.03];
  expect(sweep(matrix, [0.5], { loss: Float64Array.from(loss) })).toEqual(sweep(matrix, [0.5], { loss }));
});
