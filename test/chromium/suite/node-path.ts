/** Joins parts to a path without dots. */
export function resolve(...parts: readonly string[]): string {
  const folders: string[] = [];
  for (const part of parts.flatMap((each) => each.split('/'))) {
    if (part === '..') folders.pop();
    else if (part !== '.' && part !== '') folders.push(part);
  }
  return `/${folders.join('/')}`;
}
