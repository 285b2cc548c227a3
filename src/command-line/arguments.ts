import { parseArgs } from 'node:util';
import { FilterFailure } from '../numerics/index.js';
import { escapeText, nearestKey } from '../specification/index.js';

/** An option of a command: whether a value follows it. */
export interface OptionShape {
  readonly takesValue: boolean;
}

/** What a command accepts. */
export interface CommandShape {
  /** What the files it takes are called in messages; one each. */
  readonly operands: readonly string[];
  readonly options: Readonly<Record<string, OptionShape>>;
}

/** The words of a command line, checked. */
export interface CommandWords {
  readonly operands: readonly string[];
  readonly values: ReadonlyMap<string, string>;
  readonly flags: ReadonlySet<string>;
}

const EVERYWHERE: readonly string[] = ['help'];

/** A refusal of a command line. */
export function usageFailure(code: string, found: string, allowed: string, hint: string): FilterFailure {
  const text = `${code}: found ${found}; allowed ${allowed}; ${hint}`;
  return new FilterFailure(code, text, { value: found, limit: allowed, hint });
}

/** A word of the command line as it may be shown. */
export function shownWord(word: string): string {
  return `"${escapeText(word)}"`;
}

function unknownOption(rawName: string, known: readonly string[]): FilterFailure {
  const nearest = nearestKey(rawName.replace(/^-+/, ''), known);
  const hint = nearest === undefined ? 'see --help' : `did you mean --${nearest}?`;
  const allowed = known.map((name) => `--${name}`).join(', ');
  return usageFailure('E_OPTION', `the option ${shownWord(rawName)}`, allowed, hint);
}

interface Words {
  readonly operands: string[];
  readonly values: Map<string, string>;
  readonly flags: Set<string>;
}

interface OptionToken {
  readonly name: string;
  readonly rawName: string;
  readonly value?: string | undefined;
  readonly inlineValue?: boolean | undefined;
}

function takeOption(token: OptionToken, shape: CommandShape, words: Words): void {
  const known = [...Object.keys(shape.options), ...EVERYWHERE];
  const { name, rawName, value, inlineValue } = token;
  if (!known.includes(name)) throw unknownOption(rawName, known);
  if (words.values.has(name) || words.flags.has(name)) {
    throw usageFailure('E_OPTION', `--${name} twice`, 'each option once', 'remove one of the two');
  }
  if (shape.options[name]?.takesValue !== true) {
    if (value !== undefined) {
      throw usageFailure('E_OPTION', `a value after --${name}`, `--${name} alone`, 'remove the value');
    }
    words.flags.add(name);
    return;
  }
  const looksLikeOption = value?.startsWith('-') === true && inlineValue !== true;
  if (value === undefined || value === '' || looksLikeOption) {
    const found = value === undefined || value === '' ? 'nothing' : shownWord(value);
    throw usageFailure('E_OPTION', `${found} after --${name}`, 'a value', `write --${name}=VALUE`);
  }
  words.values.set(name, value);
}

/**
 * Checks the words after a command's name.
 *
 * @throws FilterFailure E_OPTION, E_OPERAND
 */
export function readWords(args: readonly string[], shape: CommandShape): CommandWords {
  const options = Object.entries({ ...shape.options, help: { takesValue: false } }).map(
    ([name, { takesValue }]) => [name, { type: takesValue ? ('string' as const) : ('boolean' as const) }] as const,
  );
  const withShort = { ...Object.fromEntries(options), help: { type: 'boolean' as const, short: 'h' } };
  const { tokens } = parseArgs({
    args: [...args],
    options: withShort,
    strict: false,
    allowPositionals: true,
    tokens: true,
  });
  const words: Words = { operands: [], values: new Map(), flags: new Set() };
  for (const token of tokens) {
    if (token.kind === 'option') takeOption(token, shape, words);
    if (token.kind === 'positional') words.operands.push(token.value);
  }
  if (words.flags.has('help')) return words;
  const wanted = shape.operands.length;
  if (words.operands.length === wanted) return words;
  const missing = shape.operands[words.operands.length];
  const extra = words.operands[wanted] ?? '';
  const found = missing === undefined ? `${shownWord(extra)} beside it` : `no ${missing}`;
  const allowed = wanted === 0 ? 'nothing after the command' : `one ${shape.operands.join(' and one ')}`;
  throw usageFailure('E_OPERAND', found, allowed, missing === undefined ? 'remove it' : 'give its path');
}
