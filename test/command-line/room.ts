import {
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  realpathSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import * as promises from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll } from 'vitest';
import type { FileCalls } from '../../src/command-line/files/file-calls.js';
import { run } from '../../src/command-line/run.js';
import type { World } from '../../src/command-line/world.js';
import { PLAIN } from '../../src/report/index.js';

/** A small sound design file. */
export const SMALL = {
  passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' },
  order: 2,
  returnLossDb: 20,
  sweep: { fromHz: '0.9 GHz', toHz: '1.1 GHz', points: 3 },
};

/** Files that a design leads to, sorted. */
export const RESULT_NAMES: readonly string[] = [
  'band.svg',
  'group-delay.svg',
  'hand-over.csv',
  'matrix.csv',
  'matrix.svg',
  'poles-zeros.svg',
  'report.html',
  'report.md',
  'resonators.svg',
  'response.s2p',
  'response.svg',
  'result.json',
  'routing.svg',
];

const made: string[] = [];
afterAll(() => {
  for (const folder of made) rmSync(folder, { recursive: true, force: true });
});

/** A fresh folder, taken away after the tests of the file. */
export function freshFolder(): string {
  const folder = realpathSync(mkdtempSync(join(tmpdir(), 'irisloom-test-')));
  made.push(folder);
  return folder;
}

/** A fresh folder with one design file in it. */
export function folderWith(text: string | object, name = 'one.json'): string {
  const folder = freshFolder();
  writeFileSync(join(folder, name), typeof text === 'string' ? text : JSON.stringify(text));
  return folder;
}

/** What a folder holds: each path with the text of the file, or a slash for a folder. Pipes are named only. */
export function snapshot(folder: string, before = ''): Record<string, string> {
  const found: Record<string, string> = {};
  for (const entry of readdirSync(join(folder, before)).sort()) {
    const path = join(before, entry);
    const kind = statSync(join(folder, path));
    if (kind.isDirectory()) Object.assign(found, { [path]: '/' }, snapshot(folder, path));
    else found[path] = kind.isFile() ? readFileSync(join(folder, path), 'latin1') : 'special';
  }
  return found;
}

/** What a run did. */
export interface Ran {
  readonly status: number;
  readonly stdout: string;
  readonly stderr: string;
}

/** Runs the program in this process. */
export async function running(folder: string, args: readonly string[], more: Partial<World> = {}): Promise<Ran> {
  const texts = { stdout: '', stderr: '' };
  const sink = (name: 'stdout' | 'stderr') => ({
    write: (text: string) => {
      texts[name] += text;
    },
    isTerminal: false,
  });
  const status = await run(args, {
    stdout: sink('stdout'),
    stderr: sink('stderr'),
    files: promises,
    folder,
    environment: {},
    paint: PLAIN,
    process: { id: process.pid, isAlive: () => false },
    now: () => 0,
    onInterrupt: () => () => undefined,
    ...more,
  });
  return { status, ...texts };
}

/** Makes a folder with files in it. */
export function fill(folder: string, files: Readonly<Record<string, string>>): void {
  mkdirSync(folder, { recursive: true });
  for (const [name, text] of Object.entries(files)) writeFileSync(join(folder, name), text);
}

/** The real file system, with something done before each call, calls on open files included. */
export function watchedFiles(before: (call: string) => void): FileCalls {
  const watched = <Target extends object>(target: Target): Target =>
    new Proxy(target, {
      get: (from, name) => {
        const member: unknown = Reflect.get(from, name);
        if (typeof member !== 'function' || typeof name !== 'string') return member;
        return async (...args: unknown[]) => {
          // A file that could not be closed would leak into the test itself.
          if (name !== 'close') before(name);
          const result: unknown = await Reflect.apply(member, from, args);
          return name === 'open' ? watched(Object(result)) : result;
        };
      },
    });
  // A plain object: members of a module namespace may not be answered for by a proxy.
  return watched({ ...promises });
}
