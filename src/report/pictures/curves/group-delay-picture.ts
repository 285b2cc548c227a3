import { hzFromOmega } from '../../../forms/index.js';
import { checkDesign } from '../../check-design.js';
import type { DesignReport } from '../../design-report.js';
import { type Drawing, FORMAT_WIDTH, type Format, type Picture } from '../../svg/drawing.js';
import { hatchPatterns } from '../../svg/hatch.js';
import { dot, octagon } from '../../svg/marks.js';
import { element, type Markup } from '../../svg/markup.js';
import { type FrequencyUnit, unitOf } from '../../words/numbers.js';
import { requirementOf } from '../../words/requirement.js';
import { closePlot, levelsBetween, roundRange } from './close-plot.js';
import { type CurveData, curveData, greatest } from './curve-data.js';
import { drawNames } from './draw-names.js';
import { labelMap, takeBox, takeLine } from './label-map.js';
import { limitFinding, limitWords, spanWords } from './limit-words.js';
import {
  axisRoom,
  clipFrame,
  clipped,
  curvePath,
  curvePoints,
  isInPlot,
  levelLines,
  litWindow,
  type Plot,
  plotFrame,
  xOf,
  yOf,
} from './plot.js';
import { ruler } from './ruler.js';
import {
  drawVariationBox,
  takeVariationBox,
  type VariationBox,
  valueAt,
  variationBox,
  variationLabels,
} from './variation-box.js';
import { placedText } from './walls.js';

const TOP = 26;
const HEIGHT: Readonly<Record<Format, number>> = { wide: 290, narrow: 240 };

/** Delays in the unit of the document, for each second. */
function perSecond(design: DesignReport): number {
  return 1 / unitOf(design.specification.band).delay.seconds;
}

function boxesOf(design: DesignReport, { hz, lossy }: CurveData): readonly VariationBox[] {
  const scale = perSecond(design);
  return design.mask
    .filter(({ line, worstHz }) => 'groupDelayVariationSeconds' in line && worstHz !== null)
    .map((row) => variationBox(row, scale * valueAt(hz, lossy.delaySeconds, row.worstHz as number), scale));
}

/** Delay at the upper and lower side: room above the boxes and above the peaks at the edges, unless these are far higher. */
function rangeOf(
  design: DesignReport,
  { hz, lossy }: CurveData,
  boxes: readonly VariationBox[],
): readonly [number, number] {
  const { band } = design.specification;
  const [from, to] = [hzFromOmega(band, -1.1), hzFromOmega(band, 1.1)];
  const near = lossy.delaySeconds.filter((_, n) => (hz[n] as number) >= from && (hz[n] as number) <= to);
  const scale = perSecond(design);
  const [peak, least] = [scale * greatest(near), -scale * greatest(near.map((delay) => -delay))];
  const reach = Math.max(...boxes.map(({ end }) => end), 0);
  const highest = reach === 0 ? 1.1 * peak : Math.max(1.25 * reach, Math.min(1.08 * peak, 2.2 * reach));
  const lowest = Math.min(least, ...boxes.map(({ best }) => best));
  // A small variation on a long delay would be lost on an axis from zero.
  const foot = lowest > 0.6 * highest ? lowest - 0.4 * (highest - lowest) : Math.min(0, lowest);
  const [lower, upper] = roundRange(foot, highest, 6);
  return [upper, lower];
}

function worstMarks(plot: Plot, boxes: readonly VariationBox[]): readonly Markup[] {
  return boxes.flatMap(({ row, best }) => {
    const [x, y] = [xOf(plot, row.worstHz as number), yOf(plot, best + row.predicted / plot.unit.delay.seconds)];
    if (!isInPlot(plot, x, y)) return [];
    return [requirementOf(row, plot.unit).isMet ? dot(x, y) : octagon(x, y)];
  });
}

