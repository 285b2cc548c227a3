import type { HandOver } from '../../../../bandpass/index.js';
import type { Band } from '../../../../forms/index.js';
import { minus } from '../../../svg/words.js';
import { figures, signed, sizeText, unitOf } from '../../../words/numbers.js';
import type { Link, Network } from './couplings.js';
import type { Line } from './layout.js';

/** Above this order only cross couplings are labelled. */
export const MOST_LABELLED = 14;

/** A coupling to four decimals, with its sign; sizes that four decimals do not show, by their power of ten. */
export function couplingText(value: number): string {
  const size = Math.abs(value);
  if (size === 0 || (size >= PRINTED && size < 1000)) return minus(signed(value, 4));
  return minus(`${value > 0 ? '+' : ''}${sizeText(value)}`);
}

const PRINTED = 5e-5;

/** One decimal less than frequencies carry: still a thousandth of the band. */
function widthText(hertz: number, band: Band, withUnit: boolean): string {
  const unit = unitOf(band);
  return minus(`${signed(hertz / unit.hertz, unit.digits - 1)}${withUnit ? ` ${unit.name}` : ''}`);
}

/** What labels are made from. */
export interface Wording {
  readonly network: Network;
  readonly band: Band | undefined;
  readonly handOver: HandOver;
  readonly isDense: boolean;
  /** The second line of a label: bandwidth or external Q. */
  readonly withSecond: boolean;
}

/** A coupling bandwidth; digits are added where it would print as zero. */
export function bandwidthText(hertz: number, band: Band, withUnit: boolean): string {
  const unit = unitOf(band);
  const size = Math.abs(hertz) / unit.hertz;
  if (size >= 0.5 * 10 ** (1 - unit.digits)) return widthText(hertz, band, withUnit);
  return minus(`${hertz < 0 ? '-' : '+'}${figures(size, 1)}${withUnit ? ` ${unit.name}` : ''}`);
}

/** Does a coupling tie a port to a resonator? */
export function isAtPort({ from, to }: Pick<Link, 'from' | 'to'>, order: number): boolean {
  return (from === 0) !== (to === order + 1);
}

/** Does a coupling lead from source to load? */
export function isDirect({ from, to }: Pick<Link, 'from' | 'to'>, order: number): boolean {
  return from === 0 && to === order + 1;
}

/** External Q of one coupling of a port taken alone: f0/(B*M^2). M times B means nothing at a port. */
export function externalQ(value: number, { centerHz, bandwidthHz }: Band): number {
  return centerHz / (bandwidthHz * value * value);
}

/** An external Q to four figures or as many as asked for; of very weak couplings its power of ten. */
export function qualityText(quality: number, count = 4): string {
  return quality < 1e6 ? figures(quality, count) : sizeText(quality);
}

/** The second line: coupling bandwidth between resonators, external Q at a port, nothing from source to load. */
function secondText(link: Link, { band, network, isDense }: Wording): string | undefined {
  if (band === undefined || isDirect(link, network.order)) return undefined;
  if (isAtPort(link, network.order)) return `Qe ${qualityText(externalQ(link.value, band))}`;
  return bandwidthText(link.value * band.bandwidthHz, band, !isDense);
}

/** The label of a coupling; empty where it has none. */
export function linesOf(link: Link, wording: Wording): readonly Line[] {
  const { isDense, withSecond, network } = wording;
  if (link.isMain && network.order > MOST_LABELLED) return [];
  const color = link.value < 0 ? ' f-negative' : '';
  const first = {
    text: couplingText(link.value),
    classes: `bold${isDense ? ' small' : ''}${color}`,
    size: isDense ? 11 : 13,
  };
  const second = withSecond ? secondText(link, wording) : undefined;
  if (second === undefined) return [first];
  return [first, { text: second, classes: `${isDense ? 'small f-second' : 'tick'}`, size: isDense ? 11 : 12.5 }];
}

/** How far a resonator is tuned off the center: a number in the unit of the band, or as M_ii where no band is given; else nothing. */
export function offsetText(node: number, { network, band, handOver }: Wording): string | undefined {
  const value = network.detuning[node - 1] ?? 0;
  if (band === undefined) return Math.abs(value) < PRINTED ? undefined : `M ${couplingText(value)}`;
  const hertz = (handOver.resonators[node - 1]?.frequencyHz ?? band.centerHz) - band.centerHz;
  // The unit stands once, in the caption: beside a row of couplings there is room for the number only.
  const text = widthText(hertz, band, false);
  return Number(text.replace('−', '-')) === 0 ? undefined : text;
}
