import type { MaskRow } from '../../forms/index.js';
import { type FrequencyUnit, trimmed } from './numbers.js';
import { clearanceText, placeText, RELATIVE, type Requirement, requirementOf } from './requirement.js';

/** Shares of the limit that count as equal. */
const TIE = 1e-9;

/** What is said where there is nothing to judge. */
export const NO_MASK = 'No mask was given: there is no requirement to meet or miss.';

/** The answer to the customer's mask: one sentence, and one more that names the requirement with the least room. */
export interface Verdict {
  readonly isMet: boolean;
  readonly answer: string;
  readonly nearest: string;
}

/** The requirement with the least room for its limit. */
export function tightest(requirements: readonly Requirement[]): Requirement | undefined {
  const least = Math.min(...requirements.map(({ share }) => share));
  // A symmetric design has two equals that differ by rounding: the first is named.
  return requirements.find(({ share }) => share <= least + TIE);
}

/** How many requirements, in words. */
export function counted(count: number): string {
  return count === 1 ? '1 requirement' : `${count} requirements`;
}

/** The room as a share of the limit; a limit of 0 has none. */
export function shareText({ share, limit }: Requirement): string {
  const percent = Math.round(Math.abs(100 * share));
  if (percent === 0 || limit === 0) return '';
  return `${percent > 1000 ? 'over 1000' : percent} % of the limit`;
}

function nearestText(worst: Requirement, unit: FrequencyUnit, decimals: number): string {
  const percent = shareText(worst);
  const share = percent === '' ? '' : ` (${percent})`;
  const room = `${worst.isMet ? 'clear' : worst.lack} by ${clearanceText(worst.margin, decimals)} ${worst.unit}${share}`;
  const relative = worst.name.endsWith(RELATIVE) ? ' relative to the center' : '';
  const place = `${worst.name.replace(RELATIVE, '')}${relative} ${placeText(worst, unit)}, ${room}`;
  const at =
    worst.at === 'far above' ? 'far above the band' : `at ${trimmed(Number(worst.at), unit.digits)} ${unit.name}`;
  const where = at.split(' ')[1] === worst.span ? '' : ` ${at}`;
  return `${place}${where}${worst.isOpen ? ', in the lumped model' : ''}`;
}

/** How many requirements are met, and which has the least room, to so many decimals; undefined without a mask. */
export function verdictOf(
  rows: readonly MaskRow[],
  unit: FrequencyUnit,
  decimals: (requirement: Requirement) => number = () => 2,
): Verdict | undefined {
  const requirements = rows.map((row) => requirementOf(row, unit));
  const worst = tightest(requirements);
  if (worst === undefined) return undefined;
  const missed = requirements.filter(({ isMet }) => !isMet).length;
  const total = requirements.length;
  const all = total === 1 ? 'the only requirement' : `all ${counted(total)}`;
  const some = missed === total ? all : `${missed} of ${counted(total)}`;
  const label = missed === 0 ? 'Least room for its limit' : 'Farthest off for its limit';
  return {
    isMet: missed === 0,
    answer: missed === 0 ? `Meets ${all}.` : `Misses ${some}.`,
    nearest: `${label}: ${nearestText(worst, unit, decimals(worst))}.`,
  };
}
