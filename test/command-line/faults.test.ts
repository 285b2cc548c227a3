import { cpSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { folderWith, freshFolder, RESULT_NAMES, running, SMALL, snapshot, watchedFiles } from './room.js';

const CODES = ['ENOSPC', 'EACCES', 'EIO', 'EXDEV'] as const;
const LEAST = { ...SMALL, order: 1, sweep: { ...SMALL.sweep, points: 2 } };

function systemError(code: string, syscall: string): Error {
  return Object.assign(new Error(`${code}: planted, ${syscall}`), { code, syscall });
}

/** File calls of which number `k` fails; counts them all. */
function failingAt(k: number, code: string) {
  const count = { calls: 0 };
  const files = watchedFiles((call) => {
    count.calls += 1;
    if (count.calls === k) throw systemError(code, call);
  });
  return { files, count };
}

const visible = (folder: string) =>
  Object.fromEntries(Object.entries(snapshot(folder)).filter(([path]) => !/(^|\/)\./.test(path)));

/** A folder of results of an earlier version of the design file, made once and copied. */
let earlier: Promise<string> | undefined;

async function writtenBefore(): Promise<string> {
  const folder = folderWith({ ...LEAST, returnLossDb: 10 });
  await running(folder, ['design', 'one.json']);
  writeFileSync(join(folder, 'one.json'), JSON.stringify(LEAST));
  return folder;
}

/** Folder with a design file, and with results of an earlier version of it when they are to be replaced. */
async function prepared(isReplaced: boolean): Promise<{ folder: string; before: Record<string, string> }> {
  if (!isReplaced) {
    const folder = folderWith(LEAST);
    return { folder, before: visible(folder) };
  }
  earlier ??= writtenBefore();
  const folder = freshFolder();
  cpSync(await earlier, folder, { recursive: true });
  return { folder, before: visible(folder) };
}

describe.each([
  ['a new folder', false],
  ['a folder that is replaced', true],
])('a fault of the file system while %s is written', (_, isReplaced) => {
  it.each(CODES)('%s at any call leaves all or nothing', async (code) => {
    const { folder: good } = await prepared(isReplaced);
    const counting = failingAt(0, code);
    expect((await running(good, ['design', 'one.json'], { files: counting.files })).status).toBe(0);
    const after = visible(good);
    expect(counting.count.calls).toBeGreaterThan(25);
    let refused = 0;
    for (let k = 1; k <= counting.count.calls; k += 1) {
      const { folder, before } = await prepared(isReplaced);
      const { status, stdout, stderr } = await running(folder, ['design', 'one.json'], {
        files: failingAt(k, code).files,
      });
      const left = visible(folder);
      if (status === 0) {
        // Only taking away what is in nobody's way may fail unnoticed.
        expect(left, `call ${k}`).toEqual(after);
        continue;
      }
      refused += 1;
      expect([status, stdout], `call ${k}`).toEqual([4, '']);
      expect(stderr, `call ${k}`).toMatch(/^E_IO .*: found .*; allowed /);
      expect(left, `call ${k}`).toEqual(before);
      if (code !== 'EIO') continue;
      expect((await running(folder, ['design', 'one.json'])).status, `after call ${k}`).toBe(0);
      expect(snapshot(folder), `after call ${k}`).toEqual(snapshot(good));
    }
    expect(refused).toBeGreaterThan(20);
  });
});

describe.each([
  ['a new folder', false],
  ['a folder that is replaced', true],
])('an interrupt while %s is written', (_, isReplaced) => {
  it('leaves all or nothing, at any call', async () => {
    const outcomes = new Set<number>();
    for (let k = 1; k <= 160; k += 1) {
      const { folder, before } = await prepared(isReplaced);
      let interrupt = () => {};
      let calls = 0;
      const files = watchedFiles(() => {
        calls += 1;
        if (calls === k) interrupt();
      });
      const onInterrupt = (callback: () => void) => {
        interrupt = callback;
        return () => {
          interrupt = () => {};
        };
      };
      const { status, stdout } = await running(folder, ['design', 'one.json'], { files, onInterrupt });
      outcomes.add(status);
      if (status === 130) {
        expect(stdout).toBe('');
        expect(snapshot(folder)).toEqual(before);
      } else
        expect(Object.keys(snapshot(folder)).filter((path) => path.includes('/'))).toHaveLength(RESULT_NAMES.length);
    }
    expect([...outcomes].sort()).toEqual([0, 130]);
  });
});
