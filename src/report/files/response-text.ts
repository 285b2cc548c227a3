import { sweepHz } from '../../bandpass/index.js';
import { type Band, edgesOfBand, hzFromOmega, type MaskLine } from '../../forms/index.js';
import { formatTouchstone } from '../../measurement/index.js';
import { checkDesign } from '../check-design.js';
import type { DesignReport } from '../design-report.js';
import { CONVENTIONS } from '../words/conventions.js';
import { frequencyText, unitOf } from '../words/numbers.js';

const INTERVALS = 1000;
/** In omega, where 2 is one bandwidth: 2.5 bandwidths each side, and at most 10 to reach the ends of the mask. */
const NEAR = 5;
const FAR = 20;
/** Steps of the grid, times a power of ten. */
const ROUND_STEPS: readonly number[] = [1, 2, 2.5, 5, 10];

function spanOf(band: Band, mask: readonly MaskLine[]): readonly [number, number] {
  const ends = mask.flatMap(({ fromHz, toHz }) => [fromHz, toHz]).filter((hertz) => hertz !== undefined);
  const within = ends.filter((hertz) => hertz > hzFromOmega(band, -FAR) && hertz < hzFromOmega(band, FAR));
  return [Math.min(hzFromOmega(band, -NEAR), ...within), Math.max(hzFromOmega(band, NEAR), ...within)];
}

function evenGrid(fromHz: number, stepHz: number, points: number): Float64Array {
  return Float64Array.from({ length: points }, (_, n) => fromHz + n * stepHz);
}

/**
 * Frequencies of the predicted response: those asked for, or else 1001 multiples of a round step over 2.5 bandwidths on
 * each side of the center, wider where the mask reaches further (to 10 bandwidths at most).
 */
export function responseGrid({ band, mask, sweep }: DesignReport['specification']): Float64Array {
  if (sweep !== undefined) {
    const { fromHz, toHz, points } = sweep;
    const grid = evenGrid(fromHz, (toHz - fromHz) / (points - 1), points);
    grid[points - 1] = toHz;
    return grid;
  }
  const [fromHz, toHz] = spanOf(band, mask);
  const least = (toHz - fromHz) / INTERVALS;
  // A power of ten from text is the nearest double; Math.pow may differ in its last bit between engines.
  const power = Number(`1e${Math.floor(Math.log10(least))}`);
  const step = power * (ROUND_STEPS.find((multiple) => multiple * power >= least) ?? 10);
  const first = Math.max(1, Math.round((fromHz + toHz) / 2 / step) - INTERVALS / 2);
  return Float64Array.from({ length: INTERVALS + 1 }, (_, n) => (first + n) * step);
}

function commentsOf({ version, specification }: DesignReport): readonly string[] {
  const { name, band, order, unloadedQ } = specification;
  const unit = unitOf(band);
  const { lowerHz, upperHz } = edgesOfBand(band);
  const quality = typeof unloadedQ === 'object' ? unloadedQ.join(' ') : unloadedQ;
  return [
    `irisloom ${version}: predicted response of the coupling matrix`,
    ...(name === undefined ? [] : [name]),
    `order ${order}, passband ${frequencyText(lowerHz, unit)} to ${frequencyText(upperHz, unit)} ${unit.name}`,
    quality === undefined ? 'lossless' : `unloaded Q ${quality}`,
    'model only, no safety clearance',
    ...CONVENTIONS,
  ];
}

/**
 * Text of the two-port data file with the response that the matrix predicts, loss included.
 *
 * @example
 * const text = responseText(design({ passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' }, order: 4, returnLossDb: 20 }));
 * text.includes('# Hz S RI R 50'); // true
 */
export function responseText(report: DesignReport): string {
  const { band, unloadedQ } = checkDesign(report).specification;
  const lossy = unloadedQ === undefined ? band : { ...band, unloadedQ };
  const response = sweepHz(report.matrix, lossy, responseGrid(report.specification));
  return formatTouchstone({ ...response, comments: commentsOf(report) });
}
