import type { MaskRow } from '../../../forms/index.js';
import { LUMPED } from '../../words/conventions.js';
import type { FrequencyUnit } from '../../words/numbers.js';
import {
  askedText,
  clearanceText,
  predictedText,
  RELATIVE,
  type Requirement,
  requirementOf,
} from '../../words/requirement.js';
import { tightest, type Verdict, verdictOf } from '../../words/verdict.js';
import { numberColumn, type Row, type Table, type Tone, textColumn } from './content.js';

/** Requirements that fit the first printed page, and those that a screen lists. */
const ON_PAPER = 10;
const ON_SCREEN = 20;

/** Explains the mark after the name of a requirement. */
export const RELATIVE_NOTE: string = `${RELATIVE} relative to the loss at the center`;

/** A requirement with its number in the mask, from 1. */
export interface ListedRequirement {
  readonly requirement: Requirement;
  readonly number: number;
  /** Whether paper leaves it to the table of all requirements. */
  readonly isExtra: boolean;
}

/** A note under the requirements; some hold on a screen or on paper only. */
export interface Note {
  readonly text: string;
  readonly medium?: 'screen' | 'paper';
}

/** The requirements of the first page: those listed, the tightest of all, and what to say below. */
export interface Listed {
  readonly requirements: readonly ListedRequirement[];
  readonly worst: Requirement | undefined;
  readonly notes: readonly Note[];
}

/** Verdict in the decimals of a page. */
export function pageVerdict(rows: readonly MaskRow[], unit: FrequencyUnit): Verdict | undefined {
  return verdictOf(rows, unit, ({ decimals }) => decimals);
}

function moreText(hidden: readonly Requirement[]): string {
  const missed = hidden.filter(({ isMet }) => !isMet).length;
  const isOne = hidden.length === 1;
  const count = isOne ? '1 more requirement' : `${hidden.length} more requirements`;
  const where = 'all stand in Band in detail.';
  if (missed === 0) return `${count} ${isOne ? 'is' : 'are'} clear by a larger share of the limit; ${where}`;
  if (missed === hidden.length)
    return `${count} ${isOne ? 'misses its' : 'miss their'} limit by a smaller share; ${where}`;
  return `${count} are not listed here, ${missed} of them missed; ${where}`;
}

/** What a mark means, where a limit is the model's alone, and how many requirements a medium does not list. */
function notesOf(
  all: readonly Requirement[],
  onScreen: ReadonlySet<Requirement>,
  onPaper: ReadonlySet<Requirement>,
): readonly Note[] {
  const shown = all.filter((each) => onScreen.has(each));
  const more = (listed: ReadonlySet<Requirement>, medium?: Note['medium']): readonly Note[] => {
    const hidden = all.filter((each) => !listed.has(each));
    return hidden.length === 0 ? [] : [{ text: moreText(hidden), ...(medium === undefined ? {} : { medium }) }];
  };
  return [
    ...(shown.some(({ name }) => name.endsWith(RELATIVE)) ? [{ text: `${RELATIVE_NOTE}.` }] : []),
    ...(shown.some(({ isOpen }) => isOpen) ? [{ text: LUMPED }] : []),
    ...(onScreen.size === onPaper.size ? more(onPaper) : [...more(onScreen, 'screen'), ...more(onPaper, 'paper')]),
  ];
}

/** All requirements, or those with the least room, in the order of the mask. */
export function listedRequirements(rows: readonly MaskRow[], unit: FrequencyUnit): Listed {
  const all = rows.map((row) => requirementOf(row, unit));
  const worst = tightest(all);
  const byRoom = all
    .map((requirement, n) => ({ requirement, n }))
    .sort((a, b) => a.requirement.share - b.requirement.share || a.n - b.n)
    .map(({ requirement }) => requirement);
  // The tightest is the first of equals, which rounding may put behind many of them.
  const chosen = (count: number): ReadonlySet<Requirement> =>
    new Set([...byRoom.slice(0, count), ...(worst === undefined ? [] : [worst])]);
  const [onScreen, onPaper] = [chosen(ON_SCREEN), chosen(ON_PAPER)];
  const requirements = all
    .map((requirement, n) => ({ requirement, number: n + 1, isExtra: !onPaper.has(requirement) }))
    .filter(({ requirement }) => onScreen.has(requirement));
  return { requirements, worst, notes: notesOf(all, onScreen, onPaper) };
}

/** Name with a capital. */
export function requirementName({ name }: Requirement): string {
  return name.slice(0, 1).toUpperCase() + name.slice(1);
}

/** Number in the mask, name and unit, for the first cell of a row. */
export function numberedName(requirement: Requirement, number: number): string {
  return `${number} ${requirementName(requirement)}, ${requirement.unit}`;
}

/** The limit with the side on which it lies. */
export function boundText(requirement: Requirement): string {
  const side = requirement.bound === 'atLeast' ? '>=' : '<=';
  return `${side} ${askedText(requirement, requirement.decimals)}`;
}

/** The room left, or what is lacking with its word. */
export function roomText({ isMet, lack, margin, decimals }: Requirement): string {
  return `${isMet ? '' : `${lack} by `}${clearanceText(margin, decimals)}`;
}

function tonesOf(requirement: Requirement, worst: Requirement | undefined): readonly Tone[] {
  return [
    ...(requirement === worst ? (['tightest'] as const) : []),
    ...(requirement.isMet ? [] : (['short'] as const)),
  ];
}

/** The requirement table without its strips, as on a screen. */
export function requirementTable({ requirements, worst, notes }: Listed, unit: FrequencyUnit): Table {
  const rows = requirements.map(({ requirement, number }): Row => {
    const { span, predicted, unit: level, decimals } = requirement;
    const cells = [
      numberedName(requirement, number),
      span,
      boundText(requirement),
      predictedText(predicted, level, decimals),
      roomText(requirement),
    ];
    return { cells, tones: tonesOf(requirement, worst) };
  });
  const told = notes.filter(({ medium }) => medium !== 'paper').map(({ text }) => text);
  return {
    id: 'requirements',
    caption: 'Requirements, what is predicted, and the room left',
    columns: [
      textColumn('Requirement'),
      { head: 'Over', unit: unit.name, kind: 'span' },
      numberColumn('Limit'),
      numberColumn('Predicted'),
      numberColumn('Room'),
    ],
    rows,
    ...(told.length === 0 ? {} : { note: told.join(' ') }),
  };
}
