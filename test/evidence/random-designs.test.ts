import { expect, it } from 'vitest';
import { tally } from '../support/random-designs.js';

const SEED = 20261201;
const DESIGNS = 10_000;

it(`${DESIGNS} random designs, seed ${SEED}: none silently wrong, at most 0.5 % refused`, () => {
  const { refused, wrong } = tally(SEED, DESIGNS);
  console.log(`${DESIGNS} designs, seed ${SEED}: ${wrong.length} wrong, ${refused.length} refused`);
  for (const line of refused.slice(0, 20)) console.log(line);
  expect(wrong.length, wrong.slice(0, 5).join('\n')).toBe(0);
  expect(refused.length).toBeLessThanOrEqual(0.005 * DESIGNS);
});
