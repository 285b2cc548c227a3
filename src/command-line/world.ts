import type { Paint } from '../report/index.js';
import type { FileCalls } from './files/file-calls.js';

/** Where text goes: standard output, standard error, or a test's list. */
export interface TextSink {
  readonly write: (text: string) => void;
  readonly isTerminal: boolean;
}

/** Everything outside the program that it touches. */
export interface World {
  readonly stdout: TextSink;
  readonly stderr: TextSink;
  readonly files: FileCalls;
  /** Folder that relative paths start from. */
  readonly folder: string;
  readonly environment: Readonly<Record<string, string | undefined>>;
  /** Emphasis for standard output. */
  readonly paint: Paint;
  readonly process: ProcessFacts;
  /** Milliseconds since any fixed moment. */
  readonly now: () => number;
  /** Calls back when the user interrupts, instead of ending the program; gives the function that stops that. */
  readonly onInterrupt: (callback: () => void) => () => void;
}

/** What names of temporary files are made from, so that no run takes away those of another that is still at work. */
export interface ProcessFacts {
  readonly id: number;
  readonly isAlive: (id: number) => boolean;
}
