import { join } from 'node:path';
import type { ProcessFacts } from '../world.js';
import type { FileCalls } from './file-calls.js';

/** What a temporary file or folder is: on its way in, or the old one kept until all new ones are in place. */
type Role = 'partial' | 'previous';

/** Name of a temporary beside the final name: hidden, and it says which run it belongs to. */
export function temporaryName(name: string, role: Role, id: number): string {
  return `.${name}.${role}-${id}`;
}

function ownerOf(entry: string, names: readonly string[]): number | undefined {
  const parts = /^\.(.+)\.(?:partial|previous)-(\d{1,12})$/.exec(entry);
  return parts !== null && names.includes(parts[1] ?? '') ? Number(parts[2]) : undefined;
}

/**
 * Takes away what interrupted runs left in a folder for the given names. Runs that are still at work keep theirs.
 * What cannot be looked at or taken away stays: it is in nobody's way.
 */
export async function clearLeftovers(
  files: FileCalls,
  folder: string,
  names: readonly string[],
  { id, isAlive }: ProcessFacts,
): Promise<void> {
  const entries = await files.readdir(folder).catch((): string[] => []);
  for (const entry of entries) {
    const owner = ownerOf(entry, names);
    if (owner === undefined || (owner !== id && isAlive(owner))) continue;
    await files.rm(join(folder, entry), { recursive: true, force: true }).catch(() => undefined);
  }
}
