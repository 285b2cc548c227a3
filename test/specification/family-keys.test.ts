import { describe, expect, it } from 'vitest';
import {
  checkRejection,
  checkSpecification,
  checkStopBandEdge,
  parseSpecification,
} from '../../src/specification/index.js';
import { expectRefusal } from './refusal.js';

const passband = { lowerHz: 3822e6, upperHz: 3858e6 };
const spec = (more: object) => () => checkSpecification({ passband, order: 6, ...more });
const elliptic = (more: object) => spec({ family: 'elliptic', returnLossDb: 20, ...more });
const inverse = (more: object) => spec({ family: 'inverseChebyshev', returnLossDb: 20, ...more });

type Row = readonly [name: string, run: () => unknown, code: string, ...fragments: string[]];

const ROWS: readonly Row[] = [
  ['no level', elliptic({}), 'E_MISSING', 'rejectionDb', 'one of rejectionDb and stopBandEdge', 'add'],
  ['both', elliptic({ rejectionDb: 50, stopBandEdge: 1.2 }), 'E_STOP_BAND', 'stopBandEdge', 'remove one'],
  ['level 0', elliptic({ rejectionDb: 0 }), 'E_REJECTION_RANGE', 'found 0', '0.1 to 300', 'raise it'],
  ['level negative', elliptic({ rejectionDb: -50 }), 'E_REJECTION_RANGE', 'did you mean 50?'],
  ['level too large', elliptic({ rejectionDb: 400 }), 'E_REJECTION_RANGE', 'lower it'],
  ['level as a pair', elliptic({ rejectionDb: [50, 60] }), 'E_TYPE', 'rejectionDb'],
  ['level as text', elliptic({ rejectionDb: '50' }), 'E_TYPE', 'rejectionDb', 'remove the quotes'],
  ['edge in the band', elliptic({ stopBandEdge: 0.9 }), 'E_STOP_BAND', 'above 1', 'pass band ends at 1'],
  ['edge as text', elliptic({ stopBandEdge: '3870 MHz' }), 'E_TYPE', 'stopBandEdge', 'above 1'],
  [
    'move, odd',
    elliptic({ order: 5, rejectionDb: 50, largestPairAtInfinity: true }),
    'E_ORDER_RANGE',
    'even',
    'order 5',
  ],
  ['move, no truth', elliptic({ rejectionDb: 50, largestPairAtInfinity: 1 }), 'E_TYPE', 'true or false'],
  ['zeros given', elliptic({ rejectionDb: 50, transmissionZeros: [2] }), 'E_ZERO_COUNT', 'places its own', 'remove'],
  [
    'in-line',
    elliptic({ rejectionDb: 50, topology: 'inline' }),
    'E_TOPOLOGY_ZEROS',
    '6 zeros',
    'choose another family',
  ],
  [
    'no direct coupling',
    elliptic({ rejectionDb: 50, portCouplings: 'noDirect' }),
    'E_ZERO_TOPOLOGY',
    '6 zeros',
    'largestPairAtInfinity',
  ],
  [
    'one resonator a port, odd',
    elliptic({ order: 5, rejectionDb: 50, portCouplings: 'single' }),
    'E_ZERO_TOPOLOGY',
    '4 zeros',
    'choose another family',
  ],
  ['no return loss', spec({ family: 'elliptic', rejectionDb: 50 }), 'E_MISSING', 'returnLossDb'],
  ['inverse, no level', inverse({}), 'E_MISSING', 'rejectionDb', 'add "rejectionDb"'],
  ['inverse, edge', inverse({ rejectionDb: 50, stopBandEdge: 2 }), 'E_FAMILY_KEY', 'stopBandEdge', '"elliptic"'],
  ['inverse, no direct', inverse({ rejectionDb: 50, portCouplings: 'noDirect' }), 'E_ZERO_TOPOLOGY', 'another family'],
  ['stranger', spec({ returnLossDb: 20, rejectionDb: 50 }), 'E_FAMILY_KEY', '"generalizedChebyshev"', '"elliptic"'],
  ['stranger of bessel', elliptic({ rejectionDb: 50, reflectionSide: 'left' }), 'E_FAMILY_KEY', '"bessel"'],
  ['bessel, return loss', spec({ family: 'bessel', returnLossDb: 20 }), 'E_RL_RANGE', '"bessel"', 'half-power'],
  ['bessel, side', spec({ family: 'bessel', reflectionSide: 'both' }), 'E_CHOICE', '"alternating"'],
  ['bessel, order 49', spec({ family: 'bessel', order: 49 }), 'E_ORDER_RANGE', '1 to 48', '"alternating"'],
  [
    'bessel, order 61',
    spec({ family: 'bessel', order: 61, reflectionSide: 'alternating' }),
    'E_ORDER_RANGE',
    '1 to 60',
  ],
  ['bessel, zeros', spec({ family: 'bessel', transmissionZeros: [2] }), 'E_ZERO_COUNT', 'at infinity'],
  ['unknown family', spec({ family: 'eliptic', returnLossDb: 20 }), 'E_CHOICE', 'did you mean "elliptic"?'],
  ['misspelled key', elliptic({ rejectionDB: 50 }), 'E_UNKNOWN_KEY', 'rejectionDb'],
  ['checkRejection', () => checkRejection('50'), 'E_TYPE', 'rejectionDb'],
  ['checkRejection of nothing', () => checkRejection(undefined), 'E_MISSING', 'rejectionDb'],
  ['checkStopBandEdge', () => checkStopBandEdge(1), 'E_STOP_BAND', 'stopBandEdge'],
  [
    'in a file, with its place',
    () =>
      parseSpecification(
        '{"passband": {"lowerHz": 1e9, "upperHz": 2e9},\n "order": 4, "family": "chebyshev",\n "returnLossDb": 20, "rejectionDb": 50}',
      ),
    'E_FAMILY_KEY',
    'rejectionDb (3:22)',
  ],
];

describe('keys of single families', () => {
  for (const [name, run, code, ...fragments] of ROWS) {
    it(name, () => {
      expectRefusal(run, code, ...fragments);
    });
  }

  it('are kept where they belong', () => {
    const moved = elliptic({ stopBandEdge: 1.2, largestPairAtInfinity: true, portCouplings: 'noDirect' })();
    expect(moved).toMatchObject({ stopBandEdge: 1.2, largestPairAtInfinity: true, transmissionZeros: [] });
    expect(inverse({ rejectionDb: 50 })()).toMatchObject({ rejectionDb: 50, returnLossDb: 20 });
    expect(spec({ family: 'bessel', reflectionSide: 'right' })()).toMatchObject({ reflectionSide: 'right' });
    expect('rejectionDb' in spec({ returnLossDb: 20 })()).toBe(false);
  });

  it('of other families may be false or absent', () => {
    expect(elliptic({ order: 5, rejectionDb: 50, largestPairAtInfinity: false })().largestPairAtInfinity).toBe(false);
  });
});
