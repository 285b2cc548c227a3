import type { Rotation } from '../forms/index.js';
import { type Doubled, doubledAdd, doubledDivide, doubledMultiply, doubledSquareRoot } from '../numerics/index.js';
import type { EliminationStep } from './elimination-step.js';
import type { Rows } from './matrix-shape.js';

/** A square matrix of pairs; an entry that is exactly 0 costs nothing. */
type DoubledRows = Doubled[][];

const ZERO: Doubled = { hi: 0, lo: 0 };

/**
 * An elimination carried out in doubled precision and rounded once at the end: for sequences with few active rotations,
 * where entries that are exactly 0 must stay so. Steps whose element is already 0 turn nothing.
 */
export function eliminateDoubled(
  original: Rows,
  steps: readonly EliminationStep[],
): { rows: Rows; rotations: Rotation[] } {
  const rows: DoubledRows = original.map((row) =>
    Array.from(row, (value) => (value === 0 ? ZERO : { hi: value, lo: 0 })),
  );
  const rotations: Rotation[] = [];
  for (const { element, pivot } of steps) {
    const [kept, turned] = element;
    const partner = pivot[0] === turned ? pivot[1] : pivot[0];
    const killed = at(rows, kept, turned);
    if (killed.hi === 0) continue;
    const { cosine, sine } = annihilating(at(rows, kept, partner), killed);
    turnLines(rows, partner, turned, cosine, sine);
    put(rows, kept, turned, ZERO);
    // A turn of (j, i) is the opposite turn of (i, j).
    const angle = Math.atan2(sine.hi, cosine.hi);
    rotations.push({ pivot, angle: pivot[0] === partner ? angle : -angle });
  }
  return { rows: rows.map((row) => Float64Array.from(row, ({ hi, lo }) => hi + lo)), rotations };
}

const at = (rows: DoubledRows, i: number, j: number): Doubled => rows[i]?.[j] ?? ZERO;

function put(rows: DoubledRows, i: number, j: number, value: Doubled): void {
  (rows[i] as Doubled[])[j] = value;
  (rows[j] as Doubled[])[i] = value;
}

/** Cosine (>= 0) and sine of the turn of (survivor, killed) that leaves `sine*survivor + cosine*killed = 0`. */
function annihilating(survivor: Doubled, killed: Doubled): { cosine: Doubled; sine: Doubled } {
  if (survivor.hi === 0) return { cosine: ZERO, sine: { hi: 1, lo: 0 } };
  const square = doubledAdd(doubledMultiply(survivor, survivor), doubledMultiply(killed, killed));
  const length = doubledSquareRoot(square);
  const signed = survivor.hi > 0 ? length : negative(length);
  return { cosine: doubledDivide(survivor, signed), sine: negative(doubledDivide(killed, signed)) };
}

const negative = ({ hi, lo }: Doubled): Doubled => ({ hi: -hi, lo: -lo });

/** `M <- R M R^T`: lines i and j with every other node, then their own 2 x 2. */
function turnLines(rows: DoubledRows, i: number, j: number, c: Doubled, s: Doubled): void {
  const own = [at(rows, i, i), at(rows, i, j), at(rows, j, j)] as const;
  for (let k = 0; k < rows.length; k++) {
    if (k === i || k === j) continue;
    const [a, b] = [at(rows, i, k), at(rows, j, k)];
    if (a.hi === 0 && b.hi === 0) continue;
    put(rows, i, k, combine(c, a, negative(s), b));
    put(rows, j, k, combine(s, a, c, b));
  }
  const upper = [combine(c, own[0], negative(s), own[1]), combine(c, own[1], negative(s), own[2])] as const;
  const lower = [combine(s, own[0], c, own[1]), combine(s, own[1], c, own[2])] as const;
  put(rows, i, i, combine(c, upper[0], negative(s), upper[1]));
  put(rows, i, j, combine(s, upper[0], c, upper[1]));
  put(rows, j, j, combine(s, lower[0], c, lower[1]));
}

const combine = (p: Doubled, a: Doubled, q: Doubled, b: Doubled): Doubled =>
  doubledAdd(doubledMultiply(p, a), doubledMultiply(q, b));
