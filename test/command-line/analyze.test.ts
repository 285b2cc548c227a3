import { cpSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { folderWith, freshFolder, running, SMALL, snapshot } from './room.js';

const fixtures = new URL('../../fixtures/designs/', import.meta.url).pathname;
/** Chebyshev, order 3, 20 dB, rounded to four decimals. */
const ROUNDED = [
  [0, 1.0824, 0, 0, 0],
  [1.0824, 0, 1.0303, 0, 0],
  [0, 1.0303, 0, 1.0303, 0],
  [0, 0, 1.0303, 0, 1.0824],
  [0, 0, 0, 1.0824, 0],
];
const HALF = Math.SQRT1_2;
const ONE = [
  [0, HALF, 0],
  [HALF, 0, HALF],
  [0, HALF, 0],
];
const BAND = { centerHz: '1 GHz', bandwidthHz: '20 MHz' };

async function analyzing(file: string | object, ...more: string[]) {
  const folder = folderWith(file);
  const before = snapshot(folder);
  const ran = await running(folder, ['analyze', 'one.json', ...more]);
  expect(snapshot(folder)).toEqual(before);
  const isText = !more.includes('--json');
  expect(ran.stdout.split('\n').filter((line) => isText && line.length > 80)).toEqual([]);
  return ran;
}

describe('irisloom analyze', () => {
  it('tells what a bare matrix does, normalized', async () => {
    const { status, stdout, stderr } = await analyzing({ matrix: ROUNDED });
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toContain('Matrix of order 3');
    expect(stdout).toMatch(/least return loss in the band +19\.99 dB +w = [+-]0\.50/);
    expect(stdout).toMatch(/loss at the center +0\.000 dB/);
    expect(stdout).toContain('no response is stated');
    expect(stdout.match(/ holds {2}C1/g)).toHaveLength(3);
    expect(stdout).not.toContain('MHz');
  });

  it.each(['larkmoor', 'tern-quay', 'brackwater'])('takes a result of design as it is: %s', async (name) => {
    const folder = freshFolder();
    cpSync(join(fixtures, `${name}.json`), join(folder, 'one.json'));
    await running(folder, ['design', 'one.json']);
    const { status, stdout, stderr } = await running(folder, ['analyze', 'one-design/result.json']);
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toMatch(/The matrix has the stated response: (\d+) of \1 certificates hold\./);
    expect(stdout).toContain('Meets all 9 requirements.');
    expect(stdout.match(/dip of \|S21\|/g)).toHaveLength(name === 'brackwater' ? 4 : 2);
    expect(stdout.split('\n').filter((line) => line.length > 80)).toEqual([]);
  });

  it('finds the dips where the zeros are', async () => {
    const folder = freshFolder();
    cpSync(join(fixtures, 'tern-quay.json'), join(folder, 'one.json'));
    await running(folder, ['design', 'one.json']);
    const { stdout } = await running(folder, ['analyze', 'one-design/result.json', '--json']);
    const { dips } = JSON.parse(stdout);
    expect(dips.map(({ omega }: { omega: number }) => Number(omega.toFixed(6)))).toEqual([1.28, 1.75]);
  });

  it('gives hand-over numbers and a mask verdict with a passband', async () => {
    const mask = [{ fromHz: '1.05 GHz', rejectionDb: 80 }];
    const { status, stdout } = await analyzing({
      matrix: ROUNDED,
      passband: BAND,
      unloadedQ: 2000,
      mask,
      name: 'mine',
    });
    expect(status).toBe(0);
    expect(stdout).toMatch(/^mine\n/);
    expect(stdout).toContain('Misses the only requirement.');
    expect(stdout).toMatch(/source +1 +42\.68/);
    expect(stdout).toContain('unloaded Q 2000');
  });

  it('gives status 3 and says so when the matrix has not the stated response', async () => {
    const { status, stdout, stderr } = await analyzing({ matrix: ROUNDED, order: 3, returnLossDb: 20 });
    expect([status, stderr]).toEqual([3, '']);
    expect(stdout).toMatch(/The matrix does not have the stated response: \d+ of \d+ certificates fail/);
    expect(stdout).toMatch(/ fails {2}C6/);
  });

  it('certifies a matrix against a stated butterworth response', async () => {
    const { status, stdout } = await analyzing({ matrix: ONE, family: 'butterworth' });
    expect(status).toBe(0);
    expect(stdout).toContain('The matrix has the stated response');
  });

  it('holds a stated form against the matrix', async () => {
    const crossed = ROUNDED.map((row) => [...row]);
    crossed[0]![3] = crossed[3]![0] = 1e-3;
    const { stdout } = await analyzing({ matrix: crossed, returnLossDb: 20, topology: 'inline' });
    expect(stdout).toMatch(/fails {2}C8/);
  });

  it('takes { order, values }, and a port that couples to nothing', async () => {
    expect((await analyzing({ matrix: { order: 3, values: ROUNDED } })).status).toBe(0);
    const loose = [
      [0, 1, 0],
      [1, 0, 0],
      [0, 0, 0],
    ];
    const { status, stdout } = await analyzing({ matrix: loose, passband: BAND });
    expect(status).toBe(0);
    expect(stdout).toContain('over 300 dB');
    expect(stdout).toMatch(/load +none/);
  });

  it('prints JSON that repeats the matrix and every certificate', async () => {
    const { stdout } = await analyzing({ matrix: ROUNDED, passband: BAND }, '--json');
    const read = JSON.parse(stdout);
    expect(read.matrix.values).toEqual(ROUNDED);
    expect(read.certificates).toHaveLength(3);
    expect(read.handOver.resonators).toHaveLength(3);
  });

  const withEntry = (i: number, j: number, value: unknown) =>
    JSON.stringify({ matrix: ROUNDED.map((row, n) => row.map((entry, m) => (n === i && m === j ? value : entry))) });

  it.each<readonly [string, string | object, string, ...string[]]>([
    ['no matrix', {}, 'E_MISSING', 'matrix (1:1)'],
    ['a list', '[]', 'E_TYPE', 'an object with a matrix'],
    ['text for a matrix', { matrix: 'M' }, 'E_TYPE', 'matrix (1:11)'],
    [
      'two rows',
      {
        matrix: [
          [0, 1],
          [1, 0],
        ],
      },
      'E_MATRIX_SHAPE',
      '2 rows',
      '3 to 102',
    ],
    [
      'a short row',
      {
        matrix: [
          [0, 1, 0],
          [1, 0],
          [0, 1, 0],
        ],
      },
      'E_MATRIX_SHAPE',
      'matrix[1] (1:20)',
      '2 entries',
    ],
    ['an asymmetric matrix', withEntry(1, 2, -1.0303), 'E_NOT_SYMMETRIC', '(1,2) = -1.0303 but (2,1) = 1.0303', '(1:'],
    ['null for a number', withEntry(2, 2, null), 'E_TYPE', 'matrix[2][2]', 'null'],
    ['text for a number', withEntry(2, 2, '0'), 'E_TYPE', 'remove the quotes'],
    ['NaN', '{"matrix": [[0, NaN, 0]]}', 'E_JSON_SYNTAX', '(1:17)', '"NaN"'],
    ['Infinity by exponent', '{"matrix": [[0, 1e999, 0]]}', 'E_NUMBER_OVERFLOW', '1e999'],
    ['a matrix in hertz', withEntry(1, 1, 3.8e9), 'E_ENTRY_RANGE', 'matrix[1][1] (1:', 'not in hertz'],
    ['an entry that is next to nothing', withEntry(1, 1, 5e-324), 'E_ENTRY_RANGE', 'write 0'],
    ['another order', { matrix: ONE, order: 2 }, 'E_MATRIX_SHAPE', 'order 2 beside a matrix of order 1'],
    ['another order within', { matrix: { order: 2, values: ONE } }, 'E_MATRIX_SHAPE', 'matrix.order'],
    ['a misspelled key', { matrix: ONE, pasband: BAND }, 'E_UNKNOWN_KEY', 'did you mean "passband"?'],
    ['a misspelled key within', { matrix: { order: 1, vaules: ONE } }, 'E_UNKNOWN_KEY', 'did you mean "values"?'],
    ['a mask without passband', { matrix: ONE, mask: [{ fromHz: 1e9, rejectionDb: 3 }] }, 'E_MISSING', 'passband'],
    ['a Q without passband', { matrix: ONE, unloadedQ: 100 }, 'E_MISSING', 'passband'],
    [
      'zeros in hertz without passband',
      { matrix: ROUNDED, returnLossDb: 20, transmissionZeros: ['1 GHz'] },
      'E_MISSING',
      'passband',
    ],
    ['zeros without a return loss', { matrix: ROUNDED, transmissionZeros: [2] }, 'E_MISSING', 'returnLossDb'],
    [
      'a zero in the band',
      { matrix: ROUNDED, returnLossDb: 20, transmissionZeros: [0.5] },
      'E_ZERO_IN_PASSBAND',
      'transmissionZeros[0] (1:',
    ],
    ['a wrong mask', { matrix: ONE, passband: BAND, mask: [{ rejectionDb: 3 }] }, 'E_MASK', 'mask[0] (1:'],
    ['a wrong Q', { matrix: ONE, passband: BAND, unloadedQ: -1 }, 'E_Q_RANGE', 'unloadedQ (1:'],
  ])('refuses %s', async (_, file, code, ...fragments) => {
    const { status, stdout, stderr } = await analyzing(file);
    expect(stderr.split(' ')[0]).toBe(code);
    expect([status, stdout]).toEqual([2, '']);
    for (const fragment of fragments) expect(stderr).toContain(fragment);
  });

  it('says of a matrix without couplings that nothing gets through', async () => {
    const { status, stdout, stderr } = await analyzing({
      matrix: [
        [0, 0, 0],
        [0, 0, 0],
        [0, 0, 0],
      ],
    });
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toContain('over 300 dB');
  });

  it('lists all faults, and no missing key where it was misspelled', async () => {
    const file = {
      matrix: [
        [0, 1, 0],
        [2, null, 1],
        [0, 1, 'x'],
      ],
      returnLosDb: 20,
      transmissionZeros: [2],
    };
    const { stderr } = await analyzing(file);
    const codes = stderr
      .trimEnd()
      .split('\n')
      .map((line) => line.split(' ')[0]);
    expect(codes).toEqual(['E_UNKNOWN_KEY', 'E_TYPE', 'E_TYPE']);
  });

  it('lists at most 20 faults and counts the others', async () => {
    const rows = Array.from({ length: 6 }, () => Array(6).fill(null));
    const { stderr } = await analyzing({ matrix: rows });
    expect(stderr.trimEnd().split('\n')).toHaveLength(21);
    expect(stderr).toContain('(16 more faults not listed)');
  });

  it('reads a result whose specification was spoiled with the place of the fault', async () => {
    const folder = folderWith(SMALL);
    await running(folder, ['design', 'one.json']);
    const path = join(folder, 'one-design/result.json');
    const result = JSON.parse(readFileSync(path, 'utf8'));
    result.specification.returnLossDb = -20;
    writeFileSync(path, JSON.stringify(result));
    const { status, stderr } = await running(folder, ['analyze', 'one-design/result.json']);
    expect(status).toBe(2);
    expect(stderr).toMatch(/^E_RL_RANGE specification\.returnLossDb \(1:\d+\)/);
  });
});
