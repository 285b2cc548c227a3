import type { Complex, Design } from '../../src/index.js';

/** A number that a cell must show, with so many decimals at least; text must stand as it is; undefined is not looked at. */
export type Expected = { readonly value: number; readonly decimals: number } | string | undefined;

/** Rows of a table. */
export type ExpectedTable = readonly (readonly Expected[])[];

const MEGA = 1e6;
const NANO = 1e9;

const number = (value: number, decimals: number): Expected => ({ value, decimals });
const megahertz = (hertz: number | undefined): Expected => (hertz === undefined ? 'open' : number(hertz / MEGA, 0));

type MaskRow = Design['mask'][number];

/** Factor to the unit of a requirement, and decimals: 2 for losses, 1 for the other decibels, delays in ns. */
function scaleOf({ line }: MaskRow): readonly [number, number] {
  if ('groupDelayVariationSeconds' in line) return [NANO, 1];
  return 'insertionLossDb' in line || 'insertionLossVariationDb' in line ? [1, 2] : [1, 1];
}

/** The mask of the first page; a miss would be printed without its sign, but no fixture has one. */
function requirements({ mask }: Design): ExpectedTable {
  return mask.map((row) => {
    const [scale, decimals] = scaleOf(row);
    const values = [row.limit, row.predicted, row.margin].map((value) => number(value * scale, decimals));
    return [undefined, undefined, ...values, undefined];
  });
}

function maskPoints({ mask }: Design): ExpectedTable {
  return mask.map((row) => {
    const [scale, decimals] = scaleOf(row);
    const fine = scale === NANO ? 3 : Math.max(decimals, 2);
    const share = (100 * row.margin) / Math.abs(row.limit);
    return [
      undefined,
      megahertz(row.line.fromHz),
      megahertz(row.line.toHz),
      number(row.limit * scale, decimals),
      number(row.predicted * scale, fine),
      number(row.margin * scale, fine),
      share > 1000 ? 'over 1000' : number(share, 1),
      row.worstHz === null ? 'far above' : number(row.worstHz / MEGA, 3),
    ];
  });
}

/** Words of a coupling; the sign is said by a lozenge too. */
function kindOf(kind: string, m: number): string {
  return m < 0 ? `◇ ${kind}, negative` : kind;
}

/** Entries of the matrix between resonators, in the order of the hand-over, then source to load. */
function couplings({ handOver, matrix }: Design): ExpectedTable {
  const rows = handOver.couplings.map(({ between: [i, j], k, bandwidthHz }) => {
    const m = matrix.values[i]?.[j] as number;
    return [
      `${i} – ${j}`,
      kindOf(j - i === 1 ? 'main' : 'cross', m),
      number(m, 4),
      number(k, 6),
      number(bandwidthHz / MEGA, 3),
    ];
  });
  const direct = matrix.values[0]?.[matrix.order + 1] as number;
  return direct === 0 ? rows : [...rows, ['S – L', kindOf('direct', direct), number(direct, 4), '', '']];
}

function resonators({ handOver, matrix, specification }: Design): ExpectedTable {
  const { band, unloadedQ } = specification;
  return handOver.resonators.map(({ frequencyHz }, n) => [
    String(n + 1),
    number(frequencyHz / MEGA, 3),
    number((frequencyHz - band.centerHz) / MEGA, 3),
    number(matrix.values[n + 1]?.[n + 1] as number, 4),
    ...(unloadedQ === undefined ? [] : [String(typeof unloadedQ === 'number' ? unloadedQ : unloadedQ[n])]),
  ]);
}

/** Both ports of a filter whose ports touch one resonator each. */
function ports({ handOver, matrix }: Design): ExpectedTable {
  return (['source', 'load'] as const).map((port) => {
    const [from, to] = port === 'source' ? [0, 1] : [matrix.order, matrix.order + 1];
    return [
      port === 'source' ? 'source, S – 1' : `load, ${matrix.order} – L`,
      number(matrix.values[from]?.[to] as number, 4),
      number(handOver.externalQ[port] as number, 1),
      number((handOver.reflectedDelaySeconds[port] as number) * NANO, 3),
    ];
  });
}

function matrix({ matrix: { order, values } }: Design): ExpectedTable {
  const names = ['S', ...Array.from({ length: order }, (_, n) => String(n + 1)), 'L'];
  return values.map((row, n) => [names[n], ...row.map((value) => (value === 0 ? '·' : number(value, 4)))]);
}

function certificates({ certificates: all }: Design): ExpectedTable {
  return all.map(({ check, value, limit, holds }) => [
    check,
    number(value, 0),
    number(limit, 0),
    holds ? 'holds' : 'fails',
  ]);
}

/** Twelve figures; decimals are counted elsewhere. */
function pairs(name: string, values: readonly Complex[], names: (n: number) => string): ExpectedTable {
  return values.map(({ re, im }, n) => [`${name} ${names(n)}`, number(re, 0), number(im, 0)]);
}

function roots({ polynomials }: Design): ExpectedTable {
  const count = (n: number): string => String(n + 1);
  return [
    ...pairs('E', polynomials.poles, count),
    ...pairs('F', polynomials.reflectionZeros, count),
    ...pairs('P', polynomials.transmissionZeros, count),
  ];
}

function coefficients({ coefficients: { e, f, p, epsilon, epsilonR } }: Design): ExpectedTable {
  const power = (n: number): string => `s${String(n).replace(/\d/g, (digit) => '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(digit)] as string)}`;
  return [
    ...pairs('E', e, power),
    ...pairs('F', f, power),
    ...pairs('P', p, power),
    ['ε', number(epsilon, 0), ''],
    ['εR', number(epsilonR, 0), ''],
  ];
}

/** Zeros of fixtures all lie on the axis. */
function inputZeros({ specification: { transmissionZeros, band } }: Design): ExpectedTable {
  return transmissionZeros.map(({ im }, n) => {
    const x = (im * band.bandwidthHz) / band.centerHz / 2;
    const hertz = band.centerHz * (x + Math.sqrt(1 + x * x));
    return [String(n + 1), '0', number(im, 0), number(hertz / MEGA, 3)];
  });
}

function inputMask({ mask }: Design): ExpectedTable {
  return mask.map((row, n) => {
    const [scale] = scaleOf(row);
    const { fromHz, toHz } = row.line;
    const limit = number(row.limit * scale, 0);
    return [String(n + 1), undefined, megahertz(fromHz), megahertz(toHz), limit, 'absolute'];
  });
}

/** Every table of numbers that a report holds, made from the result beside it. */
export const EXPECTED_TABLES: Readonly<Record<string, (design: Design) => ExpectedTable>> = {
  requirements,
  'mask-points': maskPoints,
  couplings,
  resonators,
  ports,
  matrix,
  certificates,
  roots,
  coefficients,
  'input-zeros': inputZeros,
  'input-mask': inputMask,
};
