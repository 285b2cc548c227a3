import type { Band, CouplingMatrix } from '../../../../forms/index.js';
import { checkMatrix } from '../../../check-design.js';
import { type Drawing, FORMAT_WIDTH, type Format, type Picture } from '../../../svg/drawing.js';
import { layoutOf } from './compose.js';
import { checkedHandOver, networkOf } from './couplings.js';
import { drawn } from './draw.js';
import type { Layout } from './layout.js';
import { captionOf, findingOf } from './routing-words.js';

/** The layout of one format, for the drawing and for whoever checks it. */
export function routingLayout(matrix: CouplingMatrix, band: Band | undefined, format: Format): Layout {
  return layoutOf({ network: networkOf(matrix), band, handOver: checkedHandOver(matrix, band), format });
}

/**
 * How the resonators of a coupling matrix are wired: main path, cross couplings, detuned resonators and ports.
 *
 * The figure follows from the pattern of the matrix alone, so a matrix from elsewhere is drawn as well: two rows for a folded
 * one, a row with triangles, squares or arcs, a fan for the transversal form. Labels give M, and with a band the coupling
 * bandwidth, at a port the external Q of that coupling alone, and the offsets of detuned resonators in its unit. Couplings that print as 0.0000 are not drawn.
 * Cost: some 10 ms up to order 20, up to a second at order 100.
 *
 * @throws FilterFailure E_BAND, E_TYPE, E_MATRIX_SHAPE, E_NOT_FINITE, E_ENTRY_RANGE, E_NOT_SYMMETRIC
 *
 * @example
 * const { matrix } = folded(transversal(generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [2, -2] })));
 * const picture = routingPicture(matrix, { centerHz: 1e9, bandwidthHz: 20e6 });
 * picture.finding.startsWith('Folded in two lines: one cross coupling'); // true
 * picture.wide.width; // 560
 */
export function routingPicture(given: CouplingMatrix, band?: Band): Picture {
  const matrix = checkMatrix(given);
  const handOver = checkedHandOver(matrix, band);
  const network = networkOf(matrix);
  const layouts = (['wide', 'narrow'] as const).map((format) => layoutOf({ network, band, handOver, format }));
  const [wide, narrow] = layouts as [Layout, Layout];
  const finding = findingOf(network);
  const drawing = (layout: Layout, format: Format): Drawing => ({
    width: FORMAT_WIDTH[format],
    height: layout.height,
    body: drawn(layout, network.order),
  });
  const wording = { network, band, handOver, isDense: false, withSecond: band !== undefined };
  return {
    name: 'routing',
    finding,
    caption: captionOf(wording, layouts),
    alternative: `Routing of ${network.order} resonators. ${finding}.`,
    wide: drawing(wide, 'wide'),
    narrow: drawing(narrow, 'narrow'),
  };
}
