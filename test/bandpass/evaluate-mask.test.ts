import { describe, expect, it } from 'vitest';
import {
  type CouplingMatrix,
  evaluateMask,
  folded,
  generalizedChebyshev,
  type MaskLine,
  omegaFromHz,
  scatteringAt,
  sweepHz,
  transversal,
} from '../../src/index.js';

const band = { centerHz: 2e9, bandwidthHz: 20e6, unloadedQ: 5000 };
const response = generalizedChebyshev({ order: 4, returnLossDb: 22, transmissionZeros: [1.6, -1.9] });
const matrix = folded(transversal(response)).matrix;

const level = (re: number, im: number): number => -20 * Math.log10(Math.hypot(re, im));

/** Attenuation of S21 on an even grid. */
function attenuations(
  model: CouplingMatrix,
  q: number | readonly number[],
  fromHz: number,
  toHz: number,
  points: number,
): { hz: number; db: number }[] {
  const grid = Float64Array.from({ length: points }, (_, n) => fromHz + ((toHz - fromHz) * n) / (points - 1));
  const { s21 } = sweepHz(model, { ...band, unloadedQ: q }, grid);
  return Array.from(grid, (hz, n) => ({ hz, db: level(s21.re[n] as number, s21.im[n] as number) }));
}

const lowest = (samples: readonly { hz: number; db: number }[]): { hz: number; db: number } =>
  samples.reduce((best, sample) => (sample.db < best.db ? sample : best));

/** The filter with a parasitic resonance far out in the stop band, weakly coupled to both ends. */
function withSpurious(coupling: number, omega: number): CouplingMatrix {
  const values = Array.from({ length: 7 }, () => new Array<number>(7).fill(0));
  const set = (i: number, j: number, value: number): void => {
    (values[i] as number[])[j] = value;
    (values[j] as number[])[i] = value;
  };
  for (let i = 0; i < 6; i++)
    for (let j = i; j < 6; j++) set(i === 5 ? 6 : i, j === 5 ? 6 : j, matrix.values[i]?.[j] as number);
  set(5, 5, -omega);
  set(0, 5, coupling);
  set(5, 6, coupling);
  return { order: 5, values };
}

