import type { FineRoot } from '../../forms/index.js';
import { add, type Complex, complex, divide, EPS, magnitude, refusal, subtract } from '../../numerics/index.js';
import { type PowerSum, sumAt } from './power-sum.js';

/** Sweeps over all roots. Thirty are enough to order 40 (measured); clusters take a hundred. */
const MOST_SWEEPS = 500;

/** A step below this share of the root is its rounding. */
const SETTLED = 2 * EPS;

/** A value below this share of what cancelled is rounding of the doubled sum: 40 factors of a few 2^-104. */
const NOISE: number = 2 ** -96;

/**
 * The left roots of a sum of powers: half of its roots, the others are their mirror images.
 *
 * Simultaneous iteration in the frequency plane: a root and its mirror image are one unknown, so the halves agree exactly; each
 * step divides a sum in doubled precision by its slope and turns away from all other roots and all mirror images. The sum must
 * be positive on the axis; `starts` are s-plane points, one for each root. Cost O(N^2) a sweep.
 *
 * @throws FilterFailure E_NO_CONVERGENCE
 *
 * Source: O. Aberth, Iteration methods for finding all zeros of a polynomial simultaneously, Math. Comp. 27, 1973 (from
 * memory).
 */
export function halfRoots(sum: PowerSum, starts: readonly FineRoot[]): readonly FineRoot[] {
  // w = -j*s: left roots lie above the axis.
  const roots = starts.map(({ re, im }) => complex(im, Math.abs(re)));
  const settled = roots.map(() => false);
  for (let sweep = 0; sweep < MOST_SWEEPS && settled.includes(false); sweep++) {
    for (let k = 0; k < roots.length; k++) {
      if (settled[k]) continue;
      const step = stepOf(sum, roots, k);
      const w = roots[k] as Complex;
      const moved = subtract(w, step ?? complex(0, 0));
      roots[k] = complex(moved.re, Math.abs(moved.im));
      settled[k] = step === undefined || magnitude(step) <= SETTLED * magnitude(w);
    }
  }
  if (settled.includes(false)) refuseUnsettled(settled.filter((each) => !each).length);
  return roots.map((_, k) => finished(sum, roots, k));
}

function refuseUnsettled(count: number): never {
  throw refusal(
    'E_NO_CONVERGENCE',
    'roots',
    `${count} roots that do not settle`,
    `roots that settle in ${MOST_SWEEPS} sweeps`,
    'give the roots to more digits, or move those that nearly coincide apart',
  );
}

/** Step from root k; undefined where the sum is nothing but rounding. */
function stepOf(sum: PowerSum, roots: readonly Complex[], k: number): Complex | undefined {
  const w = roots[k] as Complex;
  const { value, slope, size } = sumAt(sum, w);
  if (magnitude(value) <= NOISE * size) return undefined;
  // 1/(slope/value - repulsion): no division by a slope that vanishes.
  const rate = subtract(divide(slope, value), repulsion(roots, k));
  const step = divide(complex(1, 0), rate);
  return Number.isFinite(step.re + step.im) ? step : complex(w.im / 4, w.im / 4);
}

function repulsion(roots: readonly Complex[], k: number): Complex {
  const w = roots[k] as Complex;
  let total = complex(0, 0);
  roots.forEach((other, n) => {
    total = add(total, divide(complex(1, 0), subtract(w, complex(other.re, -other.im))));
    const apart = subtract(w, other);
    if (n !== k && (apart.re !== 0 || apart.im !== 0)) total = add(total, divide(complex(1, 0), apart));
  });
  return total;
}

/** The root in the s-plane after one last step, whose imaginary part keeps what rounding leaves of it. */
function finished(sum: PowerSum, roots: readonly Complex[], k: number): FineRoot {
  const w = roots[k] as Complex;
  const step = stepOf(sum, roots, k) ?? complex(0, 0);
  const small = magnitude(step) <= 1e-8 * w.im ? step : complex(0, 0);
  const im = w.re - small.re;
  const imRest = w.re - im - small.re;
  const re = -(w.im - small.im);
  return imRest === 0 ? { re, im } : { re, im, imRest };
}

/**
 * Roots of a response that is symmetric about omega = 0, made exactly so: each is averaged with the conjugate of the one
 * nearest to its image, or put on the real axis when that is itself.
 */
export function symmetrized(roots: readonly FineRoot[]): readonly FineRoot[] {
  const open = [...roots].sort((a, b) => Math.abs(b.im) - Math.abs(a.im));
  const result: FineRoot[] = [];
  while (open.length > 0) {
    const root = open.shift() as FineRoot;
    const gap = ({ re, im }: FineRoot): number => Math.hypot(re - root.re, im + root.im);
    const best = open.reduce((least, other, n) => (gap(other) < gap(open[least] ?? root) ? n : least), -1);
    if (best < 0) {
      result.push({ re: root.re, im: 0 });
      continue;
    }
    const other = open.splice(best, 1)[0] as FineRoot;
    result.push(...averaged(root, other));
  }
  return result.sort((a, b) => b.im - a.im || a.re - b.re);
}

function averaged(a: FineRoot, b: FineRoot): readonly FineRoot[] {
  const re = (a.re + b.re) / 2;
  const im = (a.im - b.im) / 2;
  const imRest = (a.im - im + (-b.im - im) + (a.imRest ?? 0) - (b.imRest ?? 0)) / 2;
  if (imRest === 0)
    return [
      { re, im },
      { re, im: -im },
    ];
  return [
    { re, im, imRest },
    { re, im: -im, imRest: -imRest },
  ];
}

/** True when each root of a list has its conjugate in it. */
export function isConjugate(roots: readonly FineRoot[]): boolean {
  const listed = new Map<string, number>();
  const key = (re: number, im: number): string => `${re + 0},${im + 0}`;
  for (const { re, im } of roots) listed.set(key(re, im), (listed.get(key(re, im)) ?? 0) + 1);
  return roots.every(({ re, im }) => listed.get(key(re, im)) === listed.get(key(re, -im)));
}
