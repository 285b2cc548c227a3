import type { TransmissionZero } from '../../src/approximation/index.js';
import type { Complex, CouplingMatrix, FilterPolynomials, Rotation, Scattering } from '../../src/forms/index.js';
import type { Sweep } from '../../src/response/index.js';
import { entry, withEntry } from '../support/models.js';
import type { Engine } from './engine.js';

/** An engine with one thing wrong. */
export type Fault = (engine: Engine) => Engine;

type Request = Parameters<Engine['generalizedChebyshev']>[0];

/** Changes what the approximation gives. */
export const inPolynomials =
  (change: (polynomials: FilterPolynomials, request: Request) => FilterPolynomials): Fault =>
  (engine) => ({ ...engine, generalizedChebyshev: (request) => change(engine.generalizedChebyshev(request), request) });

/** Changes what the approximation is asked for. */
export const inRequest =
  (change: (request: Request) => Request): Fault =>
  (engine) => ({ ...engine, generalizedChebyshev: (request) => engine.generalizedChebyshev(change(request)) });

export const inTransversal =
  (change: (matrix: CouplingMatrix) => CouplingMatrix): Fault =>
  (engine) => ({ ...engine, transversal: (polynomials) => change(engine.transversal(polynomials)) });

export const inFolded =
  (change: (matrix: CouplingMatrix, start: CouplingMatrix) => CouplingMatrix): Fault =>
  (engine) => ({
    ...engine,
    folded: (start) => {
      const result = engine.folded(start);
      return { ...result, matrix: change(result.matrix, start) };
    },
  });

export const inArrow =
  (change: (matrix: CouplingMatrix, start: CouplingMatrix) => CouplingMatrix): Fault =>
  (engine) => ({
    ...engine,
    arrow: (start) => {
      const result = engine.arrow(start);
      return { ...result, matrix: change(result.matrix, start) };
    },
  });

export const inRotation =
  (change: (turned: CouplingMatrix, before: CouplingMatrix, rotation: Rotation) => CouplingMatrix): Fault =>
  (engine) => {
    const rotate: Engine['rotate'] = (matrix, rotation) => change(engine.rotate(matrix, rotation), matrix, rotation);
    return { ...engine, rotate, applyRotations: (matrix, rotations) => rotations.reduce(rotate, matrix) };
  };

/** Changes the rotation that is carried out. */
export const ofRotation =
  (change: (rotation: Rotation) => Rotation): Fault =>
  (engine) => ({
    ...engine,
    rotate: (matrix, rotation) => engine.rotate(matrix, change(rotation)),
    applyRotations: (matrix, rotations) => engine.applyRotations(matrix, rotations.map(change)),
  });

export const inScattering =
  (change: (scattering: Scattering, omega: number) => Scattering): Fault =>
  (engine) => ({ ...engine, scatteringAt: (model, omega) => change(engine.scatteringAt(model, omega), omega) });

export const inSweep =
  (change: (result: Sweep, engine: Engine, args: Parameters<Engine['sweep']>) => Sweep): Fault =>
  (engine) => ({ ...engine, sweep: (...args) => change(engine.sweep(...args), engine, args) });

/** Entry (i, j) of a matrix, nodes counted from the end when negative, times a factor plus a shift. */
export const changed =
  (i: number, j: number, factor: number, shift = 0): ((matrix: CouplingMatrix) => CouplingMatrix) =>
  (matrix) => {
    const at = (node: number): number => (node < 0 ? matrix.order + 2 + node : Math.min(node, matrix.order + 1));
    return withEntry(matrix, at(i), at(j), factor * entry(matrix, at(i), at(j)) + shift);
  };

export const scaled = (value: Complex, factor: number): Complex => ({ re: value.re * factor, im: value.im * factor });
export const conjugate = ({ re, im }: Complex): Complex => ({ re, im: -im });

/** An epsilon off by a millionth. */
export const epsilonSlip: Fault = inPolynomials((p) => ({ ...p, epsilon: p.epsilon * (1 + 1e-6) }));

/** The last zero that a request names is forgotten (with its partner, if it has one). */
export const droppedZero: Fault = inRequest((request) => {
  const zeros = request.transmissionZeros ?? [];
  const last = zeros.at(-1);
  return { ...request, transmissionZeros: zeros.slice(0, typeof last === 'object' ? -2 : -1) };
});

/** Zeros on the axis land on the wrong side. */
export const wrongSide: Fault = inRequest((request) => ({
  ...request,
  transmissionZeros: (request.transmissionZeros ?? []).map((zero: TransmissionZero) =>
    typeof zero === 'number' ? -zero : zero,
  ),
}));

/** The lower half of the poles is the conjugate of what it should be. */
export const lostConjugate: Fault = inPolynomials((p) => ({
  ...p,
  poles: p.poles.map((pole) => (pole.im < 0 ? conjugate(pole) : pole)),
}));
