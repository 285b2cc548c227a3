import type { FilterFailure } from '../numerics/index.js';
import {
  echo,
  type Fault,
  failureOf,
  type JsonText,
  type JsonValue,
  kindFault,
  nearestKey,
  type Path,
} from '../specification/index.js';

/** A JSON object being read, with the faults found so far. */
export interface Reading {
  readonly positionOf: JsonText['positionOf'];
  readonly faults: FilterFailure[];
}

/** Members of a JSON object. */
export type Members = Readonly<Record<string, JsonValue>>;

/** Adds a fault with its place. */
export function addFault({ faults, positionOf }: Reading, fault: Fault): void {
  faults.push(failureOf(fault, (path, onKey) => positionOf(path, onKey)));
}

/** Whether a JSON value is an object, not a list. */
export function isMembers(value: JsonValue | undefined): value is { readonly [key: string]: JsonValue } {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** A value that must be an object; anything else is a fault. */
export function membersAt(
  reading: Reading,
  value: JsonValue | undefined,
  path: Path,
  allowed: string,
): Members | undefined {
  if (isMembers(value)) return value;
  addFault(reading, kindFault(path, value, allowed, 'write an object'));
  return undefined;
}

/** Adds a fault for each key that is not known, naming the nearest that is. */
export function checkKeys(reading: Reading, members: Members, path: Path, known: readonly string[]): void {
  for (const key of Object.keys(members)) {
    if (known.includes(key)) continue;
    const nearest = nearestKey(key, known);
    const advice = nearest === undefined ? 'remove it' : `did you mean "${nearest}"?`;
    const found = 'a key that is not known here';
    const fault = { code: 'E_UNKNOWN_KEY', path: [...path, key], found, allowed: known.join(', '), advice };
    addFault(reading, { ...fault, value: key, limit: nearest ?? known, onKey: true });
  }
}

/** A pair of nodes within 0..last; anything else is a fault. */
export function pairAt(
  reading: Reading,
  value: JsonValue | undefined,
  path: Path,
  last: number,
): readonly [number, number] | undefined {
  const allowed = `a pair [i, j] of nodes 0 to ${last}`;
  if (!Array.isArray(value) || value.length !== 2) {
    addFault(reading, kindFault(path, value, allowed, 'write two node numbers in brackets'));
    return undefined;
  }
  const [i, j] = value;
  const isNode = (node: JsonValue | undefined): node is number =>
    typeof node === 'number' && Number.isInteger(node) && node >= 0 && node <= last;
  if (isNode(i) && isNode(j)) return [i, j];
  const wrong = isNode(i) ? 1 : 0;
  const advice = `write a whole number, 0 for the source, ${last} for the load`;
  const fault = { code: 'E_TYPE', path: [...path, wrong], found: echo(value[wrong]), allowed, advice };
  addFault(reading, { ...fault, value: value[wrong], limit: last });
  return undefined;
}
