import type { MaskRow } from '../forms/index.js';
import { table, wrapped } from './layout.js';
import { type FrequencyUnit, fixed, trimmed } from './numbers.js';
import type { Paint } from './paint.js';
import { clearanceText, placeText, RELATIVE, type Requirement, requirementOf } from './requirement.js';

/** Rows shown at most; with more, the tightest are. */
const ROWS = 20;
/** Shares of the limit that count as equal. */
const TIE = 1e-9;

function tightest(requirements: readonly Requirement[]): Requirement | undefined {
  const least = Math.min(...requirements.map(({ share }) => share));
  // A symmetric design has two equals that differ by rounding: the first is named.
  return requirements.find(({ share }) => share <= least + TIE);
}

function counted(count: number): string {
  return count === 1 ? '1 requirement' : `${count} requirements`;
}

/** The answer first: how many requirements are met, and which has the least room. */
export function verdictLines(rows: readonly MaskRow[], unit: FrequencyUnit, paint: Paint): readonly string[] {
  const requirements = rows.map((row) => requirementOf(row, unit));
  const worst = tightest(requirements);
  if (worst === undefined) return [paint.strong('No mask was given: there is no requirement to meet or miss.')];
  const missed = requirements.filter(({ isMet }) => !isMet).length;
  const percent = Math.round(Math.abs(100 * worst.share));
  const share = percent > 100 || percent === 0 ? '' : ` (${percent} % of the limit)`;
  const room = `${worst.isMet ? 'clear' : 'short'} by ${clearanceText(worst.margin)} ${worst.unit}${share}`;
  const relative = worst.name.endsWith(RELATIVE) ? ' relative to the center' : '';
  const place = `${worst.name.replace(RELATIVE, '')}${relative} ${placeText(worst, unit)}, ${room}`;
  const at =
    worst.at === 'far above' ? 'far above the band' : `at ${trimmed(Number(worst.at), unit.digits)} ${unit.name}`;
  const where = at.split(' ')[1] === worst.span ? '' : ` ${at}`;
  const total = requirements.length;
  const all = total === 1 ? 'the only requirement' : `all ${counted(total)}`;
  const some = missed === total ? all : `${missed} of ${counted(total)}`;
  const answer = missed === 0 ? `Meets ${all}` : `Short of ${some}`;
  const mark = missed === 0 ? paint.strong : paint.alarm;
  const label = missed === 0 ? 'Least room for its limit' : 'Farthest off for its limit';
  return wrapped(`${answer}. ${label}: ${place}${where}.`).map(mark);
}

/** Two decimals where they say it all: a limit is never shown rounded. */
function limitText(limit: number): string {
  const exact = trimmed(limit, 6);
  return Number(fixed(limit, 2)) === Number(exact) ? fixed(limit, 2) : exact;
}

/** Attenuations are stated to 400 dB only; beyond, the figure is a floor and not a prediction. */
function predictedText(predicted: number, unit: string): string {
  return unit === 'dB' && predicted >= 400 ? 'over 400' : fixed(predicted, 2);
}

function rowCells({ name, unit, span, limit, predicted, margin, isMet, at }: Requirement): readonly string[] {
  const room = isMet ? 'clear by' : 'short by';
  return [`${name}, ${unit}`, span, limitText(limit), predictedText(predicted, unit), room, clearanceText(margin), at];
}

/** Each requirement with its limit, what is predicted, the room left or lacking, and the worst point. */
export function maskTable(rows: readonly MaskRow[], unit: FrequencyUnit, paint: Paint): readonly string[] {
  if (rows.length === 0) return [];
  const requirements = rows.map((row) => requirementOf(row, unit));
  const worst = tightest(requirements);
  const bar = [...requirements].sort((a, b) => a.share - b.share)[ROWS - 1]?.share ?? Number.POSITIVE_INFINITY;
  const shown = requirements.filter(({ share }) => share <= bar).slice(0, ROWS);
  const head = ['requirement', `over ${unit.name}`, 'limit', 'predicted', '', '', `at ${unit.name}`];
  const [headLine = '', ...lines] = table([head, ...shown.map(rowCells)], 'llrrrrr');
  const marked = lines.map((line, n) => {
    if (shown[n]?.isMet === false) return paint.alarm(line);
    return shown[n] === worst ? paint.strong(line) : line;
  });
  const hidden = requirements.length - shown.length;
  const more = hidden === 0 ? [] : [`(${counted(hidden)} with more room not shown; all are in result.json)`];
  const isRelative = shown.some(({ name }) => name.endsWith(RELATIVE));
  const note = isRelative ? [paint.dim(`${RELATIVE} relative to the loss at the center`)] : [];
  return [paint.dim(headLine), ...marked, ...more, ...note];
}
