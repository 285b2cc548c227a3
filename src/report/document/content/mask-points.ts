import type { MaskRow } from '../../../forms/index.js';
import { type FrequencyUnit, fixed, frequencyText } from '../../words/numbers.js';
import { clearanceText, limitText, predictedText, RELATIVE, requirementOf } from '../../words/requirement.js';
import { tightest } from '../../words/verdict.js';
import { type Column, numberColumn, type Row, type Table, textColumn } from './content.js';
import { RELATIVE_NOTE, requirementName } from './requirements.js';

const DB_DECIMALS = 2;
const NS_DECIMALS = 3;

/** Both levels of a line whose limit slopes; undefined for a level line. */
function slopeOf({ line }: MaskRow): readonly [number, number] | undefined {
  const level =
    'rejectionDb' in line
      ? line.rejectionDb
      : 'returnLossDb' in line
        ? line.returnLossDb
        : 'insertionLossDb' in line
          ? line.insertionLossDb
          : 0;
  return typeof level === 'number' ? undefined : level;
}

function columnsOf(unit: FrequencyUnit, anySlope: boolean): readonly Column[] {
  return [
    textColumn('Requirement'),
    numberColumn('From', unit.name),
    numberColumn('To', unit.name),
    ...(anySlope ? [numberColumn('Sloping limit', 'at both ends')] : []),
    numberColumn('Limit', 'at the worst point'),
    numberColumn('Predicted'),
    numberColumn('Room', 'negative: short'),
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
  const anySlope = rows.some((row) => slopeOf(row) !== undefined);
  const lines = rows.map((row, n): Row => {
    const requirement = requirementOf(row, unit);
    const { limit, predicted, unit: level, margin, share, at, isMet } = requirement;
    const decimals = Math.max(requirement.decimals, level === 'ns' ? NS_DECIMALS : DB_DECIMALS);
    const slope = slopeOf(row);
    const end = (hertz: number | undefined): string =>
      hertz === undefined ? 'open' : fixed(hertz / unit.hertz, places);
    const cells = [
      `${requirementName(requirement)}, ${level}`,
      end(row.line.fromHz),
      end(row.line.toHz),
      ...(anySlope ? [slope === undefined ? '' : slope.map((value) => limitText(value, decimals)).join(' to ')] : []),
      limitText(limit, decimals),
      predictedText(predicted, level, decimals),
      `${isMet ? '+' : '-'}${clearanceText(margin, decimals)}`,
      Math.abs(share) > 10 ? 'over 1000' : fixed(100 * share, 1),
      at,
    ];
    const isWorst = worst !== undefined && requirements.indexOf(worst) === n;
    return { cells, tones: [...(isWorst ? (['tightest'] as const) : []), ...(isMet ? [] : (['short'] as const))] };
  });
  const isRelative = requirements.some(({ name }) => name.endsWith(RELATIVE));
  return {
    id: 'mask-points',
    caption: 'All requirements with their worst points',
    columns: columnsOf(unit, anySlope),
    rows: lines,
    ...(isRelative ? { note: `${RELATIVE_NOTE}.` } : {}),
  };
}
