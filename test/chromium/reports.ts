import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, join, resolve } from 'node:path';
import { afterAll, beforeAll } from 'vitest';
import type { Design } from '../../src/index.js';
import { start, useProgram } from '../command-line/program.js';

const DESIGNS = resolve(import.meta.dirname, '../../fixtures/designs');

/** Names of the fixtures. */
export const FIXTURES: readonly string[] = readdirSync(DESIGNS)
  .filter((name) => name.endsWith('.json'))
  .map((name) => basename(name, '.json'))
  .sort();

/** Pictures of a document in their order; each is a file of its own too. */
export const PICTURES = ['response', 'band', 'group-delay', 'routing', 'poles-zeros', 'matrix', 'resonators'] as const;

/** What the program wrote for a fixture, by the name of the file. */
export type Written = (fixture: string, file: string) => string;

/** Runs the program over all fixtures before the tests of a file. */
export function useReports(): Written {
  const { path } = useProgram();
  let home = '';
  beforeAll(async () => {
    home = mkdtempSync(join(tmpdir(), 'irisloom-reports-'));
    for (const name of FIXTURES) {
      const args = ['design', join(DESIGNS, `${name}.json`), '--out', join(home, name)];
      const { code, stderr } = await start(path, args, home);
      if (code !== 0) throw new Error(`${name}: ${stderr}`);
    }
  }, 120_000);
  afterAll(() => rmSync(home, { recursive: true, force: true }));
  return (fixture, file) => readFileSync(join(home, fixture, file), 'utf8');
}

/** The result that stands beside a report. */
export function resultOf(written: Written, fixture: string): Design {
  return JSON.parse(written(fixture, 'result.json')) as Design;
}
