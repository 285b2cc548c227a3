import { basename, dirname, join, relative, resolve, sep } from 'node:path';
import { FilterFailure } from '../../numerics/index.js';
import { decodeUtf8 } from '../../specification/index.js';
import type { FileCalls } from './file-calls.js';
import { readInput } from './read-input.js';
import { fileFailure, systemCode } from './trouble.js';

/** Name of the file by which a folder is known as written by this program. */
export const RESULT_NAME = 'result.json';

/** Where the results of a design go. */
export interface OutputFolder {
  readonly path: string;
  readonly exists: boolean;
  /** The way from the folder to the design file, with forward slashes. */
  readonly toDesign: string;
}

/** Folder beside a file, named after it. */
export function folderBeside(input: string): string {
  const name = basename(input).replace(/\.json$/i, '');
  return join(dirname(input), `${name}-design`);
}

/** The kind of what a path names, links followed; undefined when there is nothing. */
async function kindOf(files: FileCalls, path: string): Promise<'folder' | 'other' | undefined> {
  try {
    return (await files.stat(path)).isDirectory() ? 'folder' : 'other';
  } catch (error) {
    if (systemCode(error) === 'ENOENT') return undefined;
    throw error;
  }
}

async function isSameFile(files: FileCalls, a: string, b: string): Promise<boolean> {
  if (a === b) return true;
  const [one, other] = await Promise.all(
    [a, b].map((path) =>
      files.stat(path, { bigint: true }).catch((error: unknown) => {
        if (['ENOENT', 'ENOTDIR'].includes(systemCode(error) ?? '')) return undefined;
        throw error;
      }),
    ),
  );
  return one !== undefined && other !== undefined && one.ino === other.ino && one.dev === other.dev;
}

/** The real path of a folder that may not exist yet; the folder around it must. */
async function realFolder(files: FileCalls, path: string): Promise<string> {
  if ((await kindOf(files, path)) === 'folder') return files.realpath(path);
  const parent = dirname(path);
  const kind = await kindOf(files, parent);
  if (kind === 'folder') return join(await files.realpath(parent), basename(path));
  const found = kind === undefined ? 'no folder of that name' : 'a file where a folder should be';
  throw fileFailure('E_IO', parent, found, 'a folder that exists', 'make it first, or choose another with --out');
}

/** The design file that a folder's result says it came from; undefined when there is no result of ours. */
async function designBehind(files: FileCalls, folder: string): Promise<string | undefined> {
  try {
    const { bytes } = await readInput(files, folder, RESULT_NAME);
    // The plain reader: the largest results have more values than an input file may, and only two texts are looked at.
    const value: unknown = JSON.parse(decodeUtf8(bytes));
    const source: unknown = Reflect.get(Object(value), 'source');
    const file: unknown = Reflect.get(Object(source), 'file');
    const digest: unknown = Reflect.get(Object(source), 'sha256');
    return typeof file === 'string' && typeof digest === 'string' ? resolve(folder, file) : undefined;
  } catch (error) {
    const isForeign = error instanceof SyntaxError || (error instanceof FilterFailure && error.code !== 'E_IO');
    if (isForeign) return undefined;
    throw error;
  }
}

async function refuseSame(files: FileCalls, folder: string, { input, wanted, names }: OutputRequest): Promise<void> {
  for (const place of [folder, ...names.map((name) => join(folder, name))]) {
    if (!(await isSameFile(files, place, input))) continue;
    const found = 'the design file itself in the place of a result';
    const allowed = 'a folder whose files are not the design file';
    throw fileFailure('E_OUTPUT_SAME', wanted, found, allowed, 'choose another folder with --out');
  }
}

function existsFailure(path: string, found: string, advice: string): FilterFailure {
  const allowed = 'a new folder, or one that this design file was written to before';
  return fileFailure('E_OUTPUT_EXISTS', path, found, allowed, advice);
}

/** What is asked for: where to, from which file, and what for. */
export interface OutputRequest {
  /** Real path of the design file. */
  readonly input: string;
  /** The folder, as the user wrote it and as an absolute path. */
  readonly wanted: string;
  readonly absolute: string;
  /** Names of the files that will be written. */
  readonly names: readonly string[];
  readonly mayOverwrite: boolean;
}

/**
 * Settles where results go, and refuses what would take something away from somebody.
 *
 * @throws FilterFailure E_OUTPUT_SAME, E_OUTPUT_EXISTS, E_IO
 */
export async function settleFolder(files: FileCalls, request: OutputRequest): Promise<OutputFolder> {
  const { input, wanted, absolute, mayOverwrite } = request;
  if (wanted.includes('\0')) {
    throw fileFailure('E_IO', wanted, 'no path that could name a folder', 'the path of a folder', 'check the path');
  }
  const path = await realFolder(files, absolute);
  await refuseSame(files, path, request);
  const toDesign = relative(path, input).split(sep).join('/');
  const kind = await kindOf(files, path);
  if (kind === undefined) return { path, exists: false, toDesign };
  if (kind === 'other') throw existsFailure(wanted, 'a file of that name', 'choose another folder with --out');
  if (!mayOverwrite && (await designBehind(files, path)) !== input) {
    const advice = 'choose another folder with --out, or give --overwrite to replace the results in this one';
    throw existsFailure(wanted, 'a folder that was not written from this design file', advice);
  }
  return { path, exists: true, toDesign };
}
