import type { PlaceZerosRequest } from '../../src/proposal/index.js';
import { closedFormRejection, lowestMargin, sampledMargin } from './sampled-margin.js';

/** How long a random search looks. */
export interface Effort {
  readonly samples: number;
  readonly refined: number;
  readonly steps: number;
}

/** The best margin found by chance, and how many samples truly had more than `bound`. */
export interface Found {
  readonly best: number;
  readonly above: number;
}

/** Coarse points flatter a placement: they may only let one through, never hide one. */
const COARSE = 24;
const FINE = 160;

/**
 * Random placements of zeros, the best of them bettered by random steps that shrink where they do not succeed. Knows nothing of
 * the theory: margins come from the closed form of the rejection.
 */
export function randomSearch(request: PlaceZerosRequest, bound: number, effort: Effort, random: () => number): Found {
  const kept: { zeros: readonly number[]; margin: number }[] = [];
  let above = 0;
  for (let n = 0; n < effort.samples; n++) {
    const zeros = Array.from({ length: request.zeroCount }, () => (random() < 0.5 ? -1 : 1) * randomZero(random));
    const margin = sampledMargin(request, closedFormRejection(request, zeros), COARSE);
    if (margin > bound && lowestMargin(request, zeros, FINE) > bound + 1e-6) above++;
    const last = kept[effort.refined - 1];
    if (last !== undefined && margin <= last.margin) continue;
    kept.push({ zeros, margin });
    kept.sort((a, b) => b.margin - a.margin);
    kept.length = Math.min(kept.length, effort.refined);
  }
  const best = kept.map(({ zeros }) => bettered(request, zeros, effort.steps, random));
  return { best: Math.max(...best), above };
}

/** From 1.01 of the band outward, dense near it. */
const randomZero = (random: () => number): number => 1 + 0.01 * 400 ** random();

function bettered(request: PlaceZerosRequest, start: readonly number[], steps: number, random: () => number): number {
  let zeros = start;
  let margin = lowestMargin(request, zeros, COARSE);
  let size = 0.3;
  for (let n = 0; n < steps; n++) {
    const tried = zeros.map((w) => Math.sign(w) * (1 + (Math.abs(w) - 1) * Math.exp(size * (2 * random() - 1))));
    const next = lowestMargin(request, tried, COARSE);
    if (next > margin) [zeros, margin, size] = [tried, next, Math.min(size * 1.5, 1)];
    else size = Math.max(size * 0.97, 1e-6);
  }
  return lowestMargin(request, zeros, FINE);
}
