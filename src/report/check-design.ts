import { type CouplingMatrix, checkPolynomials } from '../forms/index.js';
import { refusal } from '../numerics/index.js';
import { checkBand } from '../specification/index.js';
import { rowsOf } from '../topology/index.js';
import type { DesignReport } from './design-report.js';
import type { DesignSource } from './files/result-json.js';

/** Parts of a design that every text or picture reads, with what they must be. */
const PARTS: readonly (readonly [string, (value: unknown) => boolean, string])[] = [
  ['version', (value) => typeof value === 'string', 'a text'],
  ['specification', isObject, 'a checked specification'],
  ['coefficients', isObject, 'coefficients'],
  ['rotations', Array.isArray, 'a list'],
  ['handOver', isObject, 'hand-over numbers'],
  ['mask', Array.isArray, 'a list of verdict rows'],
  ['certificates', Array.isArray, 'a list of certificates'],
  ['specification.order', Number.isInteger, 'a whole number'],
  ['specification.topology', (value) => typeof value === 'string', 'a text'],
  ['specification.family', (value) => typeof value === 'string', 'a text'],
  ['specification.portCouplings', (value) => typeof value === 'string', 'a text'],
  ['specification.transmissionZeros', Array.isArray, 'a list'],
  ['specification.mask', Array.isArray, 'a list'],
  ['specification.remarks', Array.isArray, 'a list'],
  ['specification.name', isTextOrAbsent, 'a text, or absent'],
  ['specification.notes', isTextOrAbsent, 'a text, or absent'],
  ['specification.revision', isTextOrAbsent, 'a text, or absent'],
  ['specification.date', isTextOrAbsent, 'a text, or absent'],
];

function isObject(value: unknown): boolean {
  return typeof value === 'object' && value !== null;
}

function isTextOrAbsent(value: unknown): boolean {
  return value === undefined || typeof value === 'string';
}

function partOf(design: unknown, path: string): unknown {
  return path
    .split('.')
    .reduce<unknown>((value, key) => (isObject(value) ? Reflect.get(value as object, key) : undefined), design);
}

/**
 * The door of everything that is given a whole design: what `design` returned passes; anything else is refused by the first
 * part that is missing or of another kind. Its numbers are not checked again.
 *
 * @throws FilterFailure E_TYPE, and what bands, matrices and polynomials are refused for
 */
export function checkDesign(design: DesignReport): DesignReport {
  const advice = 'pass what design() returned';
  if (!isObject(design)) throw refusal('E_TYPE', 'design', design, 'the result of design()', advice);
  for (const [path, isRight, allowed] of PARTS) {
    const value = partOf(design, path);
    if (!isRight(value)) throw refusal('E_TYPE', `design.${path}`, value, allowed, advice);
  }
  checkBand(design.specification.band);
  checkPolynomials(design.polynomials);
  rowsOf(design.matrix);
  return design;
}

/**
 * A matrix with rows of plain numbers, whatever kind of array they came in.
 *
 * @throws FilterFailure E_TYPE, E_MATRIX_SHAPE, E_NOT_FINITE, E_ENTRY_RANGE, E_NOT_SYMMETRIC, E_FINITE_ZEROS
 */
export function checkMatrix(matrix: CouplingMatrix): CouplingMatrix {
  const values = rowsOf(matrix).map((row) => Array.from(row));
  return { ...matrix, values };
}

/**
 * The design file behind a document, where it is stated: both texts, or nothing.
 *
 * @throws FilterFailure E_TYPE
 */
export function checkSource(source: DesignSource | undefined): DesignSource | undefined {
  if (source === undefined) return source;
  if (isObject(source) && typeof source.file === 'string' && typeof source.sha256 === 'string') return source;
  throw refusal('E_TYPE', 'source', source, 'an object with the texts file and sha256, or nothing', 'leave it out');
}
