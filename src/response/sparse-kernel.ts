import type { Curves } from './curves.js';
import type { EliminationPlan } from './sparse-factor.js';

/** Scratch of one sparse sweep: the values by slot, and the two port columns by node, real and imaginary parts. */
interface Workspace {
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly xRe: Float64Array;
  readonly xIm: Float64Array;
  readonly yRe: Float64Array;
  readonly yIm: Float64Array;
}

/**
 * Sweep with a loss of its own for every resonator (all > 0): symmetric elimination without pivoting in an order that keeps
 * the pattern sparse, ports last, then back substitution of both port columns.
 *
 * Without pivoting a small pivot loses digits (a resonator at its own frequency has only its loss there); such points are
 * marked by NaN in the delay and solved with pivoting by the caller.
 */
export function sweepSparse(plan: EliminationPlan, loss: Float64Array, omega: Float64Array, out: Curves): void {
  const slots = plan.values.length;
  const size = plan.nodes.length + 2;
  const column = (): Float64Array => new Float64Array(size);
  const work: Workspace = {
    re: new Float64Array(slots),
    im: new Float64Array(slots),
    xRe: column(),
    xIm: column(),
    yRe: column(),
    yIm: column(),
  };
  const damping = dampingOf(plan, loss);
  for (let n = 0; n < omega.length; n++) {
    work.re.set(plan.values);
    work.im.set(damping);
    const growth = eliminate(work, plan, omega[n] as number);
    portColumns(work, plan);
    store(work, size - 1, out, n);
    if (!(growth < LARGEST_GROWTH)) out.groupDelay[n] = Number.NaN;
  }
}

/** Imaginary parts of the diagonal by slot: minus the loss, and minus 1 at the ports. */
function dampingOf({ nodes, starts, ports, values }: EliminationPlan, loss: Float64Array): Float64Array {
  const damping = new Float64Array(values.length);
  nodes.forEach((node, n) => {
    damping[starts[n] as number] = -(loss[node - 1] as number);
  });
  damping[ports[0]] = -1;
  damping[ports[2]] = -1;
  return damping;
}

/** Largest square of an inverse pivot: below, the elimination loses at most 1e3 of 2^52; above, the point is marked. */
const LARGEST_GROWTH = 1e6;

/**
 * Adds omega to each pivot as its turn comes, turns the pivot into its inverse and updates what its couplings touch; gives
 * the largest square of an inverse pivot.
 */
function eliminate({ re, im }: Workspace, { nodes, starts, targets }: EliminationPlan, omega: number): number {
  let pair = 0;
  let growth = 0;
  for (let n = 0; n < nodes.length; n++) {
    const diagonal = starts[n] as number;
    const end = starts[n + 1] as number;
    const a = (re[diagonal] as number) + omega;
    const b = im[diagonal] as number;
    const square = 1 / (a * a + b * b);
    if (square > growth) growth = square;
    const inverseRe = a * square;
    const inverseIm = -b * square;
    re[diagonal] = inverseRe;
    im[diagonal] = inverseIm;
    for (let p = diagonal + 1; p < end; p++) {
      const c = re[p] as number;
      const d = im[p] as number;
      const factorRe = c * inverseRe - d * inverseIm;
      const factorIm = c * inverseIm + d * inverseRe;
      for (let q = p; q < end; q++) {
        const e = re[q] as number;
        const f = im[q] as number;
        const target = targets[pair++] as number;
        re[target] = (re[target] as number) - (factorRe * e - factorIm * f);
        im[target] = (im[target] as number) - (factorRe * f + factorIm * e);
      }
    }
  }
  return growth;
}

/** Columns of the inverse at source (x) and load (y): the 2 x 2 of the ports first, then the resonators backward. */
function portColumns({ re, im, xRe, xIm, yRe, yIm }: Workspace, { nodes, starts, rest, ports }: EliminationPlan): void {
  const last = xRe.length - 1;
  const [ar, ai] = [re[ports[0]] as number, im[ports[0]] as number];
  const [br, bi] = [re[ports[1]] as number, im[ports[1]] as number];
  const [cr, ci] = [re[ports[2]] as number, im[ports[2]] as number];
  const dr = ar * cr - ai * ci - br * br + bi * bi;
  const di = ar * ci + ai * cr - 2 * br * bi;
  const square = 1 / (dr * dr + di * di);
  xRe[0] = (cr * dr + ci * di) * square;
  xIm[0] = (ci * dr - cr * di) * square;
  xRe[last] = yRe[0] = -(br * dr + bi * di) * square;
  xIm[last] = yIm[0] = -(bi * dr - br * di) * square;
  yRe[last] = (ar * dr + ai * di) * square;
  yIm[last] = (ai * dr - ar * di) * square;
  for (let n = nodes.length - 1; n >= 0; n--) {
    const diagonal = starts[n] as number;
    let [p, q, r, s] = [0, 0, 0, 0];
    for (let k = diagonal + 1; k < (starts[n + 1] as number); k++) {
      const j = rest[k] as number;
      const a = re[k] as number;
      const b = im[k] as number;
      p -= a * (xRe[j] as number) - b * (xIm[j] as number);
      q -= a * (xIm[j] as number) + b * (xRe[j] as number);
      r -= a * (yRe[j] as number) - b * (yIm[j] as number);
      s -= a * (yIm[j] as number) + b * (yRe[j] as number);
    }
    const a = re[diagonal] as number;
    const b = im[diagonal] as number;
    const node = nodes[n] as number;
    xRe[node] = p * a - q * b;
    xIm[node] = p * b + q * a;
    yRe[node] = r * a - s * b;
    yIm[node] = r * b + s * a;
  }
}

function store({ xRe, xIm, yRe, yIm }: Workspace, last: number, out: Curves, n: number): void {
  const s21Re = 2 * (xIm[last] as number);
  const s21Im = -2 * (xRe[last] as number);
  out.s11.re[n] = -1 + 2 * (xIm[0] as number);
  out.s11.im[n] = -2 * (xRe[0] as number);
  out.s21.re[n] = s21Re;
  out.s21.im[n] = s21Im;
  out.s22.re[n] = -1 + 2 * (yIm[last] as number);
  out.s22.im[n] = -2 * (yRe[last] as number);
  let re = 0;
  let im = 0;
  for (let i = 1; i < last; i++) {
    const a = xRe[i] as number;
    const b = xIm[i] as number;
    const c = yRe[i] as number;
    const d = yIm[i] as number;
    re += a * c - b * d;
    im += a * d + b * c;
  }
  out.groupDelay[n] = (-2 * (re * s21Re + im * s21Im)) / (s21Re * s21Re + s21Im * s21Im);
}
