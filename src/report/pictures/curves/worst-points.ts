import type { MaskRow } from '../../../forms/index.js';
import { trimmed } from '../../words/numbers.js';
import { type Requirement, requirementOf } from '../../words/requirement.js';
import type { CurveData } from './curve-data.js';
import { limitWords, roomText, spanWords } from './limit-words.js';
import { isShown, type Plot, touches, xOf, yOf } from './plot.js';
import { levelAt } from './walls.js';

/** A point to be marked, with its place in the plot and what its flag says. */
export interface WorstPoint {
  readonly isMet: boolean;
  readonly share: number;
  readonly x: number;
  readonly y: number;
  /** Whether the point is in the plot; a flag of one that is not points out of it. */
  readonly isInside: boolean;
  readonly lines: readonly [string, string];
}

function spanOf({ span, limit }: Requirement): string {
  return `of ${limitWords(limit)} at ${spanWords(span)}`;
}

/** The worst point itself, where it is in the picture. */
function ownPoint(plot: Plot, row: MaskRow, reference: number): WorstPoint {
  const requirement = requirementOf(row, plot.unit);
  const y = yOf(plot, -(row.predicted + reference));
  const isInside = y <= plot.bottom;
  const lines = [`${isInside ? '' : '↓ '}${roomText(requirement)}`, spanOf(requirement)] as const;
  const { isMet, share } = requirement;
  return { isMet, share, x: xOf(plot, row.worstHz as number), y, isInside, lines };
}

/** A flag at the edge for a worst point beyond it. */
function edgePoint(plot: Plot, row: MaskRow): WorstPoint {
  const requirement = requirementOf(row, plot.unit);
  const { isMet, share, at, limit } = requirement;
  const isBelow = row.worstHz !== null && row.worstHz < plot.fromHz;
  const place = at === 'far above' ? at : `at ${trimmed(Number(at), 1)}`;
  const lines = [
    `${isBelow ? '← ' : ''}${roomText(requirement)}${isBelow ? '' : ' →'}`,
    `of ${limitWords(limit)} ${place}`,
  ] as const;
  return { isMet, share, x: isBelow ? plot.left : plot.right, y: plot.bottom, isInside: false, lines };
}

/** Where a missed limit is missed most within the picture, when its worst point lies outside. */
function shownMiss(plot: Plot, row: MaskRow, data: CurveData): readonly WorstPoint[] {
  const { line } = row;
  if (!('rejectionDb' in line)) return [];
  const reference = line.relativeTo === 'center' ? data.centerLossDb : 0;
  let [least, at] = [0, -1];
  data.hz.forEach((hz, n) => {
    if (!isShown(plot, hz) || hz < (line.fromHz ?? 0) || hz > (line.toHz ?? Number.POSITIVE_INFINITY)) return;
    const margin = (data.lossy.attenuationDb[n] as number) - reference - levelAt(line, line.rejectionDb, hz);
    if (margin < least) [least, at] = [margin, n];
  });
  if (at < 0) return [];
  const hz = data.hz[at] as number;
  const limit = levelAt(line, line.rejectionDb, hz);
  const here = { line, limit, predicted: limit + least, margin: least, worstHz: hz };
  return [ownPoint(plot, here, reference)];
}

/** Points to be marked for the rejection lines that the picture touches, misses first, then the tightest. */
export function worstPoints(plot: Plot, mask: readonly MaskRow[], data: CurveData): readonly WorstPoint[] {
  const points = mask.flatMap((row) => {
    const { line, worstHz } = row;
    if (!('rejectionDb' in line) || !touches(plot, line)) return [];
    const reference = line.relativeTo === 'center' ? data.centerLossDb : 0;
    if (worstHz !== null && isShown(plot, worstHz)) return [ownPoint(plot, row, reference)];
    return [edgePoint(plot, row), ...shownMiss(plot, row, data)];
  });
  return points.sort((a, b) => Number(a.isMet) - Number(b.isMet) || a.share - b.share);
}
