import { constants } from 'node:fs';
import type { FileHandle } from 'node:fs/promises';
import { resolve } from 'node:path';
import type { FileCalls } from './file-calls.js';
import { fileFailure, ioFailure, systemCode } from './trouble.js';

/** Largest file that is read, bytes. */
const LIMIT = 1_048_576;

/** Bytes of an input file, and where it really lies (links followed). */
export interface InputFile {
  readonly bytes: Uint8Array;
  readonly path: string;
}

interface Kind {
  isFile(): boolean;
  isDirectory(): boolean;
  isFIFO(): boolean;
  isSocket(): boolean;
}

function refuseOddKind(kind: Kind, path: string): void {
  if (kind.isFile()) return;
  const odd = kind.isFIFO() ? 'a pipe' : kind.isSocket() ? 'a socket' : 'a device';
  const found = kind.isDirectory() ? 'a folder' : odd;
  throw fileFailure('E_NOT_A_FILE', path, found, 'a regular file', 'give the path of a file');
}

/** Reads to the end or to one byte past the limit, whatever size the system reports. */
async function readAtMost(handle: FileHandle, limit: number): Promise<Uint8Array> {
  const buffer = new Uint8Array(limit + 1);
  let length = 0;
  while (length < buffer.length) {
    const { bytesRead } = await handle.read(buffer, length, buffer.length - length, null);
    if (bytesRead === 0) break;
    length += bytesRead;
  }
  return buffer.subarray(0, length);
}

async function readOpened(handle: FileHandle, path: string): Promise<Uint8Array> {
  // Looked at again through the handle: what the path names may have changed since.
  refuseOddKind(await handle.stat(), path);
  const bytes = await readAtMost(handle, LIMIT);
  if (bytes.length <= LIMIT) return bytes;
  const found = `more than ${LIMIT} bytes`;
  throw fileFailure('E_FILE_SIZE', path, found, `at most ${LIMIT} bytes`, 'check that this is the file you meant');
}

async function readWhole(files: FileCalls, path: string): Promise<InputFile> {
  const real = await files.realpath(path);
  refuseOddKind(await files.stat(real), path);
  // Non-blocking, so that a pipe put there meanwhile cannot hold the program up.
  const handle = await files.open(real, constants.O_RDONLY | (constants.O_NONBLOCK ?? 0));
  try {
    return { bytes: await readOpened(handle, path), path: real };
  } finally {
    await handle.close();
  }
}

/**
 * Reads an input file: a regular file of at most 1 MiB.
 *
 * @throws FilterFailure E_FILE_MISSING, E_NOT_A_FILE, E_FILE_SIZE, E_IO
 */
export async function readInput(files: FileCalls, folder: string, path: string): Promise<InputFile> {
  try {
    if (path === '' || path.includes('\0')) {
      throw fileFailure(
        'E_FILE_MISSING',
        path,
        'no path that could name a file',
        'the path of a file',
        'check the path',
      );
    }
    return await readWhole(files, resolve(folder, path));
  } catch (error) {
    if (systemCode(error) === 'ENOENT') {
      throw fileFailure('E_FILE_MISSING', path, 'no file of that name', 'the path of a file', 'check the path', error);
    }
    throw ioFailure(error, path, 'reading it');
  }
}
