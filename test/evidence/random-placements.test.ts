import { expect, it } from 'vitest';
import { placeZeros } from '../../src/proposal/index.js';
import { MASKS, type MaskName, piecesFor } from '../proposal/masks.js';
import { randomRequest } from '../proposal/random-masks.js';
import { randomSearch } from '../proposal/random-search.js';
import { seeded } from '../support/random.js';

const SEED = 20261203;
const EFFORT = { samples: 60_000, refined: 12, steps: 3000 };

const CASES: readonly (readonly [MaskName, number, number])[] = [
  ['channel', 6, 2],
  ['diplexer', 7, 3],
  ['baseStation', 7, 3],
  ['frontEnd', 5, 2],
  ['cryogenic', 14, 4],
  ['cryogenic', 13, 4],
  ['cryogenic', 11, 6],
];

it.each(CASES)(
  `%s %i-%i: 60,000 random placements, 12 refined, seed ${SEED}, none better by 1e-6 dB`,
  (name, order, zeroCount) => {
    const request = { order, zeroCount, returnLossDb: MASKS[name].returnLossDb, rejection: piecesFor(name) };
    const { highestDb, lowestDb } = placeZeros(request);
    const { best, above } = randomSearch(request, highestDb, EFFORT, seeded(SEED));
    console.log(
      `${name} ${order}-${zeroCount}: optimum ${highestDb.toFixed(4)} dB, width ${(highestDb - lowestDb).toExponential(1)}, best by chance ${best.toFixed(4)}`,
    );
    expect(above).toBe(0);
    expect(best).toBeLessThanOrEqual(highestDb + 1e-6);
  },
);

it(`20,000 random masks, seed ${SEED}: every enclosure at most 1e-9 dB wide, none refused`, () => {
  const random = seeded(SEED);
  const widths = Array.from({ length: 20_000 }, () => {
    const { highestDb, lowestDb } = placeZeros(randomRequest(random));
    return highestDb - lowestDb;
  });
  console.log(`widest enclosure ${Math.max(...widths).toExponential(1)} dB`);
  expect(Math.max(...widths)).toBeLessThanOrEqual(1e-9);
});
