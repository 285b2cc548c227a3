import { approximate } from '../../approximation/index.js';
import type { CouplingMatrix } from '../../forms/index.js';
import {
  checkSpecification,
  decodeUtf8,
  echo,
  type JsonValue,
  kindFault,
  nearestKey,
  readJson,
} from '../../specification/index.js';
import { transversal } from '../../synthesis/index.js';
import type { RotationRequest } from '../../topology/index.js';
import { addFault, checkKeys, type Members, membersAt, pairAt, type Reading } from '../json-file.js';
import { readMatrix } from '../matrix-value.js';
import { locating, refuseAll } from '../places.js';
import { type NodePair, PATTERN_NAMES, patternPairs } from './patterns.js';
import { readSteps } from './steps.js';

/** A file of rotations as read. */
export interface RotationFile {
  readonly name?: string;
  readonly matrix: CouplingMatrix;
  readonly steps: readonly RotationRequest[];
  readonly pattern?: readonly NodePair[];
}

const KEYS = ['name', 'notes', 'matrix', 'response', 'steps', 'pattern'];
const RESPONSE_KEYS = [
  'passband',
  'family',
  'order',
  'returnLossDb',
  'rejectionDb',
  'stopBandEdge',
  'largestPairAtInfinity',
  'reflectionSide',
  'transmissionZeros',
];
const ANY_BAND = { lowerHz: 1, upperHz: 2 };

/** The transversal matrix of a response that is stated as in a design file. */
function readResponse(reading: Reading, value: JsonValue | undefined): CouplingMatrix | undefined {
  const path = ['response'];
  const members = membersAt(reading, value, path, 'an object with order, returnLossDb and transmissionZeros');
  if (members === undefined) return undefined;
  checkKeys(reading, members, path, RESPONSE_KEYS);
  const known = Object.fromEntries(Object.entries(members).filter(([key]) => RESPONSE_KEYS.includes(key)));
  const { transmissionZeros: zeros } = members;
  const inHertz = Array.isArray(zeros) && zeros.some((zero) => typeof zero === 'string');
  const whole = inHertz ? known : { passband: ANY_BAND, ...known };
  const { positionOf, faults } = reading;
  const checked = locating(positionOf, path, faults, () => checkSpecification(whole));
  return checked === undefined ? undefined : transversal(approximate(checked));
}

function readStart(reading: Reading, members: Members): CouplingMatrix | undefined {
  const { matrix, response } = members;
  if (matrix !== undefined && response !== undefined) {
    const base = { code: 'E_CHOICE', path: ['response'], found: 'a response beside a matrix' };
    addFault(reading, { ...base, allowed: 'one of the two', advice: 'remove one', onKey: true });
  }
  if (matrix === undefined && response === undefined) {
    addFault(
      reading,
      kindFault(['matrix'], undefined, 'a matrix, or a response to start from', 'add "matrix" or "response"'),
    );
    return undefined;
  }
  return matrix === undefined ? readResponse(reading, response) : readMatrix(reading, matrix, ['matrix']);
}

function namedPattern(reading: Reading, value: string, { order, finiteZeros }: CouplingMatrix): readonly NodePair[] {
  const name = PATTERN_NAMES.find((known) => known === value);
  if (name !== undefined) return patternPairs(name, order, finiteZeros ?? order);
  const nearest = nearestKey(value, PATTERN_NAMES);
  const advice = nearest === undefined ? 'write one of these' : `did you mean "${nearest}"?`;
  const allowed = '"folded", "arrow", or a list of node pairs';
  addFault(reading, {
    code: 'E_CHOICE',
    path: ['pattern'],
    found: echo(value),
    allowed,
    advice,
    value,
    limit: PATTERN_NAMES,
  });
  return [];
}

function readPattern(reading: Reading, value: JsonValue, matrix: CouplingMatrix): readonly NodePair[] {
  if (typeof value === 'string') return namedPattern(reading, value, matrix);
  if (!Array.isArray(value)) {
    const allowed = '"folded", "arrow", or a list of node pairs';
    addFault(reading, kindFault(['pattern'], value, allowed, 'write one of these'));
    return [];
  }
  const pairs = value.map((pair, n) => pairAt(reading, pair, ['pattern', n], matrix.order + 1));
  return pairs.filter((pair) => pair !== undefined);
}

function readName(reading: Reading, { name, notes }: Members): string | undefined {
  const { positionOf, faults } = reading;
  const labels = { ...(name === undefined ? {} : { name }), ...(notes === undefined ? {} : { notes }) };
  const frame = { passband: ANY_BAND, order: 1, returnLossDb: 20, ...labels };
  return locating(positionOf, [], faults, () => checkSpecification(frame))?.name;
}

/**
 * Reads a file of rotations; all faults are told together, each with its place.
 *
 * @throws FilterFailure E_MATRIX_SHAPE, E_ENTRY_RANGE, E_NOT_SYMMETRIC,
 *   E_PIVOT, E_ELEMENT, E_CHOICE, E_MISSING, E_TYPE, E_UNKNOWN_KEY
 */
export function readRotationFile(bytes: Uint8Array): RotationFile {
  const { value, positionOf } = readJson(decodeUtf8(bytes));
  const reading: Reading = { positionOf, faults: [] };
  const members = membersAt(reading, value, [], 'an object with a matrix or a response, and steps') ?? {};
  refuseAll(reading.faults);
  checkKeys(reading, members, [], KEYS);
  const name = readName(reading, members);
  const matrix = readStart(reading, members);
  const steps = readSteps(reading, members.steps, matrix?.order);
  const pattern =
    matrix === undefined || members.pattern === undefined ? undefined : readPattern(reading, members.pattern, matrix);
  refuseAll(reading.faults);
  if (matrix === undefined) throw new Error('a file of rotations was read neither whole nor with faults');
  return { ...(name === undefined ? {} : { name }), matrix, steps, ...(pattern === undefined ? {} : { pattern }) };
}
