import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkMask } from '../../src/specification/index.js';
import { expectRefusal } from './refusal.js';

/** The frequency that a text stands for, seen through a door that reads texts. */
function hertz(text: string): number | undefined {
  return checkMask([{ fromHz: text, rejectionDb: 1 }])[0]?.fromHz;
}

describe('frequency text', () => {
  it.each([
    ['8.2 GHz', 8_200_000_000],
    ['2.45GHz', 2_450_000_000],
    ['3822 MHz', 3_822_000_000],
    ['100 kHz', 100_000],
    ['3.5e9 Hz', 3_500_000_000],
    ['3.5E-3 THz', 3_500_000_000],
    ['+12 MHz', 12_000_000],
    ['  12   MHz ', 12_000_000],
    ['0012.50 kHz', 12_500],
  ])('%j is exactly %d Hz', (text, expected) => {
    expect(hertz(text)).toBe(expected);
  });

  it('moves the decimal point in the text, so that three-decimal GHz are whole hertz', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 99_999 }), (thousandths) => {
        const text = `${Math.floor(thousandths / 1000)}.${String(thousandths % 1000).padStart(3, '0')} GHz`;
        expect(hertz(text)).toBe(thousandths * 1_000_000);
      }),
      { seed: 41, numRuns: 1000 },
    );
  });

  it.each([
    ['2,45 GHz', '"2.45 GHz"'],
    ['\u22125 MHz', 'hyphen'],
    ['3822', 'add the unit'],
    ['3822 mhz', 'MHz: its case matters'],
    ['3822 mHz', 'MHz: its case matters'],
    ['100 KHz', 'kHz: its case matters'],
    ['3.8 G', 'units Hz, kHz, MHz, GHz, THz'],
    ['3.8\u00a0GHz', 'ordinary space'],
    ['GHz', 'digits'],
    ['', 'digits'],
    ['1.2.3 GHz', 'digits'],
    ['.5 GHz', 'digits'],
    ['5. GHz', 'digits'],
    ['0x10 Hz', 'digits'],
    [`${'1 '.repeat(1e5)}`, 'digits'],
  ])('%j is refused with a way out', (text, fragment) => {
    expectRefusal(() => hertz(text), 'E_QUANTITY', 'mask[0].fromHz', fragment);
  });

  it.each(['1e999 Hz', `1e${'9'.repeat(30)} GHz`, `${'1'.repeat(41)} Hz`])('%j overflows', (text) => {
    expectRefusal(() => hertz(text), 'E_NUMBER_OVERFLOW');
  });
});
