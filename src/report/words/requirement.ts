import type { Level, MaskLine, MaskRow } from '../../forms/index.js';
import { type FrequencyUnit, fixed, frequencyText, trimmed } from './numbers.js';

/**
 * A margin this small, as a share of the limit, is rounding: return loss levels are certified to 1e-8 dB, and a mask that
 * asks for exactly the level designed for is met.
 */
const ROUNDING = 1e-8;

/** Margins below are rounding, in dB or in the unit of delays. */
const NOTHING = 1e-7;

/** Marks the name of a requirement whose levels are relative to the loss at the center. */
export const RELATIVE = '*';

interface Kind {
  readonly name: string;
  readonly of: 'level' | 'delay';
  readonly bound: 'atLeast' | 'atMost';
  /** Decimals on a page; a terminal shows two of everything. */
  readonly decimals: number;
}

const KINDS: readonly (readonly [string, Kind])[] = [
  ['rejectionDb', { name: 'rejection', of: 'level', bound: 'atLeast', decimals: 1 }],
  ['returnLossDb', { name: 'return loss', of: 'level', bound: 'atLeast', decimals: 1 }],
  ['insertionLossDb', { name: 'insertion loss', of: 'level', bound: 'atMost', decimals: 2 }],
  ['insertionLossVariationDb', { name: 'loss variation', of: 'level', bound: 'atMost', decimals: 2 }],
  ['groupDelayVariationSeconds', { name: 'delay variation', of: 'delay', bound: 'atMost', decimals: 1 }],
];
const ANY_KIND: Kind = { name: 'requirement', of: 'level', bound: 'atLeast', decimals: 2 };

/** One line of a mask with its verdict, in the words and units of a report. */
export interface Requirement {
  readonly name: string;
  readonly unit: string;
  readonly span: string;
  /** At the worst point. */
  readonly limit: number;
  /** Limits at both ends where the limit slopes. */
  readonly slope: readonly [number, number] | undefined;
  readonly predicted: number;
  readonly margin: number;
  readonly isMet: boolean;
  /** Margin as a share of the limit: what makes decibels and nanoseconds comparable. */
  readonly share: number;
  readonly at: string;
  readonly bound: 'atLeast' | 'atMost';
  /** What a miss is: short of a least value, or over a greatest one. */
  readonly lack: 'short' | 'over';
  /** Whether the span has no end on one side, and so reaches where no lumped model describes hardware. */
  readonly isOpen: boolean;
  /** Decimals on a page: those of its kind, more where the clearance would round to zero. */
  readonly decimals: number;
}

/** A variation is a difference over its span: what its levels are relative to changes nothing. */
function kindOf(line: MaskLine): Kind {
  const found = KINDS.find(([key]) => key in line)?.[1] ?? ANY_KIND;
  const isVariation = 'insertionLossVariationDb' in line || 'groupDelayVariationSeconds' in line;
  return line.relativeTo === 'center' && !isVariation ? { ...found, name: `${found.name}${RELATIVE}` } : found;
}

function levelOf(line: MaskLine): Level | undefined {
  if ('rejectionDb' in line) return line.rejectionDb;
  if ('returnLossDb' in line) return line.returnLossDb;
  return 'insertionLossDb' in line ? line.insertionLossDb : undefined;
}

/** The limits at both ends of a line whose limit slopes; undefined for a level one. */
function slopeOf(line: MaskLine): readonly [number, number] | undefined {
  const level = levelOf(line);
  return level === undefined || typeof level === 'number' || level[0] === level[1] ? undefined : level;
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
  const { name, of, bound, decimals } = kindOf(line);
  const isDelay = of === 'delay';
  const inUnit = (value: number): number => (isDelay ? value / unit.delay.seconds : value);
  const size = Math.max(Math.abs(limit), isDelay ? Number.MIN_VALUE : 1e-3);
  return {
    name,
    unit: isDelay ? unit.delay.name : 'dB',
    span: spanText(line, unit),
    limit: inUnit(limit),
    slope: slopeOf(line),
    predicted: inUnit(predicted),
    margin: inUnit(margin),
    isMet: margin >= -ROUNDING * size,
    share: margin / size,
    at: worstHz === null ? 'far above' : fixed(worstHz / unit.hertz, unit.digits),
    bound,
    lack: bound === 'atLeast' ? 'short' : 'over',
    isOpen: line.fromHz === undefined || line.toHz === undefined,
    decimals: shownDecimals(inUnit(margin), decimals),
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

/** The limit as it was asked for: one value, or both ends of a slope. */
export function askedText({ limit, slope }: Requirement, decimals = 2): string {
  return slope === undefined ? limitText(limit, decimals) : slope.map((value) => trimmed(value, 6)).join(' → ');
}

/** Attenuations are stated to 400 dB only; beyond, the figure is a floor and not a prediction. */
export function predictedText(predicted: number, unit: string, decimals = 2): string {
  return unit === 'dB' && predicted >= 400 ? 'over 400' : fixed(predicted, decimals);
}
