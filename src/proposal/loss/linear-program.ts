/** A first-order picture of several margins: values now, and derivatives with respect to the unknowns. */
export interface MarginModel {
  readonly values: readonly number[];
  readonly gradients: readonly (readonly number[])[];
}

/** The step that raises the smallest margin most, what it promises, and the weight of every margin. */
export interface BestStep {
  readonly step: readonly number[];
  readonly smallest: number;
  /** None negative, sum 1: decibels of the promise for each decibel of that margin. */
  readonly weights: readonly number[];
}

/**
 * Maximizes `min_k (values[k] + gradients[k].step)` over steps with `|step_j| <= radius`, by the simplex method.
 *
 * Own code because the program is tiny (as many unknowns as free zeros, as many rows as local minima), starts from a feasible
 * corner by its form, and its multipliers are wanted: with `step = y - radius` and the promise measured from the worst value
 * it can take, all right sides are >= 0 and the slacks are a basis. Bland's rule ends every run.
 *
 * Source: G. B. Dantzig, Linear Programming and Extensions, 1963; R. G. Bland, Math. Oper. Res. 2, 1977 (both from memory).
 */
export function bestStep({ values, gradients }: MarginModel, radius: number): BestStep {
  const count = gradients[0]?.length ?? 0;
  const lows = values.map(
    (value, k) => value - radius * (gradients[k] as readonly number[]).reduce((sum, g) => sum + Math.abs(g), 0),
  );
  const base = Math.min(...lows);
  // Unknowns: the promise above `base`, then y_j >= 0. Rows: one a margin, one an upper bound.
  const rows = gradients.map((gradient, k) => [
    1,
    ...gradient.map((g) => -g),
    (values[k] as number) - radius * gradient.reduce((sum, g) => sum + g, 0) - base,
  ]);
  for (let j = 0; j < count; j++)
    rows.push(Array.from({ length: count + 2 }, (_, i) => (i === j + 1 ? 1 : i === count + 1 ? 2 * radius : 0)));
  const { unknowns, prices } = simplex(rows, count + 1);
  const [promise = 0, ...y] = unknowns;
  return { step: y.map((each) => each - radius), smallest: base + promise, weights: prices.slice(0, values.length) };
}

/** Turns before the simplex is stopped where it stands, a feasible corner; Bland's rule needs far fewer here. */
const MOST_TURNS = 2000;

/** Entries of a tableau smaller than this, beside numbers near 1, are rounding. */
const ROUNDING = 1e-12;

/**
 * Maximizes the first of `count` unknowns >= 0 under `row . unknowns <= right` (last entry, >= 0), with the price of each row.
 * Slacks are implicit: the tableau holds the unknowns outside the basis only.
 */
function simplex(
  rows: readonly (readonly number[])[],
  count: number,
): { unknowns: readonly number[]; prices: readonly number[] } {
  const table = rows.map((row) => [...row]);
  const goal = Array.from({ length: count + 1 }, (_, j) => (j === 0 ? -1 : 0));
  // Names: unknown j is j, slack of row i is count + i.
  const outside = Array.from({ length: count }, (_, j) => j);
  const basis = table.map((_, i) => count + i);
  for (let turn = 0; turn < MOST_TURNS; turn++) {
    const column = entering(goal, outside);
    if (column < 0) break;
    const row = leaving(table, basis, column, count);
    if (row < 0) break;
    pivot([...table, goal], row, column);
    [basis[row], outside[column]] = [outside[column] as number, basis[row] as number];
  }
  const unknowns = new Array<number>(count).fill(0);
  basis.forEach((name, i) => {
    if (name < count) unknowns[name] = (table[i] as number[])[count] as number;
  });
  const prices = new Array<number>(rows.length).fill(0);
  outside.forEach((name, j) => {
    if (name >= count) prices[name - count] = goal[j] as number;
  });
  return { unknowns, prices };
}

/** The lowest name that still raises the goal (Bland). */
function entering(goal: readonly number[], outside: readonly number[]): number {
  let best = -1;
  outside.forEach((name, j) => {
    if ((goal[j] as number) < -ROUNDING && (best < 0 || name < (outside[best] as number))) best = j;
  });
  return best;
}

function leaving(
  table: readonly (readonly number[])[],
  basis: readonly number[],
  column: number,
  count: number,
): number {
  let best = -1;
  let ratio = Number.POSITIVE_INFINITY;
  table.forEach((row, i) => {
    const entry = row[column] as number;
    if (entry <= ROUNDING) return;
    const reach = (row[count] as number) / entry;
    if (reach < ratio || (reach === ratio && (basis[i] as number) < (basis[best] as number)))
      [best, ratio] = [i, reach];
  });
  return best;
}

function pivot(table: readonly number[][], row: number, column: number): void {
  const own = table[row] as number[];
  const head = own[column] as number;
  for (let j = 0; j < own.length; j++) own[j] = (j === column ? 1 : (own[j] as number)) / head;
  for (const other of table) {
    if (other === own) continue;
    const factor = other[column] as number;
    if (factor === 0) continue;
    for (let j = 0; j < own.length; j++)
      other[j] = j === column ? -factor * (own[j] as number) : (other[j] as number) - factor * (own[j] as number);
  }
}
