import type { Band, CouplingMatrix } from '../../../../forms/index.js';
import { checkBand } from '../../../../specification/index.js';
import { checkMatrix } from '../../../check-design.js';
import { type Drawing, FORMAT_WIDTH, type Format, type Picture } from '../../../svg/drawing.js';
import { lozenge, square } from '../../../svg/marks.js';
import { element, fragment, type Markup } from '../../../svg/markup.js';
import { label, minus } from '../../../svg/words.js';
import { frequencyText, trimmed, unitOf } from '../../../words/numbers.js';
import { checkedHandOver, type Network, networkOf } from '../routing/couplings.js';
import { drawn } from '../routing/draw.js';
import type { Panel } from './panel.js';
import { type ResonatorLayout, resonatorLayout } from './resonator-layout.js';
import { captionOf, findingOf } from './resonator-words.js';

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

function drawing(layout: ResonatorLayout, network: Network, band: Band, format: Format): Drawing {
  const { left, right, offsets, ruler, rulerTop, lower, height } = layout;
  const unit = unitOf(band);
  const center = `${frequencyText(band.centerHz, unit)} ${unit.name}`;
  const upper =
    offsets === undefined
      ? label(2, 16, `All resonators tuned to ${center}`, 'small f-second')
      : panelMarkup(offsets, left, right, `Offset in ${unit.name} from ${center}`);
  const place = { transform: `translate(0 ${Math.round(rulerTop * 10) / 10})` };
  const body = fragment(
    upper,
    ...lower.map(({ panel, title }) => panelMarkup(panel, left, right, title)),
    element('g', place, drawn(ruler, network.order)),
  );
  return { width: FORMAT_WIDTH[format], height, body };
}

/**
 * The values of each resonator against those of its neighbors: offsets from the center above a ruler of resonators, couplings
 * of neighbors below it between their two resonators, cross couplings as brackets on the ruler; of a transversal network the
 * external Q of each branch to each port.
 *
 * Offsets and coupling bandwidths are in the unit of the band; couplings of a port have the external Q of that coupling taken
 * alone, f0/(B*M^2). Cost: a few milliseconds up to order 20.
 *
 * @throws FilterFailure E_BAND, E_TYPE, E_MATRIX_SHAPE, E_NOT_FINITE, E_ENTRY_RANGE, E_NOT_SYMMETRIC
 *
 * @example
 * const { matrix } = folded(transversal(generalizedChebyshev({ order: 5, returnLossDb: 20, transmissionZeros: [1.28, 1.75] })));
 * const picture = resonatorPicture(matrix, { centerHz: 2537e6, bandwidthHz: 42e6 });
 * picture.finding.startsWith('Resonator 3 lies farthest off the center'); // true
 */
export function resonatorPicture(given: CouplingMatrix, band: Band): Picture {
  const matrix = checkMatrix(given);
  const handOver = checkedHandOver(matrix, checkBand(band));
  const network = networkOf(matrix);
  const wide = resonatorLayout(network, handOver, band, 'wide');
  const narrow = resonatorLayout(network, handOver, band, 'narrow');
  const finding = findingOf(network, handOver, band);
  return {
    name: 'resonators',
    finding,
    caption: captionOf(network, band, [wide, narrow]),
    alternative: `Offsets and couplings of ${network.order} resonators. ${finding}.`,
    wide: drawing(wide, network, band, 'wide'),
    narrow: drawing(narrow, network, band, 'narrow'),
  };
}
