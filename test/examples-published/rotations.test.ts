import { describe, expect, test } from 'vitest';
import { generalizedChebyshev } from '../../src/approximation/index.js';
import type { CouplingMatrix } from '../../src/forms/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { annihilate, applyRotations, arrow, folded } from '../../src/topology/index.js';
import { entry, matrixGap, responseGap } from '../support/models.js';
import { example, gapUpToSigns, matrixFrom, requestOf } from './examples.js';

interface Step {
  readonly annihilates: string;
  readonly pivot: readonly [number, number];
  readonly theta_deg: number;
}

const node = (name: string, order: number): number => (name === 'S' ? 0 : name === 'L' ? order + 1 : Number(name));

/** The published sequence step by step from the published start, our angles beside the published ones. */
function replay(start: CouplingMatrix, steps: readonly Step[]): { matrix: CouplingMatrix; angles: number[] } {
  const angles: number[] = [];
  const matrix = steps.reduce((each, { annihilates, pivot }) => {
    const [k, l] = annihilates.split(',').map((name) => node(name, start.order));
    const result = annihilate(each, { pivot, element: [k!, l!] });
    angles.push((result.rotation.angle * 180) / Math.PI);
    return result.matrix;
  }, start);
  return { matrix, angles };
}

// R. J. Cameron, Advanced coupling matrix synthesis techniques for microwave filters, IEEE Trans. MTT 51(1), 2003: the order of
// rotations from memory; angles and matrix are 50-digit anchors.
describe('transversal to folded, order 4', () => {
  const { recomputed } = example('rot-folded-4');
  const start = matrixFrom(example('gc-4-2-asym-RL22').recomputed.transversal);
  const steps = recomputed.sequence as Step[];

  test('the sequence gives its angles and its matrix', () => {
    const { matrix, angles } = replay(start, steps);
    steps.forEach(({ theta_deg }, n) => {
      // The start is given to 12 digits.
      expect(Math.abs(angles[n]! - theta_deg)).toBeLessThan(1e-9);
    });
    // The published start is that of the dual network: its folded form differs in signs only.
    expect(gapUpToSigns(matrix, matrixFrom(recomputed.folded))).toBeLessThan(1e-11);
  });

  test('folded() takes the same steps', () => {
    const { rotations, matrix } = folded(start);
    expect(rotations.filter(({ flip }) => flip === undefined).map(({ pivot }) => pivot)).toEqual(
      steps.map(({ pivot }) => pivot),
    );
    rotations
      .filter(({ flip }) => flip === undefined)
      .forEach(({ angle }, n) => {
        expect(Math.abs((angle * 180) / Math.PI - steps[n]!.theta_deg)).toBeLessThan(1e-9);
      });
    expect(gapUpToSigns(matrix, matrixFrom(recomputed.folded))).toBeLessThan(1e-11);
  });
});

// H. C. Bell, Canonical asymmetric coupled-resonator filters, IEEE Trans. MTT 30(9), 1982: procedure from memory, digits
// 50-digit anchors; unique up to resonator signs.
describe('arrow form of the order-8 example', () => {
  const { recomputed } = example('rot-arrow-8-3');
  const request = requestOf(example('gc-8-3-asym-RL23'));
  const start = transversal(generalizedChebyshev(request));

  test('arrow() gives the matrix', () => {
    expect(gapUpToSigns(arrow(start).matrix, matrixFrom(recomputed.arrow))).toBeLessThan(1e-11);
  });

  test('the first row of the published sequence gives its angles', () => {
    const steps = recomputed.first_rotations as Step[];
    const { angles } = replay(matrixFrom(example('gc-8-3-asym-RL23').recomputed.transversal), steps);
    steps.forEach(({ theta_deg }, n) => {
      expect(Math.abs(angles[n]! - theta_deg)).toBeLessThan(1e-9);
    });
  });

  test('the whole sequence of 28 rotations gives the same matrix', () => {
    const steps: Step[] = [];
    for (let row = 0; row < 7; row++) {
      for (let k = 8; k > row + 1; k--)
        steps.push({ annihilates: row === 0 ? `S,${k}` : `${row},${k}`, pivot: [row + 1, k], theta_deg: 0 });
    }
    expect(steps).toHaveLength(recomputed.rotations as number);
    expect(gapUpToSigns(replay(start, steps).matrix, matrixFrom(recomputed.arrow))).toBeLessThan(1e-10);
  });
});

// Cameron 2003, box section: magnitudes 0.8507 and 0.5973, M_11 and M_S1 from memory, M_22 and M_33 weak recall; limit 1e-4.
describe('box section from a trisection by its cross pivot', () => {
  const { printed, recomputed } = example('rot-box-4-1');
  const at = (zero: number): CouplingMatrix =>
    folded(transversal(generalizedChebyshev({ order: 4, returnLossDb: 25, transmissionZeros: [zero] }))).matrix;
  const boxOf = (zero: number): ReturnType<typeof annihilate> =>
    annihilate(at(zero), { pivot: [2, 3], element: [2, 3] });

  test('one rotation gives the angle and the matrix', () => {
    const { matrix, rotation } = boxOf(2.394);
    expect((rotation.angle * 180) / Math.PI).toBeCloseTo(recomputed.theta_deg as number, 9);
    expect(gapUpToSigns(matrix, matrixFrom(recomputed.box))).toBeLessThan(1e-11);
    expect(responseGap(matrix, at(2.394))).toBeLessThan(1e-13);
    const names: Readonly<Record<string, readonly [number, number]>> = {
      M12: [1, 2],
      M13: [1, 3],
      M22: [2, 2],
      M33: [3, 3],
      M11: [1, 1],
      M_S1: [0, 1],
    };
    for (const [name, value] of Object.entries(printed as Record<string, number>)) {
      const [i, j] = names[name]!;
      expect(Math.abs(Math.abs(entry(matrix, i, j)) - value), name).toBeLessThan(1e-4);
    }
  });

  test('the zero on the other side negates the diagonal only', () => {
    expect(gapUpToSigns(boxOf(-2.394).matrix, matrixFrom(recomputed['box_for_zero_at_-2.3940']))).toBeLessThan(1e-11);
  });
});

// Cameron 2003, cul-de-sac: procedure from memory; digits 50-digit anchors. Zeros -1.2576 and +-0.9218 - 0.1546j, 23 dB.
describe('cul-de-sac form, order 7', () => {
  const { recomputed } = example('rot-culdesac-7');
  const start = folded(
    transversal(
      generalizedChebyshev({
        order: 7,
        returnLossDb: 23,
        transmissionZeros: [-1.2576, { re: 0.9218, im: -0.1546 }, { re: -0.9218, im: -0.1546 }],
      }),
    ),
  ).matrix;

  test('three rotations give the angles and the matrix', () => {
    const log = recomputed.log as Step[];
    const { matrix, angles } = replay(start, log);
    log.forEach(({ theta_deg }, n) => {
      expect(Math.abs(Math.abs(angles[n]!) - Math.abs(theta_deg))).toBeLessThan(1e-9);
    });
    expect(gapUpToSigns(matrix, matrixFrom(recomputed.matrix))).toBeLessThan(1e-10);
    expect(responseGap(matrix, start)).toBeLessThan(1e-12);
  });

  test('applyRotations replays them', () => {
    const log = recomputed.log as Step[];
    const { matrix, angles } = replay(start, log);
    const rotations = log.map(({ pivot }, n) => ({ pivot, angle: (angles[n]! * Math.PI) / 180 }));
    expect(matrixGap(applyRotations(start, rotations), matrix)).toBeLessThan(1e-13);
  });
});
