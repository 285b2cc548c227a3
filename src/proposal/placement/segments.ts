/** A level, dB, that changes along the line. */
export type SlopedLevel = (t: number) => number;

/** A stretch of mask on the line, ends included; `source` says which line of the mask it comes from. */
export interface Segment {
  readonly low: number;
  readonly high: number;
  readonly level: number | SlopedLevel;
  readonly source: number;
}

/** Level of a segment at t, dB. */
export function levelAt({ level }: Segment, t: number): number {
  return typeof level === 'number' ? level : level(t);
}

/**
 * The same mask without what another level covers: of the constant levels over a stretch only the highest can be the closest
 * one. Sloped levels are kept whole. Sorted by their lower ends.
 */
export function upperEnvelope(segments: readonly Segment[]): readonly Segment[] {
  const flat = segments.filter(({ level }) => typeof level === 'number');
  const ends = [...new Set(flat.flatMap(({ low, high }) => [low, high]))].sort((a, b) => a - b);
  const kept: Segment[] = segments.filter(({ level }) => typeof level !== 'number');
  for (let n = 0; n + 1 < ends.length; n++) {
    const [low, high] = [ends[n] as number, ends[n + 1] as number];
    const top = highest(flat.filter((each) => each.low <= low && each.high >= high));
    if (top === undefined) continue;
    const last = kept.at(-1);
    if (last !== undefined && last.source === top.source && last.level === top.level && last.high === low)
      kept[kept.length - 1] = { ...last, high };
    else kept.push({ ...top, low, high });
  }
  for (const point of flat.filter(({ low, high }) => low === high)) {
    const top = highest(flat.filter(({ low, high }) => low <= point.low && high >= point.low));
    if (top === point) kept.push(point);
  }
  return kept.sort((a, b) => a.low - b.low);
}

function highest(flat: readonly Segment[]): Segment | undefined {
  return flat.reduce<Segment | undefined>(
    (best, each) => (best === undefined || (each.level as number) > (best.level as number) ? each : best),
    undefined,
  );
}
