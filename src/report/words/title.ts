import { type Band, type Complex, edgesOfBand, hzFromOmega } from '../../forms/index.js';
import type { Specification, SpecificationFamily } from '../../specification/index.js';
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

function pointText({ re, im }: Complex): string {
  return `${trimmed(re, 4)}${im < 0 ? '-' : '+'}j${trimmed(Math.abs(im), 4)}`;
}

/** The finite transmission zeros in words, one by one where they are few: frequencies with their unit, then points of the s-plane. */
export function zerosText({ transmissionZeros, band }: Specification, unit: FrequencyUnit): string {
  const count = transmissionZeros.length;
  if (count === 0) return 'No finite transmission zeros';
  if (count > ZEROS_LISTED) return `${count} finite transmission zeros`;
  const ordered = [...transmissionZeros].sort((a, b) => a.im - b.im || a.re - b.re);
  const inHertz = ordered
    .filter(({ re }) => re === 0)
    .map(({ im }) => frequencyText(hzFromOmega(band, im), unit))
    .join(', ');
  const points = ordered
    .filter(({ re }) => re !== 0)
    .map(pointText)
    .join(', ');
  const parts = [inHertz === '' ? '' : `${inHertz} ${unit.name}`, points === '' ? '' : `normalized s = ${points}`];
  return `Transmission ${count === 1 ? 'zero' : 'zeros'} at ${parts.filter((part) => part !== '').join('; ')}`;
}

/** Unloaded Q in words. */
export function qualityText(unloadedQ: Specification['unloadedQ']): string {
  if (unloadedQ === undefined) return 'lossless';
  if (typeof unloadedQ === 'number') return `unloaded Q ${trimmed(unloadedQ, 3)}`;
  const [least, most] = [trimmed(Math.min(...unloadedQ), 3), trimmed(Math.max(...unloadedQ), 3)];
  return least === most ? `unloaded Q ${least}` : `unloaded Q ${least} to ${most}`;
}

/** What the band edges stand for, and the stop band of a family that has one. */
export function levelText({
  returnLossDb,
  rejectionDb,
  stopBandEdge,
}: Pick<Specification, 'returnLossDb' | 'rejectionDb' | 'stopBandEdge'>): string {
  const edges = returnLossDb === undefined ? 'half-power edges' : `return loss ${trimmed(returnLossDb, 4)} dB`;
  const stop = rejectionDb === undefined ? '' : `, stop band ${trimmed(rejectionDb, 4)} dB`;
  const from = stopBandEdge === undefined ? '' : `, stop band from w = ${trimmed(stopBandEdge, 6)}`;
  return `${edges}${stop}${from}`;
}

const FAMILIES: Readonly<Record<SpecificationFamily, string>> = {
  generalizedChebyshev: 'generalized Chebyshev',
  chebyshev: 'Chebyshev',
  butterworth: 'Butterworth (maximally flat)',
  inverseChebyshev: 'inverse Chebyshev',
  elliptic: 'elliptic',
  bessel: 'Bessel (maximally flat delay)',
};

/** The family of the response in words. */
export function familyText(family: SpecificationFamily): string {
  return FAMILIES[family];
}
