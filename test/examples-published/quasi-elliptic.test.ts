import { describe, expect, test } from 'vitest';
import { generalizedChebyshev } from '../../src/approximation/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { annihilate, folded } from '../../src/topology/index.js';
import { entry } from '../support/models.js';
import { example, numbers } from './examples.js';

// J.-S. Hong, M. J. Lancaster, Microstrip Filters for RF/Microwave Applications, 2001, table 10.1 (after R. Levy, 1976), from
// memory. Five decimals printed, the third row after rounding; limit 6e-5 as the entry states.
describe('four poles, 20 dB, one symmetric pair of zeros', () => {
  const { printed, recomputed } = example('hl-4pole-quasielliptic-table');

  /** g1, g2, J1, J2 of the quadruplet: couplings 1-4 negative; the folded form has it as it stands. */
  const elementsOf = (zero: number): number[] => {
    const { matrix } = folded(
      transversal(generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [zero, -zero] })),
    );
    const g1 = 1 / entry(matrix, 0, 1) ** 2;
    const g2 = 1 / (g1 * entry(matrix, 1, 2) ** 2);
    return [g1, g2, entry(matrix, 1, 4) * g1, entry(matrix, 2, 3) * g2];
  };

  test.each(Object.keys(printed))('zeros at +-%s', (key) => {
    const elements = elementsOf(Number(key));
    elements.forEach((value, n) => {
      expect(Math.abs(value - numbers(printed[key])[n]!)).toBeLessThan(6e-5);
      expect(Math.abs(value - numbers((recomputed[key] as Record<string, unknown>)['g1,g2,J1,J2'])[n]!)).toBeLessThan(
        1e-11,
      );
    });
  });
});

// The same book, table 10.3, three rows from memory (two values misrecalled and left out); limit 2e-4 as the entry states.
describe('eight poles, 20 dB, one symmetric pair of zeros', () => {
  const { printed, recomputed } = example('hl-8pole-quasielliptic');

  test.each(Object.keys(printed))('zeros at +-%s', (key) => {
    const zero = Number(key);
    const { matrix } = folded(
      transversal(generalizedChebyshev({ order: 8, returnLossDb: 20, transmissionZeros: [zero, -zero] })),
    );
    const g: number[] = [1 / entry(matrix, 0, 1) ** 2];
    for (let i = 1; i < 4; i++) g.push(1 / (g[i - 1]! * entry(matrix, i, i + 1) ** 2));
    const elements = [...g, entry(matrix, 3, 6) * g[2]!, entry(matrix, 4, 5) * g[3]!];
    const row = recomputed[key] as Record<string, unknown>;
    elements.forEach((value, n) => {
      const digits = (printed[key] as (number | null)[])[n];
      if (digits !== null) expect(Math.abs(value - digits!)).toBeLessThan(2e-4);
      expect(Math.abs(value - numbers(row['g1,g2,g3,g4,J3,J4'])[n]!)).toBeLessThan(1e-11);
    });
    const [mS1, m12, m23, m34, m45, m36] = numbers(row.M);
    const line = [
      entry(matrix, 0, 1),
      entry(matrix, 1, 2),
      entry(matrix, 2, 3),
      entry(matrix, 3, 4),
      entry(matrix, 4, 5),
      entry(matrix, 3, 6),
    ];
    [mS1, m12, m23, m34, m45, m36].forEach((value, n) => {
      expect(Math.abs(line[n]! - value!)).toBeLessThan(1e-11);
    });
  });
});

test('a symmetric pair outside any quadruplet leaves exact zeros elsewhere', () => {
  const { matrix } = folded(
    transversal(generalizedChebyshev({ order: 8, returnLossDb: 20, transmissionZeros: [1.2, -1.2] })),
  );
  for (const [i, j] of [
    [1, 8],
    [2, 7],
    [2, 8],
    [3, 7],
  ] as const)
    expect(entry(matrix, i, j)).toBe(0);
  expect(annihilate(matrix, { pivot: [1, 2], element: [1, 8] }).rotation.angle).toBe(0);
});
