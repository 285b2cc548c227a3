import { localMinimum } from '../../numerics/index.js';
import type { Coordinate } from '../placement/mask-pieces.js';
import { levelAt, type Segment } from '../placement/segments.js';
import { attenuationDb, type LossyResponse } from './lossy-response.js';

/** A stretch of mask with what its level is measured from. */
export interface LossySegment extends Segment {
  /** The level counts from the loss at the center of the band. */
  readonly relative: boolean;
  /** Side of the band that a folded stretch comes from; 1 where nothing is folded. */
  readonly side: 1 | -1;
}

/** A local minimum of the margin. */
export interface LossyMinimum {
  readonly omega: number;
  readonly marginDb: number;
  readonly relative: boolean;
  readonly source: number;
}

/** Points between two neighboring landmarks. */
const BETWEEN = 8;

/** Points round a zero, in units of the loss: a notch is about as wide. */
const ROUND_ZERO: readonly number[] = [-4, -2, -1, -0.5, 0, 0.5, 1, 2, 4];

/** Minima higher than the lowest one by more than this, dB, are left at their sample: they hold no margin. */
const FOLLOWED_DB = 10;

/** A local minimum among the samples of a stretch, and the samples beside it. */
interface Dip {
  readonly segment: LossySegment;
  readonly margin: (t: number) => number;
  readonly at: number;
  readonly value: number;
  readonly between?: readonly [number, number];
}

/**
 * Every local minimum of the margin with loss over the mask: ends of stretches and the lowest points between. `knots` are the
 * places of the zeros on the line of the coordinate.
 */
export function lossyMinima(
  response: LossyResponse,
  segments: readonly LossySegment[],
  coordinate: Coordinate,
  knots: readonly number[],
): readonly LossyMinimum[] {
  const center = attenuationDb(response, 0);
  const dips = segments.flatMap((segment) => dipsOf(response, segment, center, coordinate, knots));
  const lowest = Math.min(...dips.map(({ value }) => value));
  return dips.map(({ segment, margin, at, value, between }) => {
    let found = { x: at, value };
    if (between !== undefined && value < lowest + FOLLOWED_DB) {
      const inner = localMinimum(margin, ...between);
      if (inner.value < value) found = inner;
    }
    const { relative, side, source } = segment;
    return { omega: side * coordinate.toOmega(found.x), marginDb: found.value, relative, source };
  });
}

function dipsOf(
  response: LossyResponse,
  segment: LossySegment,
  center: number,
  coordinate: Coordinate,
  knots: readonly number[],
): readonly Dip[] {
  const margin = (t: number): number => {
    if (t === 0) return Number.POSITIVE_INFINITY;
    const attenuation = attenuationDb(response, segment.side * coordinate.toOmega(t));
    return attenuation - (segment.relative ? center : 0) - levelAt(segment, t);
  };
  const points = pointsOf(segment, coordinate, knots, response.sigma);
  const margins = points.map(margin);
  return points.flatMap((at, n) => {
    const value = margins[n] as number;
    const [before, after] = [margins[n - 1], margins[n + 1]];
    if (value > (before ?? Number.POSITIVE_INFINITY) || value >= (after ?? Number.POSITIVE_INFINITY)) return [];
    const dip = { segment, margin, at, value };
    if (before === undefined || after === undefined) return [dip];
    return [{ ...dip, between: [points[n - 1] as number, points[n + 1] as number] as const }];
  });
}

function pointsOf(
  { low, high }: Segment,
  { toOmega, fromOmega }: Coordinate,
  knots: readonly number[],
  sigma: number,
): readonly number[] {
  const ends = [low, ...[0, ...knots].filter((t) => t > low && t < high).sort((a, b) => a - b), high];
  const points = new Set<number>(ends);
  for (let n = 0; n + 1 < ends.length; n++) {
    const [from, to] = [ends[n] as number, ends[n + 1] as number];
    for (let k = 1; k < BETWEEN; k++) points.add(from + ((to - from) * k) / BETWEEN);
  }
  for (const knot of knots) {
    const omega = toOmega(knot);
    if (!Number.isFinite(omega)) continue;
    for (const offset of ROUND_ZERO) {
      const near = omega + offset * sigma;
      if (Math.abs(near) <= 1) continue;
      const t = fromOmega(near);
      if (t > low && t < high) points.add(t);
    }
  }
  return [...points].sort((a, b) => a - b);
}
