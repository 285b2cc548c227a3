import type { Fault, Path } from './faults.js';
import { MAX_ORDER } from './order-and-level.js';

const DEPTH_LIMIT = 16;
const LIST_LIMIT = 10_000;
const NODE_LIMIT = 200_000;

/** Keys that could reach an object's prototype. */
export const FORBIDDEN_KEYS: readonly string[] = ['__proto__', 'constructor', 'prototype'];

interface Copying {
  readonly faults: Fault[];
  nodes: number;
  full: boolean;
}

function typeFault(path: Path, found: string, allowed: string, advice: string): Fault {
  return { code: 'E_TYPE', path, found, allowed, advice };
}

/** The fault of a key that could reach a prototype. */
export function forbiddenKeyFault(path: Path): Fault {
  const allowed = 'any key but __proto__, constructor and prototype';
  return { code: 'E_FORBIDDEN_KEY', path, found: 'this key', allowed, advice: 'remove it', onKey: true };
}

/** The fault of a list of zeros longer than any order could hold, found before anything is done with them. */
function tooManyZeros(path: Path, length: number): Fault {
  const allowed = `at most ${MAX_ORDER} zeros, and no more than the order`;
  const advice = 'leave zeros at infinity out and remove the others that are too many';
  return { code: 'E_ZERO_RANGE', path, found: `${length} zeros`, allowed, advice, value: length, limit: MAX_ORDER };
}

function copyList(list: readonly unknown[], path: Path, state: Copying): unknown {
  const length = list.length;
  if (path.length === 1 && path[0] === 'transmissionZeros' && length > MAX_ORDER) {
    state.faults.push(tooManyZeros(path, length));
    return undefined;
  }
  if (length > LIST_LIMIT) {
    state.faults.push(typeFault(path, `a list of ${length}`, `a list of at most ${LIST_LIMIT}`, 'shorten it'));
    return undefined;
  }
  const out: unknown[] = [];
  for (let index = 0; index < length; index += 1) {
    out.push(copyField(() => list[index], [...path, index], state));
  }
  return out;
}

/** A complex number of any class becomes a plain pair, own fields or inherited ones. */
function copyComplex(value: object): unknown {
  const prototype: unknown = Object.getPrototypeOf(value);
  if (prototype === Object.prototype || prototype === null) return undefined;
  if (!('re' in value && 'im' in value)) return undefined;
  return { re: value.re, im: value.im };
}

function copyObject(value: object, path: Path, state: Copying): unknown {
  if (Array.isArray(value)) return copyList(value, path, state);
  if (ArrayBuffer.isView(value)) {
    state.faults.push(typeFault(path, 'a typed array', 'plain lists and objects', 'copy it into a plain list'));
    return undefined;
  }
  const complex = copyComplex(value);
  if (complex !== undefined) return complex;
  const out: Record<string, unknown> = Object.create(null);
  for (const key of Object.keys(value)) {
    const inner = [...path, key];
    if (FORBIDDEN_KEYS.includes(key)) state.faults.push(forbiddenKeyFault(inner));
    else out[key] = copyField(() => Reflect.get(value, key), inner, state);
  }
  return out;
}

function copyNode(value: unknown, path: Path, state: Copying): unknown {
  if (typeof value !== 'object' || value === null) return value;
  state.nodes += 1;
  if (path.length > DEPTH_LIMIT || state.nodes > NODE_LIMIT) {
    const limit = `at most ${DEPTH_LIMIT} levels and ${NODE_LIMIT} objects`;
    const advice = 'look for an object inside itself';
    if (!state.full) state.faults.push(typeFault([], 'too many levels or objects', limit, advice));
    state.full = true;
    return undefined;
  }
  const isBoxed = value instanceof Number || value instanceof String || value instanceof Boolean;
  return isBoxed ? value : copyObject(value, path, state);
}

/** Whatever reading or inspecting a field throws becomes a fault at its place. */
function copyField(read: () => unknown, path: Path, state: Copying): unknown {
  try {
    return copyNode(read(), path, state);
  } catch {
    state.faults.push(typeFault(path, 'a value that cannot be read', 'plain data', 'pass plain data'));
    return undefined;
  }
}

/**
 * Copies anything a caller passed into plain lists and prototype-less objects, reading every field once:
 * getters that throw, revoked proxies, loops and oversized lists become faults, holes become `undefined`.
 */
export function plainCopy(value: unknown, path: Path): { readonly value: unknown; readonly faults: readonly Fault[] } {
  const state: Copying = { faults: [], nodes: 0, full: false };
  return { value: copyField(() => value, path, state), faults: state.faults };
}
