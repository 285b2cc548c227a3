import type { DesignReport } from '../../design-report.js';
import { dot, octagon } from '../../svg/marks.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import { requirementOf } from '../../words/requirement.js';
import { levelsBetween } from './close-plot.js';
import type { CurveData } from './curve-data.js';
import { drawNames } from './draw-names.js';
import { labelMap, takeBox, takeLine } from './label-map.js';
import { lidTexts } from './lid-texts.js';
import { drawLid, lidBox, lidOf } from './lids.js';
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
import { placedText } from './walls.js';

/** Return loss from 10 dB above what is asked or designed for to 20 dB below it. */
export function matchRange({ specification, mask }: DesignReport): readonly [number, number] {
  const asked = mask.flatMap(({ line, limit }) => ('returnLossDb' in line ? [limit] : []));
  const levels = [...asked, ...(specification.returnLossDb === undefined ? [] : [specification.returnLossDb])];
  const [least, most] = levels.length === 0 ? [20, 20] : [Math.min(...levels), Math.max(...levels)];
  return [Math.max(0, 10 * Math.floor((least - 9) / 10)), 10 * Math.ceil((most + 15) / 10)];
}

/** Levels with a hairline. */
export function matchLevels(upper: number, lower: number): readonly number[] {
  return levelsBetween(upper, lower, 4);
}

/** Lower half of the band picture: return loss, better match further down. */
export function matchPanel(design: DesignReport, data: CurveData, plot: Plot): Markup {
  const lids = design.mask
    .filter(({ line }) => 'returnLossDb' in line && touches(plot, line))
    .flatMap((row) => lidOf(plot, row, { side: 'above', forbids: 'reflection' }, (level) => level));
  const points = (db: Float64Array) => curvePoints(plot, data.hz, db);
  const lossy = points(data.lossy.returnLossDb);
  const lossless = data.hasLoss ? [points(data.lossless.returnLossDb)] : [];
  const worst = lids
    .flatMap(({ row }) =>
      row.worstHz === null
        ? []
        : [[xOf(plot, row.worstHz), yOf(plot, row.predicted), requirementOf(row, plot.unit).isMet] as const],
    )
    .filter(([x, y]) => isInPlot(plot, x, y));
  const map = labelMap(plot);
  for (const curve of [lossy, ...lossless]) takeLine(map, curve);
  for (const [x, y] of worst) takeBox(map, { left: x - 6, right: x + 6, top: y - 6, bottom: y + 6 });
  for (const { lid } of lids) takeBox(map, lidBox(plot, lid));
  const asked = lidTexts(map, plot, lids, 'return loss ≥');
  const wish = [plot.right - 40, plot.top + 30] as const;
  const choices = [['return loss'], ['return', 'loss'], ['S11']];
  return fragment(
    litWindow(plot),
    levelLines(plot, matchLevels(plot.upper, plot.lower), 'dB'),
    clipped(plot, 'match', ...lids.map(({ lid }) => drawLid(plot, lid))),
    clipped(
      plot,
      'match',
      ...lossless.map((curve) => element('g', { class: 'lossless' }, curvePath(curve, 'thin s-reflection'))),
      curvePath(lossy, 'medium s-reflection'),
    ),
    ...worst.map(([x, y, isMet]) => (isMet ? dot(x, y, 'f-reflection') : octagon(x, y))),
    ...asked.map((text) => placedText(text, 'halo f-reflection')),
    ...drawNames(map, plot, [{ choices, curve: lossy, role: 'reflection', wish }]),
  );
}
