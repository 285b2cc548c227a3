import type { HandOver } from '../../../../bandpass/index.js';
import type { Band } from '../../../../forms/index.js';
import { FORMAT_WIDTH, type Format } from '../../../svg/drawing.js';
import { textWidth } from '../../../svg/words.js';
import { cascade } from './cascade.js';
import { chainColumn, chainRow } from './chain.js';
import type { Network } from './couplings.js';
import { fan } from './fan.js';
import { foldedColumns, foldedRows } from './folded.js';
import { linesOf, MOST_LABELLED, offsetText, type Wording } from './label-text.js';
import type { Layout, Line, Sizing, Skeleton } from './layout.js';
import { patternOf } from './pattern.js';
import { finish, linesWidth, type Wanted } from './place.js';

/** Half diagonal of a lozenge on a line, px. */
const LOZENGE = 8;

/** Room on both sides of a cascade for labels of upright lines, px. */
const INSET = 40;

/** Orders up to this keep the second line of their labels in the narrow drawing. */
const MOST_NARROW_SECOND = 8;

/** What a routing picture is made from. */
export interface Request {
  readonly network: Network;
  readonly band: Band | undefined;
  readonly handOver: HandOver;
  readonly format: Format;
}

function wordingOf({ network, band, handOver, format }: Request, isDense: boolean): Wording {
  const withSecond = band !== undefined && (format === 'wide' || network.order <= MOST_NARROW_SECOND);
  return { network, band, handOver, isDense, withSecond };
}

function sizingOf(request: Request): Sizing {
  const { network, format } = request;
  const widest = (isDense: boolean): number =>
    Math.max(
      0,
      ...network.links
        .filter(({ isMain }) => isMain)
        .map((link) => linesWidth(linesOf(link, wordingOf(request, isDense)))),
    );
  const wording = wordingOf(request, true);
  const isWritten = network.order <= MOST_LABELLED;
  const offsets = isWritten ? network.detuning.map((_, n) => offsetText(n + 1, wording) ?? '') : [];
  return {
    width: FORMAT_WIDTH[format],
    isNarrow: format === 'narrow',
    mainWidth: widest(false),
    smallWidth: widest(true),
    mainLines: wording.withSecond ? 2 : 1,
    offsetWidth: Math.max(0, ...offsets.map((text) => textWidth(text, format === 'narrow' ? 11 : 12.5))),
  };
}

/** Ways to lay out a network: first those that show its pattern, then those that show any. */
function skeletons(network: Network, sizing: Sizing): readonly (readonly Skeleton[])[] {
  const pattern = patternOf(network);
  const known = (each: Skeleton | undefined): Skeleton[] => (each === undefined ? [] : [each]);
  const anyway = (): Skeleton[] => [...known(chainRow(network, sizing)), chainColumn(network, sizing)];
  if (pattern.kind === 'fan') return [[fan(network, sizing)]];
  if (pattern.kind === 'folded') return [[...known(foldedRows(network, sizing)), foldedColumns(network, sizing)]];
  if (pattern.kind === 'inline') return [known(cascade(network, sizing, [])), anyway()];
  if (pattern.kind === 'cascade') {
    const { sections } = pattern;
    const tried = [0, INSET].flatMap((inset) => [0, 0.82, 1].map((smallest) => [smallest, inset] as const));
    return [tried.flatMap(([smallest, inset]) => known(cascade(network, sizing, sections, smallest, inset))), anyway()];
  }
  return [anyway()];
}

function wantedOf({ routes, offsets, isDense }: Skeleton, request: Request): Wanted[] {
  const wording = wordingOf(request, isDense);
  const short = { ...wording, withSecond: false };
  const labelled = routes.map((own): Wanted => {
    const { link, spots } = own;
    const versions = wording.withSecond ? [linesOf(link, wording), linesOf(link, short)] : [linesOf(link, wording)];
    return { versions: versions.filter((lines) => lines.length > 0), spots, own };
  });
  const shift = [...(request.network.order <= MOST_LABELLED ? offsets : [])].flatMap(([node, spots]): Wanted[] => {
    const text = offsetText(node, wording);
    const line: Line = { text: text ?? '', classes: isDense ? 'small f-second' : 'tick', size: isDense ? 11 : 12.5 };
    return text === undefined ? [] : [{ versions: [[line]], spots }];
  });
  // Cross couplings choose first: they have the fewest places, and their values the least to do with their neighbors.
  const isCross = (n: number): boolean => routes[n]?.link.isMain === false;
  const ordered = [...labelled.filter((_, n) => isCross(n)), ...labelled.filter((_, n) => !isCross(n)), ...shift];
  return ordered.filter(({ versions }) => versions.length > 0);
}

/** Labels that are left out count first, then labels that lost their second line. */
const lossOf = ({ dropped, shortened }: Layout): number => 1000 * dropped + shortened;

/** The layout that leaves out the fewest labels; of equals the first. */
export function layoutOf(request: Request): Layout {
  const sizing = sizingOf(request);
  let best: Layout | undefined;
  for (const group of skeletons(request.network, sizing)) {
    // The pattern is given up only where that saves numbers, not for second lines.
    if (best?.dropped === 0) break;
    // Small letters for all labels of a figure where one finds no room at full size.
    for (const each of group.flatMap((one) => (one.isDense ? [one] : [one, { ...one, isDense: true }]))) {
      const layout = finish(each, wantedOf(each, request), sizing.width, LOZENGE);
      if (best === undefined || lossOf(layout) < lossOf(best)) best = layout;
      if (lossOf(best) === 0) return best;
    }
  }
  return best as Layout;
}
