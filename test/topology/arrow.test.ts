import { describe, expect, test } from 'vitest';
import { butterworth, generalizedChebyshev } from '../../src/approximation/index.js';
import { EPS } from '../../src/numerics/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { applyRotations, arrow, folded } from '../../src/topology/index.js';
import { entry, isSymmetric, matrixGap, randomMatrix, responseGap, sharpness } from '../support/models.js';
import { seeded } from '../support/random.js';
import { LONG_SPECS, SPECS } from '../support/specs.js';

describe.each([...SPECS, ...LONG_SPECS])('arrow(%s)', (_, request) => {
  const polynomials = generalizedChebyshev(request);
  const start = transversal(polynomials);
  const { matrix, rotations, leftover } = arrow(start);
  const zeros = request.transmissionZeros?.length ?? 0;
  const order = request.order;

  test('leaves S-parameters unchanged', () => {
    expect(responseGap(matrix, start)).toBeLessThan(40 * order * EPS * sharpness(polynomials));
  });

  test('is a chain with nz+1 couplings to the load, exact zeros elsewhere', () => {
    for (let i = 0; i <= order; i++) {
      for (let j = i + 2; j <= order; j++) expect(entry(matrix, i, j), `entry (${i},${j})`).toBe(0);
      const coupled = i >= order - zeros;
      if (!coupled) expect(entry(matrix, i, order + 1), `load coupling ${i}`).toBe(0);
    }
    expect(entry(matrix, order - zeros, order + 1)).not.toBe(0);
    expect(isSymmetric(matrix)).toBe(true);
    expect(leftover).toBeLessThan(30 * order * EPS);
  });

  test('has a positive chain', () => {
    for (let i = 0; i < order; i++) expect(entry(matrix, i, i + 1)).toBeGreaterThanOrEqual(0);
  });

  test('replays from its rotations within 1e-12 of a unit of sharpness', () => {
    expect(matrixGap(applyRotations(start, rotations), matrix)).toBeLessThan(1e-12 * sharpness(polynomials));
  });

  test('keeps the norm of both port rows', () => {
    for (const port of [0, order + 1]) {
      const square = (rows: readonly (readonly number[])[]): number =>
        rows[port]!.slice(1, -1).reduce((sum, value) => sum + value * value, 0);
      expect(square(matrix.values) / square(start.values)).toBeCloseTo(1, 12);
    }
  });
});

test('arrow(folded(matrix)) is arrow(matrix)', () => {
  for (const [, request] of SPECS) {
    const polynomials = generalizedChebyshev(request);
    const start = transversal(polynomials);
    const gap = matrixGap(arrow(folded(start).matrix).matrix, arrow(start).matrix);
    expect(gap).toBeLessThan(1e-12 * sharpness(polynomials));
  }
});

test('arrow(all-pole matrix) is the folded matrix: both are the chain', () => {
  for (const order of [1, 2, 5, 9]) {
    const start = transversal(butterworth({ order }));
    expect(matrixGap(arrow(start).matrix, folded(start).matrix)).toBeLessThan(1e-13);
  }
});

test.each([
  ['order 64 at 40 dB with 4 zeros', { order: 64, returnLossDb: 40, transmissionZeros: [1.1, 1.3, -1.1, -1.3] }],
  ['order 64 at 40 dB with 4 zeros above', { order: 64, returnLossDb: 40, transmissionZeros: [1.05, 1.1, 1.2, 1.4] }],
  ['order 100', { order: 100, returnLossDb: 20, transmissionZeros: [1.2, -1.3] }],
])('arrow(%s) does not lose its structure to rounding', (_, request) => {
  // Started from the transversal matrix this reduction put 0.2 where 0 belongs.
  const start = transversal(generalizedChebyshev(request));
  const { matrix, leftover } = arrow(start);
  expect(leftover).toBeLessThan(1e-13);
  expect(responseGap(matrix, start)).toBeLessThan(1e-11);
});

test.each([...SPECS].filter(([name]) => /symmetric|-0|equalized|real pair|close|narrow/.test(name)))(
  'arrow(synchronous %s) has an exactly zero diagonal',
  (_, request) => {
    const { matrix } = arrow(transversal(generalizedChebyshev(request)));
    matrix.values.forEach((row, i) => {
      expect(row[i]).toBe(0);
    });
  },
);

test('arrow(full random matrix) leaves S-parameters unchanged, orders 1 to 12', () => {
  const random = seeded(81);
  for (let order = 1; order <= 12; order++) {
    const start = randomMatrix(order, random);
    const { matrix } = arrow(start);
    expect(responseGap(matrix, start)).toBeLessThan(1e-10);
    for (let i = 0; i <= order; i++) for (let j = i + 2; j <= order; j++) expect(entry(matrix, i, j)).toBe(0);
  }
});
