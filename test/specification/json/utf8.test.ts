import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decodeUtf8 } from '../../../src/specification/index.js';
import { expectRefusal, onlyRefuses } from '../refusal.js';

describe('decodeUtf8(bytes)', () => {
  it('gives back any text that was encoded', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
        expect(decodeUtf8(new TextEncoder().encode(text))).toBe(text);
      }),
      { seed: 31, numRuns: 500 },
    );
  });

  it('decodes texts longer than its pieces', () => {
    const text = 'aé滤😀'.repeat(5000);
    expect(decodeUtf8(new TextEncoder().encode(text))).toBe(text);
    expect(decodeUtf8(new Uint8Array(0))).toBe('');
  });

  it('agrees with the strict decoder of the platform on random bytes', () => {
    const strict = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });
    const byte = fc.oneof(
      fc.integer({ min: 0, max: 255 }),
      fc.constantFrom(0xc2, 0xe0, 0xed, 0xf0, 0xf4, 0x80, 0x9f, 0xa0, 0xbf),
    );
    fc.assert(
      fc.property(fc.array(byte, { maxLength: 8 }), (list) => {
        const bytes = new Uint8Array(list);
        let expected: string | undefined;
        try {
          expected = strict.decode(bytes);
        } catch {}
        const failure = onlyRefuses(() => decodeUtf8(bytes));
        expect(failure === undefined).toBe(expected !== undefined);
        if (expected !== undefined) expect(decodeUtf8(bytes)).toBe(expected);
      }),
      { seed: 32, numRuns: 5000 },
    );
  });

  it.each([
    ['overlong', [0x41, 0xc0, 0x80], 'byte 1', '0xc0'],
    ['overlong, three bytes', [0xe0, 0x9f, 0xbf], 'byte 1', '0x9f'],
    ['surrogate', [0xed, 0xa0, 0x80], 'byte 1', '0xa0'],
    ['beyond Unicode', [0xf4, 0x90, 0x80, 0x80], 'byte 1', '0x90'],
    ['cut', [0x41, 0xe2, 0x82], 'byte 3', 'the end'],
    ['stray', [0x80], 'byte 0', '0x80'],
    ['UTF-16', [0xff, 0xfe, 0x7b, 0x00], 'byte 0', 'UTF-16'],
  ])('refuses %s bytes with their offset', (_name, bytes, ...fragments) => {
    expectRefusal(() => decodeUtf8(new Uint8Array(bytes)), 'E_ENCODING', ...fragments);
  });

  it('refuses anything but bytes', () => {
    expectRefusal(() => decodeUtf8('abc' as unknown as Uint8Array), 'E_TYPE', 'bytes');
  });
});
