import type { Level, Span } from '../../forms/index.js';
import { hertzText } from '../echo.js';
import type { Fault } from '../faults.js';

/** Keys that hold the level of a mask line. */
export const LEVELS = [
  'rejectionDb',
  'returnLossDb',
  'insertionLossDb',
  'insertionLossVariationDb',
  'groupDelayVariationSeconds',
] as const;

export type LevelKey = (typeof LEVELS)[number];

/** A mask line with its place, so that a contradiction can name it. */
export interface PlacedLine {
  readonly index: number;
  readonly span: Span;
  readonly key: LevelKey;
  readonly level: Level;
}

/** A line may end at a band edge, which comes from the center and width with this relative rounding. */
const EDGE_ROUNDING = 8 * Number.EPSILON;

interface Edges {
  readonly lowerHz: number;
  readonly upperHz: number;
}

function endsOf(span: Span): readonly [number, number] {
  return [span.fromHz ?? 0, span.toHz ?? Number.POSITIVE_INFINITY];
}

function least(level: Level): number {
  return typeof level === 'number' ? level : Math.min(...level);
}

function most(level: Level): number {
  return typeof level === 'number' ? level : Math.max(...level);
}

/** Whether two spans share more than an end: a stretch, or a point of one within the other. */
function overlap(a: Span, b: Span): boolean {
  const [fromA, toA] = endsOf(a);
  const [fromB, toB] = endsOf(b);
  const from = Math.max(fromA, fromB);
  const to = Math.min(toA, toB);
  return from < to || (from === to && (fromA === toA || fromB === toB));
}

function spanText(span: Span): string {
  const [from, to] = endsOf(span);
  return from === to ? `at ${from} Hz` : `from ${from} to ${to} Hz`;
}

function inPassband(line: PlacedLine, edges: Edges): Fault | undefined {
  const [from, to] = endsOf(line.span);
  if (line.key !== 'rejectionDb' || most(line.level) === 0) return undefined;
  const { lowerHz, upperHz } = edges;
  if (!(from < upperHz * (1 - EDGE_ROUNDING) && to > lowerHz * (1 + EDGE_ROUNDING))) return undefined;
  return {
    code: 'E_MASK',
    path: ['mask', line.index],
    found: `rejection ${spanText(line.span)}, within the passband`,
    allowed: `rejection below ${hertzText(lowerHz)} Hz or above ${hertzText(upperHz)} Hz`,
    advice: `end mask[${line.index}] outside the passband`,
    value: line.level,
  };
}

function againstLoss(line: PlacedLine, loss: PlacedLine): Fault | undefined {
  if (line.key !== 'rejectionDb' || loss.key !== 'insertionLossDb') return undefined;
  if (line.span.relativeTo !== loss.span.relativeTo || !overlap(line.span, loss.span)) return undefined;
  if (least(line.level) <= most(loss.level)) return undefined;
  return {
    code: 'E_MASK',
    path: ['mask', line.index],
    found: `rejection of ${least(line.level)} dB ${spanText(line.span)}, where mask[${loss.index}] allows ${most(loss.level)} dB of loss`,
    allowed: 'lines that one response can meet',
    advice: `change mask[${line.index}] or mask[${loss.index}]`,
    value: line.level,
  };
}

/** Lines that no filter can meet: rejection within the passband, or where another line bounds the loss below it. */
export function contradictionFaults(lines: readonly PlacedLine[], edges: Edges | undefined): readonly Fault[] {
  const losses = lines.filter((line) => line.key === 'insertionLossDb');
  return lines.flatMap((line) => {
    const inside = edges === undefined ? undefined : inPassband(line, edges);
    const against = losses.map((loss) => againstLoss(line, loss)).find((fault) => fault !== undefined);
    const fault = inside ?? against;
    return fault === undefined ? [] : [fault];
  });
}
