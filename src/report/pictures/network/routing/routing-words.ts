import type { Band } from '../../../../forms/index.js';
import { nodeName } from '../../../words/nodes.js';
import { frequencyText, unitOf } from '../../../words/numbers.js';
import type { Link, Network } from './couplings.js';
import { couplingText, isDirect, MOST_LABELLED, offsetText, type Wording } from './label-text.js';
import type { Layout } from './layout.js';
import { isArrow, patternOf } from './pattern.js';

/** Two nodes that are coupled; no line breaks on either side of the dash. */
export const pairName = ({ from, to }: Pick<Link, 'from' | 'to'>, order: number): string =>
  `${nodeName(from, order)}${JOINED}–${JOINED}${nodeName(to, order)}`;

/** Word joiner: a line may end after a dash, but not in the name of a pair. */
const JOINED = '\u2060';

function crossWords({ order, cross }: Network): string {
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
  if (pattern.kind === 'fan') return 'Resonators in parallel between source and load';
  if (pattern.kind === 'folded') return 'Folded in two lines';
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
  const isWhole = network.links.filter(({ isMain }) => isMain).length === network.order + 1;
  return isWhole && isArrow(network) ? 'A chain in arrow form' : 'A chain';
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

/** Which kinds of label a drawing holds. */
interface Drawn {
  readonly bandwidth: boolean;
  readonly quality: boolean;
  readonly offset: boolean;
  /** Second lines that found no room, or that this drawing does without. */
  readonly isBare: boolean;
}

function drawnOf({ labels }: Layout, { links, order }: Network): Drawn {
  const seconds = labels.flatMap(({ lines }) => (lines[1] === undefined ? [] : [lines[1].text]));
  const couplings = labels.filter(({ lines }) => lines[0]?.classes.includes('bold'));
  const quality = seconds.filter((text) => text.startsWith('Qe'));
  return {
    bandwidth: seconds.length > quality.length,
    quality: quality.length > 0,
    offset: labels.length > couplings.length,
    // A coupling from source to load has no second line to lose.
    isBare: seconds.length + links.filter((link) => isDirect(link, order)).length < couplings.length,
  };
}

/** What stands below M in the labels; nothing where no drawing has a second line. */
function secondWords({ band }: Wording, drawings: readonly Drawn[]): string[] {
  const [bandwidth, quality] = [drawings.some((each) => each.bandwidth), drawings.some((each) => each.quality)];
  if (band === undefined || (!bandwidth && !quality)) return [];
  const place = drawings.some(({ isBare }) => isBare) ? 'second line where there is room' : 'second line';
  const size = `coupling bandwidth in ${unitOf(band).name}`;
  const external = 'external Q (Qe) of that coupling alone';
  if (!quality) return [`${place}: ${size}`];
  return [bandwidth ? `${place}: ${size}, at a port ${external}` : `${place}: ${external}`];
}

function tuningWords(wording: Wording, band: Band | undefined, drawings: readonly Drawn[]): string {
  const detuned = wording.network.detuning.filter((_, n) => offsetText(n + 1, wording) !== undefined).length;
  if (detuned > 0 && !drawings.some(({ offset }) => offset))
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
  if (network.order > MOST_LABELLED)
    words.push(
      network.links.some(({ isMain }) => !isMain)
        ? 'only cross couplings carry a number'
        : 'the numbers stand in the table',
    );
  if (dropped > 0) words.push('numbers without room stand in the table only');
  if (network.hidden > 0)
    words.push(
      network.hidden === 1 ? 'one more coupling is not drawn' : `${network.hidden} more couplings are not drawn`,
    );
  return words;
}

/** What the lines mean: those that are drawn. */
function lineWords({ links, isFan, order }: Network): string[] {
  const dashed = links.filter(({ isMain }) => !isMain);
  const onlyDirect = dashed.every((link) => isDirect(link, order));
  return [
    ...(links.length > dashed.length ? [isFan ? 'solid: coupling of a port' : 'solid: main path'] : []),
    ...(dashed.length > 0 ? [onlyDirect ? 'dashed: source to load' : 'dashed: cross coupling'] : []),
    ...(links.some(({ value }) => value < 0) ? ['lozenge with bar: negative'] : []),
  ];
}

const sentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;

/** How to read the marks, in two sentences; true of every drawing of the picture. */
export function captionOf(wording: Wording, layouts: readonly Layout[]): string {
  const drawings = layouts.map((layout) => drawnOf(layout, wording.network));
  const first = [...lineWords(wording.network), ...secondWords(wording, drawings)];
  const second = [tuningWords(wording, wording.band, drawings), ...omissions(wording, layouts)];
  return `${sentence(first.length > 0 ? first.join(', ') : 'no coupling')} ${sentence(second.join('; '))}`;
}
