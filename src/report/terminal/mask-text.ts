import type { MaskRow } from '../../forms/index.js';
import { LUMPED } from '../words/conventions.js';
import type { FrequencyUnit } from '../words/numbers.js';
import {
  askedText,
  clearanceText,
  predictedText,
  RELATIVE,
  type Requirement,
  requirementOf,
} from '../words/requirement.js';
import { counted, NO_MASK, tightest, verdictOf } from '../words/verdict.js';
import { table, wrapped } from './layout.js';
import type { Paint } from './paint.js';

/** Rows shown at most; with more, the tightest are. */
const ROWS = 20;

/** The answer first: how many requirements are met, and which has the least room. */
export function verdictLines(rows: readonly MaskRow[], unit: FrequencyUnit, paint: Paint): readonly string[] {
  const verdict = verdictOf(rows, unit);
  if (verdict === undefined) return [paint.strong(NO_MASK)];
  const mark = verdict.isMet ? paint.strong : paint.alarm;
  return wrapped(`${verdict.answer} ${verdict.nearest}`).map(mark);
}

function rowCells(requirement: Requirement): readonly string[] {
  const { name, unit, span, predicted, margin, isMet, lack, at } = requirement;
  const room = `${isMet ? 'clear' : lack} by`;
  const [limit, found] = [askedText(requirement), predictedText(predicted, unit)];
  return [`${name}, ${unit}`, span, limit, found, room, clearanceText(margin), at];
}

/** Each requirement with its limit, what is predicted, the room left or lacking, and the worst point. */
export function maskTable(rows: readonly MaskRow[], unit: FrequencyUnit, paint: Paint): readonly string[] {
  if (rows.length === 0) return [];
  const requirements = rows.map((row) => requirementOf(row, unit));
  const worst = tightest(requirements);
  const bar = [...requirements].sort((a, b) => a.share - b.share)[ROWS - 1]?.share ?? Number.POSITIVE_INFINITY;
  const shown = requirements.filter(({ share }) => share <= bar).slice(0, ROWS);
  const head = ['requirement', `over ${unit.name}`, 'limit', 'predicted', '', 'room', `at ${unit.name}`];
  const [headLine = '', ...lines] = table([head, ...shown.map(rowCells)], 'llrrrrr');
  const marked = lines.map((line, n) => {
    if (shown[n]?.isMet === false) return paint.alarm(line);
    return shown[n] === worst ? paint.strong(line) : line;
  });
  const hidden = requirements.length - shown.length;
  const more = hidden === 0 ? [] : [`(${counted(hidden)} with more room not shown; all are in result.json)`];
  const isRelative = shown.some(({ name }) => name.endsWith(RELATIVE));
  const note = isRelative ? [paint.dim(`${RELATIVE} relative to the loss at the center`)] : [];
  const far = requirements.some(({ isOpen }) => isOpen) ? [paint.dim(LUMPED)] : [];
  return [paint.dim(headLine), ...marked, ...more, ...note, ...far];
}
