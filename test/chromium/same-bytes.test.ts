import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, join, resolve } from 'node:path';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { start, useProgram } from '../command-line/program.js';

const DESIGNS = resolve(import.meta.dirname, '../../fixtures/designs');
const FIXTURES = readdirSync(DESIGNS).filter((name) => name.endsWith('.json'));

/** What must be among the files, so that an empty folder does not count as equal. */
const LEAST = [
  'hand-over.csv',
  'matrix.csv',
  'report.html',
  'report.md',
  'response.s2p',
  'response.svg',
  'result.json',
];

describe('the files of a design', () => {
  const { path } = useProgram();
  const home = mkdtempSync(join(tmpdir(), 'irisloom-bytes-'));
  afterEach(() => rmSync(home, { recursive: true, force: true }));

  async function filesOf(design: string, folder: string): Promise<ReadonlyMap<string, Buffer>> {
    mkdirSync(home, { recursive: true });
    const out = join(home, folder);
    const { code, stderr } = await start(path, ['design', join(DESIGNS, design), '--out', out], home);
    expect(stderr).toBe('');
    expect(code).toBe(0);
    return new Map(
      readdirSync(out)
        .sort()
        .map((name) => [name, readFileSync(join(out, name))]),
    );
  }

  it.each(FIXTURES.map((file) => [basename(file, '.json'), file]))(
    '%s: the same bytes from another process, in another time zone and language',
    async (_, design) => {
      const first = await filesOf(design, 'one');
      vi.stubEnv('TZ', 'Asia/Kathmandu');
      vi.stubEnv('LANG', 'tr_TR.UTF-8');
      vi.stubEnv('LC_ALL', 'tr_TR.UTF-8');
      const second = await filesOf(design, 'two');
      vi.unstubAllEnvs();
      expect([...first.keys()]).toEqual(expect.arrayContaining(LEAST));
      expect([...second.keys()]).toEqual([...first.keys()]);
      for (const [name, bytes] of first) expect(second.get(name)?.equals(bytes), name).toBe(true);
    },
  );
});
