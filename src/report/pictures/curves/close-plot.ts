import { scaleLinear } from 'd3-scale';
import type { DesignReport } from '../../design-report.js';
import { FORMAT_WIDTH, type Format } from '../../svg/drawing.js';
import { unitOf } from '../../words/numbers.js';
import type { CurveData } from './curve-data.js';
import type { Plot } from './plot.js';

/** Where a plot of the passband stands and what it shows. */
export interface CloseFrame {
  readonly name: string;
  readonly top: number;
  readonly height: number;
  readonly upper: number;
  readonly lower: number;
  /** Room for the numbers of the level axis. */
  readonly room: number;
}

/** A plot of the passband and a little beside it. */
export function closePlot(design: DesignReport, data: CurveData, format: Format, frame: CloseFrame): Plot {
  const { band } = design.specification;
  return {
    format,
    prefix: `${frame.name}-${format}`,
    band,
    unit: unitOf(band),
    left: Math.max(format === 'wide' ? 46 : 38, frame.room),
    right: FORMAT_WIDTH[format] - (format === 'wide' ? 14 : 8),
    top: frame.top,
    bottom: frame.top + frame.height,
    fromHz: data.closeHz[0],
    toHz: data.closeHz[1],
    upper: frame.upper,
    lower: frame.lower,
  };
}

/** Round levels between two, both ends included where they are round. */
export function levelsBetween(a: number, b: number, count: number): readonly number[] {
  return scaleLinear([Math.min(a, b), Math.max(a, b)], [0, 1]).ticks(count);
}

/** The round step that divides a range into about so many. */
export function roundStep(range: number, count: number): number {
  const [first = 0, second = range] = scaleLinear([0, range], [0, 1]).ticks(count);
  return second - first;
}

/** A range of levels with both ends on a round step. */
export function roundRange(from: number, to: number, count: number): readonly [number, number] {
  const step = roundStep(to - from, count);
  const clean = (steps: number): number => Number((steps * step).toPrecision(12));
  return [clean(Math.floor(from / step + 1e-9)), clean(Math.ceil(to / step - 1e-9))];
}
