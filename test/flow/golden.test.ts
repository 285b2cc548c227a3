import { describe, expect, test } from 'vitest';
import { generalizedChebyshev } from '../../src/approximation/index.js';
import { denormalize, evaluateMask, sweepHz } from '../../src/bandpass/index.js';
import { certify } from '../../src/certification/index.js';
import { bandFromEdges, type MaskLine, omegaFromHz } from '../../src/forms/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { folded } from '../../src/topology/index.js';
import { entry } from '../support/models.js';

/**
 * Three filters invented for these tests, from passband to mask. Golden numbers were computed by a separate 60-digit script
 * from the same mathematics and are stated to the digits below; limits are half a unit of the last digit, a whole one where the text
 * gives a rounded worst value.
 */
interface Golden {
  readonly name: string;
  readonly edgesMhz: readonly [number, number];
  readonly order: number;
  readonly returnLossDb: number;
  readonly zeros: readonly number[];
  readonly unloadedQ: number;
  readonly centerMhz: number;
  readonly fractionPercent: number;
  readonly epsilon: number;
  readonly epsilonR: number;
  readonly zerosMhz: readonly number[];
  /** Folded entries, four decimals. */
  readonly entries: readonly (readonly [number, number, number])[];
  readonly mask: readonly MaskLine[];
  /** Rejections at the worst point of each mask line, dB, one decimal. */
  readonly rejectionsDb: readonly number[];
  readonly lossDb: { readonly center: number; readonly worst: number };
  readonly delayNs: { readonly usable: number; readonly central: number };
  readonly usableMhz: readonly [number, number];
}

const MHZ = 1e6;

const GOLDEN: readonly Golden[] = [
  {
    name: 'six resonators, symmetric zeros, transponder channel',
    edgesMhz: [3822, 3858],
    order: 6,
    returnLossDb: 22,
    zeros: [1.45, -1.45],
    unloadedQ: 9000,
    centerMhz: 3839.958,
    fractionPercent: 0.938,
    epsilon: 3.98423,
    epsilonR: 1,
    zerosMhz: [3866.15, 3813.95],
    entries: [
      [0, 1, 1.0356],
      [1, 2, 0.8659],
      [2, 3, 0.5908],
      [3, 4, 0.7129],
      [2, 5, -0.1561],
      [4, 5, 0.5908],
      [5, 6, 0.8659],
      [6, 7, 1.0356],
      [1, 1, 0],
    ],
    mask: [
      { fromHz: 3816 * MHZ, toHz: 3816 * MHZ, rejectionDb: 24 },
      { fromHz: 3864 * MHZ, toHz: 3864 * MHZ, rejectionDb: 24 },
      { toHz: 3812 * MHZ, rejectionDb: 34 },
      { fromHz: 3868 * MHZ, rejectionDb: 34 },
    ],
    rejectionsDb: [27.1, 26.6, 36.3],
    lossDb: { center: 0.384, worst: 0.75 },
    delayNs: { usable: 32.9, central: 13.3 },
    usableMhz: [3823, 3857],
  },
  {
    name: 'five resonators, both zeros above, receive front end',
    edgesMhz: [2516, 2558],
    order: 5,
    returnLossDb: 20,
    zeros: [1.28, 1.75],
    unloadedQ: 3500,
    centerMhz: 2536.913,
    fractionPercent: 1.656,
    epsilon: 2.66294,
    epsilonR: 1,
    zerosMhz: [2563.94, 2573.93],
    entries: [
      [0, 1, 1.0156],
      [1, 1, 0.0595],
      [1, 2, 0.8728],
      [2, 2, 0.0886],
      [2, 3, 0.3911],
      [2, 4, 0.499],
      [2, 5, 0.2086],
      [3, 3, -0.8454],
      [3, 4, 0.3065],
      [4, 4, -0.157],
      [4, 5, 0.8475],
      [5, 5, 0.0595],
    ],
    mask: [
      { fromHz: 2563 * MHZ, toHz: 2600 * MHZ, rejectionDb: 30 },
      { fromHz: 2600 * MHZ, toHz: 2700 * MHZ, rejectionDb: 42 },
      { toHz: 2480 * MHZ, rejectionDb: 25 },
      { toHz: 2490 * MHZ, rejectionDb: 19 },
    ],
    rejectionsDb: [32.7, 45.8, 28.2, 21.7],
    lossDb: { center: 0.44, worst: 1.405 },
    delayNs: { usable: 49.7, central: 19.8 },
    usableMhz: [2517, 2557],
  },
  {
    name: 'four resonators, fully canonical, minimum volume',
    edgesMhz: [9980, 10020],
    order: 4,
    returnLossDb: 20,
    zeros: [1.55, -1.55, 2.2, -2.2],
    unloadedQ: 6000,
    centerMhz: 9999.98,
    fractionPercent: 0.4,
    epsilon: 6.57721,
    epsilonR: 1.0117624,
    zerosMhz: [],
    entries: [
      [0, 1, 1.00175],
      [1, 2, 0.8217],
      [2, 3, 0.81812],
      [3, 4, 0.8217],
      [4, 5, 1.00175],
    ],
    mask: [
      { fromHz: 9950 * MHZ, toHz: 9970 * MHZ, rejectionDb: 28 },
      { fromHz: 10030 * MHZ, toHz: 10050 * MHZ, rejectionDb: 28 },
      { fromHz: 9800 * MHZ, toHz: 9940 * MHZ, rejectionDb: 15 },
      { fromHz: 10060 * MHZ, toHz: 10200 * MHZ, rejectionDb: 15 },
    ],
    rejectionsDb: [30.9, 16.9],
    lossDb: { center: 0.591, worst: 1.209 },
    delayNs: { usable: 14, central: 6.4 },
    usableMhz: [9982, 10018],
  },
];

