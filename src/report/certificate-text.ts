import type { Certificate } from '../forms/index.js';
import { table, wrapped } from './layout.js';
import { sizeText } from './numbers.js';
import type { Paint } from './paint.js';

/** Share of its limit that a held check has used; a count that must be met exactly uses none. */
function used({ value, limit, holds }: Certificate): number {
  return holds && value < limit ? value / limit : 0;
}

/** All certificates in one sentence: how many hold, and which came nearest to its limit. */
export function certificateSentence(certificates: readonly Certificate[]): readonly string[] {
  const [nearest] = [...certificates].sort((a, b) => used(b) - used(a));
  if (nearest === undefined) return [];
  const held = certificates.filter(({ holds }) => holds).length;
  const digits = certificates.find(({ check }) => check.startsWith('C9'));
  const near = `nearest to its limit: ${nearest.check}, ${sizeText(nearest.value)} of ${sizeText(nearest.limit)}`;
  const left = digits === undefined ? '' : `; ${Math.floor(digits.value)} digits left`;
  return wrapped(`Certificates: ${held} of ${certificates.length} hold${left}; ${near}.`, 2);
}

/** Every certificate on its own line, those that fail marked. */
export function certificateTable(certificates: readonly Certificate[], paint: Paint): readonly string[] {
  const rows = certificates.map(({ check, value, limit, holds }) => [
    check,
    sizeText(value),
    sizeText(limit),
    holds ? 'holds' : 'fails',
  ]);
  const [head = '', ...lines] = table([['certificate', 'size', 'limit', ''], ...rows], 'lrrl');
  return [paint.dim(head), ...lines.map((line, n) => (certificates[n]?.holds === false ? paint.alarm(line) : line))];
}
