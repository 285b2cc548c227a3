import { describe, expect, it } from 'vitest';
import { applyRotations, folded, generalizedChebyshev, traceRotations, transversal } from '../../src/index.js';

const start = transversal(generalizedChebyshev({ order: 5, returnLossDb: 20, transmissionZeros: [1.28, 1.75] }));

/** The pairs that a folded matrix of order 5 with two zeros may couple. */
const pattern: readonly (readonly [number, number])[] = [
  [0, 1],
  [1, 2],
  [2, 3],
  [3, 4],
  [4, 5],
  [5, 6],
  [2, 4],
  [2, 5],
];

describe('traceRotations(start, steps, pattern)', () => {
  it('replays a published kind of sequence, keeps the invariants and ends on the pattern', () => {
    const rotations = folded(start).rotations.filter(({ angle }) => angle !== 0);
    const { matrix, steps } = traceRotations(start, rotations, pattern);
    expect(matrix).toEqual(applyRotations(start, rotations));
    expect(steps.every(({ drift }) => drift < 1e-13)).toBe(true);
    expect(steps.at(-1)?.offPattern).toBeLessThan(1e-13);
    expect(steps[0]?.offPattern).toBeGreaterThan(0.1);
  });

  it('names the entry that a step annihilated and its value before', () => {
    const { matrix, steps } = traceRotations(start, [
      { pivot: [4, 5], annihilate: [0, 5] },
      { pivot: [1, 2], angle: 0.2 },
    ]);
    expect(steps[0]?.annihilated).toEqual({ element: [0, 5], before: start.values[0]?.[5] });
    expect(steps[1]?.annihilated).toBeUndefined();
    expect(steps[1]?.offPattern).toBeUndefined();
    expect(matrix.values[0]?.[5]).toBe(0);
  });

  it('drifts by no more than rounding over 500 rotations', () => {
    const steps = Array.from({ length: 500 }, (_, n) => ({
      pivot: [1 + (n % 4), 2 + (n % 4)] as const,
      angle: 0.1 + 0.37 * n,
    }));
    expect(traceRotations(start, steps).steps.at(-1)?.drift).toBeLessThan(1e-12);
  });

  it.each([
    [[{ pivot: [0, 1], angle: 1 }]],
    [[{ pivot: [1, 2], annihilate: [3, 4] }]],
    [[{ pivot: [1, 1], angle: 1 }]],
    ['no list'],
    [[null]],
  ])('refuses %o', (steps) => {
    expect(() => traceRotations(start, steps as never)).toThrow(/E_/);
  });
});
