import { DATE_ALLOWED } from './calendar-date.js';
import { MAX_ORDER } from './order-and-level.js';
import { FREQUENCY_ALLOWED } from './quantity.js';
import { ZERO_ALLOWED } from './zeros/values.js';

/** What a key means (for the JSON Schema) and what it may hold (for messages). */
export interface Term {
  readonly meaning: string;
  readonly allowed: string;
}

const LEVEL = 'a number of dB, or a pair [at fromHz, at toHz]';

/** Every key of the design file, once. */
export const VOCABULARY: Readonly<Record<string, Term>> = {
  $schema: { meaning: 'Where an editor finds the schema of this file; not read.', allowed: 'text' },
  name: { meaning: 'Name of the filter, at most 120 characters.', allowed: 'text of at most 120 characters' },
  notes: { meaning: 'Remarks in free text, at most 1000 characters.', allowed: 'text of at most 1000 characters' },
  revision: {
    meaning: 'Revision of the design, at most 20 characters, for the head of the report.',
    allowed: 'text of at most 20 characters',
  },
  date: {
    meaning: 'Date of the design, YYYY-MM-DD, for the head of the report; nothing else knows what day it is.',
    allowed: DATE_ALLOWED,
  },
  passband: {
    meaning:
      'The passband: lowerHz and upperHz, or centerHz and bandwidthHz. Its width is the equiripple width (half-power for butterworth and bessel, where the return loss is reached for inverseChebyshev).',
    allowed: 'an object with lowerHz and upperHz, or with centerHz and bandwidthHz',
  },
  lowerHz: { meaning: 'Lower edge of the passband, hertz or text with a unit.', allowed: FREQUENCY_ALLOWED },
  upperHz: { meaning: 'Upper edge of the passband, hertz or text with a unit.', allowed: FREQUENCY_ALLOWED },
  centerHz: {
    meaning: 'Geometric center of the passband, the root of the product of its edges, hertz or text with a unit.',
    allowed: FREQUENCY_ALLOWED,
  },
  bandwidthHz: { meaning: 'Width of the passband, hertz or text with a unit.', allowed: FREQUENCY_ALLOWED },
  family: {
    meaning:
      'Family of the transfer function: generalizedChebyshev (default), chebyshev (all-pole), butterworth (all-pole, half-power edges), inverseChebyshev (flat pass band, equal ripple in the stop band), elliptic (equal ripple in both), bessel (all-pole, flat delay, half-power edges).',
    allowed: '"generalizedChebyshev", "chebyshev", "butterworth", "inverseChebyshev", "elliptic" or "bessel"',
  },
  order: { meaning: 'Number of resonators.', allowed: `a number, whole, 1 to ${MAX_ORDER}` },
  returnLossDb: {
    meaning:
      'Return loss, dB, positive: of the equiripple band (at the edges of a flat one), or on a mask line the least return loss.',
    allowed: 'a positive number of dB',
  },
  transmissionZeros: {
    meaning:
      'Finite transmission zeros: numbers w (s = jw, normalized, abs(w) above 1), {re, im} in the normalized s-plane (off the axis in pairs s and -conj(s)), or text with a unit (band-pass frequency). Default: none.',
    allowed: `a list of zeros, each ${ZERO_ALLOWED}`,
  },
  re: { meaning: 'Real part in the normalized s-plane.', allowed: 'a finite number' },
  im: { meaning: 'Imaginary part in the normalized s-plane.', allowed: 'a finite number' },
  topology: {
    meaning: 'Form of the coupling matrix: folded (default), arrow, inline, transversal.',
    allowed: '"folded", "arrow", "inline" or "transversal"',
  },
  portCouplings: {
    meaning:
      'What the ports may touch: any (default), noDirect (no direct source-load coupling, at most N-1 zeros), single (source and load touch one resonator each, at most N-2 zeros).',
    allowed: '"any", "noDirect" or "single"',
  },
  unloadedQ: {
    meaning: 'Unloaded Q: one positive number for all resonators, or a list with one for each. Absent: lossless.',
    allowed: 'a positive number, or a list with one for each resonator',
  },
  mask: { meaning: "Lines of the customer's mask.", allowed: 'a list of mask lines' },
  fromHz: { meaning: 'Lower end of a span, hertz or text with a unit.', allowed: FREQUENCY_ALLOWED },
  toHz: { meaning: 'Upper end of a span, hertz or text with a unit.', allowed: FREQUENCY_ALLOWED },
  relativeTo: {
    meaning: 'center: levels are relative to the loss at the center frequency. Absent: absolute, to available power.',
    allowed: '"center"',
  },
  rejectionDb: {
    meaning:
      'Rejection of the stop band of inverseChebyshev and elliptic, dB; on a mask line the least rejection over the span, dB, or a pair [at fromHz, at toHz].',
    allowed: 'a number of dB, or on a mask line a pair [at fromHz, at toHz]',
  },
  stopBandEdge: {
    meaning:
      'Where the stop band of elliptic starts, normalized (the pass band ends at 1); give this or rejectionDb, the other follows.',
    allowed: 'a normalized frequency above 1',
  },
  largestPairAtInfinity: {
    meaning:
      'Even orders of elliptic: true moves the largest pair of transmission zeros to infinity, so that no direct coupling is needed. Default: false.',
    allowed: 'true or false',
  },
  reflectionSide: {
    meaning:
      'Where the reflection zeros of bessel lie: left (default) or right half plane, or alternating, pair by pair. The delay is the same; the couplings differ.',
    allowed: '"left", "right" or "alternating"',
  },
  insertionLossDb: {
    meaning: 'Greatest insertion loss over the span, dB, or a pair [at fromHz, at toHz].',
    allowed: LEVEL,
  },
  insertionLossVariationDb: {
    meaning: 'Greatest peak-to-peak variation of the insertion loss over the span, dB.',
    allowed: 'a number of dB',
  },
  groupDelayVariationSeconds: {
    meaning: 'Greatest peak-to-peak variation of the group delay over the span, seconds.',
    allowed: 'a number of seconds',
  },
  sweep: {
    meaning: 'Frequencies for the predicted response file.',
    allowed: 'an object with fromHz, toHz and points',
  },
  points: { meaning: 'Number of frequencies, both ends included.', allowed: 'a whole number, 2 to 100001' },
};

/** Keys of each object of the design file, by the path to it with indices left out. */
export const KEYS: Readonly<Record<string, readonly string[]>> = {
  '': [
    '$schema',
    'name',
    'notes',
    'revision',
    'date',
    'passband',
    'family',
    'order',
    'returnLossDb',
    'rejectionDb',
    'stopBandEdge',
    'largestPairAtInfinity',
    'reflectionSide',
    'transmissionZeros',
    'topology',
    'portCouplings',
    'unloadedQ',
    'mask',
    'sweep',
  ],
  passband: ['lowerHz', 'upperHz', 'centerHz', 'bandwidthHz'],
  transmissionZeros: ['re', 'im'],
  mask: [
    'fromHz',
    'toHz',
    'relativeTo',
    'rejectionDb',
    'returnLossDb',
    'insertionLossDb',
    'insertionLossVariationDb',
    'groupDelayVariationSeconds',
  ],
  sweep: ['fromHz', 'toHz', 'points'],
};
