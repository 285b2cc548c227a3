import type { MaskRow } from '../../../forms/index.js';
import type { FrequencyUnit } from '../../words/numbers.js';
import {
  clearanceText,
  limitText,
  predictedText,
  RELATIVE,
  type Requirement,
  requirementOf,
} from '../../words/requirement.js';
import { counted, tightest, type Verdict, verdictOf } from '../../words/verdict.js';
import { numberColumn, type Row, type Table, type Tone, textColumn } from './content.js';

/** Requirements that fit the first page. */
const LISTED = 10;

/** Explains the mark after the name of a requirement. */
export const RELATIVE_NOTE: string = `${RELATIVE} relative to the loss at the center`;

/** The requirements of the first page: those listed, the tightest of all, and what to say of the others. */
export interface Listed {
  readonly requirements: readonly Requirement[];
  readonly worst: Requirement | undefined;
  readonly more: string | undefined;
}

/** Verdict in the decimals of a page. */
export function pageVerdict(rows: readonly MaskRow[], unit: FrequencyUnit): Verdict | undefined {
  return verdictOf(rows, unit, ({ decimals }) => decimals);
}

function moreText(hidden: readonly Requirement[]): string {
  const short = hidden.filter(({ isMet }) => !isMet).length;
  const count = hidden.length === 1 ? '1 more requirement is' : `${hidden.length} more requirements are`;
  const where = 'all stand in Band in detail.';
  if (short === 0) return `${count} clear by a larger share of the limit; ${where}`;
  if (short === hidden.length) return `${count} short of the limit by a smaller share; ${where}`;
  return `${counted(hidden.length)} more are not listed here, ${short} of them short of the limit; ${where}`;
}

/** All requirements, or the ten with the least room, in the order of the mask. */
export function listedRequirements(rows: readonly MaskRow[], unit: FrequencyUnit): Listed {
  const all = rows.map((row) => requirementOf(row, unit));
  const worst = tightest(all);
  const byRoom = all
    .map((requirement, n) => ({ requirement, n }))
    .sort((a, b) => a.requirement.share - b.requirement.share || a.n - b.n);
  const chosen = new Set(byRoom.slice(0, LISTED).map(({ requirement }) => requirement));
  if (worst !== undefined && !chosen.has(worst)) chosen.add(worst);
  const requirements = all.filter((requirement) => chosen.has(requirement));
  const hidden = all.filter((requirement) => !chosen.has(requirement));
  return { requirements, worst, more: hidden.length === 0 ? undefined : moreText(hidden) };
}

/** Name with a capital. */
export function requirementName({ name }: Requirement): string {
  return name.slice(0, 1).toUpperCase() + name.slice(1);
}

/** The limit with the side on which it lies. */
export function boundText({ bound, limit, decimals }: Requirement): string {
  return `${bound === 'atLeast' ? '>=' : '<='} ${limitText(limit, decimals)}`;
}

/** The room left, or lacking with the word. */
export function roomText({ isMet, margin, decimals }: Requirement): string {
  return `${isMet ? '' : 'short '}${clearanceText(margin, decimals)}`;
}

function tonesOf(requirement: Requirement, worst: Requirement | undefined): readonly Tone[] {
  return [
    ...(requirement === worst ? (['tightest'] as const) : []),
    ...(requirement.isMet ? [] : (['short'] as const)),
  ];
}

/** The requirement table without its strips. */
export function requirementTable({ requirements, worst, more }: Listed, unit: FrequencyUnit): Table {
  const rows = requirements.map((requirement): Row => {
    const { span, predicted, unit: level, decimals } = requirement;
    const cells = [
      `${requirementName(requirement)}, ${level}`,
      span,
      boundText(requirement),
      predictedText(predicted, level, decimals),
      roomText(requirement),
    ];
    return { cells, tones: tonesOf(requirement, worst) };
  });
  const isRelative = requirements.some(({ name }) => name.endsWith(RELATIVE));
  const notes = [...(isRelative ? [`${RELATIVE_NOTE}.`] : []), ...(more === undefined ? [] : [more])];
  return {
    id: 'requirements',
    caption: 'Requirements, what is predicted, and the room left',
    columns: [
      textColumn('Requirement'),
      { head: 'Over', unit: unit.name, kind: 'span' },
      numberColumn('Limit'),
      numberColumn('Predicted'),
      numberColumn('Clear by'),
    ],
    rows,
    ...(notes.length === 0 ? {} : { note: notes.join(' ') }),
  };
}
