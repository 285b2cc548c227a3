/** A band in hertz: geometric center and equiripple (or half-power) width, `centerHz = sqrt(lower*upper)`. */
export interface Band {
  readonly centerHz: number;
  readonly bandwidthHz: number;
}

/**
 * Band-pass frequency (hertz, above 0) to low-pass prototype frequency, `omega = (f0/B)*(f/f0 - f0/f)`, written without
 * cancellation near f0.
 *
 * Source: the classical reactance transformation of lumped band-pass filters; common practice, no source.
 *
 * @example
 * omegaFromHz({ centerHz: 1000e6, bandwidthHz: 50e6 }, 1050e6).toFixed(6); // '1.952381'
 */
export function omegaFromHz(band: Band, hz: number): number {
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
  return { centerHz: Math.sqrt(lowerHz) * Math.sqrt(upperHz), bandwidthHz: upperHz - lowerHz };
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
