import type { MaskLine } from '../../forms/index.js';

/** Lines widened at both ends: what holds there holds for a filter that is off by as much either way. */
export function widened(mask: readonly MaskLine[], driftHz: number): readonly MaskLine[] {
  return mask.map((line) => ({
    ...line,
    ...(line.fromHz === undefined ? {} : { fromHz: line.fromHz - driftHz }),
    ...(line.toHz === undefined ? {} : { toHz: line.toHz + driftHz }),
  }));
}
