#!/usr/bin/env node
import * as files from 'node:fs/promises';
import pc from 'picocolors';
import { PLAIN } from '../report/index.js';
import { EXIT } from './failures.js';
import { run } from './run.js';
import type { TextSink } from './world.js';

function sink(stream: NodeJS.WriteStream): TextSink {
  stream.on('error', ({ code }: NodeJS.ErrnoException) => {
    // A reader that has seen enough closes the pipe: not our trouble. A full disk is trouble with a file.
    if (code === 'EPIPE') return;
    process.stderr.write(
      `E_IO standard output: found the system error ${code}; allowed a place that takes text; free some space\n`,
    );
    process.exit(EXIT.file);
  });
  return { write: (text) => stream.write(text), isTerminal: stream.isTTY === true };
}

function isAlive(id: number): boolean {
  try {
    process.kill(id, 0);
    return true;
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
}

const { env } = process;
const stdout = sink(process.stdout);
const hasColor = stdout.isTerminal && !env.NO_COLOR && env.TERM !== 'dumb';
const color = pc.createColors(true);

process.exitCode = await run(process.argv.slice(2), {
  stdout,
  stderr: sink(process.stderr),
  files,
  folder: process.cwd(),
  environment: env,
  paint: hasColor ? { strong: color.bold, dim: color.dim, alarm: (text) => color.bold(color.red(text)) } : PLAIN,
  process: { id: process.pid, isAlive },
  now: () => performance.now(),
  onInterrupt: (callback) => {
    process.on('SIGINT', callback);
    return () => process.off('SIGINT', callback);
  },
});
