import { createHash } from 'node:crypto';
import { cpSync, mkdirSync, readFileSync, renameSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { fill, folderWith, freshFolder, RESULT_NAMES as NAMES, running, SMALL, snapshot } from './room.js';

const fixtures = new URL('../../fixtures/designs/', import.meta.url).pathname;

describe('irisloom design', () => {
  it.each(['larkmoor', 'tern-quay', 'brackwater'])('makes the files of %s and a summary', async (name) => {
    const folder = freshFolder();
    cpSync(join(fixtures, `${name}.json`), join(folder, `${name}.json`));
    const { status, stdout, stderr } = await running(folder, ['design', `${name}.json`]);
    expect([status, stderr]).toEqual([0, '']);
    expect(Object.keys(snapshot(folder)).sort()).toEqual(
      [`${name}.json`, `${name}-design`, ...NAMES.map((file) => `${name}-design/${file}`)].sort(),
    );
    expect(stdout).toContain('Meets all 9 requirements.');
    const [, told = ''] = stdout.split(`Written to ${name}-design:\n`);
    expect(told.startsWith('  report.html, report.md, response.svg, ')).toBe(true);
    expect(told.endsWith(', result.json\n')).toBe(true);
    expect(
      told
        .split(/[\s,]+/)
        .filter((file) => file !== '')
        .sort(),
    ).toEqual(NAMES);
    expect(stdout.split('\n').filter((line) => line.length > 80)).toEqual([]);
  });

  it('records the way to the design file, its digest, and no absolute path or time', async () => {
    const folder = folderWith(SMALL);
    mkdirSync(join(folder, 'deep'));
    await running(folder, ['design', 'one.json', '--out', 'deep/results']);
    const text = readFileSync(join(folder, 'deep/results/result.json'), 'utf8');
    const sha256 = createHash('sha256').update(JSON.stringify(SMALL)).digest('hex');
    expect(JSON.parse(text).source).toEqual({ file: '../../one.json', sha256 });
    for (const each of Object.values(snapshot(join(folder, 'deep/results')))) {
      expect(each).not.toContain(folder);
      expect(each).not.toMatch(/20\d\d-\d\d/);
    }
    const page = readFileSync(join(folder, 'deep/results/report.html'), 'utf8');
    for (const told of ['../../one.json', sha256, sha256.slice(0, 12)]) expect(page).toContain(told);
  });

  it('gives the same bytes twice, in another folder too', async () => {
    const [one, other] = [folderWith(SMALL), folderWith(SMALL)];
    const first = await running(one, ['design', 'one.json']);
    const before = snapshot(one);
    const second = await running(one, ['design', 'one.json']);
    const elsewhere = await running(other, ['design', 'one.json']);
    expect([first.status, second.status, elsewhere.status]).toEqual([0, 0, 0]);
    expect(snapshot(one)).toEqual(before);
    expect(snapshot(other)).toEqual(before);
    expect(second.stdout).toBe(first.stdout);
  });

  it('replaces what the same file wrote before, also after an edit and a move, and leaves other files alone', async () => {
    const folder = folderWith(SMALL);
    await running(folder, ['design', 'one.json']);
    writeFileSync(join(folder, 'one-design/notes.txt'), 'mine');
    writeFileSync(join(folder, 'one.json'), JSON.stringify({ ...SMALL, order: 3 }));
    expect((await running(folder, ['design', 'one.json'])).status).toBe(0);
    expect(JSON.parse(readFileSync(join(folder, 'one-design/result.json'), 'utf8')).matrix.order).toBe(3);
    expect(readFileSync(join(folder, 'one-design/notes.txt'), 'utf8')).toBe('mine');
    const moved = `${folder}/moved`;
    mkdirSync(moved);
    for (const name of ['one.json', 'one-design']) renameSync(join(folder, name), join(moved, name));
    expect((await running(moved, ['design', 'one.json'])).status).toBe(0);
  });

  it('takes --out=FOLDER, a folder through a link, and a design file through a link', async () => {
    const folder = folderWith(SMALL);
    symlinkSync('one.json', join(folder, 'linked.json'));
    expect((await running(folder, ['design', 'linked.json', '--out=out'])).status).toBe(0);
    symlinkSync('out', join(folder, 'way'));
    expect((await running(folder, ['design', 'one.json', '--out', 'way'])).status).toBe(0);
  });

  const foreign: readonly (readonly [string, Readonly<Record<string, string>>])[] = [
    ['empty', {}],
    ['with files of somebody', { 'matrix.csv': 'precious' }],
    ['with a result that is no JSON', { 'result.json': '{' }],
    ['with a result of another shape', { 'result.json': '{"source": {"file": 3}}' }],
    ['with a result of null', { 'result.json': 'null' }],
    ['with the result of another design', { 'result.json': '{"source": {"file": "../two.json", "sha256": "0"}}' }],
  ];

  it.each(foreign)('refuses a folder %s, and takes it with --overwrite', async (_, files) => {
    const folder = folderWith(SMALL);
    fill(join(folder, 'out'), files);
    const before = snapshot(folder);
    const refused = await running(folder, ['design', 'one.json', '--out', 'out']);
    expect([refused.status, refused.stdout]).toEqual([4, '']);
    expect(refused.stderr).toMatch(/^E_OUTPUT_EXISTS out: found .*; allowed .*--overwrite/);
    expect(snapshot(folder)).toEqual(before);
    const taken = await running(folder, ['design', 'one.json', '--out', 'out', '--overwrite']);
    expect(taken.status).toBe(0);
    expect(Object.keys(snapshot(join(folder, 'out'))).sort()).toEqual(NAMES);
  });

  it.each([
    ['the design file itself', ['--out', 'one.json'], 'one.json', 'E_OUTPUT_SAME'],
    ['the design file itself, whatever is asked', ['--out', './one.json', '--overwrite'], 'one.json', 'E_OUTPUT_SAME'],
    ['its own folder under the name of a result', ['--out', '.', '--overwrite'], 'result.json', 'E_OUTPUT_SAME'],
    ['a file', ['--out', 'taken', '--overwrite'], 'one.json', 'E_OUTPUT_EXISTS'],
    ['a folder within no folder', ['--out', 'no/where'], 'one.json', 'E_IO'],
    ['a folder within a file', ['--out', 'taken/out'], 'one.json', 'E_IO'],
    ['a path that ends early', ['--out', 'a\0b'], 'one.json', 'E_IO'],
    ['a name longer than any', ['--out', 'x'.repeat(300)], 'one.json', 'E_IO'],
  ])('refuses to write to %s', async (_, more, name, code) => {
    const folder = folderWith(SMALL, name);
    writeFileSync(join(folder, 'taken'), 'precious');
    const before = snapshot(folder);
    const { status, stdout, stderr } = await running(folder, ['design', name, ...more]);
    expect([status, stdout]).toEqual([4, '']);
    expect(stderr.split(' ')[0]).toBe(code);
    expect(snapshot(folder)).toEqual(before);
  });

  it('refuses a link to the design file in the place of a result', async () => {
    const folder = folderWith(SMALL);
    mkdirSync(join(folder, 'out'));
    symlinkSync('../one.json', join(folder, 'out/matrix.csv'));
    const { status, stderr } = await running(folder, ['design', 'one.json', '--out', 'out', '--overwrite']);
    expect([status, stderr.split(' ')[0]]).toEqual([4, 'E_OUTPUT_SAME']);
    expect(readFileSync(join(folder, 'one.json'), 'utf8')).toBe(JSON.stringify(SMALL));
  });

  it('takes away what an interrupted run left, but not what a run at work holds', async () => {
    const folder = folderWith(SMALL);
    const process = { id: 77, isAlive: (id: number) => id === 42 };
    fill(join(folder, '.one-design.partial-41'), { 'matrix.csv': 'half' });
    fill(join(folder, '.one-design.partial-42'), { 'matrix.csv': 'half' });
    fill(join(folder, '.two-design.partial-41'), { 'matrix.csv': 'half' });
    await running(folder, ['design', 'one.json'], { process });
    const names = Object.keys(snapshot(folder)).filter((path) => !path.includes('/'));
    expect(names).toEqual(['.one-design.partial-42', '.two-design.partial-41', 'one-design', 'one.json']);
    fill(join(folder, 'one-design'), {
      '.matrix.csv.partial-41': '',
      '.result.json.previous-41': '',
      '.matrix.csv.partial-42': '',
      '.other.partial-41': '',
    });
    await running(folder, ['design', 'one.json'], { process });
    expect(Object.keys(snapshot(join(folder, 'one-design')))).toEqual([
      '.matrix.csv.partial-42',
      '.other.partial-41',
      ...NAMES,
    ]);
  });

  it('does not let a name of the filter near any path, and guards it where it goes', async () => {
    const folder = folderWith({ ...SMALL, name: '../=1+1 <script>, "x"' });
    const { status, stdout } = await running(folder, ['design', 'one.json']);
    expect(status).toBe(0);
    expect(stdout).toContain('../=1+1 <script>, "x"\n');
    expect(Object.keys(snapshot(folder)).filter((path) => !path.includes('/'))).toEqual(['one-design', 'one.json']);
    expect(readFileSync(join(folder, 'one-design/response.s2p'), 'utf8')).toContain('! ../=1+1 <script>, "x"\n');
  });

  it('stays silent on standard error unless it is a terminal and something takes long', async () => {
    const folder = folderWith(SMALL);
    const texts: string[] = [];
    let time = 0;
    const stderr = { write: (text: string) => texts.push(text), isTerminal: true };
    await running(folder, ['design', 'one.json'], { stderr });
    expect(texts).toEqual([]);
    await running(folder, ['design', 'one.json'], { stderr, now: () => (time += 160) });
    expect(texts).toEqual([]);
    await running(folder, ['design', 'one.json'], { stderr, now: () => (time += 600) });
    expect(texts.join('')).toContain('Predicting the response');
    expect(texts.join('')).toContain('Drawing the pictures');
    expect(texts.join('')).toContain('Writing the results');
    expect(texts.at(-1)).toMatch(/^\r +\r$/);
    texts.splice(0);
    await running(folder, ['design', 'one.json'], {
      stderr: { ...stderr, isTerminal: false },
      now: () => (time += 600),
    });
    expect(texts).toEqual([]);
  });

  it('clears what it was doing before it tells a refusal', async () => {
    const folder = folderWith(SMALL);
    const texts: string[] = [];
    let time = 0;
    const stderr = { write: (text: string) => texts.push(text), isTerminal: true };
    const args = ['design', 'one.json', '--out', 'no/where'];
    const { status } = await running(folder, args, { stderr, now: () => (time += 600) });
    expect(status).toBe(4);
    expect(texts.at(-2)).toMatch(/^\r +\r$/);
    expect(texts.at(-1)).toMatch(/^E_IO /);
  });

  it('tells the names of many files in lines of 80 columns, each once', async () => {
    const folder = folderWith(SMALL);
    const { stdout } = await running(folder, ['design', 'one.json']);
    const lines = stdout.slice(stdout.indexOf('Written to')).trimEnd().split('\n').slice(1);
    expect(lines.length).toBeLessThan(4);
    expect(lines.filter((line) => line.length > 80 || !line.startsWith('  '))).toEqual([]);
    expect(lines.slice(0, -1).every((line) => line.endsWith(','))).toBe(true);
  });
});
