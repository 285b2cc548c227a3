import { describe, expect, it } from 'vitest';
import {
  checkOrder,
  checkReturnLoss,
  checkSpecification,
  checkTransmissionZeros,
  decodeUtf8,
  parseSpecification,
} from '../../src/specification/index.js';
import { expectRefusal, SOUND } from './refusal.js';

type Row = readonly [name: string, run: () => unknown, code: string, ...fragments: string[]];

const spec = (more: object) => () => checkSpecification({ ...SOUND, ...more });
const zeros =
  (list: unknown, order = 6) =>
  () =>
    checkTransmissionZeros(list, order);
const text = (json: string) => () => parseSpecification(json);
/** A design file that is sound but for the members given. */
const file = (members: string) =>
  text(`{\n  "passband": {"lowerHz": "3822 MHz", "upperHz": "3858 MHz"},\n  ${members}\n}`);

const ROWS: readonly Row[] = [
  ['1 order 0', () => checkOrder(0), 'E_ORDER_RANGE', 'order', 'found 0', 'whole', '1 to 100'],
  ['1 order -3', () => checkOrder(-3), 'E_ORDER_RANGE', 'found -3', 'whole'],
  ['1 order 2.5', () => checkOrder(2.5), 'E_ORDER_RANGE', 'found 2.5', 'whole'],
  ['1 order in a file', file('"order": 2.5, "returnLossDb": 22'), 'E_ORDER_RANGE', 'order (3:12)', 'found 2.5'],
  ['2 order 200', () => checkOrder(200), 'E_ORDER_RANGE', '200', '100', 'largest order whose certificates pass'],
  ['3 order quoted', file('"order": "6", "returnLossDb": 22'), 'E_TYPE', 'number', 'string "6"', 'remove the quotes'],
  ['3 level quoted', file('"order": 6, "returnLossDb": "20"'), 'E_TYPE', 'number', 'string "20"', 'remove the quotes'],
  ['3 through the API', () => checkReturnLoss('20'), 'E_TYPE', 'returnLossDb', 'number', 'remove the quotes'],
  ['4 NaN', file('"order": NaN'), 'E_JSON_SYNTAX', '(3:12)', '"NaN"'],
  ['4 Infinity', file('"order": -Infinity'), 'E_JSON_SYNTAX', '(3:12)', '"-Infinity"'],
  ['4 plus', file('"order": +5'), 'E_JSON_SYNTAX', '(3:12)', '"+5"', 'plus'],
  ['4 bare point', file('"order": .5'), 'E_JSON_SYNTAX', '(3:12)', '".5"'],
  ['4 hexadecimal', file('"order": 0x10'), 'E_JSON_SYNTAX', '(3:12)', '"0x10"', 'decimal'],
  ['5 overflow', file('"order": 1e999'), 'E_NUMBER_OVERFLOW', 'order (3:12)', '1e999'],
  ['5 10 MB of digits', file(`"order": ${'1'.repeat(1e7)}`), 'E_NUMBER_OVERFLOW', '40 digits'],
  ['6 NaN', () => checkOrder(Number.NaN), 'E_NOT_FINITE', 'order', 'NaN'],
  ['6 Infinity', () => checkReturnLoss(Number.POSITIVE_INFINITY), 'E_NOT_FINITE', 'returnLossDb', 'Infinity'],
  ['6 -Infinity as a zero', zeros([Number.NEGATIVE_INFINITY]), 'E_NOT_FINITE', 'transmissionZeros[0]', 'leave zeros'],
  ['6 NaN in a pair', zeros([{ re: Number.NaN, im: 2 }]), 'E_NOT_FINITE', 'transmissionZeros[0].re'],
  ['6 BigInt', () => checkOrder(5n), 'E_TYPE', 'order', 'BigInt'],
  ['6 boxed number', () => checkOrder(new Number(5)), 'E_TYPE', 'order', 'Number object'],
  ['6 in an object', spec({ unloadedQ: Number.NaN }), 'E_NOT_FINITE', 'unloadedQ'],
  ['7 level 0', () => checkReturnLoss(0), 'E_RL_RANGE', 'positive', 'dB', 'did you mean 20?'],
  ['7 level -20', () => checkReturnLoss(-20), 'E_RL_RANGE', 'positive', 'dB', 'did you mean 20?'],
  ['8 level 1e-12', () => checkReturnLoss(1e-12), 'E_RL_RANGE', '0.01', '100', 'abs(S11)^2', '157 dB'],
  ['8 level 400', () => checkReturnLoss(400), 'E_RL_RANGE', '0.01', '100', 'abs(S11)^2', '157 dB'],
  ['9 zero inside', zeros([2, { re: 0, im: 0.5 }]), 'E_ZERO_IN_PASSBAND', '[1]', '0.5j', 'abs(w) < 1'],
  [
    '9 with hertz',
    spec({ transmissionZeros: ['3840 MHz'] }),
    'E_ZERO_IN_PASSBAND',
    '[0]',
    '3840000000 Hz',
    '3822000000',
  ],
  ['10 zero on the edge', zeros([-1]), 'E_ZERO_ON_EDGE', 'S21 cannot be 0', 'return loss'],
  ['10 as a frequency', spec({ transmissionZeros: ['3858 MHz'] }), 'E_ZERO_ON_EDGE', '3858000000 Hz'],
  [
    '12 seven zeros',
    zeros(Array(7).fill(2)),
    'E_ZERO_COUNT',
    '7',
    'N = 6',
    'N-1',
    'without direct',
    'N-2',
    'touch one',
  ],
  [
    '13 N zeros',
    spec({ transmissionZeros: Array(6).fill(2), portCouplings: 'noDirect' }),
    'E_ZERO_TOPOLOGY',
    'portCouplings',
    'direct source-load',
    'remove 1',
  ],
  [
    '13 N-1 zeros',
    spec({ transmissionZeros: Array(5).fill(2), portCouplings: 'single' }),
    'E_ZERO_TOPOLOGY',
    'portCouplings',
    '"any"',
    'remove 1',
  ],
  ['14 alone', zeros([{ re: 0.3, im: 1.2 }]), 'E_ZERO_PAIR', '0.3+1.2j', '-0.3+1.2j', 'not the conjugate'],
  [
    '14 conjugate',
    zeros([
      { re: 0.3, im: 1.2 },
      { re: 0.3, im: -1.2 },
    ]),
    'E_ZERO_PAIR',
    '-0.3+1.2j',
    'not the conjugate',
  ],
  [
    '14 multiplicity',
    zeros([
      { re: 0.3, im: 1.2 },
      { re: -0.3, im: 1.2 },
      { re: 0.3, im: 1.2 },
    ]),
    'E_ZERO_PAIR',
    '2 times',
    '1 times',
    'unequal multiplicity',
  ],
  [
    '15 off by 1e-9',
    zeros([
      { re: 0.3, im: 1.2 },
      { re: -0.3, im: 1.200000001 },
    ]),
    'E_ZERO_PAIR',
    '0.3+1.2j',
    '-0.3+1.200000001j',
    'e-9',
  ],
  ['18 zero at 0', zeros([0]), 'E_ZERO_IN_PASSBAND', '0j'],
  [
    '20 null',
    file('"order": 6, "returnLossDb": 22, "transmissionZeros": null'),
    'E_TYPE',
    'transmissionZeros (3:56)',
    'null',
  ],
  ['20 null through the API', zeros(null), 'E_TYPE', 'null'],
  ['20 missing where it is an argument', zeros(undefined), 'E_MISSING', 'transmissionZeros'],
  ['21 inf', zeros(['inf']), 'E_ZERO_RANGE', 'leave zeros at infinity out'],
  [
    '21 Infinity in a file',
    file('"order": 6, "returnLossDb": 22, "transmissionZeros": ["-Infinity"]'),
    'E_ZERO_RANGE',
    'infinity out',
  ],
  ['21 j1e308', zeros([1e308]), 'E_ZERO_RANGE', '10000'],
  [
    '21 complex 1e308',
    zeros([
      { re: 1e308, im: 1e308 },
      { re: -1e308, im: 1e308 },
    ]),
    'E_ZERO_RANGE',
    '10000',
  ],
  ['21 a million', zeros(Array(1e6).fill(2)), 'E_ZERO_RANGE', '1000000 zeros', '100'],
  ['21 a million in a specification', spec({ transmissionZeros: Array(1e6).fill(2) }), 'E_ZERO_RANGE', '1000000 zeros'],
  ['22 key twice', file('"order": 6,\n  "order": 7'), 'E_JSON_DUPLICATE', 'order (4:3)', '(3:3)'],
  ['22 key twice, escaped', text('{"a": 1, "\\u0061": 2}'), 'E_JSON_DUPLICATE', '(1:10)', '(1:2)'],
  ['23 misspelled', file('"order": 6, "retrunLoss": 22'), 'E_UNKNOWN_KEY', 'retrunLoss (3:15)', 'returnLossDb'],
  ['24 __proto__', file('"__proto__": {}'), 'E_FORBIDDEN_KEY', '__proto__ (3:3)'],
  ['24 escaped', file('"\\u005f\\u005fproto__": {}'), 'E_FORBIDDEN_KEY', '__proto__ (3:3)'],
  ['24 constructor', file('"constructor": {}'), 'E_FORBIDDEN_KEY', 'constructor (3:3)'],
  ['24 prototype', file('"prototype": {}'), 'E_FORBIDDEN_KEY', 'prototype (3:3)'],
  [
    '24 through the API',
    () => checkSpecification(JSON.parse('{"__proto__": {"order": 3}}')),
    'E_FORBIDDEN_KEY',
    '__proto__',
  ],
  ['25 depth 17', text('['.repeat(17)), 'E_JSON_DEPTH', '(1:17)', '17', '16'],
  ['25 depth 17, mixed', text(`{"mask": ${'['.repeat(16)}`), 'E_JSON_DEPTH', '(1:25)'],
  ['25 depth 1e7', text('['.repeat(1e7)), 'E_JSON_DEPTH', '16'],
  ['26 too long', text(' '.repeat(1_048_577)), 'E_FILE_SIZE', '1048576'],
  ['27 byte-order mark', text('\ufeff{}'), 'E_ENCODING', '(1:1)', 'byte-order mark'],
  ['27 comment', file('// remark'), 'E_JSON_SYNTAX', '(3:3)', '"//"', 'comment'],
  ['27 block comment', file('/* remark */'), 'E_JSON_SYNTAX', '(3:3)', 'comment'],
  ['27 trailing comma', text('{"order": 6,}'), 'E_JSON_SYNTAX', '(1:13)', 'trailing comma'],
  ['27 bad UTF-8', () => decodeUtf8(new Uint8Array([0x7b, 0xff])), 'E_ENCODING', 'byte 1', '0xff'],
  ['27 lone surrogate', text('{"name": "\ud800"}'), 'E_ENCODING', 'name (1:10)'],
  ['27 lone surrogate, escaped', text('{"name": "a\\udc00"}'), 'E_ENCODING', 'name (1:10)', '\\udc00'],
  ['27 text after the end', text('{} x'), 'E_JSON_SYNTAX', '(1:4)', '"x"', 'after the end'],
  ['28 NUL', file('"order": 6, "returnLossDb": 22, "name": "a\\u0000b"'), 'E_NAME', 'name (3:43)', '\\u0000'],
  ['28 direction mark', spec({ name: 'abc\u202etxt' }), 'E_NAME', '\\u202e'],
  ['28 a megabyte', spec({ name: 'a'.repeat(1e6) }), 'E_NAME', '1000000', '120'],
  [
    '28 revision',
    file('"order": 6, "returnLossDb": 22, "revision": "a\\u202eb"'),
    'E_NAME',
    'revision (3:47)',
    '\\u202e',
  ],
  [
    '28 no date',
    spec({ date: '1 December 2026' }),
    'E_DATE',
    'the string "1 December 2026"',
    'YYYY-MM-DD',
    '"2026-12-01"',
  ],
  ['28 no such day', file('"order": 6, "returnLossDb": 22, "date": "2026-02-29"'), 'E_DATE', 'date (3:43)', '28 days'],
  ['28 no such month', spec({ date: '2026-13-01' }), 'E_DATE', '2026-13-01', '01 to 12'],
  ['28 day 0', spec({ date: '2026-04-00' }), 'E_DATE', '30 days'],
  ['28 leap century', spec({ date: '1900-02-29' }), 'E_DATE', '28 days'],
  ['28 a year before the calendar', spec({ date: '1582-10-15' }), 'E_DATE', '1583'],
  ['28 date with marks', spec({ date: '2026-12-01\u202e' }), 'E_DATE', '\\u202e'],
  ['28 digits of another script', spec({ date: '２０２６-12-01' }), 'E_DATE'],
  ['29 center 0', spec({ passband: { centerHz: 0, bandwidthHz: 5 } }), 'E_BAND', '-2.5 Hz', '2.5 Hz'],
  ['29 width negative', spec({ passband: { centerHz: 100, bandwidthHz: -10 } }), 'E_BAND', '105 Hz', '95 Hz'],
  [
    '29 exchanged',
    spec({ passband: { lowerHz: '2558 MHz', upperHz: '2516 MHz' } }),
    'E_BAND',
    '2558000000 Hz',
    '2516000000 Hz',
    'exchange',
  ],
  ['29 equal', spec({ passband: { lowerHz: 5, upperHz: 5 } }), 'E_BAND', '5 Hz and 5 Hz'],
  [
    '29 too wide',
    spec({ passband: { centerHz: '12.1 MHz', bandwidthHz: '54 MHz' } }),
    'E_BAND',
    '-14900000 Hz',
    '39100000 Hz',
    'units',
  ],
  ['29 just too wide', spec({ passband: { centerHz: 10, bandwidthHz: 20 } }), 'E_BAND', '0 Hz', '20 Hz'],
  [
    '30 in-line with zeros',
    spec({ topology: 'inline', transmissionZeros: [1.5] }),
    'E_TOPOLOGY_ZEROS',
    'k = 6',
    'N-k',
    '0',
  ],
];

