import type { Band } from '../../forms/index.js';

/** Fixed decimals; what rounds to zero loses its minus. */
export function fixed(value: number, digits: number): string {
  const text = value.toFixed(digits);
  return Number(text) === 0 ? text.replace('-', '') : text;
}

/** Fixed decimals with the sign always shown. */
export function signed(value: number, digits: number): string {
  const text = fixed(value, digits);
  return text.startsWith('-') ? text : `+${text}`;
}

/** At most so many decimals, trailing zeros left out. */
export function trimmed(value: number, digits: number): string {
  return String(Number(fixed(value, digits)));
}

/** So many significant figures, no exponent for values from 1 on. */
export function figures(value: number, count: number): string {
  const whole = Math.floor(Math.log10(Math.abs(value))) + 1;
  return fixed(value, Math.min(Math.max(count - whole, 0), 12));
}

/** A size whose power of ten matters; whole numbers as they are. */
export function sizeText(value: number): string {
  if (Number.isInteger(value) && Math.abs(value) < 1e6) return String(value);
  return Math.abs(value) >= 0.01 && Math.abs(value) < 1000 ? value.toPrecision(2) : value.toExponential(1);
}

/** The unit in which all delays of one band are written, and the decimals that show them to a thousandth of it. */
export interface DelayUnit {
  readonly name: string;
  readonly seconds: number;
  readonly digits: number;
}

/**
 * Delays go with the reciprocal of the bandwidth, whatever the center: ns from 1 MHz of width up, µs from 1 kHz up, ms below.
 */
export function delayUnitOf({ bandwidthHz }: Band): DelayUnit {
  const [name, seconds] = bandwidthHz >= 1e6 ? ['ns', 1e-9] : bandwidthHz >= 1e3 ? ['µs', 1e-6] : ['ms', 1e-3];
  return { name, seconds, digits: 3 };
}

/** The unit in which the frequencies of one band are written, and the decimals that resolve a ten thousandth of its width. */
export interface FrequencyUnit {
  readonly name: string;
  readonly hertz: number;
  readonly digits: number;
  /** Delays of the same band: one unit for a whole document. */
  readonly delay: DelayUnit;
}

/** MHz, but kHz and Hz for bands far below 1 MHz. */
export function unitOf(band: Band): FrequencyUnit {
  const { centerHz, bandwidthHz } = band;
  const [name, hertz] = centerHz >= 1e6 ? ['MHz', 1e6] : centerHz >= 1e3 ? ['kHz', 1e3] : ['Hz', 1];
  const digits = Math.ceil(4 - Math.log10(bandwidthHz / hertz));
  return { name, hertz, digits: Math.min(Math.max(digits, 3), 9), delay: delayUnitOf(band) };
}

/** A frequency in the unit, trailing zeros left out. */
export function frequencyText(hertz: number, unit: FrequencyUnit): string {
  return trimmed(hertz / unit.hertz, unit.digits);
}
