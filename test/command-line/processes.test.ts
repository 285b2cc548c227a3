import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { readTwoPort } from '../measurement/read-two-port.js';
import { start, useProgram } from './program.js';
import { folderWith, RESULT_NAMES, snapshot } from './room.js';

const program = useProgram();
const POINTS = 10_001;
const LARGE = {
  passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' },
  order: 6,
  returnLossDb: 20,
  sweep: { fromHz: '0.9 GHz', toHz: '1.1 GHz', points: POINTS },
};

/** Fails if a file of a folder of results is cut short. */
function expectWhole(folder: string): void {
  expect(JSON.parse(readFileSync(join(folder, 'result.json'), 'utf8')).matrix.order).toBe(6);
  expect(readFileSync(join(folder, 'matrix.csv'), 'utf8').split('\r\n')).toHaveLength(10);
  expect(readFileSync(join(folder, 'hand-over.csv'), 'utf8').endsWith('\r\n')).toBe(true);
  expect(readFileSync(join(folder, 'report.html'), 'utf8').endsWith('</html>\n')).toBe(true);
  for (const name of RESULT_NAMES.filter((each) => each.endsWith('.svg')))
    expect(readFileSync(join(folder, name), 'utf8').endsWith('</svg>\n'), name).toBe(true);
  expect(readTwoPort(readFileSync(join(folder, 'response.s2p'), 'utf8')).records).toHaveLength(POINTS);
}

async function fullTime(folder: string): Promise<number> {
  const from = performance.now();
  expect((await start(program.path, ['design', 'one.json'], folder)).code).toBe(0);
  return performance.now() - from;
}

/** Fractions of a full run, spread evenly but not in order. */
const MOMENTS = Array.from({ length: 20 }, (_, n) => 0.35 + (((n * 7) % 20) / 20) * 0.65);

describe('the program as a process', () => {
  it('writes the same bytes in two processes, and no color into a pipe', async () => {
    const [one, other] = [folderWith(LARGE), folderWith(LARGE)];
    const [first, second] = await Promise.all(
      [one, other].map((folder) => start(program.path, ['design', 'one.json'], folder)),
    );
    expect([first!.code, second!.code, first!.stderr]).toEqual([0, 0, '']);
    expect(first!.stdout).toBe(second!.stdout);
    expect(first!.stdout).not.toContain('\u001b');
    expect(snapshot(one)).toEqual(snapshot(other));
  });

  it('gives the exit status of a refusal, and nothing on standard output', async () => {
    const folder = folderWith('{');
    const { code, stdout, stderr } = await start(program.path, ['design', 'one.json'], folder);
    expect([code, stdout, stderr.split(' ')[0]]).toEqual([2, '', 'E_JSON_SYNTAX']);
    expect((await start(program.path, ['design', '/dev/stdin'], folder)).code).toBe(4);
  });

  it('killed at any moment leaves no file cut short, and the next run takes the leftovers away', async () => {
    const folder = folderWith(LARGE);
    const whole = await fullTime(folder);
    let killed = 0;
    for (const [n, moment] of MOMENTS.entries()) {
      const place = n % 2 === 0 ? folder : folderWith({ ...LARGE, order: 6 });
      if (n % 2 === 0) writeFileSync(join(folder, 'one.json'), JSON.stringify({ ...LARGE, returnLossDb: 10 + n }));
      const { signal } = await start(program.path, ['design', 'one.json'], place, (child) => {
        setTimeout(() => child.kill('SIGKILL'), moment * whole);
      });
      if (signal === 'SIGKILL') killed += 1;
      const isThere = readdirSync(place).includes('one-design');
      expect(n % 2 === 0 ? isThere : true).toBe(true);
      if (isThere) expectWhole(join(place, 'one-design'));
    }
    expect(killed).toBeGreaterThan(5);
    await fullTime(folder);
    const names = readdirSync(join(folder, 'one-design')).sort();
    expect(names).toEqual(RESULT_NAMES);
  });

  it('ends cleanly when the user interrupts', async () => {
    const measured = folderWith(LARGE);
    const whole = await fullTime(measured);
    for (const moment of MOMENTS.slice(0, 6)) {
      const folder = folderWith(LARGE);
      const { code, signal } = await start(program.path, ['design', 'one.json'], folder, (child) => {
        setTimeout(() => child.kill('SIGINT'), moment * whole);
      });
      expect(signal === 'SIGINT' || code === 130 || code === 0).toBe(true);
      const names = readdirSync(folder);
      expect(names.filter((name) => name.startsWith('.'))).toEqual([]);
      if (names.includes('one-design')) expectWhole(join(folder, 'one-design'));
    }
  });
});
