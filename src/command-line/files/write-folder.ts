import { basename, dirname, join } from 'node:path';
import type { ProcessFacts } from '../world.js';
import type { FileCalls } from './file-calls.js';
import { clearLeftovers, temporaryName } from './temporary-names.js';

/** A file to be written: its name within the folder, and its text. */
export interface OutputFile {
  readonly name: string;
  readonly text: string;
}

/** What writing needs beside the files. */
export interface Writing {
  readonly files: FileCalls;
  readonly process: ProcessFacts;
  /** Throws when the user has interrupted; asked between any two steps until the last of them begins. */
  readonly checkInterrupt: () => void;
}

async function writeSynced({ files }: Writing, path: string, text: string): Promise<void> {
  const handle = await files.open(path, 'wx');
  try {
    await handle.writeFile(text);
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Makes names in a folder durable. Systems that cannot open a folder do without. */
async function syncFolder({ files }: Writing, folder: string): Promise<void> {
  if (process.platform === 'win32') return;
  const handle = await files.open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Takes something away on the way out of a failure, whose own error is the one to tell. */
async function discard({ files }: Writing, path: string): Promise<void> {
  await files.rm(path, { recursive: true, force: true }).catch(() => undefined);
}

/** Makes a new folder whole or not at all: written under a temporary name, then renamed. */
export async function writeNewFolder(writing: Writing, folder: string, outputs: readonly OutputFile[]): Promise<void> {
  const { files, process: facts } = writing;
  const parent = dirname(folder);
  await clearLeftovers(files, parent, [basename(folder)], facts);
  const temporary = join(parent, temporaryName(basename(folder), 'partial', facts.id));
  let isInPlace = false;
  try {
    await files.mkdir(temporary);
    for (const { name, text } of outputs) {
      writing.checkInterrupt();
      await writeSynced(writing, join(temporary, name), text);
    }
    await syncFolder(writing, temporary);
    writing.checkInterrupt();
    await files.rename(temporary, folder);
    isInPlace = true;
    await syncFolder(writing, parent);
  } catch (error) {
    await discard(writing, isInPlace ? folder : temporary);
    throw error;
  }
}

interface Places {
  readonly final: string;
  readonly partial: string;
  readonly previous: string;
}

/** Keeps a copy of what stands at the final name, if anything does. */
async function keepPrevious({ files }: Writing, { final, previous }: Places): Promise<boolean> {
  const isThere = await files.lstat(final).then(
    () => true,
    (error: unknown) => {
      if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return false;
      throw error;
    },
  );
  if (isThere) await files.copyFile(final, previous);
  return isThere;
}

/** Puts back what was there, or takes the new file away where there was nothing. */
async function undo(writing: Writing, { final, previous }: Places, wasThere: boolean): Promise<void> {
  if (wasThere) await writing.files.rename(previous, final).catch(() => undefined);
  else await discard(writing, final);
}

async function exchange(writing: Writing, folder: string, all: readonly Places[]): Promise<void> {
  const wasThere: boolean[] = [];
  for (const places of all) wasThere.push(await keepPrevious(writing, places));
  writing.checkInterrupt();
  let done = 0;
  try {
    for (const { partial, final } of all) {
      await writing.files.rename(partial, final);
      done += 1;
    }
    await syncFolder(writing, folder);
  } catch (error) {
    for (const [n, places] of all.slice(0, done).entries()) await undo(writing, places, wasThere[n] === true);
    throw error;
  }
}

/**
 * Replaces files of a folder; others in it stay. All are written beside the old ones first; then each is renamed over the
 * old, so that at any moment a reader finds an old file or a new one, never part of one. A failure puts the old ones back.
 */
export async function replaceFiles(writing: Writing, folder: string, outputs: readonly OutputFile[]): Promise<void> {
  const { files, process: facts } = writing;
  const names = outputs.map(({ name }) => name);
  await clearLeftovers(files, folder, names, facts);
  const all = names.map((name) => ({
    final: join(folder, name),
    partial: join(folder, temporaryName(name, 'partial', facts.id)),
    previous: join(folder, temporaryName(name, 'previous', facts.id)),
  }));
  try {
    for (const [n, { partial }] of all.entries()) {
      writing.checkInterrupt();
      await writeSynced(writing, partial, outputs[n]?.text ?? '');
    }
    await exchange(writing, folder, all);
  } finally {
    for (const { partial, previous } of all) for (const path of [partial, previous]) await discard(writing, path);
  }
}
