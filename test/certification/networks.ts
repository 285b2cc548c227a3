/**
 * Networks made for these tests alone, from closed forms and from the phase of the filtering function, so that the
 * certificates are tried without the synthesis they are to judge.
 */
import type { Complex, CouplingMatrix, FilterPolynomials } from '../../src/forms/index.js';

export interface Network {
  readonly polynomials: FilterPolynomials;
  readonly matrix: CouplingMatrix;
}

const J_POWERS: readonly Complex[] = [
  { re: 1, im: 0 },
  { re: 0, im: 1 },
  { re: -1, im: 0 },
  { re: 0, im: -1 },
];

/** j^n for any whole n. */
export function powerOfJ(n: number): Complex {
  return J_POWERS[((n % 4) + 4) % 4]!;
}

/** Deterministic numbers in [0, 1). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

export function withEntry(matrix: CouplingMatrix, i: number, j: number, value: number): CouplingMatrix {
  const values = matrix.values.map((row) => [...row]);
  values[i]![j] = value;
  values[j]![i] = value;
  return { ...matrix, values };
}

function line(order: number, couplings: readonly number[]): CouplingMatrix {
  const values = Array.from({ length: order + 2 }, () => new Array<number>(order + 2).fill(0));
  couplings.forEach((m, i) => {
    values[i]![i + 1] = m;
    values[i + 1]![i] = m;
  });
  return { order, values, finiteZeros: 0 };
}

/** In-line Butterworth, half-power edge at 1: g_i = 2 sin((2i-1)pi/2N). */
export function butterworthLine(order: number): Network {
  const angle = (i: number): number => (Math.PI * (2 * i - 1)) / (2 * order);
  const g = [1, ...Array.from({ length: order }, (_, i) => 2 * Math.sin(angle(i + 1))), 1];
  return {
    matrix: line(
      order,
      g.slice(1).map((x, i) => 1 / Math.sqrt(x * g[i]!)),
    ),
    polynomials: {
      family: 'butterworth',
      order,
      poles: Array.from({ length: order }, (_, i) => ({ re: -Math.sin(angle(i + 1)), im: Math.cos(angle(i + 1)) })),
      reflectionZeros: Array.from({ length: order }, () => ({ re: 0, im: 0 })),
      transmissionZeros: [],
      transmissionLead: powerOfJ(-(order + 1)),
      epsilon: 1,
      epsilonR: 1,
    },
  };
}

/** In-line Chebyshev of closed form: poles -sinh(eta) sin(t) + j cosh(eta) cos(t), and the g values as couplings between equal ports. */
export function chebyshevLine(order: number, returnLossDb: number): Network {
  const kappa = Math.sqrt(10 ** (returnLossDb / 10) - 1);
  const eta = Math.asinh(kappa) / order;
  const angle = (i: number): number => (Math.PI * (2 * i - 1)) / (2 * order);
  // Couplings symmetric by construction: M_i,i+1^2 = (sinh^2 eta + sin^2(i pi/N))/(4 sin sin), M_01^2 = sinh(eta)/(2 sin).
  const couplings = Array.from({ length: order + 1 }, (_, i) => {
    if (i === 0 || i === order) return Math.sqrt(Math.sinh(eta) / (2 * Math.sin(angle(1))));
    const top = Math.sinh(eta) ** 2 + Math.sin((Math.PI * i) / order) ** 2;
    return Math.sqrt(top / (4 * Math.sin(angle(i)) * Math.sin(angle(i + 1))));
  });
  const t = Array.from({ length: order }, (_, i) => angle(i + 1));
  return {
    matrix: line(order, couplings),
    polynomials: {
      family: 'generalizedChebyshev',
      order,
      poles: t.map((x) => ({ re: -Math.sinh(eta) * Math.sin(x), im: Math.cosh(eta) * Math.cos(x) })),
      reflectionZeros: t.map((x) => ({ re: 0, im: Math.cos(x) })),
      transmissionZeros: [],
      transmissionLead: powerOfJ(-(order + 1)),
      epsilon: 2 ** (order - 1) / kappa,
      epsilonR: 1,
      returnLossDb,
    },
  };
}

const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
const sub = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im });
const mul = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });
const div = (a: Complex, b: Complex): Complex => {
  const norm = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / norm, im: (a.im * b.re - a.re * b.im) / norm };
};
const log = (a: Complex): Complex => ({ re: Math.log(Math.hypot(a.re, a.im)), im: Math.atan2(a.im, a.re) });
const root = (a: Complex): Complex => {
  const size = Math.sqrt(Math.hypot(a.re, a.im));
  const half = Math.atan2(a.im, a.re) / 2;
  return { re: size * Math.cos(half), im: size * Math.sin(half) };
};
const expJ = (a: Complex): Complex => ({ re: Math.exp(-a.im) * Math.cos(a.re), im: Math.exp(-a.im) * Math.sin(a.re) });
const ONE: Complex = { re: 1, im: 0 };

