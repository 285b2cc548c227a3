import { expect, it } from 'vitest';
import { tallyPoles } from '../support/random-poles.js';

const SEED = 20261202;
const SPECS = 200_000;

it(`${SPECS} random responses with crowded zeros, seed ${SEED}: none wrong, at most one in ten thousand refused`, () => {
  const { wrong, refused } = tallyPoles(SEED, SPECS);
  console.log(`${SPECS} responses, seed ${SEED}: ${wrong.length} wrong, ${refused.length} refused`);
  for (const line of [...wrong, ...refused].slice(0, 20)) console.log(line);
  expect(wrong.length).toBe(0);
  expect(refused.length).toBeLessThanOrEqual(SPECS / 10_000);
});
