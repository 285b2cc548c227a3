import { scaleLinear } from 'd3-scale';
import { checkDesign } from '../../check-design.js';
import type { DesignReport } from '../../design-report.js';
import { type Drawing, FORMAT_WIDTH, type Format, type Picture } from '../../svg/drawing.js';
import { hatchPatterns } from '../../svg/hatch.js';
import { dot, octagon } from '../../svg/marks.js';
import type { Markup } from '../../svg/markup.js';
import { requirementOf } from '../../words/requirement.js';
import { type CurveData, curveData } from './curve-data.js';
import { type CurveName, drawNames } from './draw-names.js';
import { drawFlags, flagStrip, placedFlags, takeFlags } from './flags.js';
import { type LabelMap, labelMap, takeBox, takeLine } from './label-map.js';
import { lidTexts } from './lid-texts.js';
import { type AskedLid, drawLid, lidBox } from './lids.js';
import {
  clipFrame,
  clipped,
  isInPlot,
  isShown,
  levelLines,
  litWindow,
  type Plot,
  plotFrame,
  xOf,
  yOf,
} from './plot.js';
import { type Curves, curvesOf, drawCurves, returnLossLids } from './response-parts.js';
import { responsePlot } from './response-plot.js';
import { responseWords } from './response-words.js';
import { ruler } from './ruler.js';
import { drawWalls, placedText, takeWalls, wallLabels, wallsOf } from './walls.js';
import { worstPoints } from './worst-points.js';

/** Worst points of the return-loss lines. */
function lidMarks(plot: Plot, lids: readonly AskedLid[]): readonly Markup[] {
  return lids.flatMap(({ row }) => {
    const { worstHz, predicted } = row;
    if (worstHz === null || !isShown(plot, worstHz)) return [];
    const [x, y] = [xOf(plot, worstHz), yOf(plot, -predicted)];
    if (!isInPlot(plot, x, y)) return [];
    return [requirementOf(row, plot.unit).isMet ? dot(x, y, 'f-reflection') : octagon(x, y)];
  });
}

/** Names of the two curves. */
function curveNames(map: LabelMap, plot: Plot, { s21, s11 }: Curves): readonly Markup[] {
  const center = xOf(plot, plot.band.centerHz);
  const names: readonly CurveName[] = [
    {
      choices: [['transmission S21'], ['transmission', 'S21'], ['S21']],
      curve: s21,
      role: 'transmission',
      wish: [plot.right - 60, plot.bottom - 120],
    },
    {
      choices: [['reflection S11'], ['reflection', 'S11'], ['S11']],
      curve: s11,
      role: 'reflection',
      wish: [center, plot.bottom - 110],
    },
  ];
  return drawNames(map, plot, names);
}

function levelTicks({ lower }: Plot): readonly number[] {
  return scaleLinear([lower, 0], [0, 1])
    .ticks(7)
    .filter((level) => level >= lower);
}

function drawing(design: DesignReport, data: CurveData, format: Format): Drawing {
  const plot = responsePlot(design, data, format);
  const walls = wallsOf(plot, design.mask, data.centerLossDb);
  const lids = returnLossLids(design, plot);
  const points = worstPoints(plot, design.mask, data);
  const flags = placedFlags(plot, points);
  const curves = curvesOf(plot, data);
  const foot = plot.bottom + flagStrip(flags);
  const scale = ruler(plot, foot, design.specification.transmissionZeros);
  const map = labelMap(plot);
  for (const curve of [curves.s21, curves.s11, ...curves.lossless]) takeLine(map, curve);
  for (const { lid } of lids) takeBox(map, lidBox(plot, lid));
  takeFlags(map, plot, points);
  // Labels of walls stand inside the walls: before these are taken.
  const wallTexts = wallLabels(map, plot, walls);
  takeWalls(map, plot, walls);
  const asked = lidTexts(map, plot, lids, 'return loss ≥');
  const body = plotFrame(
    plot,
    plot.top,
    foot,
    hatchPatterns(plot.prefix, ['transmission', 'reflection']),
    clipFrame(plot, 'clip'),
    litWindow(plot, foot),
    clipped(plot, 'clip', drawWalls(plot, walls)),
    levelLines(plot, levelTicks(plot), 'dB'),
    clipped(plot, 'clip', ...lids.map(({ lid }) => drawLid(plot, lid))),
    drawCurves(plot, curves),
    ...lidMarks(plot, lids),
    drawFlags(plot, points, flags),
    ...wallTexts.map((text) => placedText(text, 'halo-ground')),
    ...asked.map((text) => placedText(text, 'halo f-reflection')),
    ...curveNames(map, plot, curves),
    scale.markup,
  );
  return { width: FORMAT_WIDTH[format], height: foot + scale.height, body };
}

/** The picture from curves that are there already. */
export function responsePictureOf(design: DesignReport, data: CurveData): Picture {
  return {
    name: 'response',
    ...responseWords(design, data),
    wide: drawing(design, data, 'wide'),
    narrow: drawing(design, data, 'narrow'),
  };
}

/**
 * S11 and S21 in dB over the mask of a design: walls where transmission may not be, a hatched lid over the return loss, the
 * worst point of every rejection line with the room left, the lossless response thin under the lossy one.
 *
 * @param design what `design` returned; its `sweep` sets the frequencies shown, else 2.5 bandwidths on each side
 * @returns a picture of 560 and of 340 pixels width
 *
 * @example
 * const picture = responsePicture(design({
 *   passband: { lowerHz: '3822 MHz', upperHz: '3858 MHz' }, order: 6, returnLossDb: 22,
 *   transmissionZeros: [1.45, -1.45], mask: [{ fromHz: '3868 MHz', rejectionDb: 34 }],
 * }));
 * picture.finding; // 'Rejection clear by 2.2 dB'
 */
export function responsePicture(design: DesignReport): Picture {
  return responsePictureOf(checkDesign(design), curveData(design));
}