describe.each(GOLDEN.map((each) => [each.name, each] as const))('%s', (_, golden) => {
  const band = bandFromEdges(golden.edgesMhz[0] * MHZ, golden.edgesMhz[1] * MHZ);
  const polynomials = generalizedChebyshev({
    order: golden.order,
    returnLossDb: golden.returnLossDb,
    transmissionZeros: golden.zeros,
  });
  const start = transversal(polynomials);
  const { matrix, leftover } = folded(start);
  const lossy = { ...band, unloadedQ: golden.unloadedQ };
  const rows = evaluateMask(matrix, lossy, golden.mask);
  const [low, high] = golden.usableMhz.map((mhz) => mhz * MHZ) as [number, number];

  test('center, fractional bandwidth and zeros in hertz', () => {
    expect(Math.abs(band.centerHz / MHZ - golden.centerMhz)).toBeLessThan(5.01e-4);
    expect(Math.abs((100 * band.bandwidthHz) / band.centerHz - golden.fractionPercent)).toBeLessThan(5e-4);
    golden.zerosMhz.forEach((mhz, n) => {
      const slope = (omegaFromHz(band, mhz * MHZ + 1e3) - omegaFromHz(band, mhz * MHZ)) / 1e3;
      expect(Math.abs(omegaFromHz(band, mhz * MHZ) - golden.zeros[n]!)).toBeLessThan(slope * 5.01e3);
    });
  });

  test('ripple constants', () => {
    const unit = 10 ** -(6 - Math.ceil(Math.log10(golden.epsilon)));
    expect(Math.abs(polynomials.epsilon - golden.epsilon)).toBeLessThan(unit / 2);
    expect(Math.abs(polynomials.epsilonR - golden.epsilonR)).toBeLessThan(5e-8);
  });

  test('folded entries', () => {
    for (const [i, j, value] of golden.entries) {
      const digits = (String(value).split('.')[1] ?? '').length;
      expect(Math.abs(entry(matrix, i, j) - value), `M(${i},${j})`).toBeLessThan(0.5001 * 10 ** -Math.max(4, digits));
    }
  });

  test('every certificate holds', () => {
    for (const { check, holds } of certify(polynomials, matrix, {
      before: start,
      leftover,
      structure: 'folded',
      askedZeros: polynomials.transmissionZeros,
    })) {
      expect(holds, check).toBe(true);
    }
  });

  test('the mask is met, by the stated rejections', () => {
    for (const { margin } of rows) expect(margin).toBeGreaterThan(0);
    const worst = rows.map(({ predicted }) => predicted);
    const stated = golden.rejectionsDb;
    for (const value of stated) expect(Math.min(...worst.map((each) => Math.abs(each - value)))).toBeLessThan(0.0501);
  });

  test('insertion loss at the center and at worst over the usable band', () => {
    const { s21 } = sweepHz(matrix, lossy, [band.centerHz]);
    expect(Math.abs(-20 * Math.log10(Math.hypot(s21.re[0]!, s21.im[0]!)) - golden.lossDb.center)).toBeLessThan(5.01e-4);
    const [row] = evaluateMask(matrix, lossy, [{ fromHz: low, toHz: high, insertionLossDb: 2 }]);
    expect(Math.abs(row!.predicted - golden.lossDb.worst)).toBeLessThan(5.01e-4);
  });

  test('group-delay variation over the usable band and its central 80 percent', () => {
    const inner = (high - low) / 10;
    const lines: MaskLine[] = [
      { fromHz: low, toHz: high, groupDelayVariationSeconds: 1e-7 },
      { fromHz: low + inner, toHz: high - inner, groupDelayVariationSeconds: 1e-7 },
    ];
    const [usable, central] = evaluateMask(matrix, lossy, lines);
    expect(Math.abs(usable!.predicted * 1e9 - golden.delayNs.usable)).toBeLessThan(0.0501);
    expect(Math.abs(central!.predicted * 1e9 - golden.delayNs.central)).toBeLessThan(0.0501);
  });
});

