import { FilterFailure } from '../numerics/index.js';
import type { World } from './world.js';

/** Exit statuses of the program. */
export const EXIT = {
  done: 0,
  badInput: 2,
  certificate: 3,
  file: 4,
  bug: 70,
  interrupted: 130,
} as const;

const FILE_CODES: readonly string[] = [
  'E_FILE_MISSING',
  'E_FILE_SIZE',
  'E_NOT_A_FILE',
  'E_OUTPUT_EXISTS',
  'E_OUTPUT_SAME',
  'E_IO',
];

/** A result that could not be proven, or not be reached: good input, no answer. */
const UNPROVEN_CODES: readonly string[] = ['E_CERT', 'E_ILL_CONDITIONED', 'E_NO_CONVERGENCE'];

/** Thrown where the user's interrupt is noticed; what was begun has been taken away by then. */
export class Interrupted extends Error {
  override readonly name = 'Interrupted';
}

/** Exit status of a refusal. */
function exitStatusOf({ code }: FilterFailure): number {
  if (UNPROVEN_CODES.includes(code)) return EXIT.certificate;
  return FILE_CODES.includes(code) ? EXIT.file : EXIT.badInput;
}

/** A bug of ours: said plainly, with the way to report it; the trace only where it was asked for. */
function reportBug(error: unknown, { stderr, environment }: World): void {
  const what = error instanceof Error ? `${error.name}: ${error.message}` : String(error);
  const isDebug = environment.IRISLOOM_DEBUG === '1';
  stderr.write(
    `Sorry, this is a fault of irisloom and not of your input. Nothing was written.\n${what.slice(0, 400)}\n`,
  );
  stderr.write('Please report it to the maintainers with the input file and the output of irisloom --version.\n');
  if (isDebug && error instanceof Error) stderr.write(`${error.stack ?? ''}\n`);
  else stderr.write('With IRISLOOM_DEBUG=1 in the environment the trace is printed too.\n');
}

/** Tells what went wrong on standard error; gives the exit status. */
export function reportFailure(error: unknown, world: World): number {
  if (error instanceof Interrupted) return EXIT.interrupted;
  if (error instanceof FilterFailure) {
    world.stderr.write(`${error.message}\n`);
    return exitStatusOf(error);
  }
  reportBug(error, world);
  return EXIT.bug;
}
