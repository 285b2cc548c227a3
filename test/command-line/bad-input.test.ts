import { execFileSync } from 'node:child_process';
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { folderWith, freshFolder, running, SMALL, snapshot } from './room.js';

const zeros = (...list: unknown[]) => JSON.stringify({ ...SMALL, order: 6, transmissionZeros: list });
const changed = (more: object) => JSON.stringify({ ...SMALL, ...more });
/** A sound design file with one member written as it is. */
const member = (text: string) =>
  `{"passband": {"centerHz": 1e9, "bandwidthHz": 2e7}, "order": 2, "returnLossDb": 20, ${text}}`;
const instead = (text: string) => `{"passband": {"centerHz": 1e9, "bandwidthHz": 2e7}, ${text}}`;

type Row = readonly [row: string, text: string, code: string, status: number, ...fragments: string[]];

const ROWS: readonly Row[] = [
  ['1 order 0', changed({ order: 0 }), 'E_ORDER_RANGE', 2, 'found 0', 'whole'],
  ['1 order 2.5', changed({ order: 2.5 }), 'E_ORDER_RANGE', 2, 'found 2.5', 'order (1:'],
  ['2 order 200', changed({ order: 200 }), 'E_ORDER_RANGE', 2, '200', '100'],
  ['3 order as text', changed({ order: '6' }), 'E_TYPE', 2, 'remove the quotes'],
  ['4 NaN', instead('"order": NaN'), 'E_JSON_SYNTAX', 2, '(1:', '"NaN"'],
  ['4 +5', instead('"order": +5'), 'E_JSON_SYNTAX', 2, '"+5"'],
  ['5 overflow', instead('"order": 1e999'), 'E_NUMBER_OVERFLOW', 2, '1e999'],
  ['7 return loss -20', changed({ returnLossDb: -20 }), 'E_RL_RANGE', 2, 'did you mean 20?'],
  ['8 return loss 400', changed({ returnLossDb: 400 }), 'E_RL_RANGE', 2, '100'],
  ['9 zero in the band', zeros(0.5), 'E_ZERO_IN_PASSBAND', 2, 'transmissionZeros[0] (1:', 'Hz'],
  ['10 zero on the edge', zeros(1), 'E_ZERO_ON_EDGE', 2, 'S21 cannot be 0'],
  ['11 zero 1e-12 beyond the edge', zeros(1 + 1e-12), 'E_CERT', 3, 'found', 'allowed'],
  ['12 seven zeros', zeros(2, 2, 2, 2, 2, 2, 2), 'E_ZERO_COUNT', 2, '7'],
  ['13 no direct coupling', changed({ transmissionZeros: [2, 3], portCouplings: 'noDirect' }), 'E_ZERO_TOPOLOGY', 2],
  ['14 zero without partner', zeros({ re: 0.3, im: 1.2 }), 'E_ZERO_PAIR', 2, '-0.3+1.2j'],
  ['15 partner off', zeros({ re: 0.3, im: 1.2 }, { re: -0.3, im: 1.2 + 1e-9 }), 'E_ZERO_PAIR', 2],
  ['18 zero at 0', zeros(0), 'E_ZERO_IN_PASSBAND', 2],
  ['20 zeros null', changed({ transmissionZeros: null }), 'E_TYPE', 2, 'null'],
  ['21 zero far out', zeros({ re: 0, im: 1e308 }), 'E_ZERO_RANGE', 2],
  ['22 key twice', member('"order": 3'), 'E_JSON_DUPLICATE', 2, 'order (1:'],
  ['23 misspelled key', changed({ retrunLoss: 20 }), 'E_UNKNOWN_KEY', 2, 'returnLossDb'],
  ['24 forbidden key', member('"\\u005f_proto__": 1'), 'E_FORBIDDEN_KEY', 2],
  ['25 too deep', member(`"mask": ${'['.repeat(30)}${']'.repeat(30)}`), 'E_JSON_DEPTH', 2],
  ['26 one byte beyond 1 MiB', member(`"notes": "${'x'.repeat(1_048_577)}"`).slice(0, 1_048_577), 'E_FILE_SIZE', 4],
  ['27 byte-order mark', `\ufeff${changed({})}`, 'E_ENCODING', 2],
  ['27 comment', `// hello\n${changed({})}`, 'E_JSON_SYNTAX', 2, '(1:1)', 'comment'],
  ['27 text after the end', `${changed({})} x`, 'E_JSON_SYNTAX', 2],
  ['27 empty file', '', 'E_JSON_SYNTAX', 2],
  ['28 direction mark in the name', changed({ name: 'a\u202eb' }), 'E_NAME', 2, '\\u202e'],
  ['28 long name', changed({ name: 'x'.repeat(121) }), 'E_NAME', 2, '121'],
  ['29 edges exchanged', changed({ passband: { lowerHz: '2 GHz', upperHz: '1 GHz' } }), 'E_BAND', 2, '2000000000'],
  [
    '30 more zeros than the form holds',
    changed({ order: 4, transmissionZeros: [2], topology: 'inline' }),
    'E_TOPOLOGY_ZEROS',
    2,
    'found',
  ],
];

