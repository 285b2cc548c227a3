import { type ChildProcess, spawn } from 'node:child_process';
import { mkdirSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';
import { afterAll, beforeAll } from 'vitest';

const here = fileURLToPath(new URL('../..', import.meta.url));
const folder = `${here}node_modules/.irisloom-test-${process.pid}`;

/** Bundles the program from its sources, so that a test can start it as a process whatever the last build was. */
export function useProgram(): { readonly path: string } {
  beforeAll(async () => {
    mkdirSync(folder, { recursive: true });
    await build({
      root: here,
      configFile: false,
      logLevel: 'error',
      build: {
        ssr: 'src/command-line/main.ts',
        outDir: folder,
        target: 'node20',
        rolldownOptions: { output: { entryFileNames: 'main.mjs' } },
      },
    });
  }, 60_000);
  afterAll(() => rmSync(folder, { recursive: true, force: true }));
  return { path: `${folder}/main.mjs` };
}

/** How a process ended. */
export interface Ended {
  readonly code: number | null;
  readonly signal: NodeJS.Signals | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** Starts the program; `during` may act on the process. */
export function start(
  path: string,
  args: readonly string[],
  cwd: string,
  during: (child: ChildProcess) => void = () => undefined,
): Promise<Ended> {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [path, ...args], { cwd, env: { ...process.env, NO_COLOR: '1' } });
    let stdout = '';
    let stderr = '';
    child.stdout.on('data', (data) => {
      stdout += String(data);
    });
    child.stderr.on('data', (data) => {
      stderr += String(data);
    });
    child.on('close', (code, signal) => resolve({ code, signal, stdout, stderr }));
    during(child);
  });
}
