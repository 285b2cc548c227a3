import type { Certificate, Complex, CouplingMatrix, FilterPolynomials } from '../forms/index.js';
import { polesByRounding } from './fitted-poles.js';
import { atMost, EPSILON } from './verdict.js';

/**
 * Units of rounding, relative to the sum of all magnitudes in the identity; for the poles plus what rounding of F and P moves
 * them by, since a matrix has the poles that F and P fix.
 */
const ROUNDING_LIMIT = 30;

/**
 * C7, without any frequency: the first two power sums of the poles and of the reflection zeros, read off the matrix.
 *
 * With the ports eliminated, `det A` is proportional to `det(omega*I + W)`, `W = M_rr - K G K^T`, K the two port columns
 * and `G = (M_pp - j*I)^-1`: the eigenvalues of W are j*p, so `tr W = j*sum p` and `tr W^2 = -sum p^2`. S11 vanishes
 * where `det A` with +j for -j at the source does: the same identities hold for F with `G = (M_pp + diag(j, -j))^-1`.
 * With M_SS = M_LL = 0 and B = M_SL the first ones read `sum(M_Sk^2 + M_Lk^2) = -(1 + B^2) sum Re p`,
 * `sum M_kk = 2B sum(M_Sk M_Lk)/(1 + B^2) - sum Im p`, `sum(M_Sk^2 - M_Lk^2) = (1 - B^2) sum Re f`.
 */
export function powerSums(polynomials: FilterPolynomials, matrix: CouplingMatrix): Certificate[] {
  const { order, poles, reflectionZeros } = polynomials;
  const sums = portSums(matrix);
  const certificates = identities('poles', poles, traces(sums, -1), polesByRounding(polynomials));
  // Fewer reflection zeros than the order: S11 vanishes at infinity, G does not exist and neither do the identities.
  if (reflectionZeros.length < order) return certificates;
  return [...certificates, ...identities('reflection zeros', reflectionZeros, traces(sums, 1), [])];
}

interface PortSums {
  readonly ports: readonly [number, number, number];
  readonly trace: number;
  readonly traceSize: number;
  readonly squares: number;
  /** m_x . m_y and m_x^T M m_y for xy = SS, SL, LL. */
  readonly products: readonly [number, number, number];
  readonly through: readonly [number, number, number];
  readonly size: number;
}

interface Traces {
  readonly first: Complex;
  readonly second: Complex;
  /** Sums of the magnitudes that went into each. */
  readonly firstSize: number;
  readonly secondSize: number;
}

function portSums(matrix: CouplingMatrix): PortSums {
  const n = matrix.order;
  const rows = matrix.values;
  const entry = (i: number, j: number): number => rows[i]?.[j] ?? Number.NaN;
  const block = Array.from({ length: n }, (_, i) => (rows[i + 1] ?? []).slice(1, n + 1));
  const s = (rows[0] ?? []).slice(1, n + 1);
  const l = (rows[n + 1] ?? []).slice(1, n + 1);
  const [throughS, throughL] = [s, l].map((vector) => block.map((row) => dot(row, vector)));
  const diagonal = block.map((row, i) => row[i] ?? Number.NaN);
  const squares = block.reduce((sum, row) => sum + dot(row, row), 0);
  const [ss, ll] = [dot(s, s), dot(l, l)];
  return {
    ports: [entry(0, 0), entry(0, n + 1), entry(n + 1, n + 1)],
    trace: diagonal.reduce((sum, x) => sum + x, 0),
    traceSize: diagonal.reduce((sum, x) => sum + Math.abs(x), 0),
    squares,
    products: [ss, dot(s, l), ll],
    through: [dot(s, throughS ?? []), dot(s, throughL ?? []), dot(l, throughL ?? [])],
    size: ss + ll,
  };
}

