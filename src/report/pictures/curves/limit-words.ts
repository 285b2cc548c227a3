import { fixed, trimmed } from '../../words/numbers.js';
import { clearanceText, RELATIVE, type Requirement } from '../../words/requirement.js';

/** Name of the kind of a requirement, without the mark of relative levels. */
export function kindOf({ name }: Requirement): string {
  return name.replace(RELATIVE, '');
}

/** Whether the limit is a greatest value: it is gone over, not fallen short of. */
function isMost(requirement: Requirement): boolean {
  return /loss variation|delay variation|insertion loss/.test(kindOf(requirement));
}

/** Size of a margin: losses of the passband to hundredths of a decibel, everything else to tenths, more where that is zero. */
function sizeText(requirement: Requirement, margin: number): string {
  const digits = isMost(requirement) && requirement.unit === 'dB' ? 2 : 1;
  const size = Math.abs(margin);
  return size >= 0.95 ? fixed(size, digits) : clearanceText(size);
}

/** Room left or lacking, such as `2.3 dB clear`, `1.4 dB short`, `0.84 dB over`. */
export function roomText(requirement: Requirement): string {
  const word = requirement.isMet ? 'clear' : isMost(requirement) ? 'over' : 'short';
  return `${sizeText(requirement, requirement.margin)} ${requirement.unit} ${word}`;
}

/** A span as pictures write it. */
export function spanWords(span: string): string {
  return span.replace('<= ', '≤ ').replace('>= ', '≥ ').replace('-', '–');
}

/** A limit: never rounded to a figure that it is not, without needless zeros. */
export function limitWords(limit: number): string {
  return trimmed(limit, 6);
}

function kindFinding(requirements: readonly Requirement[]): string {
  const [worst] = [...requirements].sort((a, b) => a.margin - b.margin);
  if (worst === undefined) return '';
  const size = `${sizeText(worst, worst.margin)} ${worst.unit}`;
  if (worst.isMet) return `${kindOf(worst)} clear by ${size}${requirements.length > 1 ? ' or more' : ''}`;
  const missed = requirements.filter(({ isMet }) => !isMet).length;
  const upTo = missed > 1 ? 'up to ' : '';
  return `${kindOf(worst)} ${isMost(worst) ? 'over' : 'short'} by ${upTo}${size}`;
}

/**
 * What a picture finds about the limits in it, one statement for each kind: kinds cannot be compared with each other. Misses
 * come first.
 */
export function limitFinding(requirements: readonly Requirement[]): string {
  const kinds = [...new Set(requirements.map(kindOf))];
  const groups = kinds.map((kind) => requirements.filter((each) => kindOf(each) === kind));
  const hasMiss = (group: readonly Requirement[]): boolean => group.some(({ isMet }) => !isMet);
  const ordered = [...groups.filter(hasMiss), ...groups.filter((group) => !hasMiss(group))];
  const text = ordered.map(kindFinding).join('; ');
  return text.charAt(0).toUpperCase() + text.slice(1);
}
