import type { PlaceZerosRequest, RejectionPiece } from '../../src/proposal/index.js';

/**
 * A random placement problem: order 2 to 15, up to order - 2 zeros, one to eight pieces on either or both sides, from 1.02 of
 * the band outward, levels from 5 to 90 dB; one piece in six is sloped, one in three open.
 */
export function randomRequest(random: () => number): PlaceZerosRequest {
  const order = 2 + Math.floor(14 * random());
  const zeroCount = Math.floor((order - 1) * random());
  const pieces = 1 + Math.floor(8 * random());
  const oneSided = random() < 0.25;
  const rejection = Array.from({ length: pieces }, () => randomPiece(random, oneSided || random() < 0.5));
  return { order, zeroCount, returnLossDb: 10 + 20 * random(), rejection };
}

function randomPiece(random: () => number, above: boolean): RejectionPiece {
  const near = 1.02 + 2 * random() ** 2;
  const far = near + 0.05 + 3 * random();
  const level = 5 + 85 * random();
  const kind = random();
  if (kind < 1 / 3) return above ? { fromOmega: near, rejectionDb: level } : { toOmega: -near, rejectionDb: level };
  const span = above ? { fromOmega: near, toOmega: far } : { fromOmega: -far, toOmega: -near };
  if (kind > 5 / 6) return { ...span, rejectionDb: [level, level * (0.5 + random())] };
  return { ...span, rejectionDb: level };
}
