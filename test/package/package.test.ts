import { execFileSync, spawnSync } from 'node:child_process';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { VERSION } from '../../src/index.js';

const ROOT = resolve(import.meta.dirname, '../..');
const manifest = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8'));

/** A folder as a user has it: the package unpacked from its tarball, its dependencies beside it, nothing of the sources. */
let folder = '';

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'irisloom-package-'));
  execFileSync('npm', ['run', 'build'], { cwd: ROOT, stdio: 'ignore' });
  const listed = JSON.parse(
    execFileSync('npm', ['pack', '--json', '--ignore-scripts', '--pack-destination', folder], {
      cwd: ROOT,
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'ignore'],
    }),
  );
  const modules = join(folder, 'node_modules');
  mkdirSync(join(modules, 'irisloom'), { recursive: true });
  const [entry] = Array.isArray(listed) ? listed : Object.values(listed);
  execFileSync('tar', ['xzf', join(folder, entry.filename), '-C', join(modules, 'irisloom'), '--strip-components=1']);
  for (const name of readdirSync(join(ROOT, 'node_modules'))) {
    if (!name.startsWith('.')) symlinkSync(join(ROOT, 'node_modules', name), join(modules, name));
  }
  writeFileSync(join(folder, 'package.json'), '{"type":"module","private":true}');
}, 120_000);

afterAll(() => rmSync(folder, { recursive: true, force: true }));

const node = (...argv: string[]): string => execFileSync(process.execPath, argv, { cwd: folder, encoding: 'utf8' });

describe('the packed package', () => {
  it('is imported by its name and designs a filter', () => {
    writeFileSync(
      join(folder, 'use.js'),
      `import { generalizedChebyshev, transversal, folded, scatteringAt } from 'irisloom';
       const response = generalizedChebyshev({ order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45] });
       const { matrix } = folded(transversal(response));
       console.log(matrix.values[2][5].toFixed(4), Math.hypot(scatteringAt(matrix, 1).s11.re, scatteringAt(matrix, 1).s11.im).toFixed(6));`,
    );
    expect(node('use.js').trim()).toBe('-0.1561 0.079433');
  });

  it('is typed for a strict consumer', () => {
    writeFileSync(
      join(folder, 'use.ts'),
      `import { design, FilterFailure, type Design } from 'irisloom';
       const result: Design = design({ passband: { lowerHz: '1 GHz', upperHz: 1.02e9 }, order: 3, returnLossDb: 20 });
       export const quality: number | null = result.handOver.externalQ.source;
       export const failure = new FilterFailure('E_X', 'text');
       // @ts-expect-error an order is a number
       design({ passband: { lowerHz: 1, upperHz: 2 }, order: '3', returnLossDb: 20 });`,
    );
    const options = [
      '--noEmit',
      '--strict',
      '--skipLibCheck',
      '--module',
      'nodenext',
      '--moduleResolution',
      'nodenext',
      '--target',
      'es2022',
    ];
    const compiler = join(ROOT, 'node_modules/typescript/bin/tsc');
    const compiled = spawnSync(process.execPath, [compiler, ...options, 'use.ts'], { cwd: folder, encoding: 'utf8' });
    expect(compiled.stdout).toBe('');
    expect(compiled.status).toBe(0);
  });

  it('compiles the example of the README strictly', () => {
    const block = /```ts\n([\s\S]*?)```/.exec(readFileSync(join(ROOT, 'README.md'), 'utf8'))?.[1] ?? '';
    expect(block).toContain("from 'irisloom'");
    writeFileSync(join(folder, 'readme.ts'), block);
    const options = [
      '--noEmit',
      '--strict',
      '--noUncheckedIndexedAccess',
      '--skipLibCheck',
      '--module',
      'nodenext',
      '--target',
      'es2022',
    ];
    const compiler = join(ROOT, 'node_modules/typescript/bin/tsc');
    const compiled = spawnSync(process.execPath, [compiler, ...options, 'readme.ts'], {
      cwd: folder,
      encoding: 'utf8',
    });
    expect(compiled.stdout).toBe('');
  });

  it('holds what it should and nothing else', () => {
    const top = readdirSync(join(folder, 'node_modules/irisloom')).sort();
    expect(top).toEqual(['LICENSE', 'README.md', 'dist', 'package.json']);
    const files = readdirSync(join(folder, 'node_modules/irisloom/dist'), { recursive: true, encoding: 'utf8' });
    expect(files.some((file) => /test|fixture|\.tsbuildinfo$/.test(file))).toBe(false);
    expect(existsSync(join(folder, 'node_modules/irisloom/dist/design-file.schema.json'))).toBe(true);
  });

  it('has one version, an ESM root, a runner, and runs nothing on install', () => {
    expect(VERSION).toBe(manifest.version);
    expect(Object.keys(manifest.exports)).toEqual(['.']);
    expect(Object.keys(manifest.scripts).filter((name) => /install|prepare/.test(name))).toEqual([]);
    expect(node('node_modules/irisloom/dist/command-line/main.js', '--version').trim()).toBe(manifest.version);
  });

  it('names exact versions of its dependencies', () => {
    for (const version of Object.values({ ...manifest.dependencies, ...manifest.devDependencies }))
      expect(version).toMatch(/^\d+\.\d+\.\d+$/);
  });
});