/** The point inside the unit disk with (a + 1/a)/2 = omega. */
function inside(omega: Complex): Complex {
  const r = root(mul(sub(omega, ONE), add(omega, ONE)));
  const [plus, minus] = [add(omega, r), sub(omega, r)];
  return div(ONE, Math.hypot(plus.re, plus.im) > Math.hypot(minus.re, minus.im) ? plus : minus);
}

/** Generalized Chebyshev polynomials from the phase of the filtering function; `zeros` in the s-plane. */
export function equirippleRoots(order: number, returnLossDb: number, zeros: readonly Complex[]): FilterPolynomials {
  const points = zeros.map((z) => inside({ re: z.im, im: -z.re }));
  const kappa = Math.sqrt(10 ** (returnLossDb / 10) - 1);
  const phase = (phi: Complex): Complex => {
    const u = expJ(phi);
    return points.reduce(
      (sum, a) => {
        const turned = sub(log(sub(ONE, div(a, u))), log(sub(ONE, mul(a, u))));
        return add(sum, { re: turned.im, im: -turned.re });
      },
      { re: order * phi.re, im: order * phi.im },
    );
  };
  const slope = (phi: Complex): Complex => {
    const u = expJ(phi);
    return points.reduce((sum, a) => add(sum, div(mul(u, sub(ONE, mul(a, a))), mul(sub(u, a), sub(ONE, mul(a, u))))), {
      re: order - points.length,
      im: 0,
    });
  };
  const newton = (phi: Complex, target: Complex): Complex => {
    const off = sub(phase(phi), target);
    const wrapped = { re: off.re - 2 * Math.PI * Math.round(off.re / (2 * Math.PI)), im: off.im };
    return sub(phi, div(wrapped, slope(phi)));
  };
  const reflectionZeros: Complex[] = [];
  const poles: Complex[] = [];
  for (let k = 1; k <= order; k++) {
    const target = (k - 0.5) * Math.PI;
    let [low, high] = [0, Math.PI];
    for (let step = 0; step < 60; step++) {
      const middle = (low + high) / 2;
      if (phase({ re: middle, im: 0 }).re < target) low = middle;
      else high = middle;
    }
    const angle = newton({ re: (low + high) / 2, im: 0 }, { re: target, im: 0 }).re;
    reflectionZeros.push({ re: 0, im: Math.cos(angle) });
    let phi: Complex = { re: angle, im: 0 };
    for (let step = 1; step <= 48; step++) {
      const height = Math.asinh(kappa) * Math.min(1, step / 40);
      for (let inner = 0; inner < 3; inner++) phi = newton(phi, { re: target, im: height });
    }
    // omega = cos(phi); s = j*omega, in the left half plane.
    const omega = { re: Math.cos(phi.re) * Math.cosh(phi.im), im: -Math.sin(phi.re) * Math.sinh(phi.im) };
    poles.push({ re: -Math.abs(omega.im), im: omega.re });
  }
  const edge: Complex = { re: 0, im: 1 };
  let ratio = 1;
  for (let k = 0; k < order; k++) {
    const z = zeros[k];
    if (z !== undefined) ratio *= Math.hypot(z.re, 1 - z.im);
    const f = sub(edge, reflectionZeros[k]!);
    ratio /= Math.hypot(f.re, f.im);
  }
  ratio /= kappa;
  const canonical = zeros.length === order;
  const above = zeros.filter((z) => z.re === 0 && z.im > 0).length;
  const below = zeros.filter((z) => z.re === 0 && z.im < 0).length;
  const pairs = (zeros.length - above - below) / 2;
  return {
    family: 'generalizedChebyshev',
    order,
    poles,
    reflectionZeros,
    transmissionZeros: zeros,
    transmissionLead: powerOfJ(-(order + 1) + above - below + 2 * pairs),
    epsilon: canonical ? Math.sqrt(1 + ratio * ratio) : ratio,
    epsilonR: canonical ? Math.sqrt(1 + ratio * ratio) / ratio : 1,
    returnLossDb,
  };
}

/**
 * Transversal matrix of a symmetric two-port from its poles. S11 + S21 and S11 - S21 are all-pass; a pole belongs to the
 * first where P/epsilon = F/epsilonR there, to the second where it is the negative. All-pass `S = -1` at an eigenvalue.
 */
