import { type Band, hzFromOmega, omegaFromHz } from '../forms/index.js';
import type { Landmark } from '../response/index.js';

/** Points round each landmark, in half widths: dense at its center, out to 40 half widths. */
const AROUND: readonly number[] = Array.from({ length: 33 }, (_, n) => Math.tan(((n - 16) / 16) * 1.546));

/** Points spread over a span, dense at its ends, and as dense in the far stop band as its slow change there asks. */
const SPREAD = 129;

/** Narrowest half width a landmark is resolved with, as a fraction of the unit band: a lossless zero has none of its own. */
const NARROWEST = 1e-6;

/**
 * Sorted sample frequencies of a span, in hertz, such that between neighbors the response is smooth: both ends, a spread over
 * the span, and a cluster round every pole and zero as narrow as that root is.
 */
export function samplePoints(band: Band, landmarks: readonly Landmark[], fromHz: number, toHz: number): Float64Array {
  const points = new Set<number>([fromHz, toHz]);
  const [low, high] = [omegaFromHz(band, fromHz), omegaFromHz(band, toHz)];
  const put = (omega: number): void => {
    const hz = hzFromOmega(band, omega);
    if (hz > fromHz && hz < toHz) points.add(hz);
  };
  const [left, right] = [shrunk(low), shrunk(high)];
  for (let n = 1; n < SPREAD - 1; n++)
    put(stretched(left + ((right - left) * (1 - Math.cos((Math.PI * n) / (SPREAD - 1)))) / 2));
  for (const { omega, halfWidth } of landmarks) {
    for (const offset of AROUND) put(omega + offset * Math.max(halfWidth, NARROWEST));
  }
  return Float64Array.from(points).sort();
}

/** All of the frequency axis in (-1, 1): near the band like omega, far out like its inverse, as the response itself. */
function shrunk(omega: number): number {
  return omega / (1 + Math.abs(omega));
}

function stretched(share: number): number {
  return share / (1 - Math.abs(share));
}
