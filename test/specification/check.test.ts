import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  checkBand,
  checkOrder,
  checkReturnLoss,
  checkSpecification,
  checkTransmissionZeros,
  checkUnloadedQ,
  parseSpecification,
} from '../../src/specification/index.js';
import { expectRefusal, onlyRefuses, refusal, SOUND } from './refusal.js';

const FULL = `{
  "name": "Larkmoor",
  "notes": "channel filter\\nsecond issue",
  "revision": "C",
  "date": "2024-02-29",
  "passband": { "lowerHz": "3822 MHz", "upperHz": "3.858 GHz" },
  "family": "generalizedChebyshev",
  "order": 6,
  "returnLossDb": 22,
  "transmissionZeros": [-1.45, "3866.15 MHz", { "re": 0.8, "im": 0 }, { "re": -0.8, "im": 0 }],
  "topology": "folded",
  "portCouplings": "single",
  "unloadedQ": [9000, 9000, 8000, 8000, 9000, 9000],
  "mask": [{ "fromHz": "3864 MHz", "rejectionDb": 24 }],
  "sweep": { "fromHz": "3.8 GHz", "toHz": 3.9e9, "points": 201 }
}`;

function isDeepFrozen(value: unknown): boolean {
  if (typeof value !== 'object' || value === null) return true;
  return Object.isFrozen(value) && Object.values(value).every(isDeepFrozen);
}

