import { expect, it } from 'vitest';
import { tally } from '../support/random-designs.js';

// A sample of test/evidence/random-designs.test.ts (10,000 designs), with a seed of its own.
it('300 random designs: none silently wrong, at most one refused', () => {
  const { refused, wrong } = tally(7, 300);
  expect(wrong.length, wrong.slice(0, 5).join('\n')).toBe(0);
  expect(refused.length, refused.join('\n')).toBeLessThanOrEqual(1);
});
