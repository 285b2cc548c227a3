import type { BestZerosTable } from './best-zeros.js';
import { judge } from './judge.js';
import type { MaskProblem } from './mask-problem.js';
import type { ExcludedDesign, ProposedDesign, SmallerDesign } from './proposal.js';
import { attempt, missedRejection, uselessZero } from './reasons.js';
import type { CheckedRequest } from './request.js';

/** How many counts of zeros are kept at the smallest order that has a design, and at the next one that has. */
const KEPT: readonly number[] = [2, 2];

/** Orders looked at beyond the first whose rejection suffices, loss included. */
const FURTHER_ORDERS = 3;

/** Counts of zeros looked at beyond the wanted number of designs. */
const FURTHER_COUNTS = 2;

/** Loss may raise the margins of a stop band: designs that miss by less than this without loss are looked at with it. */
const RAISED_BY_LOSS_DB = 1.5;

/** Pairs +-w are offered where they cost less. */
const SYMMETRY_PRICE_DB = 0.1;

/** Everything a search looked at. */
export interface Found {
  readonly designs: readonly ProposedDesign[];
  readonly excluded: readonly ExcludedDesign[];
  /** Whether the rejection lines were met at all, whatever else was missed. */
  readonly reached: boolean;
}

/** The smallest order whose rejection suffices with all zeros it may have; undefined when none does. */
export function firstOrder(request: CheckedRequest, problem: MaskProblem, table: BestZerosTable): number | undefined {
  const threshold = thresholdOf(request);
  for (let order = 1; order <= request.largestOrder; order++)
    if (losslessMargin(table, order, mostZeros(request, problem, order)) >= threshold) return order;
  return undefined;
}

/** Smallest designs that meet the mask, from the first order upward. */
export function searchFrom(first: number, request: CheckedRequest, problem: MaskProblem, table: BestZerosTable): Found {
  const designs: ProposedDesign[] = [];
  const excluded: ExcludedDesign[] = [];
  let orders = 0;
  let last = request.largestOrder;
  let reached = false;
  for (let order = first; order <= last && orders < KEPT.length; order++) {
    const found = searchOrder(order, KEPT[orders] as number, request, problem, table);
    designs.push(...found.designs);
    excluded.push(...found.excluded);
    if (found.reached && !reached) last = Math.min(order + FURTHER_ORDERS, last);
    reached ||= found.reached;
    if (found.designs.length > 0) orders++;
    // Loss and delay grow with the order: what the next one misses, later ones miss by more.
    else if (designs.length > 0) break;
  }
  return { designs, excluded, reached };
}

function searchOrder(
  order: number,
  kept: number,
  request: CheckedRequest,
  problem: MaskProblem,
  table: BestZerosTable,
): Found {
  const most = mostZeros(request, problem, order);
  const least = fewestZeros(order, most, thresholdOf(request), table);
  const last = Math.min(most, least + kept + FURTHER_COUNTS - 1);
  // More zeros are never worse: an order whose rejection is missed with the most of them, loss included, is out at once.
  const hopeless = missedRejection(order, last, request, table);
  if (hopeless !== undefined)
    return { designs: [], excluded: [{ order, zeroCount: last, reason: hopeless }], reached: false };
  const designs: ProposedDesign[] = [];
  const excluded: ExcludedDesign[] = [];
  let accepted = 0;
  for (let count = least; count <= last && accepted < kept; count++) {
    const found = tryOne(order, count, request, problem, table);
    excluded.push(...found.excluded);
    const [free] = found.designs;
    if (free === undefined) continue;
    // Pairs for the fewest zeros of an order only: every verdict costs as much as the search for its zeros.
    designs.push(free, ...(accepted === 0 ? inPairs(free, request, table) : []));
    accepted++;
  }
  return { designs, excluded, reached: true };
}

/** One order and count: the design, or the reason against it. */
function tryOne(
  order: number,
  zeroCount: number,
  request: CheckedRequest,
  problem: MaskProblem,
  table: BestZerosTable,
): Found {
  const out = (reason: string): Found => ({ designs: [], excluded: [{ order, zeroCount, reason }], reached: true });
  const missed = missedRejection(order, zeroCount, request, table);
  if (missed !== undefined) return out(missed);
  const zeros = table.best(order, zeroCount);
  const useless = uselessZero(zeros, request, table);
  if (useless !== undefined) return out(useless);
  const smaller = (): readonly SmallerDesign[] => smallerThan(order, zeroCount, request, problem, table);
  const verdict = attempt(() => judge(request, zeros, smaller));
  if (typeof verdict === 'string') return out(verdict);
  if (verdict.design === undefined) return out(verdict.misses.join('; '));
  return { designs: [verdict.design], excluded: [], reached: true };
}

/** The same order and count in pairs +-w, where that costs little and meets the mask too. */
function inPairs(free: ProposedDesign, request: CheckedRequest, table: BestZerosTable): readonly ProposedDesign[] {
  const count = free.transmissionZeros.length;
  if (count === 0 || count % 2 === 1) return [];
  const pairs = attempt(() => table.best(free.order, count, true));
  if (typeof pairs === 'string' || free.marginDb - pairs.marginDb >= SYMMETRY_PRICE_DB) return [];
  const verdict = attempt(() => judge(request, pairs, () => free.smaller));
  return typeof verdict === 'string' || verdict.design === undefined ? [] : [verdict.design];
}

/** What one zero fewer, and one resonator fewer, would have beyond what is wanted. */
function smallerThan(
  order: number,
  zeroCount: number,
  request: CheckedRequest,
  problem: MaskProblem,
  table: BestZerosTable,
): readonly SmallerDesign[] {
  const tried = [
    ...(zeroCount > 0 ? [[order, zeroCount - 1] as const] : []),
    ...(order > 1 ? [[order - 1, Math.min(zeroCount, mostZeros(request, problem, order - 1))] as const] : []),
  ];
  return tried.flatMap(([n, count]) => {
    const found = attempt(() => table.best(n, count));
    if (typeof found === 'string') return [];
    return [{ order: n, zeroCount: count, marginDb: found.marginDb - request.margins.rejectionDb }];
  });
}

function mostZeros({ largestZeroCount }: CheckedRequest, { mostZeros: most }: MaskProblem, order: number): number {
  return Math.max(0, Math.min(order - 2, largestZeroCount, most));
}

function thresholdOf({ sigma, margins }: CheckedRequest): number {
  return margins.rejectionDb - (sigma > 0 ? RAISED_BY_LOSS_DB : 0);
}

/** The fewest zeros whose lossless margin reaches the threshold; the margin grows with their number. */
function fewestZeros(order: number, most: number, threshold: number, table: BestZerosTable): number {
  let [low, high] = [0, most];
  while (low < high) {
    const middle = Math.floor((low + high) / 2);
    if (losslessMargin(table, order, middle) >= threshold) high = middle;
    else low = middle + 1;
  }
  return low;
}

function losslessMargin(table: BestZerosTable, order: number, zeroCount: number): number {
  const placed = attempt(() => table.lossless(order, zeroCount));
  return typeof placed === 'string' ? Number.NEGATIVE_INFINITY : placed.marginDb;
}
