import type { MaskLine, MaskRow } from '../../forms/index.js';
import { type FrequencyUnit, fixed, frequencyText, trimmed } from './numbers.js';

/**
 * A margin this small, as a share of the limit, is rounding: return loss levels are certified to 1e-8 dB, and a mask that
 * asks for exactly the level designed for is met.
 */
const ROUNDING = 1e-8;

const NANO = 1e9;

/** Marks the name of a requirement whose levels are relative to the loss at the center. */
export const RELATIVE = '*';

interface Kind {
  readonly name: string;
  readonly unit: 'dB' | 'ns';
}

const KINDS: readonly (readonly [string, Kind])[] = [
  ['rejectionDb', { name: 'rejection', unit: 'dB' }],
  ['returnLossDb', { name: 'return loss', unit: 'dB' }],
  ['insertionLossDb', { name: 'insertion loss', unit: 'dB' }],
  ['insertionLossVariationDb', { name: 'loss variation', unit: 'dB' }],
  ['groupDelayVariationSeconds', { name: 'delay variation', unit: 'ns' }],
];

/** One line of a mask with its verdict, in the words and units of a report. */
export interface Requirement {
  readonly name: string;
  readonly unit: string;
  readonly span: string;
  readonly limit: number;
  readonly predicted: number;
  readonly margin: number;
  readonly isMet: boolean;
  /** Margin as a share of the limit: what makes decibels and nanoseconds comparable. */
  readonly share: number;
  readonly at: string;
}

function kindOf(line: MaskLine): Kind {
  const found = KINDS.find(([key]) => key in line)?.[1] ?? { name: 'requirement', unit: 'dB' };
  return line.relativeTo === 'center' ? { ...found, name: `${found.name}${RELATIVE}` } : found;
}

function spanText({ fromHz, toHz }: MaskLine, unit: FrequencyUnit): string {
  if (fromHz === undefined) return `<= ${frequencyText(toHz ?? 0, unit)}`;
  if (toHz === undefined) return `>= ${frequencyText(fromHz, unit)}`;
  if (fromHz === toHz) return frequencyText(fromHz, unit);
  return `${frequencyText(fromHz, unit)}-${frequencyText(toHz, unit)}`;
}

/** Puts a verdict into words. */
export function requirementOf({ line, limit, predicted, margin, worstHz }: MaskRow, unit: FrequencyUnit): Requirement {
  const { name, unit: level } = kindOf(line);
  const scale = level === 'ns' ? NANO : 1;
  const size = Math.max(Math.abs(limit), level === 'ns' ? Number.MIN_VALUE : 1e-3);
  return {
    name,
    unit: level,
    span: spanText(line, unit),
    limit: limit * scale,
    predicted: predicted * scale,
    margin: margin * scale,
    isMet: margin >= -ROUNDING * size,
    share: margin / size,
    at: worstHz === null ? 'far above' : fixed(worstHz / unit.hertz, unit.digits),
  };
}

/** A clearance: two decimals, more where it would round to zero. */
export function clearanceText(margin: number): string {
  const size = Math.abs(margin);
  if (size < 1e-7) return '0.00';
  return size < 0.005 ? size.toPrecision(1) : fixed(size, 2);
}

/** Where a requirement applies, in words. */
export function placeText({ span }: Requirement, unit: FrequencyUnit): string {
  if (span.startsWith('<= ')) return `at and below ${span.slice(3)} ${unit.name}`;
  if (span.startsWith('>= ')) return `at and above ${span.slice(3)} ${unit.name}`;
  if (span.includes('-')) return `over ${span.replace('-', ' to ')} ${unit.name}`;
  return `at ${span} ${unit.name}`;
}

/** Two decimals where they say it all: a limit is never shown rounded. */
export function limitText(limit: number): string {
  const exact = trimmed(limit, 6);
  return Number(fixed(limit, 2)) === Number(exact) ? fixed(limit, 2) : exact;
}

/** Attenuations are stated to 400 dB only; beyond, the figure is a floor and not a prediction. */
export function predictedText(predicted: number, unit: string): string {
  return unit === 'dB' && predicted >= 400 ? 'over 400' : fixed(predicted, 2);
}
