import type { Curves } from './curves.js';
import type { FlatPlan } from './sparse-factor.js';

/** Scratch of one sparse sweep: the complex symmetric matrix (row-major, both parts) and the two port columns. */
interface Workspace {
  readonly size: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly x: readonly [Float64Array, Float64Array];
  readonly y: readonly [Float64Array, Float64Array];
}

/**
 * Sweep with a loss of its own for every resonator (all > 0): symmetric elimination without pivoting in an order that keeps
 * the pattern sparse, ports last, then back substitution of both port columns.
 *
 * Without pivoting it is stable because the imaginary part of A is negative definite: the growth of complex symmetric
 * elimination is then below 3 (N. J. Higham, Factorizing complex symmetric matrices with positive definite real and
 * imaginary parts, Math. Comp. 67, 1998; from memory).
 */
export function sweepSparse(
  rows: readonly Float64Array[],
  plan: FlatPlan,
  loss: Float64Array,
  omega: Float64Array,
  out: Curves,
): void {
  const size = rows.length;
  const work: Workspace = {
    size,
    re: new Float64Array(size * size),
    im: new Float64Array(size * size),
    x: [new Float64Array(size), new Float64Array(size)],
    y: [new Float64Array(size), new Float64Array(size)],
  };
  for (let n = 0; n < omega.length; n++) {
    fill(work, rows, loss, omega[n] as number);
    eliminate(work, plan);
    portColumns(work, plan);
    store(work, out, n);
  }
}

function fill({ size, re, im }: Workspace, rows: readonly Float64Array[], loss: Float64Array, omega: number): void {
  im.fill(0);
  for (let i = 0; i < size; i++) re.set(rows[i] as Float64Array, i * size);
  for (let i = 1; i < size - 1; i++) {
    re[i * size + i] = (re[i * size + i] as number) + omega;
    im[i * size + i] = -(loss[i - 1] as number);
  }
  im[0] = -1;
  im[size * size - 1] = -1;
}

/** Schur complements in place; the multiplier of each eliminated entry stays in the pivot's row. */
function eliminate({ size, re, im }: Workspace, { nodes, starts, rest }: FlatPlan): void {
  for (let n = 0; n < nodes.length; n++) {
    const row = (nodes[n] as number) * size;
    const a = re[row + (nodes[n] as number)] as number;
    const b = im[row + (nodes[n] as number)] as number;
    const square = 1 / (a * a + b * b);
    const [from, to] = [starts[n] as number, starts[n + 1] as number];
    for (let p = from; p < to; p++) {
      const i = rest[p] as number;
      const c = re[row + i] as number;
      const d = im[row + i] as number;
      const factorRe = (c * a + d * b) * square;
      const factorIm = (d * a - c * b) * square;
      for (let q = p; q < to; q++) {
        const j = rest[q] as number;
        const e = re[row + j] as number;
        const f = im[row + j] as number;
        const at = i * size + j;
        re[at] = re[j * size + i] = (re[at] as number) - (factorRe * e - factorIm * f);
        im[at] = im[j * size + i] = (im[at] as number) - (factorRe * f + factorIm * e);
      }
    }
  }
}

/** Columns of the inverse at source (x) and load (y): the 2 x 2 of the ports first, then the resonators backward. */
function portColumns(work: Workspace, { nodes, starts, rest }: FlatPlan): void {
  const { size, re, im } = work;
  const last = size - 1;
  const [ar, ai] = [re[0] as number, im[0] as number];
  const [br, bi] = [re[last] as number, im[last] as number];
  const [cr, ci] = [re[size * size - 1] as number, im[size * size - 1] as number];
  const dr = ar * cr - ai * ci - br * br + bi * bi;
  const di = ar * ci + ai * cr - 2 * br * bi;
  const square = 1 / (dr * dr + di * di);
  const put = ([vr, vi]: readonly [Float64Array, Float64Array], i: number, p: number, q: number): void => {
    vr[i] = (p * dr + q * di) * square;
    vi[i] = (q * dr - p * di) * square;
  };
  put(work.x, 0, cr, ci);
  put(work.x, last, -br, -bi);
  put(work.y, 0, -br, -bi);
  put(work.y, last, ar, ai);
  for (let n = nodes.length - 1; n >= 0; n--) {
    for (const vector of [work.x, work.y])
      substituteBack(work, vector, nodes[n] as number, rest, starts[n] as number, starts[n + 1] as number);
  }
}

function substituteBack(
  { size, re, im }: Workspace,
  [vr, vi]: readonly [Float64Array, Float64Array],
  node: number,
  rest: Int32Array,
  from: number,
  to: number,
): void {
  const row = node * size;
  let p = 0;
  let q = 0;
  for (let k = from; k < to; k++) {
    const j = rest[k] as number;
    const a = re[row + j] as number;
    const b = im[row + j] as number;
    p -= a * (vr[j] as number) - b * (vi[j] as number);
    q -= a * (vi[j] as number) + b * (vr[j] as number);
  }
  const a = re[row + node] as number;
  const b = im[row + node] as number;
  const square = 1 / (a * a + b * b);
  vr[node] = (p * a + q * b) * square;
  vi[node] = (q * a - p * b) * square;
}

function store({ size, x, y }: Workspace, out: Curves, n: number): void {
  const last = size - 1;
  const s21Re = 2 * (x[1][last] as number);
  const s21Im = -2 * (x[0][last] as number);
  out.s11.re[n] = -1 + 2 * (x[1][0] as number);
  out.s11.im[n] = -2 * (x[0][0] as number);
  out.s21.re[n] = s21Re;
  out.s21.im[n] = s21Im;
  out.s22.re[n] = -1 + 2 * (y[1][last] as number);
  out.s22.im[n] = -2 * (y[0][last] as number);
  let re = 0;
  let im = 0;
  for (let i = 1; i < last; i++) {
    const [a, b, c, d] = [x[0][i] as number, x[1][i] as number, y[0][i] as number, y[1][i] as number];
    re += a * c - b * d;
    im += a * d + b * c;
  }
  out.groupDelay[n] = (-2 * (re * s21Re + im * s21Im)) / (s21Re * s21Re + s21Im * s21Im);
}
