import { FilterFailure } from '../numerics/index.js';
import { echo, escapeText } from './echo.js';

/** Keys and indices from the root to a value. */
export type Path = readonly (string | number)[];

/** A place in a text, both counted from 1; a column is one UTF-16 code unit. */
export interface Position {
  readonly line: number;
  readonly column: number;
}

/** One thing wrong, before its place in the text is known. */
export interface Fault {
  readonly code: string;
  readonly path: Path;
  readonly found: string;
  readonly allowed: string;
  readonly advice: string;
  readonly value?: unknown;
  readonly limit?: unknown;
  /** The fault is in the key, not in the value behind it. */
  readonly onKey?: boolean;
}

/** Finds the place of a value, or of its key; undefined where there is no text. */
export type Locate = (path: Path, onKey: boolean) => Position | undefined;

/** Most faults that one refusal lists. */
export const FAULT_LIMIT = 20;

const NOWHERE: Locate = () => undefined;
const PLAIN_KEY = /^[A-Za-z_$][\w$]{0,39}$/;

/** `mask[0].fromHz`; odd keys are quoted, cut and escaped. */
export function pathText(path: Path): string {
  return path.reduce<string>((text, step) => {
    if (typeof step === 'number') return `${text}[${step}]`;
    if (!PLAIN_KEY.test(step)) return `${text}["${escapeText(step)}"]`;
    return text === '' ? step : `${text}.${step}`;
  }, '');
}

/** Whether `path` is `start` or lies under it. */
export function isUnder(start: Path, path: Path): boolean {
  return start.length <= path.length && start.every((step, index) => step === path[index]);
}

/** The failure that a fault becomes: `CODE path (line:col): found ...; allowed ...; advice`. */
export function failureOf(fault: Fault, locate: Locate = NOWHERE): FilterFailure {
  const path = pathText(fault.path);
  const place = locate(fault.path, fault.onKey === true);
  const where = [fault.code, path, place && `(${place.line}:${place.column})`].filter((part) => part).join(' ');
  const text = `${where}: found ${fault.found}; allowed ${fault.allowed}; ${fault.advice}`;
  return new FilterFailure(fault.code, text, {
    ...(path === '' ? {} : { argument: path }),
    value: fault.value,
    limit: fault.limit ?? fault.allowed,
    hint: fault.advice,
  });
}

/** Throws one failure for all faults, or returns when there are none. */
export function refuseAny(faults: readonly Fault[], locate: Locate = NOWHERE): void {
  const shown = faults.slice(0, FAULT_LIMIT).map((fault) => failureOf(fault, locate));
  const [first, second] = shown;
  if (first === undefined) return;
  if (second === undefined) throw first;
  const lines = shown.map((failure) => failure.message);
  if (faults.length > shown.length) lines.push(`(${faults.length - shown.length} more faults not listed)`);
  const { argument, value, limit, hint } = first;
  throw new FilterFailure(first.code, lines.join('\n'), {
    ...(argument === undefined ? {} : { argument }),
    ...(hint === undefined ? {} : { hint }),
    value,
    limit,
    faults: shown,
  });
}

const QUOTED_NUMBER = /^\s*[+-]?(\d{1,40}(\.\d{0,40})?|\.\d{1,40})([eE][+-]?\d{1,5})?\s*$/;

/** Whether a text is nothing but a number, so that its quotes are the mistake. */
export function isQuotedNumber(text: string): boolean {
  return QUOTED_NUMBER.test(text);
}

/** The fault of a value that is not of the kind allowed: missing, not finite, or of another type. */
export function kindFault(path: Path, value: unknown, allowed: string, advice: string): Fault {
  const base = { path, found: echo(value), allowed, advice, value };
  if (value === undefined && typeof path.at(-1) !== 'number') return { ...base, code: 'E_MISSING' };
  if (typeof value === 'number') return { ...base, code: Number.isFinite(value) ? 'E_TYPE' : 'E_NOT_FINITE' };
  const quoted = typeof value === 'string' && isQuotedNumber(value);
  return { ...base, code: 'E_TYPE', advice: quoted ? 'remove the quotes' : advice };
}
