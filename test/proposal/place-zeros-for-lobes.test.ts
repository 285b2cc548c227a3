import { describe, expect, it } from 'vitest';
import { generalizedChebyshev, scatteringAt } from '../../src/index.js';
import { placeZerosForLobes } from '../../src/proposal/index.js';
import { seeded } from '../support/random.js';
import { goldenMinimum } from './sampled-margin.js';

describe('placeZerosForLobes', () => {
  // R. J. Cameron, General coupling matrix synthesis methods for Chebyshev filtering functions, 1999 (from memory): the two
  // worked examples, zeros printed to four decimals.
  it.each([
    [{ order: 4, returnLossDb: 22, above: [30, 30] }, [1.3217, 1.8082]],
    [{ order: 8, returnLossDb: 23, above: [40, 40], below: [40] }, [-1.3553, 1.1093, 1.218]],
  ] as const)('gives the published zeros of %j', (request, printed) => {
    const zeros = placeZerosForLobes(request);
    printed.forEach((zero, n) => {
      expect(Math.abs((zeros[n] as number) - zero)).toBeLessThanOrEqual(0.5e-4);
    });
  });

  it('gives lobes whose lowest points on the synthesized response have the levels asked for, 300 random ones', () => {
    const random = seeded(4);
    let worst = 0;
    for (let n = 0; n < 300; n++) {
      const order = 2 + Math.floor(10 * random());
      const count = 1 + Math.floor((order - 1) * random());
      const split = Math.floor((count + 1) * random());
      const level = (): number => 15 + 45 * random();
      const above = Array.from({ length: split }, level);
      const below = Array.from({ length: count - split }, level);
      const zeros = placeZerosForLobes({ order, returnLossDb: 20, above, below });
      const found = lobeLevels(order, zeros);
      expect(found.above).toHaveLength(above.length);
      above.forEach((wanted, k) => {
        worst = Math.max(worst, Math.abs(wanted - (found.above[k] as number)));
      });
      below.forEach((wanted, k) => {
        worst = Math.max(worst, Math.abs(wanted - (found.below[k] as number)));
      });
    }
    // The scan below refines a sampled minimum by golden sections: 1e-7 dB is its own reach.
    expect(worst).toBeLessThan(1e-6);
  });

  it.each([
    [{ order: 2, returnLossDb: 20, above: [30, 30] }, 'E_ZERO_COUNT'],
    [{ order: 4, returnLossDb: 20, above: [0.01] }, 'E_MASK'],
    [{ order: 4, returnLossDb: 20, above: [Number.NaN] }, 'E_MASK'],
    [{ order: 4, returnLossDb: 20, below: 30 }, 'E_TYPE'],
    [{ order: 0, returnLossDb: 20 }, 'E_ORDER_RANGE'],
    [null, 'E_TYPE'],
  ])('refuses %j', (request, code) => {
    expect(() => placeZerosForLobes(request as never)).toThrow(expect.objectContaining({ code }));
  });
});

/** Lowest rejection between neighboring zeros and out to infinity, from the band outward, by the polynomials. */
function lobeLevels(order: number, zeros: readonly number[]): { above: number[]; below: number[] } {
  const response = generalizedChebyshev({ order, returnLossDb: 20, transmissionZeros: zeros });
  const rejection = (omega: number): number => {
    const { s21 } = scatteringAt(response, omega);
    return -20 * Math.log10(Math.hypot(s21.re, s21.im));
  };
  const side = (sign: 1 | -1): number[] => {
    const own = zeros
      .filter((zero) => zero * sign > 0)
      .map(Math.abs)
      .sort((a, b) => a - b);
    // Reciprocals make the lobe to infinity an interval like the others.
    return own.map((zero, k) =>
      goldenMinimum((x) => rejection(sign / x), 1 / (own[k + 1] ?? Number.POSITIVE_INFINITY), 1 / zero),
    );
  };
  return { above: side(1), below: side(-1) };
}
