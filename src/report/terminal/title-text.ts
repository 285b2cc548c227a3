import { type Band, type Complex, edgesOfBand, hzFromOmega } from '../../forms/index.js';
import type { Specification } from '../../specification/index.js';
import { type FrequencyUnit, frequencyText, trimmed } from '../words/numbers.js';
import { wrapped } from './layout.js';
import type { Paint } from './paint.js';

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

function zerosText({ transmissionZeros, band }: Specification, unit: FrequencyUnit): string {
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

/** What the design is, in four lines. */
export function titleLines(specification: Specification, unit: FrequencyUnit, paint: Paint): readonly string[] {
  const { name, band, order, returnLossDb, topology, unloadedQ } = specification;
  const level = returnLossDb === undefined ? 'half-power edges' : `return loss ${trimmed(returnLossDb, 4)} dB`;
  const zeros = zerosText(specification, unit);
  return [
    ...wrapped(name ?? 'Unnamed design').map(paint.strong),
    ...wrapped(bandText(band, unit)),
    ...wrapped(`Order ${order}, ${topology}, ${level}, ${qualityText(unloadedQ)}`),
    ...wrapped(zeros),
  ];
}
