import { expect, test } from 'vitest';
import { generalizedChebyshev } from '../../src/approximation/index.js';
import { transversal } from '../../src/synthesis/index.js';

test('generalizedChebyshev gives the same bits of epsilon and epsilonR, and of the canonical matrix, for permuted zeros', () => {
  const [one, two] = [
    [2, -2],
    [-2, 2],
  ].map((transmissionZeros) => generalizedChebyshev({ order: 2, returnLossDb: 3, transmissionZeros }));
  expect([one!.epsilon, one!.epsilonR]).toEqual([two!.epsilon, two!.epsilonR]);
  expect(transversal(one!)).toEqual(transversal(two!));
});