/** tr W and tr W^2 with `sourceSign*j` in the place of the source's port term and -j at the load. */
function traces(sums: PortSums, sourceSign: 1 | -1): Traces {
  const [source, direct, load] = sums.ports;
  // det = (M_SS + sign*j)(M_LL - j) - M_SL^2 ; G = [[M_LL - j, -M_SL], [-M_SL, M_SS + sign*j]]/det.
  const det: Complex = { re: source * load + sourceSign - direct * direct, im: sourceSign * load - source };
  const norm = det.re * det.re + det.im * det.im;
  const over = (re: number, im: number): Complex => ({
    re: (re * det.re + im * det.im) / norm,
    im: (im * det.re - re * det.im) / norm,
  });
  const g = [over(load, -1), over(-direct, 0), over(source, sourceSign)] as const;
  const [a, b, c] = sums.products;
  const [u, v, w] = sums.through;
  const loaded = { re: g[0].re * a + 2 * g[1].re * b + g[2].re * c, im: g[0].im * a + 2 * g[1].im * b + g[2].im * c };
  const crossed = { re: g[0].re * u + 2 * g[1].re * v + g[2].re * w, im: g[0].im * u + 2 * g[1].im * v + g[2].im * w };
  const coupled = squareTrace(g, sums.products);
  // The entries of G carry the relative error of det, which cancels where M_SL comes near 1.
  const cancelled = (Math.abs(source * load) + 1 + direct * direct) / Math.sqrt(norm);
  const largest = cancelled * Math.max(...g.map((x) => Math.hypot(x.re, x.im)));
  return {
    first: { re: sums.trace - loaded.re, im: -loaded.im },
    second: { re: sums.squares - 2 * crossed.re + coupled.re, im: -2 * crossed.im + coupled.im },
    firstSize: sums.traceSize + largest * sums.size,
    secondSize: sums.squares + 2 * largest * sums.size * Math.sqrt(sums.squares) + (largest * sums.size) ** 2,
  };
}

/** tr (G Q)^2 for the symmetric 2 x 2 matrices G (complex) and Q (real), each given as [11, 12, 22]. */
function squareTrace(g: readonly [Complex, Complex, Complex], q: readonly [number, number, number]): Complex {
  const mix = (x: Complex, s: number, y: Complex, t: number): Complex => ({
    re: x.re * s + y.re * t,
    im: x.im * s + y.im * t,
  });
  const ss = mix(g[0], q[0], g[1], q[1]);
  const sl = mix(g[0], q[1], g[1], q[2]);
  const ls = mix(g[1], q[0], g[2], q[1]);
  const ll = mix(g[1], q[1], g[2], q[2]);
  return {
    re: ss.re * ss.re - ss.im * ss.im + 2 * (sl.re * ls.re - sl.im * ls.im) + ll.re * ll.re - ll.im * ll.im,
    im: 2 * (ss.re * ss.im + sl.re * ls.im + sl.im * ls.re + ll.re * ll.im),
  };
}

function identities(name: string, roots: readonly Complex[], traced: Traces, moves: readonly number[]): Certificate[] {
  let [re, im, squareRe, squareIm, size, squareSize] = [0, 0, 0, 0, 0, 0];
  roots.forEach((root, k) => {
    const move = moves[k] ?? 0;
    re += root.re;
    im += root.im;
    squareRe += root.re * root.re - root.im * root.im;
    squareIm += 2 * root.re * root.im;
    size += Math.hypot(root.re, root.im) + move;
    squareSize += root.re * root.re + root.im * root.im + 2 * Math.hypot(root.re, root.im) * move;
  });
  const first = Math.hypot(traced.first.re + im, traced.first.im - re);
  const second = Math.hypot(traced.second.re + squareRe, traced.second.im + squareIm);
  return [
    atMost(`C7 sum of the ${name}, units of rounding`, rounded(first, traced.firstSize + size), ROUNDING_LIMIT),
    atMost(
      `C7 sum of the squares of the ${name}, units of rounding`,
      rounded(second, traced.secondSize + squareSize),
      ROUNDING_LIMIT,
    ),
  ];
}

/** A difference of exactly 0 counts as 0 also where everything it was made of is 0. */
function rounded(difference: number, size: number): number {
  return difference === 0 ? 0 : difference / (EPSILON * size);
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, x, i) => sum + x * (b[i] ?? Number.NaN), 0);
}
