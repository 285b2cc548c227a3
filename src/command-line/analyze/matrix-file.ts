import type { CouplingMatrix } from '../../forms/index.js';
import {
  checkSpecification,
  decodeUtf8,
  type JsonValue,
  readJson,
  type Specification,
} from '../../specification/index.js';
import { addFault, checkKeys, isMembers, type Members, membersAt, type Reading } from '../json-file.js';
import { readMatrix } from '../matrix-value.js';
import { locating, refuseAll } from '../places.js';

/** A matrix file as read. */
export interface MatrixFile {
  readonly matrix: CouplingMatrix;
  /** Everything else in the form of a specification; what the file does not state has stand-ins. */
  readonly specification: Specification;
  readonly isStated: boolean;
  /** Whether the file says what form the matrix has. */
  readonly hasForm: boolean;
  readonly hasBand: boolean;
}

const RESPONSE_KEYS = [
  'family',
  'order',
  'returnLossDb',
  'rejectionDb',
  'stopBandEdge',
  'largestPairAtInfinity',
  'reflectionSide',
  'transmissionZeros',
  'topology',
] as const;
const BAND_KEYS = ['unloadedQ', 'mask'] as const;
const KEYS = ['matrix', 'name', 'notes', 'passband', ...BAND_KEYS, ...RESPONSE_KEYS] as const;

/** Keys of a file that `irisloom design` wrote; only matrix and specification are looked at. */
const RESULT_KEYS = [
  'version',
  'source',
  'conventions',
  'specification',
  'polynomials',
  'coefficients',
  'transversal',
  'matrix',
  'rotations',
  'handOver',
  'mask',
  'certificates',
] as const;

/** What stands where the file states no passband and nothing that would need one. */
const ANY_BAND = { lowerHz: 1, upperHz: 2 };
const ANY_LEVEL_DB = 20;

function needsBand(members: Members): boolean {
  const { transmissionZeros: zeros } = members;
  const inHertz = Array.isArray(zeros) && zeros.some((zero) => typeof zero === 'string');
  return inHertz || BAND_KEYS.some((key) => members[key] !== undefined);
}

/** Families that need no level to be stated. */
const HALF_POWER = ['butterworth', 'bessel'] as const;

/** Whether the members say what response the matrix should have. */
function statesResponse({ family, returnLossDb, transmissionZeros }: Members): boolean {
  return returnLossDb !== undefined || transmissionZeros !== undefined || HALF_POWER.some((name) => name === family);
}

/** The members as a whole specification: stand-ins for what is not stated, so that one check tells every fault. */
function completed(members: Members, order: number): Record<string, JsonValue | undefined> {
  const { matrix: _, ...rest } = members;
  const known = Object.entries(rest).filter(([key]) => KEYS.some((name) => name === key));
  const level = statesResponse(members) ? {} : { returnLossDb: ANY_LEVEL_DB };
  const band = members.passband === undefined && !needsBand(members) ? { passband: ANY_BAND } : {};
  return { order, ...level, ...band, ...Object.fromEntries(known) };
}

function checkOrder(reading: Reading, members: Members, matrix: CouplingMatrix, path: readonly string[]): void {
  const { order } = members;
  if (typeof order !== 'number' || order === matrix.order) return;
  const found = `order ${order} beside a matrix of order ${matrix.order}`;
  const base = { code: 'E_MATRIX_SHAPE', path: [...path, 'order'], found, allowed: `${matrix.order}` };
  addFault(reading, { ...base, advice: 'correct the order, or the rows', value: order, limit: matrix.order });
}

function readOwn(reading: Reading, members: Members): MatrixFile | undefined {
  checkKeys(reading, members, [], KEYS);
  const matrix = readMatrix(reading, members.matrix, ['matrix']);
  if (matrix !== undefined) checkOrder(reading, members, matrix, []);
  const whole = completed(members, matrix?.order ?? 1);
  const { positionOf, faults } = reading;
  const specification = locating(positionOf, [], faults, () => checkSpecification(whole));
  if (matrix === undefined || specification === undefined) return undefined;
  const { passband, topology } = members;
  const isStated = statesResponse(members);
  return { matrix, specification, isStated, hasForm: topology !== undefined, hasBand: passband !== undefined };
}

/** A design states the zeros that its family placed; who asks for the family does not. */
function withoutOwnZeros(members: Members): Members {
  const { transmissionZeros: _, ...others } = members;
  return members.family === 'elliptic' || members.family === 'inverseChebyshev' ? others : members;
}

function readResult(reading: Reading, members: Members): MatrixFile | undefined {
  checkKeys(reading, members, [], RESULT_KEYS);
  const matrix = readMatrix(reading, members.matrix, ['matrix']);
  const stated = membersAt(reading, members.specification, ['specification'], 'the specification that was designed');
  if (stated === undefined) return undefined;
  if (matrix !== undefined) checkOrder(reading, stated, matrix, ['specification']);
  const { band, remarks: _, ...rest } = stated;
  const { positionOf, faults } = reading;
  const whole = { ...withoutOwnZeros(rest), passband: band };
  const specification = locating(positionOf, ['specification'], faults, () => checkSpecification(whole));
  if (matrix === undefined || specification === undefined) return undefined;
  return { matrix, specification, isStated: true, hasForm: true, hasBand: true };
}

/**
 * Reads a matrix file, or a result that was written before; all faults are told together, each with its place.
 *
 * @throws FilterFailure E_MATRIX_SHAPE, E_ENTRY_RANGE, E_NOT_SYMMETRIC,
 *   E_MISSING, E_TYPE, E_UNKNOWN_KEY, and those of design files
 */
export function readMatrixFile(bytes: Uint8Array): MatrixFile {
  const { value, positionOf } = readJson(decodeUtf8(bytes));
  const reading: Reading = { positionOf, faults: [] };
  const members = membersAt(reading, value, [], 'an object with a matrix');
  const isResult = members !== undefined && isMembers(members.specification);
  const file = members === undefined ? undefined : (isResult ? readResult : readOwn)(reading, members);
  refuseAll(reading.faults);
  if (file === undefined) throw new Error('a matrix file was read neither whole nor with faults');
  return file;
}
