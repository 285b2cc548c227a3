import { expect, test } from 'vitest';
import { EPS, FilterFailure } from '../../src/numerics/index.js';

test('FilterFailure is an Error with code, argument, value, limit, hint and faults', () => {
  const inner = new FilterFailure('E_TYPE', 'inner');
  const cause = new Error('why');
  const failure = new FilterFailure('E_PIVOT', 'E_PIVOT pivot: found 0', {
    argument: 'pivot',
    value: 0,
    limit: [1, 4],
    hint: 'choose a resonator',
    faults: [inner],
    cause,
  });
  expect(failure).toBeInstanceOf(Error);
  expect(failure.name).toBe('FilterFailure');
  expect({ ...failure }).toMatchObject({
    code: 'E_PIVOT',
    argument: 'pivot',
    value: 0,
    limit: [1, 4],
    hint: 'choose a resonator',
  });
  expect(failure.faults).toEqual([inner]);
  expect(failure.cause).toBe(cause);
});

test('FilterFailure without details has no faults and no cause', () => {
  const failure = new FilterFailure('E_TYPE', 'E_TYPE x: found y');
  expect(failure.faults).toEqual([]);
  expect('cause' in failure).toBe(false);
  expect(failure.argument).toBeUndefined();
});

test('EPS is the unit spacing of doubles at 1', () => {
  expect(1 + EPS).toBeGreaterThan(1);
  expect(1 + EPS / 2).toBe(1);
});
