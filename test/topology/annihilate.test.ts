import fc from 'fast-check';
import { expect, test } from 'vitest';
import { chebyshev } from '../../src/approximation/index.js';
import type { CouplingMatrix } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { type Annihilation, annihilate, rotate } from '../../src/topology/index.js';
import {
  entry,
  isSymmetric,
  matrixGap,
  matrixOf,
  normOf,
  randomMatrix,
  responseGap,
  withEntry,
} from '../support/models.js';
import { seeded } from '../support/random.js';

const random = seeded(61);
const QUARTER = Math.PI / 4;
const HALF = Math.PI / 2;

/** Every element that a pivot of an order-4 matrix may annihilate. */
function elementsOf([i, j]: readonly [number, number], order: number): (readonly [number, number])[] {
  const others = Array.from({ length: order + 2 }, (_, k) => k).filter((k) => k !== i && k !== j);
  return [
    [i, j],
    [j, i],
    ...others.flatMap(
      (k) =>
        [
          [i, k],
          [k, i],
          [j, k],
          [k, j],
        ] as const,
    ),
  ];
}

test('annihilate(matrix, any pivot and element) gives exact 0, the documented range, and the rotation that it reports', () => {
  for (let turn = 0; turn < 10; turn++) {
    const matrix = randomMatrix(4, random);
    for (const pivot of [
      [1, 2],
      [2, 1],
      [1, 4],
      [4, 1],
      [3, 2],
    ] as const) {
      for (const element of elementsOf(pivot, 4)) {
        const { matrix: after, rotation } = annihilate(matrix, { pivot, element });
        expect(entry(after, element[0], element[1])).toBe(0);
        expect(isSymmetric(after)).toBe(true);
        expect(rotation.pivot).toEqual(pivot);
        const nodes: readonly number[] = pivot;
        const own = nodes.includes(element[0]) && nodes.includes(element[1]);
        expect(rotation.angle).toBeGreaterThan(own ? -QUARTER : -HALF);
        expect(rotation.angle).toBeLessThanOrEqual(own ? QUARTER : HALF);
        expect(matrixGap(rotate(matrix, rotation), after)).toBeLessThan(30 * EPS * normOf(matrix));
      }
    }
  }
});

/** Order-2 matrix with M_S1 = a, M_S2 = b. */
const source = (a: number, b: number): CouplingMatrix =>
  matrixOf(2, [
    [0, 1, a],
    [0, 2, b],
    [1, 1, 0.3],
    [1, 2, 0.7],
    [1, 3, 0.2],
    [2, 3, 0.9],
  ]);

test.each([
  [0, 0, 0],
  [0, 0.5, 0],
  [0, -0.5, 0],
  [-0, 0.5, 0],
  [0.5, 0, HALF],
  [-0.5, 0, HALF],
  [0.5, -0, HALF],
  [0.5, 0.5, QUARTER],
  [-0.5, 0.5, -QUARTER],
  [0.5, -0.5, -QUARTER],
  [-0.5, -0.5, QUARTER],
  [1e8, 1e-100, HALF],
  [-1e8, 1e-100, HALF],
  [1e-100, 1, 1e-100],
])('annihilate M_S1 = %d against M_S2 = %d by pivot [1, 2] turns by %d', (a, b, angle) => {
  const { matrix, rotation } = annihilate(source(a, b), { pivot: [1, 2], element: [0, 1] });
  expect(rotation.angle).toBeCloseTo(angle, 15);
  expect(entry(matrix, 0, 1)).toBe(0);
  if (a === 0) expect(Object.is(rotation.angle, 0)).toBe(true);
});

test.each([
  [0, 0, 0],
  [0.5, 0, 0],
  [0, 0.5, HALF],
  [0, -0.5, HALF],
  [0.5, 0.5, -QUARTER],
  [-0.5, 0.5, QUARTER],
])('annihilate M_S2 with M_S1 = %d, M_S2 = %d by pivot [1, 2] turns by %d', (a, b, angle) => {
  const { matrix, rotation } = annihilate(source(a, b), { pivot: [1, 2], element: [0, 2] });
  expect(rotation.angle).toBeCloseTo(angle, 15);
  expect(entry(matrix, 0, 2)).toBe(0);
});

/** Order-2 matrix with diagonal a, b and M_12 = c. */
const block = (a: number, b: number, c: number): CouplingMatrix =>
  matrixOf(2, [
    [0, 1, 1],
    [1, 1, a],
    [2, 2, b],
    [1, 2, c],
    [2, 3, 1],
  ]);

