import type { FineRoot } from '../forms/index.js';
import { type Complex, complex, EPS, FilterFailure } from '../numerics/index.js';
import { type BandPhase, bandPhase } from './band-phase.js';
import { conjugate, countInUpperHalf, type HalfBandRoot, halfBandRoots, mirrored } from './half-band.js';

/** Bends of the continuation, radians; the next one is tried when a path stalls or two poles come out alike. */
const DETOURS: readonly number[] = [0.35, -0.6, 0.85, -1.1, 0.15, -0.25, 1.3, -1.4];

/** Reflection zeros with 1 - omega, and poles, by falling frequency. */
export interface BandRoots {
  readonly reflection: readonly { readonly zero: FineRoot; readonly oneMinus: number }[];
  readonly poles: readonly FineRoot[];
}

/**
 * All reflection zeros and poles of the response with the given transmission zeros (omega plane).
 *
 * A set of zeros that is exactly symmetric about omega = 0 gives exactly symmetric roots.
 *
 * @throws FilterFailure E_NO_CONVERGENCE when no continuation separates the poles
 */
export function bandRoots(order: number, omega: readonly Complex[], kappa: number): BandRoots {
  const phase = bandPhase(order, omega);
  const mirrorPhase = bandPhase(
    order,
    omega.map((w) => complex(-w.re, w.im)),
  );
  for (const detour of DETOURS) {
    const roots = bothHalves(order, phase, mirrorPhase, kappa, detour);
    if (roots === undefined) continue;
    const found = isSymmetric(phase, mirrorPhase)
      ? symmetrized(roots)
      : { reflection: roots, poles: roots.map(({ pole }) => pole) };
    if (found.poles.length === order && areApart(found.poles)) return { ...found, poles: byFrequency(found.poles) };
  }
  throw new FilterFailure(
    'E_NO_CONVERGENCE',
    'E_NO_CONVERGENCE transmissionZeros: found two poles too close to tell apart; allowed responses with distinct poles; move a transmission zero or the return loss slightly',
    { argument: 'transmissionZeros', hint: 'move a transmission zero or the return loss slightly' },
  );
}

function bothHalves(
  order: number,
  phase: BandPhase,
  mirrorPhase: BandPhase,
  kappa: number,
  detour: number,
): readonly HalfBandRoot[] | undefined {
  const count = isSymmetric(phase, mirrorPhase) ? Math.ceil(order / 2) : countInUpperHalf(phase);
  const upper = halfBandRoots(phase, count, kappa, detour);
  const lower = halfBandRoots(mirrorPhase, order - count, kappa, -detour);
  if (upper === undefined || lower === undefined) return undefined;
  return [...upper, ...lower.map(mirrored).reverse()];
}

function isSymmetric(phase: BandPhase, mirrorPhase: BandPhase): boolean {
  return phase.finite.every(({ q }, n) => q.re === mirrorPhase.finite[n]?.q.re && q.im === mirrorPhase.finite[n]?.q.im);
}

/**
 * Whether all poles lie in the left half plane and differ from one another by more than rounding: than a few ulp of their
 * size, and than 1e-9 of their distance from the axis.
 */
function areApart(poles: readonly FineRoot[]): boolean {
  const differ = (p: FineRoot, q: FineRoot): boolean =>
    Math.hypot(p.re - q.re, p.im - q.im) > 1e-9 * Math.abs(p.re) + 16 * EPS * Math.hypot(p.re, p.im);
  return poles.every((p, i) => p.re < 0 && poles.every((q, j) => j <= i || differ(p, q)));
}

function byFrequency(poles: readonly FineRoot[]): readonly FineRoot[] {
  return [...poles].sort((a, b) => b.im - a.im || a.re - b.re);
}

/**
 * Makes rounding symmetric: the upper half is kept, averaged with the mirror image of the lower, and mirrored. Fewer poles
 * come out when the mirror images do not pair up.
 */
function symmetrized(roots: readonly HalfBandRoot[]): BandRoots {
  const last = roots.length - 1;
  const reflection = roots.map((root, n) => {
    if (2 * n === last) return { zero: { re: 0, im: 0 }, oneMinus: 1 };
    const upper = roots[last - n] as HalfBandRoot;
    return n < last - n ? root : { zero: conjugate(upper.zero), oneMinus: upper.onePlus };
  });
  const poles = roots.map(({ pole }) => pole);
  const real = poles.filter((pole) => isOwnMirror(poles, pole)).map(({ re }) => ({ re, im: 0 }));
  const upper = poles
    .filter((pole) => !isOwnMirror(poles, pole) && pole.im > 0)
    .map((pole) => averaged(pole, nearestMirror(poles, pole)));
  return { reflection, poles: [...upper, ...real, ...upper.map(conjugate)] };
}

function isOwnMirror(poles: readonly FineRoot[], pole: FineRoot): boolean {
  return nearestMirror(poles, pole) === pole;
}

/** The pole whose mirror image is nearest to `pole`. */
function nearestMirror(poles: readonly FineRoot[], pole: FineRoot): FineRoot {
  const distance = (other: FineRoot): number => Math.hypot(other.re - pole.re, other.im + pole.im);
  return poles.reduce((best, other) => (distance(other) < distance(best) ? other : best));
}

/** Mean of a pole and the mirror image of its partner; the two differ by rounding, so the difference of `im` is exact. */
function averaged(pole: FineRoot, partner: FineRoot): FineRoot {
  const { imRest = 0 } = pole;
  const { imRest: partnerRest = 0 } = partner;
  const rest = imRest + (-partner.im - pole.im - partnerRest - imRest) / 2;
  const im = pole.im + rest;
  return { re: (pole.re + partner.re) / 2, im, imRest: pole.im - im + rest };
}
