/** Columns that every text of this room fits into. */
export const WIDTH = 80;

/** Breaks a sentence into lines of at most the width; a word longer than a line stays whole. */
export function wrapped(text: string, indent = 0): readonly string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    const margin = lines.length === 0 ? 0 : indent;
    if (line !== '' && margin + line.length + 1 + word.length > WIDTH) {
      lines.push(' '.repeat(margin) + line);
      line = word;
    } else line = line === '' ? word : `${line} ${word}`;
  }
  return [...lines, ' '.repeat(lines.length === 0 ? 0 : indent) + line];
}

/** Pads the cells of each column to one width; `sides` says for each column which side its text stands on: l or r. */
export function table(rows: readonly (readonly string[])[], sides: string): readonly string[] {
  const widths = Array.from(sides, (_, column) => Math.max(...rows.map((row) => (row[column] ?? '').length)));
  const bare = widths.reduce((sum, width) => sum + width, 0);
  const gap = bare + 2 * (widths.length - 1) <= WIDTH ? '  ' : ' ';
  return rows.map((row) => {
    const cells = widths.map((width, column) => {
      const cell = row[column] ?? '';
      return sides[column] === 'r' ? cell.padStart(width) : cell.padEnd(width);
    });
    return cells.join(gap).trimEnd();
  });
}

/** Two blocks of lines beside each other. */
export function beside(left: readonly string[], right: readonly string[], gap = 3): readonly string[] {
  const width = Math.max(0, ...left.map((line) => line.length)) + gap;
  return Array.from({ length: Math.max(left.length, right.length) }, (_, n) =>
    `${(left[n] ?? '').padEnd(width)}${right[n] ?? ''}`.trimEnd(),
  );
}

/** Blocks with one empty line between; empty blocks vanish. */
export function blocks(...parts: readonly (readonly string[])[]): string {
  const present = parts.filter((lines) => lines.length > 0);
  return `${present.map((lines) => lines.join('\n')).join('\n\n')}\n`;
}
