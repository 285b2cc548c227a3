import fc from 'fast-check';
import { expect, test } from 'vitest';
import { chebyshev, generalizedChebyshev } from '../../src/approximation/index.js';
import type { CouplingMatrix, Rotation } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { applyRotations, rotate } from '../../src/topology/index.js';
import { denseRotation, entry, isSymmetric, matrixGap, normOf, randomMatrix, responseGap } from '../support/models.js';
import { seeded } from '../support/random.js';

const random = seeded(51);
const angles = [0.3, -2.8, Math.PI / 2, -Math.PI / 2, Math.PI, 1e-9, 40];

function randomRotation(order: number): Rotation {
  const i = 1 + Math.floor(random() * order);
  const j = 1 + ((i + Math.floor(random() * (order - 1))) % order);
  return { pivot: [i, j], angle: (random() - 0.5) * 7 };
}

test('rotate(matrix, rotation) equals the dense product R M R^T for every pivot', () => {
  const matrix = randomMatrix(5, random);
  for (const angle of angles) {
    for (let i = 1; i <= 5; i++) {
      for (let j = 1; j <= 5; j++) {
        if (i === j) continue;
        const turned = rotate(matrix, { pivot: [i, j], angle });
        const dense: CouplingMatrix = { order: 5, values: denseRotation(matrix, [i, j], angle) };
        expect(matrixGap(turned, dense)).toBeLessThan(30 * EPS * normOf(matrix));
      }
    }
  }
});

test('rotate(matrix, rotation) by a quarter turn swaps two resonators, one with opposite sign', () => {
  const matrix = randomMatrix(3, random);
  const turned = rotate(matrix, { pivot: [1, 2], angle: Math.PI / 2 });
  // New 1 = -old 2, new 2 = old 1.
  expect(entry(turned, 1, 1)).toBeCloseTo(entry(matrix, 2, 2), 14);
  expect(entry(turned, 0, 1)).toBeCloseTo(-entry(matrix, 0, 2), 14);
  expect(entry(turned, 0, 2)).toBeCloseTo(entry(matrix, 0, 1), 14);
  expect(entry(turned, 1, 2)).toBeCloseTo(-entry(matrix, 1, 2), 14);
});

test('rotate(matrix, [j, i], angle) equals rotate(matrix, [i, j], -angle)', () => {
  const matrix = randomMatrix(4, random);
  const one = rotate(matrix, { pivot: [3, 1], angle: 0.7 });
  const two = rotate(matrix, { pivot: [1, 3], angle: -0.7 });
  expect(matrixGap(one, two)).toBeLessThan(4 * EPS * normOf(matrix));
});

test('rotate(matrix, angle 0) is the matrix itself', () => {
  const matrix = randomMatrix(4, random);
  expect(rotate(matrix, { pivot: [2, 3], angle: 0 }).values).toEqual(matrix.values);
});

test('rotate leaves entries (i,j) and (j,i) the same bits, ports untouched, and no negative zero', () => {
  const matrix = randomMatrix(6, random);
  for (let turn = 0; turn < 50; turn++) {
    const turned = rotate(matrix, { ...randomRotation(6), flip: [1 + Math.floor(random() * 6)] });
    expect(isSymmetric(turned)).toBe(true);
    expect(entry(turned, 0, 0)).toBe(entry(matrix, 0, 0));
    expect(entry(turned, 0, 7)).toBe(entry(matrix, 0, 7));
    expect(entry(turned, 7, 7)).toBe(entry(matrix, 7, 7));
    expect(turned.values.flat().some((value) => Object.is(value, -0))).toBe(false);
  }
});

test('rotate(matrix, flip) changes the sign of couplings and not of the diagonal', () => {
  const matrix = randomMatrix(4, random);
  const flipped = rotate(matrix, { pivot: [2, 2], angle: 0, flip: [2] });
  for (let i = 0; i < 6; i++) {
    for (let j = 0; j < 6; j++) {
      const sign = (i === 2) === (j === 2) ? 1 : -1;
      expect(entry(flipped, i, j)).toBe(sign * entry(matrix, i, j));
    }
  }
  const both = rotate(matrix, { pivot: [1, 2], angle: 0, flip: [2, 3] });
  expect(entry(both, 2, 3)).toBe(entry(matrix, 2, 3));
  expect(entry(both, 1, 2)).toBe(-entry(matrix, 1, 2));
});

test('rotate(matrix, rotation) flips after it turns', () => {
  const matrix = randomMatrix(3, random);
  const both = rotate(matrix, { pivot: [1, 2], angle: 0.4, flip: [1] });
  const apart = rotate(rotate(matrix, { pivot: [1, 2], angle: 0.4 }), { pivot: [1, 1], angle: 0, flip: [1] });
  expect(both.values).toEqual(apart.values);
});

