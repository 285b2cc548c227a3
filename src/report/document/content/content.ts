/** Text of the user, which every form of the document keeps apart from its own. */
export interface UserText {
  readonly user: string;
}

/** Text as it stands in a cell or a sentence: plain, with ASCII signs, or the user's. */
export type Cell = string | UserText;

/** How a column reads: words, numbers whose points align, spans of frequency, or coefficients in a fixed pitch. */
export type ColumnKind = 'text' | 'number' | 'span' | 'figures';

/** One column; the unit stands in the head and nowhere else. */
export interface Column {
  readonly head: string;
  readonly unit?: string;
  readonly kind: ColumnKind;
}

/** What a row says beside its numbers: least room of all, short of its limit, or a coupling of negative sign. */
export type Tone = 'tightest' | 'short' | 'negative';

/** One row; its first cell names it. */
export interface Row {
  readonly cells: readonly Cell[];
  readonly tones?: readonly Tone[];
}

/** A table of the document: the same in every form that it is written in. */
export interface Table {
  readonly id: string;
  readonly caption: string;
  readonly columns: readonly Column[];
  readonly rows: readonly Row[];
  readonly note?: string;
}

/** A piece of a sheet. */
export type Block =
  | { readonly kind: 'picture'; readonly name: string }
  | { readonly kind: 'table'; readonly table: Table }
  /** A table that is closed until it is asked for. */
  | { readonly kind: 'fold'; readonly table: Table }
  | { readonly kind: 'text'; readonly head?: string; readonly sentences: readonly Cell[] }
  | { readonly kind: 'list'; readonly head: string; readonly items: readonly Cell[]; readonly isFormula?: boolean };

/** Blocks that stand under each other; `shape` says what room they take beside others. */
export interface Stack {
  readonly shape: 'half' | 'tall' | 'wide';
  readonly blocks: readonly Block[];
}

/** One sheet after the first. */
export interface Sheet {
  readonly id: string;
  readonly head: string;
  readonly stacks: readonly Stack[];
}

/** A table as a block. */
export function tableBlock(table: Table): Block {
  return { kind: 'table', table };
}

/** A column of numbers. */
export function numberColumn(head: string, unit?: string): Column {
  return unit === undefined ? { head, kind: 'number' } : { head, unit, kind: 'number' };
}

/** A column of words. */
export function textColumn(head: string): Column {
  return { head, kind: 'text' };
}
