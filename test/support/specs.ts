import type { GeneralizedChebyshevRequest } from '../../src/approximation/index.js';

/** Requests that between them reach every branch of the synthesis: no, one-sided, symmetric, close, complex and N zeros. */
export const SPECS: readonly (readonly [string, GeneralizedChebyshevRequest])[] = [
  ['1-0', { order: 1, returnLossDb: 20 }],
  ['1-1', { order: 1, returnLossDb: 20, transmissionZeros: [2] }],
  ['2-0', { order: 2, returnLossDb: 15 }],
  ['2-1 below', { order: 2, returnLossDb: 20, transmissionZeros: [-1.8] }],
  ['2-2 canonical', { order: 2, returnLossDb: 20, transmissionZeros: [2.5, -3] }],
  ['3-0', { order: 3, returnLossDb: 20 }],
  ['3-1', { order: 3, returnLossDb: 22, transmissionZeros: [1.6] }],
  [
    '3-2 real pair',
    {
      order: 3,
      returnLossDb: 18,
      transmissionZeros: [
        { re: 2, im: 0 },
        { re: -2, im: 0 },
      ],
    },
  ],
  ['4-2 above', { order: 4, returnLossDb: 22, transmissionZeros: [1.3217, 1.8082] }],
  ['4-2 symmetric', { order: 4, returnLossDb: 20, transmissionZeros: [2, -2] }],
  ['4-4 canonical', { order: 4, returnLossDb: 22, transmissionZeros: [-3.7431, -1.8051, 1.5699, 6.191] }],
  ['5-2 above', { order: 5, returnLossDb: 20, transmissionZeros: [1.28, 1.75] }],
  ['5-4 symmetric', { order: 5, returnLossDb: 25, transmissionZeros: [1.3, -1.3, 2, -2] }],
  ['5-5 canonical', { order: 5, returnLossDb: 20, transmissionZeros: [1.2, 1.5, 4, -1.3, -2] }],
  ['6-2 symmetric', { order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45] }],
  [
    '6-6 canonical with a pair',
    { order: 6, returnLossDb: 20, transmissionZeros: [1.3, -1.4, 2, -3, { re: 1.5, im: 0.4 }, { re: -1.5, im: 0.4 }] },
  ],
  [
    '7-3 complex',
    {
      order: 7,
      returnLossDb: 23,
      transmissionZeros: [-1.2576, { re: 0.9218, im: -0.1546 }, { re: -0.9218, im: -0.1546 }],
    },
  ],
  ['8-3', { order: 8, returnLossDb: 23, transmissionZeros: [-1.3553, 1.1093, 1.218] }],
  [
    '8-4 equalized',
    { order: 8, returnLossDb: 23, transmissionZeros: [1.3, -1.3, { re: 0.85, im: 0 }, { re: -0.85, im: 0 }] },
  ],
  ['9-3 equal zeros', { order: 9, returnLossDb: 20, transmissionZeros: [1.5, 1.5, 1.5] }],
  ['10-2 close', { order: 10, returnLossDb: 20, transmissionZeros: [1.001, -1.001] }],
  ['12-0 weak', { order: 12, returnLossDb: 3 }],
  ['14-4 narrow', { order: 14, returnLossDb: 22, transmissionZeros: [1.05, 1.12, -1.05, -1.12] }],
  [
    '20-6',
    { order: 20, returnLossDb: 25, transmissionZeros: [1.05, 1.3, -1.1, -2, { re: 2, im: 0.3 }, { re: -2, im: 0.3 }] },
  ],
];

/** Orders that belong to the range but are too slow for every test. */
export const LONG_SPECS: readonly (readonly [string, GeneralizedChebyshevRequest])[] = [
  ['40-6', { order: 40, returnLossDb: 20, transmissionZeros: [1.02, 1.1, 1.4, -1.03, -1.2, -1.9] }],
  ['64-4 at 40 dB', { order: 64, returnLossDb: 40, transmissionZeros: [1.1, 1.3, -1.1, -1.3] }],
  ['100-0', { order: 100, returnLossDb: 20 }],
];
