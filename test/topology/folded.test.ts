import { describe, expect, test } from 'vitest';
import { butterworth, chebyshev, generalizedChebyshev } from '../../src/approximation/index.js';
import type { CouplingMatrix } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { applyRotations, folded } from '../../src/topology/index.js';
import {
  entry,
  isSymmetric,
  matrixGap,
  normOf,
  randomMatrix,
  responseGap,
  sharpness,
  withEntry,
} from '../support/models.js';
import { seeded } from '../support/random.js';
import { LONG_SPECS, SPECS } from '../support/specs.js';

/** Whether the folded form of nz finite zeros may have entry (i, j), i < j: main line and the nz innermost crossings. */
function allowed(order: number, zeros: number, i: number, j: number): boolean {
  if (i === j) return i > 0 && i <= order;
  if (j === i + 1) return true;
  // Entry (i, j) closes a path over i + (N+1-j) resonators; only i+j = N+1 or N+2 lie across the fold.
  if (i + j !== order + 1 && i + j !== order + 2) return false;
  return i + (order + 1 - j) >= order - zeros;
}

function expectStructure(matrix: CouplingMatrix, zeros: number): void {
  matrix.values.forEach((row, i) => {
    row.forEach((value, j) => {
      if (i <= j && !allowed(matrix.order, zeros, i, j)) expect(value, `entry (${i},${j})`).toBe(0);
    });
  });
}

describe.each([...SPECS, ...LONG_SPECS])('folded(%s)', (_, request) => {
  const polynomials = generalizedChebyshev(request);
  const start = transversal(polynomials);
  const { matrix, rotations, leftover } = folded(start);
  const zeros = request.transmissionZeros?.length ?? 0;
  const order = request.order;

  test('leaves S-parameters unchanged', () => {
    expect(responseGap(matrix, start)).toBeLessThan(40 * order * EPS * sharpness(polynomials));
  });

  test('has exact zeros outside main line, diagonal and the innermost crossings', () => {
    expectStructure(matrix, zeros);
    expect(isSymmetric(matrix)).toBe(true);
    expect(matrix.finiteZeros).toBe(zeros);
    expect(leftover).toBeLessThan(30 * order * EPS);
  });

  test('has a positive main line', () => {
    for (let i = 1; i <= order; i++) expect(entry(matrix, i, i + 1)).toBeGreaterThanOrEqual(0);
  });

  test('replays from its rotations within 1e-12, none of which touches a port', () => {
    expect(matrixGap(applyRotations(start, rotations), matrix)).toBeLessThan(1e-12);
    expect(rotations.length).toBeLessThanOrEqual((order * (order - 1)) / 2 + 1);
    for (const { pivot, flip } of rotations) {
      for (const node of [...pivot, ...(flip ?? [])]) {
        expect(node).toBeGreaterThanOrEqual(1);
        expect(node).toBeLessThanOrEqual(order);
      }
    }
  });

  test('is the same when it is folded again', () => {
    const again = folded(matrix);
    expect(matrixGap(again.matrix, matrix)).toBeLessThan(30 * order * EPS);
  });
});

test.each([...SPECS].filter(([name]) => /symmetric|-0|equalized|real pair|close|narrow/.test(name)))(
  'folded(synchronous %s) has an exactly zero diagonal and no coupling between nodes of equal parity',
  (_, request) => {
    const { matrix } = folded(transversal(generalizedChebyshev(request)));
    matrix.values.forEach((row, i) => {
      row.forEach((value, j) => {
        if ((i + j) % 2 === 0) expect(value).toBe(0);
      });
    });
  },
);

test('folded(all-pole matrix) reads the same from either port', () => {
  for (const [order, returnLossDb] of [
    [4, 20],
    [9, 12],
    [16, 30],
  ] as const) {
    const { matrix } = folded(transversal(chebyshev({ order, returnLossDb })));
    for (let i = 0; i <= order; i++) {
      expect(Math.abs(entry(matrix, i, i + 1) - entry(matrix, order - i, order + 1 - i))).toBeLessThan(4 * EPS);
    }
  }
});

test('folded(asymmetric matrix) keeps its diagonal', () => {
  const { matrix } = folded(transversal(generalizedChebyshev({ order: 3, returnLossDb: 20, transmissionZeros: [50] })));
  expect(entry(matrix, 1, 1)).not.toBe(0);
});

