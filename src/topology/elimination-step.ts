/**
 * One step of a fixed elimination: `element` = [kept, turned] is annihilated by turning `pivot`, which contains `turned`;
 * `against` is the node whose coupling to `kept` survives, so that later corrections have something to divide by.
 */
export interface EliminationStep {
  readonly element: readonly [number, number];
  readonly pivot: readonly [number, number];
  readonly against: number;
}