test('six resonators: hand-over numbers', () => {
  const band = bandFromEdges(3822 * MHZ, 3858 * MHZ);
  const { matrix } = folded(
    transversal(generalizedChebyshev({ order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45] })),
  );
  const { resonators, couplings, externalQ, reflectedDelaySeconds } = denormalize(matrix, band);
  for (const { frequencyHz } of resonators) expect(frequencyHz).toBe(band.centerHz);
  expect(couplings.map(({ between }) => between.join())).toEqual(['1,2', '2,3', '2,5', '3,4', '4,5', '5,6']);
  for (const { between, k, bandwidthHz } of couplings) {
    expect(bandwidthHz).toBeCloseTo(entry(matrix, between[0], between[1]) * 36e6, 5);
    expect(k * band.centerHz).toBeCloseTo(bandwidthHz, 5);
  }
  expect(externalQ.source).toBeCloseTo(band.centerHz / 36e6 / entry(matrix, 0, 1) ** 2, 10);
  expect(externalQ.load).toBeCloseTo(externalQ.source!, 10);
  expect(reflectedDelaySeconds.source! * Math.PI * band.centerHz).toBeCloseTo(2 * externalQ.source!, 9);
});

test('four resonators: sizes of the cross and direct couplings, external Q 249.1', () => {
  const band = bandFromEdges(9980 * MHZ, 10020 * MHZ);
  const { matrix } = folded(
    transversal(generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [1.55, -1.55, 2.2, -2.2] })),
  );
  expect(Math.abs(Math.abs(entry(matrix, 1, 4)) - 0.38658)).toBeLessThan(5e-6);
  expect(Math.abs(Math.abs(entry(matrix, 0, 5)) - 0.07646)).toBeLessThan(5e-6);
  const { externalQ, directCoupling } = denormalize(matrix, band);
  expect(Math.abs(externalQ.source! - 249.1)).toBeLessThan(0.05);
  expect(directCoupling).toBe(entry(matrix, 0, 5));
});
