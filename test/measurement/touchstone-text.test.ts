import { describe, expect, it } from 'vitest';
import { chebyshev, FilterFailure, formatTouchstone, sweepHz, type TwoPortData } from '../../src/index.js';
import { readTwoPort } from './read-two-port.js';

const samples = (re: readonly number[], im: readonly number[]) => ({ re, im });
const DATA: TwoPortData = {
  frequenciesHz: [1e9, 2e9],
  s11: samples([0.1, -0.2], [0.3, 0.4]),
  s21: samples([1, 1e-300], [-0, 5e-324]),
  s12: samples([2, 1 / 3], [0.5, -1e-7]),
  s22: samples([0.7, Math.PI], [1e21, 0]),
};

function codeOf(run: () => unknown): string {
  try {
    run();
  } catch (error) {
    if (error instanceof FilterFailure) return error.code;
    throw error;
  }
  return 'no refusal';
}

describe('formatTouchstone(data)', () => {
  it('writes hertz, real and imaginary parts, 21 before 12, digits that read back to the same bits', () => {
    const { option, records } = readTwoPort(formatTouchstone(DATA));
    expect(option).toBe('# Hz S RI R 50');
    expect(records).toEqual([
      [1e9, 0.1, 0.3, 1, 0, 2, 0.5, 0.7, 1e21],
      [2e9, -0.2, 0.4, 1e-300, 5e-324, 1 / 3, -1e-7, Math.PI, 0],
    ]);
  });

  it('holds a sweep bit for bit', () => {
    const grid = Array.from({ length: 201 }, (_, n) => 0.97e9 + n * 0.3e6);
    const band = { centerHz: 1e9, bandwidthHz: 20e6, unloadedQ: 2000 };
    const response = sweepHz(chebyshev({ order: 5, returnLossDb: 20 }), band, grid);
    const { records } = readTwoPort(formatTouchstone(response));
    expect(records).toHaveLength(201);
    records.forEach((record, n) => {
      const { s11, s21, s12, s22 } = response;
      const expected = [s11, s21, s12, s22].flatMap(({ re, im }) => [re[n]! + 0, im[n]! + 0]);
      expect(record).toEqual([grid[n], ...expected]);
    });
  });

  it('keeps a comment on its line and in ASCII', () => {
    const comments = ['plain', 'two\nlines # Hz S MA\r9 9 9', 'Größe \u202e ! 日', ''];
    const text = formatTouchstone({ ...DATA, comments, referenceOhms: 75 });
    expect(readTwoPort(text).records).toHaveLength(2);
    expect(readTwoPort(text).option).toBe('# Hz S RI R 75');
    expect(text.split('\n').slice(0, 4)).toEqual(['! plain', '! two lines # Hz S MA 9 9 9', '! Gr??e ? ! ?', '!']);
    expect(/^[\x20-\x7e\n]*$/.test(text)).toBe(true);
  });

  it.each<readonly [string, object, string]>([
    ['no frequency', { frequenciesHz: [] }, 'E_TS_EMPTY'],
    ['a shorter list', { s21: samples([1], [1, 2]) }, 'E_TS_COUNT'],
    ['a negative frequency', { frequenciesHz: [-1, 1] }, 'E_TS_FREQUENCY'],
    ['a repeated frequency', { frequenciesHz: [1, 1] }, 'E_TS_ORDER'],
    ['a falling frequency', { frequenciesHz: [2, 1] }, 'E_TS_ORDER'],
    ['NaN', { s11: samples([Number.NaN, 1], [0, 0]) }, 'E_NOT_FINITE'],
    ['Infinity', { frequenciesHz: [1, Number.POSITIVE_INFINITY] }, 'E_NOT_FINITE'],
    ['text for a number', { s11: samples(['1' as unknown as number, 1], [0, 0]) }, 'E_TYPE'],
    ['a missing parameter', { s22: undefined }, 'E_TYPE'],
    ['no ohms', { referenceOhms: 0 }, 'E_TS_OPTION'],
    ['endless ohms', { referenceOhms: Number.POSITIVE_INFINITY }, 'E_TS_OPTION'],
  ])('refuses %s', (_, part, code) => {
    expect(codeOf(() => formatTouchstone({ ...DATA, ...part }))).toBe(code);
  });

  it('refuses what is no object', () => {
    expect(codeOf(() => formatTouchstone(null as unknown as TwoPortData))).toBe('E_TYPE');
  });
});
