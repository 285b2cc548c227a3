import { escapeText } from '../echo.js';
import type { Path } from '../faults.js';
import { jsonFailure, LENGTH_LIMIT, sizeFailure, syntaxFailure } from './faults.js';

/** Where reading stands. `path` is the way to the value being read. */
export interface Cursor {
  readonly text: string;
  readonly path: (string | number)[];
  at: number;
}

const DIGIT_LIMIT = 40;
const QUOTE = 34;
const BACKSLASH = 92;
const ESCAPES: ReadonlyMap<string, string> = new Map([
  ['"', '"'],
  ['\\', '\\'],
  ['/', '/'],
  ['b', '\b'],
  ['f', '\f'],
  ['n', '\n'],
  ['r', '\r'],
  ['t', '\t'],
]);

function isDigit(code: number): boolean {
  return code >= 48 && code <= 57;
}

/** Moves past JSON white space, but not on and on. */
export function skipSpace(cursor: Cursor): void {
  while (cursor.at <= LENGTH_LIMIT) {
    const code = cursor.text.charCodeAt(cursor.at);
    if (code !== 32 && code !== 9 && code !== 10 && code !== 13) return;
    cursor.at += 1;
  }
}

/** Moves past digits; gives how many, and stops one past the limit. */
function skipDigits(cursor: Cursor, allowance: number): number {
  const start = cursor.at;
  while (isDigit(cursor.text.charCodeAt(cursor.at)) && cursor.at - start <= allowance) cursor.at += 1;
  return cursor.at - start;
}

function skipOne(cursor: Cursor, characters: string): boolean {
  const character = cursor.text.charAt(cursor.at);
  if (character === '' || !characters.includes(character)) return false;
  cursor.at += 1;
  return true;
}

function overflow(cursor: Cursor, start: number): Error {
  const token = escapeText(cursor.text.slice(start, cursor.at));
  const allowed = `a finite number of at most ${DIGIT_LIMIT} digits`;
  const fault = {
    code: 'E_NUMBER_OVERFLOW',
    path: cursor.path,
    found: token,
    allowed,
    advice: 'write a shorter number',
  };
  return jsonFailure(cursor.text, start, fault);
}

/** Reads a number: sign, digits, fraction, exponent as RFC 8259 has them, then finite. */
export function readNumber(cursor: Cursor): number {
  const start = cursor.at;
  const bad = (): Error => syntaxFailure(cursor.text, start, cursor.path, 'a JSON number');
  skipOne(cursor, '-');
  const zero = cursor.text.charAt(cursor.at) === '0';
  const whole = skipDigits(cursor, DIGIT_LIMIT);
  let digits = whole;
  if (whole === 0 || (zero && whole > 1)) throw bad();
  for (const [mark, signs] of [
    ['.', ''],
    ['eE', '+-'],
  ] as const) {
    if (digits > DIGIT_LIMIT) throw overflow(cursor, start);
    if (!skipOne(cursor, mark)) continue;
    skipOne(cursor, signs);
    const more = skipDigits(cursor, DIGIT_LIMIT - digits);
    if (more === 0) throw bad();
    digits += more;
  }
  if (digits > DIGIT_LIMIT) throw overflow(cursor, start);
  const next = cursor.text.charAt(cursor.at);
  if (next !== '' && !' \t\r\n,]}:'.includes(next)) throw bad();
  const value = Number(cursor.text.slice(start, cursor.at));
  if (!Number.isFinite(value)) throw overflow(cursor, start);
  return value;
}

function readEscape(cursor: Cursor): string {
  const start = cursor.at;
  const letter = cursor.text.charAt(start + 1);
  const plain = ESCAPES.get(letter);
  cursor.at += 2;
  if (plain !== undefined) return plain;
  const hex = cursor.text.slice(start + 2, start + 6);
  if (letter !== 'u' || !/^[0-9a-fA-F]{4}$/.test(hex)) {
    const found = `"${escapeText(cursor.text.slice(start, start + 6))}"`;
    const allowed = 'the escapes of JSON: \\" \\\\ \\/ \\b \\f \\n \\r \\t and \\u with four hex digits';
    const fault = { code: 'E_JSON_SYNTAX', path: cursor.path, found, allowed, advice: 'write the backslash twice' };
    throw jsonFailure(cursor.text, start, fault);
  }
  cursor.at += 4;
  return String.fromCharCode(Number.parseInt(hex, 16));
}

function refuseStray(cursor: Cursor, start: number, code: number): never {
  if (cursor.at > LENGTH_LIMIT) throw sizeFailure(cursor.text, cursor.at);
  if (Number.isNaN(code)) {
    const found = 'a text without its closing quote';
    const allowed = 'texts in double quotes';
    const fault = { code: 'E_JSON_SYNTAX', path: cursor.path, found, allowed, advice: 'close the quote' };
    throw jsonFailure(cursor.text, start, fault);
  }
  const found = `the control character "${escapeText(String.fromCharCode(code))}" in a text`;
  const advice = 'close the quote before the line ends, or write an escape such as \\n';
  const fault = { code: 'E_JSON_SYNTAX', path: cursor.path, found, allowed: 'texts on one line', advice };
  throw jsonFailure(cursor.text, cursor.at, fault);
}

const LONE_SURROGATE = /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/;

function refuseLoneSurrogate(cursor: Cursor, start: number, path: Path, value: string): void {
  if (!LONE_SURROGATE.test(value)) return;
  const allowed = 'whole Unicode characters';
  const fault = { code: 'E_ENCODING', path, found: `half a character in "${escapeText(value, 30)}"`, allowed };
  throw jsonFailure(cursor.text, start, { ...fault, advice: 'write both halves or neither' });
}

/** Reads a text in double quotes; escapes are resolved, half characters refused. */
export function readString(cursor: Cursor): string {
  const { text } = cursor;
  const start = cursor.at;
  let value = '';
  cursor.at += 1;
  let from = cursor.at;
  for (;;) {
    const code = text.charCodeAt(cursor.at);
    if (code === QUOTE) break;
    if (!(code >= 32) || cursor.at > LENGTH_LIMIT) refuseStray(cursor, start, code);
    if (code === BACKSLASH) {
      if (cursor.at > from) value += text.slice(from, cursor.at);
      value += readEscape(cursor);
      from = cursor.at;
    } else cursor.at += 1;
  }
  value += text.slice(from, cursor.at);
  cursor.at += 1;
  refuseLoneSurrogate(cursor, start, cursor.path, value);
  return value;
}
