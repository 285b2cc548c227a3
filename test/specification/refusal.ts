import { expect } from 'vitest';
import { FilterFailure } from '../../src/numerics/index.js';

/** A sound specification to break one part of. */
export const SOUND = { passband: { lowerHz: 3822e6, upperHz: 3858e6 }, order: 6, returnLossDb: 22 } as const;

/** Runs what must refuse and gives the failure; anything else thrown, or nothing, fails the test. */
export function refusal(run: () => unknown): FilterFailure {
  try {
    run();
  } catch (error) {
    if (error instanceof FilterFailure) return error;
    throw error;
  }
  return expect.fail('nothing was refused');
}

/** Checks that a refusal has the code, every fragment of text, and the shape that all messages share. */
export function expectRefusal(run: () => unknown, code: string, ...fragments: readonly string[]): FilterFailure {
  const failure = refusal(run);
  const all = failure.faults.length > 0 ? failure.faults : [failure];
  const match = all.find((fault) => fault.code === code);
  expect(match?.code ?? failure.message).toBe(code);
  for (const fragment of fragments) expect(match?.message).toContain(fragment);
  for (const fault of all) {
    expect(fault.message).toMatch(/^E_[A-Z_0-9]+( \S.*?)?( \(\d+:\d+\)| \(byte \d+\))?: found .+; allowed .+; .+$/s);
    expect(fault.message).not.toMatch(/Invalid|expected .*received|Unrecognized|\[object/);
  }
  return failure;
}

/** Runs something that may refuse: gives the failure or undefined, and lets foreign errors through. */
export function onlyRefuses(run: () => unknown): FilterFailure | undefined {
  try {
    run();
    return undefined;
  } catch (error) {
    if (error instanceof FilterFailure) return error;
    throw error;
  }
}
