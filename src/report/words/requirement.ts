import type { MaskLine, MaskRow } from '../../forms/index.js';
import { type FrequencyUnit, fixed, frequencyText, trimmed } from './numbers.js';

/**
 * A margin this small, as a share of the limit, is rounding: return loss levels are certified to 1e-8 dB, and a mask that
 * asks for exactly the level designed for is met.
 */
const ROUNDING = 1e-8;

const NANO = 1e9;

/** Margins below are rounding, dB or ns. */
const NOTHING = 1e-7;

/** Marks the name of a requirement whose levels are relative to the loss at the center. */
export const RELATIVE = '*';

interface Kind {
  readonly name: string;
  readonly unit: 'dB' | 'ns';
  readonly bound: 'atLeast' | 'atMost';
  /** Decimals on a page; a terminal shows two of everything. */
  readonly decimals: number;
}

const KINDS: readonly (readonly [string, Kind])[] = [
  ['rejectionDb', { name: 'rejection', unit: 'dB', bound: 'atLeast', decimals: 1 }],
  ['returnLossDb', { name: 'return loss', unit: 'dB', bound: 'atLeast', decimals: 1 }],
  ['insertionLossDb', { name: 'insertion loss', unit: 'dB', bound: 'atMost', decimals: 2 }],
  ['insertionLossVariationDb', { name: 'loss variation', unit: 'dB', bound: 'atMost', decimals: 2 }],
  ['groupDelayVariationSeconds', { name: 'delay variation', unit: 'ns', bound: 'atMost', decimals: 1 }],
];
const ANY_KIND: Kind = { name: 'requirement', unit: 'dB', bound: 'atLeast', decimals: 2 };

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
  readonly bound: 'atLeast' | 'atMost';
  /** Decimals on a page: those of its kind, more where the clearance would round to zero. */
  readonly decimals: number;
}

function kindOf(line: MaskLine): Kind {
  const found = KINDS.find(([key]) => key in line)?.[1] ?? ANY_KIND;
  return line.relativeTo === 'center' ? { ...found, name: `${found.name}${RELATIVE}` } : found;
}

function spanText({ fromHz, toHz }: MaskLine, unit: FrequencyUnit): string {
  if (fromHz === undefined) return `<= ${frequencyText(toHz ?? 0, unit)}`;
  if (toHz === undefined) return `>= ${frequencyText(fromHz, unit)}`;
  if (fromHz === toHz) return frequencyText(fromHz, unit);
  return `${frequencyText(fromHz, unit)}-${frequencyText(toHz, unit)}`;
}

/** Decimals that show a margin, unless it is nothing but rounding. */
function shownDecimals(margin: number, least: number): number {
  const size = Math.abs(margin);
  if (size < NOTHING) return least;
  return Math.max(least, Math.ceil(-Math.log10(2 * size)));
}

/** Puts a verdict into words. */
export function requirementOf({ line, limit, predicted, margin, worstHz }: MaskRow, unit: FrequencyUnit): Requirement {
  const { name, unit: level, bound, decimals } = kindOf(line);
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
    bound,
    decimals: shownDecimals(margin * scale, decimals),
  };
}

/** A clearance: so many decimals, more where it would round to zero. */
export function clearanceText(margin: number, decimals = 2): string {
  const size = Math.abs(margin);
  if (size < NOTHING) return fixed(0, decimals);
  return size < 0.5 * 10 ** -decimals ? size.toPrecision(1) : fixed(size, decimals);
}

/** Where a requirement applies, in words. */
export function placeText({ span }: Requirement, unit: FrequencyUnit): string {
  if (span.startsWith('<= ')) return `at and below ${span.slice(3)} ${unit.name}`;
  if (span.startsWith('>= ')) return `at and above ${span.slice(3)} ${unit.name}`;
  if (span.includes('-')) return `over ${span.replace('-', ' to ')} ${unit.name}`;
  return `at ${span} ${unit.name}`;
}

/** So many decimals where they say it all: a limit is never shown rounded. */
export function limitText(limit: number, decimals = 2): string {
  const exact = trimmed(limit, 6);
  return Number(fixed(limit, decimals)) === Number(exact) ? fixed(limit, decimals) : exact;
}

/** Attenuations are stated to 400 dB only; beyond, the figure is a floor and not a prediction. */
export function predictedText(predicted: number, unit: string, decimals = 2): string {
  return unit === 'dB' && predicted >= 400 ? 'over 400' : fixed(predicted, decimals);
}

/** Room left, or short, in the words of the pictures. */
export function roomText(margin: number, isMet: boolean, unit: string): string {
  const size = Math.abs(margin);
  const text = size >= 0.95 ? fixed(size, 1) : clearanceText(size);
  return `${text} ${unit} ${isMet ? 'clear' : 'short'}`;
}
