import type { Certificate, Complex, FilterPolynomials, FineRoot } from '../forms/index.js';
import { atMost, EPSILON, exactly } from './verdict.js';

/**
 * C3: every pole lies in the left half plane, and the poles listed are the roots they claim to be.
 *
 * Winding: along the axis a factor s - p turns by +pi if p lies left of it, by -pi if right; E must turn by N*pi.
 *
 * Disks: `G = F F#/epsilonR^2 + P P#/epsilon^2` has the degree 2N and, if the response is lossless, the roots p and
 * -conj p. For any 2N numbers z_i the disks of radius `2N*|G(z_i)/lead|/prod_(j != i)|z_i - z_j|` together hold all
 * roots of G, and a disk that meets no other holds exactly one (Smith 1970). G is evaluated from the roots of F
 * and P only, so disjoint disks, clear of the axis, prove N distinct roots of the true E, one next to each pole
 * listed; mirror disks follow from G = G#. S11 and S22 may differ. Cost O(N^2).
 */
export function stability(polynomials: FilterPolynomials): Certificate[] {
  const { order, poles } = polynomials;
  const turns = poles.reduce((sum, p) => sum + Math.sign(-p.re), 0);
  return [
    exactly('C3 half turns of E along the axis', turns, order),
    atMost('C3 disks of the poles against their gaps', diskCrowding(polynomials), DISK_LIMIT),
  ];
}

/** Radii over gaps: 1 is the first touch; a half keeps one radius of clear space. */
const DISK_LIMIT = 0.5;

/** Rounding of one evaluation of G over the product of gaps, in units of eps per order: 4N factors, each a difference and a complex product or quotient. */
const ROUNDING_PER_ORDER = 16;

/** The largest of radius/distance to the axis and (radius + radius)/distance between poles. */
function diskCrowding(polynomials: FilterPolynomials): number {
  const { order, poles } = polynomials;
  if (poles.length !== order) return Infinity;
  const radii = poles.map((_, i) => diskRadius(polynomials, i));
  let crowding = 0;
  poles.forEach((p, i) => {
    const radius = radii[i] ?? Number.NaN;
    crowding = Math.max(crowding, radius / -p.re, p.re < 0 ? 0 : Infinity);
    for (let j = 0; j < i; j++) {
      const q = poles[j] ?? p;
      crowding = Math.max(crowding, (radius + (radii[j] ?? Number.NaN)) / Math.hypot(p.re - q.re, p.im - q.im));
    }
  });
  return crowding;
}

function diskRadius(polynomials: FilterPolynomials, i: number): number {
  const { order, reflectionZeros, transmissionZeros, transmissionLead, epsilon, epsilonR } = polynomials;
  const lead = transmissionLead.re * transmissionLead.re + transmissionLead.im * transmissionLead.im;
  const reflected = signed(reflectionZeros.length, 1 / (epsilonR * epsilonR));
  const transmitted = signed(transmissionZeros.length, lead / (epsilon * epsilon));
  const f = overGaps(polynomials.poles, i, reflectionZeros);
  const p = overGaps(polynomials.poles, i, transmissionZeros);
  const value = Math.hypot(reflected * f.re + transmitted * p.re, reflected * f.im + transmitted * p.im);
  const size = Math.abs(reflected) * Math.hypot(f.re, f.im) + Math.abs(transmitted) * Math.hypot(p.re, p.im);
  const leading =
    (reflectionZeros.length === order ? Math.abs(reflected) : 0) +
    (transmissionZeros.length === order ? Math.abs(transmitted) : 0);
  return (2 * order * (value + ROUNDING_PER_ORDER * order * EPSILON * size)) / leading;
}

/** `X X#` has the leading coefficient `(-1)^degree` times the square of that of X. */
function signed(degree: number, size: number): number {
  return degree % 2 === 0 ? size : -size;
}

/** `prod_k (z - r_k)(z + conj r_k)` at z = pole i, over the product of its distances to all other poles and mirrored poles. */
export function overGaps(poles: readonly FineRoot[], i: number, roots: readonly FineRoot[]): Complex {
  const z = poles[i] ?? { re: Number.NaN, im: Number.NaN };
  let value: Complex = { re: 1, im: 0 };
  for (let k = 0; k < Math.max(poles.length, roots.length); k++) {
    const root = roots[k];
    if (root !== undefined) value = product(value, product(minus(z, root), plusMirror(z, root)));
    const pole = poles[k];
    if (pole !== undefined) value = quotient(value, plusMirror(z, pole));
    if (pole !== undefined && k !== i) value = quotient(value, minus(z, pole));
  }
  return value;
}

function minus(z: FineRoot, r: FineRoot): Complex {
  return { re: z.re - r.re, im: z.im - r.im + ((z.imRest ?? 0) - (r.imRest ?? 0)) };
}

function plusMirror(z: FineRoot, r: FineRoot): Complex {
  return { re: z.re + r.re, im: z.im - r.im + ((z.imRest ?? 0) - (r.imRest ?? 0)) };
}

function product(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
}

function quotient(a: Complex, b: Complex): Complex {
  const norm = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / norm, im: (a.im * b.re - a.re * b.im) / norm };
}