describe('a design file that must be refused', () => {
  it.each(ROWS)('row %s', async (_, text, code, status, ...fragments) => {
    const folder = folderWith(String(text));
    const before = snapshot(folder);
    const ran = await running(folder, ['design', 'one.json']);
    expect(ran.stderr.split(/[ :]/)[0]).toBe(code);
    expect([ran.status, ran.stdout]).toEqual([status, '']);
    for (const fragment of fragments) expect(ran.stderr).toContain(fragment);
    expect(ran.stderr).not.toMatch(/^\s+at /m);
    expect(snapshot(folder)).toEqual(before);
  });

  it('takes the whole of 1 MiB', async () => {
    const text = changed({ notes: 'x' });
    const folder = folderWith(text + ' '.repeat(1_048_576 - text.length));
    expect((await running(folder, ['design', 'one.json'])).status).toBe(0);
  });

  it('row 27 bad UTF-8', async () => {
    const folder = freshFolder();
    writeFileSync(join(folder, 'one.json'), Buffer.from([0x7b, 0xff, 0x7d]));
    const ran = await running(folder, ['design', 'one.json']);
    expect([ran.status, ran.stdout, ran.stderr.split(' ')[0]]).toEqual([2, '', 'E_ENCODING']);
  });

  it('lists all faults of a file, each on its line', async () => {
    const folder = folderWith({ ...SMALL, order: 'six', returnLossDb: -1, colour: 'red' });
    const { status, stderr } = await running(folder, ['design', 'one.json']);
    expect(status).toBe(2);
    expect(stderr.trimEnd().split('\n')).toHaveLength(3);
  });
});

describe('what is no file to be read', () => {
  it.each([
    ['a folder', '.', 'E_NOT_A_FILE'],
    ['a device', '/dev/zero', 'E_NOT_A_FILE'],
    ['a pipe without a writer', 'pipe', 'E_NOT_A_FILE'],
    ['nothing', 'absent.json', 'E_FILE_MISSING'],
    ['an empty path', '', 'E_FILE_MISSING'],
    ['a path that ends early', 'one\0.json', 'E_FILE_MISSING'],
    ['a file within a file', 'one.json/two.json', 'E_IO'],
  ])('%s', async (_, path, code) => {
    const folder = folderWith(SMALL);
    execFileSync('mkfifo', [join(folder, 'pipe')]);
    const before = snapshot(folder);
    for (const command of ['design', 'analyze', 'rotate']) {
      const ran = await running(folder, [command, path]);
      expect([ran.status, ran.stdout, ran.stderr.split(' ')[0]]).toEqual([4, '', code]);
    }
    expect(snapshot(folder)).toEqual(before);
  });

  it('shows a path with its control characters escaped', async () => {
    const { stderr } = await running(freshFolder(), ['design', 'a\u001b[31mb.json']);
    expect(stderr).toContain('a\\u001b[31mb.json');
  });
});

describe('a command line that must be refused', () => {
  it.each([
    ['an unknown command', ['desing', 'one.json'], 'E_COMMAND', 'did you mean design?'],
    ['a file in the place of a command', ['one.json'], 'E_COMMAND', 'irisloom design'],
    ['an unknown option', ['design', 'one.json', '--overwrit'], 'E_OPTION', 'did you mean --overwrite?'],
    ['an unknown short option', ['design', '-x', 'one.json'], 'E_OPTION', '"-x"'],
    ['an unknown program option', ['--verson'], 'E_OPTION', 'did you mean --version?'],
    ['no file', ['design'], 'E_OPERAND', 'no design file'],
    ['two files', ['design', 'one.json', 'two.json'], 'E_OPERAND', '"two.json"'],
    ['an option without its value', ['design', 'one.json', '--out'], 'E_OPTION', '--out=VALUE'],
    ['an empty value', ['design', 'one.json', '--out='], 'E_OPTION', '--out=VALUE'],
    ['an option for a value', ['design', 'one.json', '--out', '--overwrite'], 'E_OPTION', '--out=VALUE'],
    ['a value for a flag', ['design', 'one.json', '--overwrite=yes'], 'E_OPTION', 'remove the value'],
    ['an option twice', ['design', 'one.json', '--out', 'a', '--out', 'b'], 'E_OPTION', 'twice'],
    ['a file for the schema', ['schema', 'one.json'], 'E_OPERAND', 'nothing after the command'],
    ['an option of another command', ['analyze', 'one.json', '--out', 'a'], 'E_OPTION', '--json'],
  ])('%s', async (_, args, code, fragment) => {
    const folder = folderWith(SMALL);
    const before = snapshot(folder);
    const ran = await running(folder, args);
    expect([ran.status, ran.stdout]).toEqual([2, '']);
    expect(ran.stderr).toContain(`${code}: found`);
    expect(ran.stderr).toContain(fragment);
    expect(snapshot(folder)).toEqual(before);
  });

  it('no word at all: the help on standard error', async () => {
    const ran = await running(freshFolder(), []);
    expect([ran.status, ran.stdout]).toEqual([2, '']);
    expect(ran.stderr).toContain('irisloom design FILE');
  });

  it('takes a file whose name begins with a dash after --', async () => {
    const folder = folderWith(SMALL, '-one.json');
    mkdirSync(join(folder, 'in'));
    expect((await running(folder, ['design', '--', '-one.json'])).status).toBe(0);
  });
});
