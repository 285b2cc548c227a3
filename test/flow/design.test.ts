import { describe, expect, it } from 'vitest';
import {
  arrow,
  certify,
  design,
  FilterFailure,
  folded,
  generalizedChebyshev,
  type Rotation,
  scatteringAt,
  transversal,
} from '../../src/index.js';

const passband = { lowerHz: '2516 MHz', upperHz: 2558e6 };

function refusalOf(run: () => unknown): FilterFailure {
  try {
    run();
  } catch (error) {
    if (error instanceof FilterFailure) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('design(specification)', () => {
  it.each(['folded', 'arrow', 'transversal', 'inline'] as const)('gives a certified %s matrix', (topology) => {
    const transmissionZeros = topology === 'inline' ? [] : [1.28, 1.75];
    const result = design({ passband, order: 5, returnLossDb: 20, transmissionZeros, topology });
    expect(result.certificates.length).toBeGreaterThan(15);
    expect(result.certificates.every(({ holds }) => holds)).toBe(true);
    for (const omega of [-1.5, 0.3, 1, 1.4]) {
      const [a, b] = [scatteringAt(result.matrix, omega).s21, scatteringAt(result.polynomials, omega).s21];
      expect(Math.hypot(a.re - b.re, a.im - b.im)).toBeLessThan(1e-14);
    }
  });

  it('gives the same bytes twice and leaves its argument alone', () => {
    const specification = Object.freeze({
      passband: Object.freeze(passband),
      order: 6,
      returnLossDb: 22,
      transmissionZeros: Object.freeze([1.45, -1.45]),
    });
    expect(JSON.stringify(design(specification))).toBe(JSON.stringify(design(specification)));
  });

  it('refuses a zero at 1 + 1e-12 by certificate, with a distance that then passes', () => {
    const request = { passband, order: 6, returnLossDb: 20 };
    const failure = refusalOf(() => design({ ...request, transmissionZeros: [1 + 1e-12] }));
    expect(failure.code).toBe('E_CERT');
    expect(failure.message).toMatch(
      /C\d .*: found .*; allowed .*; move the transmission zeros out to \|omega\| >= 1\.0+[1-9]/,
    );
    expect(failure.value).toBeGreaterThan(failure.limit as number);
    const passing = Number(/>= (1\.0\d+)/.exec(failure.hint ?? '')?.[1]);
    expect(design({ ...request, transmissionZeros: [passing] }).certificates.every(({ holds }) => holds)).toBe(true);
  });

  it('lists every fault of a specification', () => {
    const failure = refusalOf(() =>
      design({ passband: { lowerHz: 2, upperHz: 1 }, order: 0, returnLossDb: -20, transmissionZeros: [0.5] }),
    );
    expect(failure.faults.map(({ code }) => code).sort()).toEqual([
      'E_BAND',
      'E_ORDER_RANGE',
      'E_RL_RANGE',
      'E_ZERO_IN_PASSBAND',
    ]);
  });
});

// Each of these came out wrong once: a pole twice, a resonance missed next to a narrow one.
describe('filters that were wrong before', () => {
  it.each([
    {
      order: 3,
      returnLossDb: 20,
      transmissionZeros: [
        { re: 0.055, im: -0.3321 },
        { re: -0.055, im: -0.3321 },
      ],
    },
    { order: 6, returnLossDb: 31.7, transmissionZeros: [{ re: -0.4015, im: 0 }, { re: 0.4015, im: 0 }, 4.066, 1.0011] },
    { order: 43, returnLossDb: 23.39145982055925, transmissionZeros: [] },
    { order: 34, returnLossDb: 30.069142011925578, transmissionZeros: [-1.0094786064454677] },
  ])('order $order', (request) => {
    const response = generalizedChebyshev(request);
    expect(certify(response, transversal(response)).filter(({ holds }) => !holds)).toEqual([]);
  });
});

// Poles came out in the right half plane, or twice, and nothing said so.
describe('adversarial zeros', () => {
  const pair = (re: number, im: number) => [
    { re, im },
    { re: -re, im },
  ];

  it.each([
    { order: 2, returnLossDb: 60, transmissionZeros: [1.3, 1.3] },
    { order: 2, returnLossDb: 65.71459417461078, transmissionZeros: [1.1283332069400271, 1433.3301192848012] },
    { order: 3, returnLossDb: 80, transmissionZeros: [1e4, -9e3] },
    { order: 2, returnLossDb: 100, transmissionZeros: [2, 2] },
    { order: 4, returnLossDb: 54, transmissionZeros: [-1.2, 1.02, 1.002, 1.02] },
    {
      order: 7,
      returnLossDb: 56.3,
      transmissionZeros: [-1.0013553460518678, -1.0102542269994612, -1.0095187292362282, 1.2, 1.2],
    },
    { order: 4, returnLossDb: 80, transmissionZeros: [...pair(0.05, 0), ...pair(0.05, 0)] },
    {
      order: 5,
      returnLossDb: 0.5,
      transmissionZeros: [
        ...pair(0.05100268731274092, -0.3073053420521319),
        ...pair(0.02121274161050025, 0.4055576669052243),
      ],
    },
  ])('order $order at $returnLossDb dB are certified', (request) => {
    const response = generalizedChebyshev(request);
    expect(response.poles.every(({ re }) => re < 0)).toBe(true);
    expect(certify(response, transversal(response)).filter(({ holds }) => !holds)).toEqual([]);
  });

  it.each([
    { order: 5, returnLossDb: 0.1, transmissionZeros: [...pair(1e-6, 0), ...pair(1e-6, 0), -1.0974540980905751] },
    { order: 4, returnLossDb: 20, transmissionZeros: [...pair(1e-9, 0), ...pair(1e-9, 0)] },
  ])('order $order within rounding of the axis are refused', (request) => {
    expect(refusalOf(() => generalizedChebyshev(request)).code).toMatch(/E_ILL_CONDITIONED|E_NO_CONVERGENCE/);
  });
});

describe('certify with rotations', () => {
  const response = generalizedChebyshev({ order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.3] });
  const before = transversal(response);
  const { matrix, rotations } = folded(before);
  const red = (changed: readonly Rotation[]): string[] =>
    certify(response, matrix, { before, rotations: changed })
      .filter(({ holds }) => !holds)
      .map(({ check }) => check);

  it('holds for the rotations that were made, to order 100', () => {
    expect(red(rotations)).toEqual([]);
    const long = generalizedChebyshev({ order: 100, returnLossDb: 25, transmissionZeros: [1.05, -1.1] });
    const start = transversal(long);
    const reduced = arrow(start);
    expect(
      certify(long, reduced.matrix, { before: start, rotations: reduced.rotations }).every(({ holds }) => holds),
    ).toBe(true);
  });

  it.each<readonly [string, readonly Rotation[]]>([
    [
      'a stale one',
      rotations.map((rotation, n) => (n === 3 ? { ...rotation, angle: rotation.angle + 1e-6 } : rotation)),
    ],
    ['a missing one', rotations.slice(1)],
    ['two exchanged', [rotations[1], rotations[0], ...rotations.slice(2)] as Rotation[]],
  ])('is red for %s', (_, changed) => {
    expect(red(changed)).toEqual(['C7 rotations replayed against the matrix']);
  });
});
