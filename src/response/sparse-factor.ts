/** One pivot of a symmetric elimination: the node and the later nodes it still couples to (fill included). */
interface Pivot {
  readonly node: number;
  readonly rest: readonly number[];
}

/**
 * Plan of a symmetric elimination of the resonators of one coupling pattern: least-degree order, ports last, fill listed.
 * Made once a sweep; a folded or arrow matrix then costs O(N) a frequency.
 */
export function eliminationPlan(rows: readonly Float64Array[]): readonly Pivot[] {
  const last = rows.length - 1;
  const neighbors = rows.map((row, i) => new Set(Array.from(row.keys()).filter((j) => j !== i && row[j] !== 0)));
  const open = new Set(Array.from({ length: last - 1 }, (_, i) => i + 1));
  const plan: Pivot[] = [];
  while (open.size > 0) {
    const node = leastDegree(open, neighbors);
    open.delete(node);
    const rest = [...(neighbors[node] as Set<number>)].sort((a, b) => a - b);
    for (const i of rest) {
      const set = neighbors[i] as Set<number>;
      set.delete(node);
      for (const j of rest) if (j !== i) set.add(j);
    }
    plan.push({ node, rest });
  }
  return plan;
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

/** The plan flattened to index arrays, so that the numeric loops touch typed arrays only. */
export interface FlatPlan {
  readonly nodes: Int32Array;
  readonly starts: Int32Array;
  readonly rest: Int32Array;
}

export function flatten(plan: readonly Pivot[]): FlatPlan {
  const starts = new Int32Array(plan.length + 1);
  plan.forEach(({ rest }, n) => {
    starts[n + 1] = (starts[n] as number) + rest.length;
  });
  return {
    nodes: Int32Array.from(plan, ({ node }) => node),
    starts,
    rest: Int32Array.from(plan.flatMap(({ rest }) => rest)),
  };
}
