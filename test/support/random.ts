/** Deterministic numbers in [0, 1) (32-bit mixing generator). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** A number in [low, high), uniform in the logarithm. */
export const logUniform = (random: () => number, low: number, high: number): number => low * (high / low) ** random();