test.each([
  [0, 0, 0, 0],
  [1, 2, 0, 0],
  [2, 1, 0, 0],
  [0.4, 0.4, 0.3, QUARTER],
  [0.4, 0.4, -0.3, QUARTER],
  [0, 0, -1, QUARTER],
  [0, 1, 0.5, Math.PI / 8],
  [1, 0, 0.5, -Math.PI / 8],
  [0, 1, -0.5, -Math.PI / 8],
  [1, 0, -0.5, Math.PI / 8],
])('annihilate M_12 of diagonal %d, %d and coupling %d by its own pivot turns by %d', (a, b, c, angle) => {
  const before = block(a, b, c);
  const { matrix, rotation } = annihilate(before, { pivot: [1, 2], element: [1, 2] });
  expect(rotation.angle).toBeCloseTo(angle, 15);
  expect(entry(matrix, 1, 2)).toBe(0);
  expect(entry(matrix, 1, 1) + entry(matrix, 2, 2)).toBeCloseTo(a + b, 14);
  expect(responseGap(matrix, before, [-2, 0.31, 1.7])).toBeLessThan(1e-13);
});

test('annihilate turns least: the smaller of the angles that do it', () => {
  const { rotation } = annihilate(block(1, 2, 1e-3), { pivot: [1, 2], element: [2, 1] });
  expect(rotation.angle).toBeCloseTo(0.5 * Math.atan(2e-3), 15);
});

test('annihilate(matrix, element on a port row) works for source and load, written either way round', () => {
  const matrix = randomMatrix(3, random);
  for (const port of [0, 4]) {
    const one = annihilate(matrix, { pivot: [2, 3], element: [port, 3] });
    const two = annihilate(matrix, { pivot: [2, 3], element: [3, port] });
    expect(one).toEqual(two);
    expect(entry(one.matrix, port, 3)).toBe(0);
    expect(entry(one.matrix, port, 2) ** 2).toBeCloseTo(entry(matrix, port, 2) ** 2 + entry(matrix, port, 3) ** 2, 13);
  }
});

test('annihilate(matrix, request) leaves S-parameters unchanged', () => {
  const matrix = transversal(chebyshev({ order: 5, returnLossDb: 20 }));
  const { matrix: after } = annihilate(matrix, { pivot: [2, 4], element: [0, 4] });
  expect(responseGap(after, matrix)).toBeLessThan(1e-13);
});

test('annihilate(matrix, request) holds its range for entries of any size that is taken', () => {
  const value = fc.oneof(
    fc.constantFrom(0, -0, 1, -1, 1e-100, -1e-100, 1e8, -1e8),
    fc.double({ min: -1e8, max: 1e8, noNaN: true }).filter((x) => x === 0 || Math.abs(x) >= 1e-100),
  );
  fc.assert(
    fc.property(value, value, value, fc.boolean(), (a, b, c, own) => {
      const matrix = own ? block(a, b, c) : withEntry(source(a, b), 1, 2, c);
      const { rotation, matrix: after } = annihilate(matrix, { pivot: [1, 2], element: own ? [1, 2] : [0, 1] });
      const limit = own ? QUARTER : HALF;
      expect(rotation.angle > -limit && rotation.angle <= limit).toBe(true);
      expect(entry(after, own ? 1 : 0, own ? 2 : 1)).toBe(0);
    }),
    { seed: 62, numRuns: 500 },
  );
});

const refused: readonly (readonly [string, unknown, string])[] = [
  ['an element that shares no index', { pivot: [1, 2], element: [0, 3] }, 'E_ELEMENT'],
  ['a diagonal entry of the pivot', { pivot: [1, 2], element: [1, 1] }, 'E_ELEMENT'],
  ['an element outside', { pivot: [1, 2], element: [1, 9] }, 'E_ELEMENT'],
  ['a negative index', { pivot: [1, 2], element: [-1, 1] }, 'E_ELEMENT'],
  ['a broken index', { pivot: [1, 2], element: [0.5, 1] }, 'E_ELEMENT'],
  ['an element as text', { pivot: [1, 2], element: '01' }, 'E_TYPE'],
  ['an element of one', { pivot: [1, 2], element: [1] }, 'E_TYPE'],
  ['no element', { pivot: [1, 2] }, 'E_TYPE'],
  ['a port in the pivot', { pivot: [0, 2], element: [0, 3] }, 'E_PIVOT'],
  ['equal pivot nodes', { pivot: [2, 2], element: [0, 2] }, 'E_PIVOT'],
  ['nothing', undefined, 'E_TYPE'],
];

test.each(refused)('annihilate refuses %s', (_, request, code) => {
  const matrix = randomMatrix(4, seeded(63));
  expect(() => annihilate(matrix, request as Annihilation)).toThrowError(expect.objectContaining({ code }));
});