test('rotate(matrix, rotation) leaves S-parameters unchanged', () => {
  const matrix = transversal(generalizedChebyshev({ order: 6, returnLossDb: 20, transmissionZeros: [1.4, -1.2] }));
  expect(responseGap(rotate(matrix, { pivot: [2, 5], angle: 1.1, flip: [3] }), matrix)).toBeLessThan(1e-13);
});

test('rotate keeps the stated number of finite zeros and does not write its argument', () => {
  const matrix = transversal(generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [2] }));
  const copy = structuredClone(matrix);
  expect(rotate(matrix, { pivot: [1, 2], angle: 1 }).finiteZeros).toBe(1);
  expect(matrix).toEqual(copy);
});

test('applyRotations(matrix, []) is the matrix, and a list equals one step after the other', () => {
  const matrix = randomMatrix(5, random);
  expect(applyRotations(matrix, []).values).toEqual(matrix.values);
  const steps = Array.from({ length: 9 }, () => randomRotation(5));
  const oneByOne = steps.reduce<CouplingMatrix>(rotate, matrix);
  expect(applyRotations(matrix, steps).values).toEqual(oneByOne.values);
});

test('applyRotations of 500 steps keeps eigenvalue sums and response within 1e-12', () => {
  const matrix = transversal(chebyshev({ order: 7, returnLossDb: 20 }));
  const turned = applyRotations(
    matrix,
    Array.from({ length: 500 }, () => randomRotation(7)),
  );
  expect(isSymmetric(turned)).toBe(true);
  expect(responseGap(turned, matrix)).toBeLessThan(1e-12);
});

test('applyRotations(matrix, steps) is undone by the reversed steps with opposite angles', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 2 ** 31 }), (seed) => {
      const noise = seeded(seed);
      const matrix = randomMatrix(2 + (seed % 6), noise);
      const steps = Array.from({ length: 20 }, () => randomRotation(matrix.order));
      const back = [...steps].reverse().map(({ pivot, angle }): Rotation => ({ pivot, angle: -angle }));
      expect(matrixGap(applyRotations(applyRotations(matrix, steps), back), matrix)).toBeLessThan(2000 * EPS);
    }),
    { seed: 52, numRuns: 40 },
  );
});

const matrix3 = transversal(chebyshev({ order: 3, returnLossDb: 20 }));
const refusals: readonly (readonly [string, unknown, string])[] = [
  ['the source as pivot', { pivot: [0, 1], angle: 1 }, 'E_PIVOT'],
  ['the load as pivot', { pivot: [1, 4], angle: 1 }, 'E_PIVOT'],
  ['a node outside', { pivot: [1, 9], angle: 1 }, 'E_PIVOT'],
  ['a negative node', { pivot: [-1, 2], angle: 1 }, 'E_PIVOT'],
  ['a broken node', { pivot: [1.5, 2], angle: 1 }, 'E_PIVOT'],
  ['a node as text', { pivot: ['1', 2], angle: 1 }, 'E_PIVOT'],
  ['equal nodes', { pivot: [2, 2], angle: 1 }, 'E_PIVOT'],
  ['a pivot of three', { pivot: [1, 2, 3], angle: 1 }, 'E_TYPE'],
  ['no pivot', { angle: 1 }, 'E_TYPE'],
  ['no rotation', undefined, 'E_TYPE'],
  ['null', null, 'E_TYPE'],
  ['no angle', { pivot: [1, 2] }, 'E_TYPE'],
  ['an angle as text', { pivot: [1, 2], angle: '1' }, 'E_TYPE'],
  ['an infinite angle', { pivot: [1, 2], angle: Number.POSITIVE_INFINITY }, 'E_NOT_FINITE'],
  ['a NaN angle', { pivot: [1, 2], angle: Number.NaN }, 'E_NOT_FINITE'],
  ['a flipped port', { pivot: [1, 2], angle: 1, flip: [0] }, 'E_PIVOT'],
];

test.each(refusals)('rotate refuses %s', (_, rotation, code) => {
  expect(() => rotate(matrix3, rotation as Rotation)).toThrowError(expect.objectContaining({ code }));
});

test('applyRotations refuses what is no list, and names the faulty step', () => {
  expect(() => applyRotations(matrix3, 5 as unknown as Rotation[])).toThrowError(
    expect.objectContaining({ code: 'E_TYPE' }),
  );
  const steps: Rotation[] = [
    { pivot: [1, 2], angle: 1 },
    { pivot: [1, 4], angle: 1 },
  ];
  expect(() => applyRotations(matrix3, steps)).toThrowError(/rotations\[1\].*4 \(the load\)/);
});
