import fc from 'fast-check';
import type { Complex, CouplingMatrix } from '../../src/forms/index.js';
import { hzFromOmega, omegaFromHz } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import type { Model, Sweep } from '../../src/response/index.js';
import { distance, entry, sharpness, size, withEntry } from '../support/models.js';
import type { Engine } from './engine.js';
import { type Fault, inSweep } from './faults.js';
import { type Law, law, must, within } from './law.js';
import { turnedAround } from './matrix-laws.js';
import { frequency, matrices, plainRequests, type Request, requests, roomOf, uniform } from './specs.js';

const at = (samples: Sweep['s11'], n: number): Complex => ({ re: samples.re[n]!, im: samples.im[n]! });

const withSamples = (samples: Sweep['s11'], change: (value: Complex, n: number) => Complex): Sweep['s11'] => {
  const values = Array.from(samples.re, (_, n) => change(at(samples, n), n));
  return { re: Float64Array.from(values, ({ re }) => re), im: Float64Array.from(values, ({ im }) => im) };
};

/** The four models of one request: polynomials, transversal, folded, and a detuned one with S11 different from S22. */
function modelsOf(engine: Engine, request: Request): readonly Model[] {
  const p = engine.generalizedChebyshev(request);
  const start = engine.transversal(p);
  const { matrix } = engine.folded(start);
  return [p, start, matrix, withEntry(matrix, 0, 1, 1.05 * entry(matrix, 0, 1))];
}

const loss = fc.oneof(
  { weight: 1, arbitrary: fc.constant(0) },
  { weight: 3, arbitrary: uniform(-3, 0).map((e) => 10 ** e) },
);
const grid = fc.array(frequency, { minLength: 1, maxLength: 6 });
const band = fc
  .tuple(uniform(6, 11), uniform(-3, -0.5))
  .map(([center, fraction]) => ({ centerHz: 10 ** center, bandwidthHz: 10 ** (center + fraction) }));

const inDenormalize =
  (change: (result: ReturnType<Engine['denormalize']>) => ReturnType<Engine['denormalize']>): Fault =>
  (engine) => ({ ...engine, denormalize: (matrix, where) => change(engine.denormalize(matrix, where)) });

