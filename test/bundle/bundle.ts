import { readdirSync } from 'node:fs';
import { basename, relative, resolve } from 'node:path';
import { gzipSync } from 'node:zlib';
import { build } from 'vite';

const ROOT = resolve(import.meta.dirname, '../..');

/** Entries of test/bundle/entries: each imports from the package by its name. */
export const ENTRIES: readonly string[] = readdirSync(resolve(import.meta.dirname, 'entries'))
  .map((file) => basename(file, '.js'))
  .sort();

/** What a user's bundler makes of an entry. */
export interface Bundle {
  readonly name: string;
  readonly code: string;
  readonly bytes: number;
  readonly gzippedBytes: number;
  /** Bytes before minification by place: a package, or a room of dist. Nothing that tree-shaking took out is here. */
  readonly contents: Readonly<Record<string, number>>;
}

function placeOf(id: string): string {
  const path = relative(ROOT, id);
  if (id.startsWith('\0') || path.startsWith('..')) return 'bundler';
  const [top = '', second = ''] = path.split('/');
  return top === 'node_modules' ? second : `${top}/${second}`;
}

function contentsOf(modules: Readonly<Record<string, { readonly renderedLength: number }>>): Record<string, number> {
  const contents: Record<string, number> = {};
  for (const [id, { renderedLength }] of Object.entries(modules)) {
    if (renderedLength > 0) contents[placeOf(id)] = (contents[placeOf(id)] ?? 0) + renderedLength;
  }
  return contents;
}

/**
 * Bundles an entry for browsers from the built package, through its exports map: one ES module, tree-shaken and minified.
 * An application build that keeps the exports: vite's library mode would leave the white space in.
 */
export async function bundle(name: string): Promise<Bundle> {
  const result = await build({
    root: ROOT,
    configFile: false,
    logLevel: 'error',
    build: {
      write: false,
      minify: true,
      target: 'es2022',
      rolldownOptions: {
        input: resolve(import.meta.dirname, `entries/${name}.js`),
        preserveEntrySignatures: 'strict',
      },
    },
  });
  const outputs = [result].flat().flatMap((each) => ('output' in each ? each.output : []));
  const [chunk] = outputs;
  if (outputs.length !== 1 || chunk?.type !== 'chunk') throw new Error(`${name}: more than one file`);
  const { code, modules } = chunk;
  const [bytes, gzippedBytes] = [Buffer.byteLength(code), gzipSync(code, { level: 9 }).length];
  return { name, code, bytes, gzippedBytes, contents: contentsOf(modules) };
}
