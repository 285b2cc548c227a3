import { refusal } from '../numerics/index.js';

/** A band in hertz: geometric center and equiripple (or half-power) width, `centerHz = sqrt(lower*upper)`. */
export interface Band {
  readonly centerHz: number;
  readonly bandwidthHz: number;
}

/**
 * Band-pass frequency (hertz, above 0) to low-pass prototype frequency, `omega = (f0/B)*(f/f0 - f0/f)`, written without
 * cancellation near f0.
 *
 * @throws FilterFailure E_BAND, E_FREQUENCY
 *
 * Source: the classical reactance transformation of lumped band-pass filters; common practice, no source.
 *
 * @example
 * omegaFromHz({ centerHz: 1000e6, bandwidthHz: 50e6 }, 1050e6).toFixed(6); // '1.952381'
 */
export function omegaFromHz(band: Band, hz: number): number {
  checkBandNumbers(band);
  if (typeof hz !== 'number' || !(hz > 0) || hz > MOST_HZ || hz < 1 / MOST_HZ) {
    throw refusal('E_FREQUENCY', 'hz', hz, `hertz above 0, to ${MOST_HZ}`, 'check the unit');
  }
  return ((hz - band.centerHz) / band.bandwidthHz) * ((hz + band.centerHz) / hz);
}

/**
 * Low-pass prototype frequency to band-pass frequency in hertz, the inverse of `omegaFromHz` on the positive branch:
 * `f = f0*(sqrt(1 + x^2) + x)`, `x = omega*B/(2*f0)`.
 *
 * @example
 * hzFromOmega({ centerHz: 1000e6, bandwidthHz: 50e6 }, 1).toFixed(3); // '1025312451.187'
 */
export function hzFromOmega(band: Band, omega: number): number {
  checkBandNumbers(band);
  if (typeof omega !== 'number' || !Number.isFinite(omega)) {
    throw refusal('E_NOT_FINITE', 'omega', omega, 'a finite number', 'replace it');
  }
  const x = (omega * band.bandwidthHz) / (2 * band.centerHz);
  const root = Math.sqrt(1 + x * x);
  // For negative x the sum cancels; its reciprocal does not.
  return x >= 0 ? band.centerHz * (root + x) : band.centerHz / (root - x);
}

/**
 * The band between two edges in hertz: geometric center, width.
 *
 * @example
 * bandFromEdges(3822e6, 3858e6).bandwidthHz; // 36000000
 */
export function bandFromEdges(lowerHz: number, upperHz: number): Band {
  const band = { centerHz: Math.sqrt(lowerHz) * Math.sqrt(upperHz), bandwidthHz: upperHz - lowerHz };
  return checkBandNumbers(band);
}

/**
 * The two edges of a band in hertz, `lower*upper = center^2` and `upper - lower = bandwidth`.
 *
 * @example
 * edgesOfBand(bandFromEdges(3822e6, 3858e6)).upperHz.toFixed(0); // '3858000000'
 */
export function edgesOfBand(band: Band): { readonly lowerHz: number; readonly upperHz: number } {
  return { lowerHz: hzFromOmega(band, -1), upperHz: hzFromOmega(band, 1) };
}

/** No frequency of a circuit lies beyond, or below its inverse; products of two stay in the range of doubles. */
const MOST_HZ = 1e100;

function checkBandNumbers(band: Band): Band {
  const usable = (value: unknown): boolean => typeof value === 'number' && value > 0 && value <= MOST_HZ;
  if (usable(band?.centerHz) && usable(band?.bandwidthHz)) return band;
  throw refusal(
    'E_BAND',
    'band',
    band,
    'centerHz and bandwidthHz above 0, lower edge below upper edge',
    'check the edges and their units',
  );
}