export const responseLaws: readonly Law[] = [
  law(
    'a lossless sweep equals scatteringAt at every point',
    fc.tuple(requests(), grid),
    (engine, [request, omegas]) => {
      const room = roomOf(engine.generalizedChebyshev(request));
      for (const model of modelsOf(engine, request)) {
        const result = engine.sweep(model, omegas);
        omegas.forEach((omega, n) => {
          const { s11, s21, s12, s22 } = engine.scatteringAt(model, omega);
          within(Math.max(distance(s11, at(result.s11, n)), distance(s22, at(result.s22, n))), 10 * room, 'reflection');
          within(
            Math.max(distance(s21, at(result.s21, n)), distance(s12, at(result.s12, n))),
            10 * room,
            'transmission',
          );
        });
      }
    },
    [
      ['S11 conjugated', inSweep((r) => ({ ...r, s11: withSamples(r.s11, ({ re, im }) => ({ re, im: -im })) }))],
      ['S11 and S22 swapped', inSweep((r) => ({ ...r, s11: r.s22, s22: r.s11 }))],
      [
        'S21 off by 1e-6',
        inSweep((r) => ({ ...r, s21: withSamples(r.s21, ({ re, im }) => ({ re: re * (1 + 1e-6), im })) })),
      ],
    ],
    40,
  ),
  law(
    'a sweep is pointwise: part of a grid, in another order, gives the same bits',
    fc.tuple(requests(12), grid, loss),
    (engine, [request, omegas, lost]) => {
      for (const model of modelsOf(engine, request)) {
        const whole = engine.sweep(model, omegas, { loss: lost });
        const part = engine.sweep(model, [...omegas].reverse().slice(0, 2), { loss: lost });
        part.omega.forEach((omega, k) => {
          const n = omegas.length - 1 - k;
          must(omega === whole.omega[n], 'grid');
          for (const name of ['s11', 's21', 's22'] as const)
            must(
              Object.is(part[name].re[k], whole[name].re[n]) && Object.is(part[name].im[k], whole[name].im[n]),
              name,
            );
          must(Object.is(part.groupDelay[k], whole.groupDelay[n]), 'delay');
        });
      }
    },
    [
      [
        'the first point leaks into the others',
        inSweep((r) => ({ ...r, groupDelay: r.groupDelay.map((value) => value + r.groupDelay[0]!) })),
      ],
      [
        'a last bit that depends on the length',
        inSweep((r) => ({
          ...r,
          s11: withSamples(r.s11, ({ re, im }) => ({ re: re * (1 + EPS * r.omega.length), im })),
        })),
      ],
    ],
    40,
  ),
  law(
    'lossless delay is positive, and the sum over the poles',
    fc.tuple(requests(), grid),
    (engine, [request, omegas]) => {
      const p = engine.generalizedChebyshev(request);
      const [, start, folded] = modelsOf(engine, request);
      for (const model of [p, start!, folded!]) {
        engine.sweep(model, omegas).groupDelay.forEach((delay, n) => {
          const sum = p.poles.reduce((total, { re, im }) => total - re / (re * re + (omegas[n]! - im) ** 2), 0);
          must(delay > 0, 'positive');
          within(Math.abs(delay / sum - 1), 10 * roomOf(p) * sharpness(p), 'sum');
        });
      }
    },
    [
      ['delay with the wrong sign', inSweep((r) => ({ ...r, groupDelay: r.groupDelay.map((value) => -value) }))],
      [
        'delay of S11 + S21 instead of the mean',
        inSweep((r) => ({ ...r, groupDelay: r.groupDelay.map((value) => value * (1 + 1e-4)) })),
      ],
      [
        'one pole moved off the axis',
        (engine) => ({
          ...engine,
          sweep: (model, omegas, options) =>
            engine.sweep(
              'values' in model
                ? model
                : { ...model, poles: model.poles.map((pole, n) => (n === 0 ? { ...pole, re: 2 * pole.re } : pole)) },
              omegas,
              options,
            ),
        }),
      ],
    ],
    40,
  ),
  law(
    'delay, lossy or not, is the slope of the phase of S21',
    fc.tuple(requests(7), uniform(-1, 1), loss),
    (engine, [request, omega, lost]) => {
      const p = engine.generalizedChebyshev(request);
      if (sharpness(p) > 1e3) return;
      const step = 0.02 / sharpness(p);
      for (const model of modelsOf(engine, request)) {
        const points = [-4, -3, -2, -1, 0, 1, 2, 3, 4].map((k) => omega + k * step);
        const { s21, groupDelay } = engine.sweep(model, points, { loss: lost });
        // Off a pair of zeros close to the axis the phase of a lossy S21 turns fast; such points say nothing.
        if (size(at(s21, 4)) < 0.05) continue;
        const turn = (k: number): number => {
          const [a, b] = [at(s21, 4 + k), at(s21, 4 - k)];
          return Math.atan2(a.im * b.re - a.re * b.im, a.re * b.re + a.im * b.im);
        };
        const slope = (4 / 5) * turn(1) - (1 / 5) * turn(2) + (4 / 105) * turn(3) - (1 / 280) * turn(4);
        within(Math.abs((groupDelay[4]! * step) / -slope - 1), 1e-5, 'delay');
      }
    },
    [
      [
        'delay per turn instead of per radian',
        inSweep((r) => ({ ...r, groupDelay: r.groupDelay.map((value) => value / (2 * Math.PI)) })),
      ],
      ['delay off by 1e-4', inSweep((r) => ({ ...r, groupDelay: r.groupDelay.map((value) => value * (1 + 1e-4)) }))],
    ],
    60,
  ),
  law(
    'a network with loss is passive: |S11|^2 + |S21|^2 <= 1, the less the more loss inside',
    fc.tuple(matrices(1, 8), frequency, loss),
    (engine, [matrix, omega, lost]) => {
      const { s11, s21, s12, s22 } = engine.sweep(matrix, [omega], { loss: lost });
      for (const [a, b] of [
        [s11, s21],
        [s12, s22],
      ] as const) {
        const power = size(at(a, 0)) ** 2 + size(at(b, 0)) ** 2;
        within(power, 1 + 1e-9, 'power');
        if (lost > 0.1) within(power, 1 - 1e-7, 'power with much loss');
      }
    },
    [
      [
        'loss taken for gain',
        inSweep((r, _, [, , options]) => ({
          ...r,
          s21: withSamples(r.s21, ({ re, im }) => ({
            re: re * (1 + 10 * Number(options?.loss ?? 0)),
            im: im * (1 + 10 * Number(options?.loss ?? 0)),
          })),
        })),
      ],
      ['loss ignored', inSweep((r, engine, [model, omegas]) => (r.omega.length > 0 ? engine.sweep(model, omegas) : r))],
    ],
  ),
  law(
    'loss lowers |S21| of an all-pole response at every frequency',
    fc.tuple(plainRequests, frequency, uniform(1e-3, 1), uniform(1.1, 3)),
    (engine, [request, omega, lost, factor]) => {
      const p = engine.generalizedChebyshev(request);
      const power = [0, lost, lost * factor].map((each) => size(at(engine.sweep(p, [omega], { loss: each }).s21, 0)));
      must(power[0]! > power[1]! && power[1]! > power[2]!, `S21 ${power.join(' ')}`);
    },
    [
      ['loss ignored', inSweep((_, engine, [model, omegas]) => engine.sweep(model, omegas))],
      [
        'a ceiling on loss',
        inSweep((_, engine, [model, omegas, options]) =>
          engine.sweep(model, omegas, { loss: Math.min(Number(options?.loss ?? 0), 0.5) }),
        ),
      ],
    ],
  ),
  law(
    'a common loss acts alike on polynomials and on every form of the matrix',
    fc.tuple(requests(), grid, uniform(1e-3, 0.5)),
    (engine, [request, omegas, lost]) => {
      const p = engine.generalizedChebyshev(request);
      const start = engine.transversal(p);
      const reference = engine.sweep(p, omegas, { loss: lost });
      for (const model of [start, engine.folded(start).matrix, engine.arrow(start).matrix]) {
        const result = engine.sweep(model, omegas, { loss: lost });
        for (const name of ['s11', 's21', 's22'] as const) {
          omegas.forEach((_, n) => {
            within(distance(at(reference[name], n), at(result[name], n)), roomOf(p), name);
          });
        }
      }
    },
    [
      [
        'loss of the matrix doubled',
        inSweep((r, engine, [model, omegas, options]) =>
          'values' in model ? engine.sweep(model, omegas, { loss: 2 * Number(options?.loss ?? 0) }) : r,
        ),
      ],
      [
        'loss of the polynomials with the wrong sign',
        (engine) => ({
          ...engine,
          sweep: (model, omegas, options) =>
            engine.sweep(
              'values' in model
                ? model
                : {
                    ...model,
                    poles: model.poles.map((pole) => ({ ...pole, re: pole.re + 2 * Number(options?.loss ?? 0) })),
                  },
              omegas,
              options,
            ),
        }),
      ],
    ],
    40,
  ),
  law(
    'a loss for each resonator goes to its own resonator: turning the network and the list around swaps S11 and S22',
    fc.tuple(matrices(2, 7), grid, fc.array(uniform(0.01, 1), { minLength: 7, maxLength: 7 }), fc.boolean()),
    (engine, [matrix, omegas, losses, withZero]) => {
      const list = losses.slice(0, matrix.order).map((value, n) => (withZero && n === 1 ? 0 : value));
      const one = engine.sweep(matrix, omegas, { loss: list });
      const two = engine.sweep(turnedAround(matrix), omegas, { loss: [...list].reverse() });
      omegas.forEach((_, n) => {
        within(distance(at(one.s11, n), at(two.s22, n)), 1e-10, 'S11');
        within(distance(at(one.s21, n), at(two.s21, n)), 1e-10, 'S21');
        within(distance(at(one.s22, n), at(two.s11, n)), 1e-10, 'S22');
      });
    },
    [
      [
        'the list is shifted by one',
        inSweep((r, engine, [model, omegas, options]) =>
          Array.isArray(options?.loss)
            ? engine.sweep(model, omegas, { loss: [...options.loss.slice(1), options.loss[0]] })
            : r,
        ),
      ],
      [
        'the list is averaged and the first kept',
        inSweep((r, engine, [model, omegas, options]) =>
          Array.isArray(options?.loss)
            ? engine.sweep(model, omegas, { loss: options.loss.map((value, n) => (n === 0 ? value : 0.5)) })
            : r,
        ),
      ],
    ],
  ),
  law(
    'equal losses in a list act like one number, and nearly equal ones nearly so',
    fc.tuple(matrices(2, 7), grid, uniform(0.01, 1)),
    (engine, [matrix, omegas, lost]) => {
      const common = engine.sweep(matrix, omegas, { loss: lost });
      const list = new Array<number>(matrix.order).fill(lost);
      const near = engine.sweep(matrix, omegas, {
        loss: list.map((value, n) => (n === 0 ? value * (1 + 1e-12) : value)),
      });
      for (const name of ['s11', 's21', 's22'] as const) {
        omegas.forEach((_, n) => {
          within(distance(at(common[name], n), at(near[name], n)), 1e-9, name);
        });
      }
      const same = engine.sweep(matrix, omegas, { loss: list });
      must(
        omegas.every((_, n) => Object.is(same.groupDelay[n], common.groupDelay[n])),
        'bits',
      );
    },
    [
      [
        'one resonator of the list is lossless',
        inSweep((r, engine, [model, omegas, options]) =>
          Array.isArray(options?.loss)
            ? engine.sweep(model, omegas, { loss: options.loss.map((value, n) => (n === 0 ? 0 : value)) })
            : r,
        ),
      ],
    ],
    40,
  ),
  law(
    'a sweep in hertz is the sweep at the mapped frequencies, loss f0/(B Qu), delay times d omega/d(2 pi f)',
    fc.tuple(requests(8), band, uniform(-1.5, 1.5), uniform(2, 5)),
    (engine, [request, { centerHz, bandwidthHz }, omega, quality]) => {
      const p = engine.generalizedChebyshev(request);
      const unloadedQ = 10 ** quality;
      const f = hzFromOmega({ centerHz, bandwidthHz }, omega);
      const one = engine.sweepHz(p, { centerHz, bandwidthHz, unloadedQ }, [f]);
      const two = engine.sweep(p, [(centerHz / bandwidthHz) * (f / centerHz - centerHz / f)], {
        loss: centerHz / (bandwidthHz * unloadedQ),
      });
      // Mapped by the plain formula, which cancels near the center.
      const room = roomOf(p) * (1 + centerHz / bandwidthHz);
      for (const name of ['s11', 's21', 's22'] as const)
        within(distance(at(one[name], 0), at(two[name], 0)), room, name);
      const unit = (1 + (centerHz / f) ** 2) / (2 * Math.PI * bandwidthHz);
      if (size(at(two.s21, 0)) > 0.1)
        within(Math.abs(one.groupDelaySeconds[0]! / (two.groupDelay[0]! * unit) - 1), 1e-6 + 1e3 * room, 'delay');
    },
    [
      [
        'the narrow-band map',
        (engine) => ({
          ...engine,
          sweepHz: (model, where, hz) =>
            engine.sweepHz(
              model,
              where,
              Array.from(hz, (f) => hzFromOmega(where, (2 * (f - where.centerHz)) / where.bandwidthHz)),
            ),
        }),
      ],
      [
        'Q off by a thousandth',
        (engine) => ({
          ...engine,
          sweepHz: (model, where, hz) =>
            engine.sweepHz(model, { ...where, unloadedQ: Number(where.unloadedQ) * 1.001 }, hz),
        }),
      ],
      [
        'delay without 2 pi',
        (engine) => ({
          ...engine,
          sweepHz: (model, where, hz) => {
            const r = engine.sweepHz(model, where, hz);
            return { ...r, groupDelaySeconds: r.groupDelaySeconds.map((value) => value * 2 * Math.PI) };
          },
        }),
      ],
    ],
  ),
  law(
    'scaling every frequency by one factor keeps k and Q and scales hertz and seconds',
    fc.tuple(requests(10), band, uniform(0.1, 10)),
    (engine, [request, where, factor]) => {
      const { matrix } = engine.folded(engine.transversal(engine.generalizedChebyshev(request)));
      const one = engine.denormalize(matrix, where);
      const two = engine.denormalize(matrix, {
        centerHz: where.centerHz * factor,
        bandwidthHz: where.bandwidthHz * factor,
      });
      const same = (a: number | null, b: number | null, what: string): void =>
        a === null || b === null ? must(a === b, what) : within(Math.abs(a - b), 16 * EPS * Math.abs(a), what);
      must(one.couplings.length === two.couplings.length, 'couplings');
      one.couplings.forEach((coupling, n) => {
        same(coupling.k, two.couplings[n]!.k, 'k');
        same(coupling.bandwidthHz * factor, two.couplings[n]!.bandwidthHz, 'coupling bandwidth');
      });
      one.resonators.forEach(({ frequencyHz }, n) => {
        same(frequencyHz * factor, two.resonators[n]!.frequencyHz, 'frequency');
      });
      same(one.externalQ.source, two.externalQ.source, 'Qe');
      same(
        one.reflectedDelaySeconds.load,
        two.reflectedDelaySeconds.load === null ? null : two.reflectedDelaySeconds.load * factor,
        'delay',
      );
      must(one.directCoupling === two.directCoupling, 'direct');
    },
    [
      [
        'a hertz added to every frequency',
        inDenormalize((r) => ({
          ...r,
          resonators: r.resonators.map(({ frequencyHz }) => ({ frequencyHz: frequencyHz + 1e3 })),
        })),
      ],
      [
        'k in megahertz',
        inDenormalize((r) => ({ ...r, couplings: r.couplings.map((c) => ({ ...c, k: c.bandwidthHz / 1e6 })) })),
      ],
    ],
  ),
  law(
    'hand-over numbers give the matrix back',
    fc.tuple(requests(10), band),
    (engine, [request, where]) => {
      const { matrix } = engine.folded(engine.transversal(engine.generalizedChebyshev(request)));
      const { resonators, couplings, externalQ } = engine.denormalize(matrix, where);
      const fraction = where.bandwidthHz / where.centerHz;
      resonators.forEach(({ frequencyHz }, n) => {
        // A positive diagonal entry tunes below the center.
        within(
          Math.abs(omegaFromHz(where, frequencyHz) + entry(matrix, n + 1, n + 1)),
          8 * EPS * (1 / fraction + 1),
          `M_${n + 1}${n + 1}`,
        );
      });
      const listed = new Map(couplings.map(({ between, k }) => [between.join(), k / fraction] as const));
      for (let i = 1; i <= matrix.order; i++) {
        for (let j = i + 1; j <= matrix.order; j++) {
          within(
            Math.abs((listed.get(`${i},${j}`) ?? 0) - entry(matrix, i, j)),
            8 * EPS * Math.abs(entry(matrix, i, j)),
            `M_${i}${j}`,
          );
        }
      }
      if (externalQ.source !== null)
        within(
          Math.abs(1 / Math.sqrt(externalQ.source * fraction) - Math.abs(entry(matrix, 0, 1))),
          16 * EPS * Math.abs(entry(matrix, 0, 1)),
          'M_S1',
        );
    },
    [
      [
        'resonators tuned to the wrong side',
        (engine) => ({
          ...engine,
          denormalize: (matrix: CouplingMatrix, where) => {
            const r = engine.denormalize(matrix, where);
            return {
              ...r,
              resonators: r.resonators.map(({ frequencyHz }) => ({ frequencyHz: where.centerHz ** 2 / frequencyHz })),
            };
          },
        }),
      ],
      [
        'the linear shift',
        (engine) => ({
          ...engine,
          denormalize: (matrix: CouplingMatrix, where) => {
            const r = engine.denormalize(matrix, where);
            return {
              ...r,
              resonators: r.resonators.map((_, n) => ({
                frequencyHz: where.centerHz - (entry(matrix, n + 1, n + 1) * where.bandwidthHz) / 2,
              })),
            };
          },
        }),
      ],
      ['one coupling lost', inDenormalize((r) => ({ ...r, couplings: r.couplings.slice(1) }))],
    ],
  ),
  law(
    'the band-pass map has the band edges at omega = +-1 and is its own inverse',
    fc.tuple(band, uniform(-50, 50)),
    (engine, [where, omega]) => {
      // Through the engine: one resonator tuned to omega is handed over at that frequency.
      const matrix: CouplingMatrix = {
        order: 1,
        values: [
          [0, 1, 0],
          [1, -omega, 1],
          [0, 1, 0],
        ],
      };
      const [resonator] = engine.denormalize(matrix, where).resonators;
      const f = resonator!.frequencyHz;
      const { centerHz, bandwidthHz } = where;
      within(Math.abs(f - centerHz ** 2 / f - omega * bandwidthHz), 32 * EPS * (f + centerHz ** 2 / f), 'map');
    },
    [
      [
        'geometric mean replaced by the arithmetic one',
        inDenormalize((r) => ({
          ...r,
          resonators: r.resonators.map(({ frequencyHz }) => ({ frequencyHz: frequencyHz * (1 + 1e-9) })),
        })),
      ],
    ],
  ),
];
