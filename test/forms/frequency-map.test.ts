import { expect, test } from 'vitest';
import { bandFromEdges, edgesOfBand, hzFromOmega, omegaFromHz } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { Exact, exact } from '../support/exact.js';
import { logUniform, seeded } from '../support/random.js';

const random = seeded(111);
const bands = Array.from({ length: 40 }, () => {
  const centerHz = logUniform(random, 1e6, 1e11);
  return { centerHz, bandwidthHz: centerHz * logUniform(random, 1e-4, 0.5) };
});

test('omegaFromHz(band, hz) equals the exact map (f0/B)(f/f0 - f0/f), also next to the center', () => {
  for (const band of bands) {
    for (const offset of [0, 1e-15, 1e-9, 1e-3, 0.3, -1e-12, -0.2, 3]) {
      const hz = band.centerHz * (1 + offset);
      const [f, f0, b] = [exact(hz), exact(band.centerHz), exact(band.bandwidthHz)];
      const reference = f.times(f).minus(f0.times(f0)).div(f.times(b));
      const error = exact(omegaFromHz(band, hz)).minus(reference).abs();
      expect(error.lte(new Exact(4 * EPS).times(reference.abs()))).toBe(true);
    }
  }
});

test('hzFromOmega(band, omega) inverts it on either side, far out too', () => {
  for (const band of bands) {
    for (const omega of [0, 1e-12, 0.5, -0.5, 1, -1, 30, -30, 1e6, -1e6]) {
      const hz = hzFromOmega(band, omega);
      expect(hz).toBeGreaterThan(0);
      const [f, f0, b] = [exact(hz), exact(band.centerHz), exact(band.bandwidthHz)];
      const back = f.times(f).minus(f0.times(f0)).div(f.times(b));
      // One ulp of f moves omega by about eps*(f + f0^2/f)/B.
      const room = (4 * EPS * (hz + band.centerHz ** 2 / hz)) / band.bandwidthHz;
      expect(back.minus(exact(omega)).abs().toNumber()).toBeLessThan(room);
    }
  }
});

test('edgesOfBand and bandFromEdges belong together', () => {
  for (const band of bands) {
    const { lowerHz, upperHz } = edgesOfBand(band);
    const again = bandFromEdges(lowerHz, upperHz);
    expect(Math.abs(again.centerHz / band.centerHz - 1)).toBeLessThan(8 * EPS);
    expect(Math.abs(again.bandwidthHz - band.bandwidthHz)).toBeLessThan(8 * EPS * band.centerHz);
  }
  expect(bandFromEdges(1e90, 4e90).centerHz / 2e90).toBeCloseTo(1, 14);
});

test('the maps refuse what is no frequency and no band', () => {
  const band = { centerHz: 1e9, bandwidthHz: 1e7 };
  for (const run of [
    () => omegaFromHz(band, 0),
    () => omegaFromHz(band, -1e9),
    () => omegaFromHz(band, '1e9' as never),
    () => omegaFromHz(band, 1e-300),
    () => omegaFromHz({ centerHz: 1e9 } as never, 1e9),
    () => hzFromOmega(band, Number.NaN),
    () => hzFromOmega(band, '3' as never),
    () => bandFromEdges(-1, 2),
    () => bandFromEdges(2, 1),
    () => edgesOfBand(null as never),
  ]) {
    expect(run).toThrowError(/^E_(FREQUENCY|NOT_FINITE|BAND) /);
  }
});
