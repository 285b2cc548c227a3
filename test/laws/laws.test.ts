import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ENGINE } from './engine.js';
import { LAWS } from './laws.js';

const SEED = 20240229;

describe.each(LAWS.map((each) => [each.name, each] as const))('%s', (_, { property, runs, faults }) => {
  test('holds', () => {
    fc.assert(property(ENGINE), { seed: SEED, numRuns: 2 * runs });
  });

  test.each(faults)('fails with a fault: %s', (__, fault) => {
    const { failed, errorInstance } = fc.check(property(fault(ENGINE)), {
      seed: SEED,
      numRuns: 4 * runs,
      endOnFailure: true,
    });
    expect(failed, 'the fault was not noticed').toBe(true);
    // A plain Error comes from the law itself; a refusal or a TypeError would mean that the engine stumbled over the fault.
    expect((errorInstance as Error).constructor).toBe(Error);
  });
});

test('every law has a name of its own and at least one fault', () => {
  expect(new Set(LAWS.map(({ name }) => name)).size).toBe(LAWS.length);
  expect(LAWS.length).toBeGreaterThanOrEqual(24);
  for (const { faults } of LAWS) expect(faults.length).toBeGreaterThan(0);
});
