import type { Complex, CouplingMatrix, FilterPolynomials } from '../forms/index.js';
import { FilterFailure } from '../numerics/index.js';
import type { CertificationContext } from './context.js';

const FAMILIES: readonly unknown[] = [
  'generalizedChebyshev',
  'butterworth',
  'inverseChebyshev',
  'elliptic',
  'bessel',
  'lossless',
];

const STRUCTURES: readonly unknown[] = ['folded', 'arrow', 'inline', 'transversal'];

/** Refuses arguments that are not of the stated form; a form that is right but says something wrong passes. */
export function checkArguments(
  polynomials: FilterPolynomials,
  matrix: CouplingMatrix,
  context: CertificationContext,
): void {
  checkObject('polynomials', polynomials);
  if (!FAMILIES.includes(polynomials.family))
    refuse('E_TYPE', 'polynomials.family', polynomials.family, FAMILIES.join(', '));
  checkOrder('polynomials.order', polynomials.order);
  for (const name of ['poles', 'reflectionZeros', 'transmissionZeros'] as const) {
    checkRoots(`polynomials.${name}`, polynomials[name]);
  }
  checkComplex('polynomials.transmissionLead', polynomials.transmissionLead);
  checkNumber('polynomials.epsilon', polynomials.epsilon);
  checkNumber('polynomials.epsilonR', polynomials.epsilonR);
  if (polynomials.returnLossDb !== undefined) checkNumber('polynomials.returnLossDb', polynomials.returnLossDb);
  checkMatrix('matrix', matrix, polynomials.order);
  checkObject('context', context);
  if (context.before !== undefined) checkMatrix('context.before', context.before, polynomials.order);
  if (context.rotations !== undefined) checkRotations(context.rotations);
  if (context.askedZeros !== undefined) checkRoots('context.askedZeros', context.askedZeros);
  if (context.leftover !== undefined && typeof context.leftover !== 'number') {
    refuse('E_TYPE', 'context.leftover', context.leftover, 'a number');
  }
  if (context.structure !== undefined && !STRUCTURES.includes(context.structure)) {
    refuse('E_TYPE', 'context.structure', context.structure, STRUCTURES.join(', '));
  }
}

function checkRotations(rotations: unknown): void {
  if (!Array.isArray(rotations)) refuse('E_TYPE', 'context.rotations', rotations, 'an array of rotations');
  rotations.forEach((rotation, n) => {
    const name = `context.rotations[${n}]`;
    checkObject(name, rotation);
    checkNumber(`${name}.angle`, rotation.angle);
    if (!Array.isArray(rotation.pivot)) refuse('E_TYPE', `${name}.pivot`, rotation.pivot, 'a pair of resonators');
    for (const node of rotation.pivot) checkNumber(`${name}.pivot`, node);
    if (rotation.flip !== undefined && !Array.isArray(rotation.flip))
      refuse('E_TYPE', `${name}.flip`, rotation.flip, 'a list');
  });
}

export function checkMatrix(name: string, matrix: CouplingMatrix, order: number): void {
  checkObject(name, matrix);
  const { values } = matrix;
  const size = order + 2;
  if (matrix.order !== order) refuse('E_MATRIX_SHAPE', `${name}.order`, matrix.order, `the order ${order}`);
  if (!Array.isArray(values)) refuse('E_TYPE', `${name}.values`, values, 'an array of rows');
  if (values.length !== size) refuse('E_MATRIX_SHAPE', `${name}.values.length`, values.length, `${size} rows`);
  values.forEach((row, i) => {
    if (!Array.isArray(row)) refuse('E_TYPE', `${name}.values[${i}]`, row, 'an array of numbers');
    if (row.length !== size) refuse('E_MATRIX_SHAPE', `${name}.values[${i}].length`, row.length, `${size} entries`);
    for (let j = 0; j < size; j++) checkNumber(`${name}.values[${i}][${j}]`, row[j]);
    for (let j = 0; j < i; j++) {
      const mirrored = values[j]?.[i];
      if (row[j] !== mirrored) {
        refuse('E_NOT_SYMMETRIC', `${name}.values[${i}][${j}]`, row[j], `${mirrored}, the entry across the diagonal`);
      }
    }
  });
}

function checkRoots(name: string, roots: readonly Complex[]): void {
  if (!Array.isArray(roots)) refuse('E_TYPE', name, roots, 'an array of complex numbers');
  for (let k = 0; k < roots.length; k++) checkComplex(`${name}[${k}]`, roots[k]);
}

function checkComplex(name: string, value: Complex | undefined): void {
  checkObject(name, value);
  checkNumber(`${name}.re`, value?.re);
  checkNumber(`${name}.im`, value?.im);
}

function checkOrder(name: string, value: unknown): void {
  checkNumber(name, value);
  if (!Number.isInteger(value) || Number(value) < 1) refuse('E_TYPE', name, value, 'a whole number from 1');
}

function checkNumber(name: string, value: unknown): void {
  if (typeof value !== 'number') refuse('E_TYPE', name, value, 'a number');
  if (!Number.isFinite(value)) refuse('E_NOT_FINITE', name, value, 'a finite number');
}

function checkObject(name: string, value: unknown): void {
  if (typeof value !== 'object' || value === null) refuse('E_TYPE', name, value, 'an object');
}

function refuse(code: string, argument: string, value: unknown, allowed: string): never {
  const found = typeof value === 'object' && value !== null ? 'an object' : String(value).slice(0, 40);
  const hint = 'pass the objects as synthesis returned them';
  throw new FilterFailure(code, `${code} ${argument}: found ${found}; allowed ${allowed}; ${hint}`, {
    argument,
    value,
    limit: allowed,
    hint,
  });
}
