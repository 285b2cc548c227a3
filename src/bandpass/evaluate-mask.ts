import { hzFromOmega, type Level, type MaskLine, type MaskRow } from '../forms/index.js';
import { landmarks, type Model } from '../response/index.js';
import { checkMask } from '../specification/index.js';
import { type LossyBand, lossOf } from './band.js';
import { type Quantity, quantityOf } from './quantities.js';
import { samplePoints } from './sample-points.js';
import { type SweepHz, sweeperHz } from './sweep-hz.js';
import { type WorstPoint, worstPoint } from './worst-point.js';

/** A prepared model: a sweep at any hertz, samples of any span. */
interface Prepared {
  readonly run: (frequenciesHz: Float64Array) => SweepHz;
  readonly points: (fromHz: number, toHz: number) => Float64Array;
  readonly reachHz: { readonly low: number; readonly high: number };
  readonly centerLossDb: number;
}

/** An open end is followed out to this many band widths; beyond, a response is within 1e-11 of its limit or still falling. */
const OPEN_END_OMEGA = 1e6;

/**
 * Verdict of a response on a mask, one row a line, at the true worst point: not the worst of a grid but the minimum between
 * samples that are placed by the poles and zeros of the model, so that a violation however narrow is found.
 *
 * `band` = { centerHz, bandwidthHz, unloadedQ? }; `mask` as in the specification (dB and loss positive). Margins are positive
 * when the line is met, in dB (seconds for group-delay variation). `returnLossDb` looks at the worse port. A level pair is
 * straight in hertz. Levels are absolute unless `relativeTo: 'center'`. Variations are peak to peak; their `worstHz` is the
 * frequency of the larger loss or delay. An attenuation above 400 dB is stated as 400. `worstHz` is null where the worst is
 * approached only as frequency grows without bound. Cost: about 130 + 33*(poles + zeros) samples a line, each O(order).
 *
 * @throws FilterFailure E_BAND, E_Q_RANGE, E_MASK and what `sweepHz` refuses
 *
 * @example
 * const response = chebyshev({ order: 5, returnLossDb: 20 });
 * const [row] = evaluateMask(response, { centerHz: 1e9, bandwidthHz: 20e6 }, [{ fromHz: 1.03e9, toHz: 1.05e9, rejectionDb: 40 }]);
 * row.worstHz; // 1030000000
 */
export function evaluateMask(model: Model, band: LossyBand, mask: readonly MaskLine[]): readonly MaskRow[] {
  const lines = checkMask(mask);
  const prepared = prepare(model, band);
  return lines.map((line) => rowOf(prepared, line));
}

function prepare(model: Model, band: LossyBand): Prepared {
  const run = sweeperHz(model, band);
  const marks = landmarks(model, lossOf(band, model.order));
  const center = run(Float64Array.of(band.centerHz));
  return {
    run,
    points: (fromHz, toHz) => samplePoints(band, marks, fromHz, toHz),
    reachHz: { low: hzFromOmega(band, -OPEN_END_OMEGA), high: hzFromOmega(band, OPEN_END_OMEGA) },
    centerLossDb: quantityOf(center, 'attenuation')[0] as number,
  };
}

function rowOf(prepared: Prepared, line: MaskLine): MaskRow {
  if ('insertionLossVariationDb' in line)
    return variationRow(prepared, line, 'attenuation', line.insertionLossVariationDb);
  if ('groupDelayVariationSeconds' in line)
    return variationRow(prepared, line, 'groupDelay', line.groupDelayVariationSeconds);
  if ('insertionLossDb' in line) return levelRow(prepared, line, 'attenuation', line.insertionLossDb, -1);
  if ('returnLossDb' in line) return levelRow(prepared, line, 'returnLoss', line.returnLossDb, 1);
  return levelRow(prepared, line, 'attenuation', line.rejectionDb, 1);
}

/** `sign` 1: the quantity must reach the level; -1: it must stay below. */
function levelRow(prepared: Prepared, line: MaskLine, quantity: Quantity, level: Level, sign: 1 | -1): MaskRow {
  const span = spanOf(prepared, line);
  const limitAt = limitOf(line, level);
  const reference = line.relativeTo === 'center' ? prepared.centerLossDb : 0;
  const margin = (value: number, hz: number): number => sign * (value - reference - limitAt(hz));
  const worst = endFirst(prepared, line, span, quantity, margin, lowest(prepared, span, quantity, margin));
  const limit = limitAt(worst.hz);
  return {
    line,
    limit,
    predicted: limit + sign * worst.margin,
    margin: worst.margin,
    worstHz: placeOf(line, span, worst.hz),
  };
}

/** Toward infinity a response flattens to rounding: an open end that is within rounding of the worst is the worst. */
function endFirst(
  { run }: Prepared,
  line: MaskLine,
  [low, high]: readonly [number, number],
  quantity: Quantity,
  margin: (value: number, hz: number) => number,
  worst: WorstPoint,
): WorstPoint {
  const ends = [...(line.fromHz === undefined ? [low] : []), ...(line.toHz === undefined ? [high] : [])];
  const margins = ends.map((hz) => ({
    hz,
    margin: margin(quantityOf(run(Float64Array.of(hz)), quantity)[0] as number, hz),
  }));
  const room = 1e-9 * (1 + Math.abs(worst.margin));
  return margins.find((end) => end.margin <= worst.margin + room) ?? worst;
}

/** The end of an open span stands for its limit: 0 Hz below, no frequency at all above. */
function placeOf(line: MaskLine, [low, high]: readonly [number, number], hz: number): number | null {
  if (line.toHz === undefined && hz === high) return null;
  return line.fromHz === undefined && hz === low ? 0 : hz;
}

function variationRow(prepared: Prepared, line: MaskLine, quantity: Quantity, limit: number): MaskRow {
  const span = spanOf(prepared, line);
  const smallest = lowest(prepared, span, quantity, (value) => value);
  const largest = lowest(prepared, span, quantity, (value) => -value);
  const predicted = -largest.margin - smallest.margin;
  return { line, limit, predicted, margin: limit - predicted, worstHz: largest.hz };
}

function lowest(
  { run, points }: Prepared,
  [fromHz, toHz]: readonly [number, number],
  quantity: Quantity,
  margin: (value: number, hz: number) => number,
): WorstPoint {
  const grid = points(fromHz, toHz);
  const values = quantityOf(run(grid), quantity);
  const marginAt = (hz: number): number => margin(quantityOf(run(Float64Array.of(hz)), quantity)[0] as number, hz);
  return worstPoint(
    grid,
    values.map((value, n) => margin(value, grid[n] as number)),
    marginAt,
  );
}

function spanOf({ reachHz }: Prepared, line: MaskLine): readonly [number, number] {
  const low = line.fromHz ?? Math.min(reachHz.low, (line.toHz as number) / 2);
  const high = line.toHz ?? Math.max(reachHz.high, 2 * low);
  return [low, high];
}

/** A level over a span as a function of frequency. */
function limitOf({ fromHz, toHz }: MaskLine, level: Level): (hz: number) => number {
  if (typeof level === 'number') return () => level;
  const [low, high] = [fromHz as number, toHz as number];
  return (hz) => (low === high ? Math.max(...level) : level[0] + ((level[1] - level[0]) * (hz - low)) / (high - low));
}
