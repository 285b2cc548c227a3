import { hzFromOmega, type MaskRow } from '../../../forms/index.js';
import type { DesignReport } from '../../design-report.js';
import { dot, octagon } from '../../svg/marks.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import { requirementOf } from '../../words/requirement.js';
import { levelsBetween, roundRange } from './close-plot.js';
import type { CurveData } from './curve-data.js';
import { greatest } from './curve-data.js';
import { drawNames } from './draw-names.js';
import { labelMap, takeBox, takeLine } from './label-map.js';
import { lidTexts } from './lid-texts.js';
import { type AskedLid, drawLid, lidBox, lidOf } from './lids.js';
import {
  clipped,
  curvePath,
  curvePoints,
  isInPlot,
  levelLines,
  litWindow,
  type Plot,
  touches,
  xOf,
  yOf,
} from './plot.js';
import {
  drawVariationBox,
  takeVariationBox,
  type VariationBox,
  valueAt,
  variationBox,
  variationLabels,
} from './variation-box.js';
import { placedText } from './walls.js';

/** Limits on insertion loss as lids, in the decibels of the panel. */
function lidsOf(design: DesignReport, { centerLossDb }: CurveData, plot: Plot): readonly AskedLid[] {
  return design.mask
    .filter(({ line }) => 'insertionLossDb' in line && touches(plot, line))
    .flatMap((row) => {
      const reference = row.line.relativeTo === 'center' ? centerLossDb : 0;
      return lidOf(plot, row, { side: 'below', forbids: 'transmission' }, (level) => level + reference);
    });
}

function boxesOf(design: DesignReport, { hz, lossy }: CurveData): readonly VariationBox[] {
  return design.mask
    .filter(({ line, worstHz }) => 'insertionLossVariationDb' in line && worstHz !== null)
    .map((row) => variationBox(row, valueAt(hz, lossy.attenuationDb, row.worstHz as number), 1));
}

/** How much deeper than everything asked for a worst point may lie and still be shown. */
const MOST_REACH = 3;

/** Loss from 0 down to where limits, boxes and the loss within the band end. */
export function lossRange(design: DesignReport, data: CurveData): readonly [number, number] {
  const { band } = design.specification;
  const [from, to] = [hzFromOmega(band, -0.97), hzFromOmega(band, 0.97)];
  const inBand = data.lossy.attenuationDb.filter(
    (_, n) => (data.hz[n] as number) >= from && (data.hz[n] as number) <= to,
  );
  const limits = design.mask.flatMap(({ line }) => {
    if (!('insertionLossDb' in line)) return [];
    const reference = line.relativeTo === 'center' ? data.centerLossDb : 0;
    return [
      Math.max(...(typeof line.insertionLossDb === 'number' ? [line.insertionLossDb] : line.insertionLossDb)) +
        reference,
    ];
  });
  const close = { fromHz: data.closeHz[0], toHz: data.closeHz[1] };
  const isShown = (row: MaskRow): boolean =>
    row.worstHz !== null && row.worstHz >= close.fromHz && row.worstHz <= close.toHz;
  const boxes = boxesOf(design, data).filter(({ fromHz, toHz }) => fromHz < close.toHz && toHz > close.fromHz);
  const worst = [
    ...boxes.filter(({ row }) => isShown(row)).map(({ row, best }) => best + row.predicted),
    ...design.mask.flatMap((row) => {
      if (!('insertionLossDb' in row.line) || !isShown(row)) return [];
      return [row.predicted + (row.line.relativeTo === 'center' ? data.centerLossDb : 0)];
    }),
  ];
  const asked = Math.max(
    ...limits,
    ...boxes.filter(({ row }) => isShown(row)).map(({ end }) => end),
    greatest(inBand),
    1e-3,
  );
  // A worst point far down the skirt would press the passband flat: it is told in words.
  const reach = Math.max(asked, ...worst.filter((level) => level < MOST_REACH * asked));
  return roundRange(0, 1.35 * reach, 5);
}

/** Levels with a hairline. */
export function lossLevels(upper: number, lower: number): readonly number[] {
  return levelsBetween(upper, lower, 5);
}

/** Worst points on the loss curve. */
function marks(
  plot: Plot,
  lids: readonly AskedLid[],
  boxes: readonly VariationBox[],
  centerLossDb: number,
): readonly (readonly [number, number, boolean])[] {
  const ofLids = lids.map(({ row }) => {
    const reference = row.line.relativeTo === 'center' ? centerLossDb : 0;
    return [row, row.predicted + reference] as const;
  });
  const ofBoxes = boxes.map(({ row, best }) => [row, best + row.predicted] as const);
  return [...ofLids, ...ofBoxes]
    .filter(([{ worstHz }]) => worstHz !== null)
    .map(
      ([row, level]) =>
        [xOf(plot, row.worstHz as number), yOf(plot, level), requirementOf(row, plot.unit).isMet] as const,
    )
    .filter(([x, y]) => isInPlot(plot, x, y));
}

/** Upper half of the band picture: insertion loss, more of it further down. */
export function lossPanel(design: DesignReport, data: CurveData, plot: Plot): Markup {
  const lids = lidsOf(design, data, plot);
  const boxes = boxesOf(design, data).filter((box) => touches(plot, box));
  const points = (db: Float64Array) => curvePoints(plot, data.hz, db);
  const lossy = points(data.lossy.attenuationDb);
  const lossless = data.hasLoss ? [points(data.lossless.attenuationDb)] : [];
  const worst = marks(plot, lids, boxes, data.centerLossDb);
  const map = labelMap(plot);
  for (const curve of [lossy, ...lossless]) takeLine(map, curve);
  for (const [x, y] of worst) takeBox(map, { left: x - 6, right: x + 6, top: y - 6, bottom: y + 6 });
  for (const { lid } of lids) takeBox(map, lidBox(plot, lid));
  for (const box of boxes) takeVariationBox(map, plot, box);
  const asked = lidTexts(map, plot, lids, 'insertion loss ≤');
  const used = variationLabels(map, plot, boxes);
  const wish = [xOf(plot, plot.band.centerHz), plot.bottom - 20] as const;
  const choices = [['insertion loss'], ['insertion', 'loss'], ['S21']];
  return fragment(
    litWindow(plot),
    levelLines(plot, lossLevels(plot.upper, plot.lower), 'dB'),
    ...boxes.map((box) => drawVariationBox(plot, box, 'loss')),
    clipped(plot, 'loss', ...lids.map(({ lid }) => drawLid(plot, lid))),
    clipped(
      plot,
      'loss',
      ...lossless.map((curve) => element('g', { class: 'lossless' }, curvePath(curve, 'thin s-transmission'))),
      curvePath(lossy, 'thick s-transmission'),
    ),
    ...worst.map(([x, y, isMet]) => (isMet ? dot(x, y) : octagon(x, y))),
    ...used.map((text) => placedText(text, 'bold halo')),
    ...asked.map((text) => placedText(text, 'halo f-transmission')),
    ...drawNames(map, plot, [{ choices, curve: lossy, role: 'transmission', wish }]),
  );
}
