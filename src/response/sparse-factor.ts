/**
 * A symmetric elimination of one coupling pattern, worked out once: which resonator goes when, which couplings it still has
 * then (fill included), and where in one flat list of values each of them and each update lives. Ports stay to the end.
 */
export interface EliminationPlan {
  /** Resonators in the order of elimination. */
  readonly nodes: Int32Array;
  /** Value slots of pivot n: `starts[n]` is its diagonal, the slots up to `starts[n + 1]` its couplings to `rest`. */
  readonly starts: Int32Array;
  /** The node at the other end of each slot; for a diagonal slot the node itself. */
  readonly rest: Int32Array;
  /** For every pair of couplings of every pivot, in the order of the loops, the slot that the pair updates. */
  readonly targets: Int32Array;
  /** Slots of the ports' own 2 x 2: source, source-load, load. */
  readonly ports: readonly [number, number, number];
  /** The matrix entries by slot, before frequency and loss; 0 where there is only fill. */
  readonly values: Float64Array;
}

/** Least-degree order: a folded or arrow matrix then has O(N) slots and costs O(N) a frequency. */
export function eliminationPlan(rows: readonly Float64Array[]): EliminationPlan {
  const last = rows.length - 1;
  const pivots = pivotsOf(rows);
  const starts = [0];
  const rest: number[] = [];
  const slots = new Map<number, number>();
  const key = (i: number, j: number): number => Math.min(i, j) * rows.length + Math.max(i, j);
  const addSlot = (i: number, j: number): void => {
    slots.set(key(i, j), rest.length);
    rest.push(j);
  };
  for (const { node, neighbors } of pivots) {
    addSlot(node, node);
    for (const other of neighbors) addSlot(node, other);
    starts.push(rest.length);
  }
  for (const [i, j] of [
    [0, 0],
    [0, last],
    [last, last],
  ] as const)
    addSlot(i, j);
  const slotOf = (i: number, j: number): number => slots.get(key(i, j)) as number;
  const values = new Float64Array(rest.length);
  for (const [at, slot] of slots) values[slot] = rows[Math.floor(at / rows.length)]?.[at % rows.length] as number;
  return {
    nodes: Int32Array.from(pivots, ({ node }) => node),
    starts: Int32Array.from(starts),
    rest: Int32Array.from(rest),
    targets: Int32Array.from(pivots.flatMap(({ neighbors }) => pairsOf(neighbors).map(([i, j]) => slotOf(i, j)))),
    ports: [slotOf(0, 0), slotOf(0, last), slotOf(last, last)],
    values,
  };
}

interface Pivot {
  readonly node: number;
  readonly neighbors: readonly number[];
}

function pivotsOf(rows: readonly Float64Array[]): readonly Pivot[] {
  const neighbors = rows.map((row, i) => new Set(Array.from(row.keys()).filter((j) => j !== i && row[j] !== 0)));
  const open = new Set(Array.from({ length: rows.length - 2 }, (_, i) => i + 1));
  const pivots: Pivot[] = [];
  while (open.size > 0) {
    const node = leastDegree(open, neighbors);
    open.delete(node);
    const rest = [...(neighbors[node] as Set<number>)].sort((a, b) => a - b);
    for (const i of rest) {
      const set = neighbors[i] as Set<number>;
      set.delete(node);
      for (const j of rest) if (j !== i) set.add(j);
    }
    pivots.push({ node, neighbors: rest });
  }
  return pivots;
}

function leastDegree(open: ReadonlySet<number>, neighbors: readonly ReadonlySet<number>[]): number {
  let best = -1;
  let degree = Number.POSITIVE_INFINITY;
  for (const node of open) {
    const size = (neighbors[node] as ReadonlySet<number>).size;
    if (size < degree) {
      best = node;
      degree = size;
    }
  }
  return best;
}

/** (p, q) with p at or before q, in the order of the two nested loops of an elimination. */
function pairsOf(nodes: readonly number[]): readonly (readonly [number, number])[] {
  return nodes.flatMap((i, p) => nodes.slice(p).map((j) => [i, j] as const));
}
