import { expect, it } from 'vitest';
import { tallyPoles } from '../support/random-poles.js';

// A sample of test/evidence/random-poles.test.ts (200,000 responses), with a seed of its own.
it('4000 random responses with crowded zeros: poles on the right side, power balanced, none refused', () => {
  const { wrong, refused } = tallyPoles(11, 4000);
  expect(wrong.slice(0, 3)).toEqual([]);
  expect(refused.slice(0, 3)).toEqual([]);
});
