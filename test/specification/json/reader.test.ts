import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readJson } from '../../../src/specification/index.js';
import { expectRefusal, onlyRefuses } from '../refusal.js';

const SHUT_OUT = ['__proto__', 'constructor', 'prototype'];

/** Plain objects with the same content as prototype-less ones, for comparing. */
function plain(value: unknown): unknown {
  return JSON.parse(JSON.stringify(value));
}

function depthOf(value: unknown): number {
  if (typeof value !== 'object' || value === null) return 0;
  return 1 + Math.max(0, ...Object.values(value).map(depthOf));
}

describe('readJson(text)', () => {
  it('agrees with JSON.parse on every text that JSON.stringify writes', () => {
    const values = fc
      .jsonValue({ maxDepth: 6 })
      .filter((value) => !/"(__proto__|constructor|prototype)":/.test(JSON.stringify(value)));
    fc.assert(
      fc.property(values, fc.constantFrom(undefined, 1, '\t'), (value, indent) => {
        const text = JSON.stringify(value, null, indent);
        expect(plain(readJson(text).value)).toEqual(JSON.parse(text));
      }),
      { seed: 21, numRuns: 1000 },
    );
  });

  it('reads every finite number as JSON.parse does, negative zero included', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const text = Object.is(value, -0) ? '-0' : String(value).replace(/e\+/, 'E+');
        expect(Object.is(readJson(text).value, JSON.parse(text))).toBe(true);
      }),
      { seed: 22, numRuns: 1000 },
    );
  });

  it('refuses what JSON.parse refuses, and of the rest only what the limits name', () => {
    const alphabet = fc.constantFrom(
      ...'{}[]:,"\\u00e9 \n0123456789.eE+-truefalsn/*\u0000\ud83d\ude00'.split(''),
      '"a":',
      '"b":',
    );
    fc.assert(
      fc.property(fc.array(alphabet, { maxLength: 14 }), (pieces) => {
        const text = pieces.join('');
        const failure = onlyRefuses(() => readJson(text));
        let parsed: unknown;
        let standard = true;
        try {
          parsed = JSON.parse(text);
        } catch {
          standard = false;
        }
        if (!standard) expect(failure).toBeDefined();
        else if (failure === undefined) expect(plain(readJson(text).value)).toEqual(plain(parsed));
        else expect(['E_JSON_DUPLICATE', 'E_NUMBER_OVERFLOW', 'E_ENCODING']).toContain(failure.code);
      }),
      { seed: 23, numRuns: 5000 },
    );
  });

  it('allows 16 levels and no more', () => {
    const deep = (levels: number) => '['.repeat(levels) + ']'.repeat(levels);
    expect(depthOf(readJson(deep(16)).value)).toBe(16);
    expectRefusal(() => readJson(deep(17)), 'E_JSON_DEPTH', '(1:17)');
  });

  it('allows 40 digits and no more', () => {
    expect(readJson(`0.${'1'.repeat(39)}`).value).toBeCloseTo(1 / 9, 12);
    expectRefusal(() => readJson(`0.${'1'.repeat(40)}`), 'E_NUMBER_OVERFLOW', '40 digits');
    expectRefusal(() => readJson(`1e${'0'.repeat(45)}1`), 'E_NUMBER_OVERFLOW');
  });

  it('builds objects without a prototype', () => {
    const value = readJson('{"a": {"b": []}}').value;
    expect(Object.getPrototypeOf(value)).toBeNull();
    expect(Object.getPrototypeOf(Reflect.get(Object(value), 'a'))).toBeNull();
  });

  it.each(SHUT_OUT)('refuses %s as a key at any level, and allows it as a value', (key) => {
    expectRefusal(() => readJson(`[{"a": {"${key}": 1}}]`), 'E_FORBIDDEN_KEY', `[0].a.${key} (1:9)`);
    expect(readJson(`"${key}"`).value).toBe(key);
  });

  it.each([
    ['', '(1:1)', 'the end of the text'],
    ['{"a": 1', '(1:8)', 'the end of the text'],
    ['"abc', '(1:1)', 'closing quote'],
    ['"a\nb"', '(1:3)', 'control character "\\u000a"'],
    ['"\\x"', '(1:2)', 'escapes'],
    ['"\\u12g4"', '(1:2)', 'four hex digits'],
    ["{'a': 1}", '(1:2)', 'double quotes'],
    ['{a: 1}', '(1:2)', 'double quotes'],
    ['{"a" 1}', '(1:6)', '":"'],
    ['{"a": 01}', '(1:7)', 'leading zeros'],
    ['{"a": 1.}', '(1:7)', 'after the point'],
    ['{"a": 1_000}', '(1:7)', 'underscores'],
    ['{"a": 1,5}', '(1:9)', 'decimal comma'],
    ['{"a": \u22125}', '(1:7)', 'hyphen'],
    ['{"a": \u201cb\u201d}', '(1:7)', 'double quotes'],
    ['{"a": True}', '(1:7)', 'lower case'],
    ['{"a": truest}', '(1:7)', '"truest"'],
    ['{"a": undefined}', '(1:7)', 'leave the key out'],
    ['{"a": 1,, "b": 2}', '(1:9)', 'comma'],
    ['# note\n{}', '(1:1)', 'comment'],
    ['{}\r\n\r{}', '(3:1)', 'after the end'],
    ['{"a":\u00a01}', '(1:6)', '1'],
  ])('refuses %j with its place', (text, ...fragments) => {
    expectRefusal(() => readJson(text), 'E_JSON_SYNTAX', ...fragments);
  });

  it('refuses half characters outside texts as well', () => {
    expectRefusal(() => readJson('[\ud800]'), 'E_ENCODING', '(1:2)');
  });

  it('cuts and escapes what it echoes', () => {
    const { message } = expectRefusal(() => readJson(`[${'\u202e'.repeat(500)}]`), 'E_JSON_SYNTAX', '\\u202e');
    expect(message.length).toBeLessThan(200);
    expect(message).not.toContain('\u202e');
  });

  it('finds the place of every value and key, in all line ends', () => {
    const { positionOf } = readJson('{\n "a": [1,\r\n  {"b\\n" : null}],\r "c": 2\n}');
    expect(positionOf([])).toEqual({ line: 1, column: 1 });
    expect(positionOf(['a'], true)).toEqual({ line: 2, column: 2 });
    expect(positionOf(['a'])).toEqual({ line: 2, column: 7 });
    expect(positionOf(['a', 0])).toEqual({ line: 2, column: 8 });
    expect(positionOf(['a', 1, 'b\n'], true)).toEqual({ line: 3, column: 4 });
    expect(positionOf(['a', 1, 'b\n'])).toEqual({ line: 3, column: 12 });
    expect(positionOf(['c'])).toEqual({ line: 4, column: 7 });
  });

  it('gives the place of what encloses a value that is not there', () => {
    const { positionOf } = readJson('{"a": {"b": 1}}');
    expect(positionOf(['a', 'x', 3])).toEqual({ line: 1, column: 7 });
    expect(positionOf(['x'], true)).toEqual({ line: 1, column: 1 });
    expect(positionOf(['a', 'b', 'toString'])).toEqual({ line: 1, column: 13 });
  });

  it('refuses anything but text', () => {
    expectRefusal(() => readJson(undefined as unknown as string), 'E_MISSING', 'text');
    expectRefusal(() => readJson({} as string), 'E_TYPE', 'text', 'an object');
  });

  const least = (text: string): number => {
    const times = [1, 2, 3, 4].map(() => {
      const start = performance.now();
      expect(onlyRefuses(() => readJson(text))).toBeDefined();
      return performance.now() - start;
    });
    return Math.min(...times);
  };

  it.each([
    ['deep', '['.repeat(1e7)],
    ['deep objects', '{"a":'.repeat(2e6)],
    ['digits', '1'.repeat(1e7)],
    ['one long text', `"${'x'.repeat(1e7)}"`],
    ['blanks', ' '.repeat(1e7)],
    ['quotes', '"'.repeat(1e6)],
  ])('refuses hostile input at once: %s', (_name, text) => {
    expect(least(text)).toBeLessThan(50);
  });

  // Under 50 ms as well on a quiet machine; the margin is for a busy one.
  it.each([
    ['escapes without end', `"${'\\u0041'.repeat(2e6)}`],
    ['backslashes', `"${'\\'.repeat(1e6)}`],
    ['many lists', `[${'[],'.repeat(300_000)}`],
    ['many numbers', `[${'1,'.repeat(500_000)}`],
    ['many keys', `{${Array.from({ length: 90_000 }, (_, index) => `"k${index}":1`).join()}`],
    ['many texts', `[${'"",'.repeat(300_000)}`],
  ])('refuses hostile input soon: %s', (_name, text) => {
    expect(least(text)).toBeLessThan(500);
  });
});
