import type { Path } from '../faults.js';
import type { Cursor } from './tokens.js';
import { readString, skipSpace } from './tokens.js';

/** What a JSON text holds; objects have no prototype. */
export type JsonValue = null | boolean | number | string | readonly JsonValue[] | { readonly [key: string]: JsonValue };

/** Offsets of an object's keys, or of a list's elements. */
export type Places = Map<string, number> | number[];

/** Offset of the value behind the key at `keyAt`, found by reading the key again. */
function behindKey(text: string, keyAt: number): number {
  const cursor: Cursor = { text, path: [], at: keyAt };
  readString(cursor);
  skipSpace(cursor);
  cursor.at += 1;
  skipSpace(cursor);
  return cursor.at;
}

/** A text with the offsets of what is in it. */
interface Mapped {
  readonly text: string;
  readonly places: ReadonlyMap<object, Places>;
}

/** Offset of the value at a path, or of its key; where there is none, of what encloses it. */
export function offsetOf(
  { text, places: all }: Mapped,
  root: { readonly value: JsonValue; readonly at: number },
  path: Path,
  onKey: boolean,
): number {
  let value: JsonValue = root.value;
  let offset = root.at;
  for (const [index, step] of path.entries()) {
    const places = typeof value === 'object' && value !== null ? all.get(value) : undefined;
    const place = Array.isArray(places) ? places[Number(step)] : places?.get(String(step));
    if (place === undefined) return offset;
    const asKey = onKey && index === path.length - 1;
    offset = asKey || Array.isArray(places) ? place : behindKey(text, place);
    value = Reflect.get(Object(value), step) as JsonValue;
  }
  return offset;
}