export function transversalOf(polynomials: FilterPolynomials): CouplingMatrix {
  const { order, poles, transmissionZeros, transmissionLead, epsilon, epsilonR } = polynomials;
  const canonical = transmissionZeros.length === order;
  const turn = canonical ? Math.sign(transmissionLead.im) * Math.atan(epsilonR / epsilon) : 0;
  const size = order + 2;
  const values = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const set = (i: number, j: number, value: number): void => {
    values[i]![j] = value;
    values[j]![i] = value;
  };
  let node = 0;
  for (const sign of [1, -1]) {
    const own = poles.filter((p) => modeOf(polynomials, p) === sign);
    const psi = (w: number): number => own.reduce((sum, p) => sum + Math.atan2(w - p.im, -p.re), 0);
    const slope = (w: number): number => own.reduce((sum, p) => sum - p.re / (p.re ** 2 + (w - p.im) ** 2), 0);
    for (let m = 0; m < own.length; m++) {
      const target = (sign * turn + (own.length - 1) * Math.PI) / 2 - m * Math.PI;
      let [low, high] = [-1e6, 1e6];
      for (let step = 0; step < 90; step++) {
        const middle = (low + high) / 2;
        if (psi(middle) < target) low = middle;
        else high = middle;
      }
      const coupling = Math.sqrt(1 / (2 * slope((low + high) / 2)));
      node++;
      set(node, node, -(low + high) / 2);
      set(node, order + 1, coupling);
      set(0, node, sign * coupling);
    }
  }
  set(0, order + 1, canonical ? -Math.tan(turn / 2) : 0);
  return { order, values, finiteZeros: transmissionZeros.length };
}

function modeOf(polynomials: FilterPolynomials, pole: Complex): number {
  let ratio = polynomials.transmissionLead;
  for (const z of polynomials.transmissionZeros) ratio = mul(ratio, sub(pole, z));
  for (const f of polynomials.reflectionZeros) ratio = div(ratio, sub(pole, f));
  return Math.sign(ratio.re);
}

/** R M R^T with pivot [i, j], R_ii = R_jj = cos, R_ij = -sin, R_ji = sin, symmetric by construction. */
function turn(values: number[][], i: number, j: number, angle: number): void {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const [ii, jj, ij] = [values[i]![i]!, values[j]![j]!, values[i]![j]!];
  for (let k = 0; k < values.length; k++) {
    if (k === i || k === j) continue;
    const [a, b] = [values[i]![k]!, values[j]![k]!];
    values[i]![k] = c * a - s * b;
    values[j]![k] = s * a + c * b;
    values[k]![i] = values[i]![k]!;
    values[k]![j] = values[j]![k]!;
  }
  values[i]![i] = c * c * ii - 2 * s * c * ij + s * s * jj;
  values[j]![j] = s * s * ii + 2 * s * c * ij + c * c * jj;
  values[i]![j] = (c * c - s * s) * ij + s * c * (ii - jj);
  values[j]![i] = values[i]![j]!;
}

function clear(values: number[][], row: number, gone: number, kept: number): void {
  // The pivot [kept, gone] with kept < gone annihilates (row, gone); [gone, kept] annihilates (row, gone) the other way.
  if (kept < gone) turn(values, kept, gone, -Math.atan2(values[row]![gone]!, values[row]![kept]!));
  else turn(values, gone, kept, Math.atan2(values[row]![gone]!, values[row]![kept]!));
  values[row]![gone] = 0;
  values[gone]![row] = 0;
}

/** Folded form by plain rotations, rows and columns in turn; entries that only rounding fills are set to 0. */
export function foldedOf(matrix: CouplingMatrix): CouplingMatrix {
  const n = matrix.order;
  const values = matrix.values.map((row) => [...row]);
  for (let step = 0; step < n; step++) {
    const [row, column] = [step, n + 1 - step];
    for (let k = n - step; k >= row + 2; k--) clear(values, row, k, k - 1);
    for (let k = row + 2; k <= column - 2; k++) clear(values, column, k, k + 1);
  }
  return tidy(values, matrix, (i, j, zeros) => {
    const cross = i + j === n + 1 || i + j === n + 2;
    return j - i <= 1 || (cross && j - i - 1 <= zeros);
  });
}

/** Arrow form: each row cleared to its neighbor; the load column keeps the last entries. */
export function arrowOf(matrix: CouplingMatrix): CouplingMatrix {
  const n = matrix.order;
  const values = matrix.values.map((row) => [...row]);
  for (let row = 0; row < n - 1; row++) for (let k = n; k >= row + 2; k--) clear(values, row, k, row + 1);
  return tidy(values, matrix, (i, j, zeros) => j - i <= 1 || (j === n + 1 && i >= n - zeros));
}

function tidy(
  values: number[][],
  matrix: CouplingMatrix,
  allowed: (i: number, j: number, zeros: number) => boolean,
): CouplingMatrix {
  const zeros = matrix.finiteZeros ?? 0;
  for (let i = 0; i < values.length; i++) {
    for (let j = i; j < values.length; j++) {
      if (allowed(i, j, zeros)) continue;
      values[i]![j] = 0;
      values[j]![i] = 0;
    }
  }
  return { ...matrix, values };
}

/** A transversal network with prescribed zeros. */
export function equiripple(order: number, returnLossDb: number, zeros: readonly Complex[]): Network {
  const polynomials = equirippleRoots(order, returnLossDb, zeros);
  return { polynomials, matrix: transversalOf(polynomials) };
}

export const onAxis = (...omegas: readonly number[]): Complex[] => omegas.map((w) => ({ re: 0, im: w }));