describe('evaluateMask(model, band, mask)', () => {
  it('finds a violation 10 kHz wide between the points of a fine sweep', () => {
    const spiked = withSpurious(0.005, 4.1234);
    const q = [5000, 5000, 5000, 5000, 2e7];
    const line: MaskLine = { fromHz: 2.03e9, toHz: 2.06e9, rejectionDb: 20 };
    const [row] = evaluateMask(spiked, { ...band, unloadedQ: q }, [line]);
    if (row === undefined) throw new Error('no row');
    // 1001 points over the span, 30 kHz apart, see a filter that meets the line.
    expect(lowest(attenuations(spiked, q, 2.03e9, 2.06e9, 1001)).db).toBeGreaterThan(20);
    expect(row.margin).toBeLessThan(-10);
    const near = attenuations(spiked, q, (row.worstHz as number) - 20e3, (row.worstHz as number) + 20e3, 40_001);
    const below = near.filter(({ db }) => db < 20);
    expect((below.at(-1)?.hz as number) - (below[0]?.hz as number)).toBeLessThan(20e3);
    expect(row.predicted).toBeCloseTo(lowest(near).db, 6);
    expect(Math.abs((row.worstHz as number) - lowest(near).hz)).toBeLessThan(2);
  });

  it('agrees with a million samples on rejection, loss and return loss', () => {
    const mask: MaskLine[] = [
      { fromHz: 2.015e9, toHz: 2.08e9, rejectionDb: 20 },
      { fromHz: 1.9e9, toHz: 1.982e9, rejectionDb: 20 },
      { fromHz: 1.991e9, toHz: 2.009e9, insertionLossDb: 1 },
      { fromHz: 1.991e9, toHz: 2.009e9, returnLossDb: 20 },
    ];
    const rows = evaluateMask(matrix, band, mask);
    mask.forEach((line, n) => {
      const [low, high] = [line.fromHz as number, line.toHz as number];
      const grid = Float64Array.from({ length: 250_001 }, (_, k) => low + ((high - low) * k) / 250_000);
      const { s11, s21 } = sweepHz(matrix, band, grid);
      const s = 'returnLossDb' in line ? s11 : s21;
      let [least, most] = [Number.POSITIVE_INFINITY, 0];
      for (let k = 0; k < grid.length; k++) {
        const db = level(s.re[k] as number, s.im[k] as number);
        least = Math.min(least, db);
        most = Math.max(most, db);
      }
      const found = 'insertionLossDb' in line ? most : least;
      // Samples can only miss the extremum, by little.
      expect(Math.abs((rows[n]?.predicted as number) - found)).toBeLessThan(1e-6);
    });
  });

  it('gives the same rows for polynomials and matrix', () => {
    const mask: MaskLine[] = [
      { fromHz: 2.015e9, rejectionDb: 20 },
      { fromHz: 1.992e9, toHz: 2.008e9, groupDelayVariationSeconds: 50e-9 },
    ];
    const [a, b] = [evaluateMask(response, band, mask), evaluateMask(matrix, band, mask)];
    a.forEach((row, n) => {
      expect(Math.abs(row.predicted / (b[n]?.predicted as number) - 1)).toBeLessThan(1e-9);
    });
  });

  it('follows a sloped level to where the slope and the response are closest', () => {
    const line: MaskLine = { fromHz: 2.016e9, toHz: 2.05e9, rejectionDb: [15, 32] };
    const [row] = evaluateMask(matrix, band, [line]);
    const samples = attenuations(matrix, 5000, 2.016e9, 2.05e9, 340_001);
    const least = samples.reduce((smallest, sample) => Math.min(smallest, margin(sample)), Number.POSITIVE_INFINITY);
    expect(row?.margin).toBeCloseTo(least, 6);
    function margin({ hz, db }: { hz: number; db: number }): number {
      return db - (15 + (17 * (hz - 2.016e9)) / 34e6);
    }
  });

  it('measures levels relative to the center when asked', () => {
    const span = { fromHz: 2.03e9, toHz: 2.03e9 } as const;
    const [absolute, relative, center] = evaluateMask(matrix, band, [
      { ...span, rejectionDb: 20 },
      { ...span, rejectionDb: 20, relativeTo: 'center' },
      { fromHz: 2e9, toHz: 2e9, insertionLossDb: 1 },
    ]);
    expect((absolute?.margin as number) - (relative?.margin as number)).toBeCloseTo(center?.predicted as number, 9);
  });

  it('states the floor of a fully canonical response for an open end, at no frequency', () => {
    const canonical = generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [1.55, -1.55, 2.2, -2.2] });
    const [above, below] = evaluateMask(canonical, { centerHz: 10e9, bandwidthHz: 40e6 }, [
      { fromHz: 10.1e9, rejectionDb: 10 },
      { toHz: 9.9e9, rejectionDb: 10 },
    ]);
    // |S21| at infinity is 1/epsilon.
    expect(above?.predicted).toBeCloseTo(20 * Math.log10(canonical.epsilon), 6);
    expect(above?.worstHz).toBeNull();
    expect(below?.predicted).toBeCloseTo(20 * Math.log10(canonical.epsilon), 6);
    expect(below?.worstHz).toBe(0);
  });

  it('places the worst of a flat open end at the end, whatever the band', () => {
    const canonical = generalizedChebyshev({ order: 2, returnLossDb: 20, transmissionZeros: [2, -2] });
    for (let n = 0; n < 120; n++) {
      const wide = { centerHz: 1e9 + 7.3e6 * n, bandwidthHz: 36e6, ...(n % 3 === 0 ? {} : { unloadedQ: 1000 * n }) };
      const [above, below] = evaluateMask(canonical, wide, [
        { fromHz: 1.2 * wide.centerHz, rejectionDb: 50 },
        { toHz: 0.8 * wide.centerHz, rejectionDb: 50 },
      ]);
      expect([above?.worstHz, below?.worstHz]).toEqual([null, 0]);
    }
  });

  it('states 400 dB on a zero that is hit exactly, and refuses what is no mask', () => {
    const [row] = evaluateMask(
      generalizedChebyshev({ order: 2, returnLossDb: 20, transmissionZeros: [2] }),
      { centerHz: 1e9, bandwidthHz: 1e7 },
      [{ fromHz: 1e9 * (Math.sqrt(1 + 1e-4) + 1e-2), toHz: 1e9 * (Math.sqrt(1 + 1e-4) + 1e-2), rejectionDb: 50 }],
    );
    expect(row?.predicted).toBeGreaterThan(250);
    expect(row?.predicted).toBeLessThanOrEqual(400);
    for (const mask of [null, [{}], [{ fromHz: 2, toHz: 1, rejectionDb: 3 }], [{ fromHz: 1e9, rejectionDb: -3 }]]) {
      expect(() => evaluateMask(matrix, band, mask as never)).toThrow(/E_/);
    }
  });
});

describe('an open line whose worst point lies just inside its end', () => {
  it('is judged there: 17.5666 dB at 1964.778 MHz, not the 17.5774 dB of the end', () => {
    const response = generalizedChebyshev({
      order: 8,
      returnLossDb: 16.206276041921228,
      transmissionZeros: [-1.5732421454678804, 1.4180524369432335],
    });
    const band = { centerHz: 2e9, bandwidthHz: 40256782.277119085 };
    const toHz = 1964981178.6919346;
    const [row] = evaluateMask(response, band, [{ toHz, rejectionDb: 50.438974769786 }]);
    // A dense look at the same response near the end, by the closed form of its roots.
    const attenuation = (hz: number): number => {
      const { re, im } = scatteringAt(response, omegaFromHz(band, hz)).s21;
      return -20 * Math.log10(Math.hypot(re, im));
    };
    const near = Array.from({ length: 4001 }, (_, n) => attenuation(toHz - n * 500));
    expect(row!.predicted).toBeLessThanOrEqual(Math.min(...near) + 1e-9);
    expect(row!.predicted).toBeGreaterThan(Math.min(...near) - 1e-4);
    expect(row!.margin).toBeCloseTo(17.56661, 4);
  });
});
