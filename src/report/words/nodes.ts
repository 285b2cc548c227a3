/** Name of a node of a coupling matrix: S, 1..N, L. */
export function nodeName(node: number, order: number): string {
  if (node === 0) return 'S';
  return node === order + 1 ? 'L' : String(node);
}

/** Names of all nodes. */
export function nodeNames(order: number): readonly string[] {
  return Array.from({ length: order + 2 }, (_, node) => nodeName(node, order));
}
