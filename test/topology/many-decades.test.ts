import { describe, expect, it } from 'vitest';
import { bessel, certify, folded, transversal } from '../../src/index.js';

describe('folded(matrix) over many decades of coupling', () => {
  // Flat-delay ladders fall off by many decades: the corrected elimination did not settle there and left what must vanish.
  it.each([20, 30, 40, 48])('order %i of the flat-delay family folds, certified', (order) => {
    const response = bessel({ order, edge: 'halfPower' });
    const start = transversal(response);
    const { matrix, rotations, leftover } = folded(start);
    expect(leftover).toBeLessThan(1e-13);
    const checks = certify(response, matrix, { before: start, rotations, leftover, structure: 'folded' });
    expect(checks.filter(({ holds }) => !holds)).toEqual([]);
  });
});
