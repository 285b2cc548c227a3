import { scaleLinear } from 'd3-scale';
import type { HandOver } from '../../../../bandpass/index.js';
import type { Band } from '../../../../forms/index.js';
import { FORMAT_WIDTH, type Format } from '../../../svg/drawing.js';
import { unitOf } from '../../../words/numbers.js';
import type { Network } from '../routing/couplings.js';
import { externalQ, isAtPort, isDirect, qualityText } from '../routing/label-text.js';
import type { Layout } from '../routing/layout.js';
import { type Panel, type PanelRequest, panelOf, type Sample } from './panel.js';
import { isOnRuler, rulerOf } from './ruler.js';

/** A plot below the ruler. */
export interface LowerPlot {
  readonly title: string;
  readonly panel: Panel;
}

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
  /** One of the couplings of neighbors; of a fan one for the branches to each port; none without such couplings. */
  readonly lower: readonly LowerPlot[];
}

/** Offsets of the resonators 1..N from the center in the unit of the band; those that print as zero are zero. */
export function offsetsOf(handOver: HandOver, band: Band): number[] {
  const unit = unitOf(band);
  return handOver.resonators.map(({ frequencyHz }) => {
    const offset = (frequencyHz - band.centerHz) / unit.hertz;
    return Math.abs(offset) < 0.5 * 10 ** (1 - unit.digits) ? 0 : offset;
  });
}

/** A value between two nodes. */
export interface Between {
  readonly from: number;
  readonly to: number;
  readonly value: number;
}

/** Coupling bandwidths of neighboring resonators in the unit of the band; couplings that are not there have no entry. */
export function neighborBandwidths({ order, isFan, links }: Network, band: Band): Between[] {
  const unit = unitOf(band);
  return links
    .filter((link) => !isFan && isOnRuler(link) && !isAtPort(link, order) && !isDirect(link, order))
    .map(({ from, to, value }) => ({ from, to, value: (value * band.bandwidthHz) / unit.hertz }))
    .sort((a, b) => a.from - b.from);
}

/** External Q of each branch of a fan to a port, taken alone. */
export function branchQualities({ order, links }: Network, band: Band, port: number): Between[] {
  return links
    .filter((link) => isAtPort(link, order) && (link.from === port || link.to === port))
    .map(({ from, to, value }) => ({ from, to, value: externalQ(value, band) }));
}

/** Index of the largest of some sizes; none where all are zero. */
export function largestOf(values: readonly number[]): number | undefined {
  const sizes = values.map(Math.abs);
  const largest = Math.max(...sizes);
  return largest > 0 ? sizes.indexOf(largest) : undefined;
}

/** Index of the smallest size. */
export function smallestOf(values: readonly number[]): number | undefined {
  const sizes = values.map(Math.abs);
  return sizes.length === 0 ? undefined : sizes.indexOf(Math.min(...sizes));
}

const listed = (...indices: readonly (number | undefined)[]): number[] =>
  [...new Set(indices)].filter((index): index is number => index !== undefined);

type Common = Pick<PanelRequest, 'step' | 'digits' | 'left' | 'right'>;

/** What the plots below the ruler hold. */
interface LowerRequest extends Omit<PanelRequest, 'top' | 'height'> {
  readonly title: string;
}

function lowerRequests(network: Network, band: Band, toX: (node: number) => number, common: Common): LowerRequest[] {
  const request = (title: string, values: readonly Between[], at: (each: Between) => number): LowerRequest => {
    const sizes = values.map(({ value }) => value);
    const samples = values.map(
      (each): Sample => ({ x: toX(at(each)), height: Math.abs(each.value), value: each.value }),
    );
    return { ...common, title, samples, extremes: listed(largestOf(sizes), smallestOf(sizes)) };
  };
  if (network.isFan) {
    const figured = { digits: 4, leastDigits: 3, write: qualityText };
    return [['source', 0] as const, ['load', network.order + 1] as const].map(([name, port]) => {
      const values = branchQualities(network, band, port);
      const own = request(`External Q of each branch to the ${name}`, values, ({ from, to }) =>
        from === port ? to : from,
      );
      return { ...own, ...figured };
    });
  }
  const neighbors = neighborBandwidths(network, band);
  if (neighbors.length === 0) return [];
  return [request(`Coupling bandwidth of neighbors in ${unitOf(band).name}`, neighbors, ({ from }) => from + 0.5)];
}

/** Sets panels and ruler one below the other. */
export function resonatorLayout(network: Network, handOver: HandOver, band: Band, format: Format): ResonatorLayout {
  const width = FORMAT_WIDTH[format];
  const isWide = format === 'wide';
  const [left, right] = [isWide ? 54 : 44, width - 6];
  const toX = scaleLinear([0, network.order + 1], [left + 16, right - 16]);
  const step = toX(1) - toX(0);
  const common = { step, digits: unitOf(band).digits - 1, left, right };
  const shifts = offsetsOf(handOver, band);
  const upper: Sample[] = shifts.map((value, n) => ({ x: toX(n + 1), height: value, value }));
  const isTuned = shifts.every((value) => value === 0);
  const top = 22;
  const offsets = isTuned
    ? undefined
    : panelOf({ ...common, samples: upper, top, height: isWide ? 130 : 120, extremes: listed(largestOf(shifts)) });
  const rulerTop = offsets === undefined ? top + 12 : offsets.bottom + 12;
  const ruler = rulerOf(network, band, toX, width);
  const height = network.isFan ? 100 : isWide ? 140 : 120;
  let bottom = rulerTop + ruler.height;
  const lower = lowerRequests(network, band, toX, common).map(({ title, ...request }): LowerPlot => {
    const panel = panelOf({ ...request, top: bottom + 26, height });
    bottom = panel.bottom;
    return { title, panel };
  });
  return { width, height: bottom + 8, left, right, offsets, ruler, rulerTop, lower };
}
