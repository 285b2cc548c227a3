import type * as promises from 'node:fs/promises';

/** The calls of node:fs/promises that the program makes; a test may put failing ones in their place. */
export type FileCalls = Pick<
  typeof promises,
  'copyFile' | 'lstat' | 'mkdir' | 'open' | 'readdir' | 'realpath' | 'rename' | 'rm' | 'rmdir' | 'stat' | 'unlink'
>;
