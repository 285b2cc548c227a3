import { type Band, type Complex, edgesOfBand, hzFromOmega } from '../../forms/index.js';
import type { Specification } from '../../specification/index.js';
import { type FrequencyUnit, frequencyText, trimmed } from './numbers.js';

/** What a design without a name is called. */
export const UNNAMED = 'Unnamed design';

/** Zeros told one by one. */
const ZEROS_LISTED = 6;

/** Edges, center and width of a band on one line. */
export function bandText(band: Band, unit: FrequencyUnit): string {
  const { lowerHz, upperHz } = edgesOfBand(band);
  const percent = Number(((100 * band.bandwidthHz) / band.centerHz).toPrecision(3));
  const [lower, upper, center] = [lowerHz, upperHz, band.centerHz].map((hertz) => frequencyText(hertz, unit));
  const width = frequencyText(band.bandwidthHz, unit);
  return `${lower} to ${upper} ${unit.name}, center ${center}, width ${width} ${unit.name} (${percent} %)`;
}

function zeroText({ re, im }: Complex, band: Band, unit: FrequencyUnit): string {
  if (re === 0) return frequencyText(hzFromOmega(band, im), unit);
  return `s = ${trimmed(re, 4)}${im < 0 ? '-' : '+'}j${trimmed(Math.abs(im), 4)}`;
}

/** The finite transmission zeros in words, one by one where they are few. */
export function zerosText({ transmissionZeros, band }: Specification, unit: FrequencyUnit): string {
  const count = transmissionZeros.length;
  if (count === 0) return 'No finite transmission zeros';
  if (count > ZEROS_LISTED) return `${count} finite transmission zeros`;
  const ordered = [...transmissionZeros].sort((a, b) => a.im - b.im || a.re - b.re);
  const anyHertz = ordered.some(({ re }) => re === 0) ? ` ${unit.name}` : '';
  return `Transmission ${count === 1 ? 'zero' : 'zeros'} at ${ordered.map((zero) => zeroText(zero, band, unit)).join(', ')}${anyHertz}`;
}

/** Unloaded Q in words. */
export function qualityText(unloadedQ: Specification['unloadedQ']): string {
  if (unloadedQ === undefined) return 'lossless';
  if (typeof unloadedQ === 'number') return `unloaded Q ${trimmed(unloadedQ, 3)}`;
  return `unloaded Q ${trimmed(Math.min(...unloadedQ), 3)} to ${trimmed(Math.max(...unloadedQ), 3)}`;
}

/** The level that the band edges stand for. */
export function levelText(returnLossDb: number | undefined): string {
  return returnLossDb === undefined ? 'half-power edges' : `return loss ${trimmed(returnLossDb, 4)} dB`;
}
