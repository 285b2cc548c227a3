import { FilterFailure, refusal } from '../../numerics/index.js';
import { type BestZerosTable, bestZerosTable } from './best-zeros.js';
import { lineWords } from './line-words.js';
import { type MaskProblem, maskProblem } from './mask-problem.js';
import type { ExcludedDesign, Proposal } from './proposal.js';
import { type CheckedRequest, checkProposeRequest, type ProposeRequest } from './request.js';
import { firstOrder, searchFrom } from './search.js';

/**
 * The smallest designs that meet a mask: order, transmission zeros, margins at every line of the real response, loss included.
 *
 * For each order and number of zeros the best placement is found with proof (`placeZeros`); the smallest order that meets the
 * rejection lines is kept with the fewest zeros and with more, then the next order likewise. Pairs +-w
 * are added to the fewest zeros of an order where they cost below 0.1 dB. Zeros that gain below 0.3 dB or lie beyond |omega| = 6 are dropped, and designs that
 * miss another line of the mask (return loss, insertion loss, variations) are excluded, each with the reason in words. With an
 * unloaded Q the zeros are placed again on the lossy response, with a local certificate. Cost: 10 to 150 ms lossless,
 * 20 to 300 ms with loss, most of it verdicts on the mask.
 *
 * A level relative to the center counts, in the lossless search, from the ripple of the band, which is at most its loss there.
 *
 * @throws FilterFailure E_MASK for a mask that contradicts itself or the passband, or that no design meets (both lines are
 *   named); E_STOPPED; E_BAND, E_RL_RANGE, E_Q_RANGE, E_MARGIN, E_ORDER_RANGE, E_ZERO_COUNT, E_UNKNOWN_KEY, E_TYPE
 *
 * @example
 * const { designs } = propose({
 *   passband: { lowerHz: '2304 MHz', upperHz: '2346 MHz' },
 *   returnLossDb: 22,
 *   mask: [{ fromHz: '2357 MHz', toHz: '2397 MHz', rejectionDb: 80 }, { toHz: '2290 MHz', rejectionDb: 20 }],
 * });
 * designs[0].order; // 7
 * designs[0].transmissionZeros.map((omega) => omega.toFixed(3)); // ['1.539', '1.749', '2.633']
 */
export function propose(request: ProposeRequest): Proposal {
  const checked = checkProposeRequest(request);
  const problem = maskProblem(checked);
  const progress = progressOf(request);
  const table = bestZerosTable(checked, problem, progress.step);
  const first = firstOrder(checked, problem, table);
  if (first === undefined) throw impossible(checked, problem, table);
  const { designs, excluded } = searchFrom(first, checked, problem, table);
  if (designs.length === 0) throw noneLeft(excluded, problem, checked, table);
  progress.finish();
  const { band, returnLossDb, unloadedQ, mask } = checked;
  return {
    band,
    returnLossDb,
    ...(unloadedQ === undefined ? {} : { unloadedQ }),
    mask,
    designs,
    excluded,
    remarks: problem.remarks,
  };
}

/** Steps of a usual search; a longer one raises its estimate as it goes. */
const USUAL_STEPS = 30;

function progressOf({ onProgress, shouldStop }: ProposeRequest): { step: () => void; finish: () => void } {
  for (const [name, value] of [
    ['onProgress', onProgress],
    ['shouldStop', shouldStop],
  ] as const)
    if (value !== undefined && typeof value !== 'function')
      throw refusal('E_TYPE', name, value, 'a function', 'leave it out, or give a function');
  let done = 0;
  return {
    step: () => {
      if (shouldStop?.() === true)
        throw refusal('E_STOPPED', 'shouldStop', true, 'a search that runs to its end', 'call again to search anew');
      done++;
      onProgress?.(done, Math.max(USUAL_STEPS, done + 1));
    },
    finish: () => onProgress?.(done + 1, done + 1),
  };
}

/** No order suffices: the margin that is left, and the lines that take it. */
function impossible(request: CheckedRequest, problem: MaskProblem, table: BestZerosTable): FilterFailure {
  const order = request.largestOrder;
  const most = Math.max(0, Math.min(order - 2, request.largestZeroCount, problem.mostZeros));
  const { marginDb, active } = table.lossless(order, most);
  const names = dearest(request, active);
  const hint = 'lower the dearer line, move it away from the passband, lower returnLossDb, or raise largestOrder';
  const missing = (request.margins.rejectionDb - marginDb).toPrecision(3);
  return new FilterFailure(
    'E_MASK',
    `E_MASK mask: found no design: order ${order} with ${most} zeros still misses the rejection by ${missing} dB, dearest ${names}; allowed masks that an order up to ${order} meets; ${hint}`,
    { argument: 'mask', value: marginDb, limit: request.margins.rejectionDb, hint },
  );
}

/** Rejection suffices, other lines do not: both are named. */
function noneLeft(
  excluded: readonly ExcludedDesign[],
  problem: MaskProblem,
  request: CheckedRequest,
  table: BestZerosTable,
): FilterFailure {
  const hint = 'ease one of these lines, raise unloadedQ, or widen the passband';
  const shown = excluded
    .slice(0, 6)
    .map(({ order, zeroCount, reason }) => `order ${order}, ${zeroCount} zeros: ${reason}`);
  const first = excluded[0] as ExcludedDesign | undefined;
  const order = first?.order ?? request.largestOrder;
  const most = Math.max(0, Math.min(order - 2, request.largestZeroCount, problem.mostZeros));
  const names = dearest(request, table.lossless(order, most).active);
  return new FilterFailure(
    'E_MASK',
    `E_MASK mask: found no design: the order is set by ${names}, and then ${shown.join(' | ')}; allowed masks that one design meets as a whole; ${hint}`,
    { argument: 'mask', value: excluded, hint },
  );
}

/** The one or two lines that cost most. */
function dearest(
  { mask }: CheckedRequest,
  active: readonly { readonly piece: number; readonly weight: number }[],
): string {
  const lines = [...new Set([...active].sort((a, b) => b.weight - a.weight).map(({ piece }) => piece))].slice(0, 2);
  return lines.map((index) => lineWords(mask[index] as (typeof mask)[number], index)).join(', and ');
}
