import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, test } from 'vitest';
import { bessel, butterworth, elliptic, inverseChebyshev } from '../../src/approximation/index.js';
import type { FilterPolynomials, FineRoot } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { Exact, exact, relativeError } from '../support/exact.js';
import { hasMpmath } from '../support/tools.js';

// Reference: test/reference/make_families.py, Python with mpmath at 60 digits and more, by expanded polynomials; it shares
// nothing with the library.
const ROOT = resolve(import.meta.dirname, '../..');
const text = readFileSync(resolve(ROOT, 'fixtures/reference/families.json'), 'utf8');

interface Columns {
  readonly re: readonly string[];
  readonly im: readonly string[];
}

interface Case {
  readonly family: 'butterworth' | 'inverseChebyshev' | 'elliptic' | 'bessel';
  readonly order: number;
  readonly returnLossDb: number;
  readonly rejectionDb: number;
  readonly stopBandEdge?: number;
  readonly edge: 'halfPower' | 'unitDelay';
  readonly poles: Columns;
  readonly reflectionZeros: Columns;
  readonly transmissionZeros: readonly string[];
  readonly epsilon: string;
  readonly epsilonR: string;
}

const CASES: readonly Case[] = JSON.parse(text);

const made = (each: Case): FilterPolynomials => {
  if (each.family === 'butterworth') return butterworth(each);
  if (each.family === 'inverseChebyshev') return inverseChebyshev(each);
  if (each.family === 'bessel') return bessel({ order: each.order, edge: each.edge });
  return elliptic(each);
};

const nameOf = ({ poles: _, reflectionZeros: __, transmissionZeros: ___, epsilon: ____, ...rest }: Case): string =>
  JSON.stringify(rest);

/** The largest distance of two lists of roots in the order of frequency, each relative to the size of its root. */
function worst(found: readonly FineRoot[], { re, im }: Columns): number {
  expect(found.length).toBe(re.length);
  return found.reduce((largest, root, n) => {
    const [right, up] = [new Exact(re[n]!), new Exact(im[n]!)];
    const size = right.times(right).plus(up.times(up)).sqrt();
    const off = exact(root.re)
      .minus(right)
      .pow(2)
      .plus(
        exact(root.im)
          .plus(exact(root.imRest ?? 0))
          .minus(up)
          .pow(2),
      )
      .sqrt();
    return Math.max(largest, off.isZero() ? 0 : off.div(size).toNumber());
  }, 0);
}

describe('families against roots of more than 50 digits, to 1e-14 of each root', () => {
  test.each(CASES.map((each) => [nameOf(each), each] as const))('%s', (_, each) => {
    const response = made(each);
    expect(worst(response.poles, each.poles)).toBeLessThan(1e-14);
    expect(worst(response.reflectionZeros, each.reflectionZeros)).toBeLessThan(1e-14);
    const zeros = { re: each.transmissionZeros.map(() => '0'), im: each.transmissionZeros };
    expect(worst(response.transmissionZeros, zeros)).toBeLessThan(1e-14);
    for (const name of ['epsilon', 'epsilonR'] as const) {
      const right = new Exact(each[name]);
      // A product of up to 2N factors.
      expect(relativeError(response[name], right, right)).toBeLessThan(8 * each.order * EPS);
    }
  });

  test.skipIf(!hasMpmath())(
    'the stored figures are what the generator makes',
    () => {
      const script = resolve(ROOT, 'test/reference/make_families.py');
      const picked = [3, 9, 17, 28, 36, 44];
      const lines = execFileSync('/usr/bin/python3', [script, 'remake', ...picked.map(String)], { encoding: 'utf8' });
      const stored = text.split('\n').slice(1);
      expect(lines.trim().split('\n')).toEqual(picked.map((n) => stored[n]?.replace(/,$/, '')));
    },
    120_000,
  );
});
