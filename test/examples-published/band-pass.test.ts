import { describe, expect, test } from 'vitest';
import { denormalize } from '../../src/bandpass/index.js';
import { bandFromEdges, edgesOfBand, hzFromOmega, omegaFromHz } from '../../src/forms/index.js';
import { matrixOf } from '../support/models.js';
import { example } from './examples.js';

// Standard formula; digits computed for this example. Relative limit 1e-12: 13 digits are kept.
test('the band-pass map of 1000 MHz and 50 MHz', () => {
  const row = example('map-bandpass').recomputed as Record<string, number>;
  const band = { centerHz: 1e9, bandwidthHz: 50e6 };
  expect(omegaFromHz(band, 1050e6)).toBeCloseTo(row.w_at_1050!, 11);
  expect(omegaFromHz(band, 950e6)).toBeCloseTo(row.w_at_950!, 11);
  expect(omegaFromHz(band, 1000e6)).toBe(0);
  expect(hzFromOmega(band, 1) / 1e6 / row['f_at_w=+1']!).toBeCloseTo(1, 12);
  expect(hzFromOmega(band, -1) / 1e6 / row['f_at_w=-1']!).toBeCloseTo(1, 12);
  const { lowerHz, upperHz } = edgesOfBand(band);
  expect((upperHz - lowerHz) / 1e6).toBeCloseTo(row.edge_difference!, 7);
  expect(Math.sqrt(lowerHz * upperHz) / 1e6).toBeCloseTo(row.edge_product_sqrt!, 9);
});

// J.-S. Hong, M. J. Lancaster, Microstrip Filters for RF/Microwave Applications, 2001, section 10.2.1; all numbers recalled
// from memory. Limits as the entry states: 2e-3 MHz, 1e-3 on Qe, 1e-5 on k.
describe('a three-pole trisection at 885 to 925 MHz', () => {
  const { printed, recomputed } = example('hl-trisection-denormalised') as unknown as Record<
    'printed' | 'recomputed',
    Record<string, number>
  >;
  const [g1, g2, j13, b1, b2] = [0.695, 1.245, -0.457, 0.185, -0.615];
  const port = 1 / Math.sqrt(g1);
  const line = 1 / Math.sqrt(g1 * g2);
  const matrix = matrixOf(3, [
    [0, 1, port],
    [1, 1, b1 / g1],
    [1, 2, line],
    [1, 3, j13 / g1],
    [2, 2, b2 / g2],
    [2, 3, line],
    [3, 3, b1 / g1],
    [3, 4, port],
  ]);
  const band = bandFromEdges(885e6, 925e6);
  const { resonators, couplings, externalQ } = denormalize(matrix, band);
  const k = (i: number, j: number): number => couplings.find(({ between }) => between[0] === i && between[1] === j)!.k;

  test('center and fractional bandwidth', () => {
    expect(band.centerHz / 1e6).toBeCloseTo(recomputed.f0_MHz!, 9);
    expect(band.bandwidthHz / band.centerHz).toBeCloseTo(recomputed.FBW!, 12);
  });

  test('resonator frequencies: a positive diagonal entry lies below the center', () => {
    expect(Math.abs(resonators[0]!.frequencyHz / 1e6 - printed.f01_MHz!)).toBeLessThan(2e-3);
    expect(Math.abs(resonators[1]!.frequencyHz / 1e6 - printed.f02_MHz!)).toBeLessThan(2e-3);
    expect(resonators[0]!.frequencyHz / 1e6).toBeCloseTo(recomputed.f01_MHz!, 9);
    expect(resonators[1]!.frequencyHz / 1e6).toBeCloseTo(recomputed.f02_MHz!, 9);
    expect(resonators[2]!.frequencyHz).toBe(resonators[0]!.frequencyHz);
  });

  test('external Q and coupling coefficients', () => {
    expect(Math.abs(externalQ.source! - printed.Qe!)).toBeLessThan(1e-3);
    expect(externalQ.source!).toBeCloseTo(recomputed.Qe!, 10);
    expect(externalQ.load!).toBeCloseTo(externalQ.source!, 12);
    expect(Math.abs(k(1, 2) - printed.M12!)).toBeLessThan(1e-5);
    expect(k(1, 2)).toBeCloseTo(recomputed.M12!, 12);
    expect(Math.abs(k(1, 3) - printed.M13!)).toBeLessThan(1e-5);
    expect(k(1, 3)).toBeCloseTo(recomputed.M13!, 12);
  });
});
