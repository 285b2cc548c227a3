import { readdirSync, readFileSync } from 'node:fs';
import { relative, resolve } from 'node:path';
import ts from 'typescript';
import { describe, expect, it } from 'vitest';
import * as irisloom from '../../src/index.js';
import * as specification from '../../src/specification/index.js';

const ROOT = resolve(import.meta.dirname, '../..');
const NAMES = { ...specification, ...irisloom };

interface Example {
  readonly where: string;
  readonly code: string;
}

/** TypeScript blocks of a Markdown file. */
function markdownExamples(file: string): Example[] {
  const text = readFileSync(resolve(ROOT, file), 'utf8');
  return [...text.matchAll(/```ts\n([\s\S]*?)```/g)].map((match, n) => ({
    where: `${file} block ${n + 1}`,
    code: match[1] ?? '',
  }));
}

/** The @example of every doc comment in src, up to the next tag. */
function commentExamples(): Example[] {
  const src = resolve(ROOT, 'src');
  const files = readdirSync(src, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.ts'));
  return files.flatMap((name) => {
    const text = readFileSync(resolve(src, name), 'utf8');
    return [...text.matchAll(/\/\*\*[\s\S]*?\*\//g)].flatMap((comment) => {
      const lines = comment[0]
        .replace(/\*\/$/, '')
        .split('\n')
        .map((line) => line.replace(/^\s*\* ?/, ''));
      const start = lines.findIndex((line) => line.startsWith('@example'));
      if (start < 0) return [];
      const rest = lines.slice(start + 1);
      const end = rest.findIndex((line) => line.startsWith('@'));
      return [{ where: relative(ROOT, resolve(src, name)), code: rest.slice(0, end < 0 ? undefined : end).join('\n') }];
    });
  });
}

/** Turns `expression; // value` into a check of that value; prose after `//` that is no literal is left alone. */
function withChecks(code: string): string {
  return code
    .replace(/^import .*$/gm, '')
    .split('\n')
    .map((line) => {
      const match = /^(?!\s*(?:const|let|try|if|for|\}|\/\/))\s*(.+?);\s*\/\/ (.+)$/.exec(line);
      if (match === null) return line.replace(/^\s*console\.log\((.+)\);\s*\/\/ (.+)$/, '__check(() => $1, $2);');
      const [, expression = '', comment = ''] = match;
      return `__check(() => (${expression.replace(/^console\.log\((.+)\)$/, '$1')}), ${JSON.stringify(comment)});`;
    })
    .join('\n');
}

function check(value: () => unknown, comment: string): void {
  const actual = value();
  const about = /^(-?[\d.e+-]+) within rounding/.exec(comment);
  if (about !== null) {
    expect(Math.abs((actual as number) - Number(about[1]))).toBeLessThan(1e-12);
    return;
  }
  let expected: unknown;
  try {
    expected = new Function(`return (${comment});`)();
  } catch {
    // A bare word such as E_ORDER_RANGE stands for its text; anything else is prose.
    if (/^[A-Z_]+$/.test(comment)) expected = comment;
    else return;
  }
  if (typeof expected === 'object' && expected !== null) expect(actual).toEqual(expected);
  else expect(actual).toBe(expected);
}

function run({ code }: Example): void {
  const javascript = ts.transpile(withChecks(code), { target: ts.ScriptTarget.ES2022, module: ts.ModuleKind.ESNext });
  const log = { log: (): void => undefined };
  const names = Object.keys(NAMES);
  const body = new Function(...names, 'console', '__check', `'use strict';\n${javascript}`);
  body(...names.map((name) => NAMES[name as keyof typeof NAMES]), log, check);
}

describe('examples', () => {
  const examples = [...commentExamples(), ...markdownExamples('README.md'), ...markdownExamples('DEVELOPERS.md')];

  it.each(examples.map((example, n) => [`${n + 1} ${example.where}`, example] as const))(
    '%s runs and prints what it says',
    (_, example) => {
      run(example);
    },
  );

  it('cover every public function', () => {
    const code = examples.map((example) => example.code).join('\n');
    const functions = Object.entries(irisloom)
      .filter(([name, value]) => typeof value === 'function' && /^[a-z]/.test(name))
      .map(([name]) => name);
    expect(functions.filter((name) => !code.includes(`${name}(`))).toEqual([]);
  });

  it('are checked: a wrong value fails', () => {
    expect(() => run({ where: 'here', code: 'butterworth({ order: 2 }).order; // 3' })).toThrow();
  });
});
