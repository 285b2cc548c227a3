import { FilterFailure } from '../../numerics/index.js';
import { escapeText } from '../../specification/index.js';

const PATH_LIMIT = 200;

/** What the usual error codes of a system mean, and what to do about them. */
const MEANINGS: ReadonlyMap<string, readonly [found: string, advice: string]> = new Map([
  ['ENOSPC', ['the disk is full', 'free some space']],
  ['EDQUOT', ['the quota of this disk is used up', 'free some space']],
  ['EACCES', ['no permission', 'check the rights of the file and of its folder']],
  ['EPERM', ['no permission', 'check the rights of the file and of its folder']],
  ['EROFS', ['a disk that cannot be written to', 'choose another folder with --out']],
  ['ENOTDIR', ['a file where a folder should be', 'check the path']],
  ['ENOENT', ['no such file or folder', 'check the path']],
  ['ENAMETOOLONG', ['a name that is too long', 'choose a shorter one']],
  ['EMFILE', ['too many open files', 'try again']],
  ['ELOOP', ['links that lead in a circle', 'check the path']],
  ['ENOTEMPTY', ['a folder that came into being meanwhile', 'try again']],
  ['EEXIST', ['a file or folder that came into being meanwhile', 'try again']],
  ['EIO', ['a fault of the disk', 'try another disk']],
]);

/** A path as it may be shown: cut, control characters escaped. */
export function shownPath(path: string): string {
  return escapeText(path, PATH_LIMIT);
}

/** A refusal that concerns a file or folder. */
export function fileFailure(
  code: string,
  path: string,
  found: string,
  allowed: string,
  hint: string,
  cause?: unknown,
): FilterFailure {
  const text = `${code} ${shownPath(path)}: found ${found}; allowed ${allowed}; ${hint}`;
  return new FilterFailure(code, text, { argument: path, value: found, limit: allowed, hint, cause });
}

/** The code that the system gave an error, if it did. */
export function systemCode(error: unknown): string | undefined {
  if (!(error instanceof Error) || !('code' in error) || !('syscall' in error)) return undefined;
  return typeof error.code === 'string' ? error.code : undefined;
}

/** Turns an error of the file system into a refusal; anything else comes back as it is. */
export function ioFailure(error: unknown, path: string, doing: string): unknown {
  const code = systemCode(error);
  if (code === undefined) return error;
  const [found, advice] = MEANINGS.get(code) ?? [`the system error ${code}`, 'check the disk and the path'];
  return fileFailure(
    'E_IO',
    path,
    `${found} (${code}) while ${doing}`,
    'a file that can be read or written',
    advice,
    error,
  );
}
