import { readdirSync, readFileSync } from 'node:fs';
import { dirname, relative, resolve } from 'node:path';
import ts from 'typescript';
import { describe, expect, it } from 'vitest';

const SRC = resolve(import.meta.dirname, '../../src');

/** Rooms in the order of the flow: a room may import rooms to its left, by their index. */
const ORDER = [
  'numerics',
  'forms',
  'specification',
  'approximation',
  'synthesis',
  'topology',
  'response',
  'bandpass',
  'certification',
  'measurement',
  'proposal',
  'report',
  'command-line',
];

/** Which packages a room may import. */
const PACKAGES: Record<string, readonly string[]> = {
  numerics: ['ml-matrix', 'complex.js'],
  specification: ['zod/mini'],
  report: ['d3-scale', 'd3-shape'],
  'command-line': ['picocolors'],
};

/** Words of the edge that no core file may hold. */
const EDGE_WORDS = [
  /\bMath\.random\b/,
  /\bDate\b\s*[.(]/,
  /\bconsole\./,
  /\bprocess\./,
  /\bsetTimeout\b/,
  /\bfetch\(/,
  /\beval\(/,
  /\bIntl\./,
  /\.toLocale/,
];

interface Import {
  readonly file: string;
  readonly target: string;
}

function filesUnder(folder: string): string[] {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith('.ts'))
    .map((name) => resolve(folder, name));
}

const roomOf = (file: string): string => {
  const [first = '', ...rest] = relative(SRC, file).split('/');
  return rest.length === 0 ? 'root' : first;
};

function faultsOf(file: string, text: string): string[] {
  const room = roomOf(file);
  const here = relative(SRC, file);
  const faults: string[] = [];
  const imports: Import[] = ts
    .preProcessFile(text, true, true)
    .importedFiles.map(({ fileName }) => ({ file: here, target: fileName }));
  for (const { target } of imports) {
    if (target.startsWith('node:')) {
      if (room !== 'command-line') faults.push(`${here}: ${target} outside the edge`);
    } else if (!target.startsWith('.')) {
      if (!(PACKAGES[room] ?? []).includes(target))
        faults.push(`${here}: package ${target} is not on the list of ${room}`);
    } else {
      const full = resolve(dirname(file), target);
      const other = roomOf(full);
      if (other === room) continue;
      if (room === 'root') {
        if (other === 'command-line') faults.push(`${here}: the core imports the runner`);
        else if (relative(SRC, full).split('/')[1] !== 'index.js')
          faults.push(`${here}: reaches past the index of ${other}`);
        continue;
      }
      if (other === 'root') {
        if (room !== 'command-line' && room !== 'report') faults.push(`${here}: a room imports the root`);
        continue;
      }
      if (ORDER.indexOf(other) > ORDER.indexOf(room)) faults.push(`${here}: imports ${other}, which is to its right`);
      if (relative(SRC, full).split('/').slice(1).join('/') !== 'index.js')
        faults.push(`${here}: reaches past the index of ${other}`);
    }
  }
  if (room !== 'command-line') {
    const code = text.replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, '');
    for (const word of EDGE_WORDS) if (word.test(code)) faults.push(`${here}: ${word} in the core`);
  }
  return faults;
}

/** What code that certifies may import from other rooms, beside types: nothing that could share a fault with the synthesis. */
const CERTIFICATION_VALUES = ['FilterFailure'];

/** Values (not types) that a file of the certification room takes from other rooms. */
function sharedValues(file: string, text: string): string[] {
  const found: string[] = [];
  const source = ts.createSourceFile(file, text, ts.ScriptTarget.ES2022);
  source.forEachChild((node) => {
    if (!ts.isImportDeclaration(node) || !ts.isStringLiteral(node.moduleSpecifier)) return;
    if (node.importClause?.isTypeOnly || !node.moduleSpecifier.text.startsWith('../')) return;
    const names = node.importClause?.namedBindings;
    if (names === undefined || !ts.isNamedImports(names)) found.push(`${file}: ${node.moduleSpecifier.text}`);
    else found.push(...names.elements.filter((each) => !each.isTypeOnly).map((each) => each.name.text));
  });
  return found.filter((name) => !CERTIFICATION_VALUES.includes(name));
}

describe('rooms', () => {
  const files = filesUnder(SRC);

  it('flow one way, by their indexes, with their own packages, and no edge in the core', () => {
    expect(files.length).toBeGreaterThan(80);
    expect(files.flatMap((file) => faultsOf(file, readFileSync(file, 'utf8')))).toEqual([]);
  });

  it('let certification share no code with what it certifies', () => {
    const room = files.filter((file) => roomOf(file) === 'certification');
    expect(room.length).toBeGreaterThan(15);
    expect(room.flatMap((file) => sharedValues(file, readFileSync(file, 'utf8')))).toEqual([]);
    expect(sharedValues('x.ts', "import { type Complex, multiply } from '../numerics/index.js';")).toEqual([
      'multiply',
    ]);
  });

  it('are all on the list', () => {
    expect([...new Set(files.map(roomOf))].filter((room) => room !== 'root').sort()).toEqual([...ORDER].sort());
  });

  it('have an index that is a comment of fixed shape and named re-exports only', () => {
    for (const room of ORDER.filter((name) => name !== 'command-line')) {
      const text = readFileSync(resolve(SRC, room, 'index.ts'), 'utf8');
      for (const word of ['Takes', 'Gives', 'Refuses', 'Source']) expect(text, `${room}/index.ts`).toContain(word);
      const code = text.replace(/\/\*[\s\S]*?\*\//g, '').trim();
      expect(code.replace(/export (type )?\{[^}]*\} from '[^']+';/g, '').trim(), `${room}/index.ts`).toBe('');
    }
  });

  it.each([
    ['an import to the right', 'numerics/x.ts', "import { sweep } from '../response/index.js';"],
    ['an import past an index', 'response/x.ts', "import { turn } from '../topology/rotate.js';"],
    ['Node in the core', 'topology/x.ts', "import { readFileSync } from 'node:fs';"],
    ['a package of another room', 'topology/x.ts', "import { Matrix } from 'ml-matrix';"],
    ['chance in the core', 'topology/x.ts', 'const x = Math.random();'],
    ['a clock in the core', 'topology/x.ts', 'const x = Date.now();'],
  ])('report %s', (_, file, text) => {
    expect(faultsOf(resolve(SRC, file), text)).toHaveLength(1);
  });
});

describe('files', () => {
  it('have at most 200 lines', () => {
    const long = filesUnder(SRC).filter((file) => readFileSync(file, 'utf8').split('\n').length > 201);
    expect(long.map((file) => relative(SRC, file))).toEqual([]);
  });
});
