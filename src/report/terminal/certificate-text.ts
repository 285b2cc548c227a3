import type { Certificate } from '../../forms/index.js';
import { sizeText } from '../words/numbers.js';
import { table, wrapped } from './layout.js';
import type { Paint } from './paint.js';

/** Share of its limit that a held check has used; a count that must be met exactly uses none. */
function used({ value, limit, holds }: Certificate): number {
  return holds && value < limit ? value / limit : 0;
}

/** All certificates in one sentence: how many hold, and how much of its limit the nearest one has used, rounded up. */
export function certificateSentence(certificates: readonly Certificate[]): readonly string[] {
  const held = certificates.filter(({ holds }) => holds).length;
  const share = Math.ceil(100 * Math.max(0, ...certificates.map(used)));
  const digits = certificates.find(({ check }) => check.startsWith('C9'));
  const left = digits === undefined ? '' : `; ${Math.floor(digits.value)} digits are left in the response`;
  return wrapped(
    `Certificates: ${held} of ${certificates.length} hold, none beyond ${share} % of its limit${left}.`,
    2,
  );
}

/** Every certificate with its size and limit, those that fail marked; the name stands last, for some are long. */
export function certificateTable(certificates: readonly Certificate[], paint: Paint): readonly string[] {
  const rows = certificates.map(({ value, limit, holds }) => [
    sizeText(value),
    sizeText(limit),
    holds ? 'holds' : 'fails',
    '|',
  ]);
  const [head = '', ...starts] = table([['size', 'limit', '', '|'], ...rows], 'rrll');
  const lines = certificates.map(({ check, holds }, n) => {
    const start = (starts[n] ?? '').slice(0, -1);
    const text = wrapped(start.replaceAll(' ', '\u00a0') + check, start.length);
    const plain = text.join('\n').replaceAll('\u00a0', ' ');
    return holds ? plain : paint.alarm(plain);
  });
  return [paint.dim(`${head.slice(0, -1)}certificate`), ...lines];
}
