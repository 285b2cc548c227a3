import { echo } from './echo.js';
import type { Fault, Path } from './faults.js';
import { isQuotedNumber } from './faults.js';

/** Decimal exponents of the units that a frequency text may end with. */
const UNITS: ReadonlyMap<string, number> = new Map([
  ['Hz', 0],
  ['kHz', 3],
  ['MHz', 6],
  ['GHz', 9],
  ['THz', 12],
]);

const DIGIT_LIMIT = 40;
export const FREQUENCY_ALLOWED = 'a frequency: a number of hertz, or text with a unit such as "3822 MHz" or "2.45GHz"';
/** Number, blanks, unit: each part once, so that matching takes one pass. */
const QUANTITY = /^ *([+-]?)(\d+)(?:\.(\d+))?(?:[eE]([+-]?\d+))? *([A-Za-z]+) *$/;

function quantityFault(path: Path, text: string, advice: string, code = 'E_QUANTITY'): Fault {
  return { code, path, found: echo(text), allowed: FREQUENCY_ALLOWED, advice, value: text };
}

function unitAdvice(unit: string): string {
  const known = [...UNITS.keys()].find((name) => name.toLowerCase() === unit.toLowerCase());
  if (known !== undefined) return `write the unit as ${known}: its case matters`;
  return `write one of the units ${[...UNITS.keys()].join(', ')}`;
}

/** What to do about a text that is no quantity: the slips seen most are named. */
function shapeAdvice(text: string): string {
  const comma = /^([\s+-]*\d+),(\d+)(.*)$/.exec(text);
  if (comma !== null) return `write a decimal point: "${comma[1]}.${comma[2]}${comma[3]}"`;
  if (/[\u2212\u2013\u2014]/.test(text)) return 'write the minus as the plain hyphen on the keyboard';
  if (isQuotedNumber(text)) return 'add the unit, as in "3822 MHz", or remove the quotes for a number of hertz';
  if (/[\u00a0\u2000-\u200a\u202f]/.test(text)) return 'write an ordinary space before the unit';
  return 'write digits, a decimal point and a unit';
}

/**
 * Reads a frequency text. The unit moves the decimal exponent within the text, before the one conversion to a number,
 * so "8.2 GHz" is exactly 8200000000.
 */
export function frequencyFromText(text: string, path: Path): number | Fault {
  const parts = text.length > 4 * DIGIT_LIMIT ? null : QUANTITY.exec(text);
  if (parts === null) return quantityFault(path, text, shapeAdvice(text.slice(0, DIGIT_LIMIT)));
  const [, sign = '', whole = '', fraction = '', exponent = '', unit = ''] = parts;
  if (whole.length + fraction.length + exponent.length > DIGIT_LIMIT) {
    return quantityFault(path, text, `write at most ${DIGIT_LIMIT} digits`, 'E_NUMBER_OVERFLOW');
  }
  const shift = UNITS.get(unit);
  if (shift === undefined) return quantityFault(path, text, unitAdvice(unit));
  const hertz = Number(`${sign}${whole}.${fraction}e${Number(exponent) + shift}`);
  if (Number.isFinite(hertz)) return hertz;
  return quantityFault(path, text, 'write a smaller number', 'E_NUMBER_OVERFLOW');
}
