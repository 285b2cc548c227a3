import { scaleLinear } from 'd3-scale';
import type { HandOver } from '../../../../bandpass/index.js';
import type { Band } from '../../../../forms/index.js';
import { FORMAT_WIDTH, type Format } from '../../../svg/drawing.js';
import { unitOf } from '../../../words/numbers.js';
import type { Network } from '../routing/couplings.js';
import type { Layout } from '../routing/layout.js';
import { type Panel, panelOf, type Sample } from './panel.js';
import { rulerOf } from './ruler.js';

/** Offsets above, the ruler between, couplings below: plain data. */
export interface ResonatorLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  /** Absent where all resonators are tuned to the center. */
  readonly offsets: Panel | undefined;
  readonly ruler: Layout;
  readonly rulerTop: number;
  readonly couplings: Panel;
}

/** Offsets of the resonators 1..N from the center in the unit of the band; those that print as zero are zero. */
export function offsetsOf(handOver: HandOver, band: Band): number[] {
  const unit = unitOf(band);
  return handOver.resonators.map(({ frequencyHz }) => {
    const offset = (frequencyHz - band.centerHz) / unit.hertz;
    return Math.abs(offset) < 0.5 * 10 ** (1 - unit.digits) ? 0 : offset;
  });
}

/** Couplings along the main line as bandwidths in the unit of the band, source to load; absent ones are 0. */
export function mainBandwidths({ order, links }: Network, band: Band): number[] {
  const unit = unitOf(band);
  return Array.from({ length: order + 1 }, (_, from) => {
    const link = links.find((each) => each.from === from && each.to === from + 1);
    return ((link?.value ?? 0) * band.bandwidthHz) / unit.hertz;
  });
}

/** Index of the largest of some sizes; none where all are zero. */
export function largestOf(values: readonly number[]): number | undefined {
  const sizes = values.map(Math.abs);
  const largest = Math.max(...sizes);
  return largest > 0 ? sizes.indexOf(largest) : undefined;
}

/** Index of the smallest size that is not zero, source and load left out where there is anything else. */
export function weakestOf(bandwidths: readonly number[]): number | undefined {
  const inner = bandwidths.map((value, n) => ({ size: Math.abs(value), n })).slice(1, -1);
  const present = inner.filter(({ size }) => size > 0);
  return present.length === 0 ? undefined : present.reduce((a, b) => (b.size < a.size ? b : a)).n;
}

const listed = (...indices: readonly (number | undefined)[]): number[] =>
  [...new Set(indices)].filter((index): index is number => index !== undefined);

/** Sets panels and ruler one below the other. */
export function resonatorLayout(network: Network, handOver: HandOver, band: Band, format: Format): ResonatorLayout {
  const width = FORMAT_WIDTH[format];
  const isWide = format === 'wide';
  const [left, right] = [isWide ? 54 : 44, width - 6];
  const toX = scaleLinear([0, network.order + 1], [left + 16, right - 16]);
  const step = toX(1) - toX(0);
  const digits = unitOf(band).digits - 1;
  const common = { step, digits, left, right };
  const shifts = offsetsOf(handOver, band);
  const upper: Sample[] = shifts.map((value, n) => ({ x: toX(n + 1), height: value, value }));
  const isTuned = shifts.every((value) => value === 0);
  const top = 22;
  const offsets = isTuned
    ? undefined
    : panelOf({ ...common, samples: upper, top, height: isWide ? 130 : 120, extremes: listed(largestOf(shifts)) });
  const rulerTop = offsets === undefined ? top + 12 : offsets.bottom + 12;
  const ruler = rulerOf(network, band, toX, width);
  const widths = mainBandwidths(network, band);
  const lower: Sample[] = widths.map((value, n) => ({ x: toX(n + 0.5), height: Math.abs(value), value }));
  const extremes = listed(largestOf(widths), weakestOf(widths));
  const couplings = panelOf({
    ...{ ...common, samples: lower, extremes },
    top: rulerTop + ruler.height + 18,
    height: isWide ? 140 : 120,
  });
  return { width, height: couplings.bottom + 8, left, right, offsets, ruler, rulerTop, couplings };
}