test('folded(all-pole matrix) is the in-line form of the closed-form couplings', () => {
  for (const order of [2, 3, 4, 7, 12]) {
    for (const returnLossDb of [3, 20, 35]) {
      const { matrix } = folded(transversal(chebyshev({ order, returnLossDb })));
      const eta = Math.asinh(Math.sqrt(10 ** (returnLossDb / 10) - 1)) / order;
      const sine = (i: number): number => Math.sin(((2 * i - 1) * Math.PI) / (2 * order));
      for (let i = 1; i < order; i++) {
        const square = (Math.sinh(eta) ** 2 + Math.sin((i * Math.PI) / order) ** 2) / (4 * sine(i) * sine(i + 1));
        expect(entry(matrix, i, i + 1) / Math.sqrt(square) - 1).toBeCloseTo(0, 12);
      }
      const port = Math.sqrt(Math.sinh(eta) / (2 * sine(1)));
      expect(entry(matrix, 0, 1) / port - 1).toBeCloseTo(0, 12);
      expect(entry(matrix, order, order + 1) / port - 1).toBeCloseTo(0, 12);
    }
  }
});

test('folded(Butterworth) is the in-line form of g = 2 sin((2i-1) pi/2N)', () => {
  for (const order of [1, 2, 3, 5, 8, 13, 30]) {
    const { matrix } = folded(transversal(butterworth({ order })));
    const g = (i: number): number => (i === 0 || i > order ? 1 : 2 * Math.sin(((2 * i - 1) * Math.PI) / (2 * order)));
    for (let i = 0; i <= order; i++) expect(entry(matrix, i, i + 1) * Math.sqrt(g(i) * g(i + 1))).toBeCloseTo(1, 12);
  }
});

test('folded(matrix without a stated number of zeros) finds the same structure', () => {
  for (const [, request] of SPECS) {
    const { order, values } = transversal(generalizedChebyshev(request));
    const { matrix } = folded({ order, values });
    expectStructure(matrix, request.transmissionZeros?.length ?? 0);
    expect('finiteZeros' in matrix).toBe(false);
  }
});

test('folded(matrix that states too few zeros) is refused: real couplings would be cleared', () => {
  const start = transversal(generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [2, -2] }));
  for (const finiteZeros of [0, 1]) {
    expect(() => folded({ ...start, finiteZeros })).toThrowError(expect.objectContaining({ code: 'E_FINITE_ZEROS' }));
  }
  for (const finiteZeros of [-3, 1.5, Number.NaN, 5, null, '2']) {
    expect(() => folded({ ...start, finiteZeros: finiteZeros as never })).toThrowError(
      expect.objectContaining({ code: 'E_TYPE' }),
    );
  }
  expect(folded({ ...start, finiteZeros: 2 }).leftover).toBeLessThan(30 * EPS);
});

test('folded(full random matrix) leaves S-parameters unchanged, orders 1 to 12', () => {
  const random = seeded(71);
  for (let order = 1; order <= 12; order++) {
    const start = randomMatrix(order, random);
    const { matrix, rotations } = folded(start);
    // A random network has S11 != S22 and poles anywhere; compare entries, which fix the response.
    expect(matrixGap(applyRotations(start, rotations), matrix)).toBeLessThan(1e-12);
    expect(responseGap(matrix, start)).toBeLessThan(1e-10);
    for (let i = 0; i <= order; i++) {
      for (let j = i + 2; j <= order + 1; j++) {
        if (i + j !== order + 1 && i + j !== order + 2) expect(entry(matrix, i, j)).toBe(0);
      }
    }
  }
});

test('folded(decoupled matrix) has no pivot to divide by and stays as it is', () => {
  const dark: CouplingMatrix = { order: 3, values: Array.from({ length: 5 }, () => [0, 0, 0, 0, 0]) };
  expect(folded(dark).matrix.values).toEqual(dark.values);
  const lone = withEntry(withEntry(dark, 0, 2, 1), 2, 4, 1);
  expect(
    responseGap(
      folded(withEntry(withEntry(lone, 1, 1, 5), 3, 3, 7)).matrix,
      withEntry(withEntry(lone, 1, 1, 5), 3, 3, 7),
      [0.3],
    ),
  ).toBeLessThan(1e-14);
});

test('folded(matrix of any scale) scales with it', () => {
  const start = transversal(generalizedChebyshev({ order: 5, returnLossDb: 20, transmissionZeros: [1.28, 1.75] }));
  for (const factor of [2 ** -60, 2 ** 20]) {
    const scaledStart = { ...start, values: start.values.map((row) => row.map((value) => value * factor)) };
    const { matrix } = folded(scaledStart);
    const plain = folded(start).matrix;
    matrix.values.forEach((row, i) => {
      row.forEach((value, j) => {
        expect(Math.abs(value / factor - entry(plain, i, j))).toBeLessThan(30 * EPS * normOf(plain));
      });
    });
  }
});

test('folded does not write its argument', () => {
  const start = transversal(generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [2] }));
  const copy = structuredClone(start);
  folded(start);
  expect(start).toEqual(copy);
});
