import type { MaskRow } from '../../../forms/index.js';
import { LUMPED } from '../../words/conventions.js';
import { type FrequencyUnit, fixed, frequencyText } from '../../words/numbers.js';
import {
  askedText,
  clearanceText,
  limitText,
  predictedText,
  RELATIVE,
  requirementOf,
} from '../../words/requirement.js';
import { tightest } from '../../words/verdict.js';
import { type Column, numberColumn, type Row, type Table, textColumn } from './content.js';
import { numberedName, RELATIVE_NOTE } from './requirements.js';

const DB_DECIMALS = 2;

function columnsOf(unit: FrequencyUnit, anySlope: boolean): readonly Column[] {
  return [
    textColumn('Requirement'),
    numberColumn('From', unit.name),
    numberColumn('To', unit.name),
    ...(anySlope ? [numberColumn('Sloping limit', 'at both ends')] : []),
    numberColumn('Limit', 'at the worst point'),
    numberColumn('Predicted'),
    numberColumn('Room', 'negative: missed'),
    numberColumn('Room', '% of limit'),
    numberColumn('Worst at', unit.name),
  ];
}

/** Decimals that show every end of a span whole, so that their points align. */
function endDecimals(rows: readonly MaskRow[], unit: FrequencyUnit): number {
  const ends = rows.flatMap(({ line: { fromHz, toHz } }) => [fromHz, toHz]).filter((hertz) => hertz !== undefined);
  return Math.max(0, ...ends.map((hertz) => (frequencyText(hertz, unit).split('.')[1] ?? '').length));
}

/** Every requirement with its true worst point, to more digits than the first page. */
export function maskPointTable(rows: readonly MaskRow[], unit: FrequencyUnit): Table {
  const requirements = rows.map((row) => requirementOf(row, unit));
  const worst = tightest(requirements);
  const places = endDecimals(rows, unit);
  const anySlope = requirements.some(({ slope }) => slope !== undefined);
  const lines = rows.map((row, n): Row => {
    const requirement = requirementOf(row, unit);
    const { limit, predicted, unit: level, margin, share, at, isMet } = requirement;
    const decimals = Math.max(requirement.decimals, level === 'dB' ? DB_DECIMALS : unit.delay.digits);
    const end = (hertz: number | undefined): string =>
      hertz === undefined ? 'open' : fixed(hertz / unit.hertz, places);
    const cells = [
      numberedName(requirement, n + 1),
      end(row.line.fromHz),
      end(row.line.toHz),
      ...(anySlope ? [requirement.slope === undefined ? '' : askedText(requirement)] : []),
      limitText(limit, decimals),
      predictedText(predicted, level, decimals),
      `${isMet ? '+' : '-'}${clearanceText(margin, decimals)}`,
      Math.abs(share) > 10 ? 'over 1000' : fixed(100 * share, 1),
      at,
    ];
    const isWorst = worst !== undefined && requirements.indexOf(worst) === n;
    return { cells, tones: [...(isWorst ? (['tightest'] as const) : []), ...(isMet ? [] : (['short'] as const))] };
  });
  const notes = [
    ...(requirements.some(({ name }) => name.endsWith(RELATIVE)) ? [`${RELATIVE_NOTE}.`] : []),
    ...(requirements.some(({ isOpen }) => isOpen) ? [LUMPED] : []),
  ];
  return {
    id: 'mask-points',
    caption: 'All requirements with their worst points',
    columns: columnsOf(unit, anySlope),
    rows: lines,
    ...(notes.length === 0 ? {} : { note: notes.join(' ') }),
  };
}