describe('checkSpecification(specification) and parseSpecification(text)', () => {
  it('read every key', () => {
    const { transmissionZeros, ...rest } = parseSpecification(FULL);
    expect(rest).toEqual({
      name: 'Larkmoor',
      notes: 'channel filter\nsecond issue',
      revision: 'C',
      date: '2024-02-29',
      band: { centerHz: Math.sqrt(3822e6) * Math.sqrt(3858e6), bandwidthHz: 36e6 },
      family: 'generalizedChebyshev',
      order: 6,
      returnLossDb: 22,
      topology: 'folded',
      portCouplings: 'single',
      unloadedQ: [9000, 9000, 8000, 8000, 9000, 9000],
      mask: [{ fromHz: 3864e6, rejectionDb: 24 }],
      sweep: { fromHz: 3.8e9, toHz: 3.9e9, points: 201 },
      remarks: [],
    });
    expect(transmissionZeros[0]).toEqual({ re: 0, im: -1.45 });
    expect(transmissionZeros[1]?.im).toBeCloseTo(1.45, 3);
    expect(transmissionZeros.slice(2)).toEqual([
      { re: 0.8, im: 0 },
      { re: -0.8, im: 0 },
    ]);
  });

  it('fill in the defaults and freeze the result', () => {
    const specification = checkSpecification({
      passband: { centerHz: 1e10, bandwidthHz: '40 MHz' },
      order: 4,
      returnLossDb: 20,
    });
    expect(specification).toEqual({
      band: { centerHz: 1e10, bandwidthHz: 4e7 },
      order: 4,
      family: 'generalizedChebyshev',
      returnLossDb: 20,
      transmissionZeros: [],
      topology: 'folded',
      portCouplings: 'any',
      mask: [],
      remarks: [],
    });
    expect(isDeepFrozen(parseSpecification(FULL))).toBe(true);
  });

  it('give the same from a text and from the object in it', () => {
    expect(parseSpecification(FULL)).toEqual(checkSpecification(JSON.parse(FULL)));
  });

  it('leave the argument as it was, frozen or not', () => {
    const given = JSON.parse(FULL);
    checkSpecification(given);
    expect(given).toEqual(JSON.parse(FULL));
    expect(Object.isFrozen(given.mask)).toBe(false);
  });

  it('take undefined fields as absent', () => {
    expect(checkSpecification({ ...SOUND, name: undefined, mask: undefined, sweep: undefined })).not.toHaveProperty(
      'name',
    );
  });

  it('need no return loss for a Butterworth filter, and refuse one', () => {
    const butterworth = { passband: SOUND.passband, order: 5, family: 'butterworth' };
    expect(checkSpecification(butterworth)).not.toHaveProperty('returnLossDb');
    expectRefusal(() => checkSpecification({ ...butterworth, returnLossDb: 20 }), 'E_RL_RANGE', 'half-power');
    expectRefusal(() => checkSpecification({ ...butterworth, family: 'chebyshev' }), 'E_MISSING', 'returnLossDb');
  });

  it('list all faults of a file together, in the order of the text', () => {
    const text = `{
      "passband": { "lowerHz": "3822", "upperHz": "3858mhz" },
      "order": "6",
      "retrunLoss": 22,
      "transmissionZeros": [null, 0.5],
      "unloadedQ": [1, "2"],
      "mask": [{ "rejectionDb": 24 }],
      "topology": "foldet",
      "sweep": { "fromHz": 2, "toHz": 1, "points": 1.5 }
    }`;
    const { faults, message, code } = refusal(() => parseSpecification(text));
    expect(faults.map((fault) => `${fault.code} ${fault.argument}`)).toEqual([
      'E_QUANTITY passband.lowerHz',
      'E_QUANTITY passband.upperHz',
      'E_TYPE order',
      'E_UNKNOWN_KEY retrunLoss',
      'E_TYPE transmissionZeros[0]',
      'E_ZERO_IN_PASSBAND transmissionZeros[1]',
      'E_TYPE unloadedQ[1]',
      'E_MASK mask[0]',
      'E_CHOICE topology',
      'E_SWEEP sweep',
      'E_SWEEP sweep.points',
    ]);
    expect(code).toBe('E_QUANTITY');
    expect(message.split('\n')).toHaveLength(faults.length);
    faults.forEach((fault) => {
      expect(fault.message).toMatch(/ \(\d+:\d+\): found /);
    });
  });

  it('list 20 faults at most and say how many more there are', () => {
    const many = Object.fromEntries(Array.from({ length: 30 }, (_, index) => [`zz${index}`, 1]));
    const { faults, message } = refusal(() => checkSpecification({ ...SOUND, ...many }));
    expect(faults).toHaveLength(20);
    expect(message).toContain('10 more faults');
  });

  it('throw a single fault as itself', () => {
    const failure = refusal(() => checkSpecification({ ...SOUND, order: 0 }));
    expect(failure).toMatchObject({ code: 'E_ORDER_RANGE', argument: 'order', value: 0, limit: [1, 100], faults: [] });
    expect(failure.hint).toBeDefined();
  });

  const rows: readonly (readonly [name: string, more: object, code: string, ...fragments: string[]])[] = [
    [
      'zeros with an all-pole family',
      { family: 'chebyshev', transmissionZeros: [2] },
      'E_ZERO_COUNT',
      '1 zero ',
      'remove',
    ],
    [
      'transversal with single ports',
      { topology: 'transversal', portCouplings: 'single' },
      'E_ZERO_TOPOLOGY',
      'folded',
    ],
    [
      'arrow with single ports and zeros',
      { topology: 'arrow', portCouplings: 'single', transmissionZeros: [2] },
      'E_ZERO_TOPOLOGY',
      'folded',
    ],
    ['Q of 0', { unloadedQ: 0 }, 'E_Q_RANGE', 'unloadedQ', 'positive'],
    ['Q negative in a list', { unloadedQ: [1, 1, 1, -1, 1, 1] }, 'E_Q_RANGE', 'unloadedQ[3]'],
    ['Q that is nearly 0', { unloadedQ: 1e-320 }, 'E_Q_RANGE', 'unloadedQ'],
    ['a sweep from nearly 0', { sweep: { fromHz: 1e-320, toHz: 2, points: 2 } }, 'E_SWEEP', '1e-18'],
    ['a zero at nearly 0 Hz', { transmissionZeros: ['1e-300 Hz'] }, 'E_ZERO_RANGE', '10000'],
    ['a zero at a negative frequency', { transmissionZeros: ['-3 GHz'] }, 'E_QUANTITY', 'positive'],
    ['Q list of the wrong length', { unloadedQ: [1, 2] }, 'E_Q_RANGE', '2 values for order 6'],
    [
      'edges and center mixed',
      { passband: { lowerHz: 1, centerHz: 2 } },
      'E_BAND',
      'lowerHz and upperHz, or centerHz and bandwidthHz',
    ],
    ['one edge only', { passband: { lowerHz: 1 } }, 'E_MISSING', 'passband.upperHz'],
    ['a negative edge', { passband: { lowerHz: -5, upperHz: 5 } }, 'E_BAND', '-5 Hz and 5 Hz', 'positive'],
    ['a width too narrow for the digits', { passband: { centerHz: 1e10, bandwidthHz: 1 } }, 'E_BAND', 'widen'],
    [
      'more zeros than order, once',
      { topology: 'inline', transmissionZeros: Array(7).fill(2) },
      'E_ZERO_COUNT',
      '7 zeros',
    ],
    ['an empty passband', { passband: {} }, 'E_MISSING', 'passband.lowerHz'],
    ['a band beyond any unit', { passband: { lowerHz: 1e300, upperHz: 2e300 } }, 'E_BAND', 'units'],
    ['a band too narrow for the digits', { passband: { lowerHz: 1e10, upperHz: 1e10 + 1 } }, 'E_BAND', 'widen'],
    ['a key of another object', { lowerHz: 1 }, 'E_UNKNOWN_KEY', 'move it into passband'],
    ['a key cut short', { zeros: [2] }, 'E_UNKNOWN_KEY', 'transmissionZeros'],
    ['a key like no other', { x: 1 }, 'E_UNKNOWN_KEY', 'remove it'],
    ['a key with marks in it', { '\u202ea b': 1 }, 'E_UNKNOWN_KEY', '["\\u202ea b"]'],
    ['a family of another name', { family: 'Chebyshev' }, 'E_CHOICE', '"chebyshev"'],
    ['a family of another type', { family: 3 }, 'E_TYPE', 'family'],
    ['a sweep of one point', { sweep: { fromHz: 1, toHz: 2, points: 1 } }, 'E_SWEEP', '2 to 100001'],
    ['a sweep without points', { sweep: { fromHz: 1, toHz: 2 } }, 'E_MISSING', 'sweep.points'],
    ['notes too long', { notes: 'x'.repeat(1001) }, 'E_NAME', 'notes', '1000'],
    ['a revision too long', { revision: 'x'.repeat(21) }, 'E_NAME', 'revision', '21 characters', '20'],
    ['a line end in a revision', { revision: 'A\nB' }, 'E_NAME', 'revision', '\\u000a'],
    ['a date that is no text', { date: 20261201 }, 'E_TYPE', 'date', 'YYYY-MM-DD'],
    ['a hole in the zeros', { transmissionZeros: new Array(2) }, 'E_TYPE', 'transmissionZeros[0]', 'nothing'],
    ['a zero with half its parts', { transmissionZeros: [{ re: 1 }] }, 'E_MISSING', 'transmissionZeros[0].im'],
    ['a zero with a part too many', { transmissionZeros: [{ re: 0, im: 2, abs: 2 }] }, 'E_UNKNOWN_KEY', 'abs'],
    ['typed arrays', { unloadedQ: new Float64Array(6) }, 'E_TYPE', 'typed array'],
    ['a function', { order: () => 6 }, 'E_TYPE', 'a function'],
    ['a symbol', { order: Symbol('6') }, 'E_TYPE', 'a symbol'],
  ];
  for (const [name, more, code, ...fragments] of rows) {
    it(`refuse ${name}`, () => {
      expectRefusal(() => checkSpecification({ ...SOUND, ...more }), code, ...fragments);
    });
  }

  it.each([undefined, null, 5, 'text', [], () => 0, new Map(), new Date(0), Symbol('x'), 5n])(
    'refuse %o as a whole',
    (value) => {
      refusal(() => checkSpecification(value));
    },
  );

  it('remark on what deserves a look', () => {
    const odd = { passband: { lowerHz: 4e9, upperHz: 6e9 }, order: 4, returnLossDb: 46, unloadedQ: 20 };
    expect(checkSpecification(odd).remarks.join('\n')).toMatch(
      /narrow-band model[\s\S]*46 dB is high[\s\S]*large loss/,
    );
    expect(checkSpecification({ ...odd, returnLossDb: 3, unloadedQ: 1e4 }).remarks.join('\n')).toMatch(
      /low for a filter/,
    );
  });

  it('never throw anything but a failure on hostile objects', () => {
    const thrower = new Proxy({}, { get: () => fail(), ownKeys: () => fail(), getPrototypeOf: () => fail() });
    const revoked = Proxy.revocable({}, {});
    const revokedList = Proxy.revocable([], {});
    revoked.revoke();
    revokedList.revoke();
    const loop: Record<string, unknown> = { ...SOUND };
    loop.mask = [loop];
    let wide: unknown = [];
    for (let level = 0; level < 14; level += 1) wide = Array(10).fill(wide);
    const endless = new Proxy([], { get: (_, key) => (key === 'length' ? 1e9 : 0) });
    const getter = {
      get order(): number {
        return fail();
      },
    };
    for (const bad of [
      thrower,
      revoked.proxy,
      revokedList.proxy,
      loop,
      wide,
      endless,
      getter,
      Object.create(thrower),
    ]) {
      expect(onlyRefuses(() => checkSpecification(bad))).toBeDefined();
      expect(onlyRefuses(() => checkTransmissionZeros(bad, 6))).toBeDefined();
      expect(onlyRefuses(() => checkTransmissionZeros([bad], 6))).toBeDefined();
      expect(onlyRefuses(() => checkBand(bad))).toBeDefined();
      expect(onlyRefuses(() => checkOrder(bad))).toBeDefined();
      expect(onlyRefuses(() => checkUnloadedQ(bad, 6))).toBeDefined();
      for (const key of Object.keys(JSON.parse(FULL))) {
        expect(onlyRefuses(() => checkSpecification({ ...SOUND, [key]: bad }))).toBeDefined();
      }
    }
  });

  it('name the field that cannot be read', () => {
    const failure = refusal(() =>
      checkSpecification({
        passband: SOUND.passband,
        returnLossDb: 22,
        get order() {
          return fail();
        },
      }),
    );
    expect(failure).toMatchObject({ code: 'E_TYPE', argument: 'order' });
  });

  it('never throw anything but a failure on arbitrary values', () => {
    const junk = fc.anything({
      withBigInt: true,
      withBoxedValues: true,
      withDate: true,
      withMap: true,
      withNullPrototype: true,
      withSparseArray: true,
      withTypedArray: true,
      maxDepth: 3,
    });
    const keys = fc.constantFrom(...Object.keys(JSON.parse(FULL)));
    fc.assert(
      fc.property(keys, junk, (key, value) => {
        onlyRefuses(() => checkSpecification({ ...JSON.parse(FULL), [key]: value }));
        onlyRefuses(() => checkSpecification(value));
      }),
      { seed: 51, numRuns: 2000 },
    );
  });

  it('never throw anything but a failure on a mutated text, and finish quickly', () => {
    const piece = fc.constantFrom(
      '{',
      '}',
      '[',
      ']',
      ',',
      ':',
      '"',
      '\\',
      '-',
      '1e999',
      '0',
      'null',
      '\u0000',
      '\ud800',
      '"order":',
      '"\\u005f_proto__":1',
      '[[[[[[[[[[[[[[[[[',
      '1,5',
      '//',
    );
    const edit = fc.record({
      at: fc.nat(FULL.length),
      cut: fc.nat(12),
      put: fc.oneof(piece, fc.string({ maxLength: 4 })),
    });
    fc.assert(
      fc.property(fc.array(edit, { minLength: 1, maxLength: 4 }), (edits) => {
        const text = edits.reduce((old, { at, cut, put }) => old.slice(0, at) + put + old.slice(at + cut), FULL);
        const start = performance.now();
        onlyRefuses(() => parseSpecification(text));
        expect(performance.now() - start).toBeLessThan(1000);
      }),
      { seed: 52, numRuns: 3000 },
    );
  });

  it('never pass zod wording on', () => {
    const structural = fc.record({
      passband: fc.jsonValue(),
      order: fc.jsonValue(),
      family: fc.jsonValue(),
      transmissionZeros: fc.array(fc.jsonValue(), { maxLength: 3 }),
      unloadedQ: fc.jsonValue(),
      mask: fc.array(fc.jsonValue(), { maxLength: 3 }),
    });
    fc.assert(
      fc.property(structural, (value) => {
        expect(onlyRefuses(() => checkSpecification(value))?.message ?? '').not.toMatch(
          /Invalid|expected .*, received|Unrecognized/,
        );
      }),
      { seed: 53, numRuns: 1000 },
    );
  });

  it.each([
    ['many unknown keys', `{${Array.from({ length: 45_000 }, (_, index) => `"k${index}":1`).join()}}`],
    ['many bad lines', `{"mask":[${'{"a":1},'.repeat(9000)}1]}`],
    ['too many lines', `{"mask":[${'{"a":1},'.repeat(20_000)}1]}`],
    ['many zeros', `{"transmissionZeros":[${'2,'.repeat(40_000)}2]}`],
    ['many sound lines', `{"mask":[${'{"fromHz":1,"rejectionDb":2},'.repeat(9000)}1]}`],
  ])('refuse a hostile file soon: %s', (_name, text) => {
    const start = performance.now();
    refusal(() => parseSpecification(text));
    expect(performance.now() - start).toBeLessThan(1000);
  });
});

