import { describe, expect, it } from 'vitest';
import { bestStep } from '../../src/proposal/loss/linear-program.js';
import { seeded } from '../support/random.js';

describe('bestStep', () => {
  it('is optimal by duality on 500 random programs', () => {
    const random = seeded(3);
    for (let n = 0; n < 500; n++) {
      const unknowns = 1 + Math.floor(7 * random());
      const count = 1 + Math.floor(20 * random());
      const values = Array.from({ length: count }, () => 20 * random());
      const gradients = values.map(() => Array.from({ length: unknowns }, () => 400 * (random() - 0.5)));
      const radius = 10 ** (-4 * random());
      const { step, smallest, weights } = bestStep({ values, gradients }, radius);
      const scale = 1e-9 * (20 + 400 * radius * unknowns);
      // The step is allowed, and reaches what it promises.
      expect(Math.max(...step.map(Math.abs))).toBeLessThanOrEqual(radius * (1 + 1e-9));
      const reached = values.map((value, k) => value + gradients[k]!.reduce((sum, g, j) => sum + g * step[j]!, 0));
      expect(Math.abs(Math.min(...reached) - smallest)).toBeLessThanOrEqual(scale);
      // Weak duality: any weights >= 0 of sum 1 bound every step by this; equality proves the optimum.
      expect(Math.min(...weights)).toBeGreaterThanOrEqual(-1e-9);
      expect(weights.reduce((sum, weight) => sum + weight, 0)).toBeCloseTo(1, 9);
      const mean = weights.reduce((sum, weight, k) => sum + weight * values[k]!, 0);
      const pull = step.map((_, j) => weights.reduce((sum, weight, k) => sum + weight * gradients[k]![j]!, 0));
      const bound = mean + radius * pull.reduce((sum, each) => sum + Math.abs(each), 0);
      expect(Math.abs(bound - smallest)).toBeLessThanOrEqual(scale);
    }
  });

  it('ends on a degenerate program: equal rows', () => {
    const { smallest } = bestStep(
      {
        values: [1, 1, 1, 1],
        gradients: [
          [1, 0],
          [1, 0],
          [-1, 0],
          [-1, 0],
        ],
      },
      0.5,
    );
    expect(smallest).toBeCloseTo(1, 12);
  });
});
