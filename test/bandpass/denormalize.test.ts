import { describe, expect, it } from 'vitest';
import { arrow, denormalize, folded, generalizedChebyshev, transversal } from '../../src/index.js';

const band = { centerHz: 2e9, bandwidthHz: 50e6 };
const start = transversal(generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [1.5, -2.2] }));

describe('denormalize(matrix, band)', () => {
  it('gives frequencies, couplings and external Q by their formulas, and back to the matrix', () => {
    const { matrix } = folded(start);
    const hand = denormalize(matrix, band);
    const ratio = band.bandwidthHz / band.centerHz;
    hand.resonators.forEach(({ frequencyHz }, n) => {
      // b = f0/f - f/f0 inverts f = f0*(sqrt(1 + (b/2)^2) - b/2).
      const b = band.centerHz / frequencyHz - frequencyHz / band.centerHz;
      expect(Math.abs(b / ratio - (matrix.values[n + 1]?.[n + 1] as number))).toBeLessThan(1e-12);
    });
    for (const { between, k, bandwidthHz } of hand.couplings) {
      expect(k / ratio).toBeCloseTo(matrix.values[between[0]]?.[between[1]] as number, 12);
      expect(bandwidthHz).toBeCloseTo(k * band.centerHz, 3);
    }
    expect(1 / Math.sqrt((hand.externalQ.source as number) * ratio)).toBeCloseTo(matrix.values[0]?.[1] as number, 12);
    expect(hand.reflectedDelaySeconds.source).toBeCloseTo(
      (2 * (hand.externalQ.source as number)) / (Math.PI * 2e9),
      18,
    );
    expect(hand.portCouplings).toEqual([]);
    expect(hand.couplings.every(({ k }) => k !== 0)).toBe(true);
  });

  it('tunes a resonator with positive M_ii below the center', () => {
    const values = [
      [0, 1, 0],
      [1, 0.5, 1],
      [0, 1, 0],
    ];
    expect(denormalize({ order: 1, values }, band).resonators[0]?.frequencyHz).toBeLessThan(2e9);
  });

  it('lists the couplings of a port that touches several resonators instead of one external Q', () => {
    const hand = denormalize(arrow(start).matrix, band);
    expect(hand.externalQ.source).not.toBeNull();
    expect(hand.externalQ.load).toBeNull();
    expect(hand.reflectedDelaySeconds.load).toBeNull();
    expect(hand.portCouplings.map(({ port, resonator }) => [port, resonator])).toEqual([
      ['load', 2],
      ['load', 3],
      ['load', 4],
    ]);
    for (const { resonator, bandwidthHz, externalQ } of hand.portCouplings) {
      const m = arrow(start).matrix.values[resonator]?.[5] as number;
      expect(bandwidthHz).toBe(m * band.bandwidthHz);
      expect(externalQ).toBeCloseTo(band.centerHz / (band.bandwidthHz * m * m), 6);
    }
  });

  it('keeps k and Q when all hertz are multiplied by one factor', () => {
    const { matrix } = folded(start);
    const [a, b] = [
      denormalize(matrix, band),
      denormalize(matrix, { centerHz: 7 * band.centerHz, bandwidthHz: 7 * band.bandwidthHz }),
    ];
    expect(b.externalQ.source).toBeCloseTo(a.externalQ.source as number, 9);
    b.couplings.forEach(({ k }, n) => {
      expect(k).toBeCloseTo(a.couplings[n]?.k as number, 14);
    });
  });

  it.each([
    [{ centerHz: 0, bandwidthHz: 1 }],
    [{ centerHz: Number.NaN, bandwidthHz: 1 }],
    [{ centerHz: 1e9, bandwidthHz: -1 }],
    [undefined],
  ])('refuses the band %o', (wrong) => {
    expect(() => denormalize(start, wrong as never)).toThrow(/E_/);
  });
});
