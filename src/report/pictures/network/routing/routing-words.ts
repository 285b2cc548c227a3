import type { Band } from '../../../../forms/index.js';
import { nodeName } from '../../../words/nodes.js';
import { frequencyText, unitOf } from '../../../words/numbers.js';
import type { Link, Network } from './couplings.js';
import { couplingText, MOST_LABELLED, offsetText, type Wording } from './label-text.js';
import type { Layout } from './layout.js';
import { patternOf } from './pattern.js';

/** Two nodes that are coupled. */
export const pairName = ({ from, to }: Pick<Link, 'from' | 'to'>, order: number): string =>
  `${nodeName(from, order)}–${nodeName(to, order)}`;

function crossWords({ order, links }: Network): string {
  const cross = links.filter(({ isMain }) => !isMain);
  const first = cross[0];
  if (first === undefined) return 'no cross coupling';
  const negative = cross.filter(({ value }) => value < 0).length;
  if (cross.length === 1) return `one cross coupling, ${pairName(first, order)}, of ${couplingText(first.value)}`;
  const strongest = cross.reduce((a, b) => (Math.abs(b.value) > Math.abs(a.value) ? b : a));
  const signs = negative === 0 ? 'none negative' : negative === cross.length ? 'all negative' : `${negative} negative`;
  return `${cross.length} cross couplings, ${signs}; strongest ${pairName(strongest, order)}, ${couplingText(strongest.value)}`;
}

function shapeWords(network: Network): string {
  const pattern = patternOf(network);
  if (pattern.kind === 'fan') return 'A fan of resonators between source and load';
  if (pattern.kind === 'folded') return 'Folded in two rows';
  if (pattern.kind === 'cascade') {
    const triangles = pattern.sections.filter(({ first, last }) => last - first === 2).length;
    const squares = pattern.sections.length - triangles;
    const counted = (count: number, word: string): string => (count === 1 ? `1 ${word}` : `${count} ${word}s`);
    const parts = [
      ...(triangles > 0 ? [counted(triangles, 'triangle')] : []),
      ...(squares > 0 ? [counted(squares, 'square')] : []),
    ];
    return `A chain with ${parts.join(' and ')}`;
  }
  return 'A chain';
}

/** What is seen. */
export function findingOf(network: Network): string {
  const rest = network.isFan
    ? network.links.some(({ isMain }) => !isMain)
      ? 'source and load also coupled directly'
      : 'no direct coupling'
    : crossWords(network);
  return `${shapeWords(network)}: ${rest}`;
}

function tuningWords(wording: Wording, band: Band | undefined): string {
  const detuned = wording.network.detuning.filter((_, n) => offsetText(n + 1, wording) !== undefined).length;
  if (detuned > 0 && wording.network.order > MOST_LABELLED)
    return detuned === 1 ? 'one resonator is detuned' : `${detuned} resonators are detuned`;
  if (detuned > 0)
    return band === undefined
      ? 'M at a resonator: its detuning, positive tunes below the center'
      : `number at a resonator: its offset from the center in ${unitOf(band).name}`;
  if (band === undefined) return 'all resonators tuned to the center';
  const unit = unitOf(band);
  return `all resonators tuned to ${frequencyText(band.centerHz, unit)} ${unit.name}`;
}

function omissions({ network }: Wording, layouts: readonly Layout[]): string[] {
  const dropped = Math.max(...layouts.map((layout) => layout.dropped));
  const words: string[] = [];
  if (network.order > MOST_LABELLED) words.push('only cross couplings carry a number');
  if (dropped > 0) words.push('numbers without room stand in the table only');
  if (network.hidden > 0)
    words.push(
      network.hidden === 1 ? 'one weaker coupling is not drawn' : `${network.hidden} weaker couplings are not drawn`,
    );
  return words;
}

/** How to read the marks, in two sentences. */
export function captionOf(wording: Wording, layouts: readonly Layout[]): string {
  const { band, network } = wording;
  const parts = [
    'Solid: main path',
    ...(network.links.some(({ isMain }) => !isMain) ? ['dashed: cross coupling'] : []),
  ];
  if (network.links.some(({ value }) => value < 0)) parts.push('lozenge with bar: negative');
  if (band !== undefined && network.order <= MOST_LABELLED)
    parts.push(`second line: coupling bandwidth in ${unitOf(band).name}, or external Q`);
  const tuning = tuningWords(wording, band);
  const second = [tuning, ...omissions(wording, layouts)].join('; ');
  return `${parts.join(', ')}. ${second.charAt(0).toUpperCase()}${second.slice(1)}.`;
}
