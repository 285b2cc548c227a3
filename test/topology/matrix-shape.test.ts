import { describe, expect, test } from 'vitest';
import type { CouplingMatrix } from '../../src/forms/index.js';
import { annihilate, applyRotations, arrow, folded, rotate, rowsOf } from '../../src/topology/index.js';
import { matrixOf } from '../support/models.js';

const good = matrixOf(2, [
  [0, 1, 1],
  [1, 2, 1],
  [2, 3, 1],
]);
const values = good.values.map((row) => [...row]);
const changed = (i: number, j: number, value: unknown): unknown => {
  const copy: unknown[][] = values.map((row) => [...row]);
  copy[i]![j] = value;
  return { order: 2, values: copy };
};

const bad: readonly (readonly [string, unknown, string])[] = [
  ['nothing', undefined, 'E_MATRIX_SHAPE'],
  ['null', null, 'E_MATRIX_SHAPE'],
  ['a number', 7, 'E_MATRIX_SHAPE'],
  ['an empty object', {}, 'E_MATRIX_SHAPE'],
  [
    'order 0',
    {
      order: 0,
      values: [
        [0, 1],
        [1, 0],
      ],
    },
    'E_MATRIX_SHAPE',
  ],
  ['a negative order', { order: -1, values: [[0]] }, 'E_MATRIX_SHAPE'],
  ['a broken order', { order: 1.5, values }, 'E_MATRIX_SHAPE'],
  ['an order as text', { order: '2', values }, 'E_MATRIX_SHAPE'],
  ['an order that does not fit', { order: 3, values }, 'E_MATRIX_SHAPE'],
  ['no values', { order: 2 }, 'E_MATRIX_SHAPE'],
  ['too few rows', { order: 2, values: values.slice(1) }, 'E_MATRIX_SHAPE'],
  ['a short row', { order: 2, values: [values[0], values[1], values[2], [0]] }, 'E_MATRIX_SHAPE'],
  ['a missing row', { order: 2, values: [values[0], null, values[2], values[3]] }, 'E_MATRIX_SHAPE'],
  ['text for an entry', changed(1, 2, '1'), 'E_TYPE'],
  ['an absent entry', changed(1, 2, undefined), 'E_TYPE'],
  ['a NaN entry', changed(1, 1, Number.NaN), 'E_NOT_FINITE'],
  ['an infinite entry', changed(1, 1, Number.NEGATIVE_INFINITY), 'E_NOT_FINITE'],
  ['unequal mirror entries', changed(1, 2, 1 + 2 ** -52), 'E_NOT_SYMMETRIC'],
];

const doors: readonly (readonly [string, (matrix: CouplingMatrix) => unknown])[] = [
  ['rowsOf', rowsOf],
  ['folded', folded],
  ['arrow', arrow],
  ['rotate', (matrix) => rotate(matrix, { pivot: [1, 2], angle: 1 })],
  ['annihilate', (matrix) => annihilate(matrix, { pivot: [1, 2], element: [0, 2] })],
  ['applyRotations', (matrix) => applyRotations(matrix, [])],
];

describe.each(doors)('%s', (_, door) => {
  test.each(bad)('refuses %s', (__, matrix, code) => {
    expect(() => door(matrix as CouplingMatrix)).toThrowError(expect.objectContaining({ name: 'FilterFailure', code }));
  });

  test('accepts the same matrix when it is whole', () => {
    expect(() => door(good)).not.toThrow();
  });
});

test('rowsOf copies, and reads -0 as 0', () => {
  const rows = rowsOf(
    matrixOf(1, [
      [0, 1, -0],
      [1, 2, 3],
    ]),
  );
  expect(Object.is(rows[0]![1], 0)).toBe(true);
  rows[1]![2] = 9;
  expect(rowsOf(good)[1]![2]).toBe(1);
});

test('a refusal names the entry, what was found and what to do', () => {
  try {
    rowsOf(changed(2, 3, Number.NaN) as CouplingMatrix);
    expect.unreachable();
  } catch (error) {
    expect(error).toMatchObject({ code: 'E_NOT_FINITE', argument: 'matrix.values[2][3]', value: Number.NaN });
    expect((error as Error).message).toMatch(/found NaN; allowed .*; \S/);
  }
});
