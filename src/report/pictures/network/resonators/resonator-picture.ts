import type { HandOver } from '../../../../bandpass/index.js';
import type { Band, CouplingMatrix } from '../../../../forms/index.js';
import { type Drawing, FORMAT_WIDTH, type Format, type Picture } from '../../../svg/drawing.js';
import { lozenge, square } from '../../../svg/marks.js';
import { element, fragment, type Markup } from '../../../svg/markup.js';
import { label, minus } from '../../../svg/words.js';
import { frequencyText, signed, trimmed, unitOf } from '../../../words/numbers.js';
import { checkedHandOver, type Network, networkOf } from '../routing/couplings.js';
import { drawn } from '../routing/draw.js';
import { pairName } from '../routing/routing-words.js';
import type { Panel } from './panel.js';
import {
  largestOf,
  mainBandwidths,
  offsetsOf,
  type ResonatorLayout,
  resonatorLayout,
  weakestOf,
} from './resonator-layout.js';

function panelMarkup(panel: Panel, left: number, right: number, title: string): Markup {
  const { top, zero, side, marks, labels, ticks } = panel;
  return fragment(
    ...ticks.map(({ y }) => element('line', { x1: left, x2: right, y1: y, y2: y, class: 's-hairline hair' })),
    element('line', { x1: left, x2: right, y1: zero, y2: zero, class: 's-second hair' }),
    ...ticks.map(({ value, y }) => label(left - 6, y + 4, minus(trimmed(value, 6)), 'small f-second', 'end')),
    label(2, top - 6, title, 'small f-second'),
    ...marks.map(({ x, y, isNegative }) =>
      fragment(
        element('line', { x1: x, x2: x, y1: zero, y2: y, class: `medium ${isNegative ? 's-negative' : 's-ink'}` }),
        isNegative ? lozenge(x, y, side) : square(x, y, side),
      ),
    ),
    ...labels.map(({ x, y, text, isExtreme, isNegative }) => {
      const classes = `small${isExtreme ? ' bold' : ''}${isNegative ? ' f-negative' : isExtreme ? '' : ' f-second'}`;
      return label(x, y + 4, text, classes, 'mid');
    }),
  );
}

function rulerMarkup({ ruler, rulerTop }: ResonatorLayout, order: number): Markup {
  const [first, last] = [ruler.discs[0], ruler.discs.at(-1)];
  const y = first?.y ?? 0;
  const line = element('line', { x1: first?.x ?? 0, x2: last?.x ?? 0, y1: y, y2: y, class: 's-ink medium' });
  return element('g', { transform: `translate(0 ${Math.round(rulerTop * 10) / 10})` }, line, drawn(ruler, order));
}

function drawing(layout: ResonatorLayout, network: Network, band: Band, format: Format): Drawing {
  const { left, right, offsets, couplings, height } = layout;
  const unit = unitOf(band);
  const center = `${frequencyText(band.centerHz, unit)} ${unit.name}`;
  const upper =
    offsets === undefined
      ? label(2, 16, `All resonators tuned to ${center}`, 'small f-second')
      : panelMarkup(offsets, left, right, `Offset from ${center}, ${unit.name}`);
  const body = fragment(
    upper,
    panelMarkup(couplings, left, right, `Coupling bandwidth along the main path, ${unit.name}`),
    rulerMarkup(layout, network.order),
  );
  return { width: FORMAT_WIDTH[format], height, body };
}

function findingOf(network: Network, handOver: HandOver, band: Band): string {
  const unit = unitOf(band);
  const text = (value: number): string => `${minus(signed(value, unit.digits - 1))} ${unit.name}`;
  const shifts = offsetsOf(handOver, band);
  const largest = largestOf(shifts);
  const tuning =
    largest === undefined
      ? 'All resonators tuned to the center'
      : `Resonator ${largest + 1} lies farthest off the center, ${text(shifts[largest] ?? 0)}`;
  const widths = mainBandwidths(network, band);
  const weakest = weakestOf(widths);
  if (weakest === undefined) return tuning;
  const pair = pairName({ from: weakest, to: weakest + 1 }, network.order);
  return `${tuning}; weakest coupling of the main path ${pair}, ${text(widths[weakest] ?? 0)}`;
}

function captionOf(network: Network, layouts: readonly ResonatorLayout[]): string {
  const isTuned = layouts[0]?.offsets === undefined;
  const above = isTuned ? '' : 'Above: offset of each resonator, squares tuned up, lozenges down. ';
  const hasCross = network.links.some(({ from, to }) => to !== from + 1);
  const cross = hasCross ? '; brackets on the ruler: cross couplings' : '';
  const isNegative = network.links.some(({ value }) => value < 0) ? ', lozenge: negative' : '';
  const missing = Math.max(...layouts.map((each) => each.couplings.unlabelled + (each.offsets?.unlabelled ?? 0)));
  const table = missing > 0 ? '; all values stand in the table' : '';
  return `${above}Below: size of each coupling between its two nodes${isNegative}${cross}${table}.`;
}

/**
 * The values of each resonator against those of its neighbors: offsets from the center above a ruler of resonators, couplings
 * of the main path below it between their two nodes, cross couplings as brackets on the ruler.
 *
 * Offsets and coupling bandwidths are in the unit of the band; ports count as M times the bandwidth. Cost: a few milliseconds up
 * to order 20.
 *
 * @throws FilterFailure E_BAND, E_TYPE, E_MATRIX_SHAPE, E_NOT_FINITE, E_ENTRY_RANGE, E_NOT_SYMMETRIC
 *
 * @example
 * const { matrix } = folded(transversal(generalizedChebyshev({ order: 5, returnLossDb: 20, transmissionZeros: [1.28, 1.75] })));
 * const picture = resonatorPicture(matrix, { centerHz: 2537e6, bandwidthHz: 42e6 });
 * picture.finding.startsWith('Resonator 3 lies farthest off the center'); // true
 */
export function resonatorPicture(matrix: CouplingMatrix, band: Band): Picture {
  const handOver = checkedHandOver(matrix, band);
  const network = networkOf(matrix);
  const wide = resonatorLayout(network, handOver, band, 'wide');
  const narrow = resonatorLayout(network, handOver, band, 'narrow');
  const finding = findingOf(network, handOver, band);
  return {
    name: 'resonators',
    finding,
    caption: captionOf(network, [wide, narrow]),
    alternative: `Offsets and couplings of ${network.order} resonators. ${finding}.`,
    wide: drawing(wide, network, band, 'wide'),
    narrow: drawing(narrow, network, band, 'narrow'),
  };
}
