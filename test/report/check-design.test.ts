import { describe, expect, it } from 'vitest';
import {
  bandPicture,
  designPictures,
  FilterFailure,
  groupDelayPicture,
  handOverCsv,
  matrixCsv,
  matrixPicture,
  polesAndZerosPicture,
  reportHtml,
  reportMarkdown,
  resonatorPicture,
  responsePicture,
  responseText,
  resultJson,
  routingPicture,
  summaryText,
} from '../../src/index.js';
import { sampleDesign } from './designs.js';

const DESIGN = sampleDesign({ unloadedQ: 2000, mask: [{ fromHz: '1.03 GHz', rejectionDb: 20 }] });
const SOURCE = { file: 'x.json', sha256: '0'.repeat(64) };

const OF_DESIGN: readonly (readonly [string, (design: never) => unknown])[] = [
  ['responsePicture', responsePicture],
  ['bandPicture', bandPicture],
  ['groupDelayPicture', groupDelayPicture],
  ['designPictures', designPictures],
  ['reportHtml', reportHtml],
  ['reportMarkdown', reportMarkdown],
  ['summaryText', summaryText],
  ['handOverCsv', handOverCsv],
  ['responseText', responseText],
  ['resultJson', (design) => resultJson(design, SOURCE)],
];

const OF_MATRIX: readonly (readonly [string, (matrix: never) => unknown])[] = [
  ['matrixCsv', matrixCsv],
  ['matrixPicture', matrixPicture],
  ['routingPicture', routingPicture],
  ['resonatorPicture', (matrix) => resonatorPicture(matrix, { centerHz: 1e9, bandwidthHz: 20e6 })],
];

const without = (key: string): unknown => ({ ...DESIGN, [key]: undefined });
const withSpecification = (more: object): unknown => ({
  ...DESIGN,
  specification: { ...DESIGN.specification, ...more },
});

const WRONG: readonly (readonly [string, unknown])[] = [
  ['nothing', undefined],
  ['null', null],
  ['a text', 'x'],
  ['an empty object', {}],
  ['a list', []],
  ...['version', 'specification', 'polynomials', 'matrix', 'handOver', 'mask', 'certificates'].map(
    (key) => [`no ${key}`, without(key)] as const,
  ),
  ['a name that is a number', withSpecification({ name: 5 })],
  ['no order', withSpecification({ order: undefined })],
  ['no family', withSpecification({ family: undefined })],
  ['a band of NaN', withSpecification({ band: { centerHz: Number.NaN, bandwidthHz: 1 } })],
];

describe.each(OF_DESIGN)('%s', (_, run) => {
  it('takes a design', () => {
    expect(run(DESIGN as never)).toBeDefined();
  });

  it.each(WRONG)('refuses %s with FilterFailure', (__, wrong) => {
    expect(() => run(wrong as never)).toThrow(FilterFailure);
  });
});

describe.each(OF_MATRIX)('%s', (_, run) => {
  it.each([
    ['nothing', undefined],
    ['an empty object', {}],
    [
      'a matrix that is not symmetric',
      {
        order: 1,
        values: [
          [0, 1, 0],
          [2, 0, 1],
          [0, 1, 0],
        ],
      },
    ],
    [
      'NaN',
      {
        order: 1,
        values: [
          [0, Number.NaN, 0],
          [Number.NaN, 0, 1],
          [0, 1, 0],
        ],
      },
    ],
    [
      'a missing row',
      {
        order: 2,
        values: [
          [0, 1, 0],
          [1, 0, 1],
          [0, 1, 0],
        ],
      },
    ],
  ])('refuses %s with FilterFailure', (__, wrong) => {
    expect(() => run(wrong as never)).toThrow(FilterFailure);
  });

  it('reads rows of typed arrays as rows of numbers', () => {
    const values = [Float64Array.of(0, 1, 0), Float64Array.of(1, 0.5, 1), Float64Array.of(0, 1, 0)];
    const plain = { order: 1, values: values.map((row) => [...row]) };
    expect(run({ order: 1, values } as never)).toEqual(run(plain as never));
  });
});

describe('a band that is missing', () => {
  it.each([undefined, null, {}, { centerHz: 1e9 }])('%j: resonatorPicture refuses', (band) => {
    expect(() => resonatorPicture(DESIGN.matrix, band as never)).toThrow(FilterFailure);
  });

  it.each([null, {}, 5])('%j: routingPicture refuses', (band) => {
    expect(() => routingPicture(DESIGN.matrix, band as never)).toThrow(FilterFailure);
  });

  it('polesAndZerosPicture refuses what is no transfer function', () => {
    for (const wrong of [undefined, null, {}, 'x'])
      expect(() => polesAndZerosPicture(wrong as never)).toThrow(FilterFailure);
  });
});
