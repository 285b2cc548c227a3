import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkTransmissionZeros } from '../../../src/specification/index.js';
import { expectRefusal } from '../refusal.js';

const ULP = Number.EPSILON;

describe('checkTransmissionZeros(zeros, order, band)', () => {
  it('reads numbers, plain pairs and class instances with own or inherited parts', () => {
    class Own {
      constructor(
        readonly re: number,
        readonly im: number,
      ) {}
    }
    class Inherited {
      get re(): number {
        return 0;
      }
      get im(): number {
        return -2;
      }
    }
    const { zeros } = checkTransmissionZeros([1.3, { re: 0, im: 1.4 }, new Own(0, 1.5), new Inherited()], 6);
    expect(zeros).toEqual([1.3, 1.4, 1.5, -2].map((im) => ({ re: 0, im })));
  });

  it('reads a frequency as the omega of the band', () => {
    const band = { centerHz: 1e9, bandwidthHz: 1e7 };
    const { zeros } = checkTransmissionZeros(['1.01 GHz'], 3, band);
    expect(zeros[0]?.im).toBeCloseTo(100 * (1.01 - 1 / 1.01), 12);
  });

  it('says that a frequency needs a band', () => {
    expectRefusal(() => checkTransmissionZeros(['1.01 GHz'], 3), 'E_TYPE', 'passband');
  });

  it.each([
    ['a real part of rounding size', { re: 4 * ULP, im: 1.5 }, 'real part'],
    ['a negative zero', { re: -0, im: 1.5 }, '-0 read as 0'],
  ])('puts %s on the axis and says so', (_name, zero, remark) => {
    const { zeros, remarks } = checkTransmissionZeros([zero], 3);
    expect(zeros).toEqual([{ re: 0, im: 1.5 }]);
    expect(Object.is(zeros[0]?.re, 0)).toBe(true);
    expect(remarks.join()).toContain(remark);
  });

  it('does not put a larger real part on the axis', () => {
    expectRefusal(() => checkTransmissionZeros([{ re: 1e-14, im: 1.5 }], 3), 'E_ZERO_PAIR');
  });

  it('makes a partner exact that is off by rounding, keeps the order, and says so', () => {
    const given = [1.5, { re: 0.3, im: 1.2 }, -2, { re: -0.3 - ULP / 4, im: 1.2 + ULP }];
    const { zeros, remarks } = checkTransmissionZeros(given, 6);
    expect(zeros[1]).toEqual({ re: 0.3, im: 1.2 });
    expect(zeros[3]).toEqual({ re: -0.3, im: 1.2 });
    expect(remarks).toHaveLength(1);
    expect(remarks[0]).toContain('transmissionZeros[3]');
  });

  it('lists every faulty zero at once', () => {
    const failure = expectRefusal(() => checkTransmissionZeros([0.1, 2, 'inf', null, 1], 6), 'E_ZERO_IN_PASSBAND');
    expect(failure.faults.map((fault) => [fault.argument, fault.code])).toEqual([
      ['transmissionZeros[0]', 'E_ZERO_IN_PASSBAND'],
      ['transmissionZeros[2]', 'E_ZERO_RANGE'],
      ['transmissionZeros[3]', 'E_TYPE'],
      ['transmissionZeros[4]', 'E_ZERO_ON_EDGE'],
    ]);
  });

  it('never writes to its argument and gives no negative zero', () => {
    const part = fc.double({ min: -3, max: 3, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.record({ re: part, im: part }), { maxLength: 5 }), (half) => {
        const list = half.flatMap((zero) => [zero, { re: -zero.re, im: zero.im }]);
        const before = structuredClone(list);
        try {
          const { zeros } = checkTransmissionZeros(list, 10);
          expect(zeros.some((zero) => Object.is(zero.re, -0) || Object.is(zero.im, -0))).toBe(false);
          for (const zero of zeros) {
            const partners = zeros.filter((each) => each.re === -zero.re && each.im === zero.im).length;
            expect(partners).toBe(zeros.filter((each) => each.re === zero.re && each.im === zero.im).length);
          }
        } catch (error) {
          expect(error).toHaveProperty('name', 'FilterFailure');
        }
        expect(list).toEqual(before);
      }),
      { seed: 11, numRuns: 500 },
    );
  });

  it('accepts the mirror pairs of any set, shuffled', () => {
    const part = fc.double({ min: 0.1, max: 3, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.tuple(part, part), { minLength: 1, maxLength: 8 }), fc.integer(), (half, turn) => {
        const pairs = half.flatMap(([re, im]) => [
          { re, im },
          { re: -re, im },
        ]);
        const shift = Math.abs(turn) % pairs.length;
        const list = [...pairs.slice(shift), ...pairs.slice(0, shift)];
        expect(checkTransmissionZeros(list, 16).zeros).toEqual(list);
      }),
      { seed: 12, numRuns: 300 },
    );
  });
});
