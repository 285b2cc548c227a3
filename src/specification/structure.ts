import type * as z from 'zod/mini';
import { echo } from './echo.js';
import type { Fault, Path } from './faults.js';
import { isUnder, kindFault } from './faults.js';
import { nearestKey } from './nearest-key.js';
import { specificationSchema } from './schema.js';
import type { SpecificationInput } from './specification.js';
import { KEYS, VOCABULARY } from './vocabulary.js';

type Issue = z.core.$ZodIssue;

/** Beyond this many structural faults the rest of the text is not looked at. */
const ISSUE_LIMIT = 200;

/** The parts of a specification that have the right structure, and the faults of those that have not. */
export interface Structured {
  readonly parts: Partial<SpecificationInput>;
  readonly faults: readonly Fault[];
  /** The same before repetitions were left out: whatever lies under one of these is not sound. */
  readonly unsound: readonly Fault[];
}

function stepsOf(path: readonly PropertyKey[]): Path {
  return path.map((step) => (typeof step === 'number' ? step : String(step)));
}

function valueAt(root: unknown, path: Path): unknown {
  return path.reduce<unknown>((value, step) => {
    return typeof value === 'object' && value !== null ? Reflect.get(value, step) : undefined;
  }, root);
}

function lastKey(path: Path): string {
  return path.findLast((step): step is string => typeof step === 'string') ?? '';
}

function allowedAt(path: Path): string {
  if (lastKey(path) === 'transmissionZeros' && typeof path.at(-1) === 'number')
    return 'a zero: number, text or {re, im}';
  if (lastKey(path) === 'mask' && typeof path.at(-1) === 'number') return 'an object with a span and one level';
  return VOCABULARY[lastKey(path)]?.allowed ?? 'an object with the keys of a specification';
}

function adviceAt(path: Path, value: unknown): string {
  if (path.length === 0) return 'give an object';
  if (value === undefined) return typeof path.at(-1) === 'number' ? 'fill the hole' : `add "${lastKey(path)}"`;
  return typeof value === 'number' ? 'write a finite number, or leave the key out' : 'write one of these';
}

/** Where a key that is unknown here is known. */
function homeOf(key: string): string | undefined {
  return Object.keys(KEYS).find((place) => KEYS[place]?.includes(key));
}

function unknownKeyFault(path: Path, key: string): Fault {
  const place = path.filter((step) => typeof step === 'string').join('.');
  const known = KEYS[place] ?? [];
  const nearest = nearestKey(key, known);
  const home = homeOf(key);
  const elsewhere = home === undefined ? 'remove it' : `move it into ${home === '' ? 'the outermost object' : home}`;
  const advice = nearest === undefined || home !== undefined ? elsewhere : `did you mean "${nearest}"?`;
  return {
    code: 'E_UNKNOWN_KEY',
    path: [...path, key],
    found: 'a key that is not known here',
    allowed: nearest === undefined ? known.join(', ') : `the keys of ${place === '' ? 'a specification' : place}`,
    advice,
    value: key,
    limit: nearest ?? known,
    onKey: true,
  };
}

function choiceFault(path: Path, value: unknown, choices: readonly unknown[]): Fault {
  if (typeof value !== 'string') return kindFault(path, value, allowedAt(path), adviceAt(path, value));
  const nearest = nearestKey(value, choices.map(String));
  const advice = nearest === undefined ? 'write one of these' : `did you mean "${nearest}"?`;
  return { code: 'E_CHOICE', path, found: echo(value), allowed: allowedAt(path), advice, value, limit: choices };
}

/** The branch of a union that was meant: the one whose outermost kind fits. */
function meantBranch(branches: readonly (readonly Issue[])[]): readonly Issue[] | undefined {
  return branches.find((issues) => issues.length > 0 && issues.every((issue) => issue.path.length > 0));
}

function faultsOf(issue: Issue, before: Path, root: unknown): readonly Fault[] {
  const path = [...before, ...stepsOf(issue.path)];
  const value = valueAt(root, path);
  if (issue.code === 'unrecognized_keys') return issue.keys.slice(0, 40).map((key) => unknownKeyFault(path, key));
  if (issue.code === 'invalid_value') return [choiceFault(path, value, issue.values)];
  const meant = issue.code === 'invalid_union' ? meantBranch(issue.errors) : undefined;
  if (meant !== undefined) return meant.flatMap((inner) => faultsOf(inner, path, root));
  return [kindFault(path, value, allowedAt(path), adviceAt(path, value))];
}

/** Leaves out a missing key where an unknown one beside it was meant as it. */
function withoutMisspelled(faults: readonly Fault[]): readonly Fault[] {
  const meant = faults.filter((fault) => fault.code === 'E_UNKNOWN_KEY' && typeof fault.limit === 'string');
  const names = meant.map((fault) => [...fault.path.slice(0, -1), String(fault.limit)]);
  return faults.filter((fault) => fault.code !== 'E_MISSING' || !names.some((name) => isUnder(name, fault.path)));
}

/** Puts a copied value through the schema; `known` faults keep what lies under them from being reported again. */
export function readStructure(value: unknown, known: readonly Fault[]): Structured {
  const result = specificationSchema.safeParse(value);
  if (result.success) {
    return { parts: known.length === 0 ? result.data : partsWithout(value, known), faults: known, unsound: known };
  }
  const { issues } = result.error;
  const found = issues.slice(0, ISSUE_LIMIT).flatMap((issue) => faultsOf(issue, [], value));
  const fresh = found.filter((fault) => !known.some((each) => isUnder(each.path, fault.path)));
  const unsound = [...known, ...found];
  const parts = issues.length > ISSUE_LIMIT ? {} : partsWithout(value, unsound);
  return { parts, faults: withoutMisspelled([...known, ...fresh]), unsound };
}

/** The outermost keys with no fault under them; a faulty list keeps its place for the rules on its sound elements. */
function partsWithout(value: unknown, faults: readonly Fault[]): Partial<SpecificationInput> {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return {};
  const parts: Record<string, unknown> = {};
  for (const key of KEYS[''] ?? []) {
    const under = faults.filter((fault) => fault.path[0] === key);
    const elementsOnly = under.every((fault) => typeof fault.path[1] === 'number');
    const isList = key === 'transmissionZeros' || key === 'mask';
    const part: unknown = Reflect.get(value, key);
    if (part !== undefined && (under.length === 0 || (isList && elementsOnly && Array.isArray(part))))
      parts[key] = part;
  }
  // Each part kept went through its own schema without a fault.
  return parts as Partial<SpecificationInput>;
}

/** Indices of the elements of a list that have faults. */
export function faultyElements(key: string, faults: readonly Fault[]): ReadonlySet<number> {
  const indices = faults.filter((fault) => fault.path[0] === key).map((fault) => fault.path[1]);
  return new Set(indices.filter((index) => typeof index === 'number'));
}