describe('checkOrder(value) and checkReturnLoss(value)', () => {
  it('give the value itself, ends of the range included', () => {
    expect([1, 6, 100].map(checkOrder)).toEqual([1, 6, 100]);
    expect([0.01, 22, 100].map(checkReturnLoss)).toEqual([0.01, 22, 100]);
    expect([0, 101, 1.5].map((value) => refusal(() => checkOrder(value)).code)).toEqual(Array(3).fill('E_ORDER_RANGE'));
    expect([0.009, 100.1].map((value) => refusal(() => checkReturnLoss(value)).code)).toEqual(
      Array(2).fill('E_RL_RANGE'),
    );
  });
});

describe('checkUnloadedQ(unloadedQ, order)', () => {
  it('gives the value, or the values copied', () => {
    expect(checkUnloadedQ(9000, 6)).toBe(9000);
    expect(checkUnloadedQ([1, 2], 2)).toEqual([1, 2]);
  });
  it('refuses what is not a Q', () => {
    expectRefusal(() => checkUnloadedQ(undefined, 6), 'E_MISSING', 'unloadedQ');
    expectRefusal(() => checkUnloadedQ([1, 2], 0), 'E_ORDER_RANGE', 'order');
    expectRefusal(() => checkUnloadedQ(-5, 6), 'E_Q_RANGE', 'unloadedQ');
  });
});

function fail(): never {
  throw new TypeError('from the caller');
}
