import type { HandOver } from '../../../../bandpass/index.js';
import type { Band } from '../../../../forms/index.js';
import { minus } from '../../../svg/words.js';
import { signed, unitOf } from '../../../words/numbers.js';
import type { Network } from '../routing/couplings.js';
import { isAtPort, isDirect, qualityText } from '../routing/label-text.js';
import { pairName } from '../routing/routing-words.js';
import {
  branchQualities,
  largestOf,
  neighborBandwidths,
  offsetsOf,
  type ResonatorLayout,
  smallestOf,
} from './resonator-layout.js';
import { isOnRuler } from './ruler.js';

/** The coupling that stands out: the weakest of neighbors, or the tightest branch of a fan. */
function couplingWords(network: Network, band: Band): string | undefined {
  const { order, isFan } = network;
  const unit = unitOf(band);
  if (isFan) {
    const all = [0, order + 1].flatMap((port) => branchQualities(network, band, port));
    const lowest = all[smallestOf(all.map(({ value }) => value)) ?? 0];
    return lowest && `lowest external Q of a branch ${pairName(lowest, order)}, ${qualityText(lowest.value)}`;
  }
  const all = neighborBandwidths(network, band);
  const weakest = all[smallestOf(all.map(({ value }) => value)) ?? 0];
  const isWhole = network.links.filter(isOnRuler).length === order + 1;
  const path = isWhole ? 'of the main path' : 'of neighbors';
  const size = (value: number): string => `${minus(signed(value, unit.digits - 1))} ${unit.name}`;
  return weakest && `weakest coupling ${path} ${pairName(weakest, order)}, ${size(weakest.value)}`;
}

/** What is seen. */
export function findingOf(network: Network, handOver: HandOver, band: Band): string {
  const unit = unitOf(band);
  const shifts = offsetsOf(handOver, band);
  const largest = largestOf(shifts);
  const tuning =
    largest === undefined
      ? 'All resonators tuned to the center'
      : `Resonator ${largest + 1} lies farthest off the center, ${minus(signed(shifts[largest] ?? 0, unit.digits - 1))} ${unit.name}`;
  const coupling = couplingWords(network, band);
  return coupling === undefined ? tuning : `${tuning}; ${coupling}`;
}

function offsetWords({ offsets }: ResonatorLayout): string[] {
  if (offsets === undefined) return [];
  const marks = [
    ...(offsets.marks.some(({ isNegative }) => !isNegative) ? ['squares tuned up'] : []),
    ...(offsets.marks.some(({ isNegative }) => isNegative) ? ['lozenges tuned down'] : []),
  ].join(', ');
  return [
    `Upper plot: offset of each resonator, ${marks}; a positive M tunes below the center, so signs are opposite.`,
  ];
}

function bracketWords({ isFan, order, links }: Network, band: Band): string[] {
  const own = links.filter((link) => (isFan ? isDirect(link, order) : !isOnRuler(link)));
  const direct = own.some((link) => isDirect(link, order));
  const between = own.some((link) => !isDirect(link, order) && !isAtPort(link, order));
  const ports = own.some((link) => isAtPort(link, order));
  const words = [
    ...(between ? [`cross couplings in ${unitOf(band).name}`] : []),
    ...(ports ? ['further couplings of a port'] : []),
    ...(direct ? ['M from source to load'] : []),
  ];
  return words.length === 0 ? [] : [`${own.length === 1 ? 'bracket' : 'brackets'}: ${words.join(', ')}`];
}

/** Is the external Q of a port written on the ruler of a layout? */
const tellsQuality = ({ ruler }: ResonatorLayout): boolean =>
  ruler.labels.some(({ lines }) => lines[0]?.text.startsWith('Qe'));

/** How to read the marks; true of both drawings. */
export function captionOf(network: Network, band: Band, layouts: readonly ResonatorLayout[]): string {
  const { isFan, links } = network;
  const [first] = layouts as [ResonatorLayout];
  const isPlotted = first.lower.length > 0;
  const told = layouts.filter(tellsQuality).length;
  const isNegative = links.some((link) => link.value < 0 && (!isFan || isDirect(link, network.order)));
  const missing = Math.max(
    ...layouts.map(({ offsets, lower, ruler }) => {
      const panels = [...lower.map(({ panel }) => panel), ...(offsets === undefined ? [] : [offsets])];
      return panels.reduce((sum, { unlabelled }) => sum + unlabelled, ruler.dropped);
    }),
  );
  const parts = [
    ...(isPlotted && isFan ? ['lower plots: each branch taken alone'] : []),
    ...(isPlotted && !isFan ? ['sticks below the ruler: size of the coupling between two resonators'] : []),
    ...bracketWords(network, band),
    ...(isNegative ? ['lozenge there: negative'] : []),
    ...(told > 0
      ? [`Qe${told < layouts.length ? ' where there is room' : ''}: external Q of that coupling alone`]
      : []),
    ...(missing > 0 ? ['all values stand in the tables'] : []),
  ];
  const text = parts.join('; ');
  const second = text === '' ? [] : [`${text.charAt(0).toUpperCase()}${text.slice(1)}.`];
  const sentences = [...offsetWords(first), ...second];
  return sentences.length === 0 ? 'Discs: resonators and ports.' : sentences.join(' ');
}
