import type { Path, Position } from '../faults.js';
import { failureOf, kindFault } from '../faults.js';
import { FORBIDDEN_KEYS, forbiddenKeyFault } from '../plain-copy.js';
import {
  jsonFailure,
  LENGTH_LIMIT,
  lineStarts,
  positionAt,
  positionIn,
  sizeFailure,
  syntaxFailure,
  VALUE_LIMIT,
} from './faults.js';
import type { JsonValue, Places } from './places.js';
import { offsetOf } from './places.js';
import type { Cursor } from './tokens.js';
import { readNumber, readString, skipSpace } from './tokens.js';

/** A JSON text as read. */
export interface JsonText {
  readonly value: JsonValue;
  /** Place of the value at a path, or with `onKey` of its key; where there is none, of what encloses it. */
  readonly positionOf: (path: Path, onKey?: boolean) => Position;
}

const DEPTH_LIMIT = 16;
const WORDS: readonly (readonly [string, boolean | null])[] = [
  ['true', true],
  ['false', false],
  ['null', null],
];

interface Reading extends Cursor {
  values: number;
  readonly places: Map<object, Places>;
}

function refuseDepth(reading: Reading): never {
  const found = `brackets ${DEPTH_LIMIT + 1} deep`;
  const allowed = `at most ${DEPTH_LIMIT} levels`;
  const fault = { code: 'E_JSON_DEPTH', path: [], found, allowed, advice: 'flatten it' };
  throw jsonFailure(reading.text, reading.at, fault);
}

function checkKey(reading: Reading, key: string, at: number, places: Map<string, number>): void {
  const path = [...reading.path, key];
  if (FORBIDDEN_KEYS.includes(key)) {
    throw failureOf(forbiddenKeyFault(path), () => positionAt(reading.text, at));
  }
  const earlier = places.get(key);
  if (earlier === undefined) return;
  const first = positionAt(reading.text, earlier);
  const found = `this key again, after (${first.line}:${first.column})`;
  const fault = { code: 'E_JSON_DUPLICATE', path, found, allowed: 'each key once', advice: 'remove one of the two' };
  throw jsonFailure(reading.text, at, fault);
}

/** After a member: true at a comma, false at the closing bracket, which is passed. */
function hasMore(reading: Reading, close: string): boolean {
  skipSpace(reading);
  const mark = reading.text.charAt(reading.at);
  if (mark !== ',' && mark !== close) throw syntaxFailure(reading.text, reading.at, reading.path, `"," or "${close}"`);
  reading.at += 1;
  return mark === ',';
}

/** Whether the bracket just opened closes at once; if so it is passed. */
function isEmpty(reading: Reading, close: string): boolean {
  reading.at += 1;
  skipSpace(reading);
  if (reading.text.charAt(reading.at) !== close) return false;
  reading.at += 1;
  return true;
}

function readMember(
  reading: Reading,
  depth: number,
  into: Record<string, JsonValue>,
  places: Map<string, number>,
): void {
  skipSpace(reading);
  const keyAt = reading.at;
  if (reading.text.charAt(keyAt) !== '"')
    throw syntaxFailure(reading.text, keyAt, reading.path, 'a key in double quotes');
  const key = readString(reading);
  checkKey(reading, key, keyAt, places);
  places.set(key, keyAt);
  reading.path.push(key);
  skipSpace(reading);
  if (reading.text.charAt(reading.at) !== ':') throw syntaxFailure(reading.text, reading.at, reading.path, '":"');
  reading.at += 1;
  skipSpace(reading);
  into[key] = readValue(reading, depth);
  reading.path.pop();
}

function readObject(reading: Reading, depth: number): JsonValue {
  const value: Record<string, JsonValue> = Object.create(null);
  const places = new Map<string, number>();
  reading.places.set(value, places);
  if (isEmpty(reading, '}')) return value;
  do readMember(reading, depth, value, places);
  while (hasMore(reading, '}'));
  return value;
}

function readList(reading: Reading, depth: number): JsonValue {
  const value: JsonValue[] = [];
  const places: number[] = [];
  reading.places.set(value, places);
  if (isEmpty(reading, ']')) return value;
  do {
    skipSpace(reading);
    places.push(reading.at);
    reading.path.push(value.length);
    value.push(readValue(reading, depth));
    reading.path.pop();
  } while (hasMore(reading, ']'));
  return value;
}

function readWord(reading: Reading): JsonValue {
  for (const [word, value] of WORDS) {
    if (!reading.text.startsWith(word, reading.at)) continue;
    if (/[\w$]/.test(reading.text.charAt(reading.at + word.length))) break;
    reading.at += word.length;
    return value;
  }
  throw syntaxFailure(reading.text, reading.at, reading.path, 'a JSON value');
}

function readValue(reading: Reading, depth: number): JsonValue {
  reading.values += 1;
  if (reading.at > LENGTH_LIMIT || reading.values > VALUE_LIMIT) throw sizeFailure(reading.text, reading.at);
  const mark = reading.text.charAt(reading.at);
  if (mark === '{' || mark === '[') {
    if (depth >= DEPTH_LIMIT) refuseDepth(reading);
    return mark === '{' ? readObject(reading, depth + 1) : readList(reading, depth + 1);
  }
  if (mark === '"') return readString(reading);
  return mark === '-' || (mark >= '0' && mark <= '9') ? readNumber(reading) : readWord(reading);
}

/**
 * Reads a JSON text strictly: RFC 8259 and nothing beside it, one pass, nothing guessed.
 *
 * Refused besides syntax: a key twice, `__proto__`, `constructor` and `prototype` as keys, more than 16 levels, numbers
 * that overflow or have more than 40 digits, half characters, a byte-order mark, more than 1048576 characters.
 *
 * @param text the whole text
 * @returns the value, with prototype-less objects, and the place (line and column from 1) of everything in it
 * @throws FilterFailure E_JSON_SYNTAX, E_JSON_DUPLICATE, E_JSON_DEPTH, E_FORBIDDEN_KEY, E_NUMBER_OVERFLOW, E_ENCODING,
 *   E_FILE_SIZE, E_TYPE
 * @example
 * const { value, positionOf } = readJson('{"a": [1, 2]}');
 * positionOf(['a', 1]); // { line: 1, column: 11 }
 */
export function readJson(text: string): JsonText {
  if (typeof text !== 'string') throw failureOf(kindFault(['text'], text, 'a string', 'pass the text of the file'));
  const reading: Reading = { text, path: [], at: 0, values: 0, places: new Map() };
  if (text.startsWith('\ufeff')) {
    const allowed = 'UTF-8 without a byte-order mark';
    const fault = {
      code: 'E_ENCODING',
      path: [],
      found: 'a byte-order mark',
      allowed,
      advice: 'save it without the mark',
    };
    throw jsonFailure(text, 0, fault);
  }
  skipSpace(reading);
  const start = reading.at;
  const value = readValue(reading, 0);
  skipSpace(reading);
  if (reading.at > LENGTH_LIMIT) throw sizeFailure(text, reading.at);
  if (reading.at < text.length) throw syntaxFailure(text, reading.at, [], 'nothing after the end of the value');
  let lines: readonly number[] | undefined;
  return {
    value,
    positionOf: (path, onKey = false) => {
      lines ??= lineStarts(text);
      return positionIn(lines, offsetOf(reading, { value, at: start }, path, onKey));
    },
  };
}