describe('bad input', () => {
  for (const [name, run, code, ...fragments] of ROWS) {
    it(name, () => {
      const failure = expectRefusal(run, code, ...fragments);
      expect(failure.message.length).toBeLessThan(4000);
    });
  }
});

describe('input that looks bad and is not', () => {
  it('11 a zero a hair outside the edge is tried', () => {
    expect(checkTransmissionZeros([1 + 1e-12], 3).zeros).toEqual([{ re: 0, im: 1 + 1e-12 }]);
  });
  it('16 a threefold zero keeps its multiplicity', () => {
    expect(checkTransmissionZeros([1.5, 1.5, 1.5], 4)).toEqual({
      zeros: Array(3).fill({ re: 0, im: 1.5 }),
      remarks: [],
    });
  });
  it('17 two zeros 1e-9 apart are accepted with a condition number', () => {
    const { zeros, remarks } = checkTransmissionZeros([1.5, 1.500000001], 4);
    expect(zeros).toHaveLength(2);
    expect(remarks.join()).toMatch(/1\.00e-9 apart, condition number .* 1\.50e\+9/);
  });
  it('18 a real-axis pair is accepted', () => {
    expect(
      checkTransmissionZeros(
        [
          { re: 0.8, im: 0 },
          { re: -0.8, im: 0 },
        ],
        4,
      ).remarks,
    ).toEqual([]);
  });
  it('20 no zeros, or none listed, is all-pole', () => {
    expect(checkSpecification(SOUND).transmissionZeros).toEqual([]);
    expect(checkSpecification({ ...SOUND, transmissionZeros: [] }).transmissionZeros).toEqual([]);
  });
  it.each(['2026-12-01', '2024-02-29', '2000-02-29', '1583-01-01', '9999-12-31'])('28 the date %s is a day', (date) => {
    expect(checkSpecification({ ...SOUND, date }).date).toBe(date);
  });
  it.each(['<script>', '=1+1', '../x', '"; DROP', 'Füllhorn 滤波器 😀'])(
    '28 the name %s is kept as written',
    (name) => {
      expect(checkSpecification({ ...SOUND, name }).name).toBe(name);
    },
  );
});
