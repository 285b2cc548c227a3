import type { DesignReport } from '../../design-report.js';
import { FORMAT_WIDTH, type Format } from '../../svg/drawing.js';
import { unitOf } from '../../words/numbers.js';
import type { CurveData } from './curve-data.js';
import type { Plot } from './plot.js';

const PLOT_HEIGHT: Readonly<Record<Format, number>> = { wide: 330, narrow: 270 };
const TOP = 26;
/** Floors the picture may have, dB below 0. */
const LEAST_FLOOR = 50;
const MOST_FLOOR = 240;
/** How much deeper than the deepest wall a worst point may lie and still be shown. */
const MORE = 45;

/** Lowest level of the picture: below the deepest wall by 15 dB, and farther to show worst points that are not much deeper. */
function floorOf(design: DesignReport, centerLossDb: number): number {
  const limits = design.mask.map(({ line }) => {
    const reference = line.relativeTo === 'center' ? centerLossDb : 0;
    const level = 'rejectionDb' in line ? line.rejectionDb : 'returnLossDb' in line ? line.returnLossDb : 0;
    return Math.max(...(typeof level === 'number' ? [level] : level)) + reference;
  });
  const deepest = Math.max(0, ...limits);
  const points = design.mask.flatMap(({ line, predicted }) => ('rejectionDb' in line ? [predicted + 6] : []));
  const near = points.filter((level) => level < deepest + MORE);
  const floor = 10 * Math.ceil(Math.max(LEAST_FLOOR, deepest + 15, ...near) / 10);
  return Math.min(floor, MOST_FLOOR);
}

/** The plot of the response over the mask. */
export function responsePlot(design: DesignReport, data: CurveData, format: Format): Plot {
  const { band } = design.specification;
  const width = FORMAT_WIDTH[format];
  return {
    format,
    prefix: `response-${format}`,
    band,
    unit: unitOf(band),
    left: format === 'wide' ? 46 : 36,
    right: width - (format === 'wide' ? 14 : 8),
    top: TOP,
    bottom: TOP + PLOT_HEIGHT[format],
    fromHz: data.spanHz[0],
    toHz: data.spanHz[1],
    upper: 0,
    lower: -floorOf(design, data.centerLossDb),
  };
}
