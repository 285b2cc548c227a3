const LENGTH_LIMIT = 40;

/** Edits (insert, delete, replace, exchange of neighbors) from one word to another. */
function editDistance(a: string, b: string): number {
  let older: number[] = [];
  let old: number[] = Array.from({ length: b.length + 1 }, (_, column) => column);
  for (let row = 1; row <= a.length; row += 1) {
    const next: number[] = [row];
    for (let column = 1; column <= b.length; column += 1) {
      const same = a[row - 1] === b[column - 1];
      const replaced = (old[column - 1] ?? 0) + (same ? 0 : 1);
      let least = Math.min(replaced, (old[column] ?? 0) + 1, (next[column - 1] ?? 0) + 1);
      const exchanged = row > 1 && column > 1 && a[row - 1] === b[column - 2] && a[row - 2] === b[column - 1];
      if (exchanged) least = Math.min(least, (older[column - 2] ?? 0) + 1);
      next.push(least);
    }
    [older, old] = [old, next];
  }
  return old[b.length] ?? 0;
}

/** The known key that a wrong one was most likely meant as: few edits away, with or without its unit, or part of it. */
export function nearestKey(wrong: string, known: readonly string[]): string | undefined {
  if (wrong.length > LENGTH_LIMIT || wrong === '') return undefined;
  const word = wrong.toLowerCase();
  let best: string | undefined;
  let least = Math.min(Math.max(2, Math.floor(word.length / 3)) + 1, word.length);
  for (const key of known) {
    const whole = key.toLowerCase();
    const bare = whole.replace(/(hz|db|seconds)$/, '');
    const within = word.length >= 3 && whole.includes(word) ? 1 : least;
    const distance = Math.min(editDistance(word, whole), editDistance(word, bare), within);
    if (distance < least) [best, least] = [key, distance];
  }
  return best;
}
