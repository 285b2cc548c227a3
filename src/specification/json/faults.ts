import type { FilterFailure } from '../../numerics/index.js';
import { escapeText } from '../echo.js';
import type { Path, Position } from '../faults.js';
import { failureOf } from '../faults.js';

const TOKEN_LIMIT = 40;

/** Longest text read, in UTF-16 code units. */
export const LENGTH_LIMIT = 1_048_576;
/** Most values read from one text. */
export const VALUE_LIMIT = 200_000;

const DELIMITERS = ' \t\r\n,:{}[]"';

/** Offsets at which lines start; LF, CR LF and CR each end a line. */
export function lineStarts(text: string): readonly number[] {
  const starts = [0];
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    if (code === 10 || (code === 13 && text.charCodeAt(index + 1) !== 10)) starts.push(index + 1);
  }
  return starts;
}

/** Line and column of an offset, counted from 1. */
export function positionIn(starts: readonly number[], offset: number): Position {
  let low = 0;
  let high = starts.length;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if ((starts[middle] ?? 0) <= offset) low = middle;
    else high = middle;
  }
  return { line: low + 1, column: offset - (starts[low] ?? 0) + 1 };
}

/** The same for a single offset of a text. */
export function positionAt(text: string, offset: number): Position {
  return positionIn(lineStarts(text.slice(0, offset)), offset);
}

/** The token at an offset, cut, as it goes into a message. */
function tokenAt(text: string, offset: number): string {
  let end = offset;
  while (end < text.length && end - offset <= TOKEN_LIMIT && !DELIMITERS.includes(text.charAt(end))) end += 1;
  return text.slice(offset, Math.max(end, Math.min(offset + 1, text.length)));
}

/** Slips by how the token starts; the first match gives the advice. */
const SLIPS: readonly (readonly [RegExp, string])[] = [
  [/^$/, 'check that every bracket is closed'],
  [/^-?(NaN|Inf)/i, 'write a finite number, or leave the key out'],
  [/^\+/, 'remove the plus sign'],
  [/^-?\.\d/, 'write a digit before the point'],
  [/^-?0[xXbBoO]/, 'write the number in decimal digits'],
  [/^-?0\d/, 'remove the leading zeros'],
  [/^-?\d+_/, 'remove the underscores'],
  [/^-?\d+\.(?!\d)/, 'write a digit after the point'],
  [/^-?\d/, 'check the number and what stands before it (a decimal comma?)'],
  [/^[\u2212\u2013\u2014]/, 'write the minus as the plain hyphen on the keyboard'],
  [/^(\/\/|\/\*|#)/, 'remove the comment; the key "notes" holds remarks'],
  [/^['\u2018\u2019\u201c\u201d]/, 'write texts and keys in plain double quotes'],
  [/^[}\]]/, 'remove the trailing comma, or close what is open'],
  [/^,/, 'remove the comma that is too many'],
  [/^(true|false|null|none|undefined)/i, 'write true, false or null in lower case, or leave the key out'],
  [/^[A-Za-z_$]/, 'put texts and keys in double quotes'],
];

/** The failure for a token that may not stand where it does. */
export function syntaxFailure(text: string, offset: number, path: Path, allowed: string): FilterFailure {
  const token = tokenAt(text, offset);
  const surrogate = /^[\ud800-\udfff]/.test(token) && token.codePointAt(0) === token.charCodeAt(0);
  const code = surrogate || token.startsWith('\ufeff') ? 'E_ENCODING' : 'E_JSON_SYNTAX';
  const advice = SLIPS.find(([pattern]) => pattern.test(token))?.[1] ?? 'remove it';
  const found = token === '' ? 'the end of the text' : `"${escapeText(token, TOKEN_LIMIT)}"`;
  return jsonFailure(text, offset, { code, path, found, allowed, advice });
}

/** What a reading failure says, at an offset of the text. */
export interface JsonFault {
  readonly code: string;
  readonly path: Path;
  readonly found: string;
  readonly allowed: string;
  readonly advice: string;
}

/** The failure for a fault found while reading. */
export function jsonFailure(text: string, offset: number, fault: JsonFault): FilterFailure {
  return failureOf({ ...fault, value: undefined }, () => positionAt(text, offset));
}

/** The failure for a text that is too long or holds too many values. */
export function sizeFailure(text: string, offset: number): FilterFailure {
  const found = offset > LENGTH_LIMIT ? `more than ${LENGTH_LIMIT} characters` : `more than ${VALUE_LIMIT} values`;
  const allowed = `at most ${LENGTH_LIMIT} characters and ${VALUE_LIMIT} values`;
  const fault = { code: 'E_FILE_SIZE', path: [], found, allowed, advice: 'check that this is the file you meant' };
  return jsonFailure(text, Math.min(offset, LENGTH_LIMIT), fault);
}