function drawing(design: DesignReport, data: CurveData, format: Format): Drawing {
  const [fromHz, toHz] = data.closeHz;
  const boxes = boxesOf(design, data).filter((box) => box.fromHz < toHz && box.toHz > fromHz);
  const [upper, lower] = rangeOf(design, data, boxes);
  const levels = levelsBetween(upper, lower, 6);
  const room = axisRoom(levels);
  const plot = closePlot(design, data, format, {
    name: 'group-delay',
    top: TOP,
    height: HEIGHT[format],
    upper,
    lower,
    room,
  });
  const points = (seconds: Float64Array) =>
    curvePoints(
      plot,
      data.hz,
      seconds.map((delay) => perSecond(design) * delay),
    );
  const lossy = points(data.lossy.delaySeconds);
  const map = labelMap(plot);
  takeLine(map, lossy);
  const marks = worstMarks(plot, boxes);
  for (const { row, best } of boxes) {
    const [x, y] = [xOf(plot, row.worstHz as number), yOf(plot, best + row.predicted / plot.unit.delay.seconds)];
    takeBox(map, { left: x - 6, right: x + 6, top: y - 6, bottom: y + 6 });
  }
  for (const box of boxes) takeVariationBox(map, plot, box);
  const texts = variationLabels(map, plot, boxes);
  const name = {
    choices: [['group delay of S21'], ['group delay', 'of S21']],
    curve: lossy,
    role: 'transmission',
  } as const;
  const wish = [xOf(plot, plot.band.centerHz), plot.bottom] as const;
  const lossless = data.hasLoss
    ? [element('g', { class: 'lossless' }, curvePath(points(data.lossless.delaySeconds), 'thin s-transmission'))]
    : [];
  const scale = ruler(plot, plot.bottom, []);
  const body = plotFrame(
    plot,
    plot.top,
    plot.bottom,
    hatchPatterns(plot.prefix, ['transmission']),
    clipFrame(plot, 'clip'),
    litWindow(plot),
    levelLines(plot, levels, plot.unit.delay.name),
    ...boxes.map((box) => drawVariationBox(plot, box, 'clip')),
    clipped(plot, 'clip', ...lossless, curvePath(lossy, 'thick s-transmission')),
    ...marks,
    ...texts.map((text) => placedText(text, 'bold halo')),
    ...drawNames(map, plot, [{ ...name, wish }]),
    scale.markup,
  );
  return { width: FORMAT_WIDTH[format], height: plot.bottom + scale.height, body };
}

function words(design: DesignReport, unit: FrequencyUnit): Pick<Picture, 'finding' | 'caption' | 'alternative'> {
  const rows = design.mask.filter(({ line }) => 'groupDelayVariationSeconds' in line);
  const requirements = rows.map((row) => requirementOf(row, unit));
  const finding = rows.length === 0 ? 'Group delay of the passband' : limitFinding(requirements);
  const used = requirements.map(
    ({ predicted, limit, span }) =>
      `${predicted.toFixed(1)} of ${limitWords(limit)} ${unit.delay.name} over ${spanWords(span)} ${unit.name}`,
  );
  const boxes =
    'Each box is as wide as its band and as tall as the variation allowed; it stands on the lowest delay, and the curve must stay below the hatched lid.';
  return {
    finding,
    caption: rows.length === 0 ? 'Of S21; the light area is the passband.' : boxes,
    alternative: `Group delay of S21 over the passband${rows.length === 0 ? '' : `; variation ${used.join(', ')}`}.`,
  };
}

/** The picture from curves that are there already. */
export function groupDelayPictureOf(design: DesignReport, data: CurveData): Picture {
  return {
    name: 'group-delay',
    ...words(design, unitOf(design.specification.band)),
    wide: drawing(design, data, 'wide'),
    narrow: drawing(design, data, 'narrow'),
  };
}

/**
 * Group delay of S21 in nanoseconds over the passband, with a box for every limit on its variation.
 *
 * @param design what `design` returned
 * @returns a picture of 560 and of 340 pixels width
 *
 * @example
 * const picture = groupDelayPicture(design({
 *   passband: { lowerHz: '3822 MHz', upperHz: '3858 MHz' }, order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45],
 *   mask: [{ fromHz: '3823 MHz', toHz: '3857 MHz', groupDelayVariationSeconds: 40e-9 }],
 * }));
 * picture.alternative.includes('of 40 ns'); // true
 */
export function groupDelayPicture(design: DesignReport): Picture {
  return groupDelayPictureOf(checkDesign(design), curveData(design));
}
