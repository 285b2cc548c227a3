import { nearestKey } from '../specification/index.js';
import { VERSION } from '../version.js';
import { ANALYZE_SHAPE, analyzeCommand } from './analyze/analyze-command.js';
import { type CommandShape, type CommandWords, readWords, shownWord, usageFailure } from './arguments.js';
import { DESIGN_SHAPE, designCommand } from './design-command.js';
import { EXIT, reportFailure } from './failures.js';
import { COMMAND_HELP, COMMANDS, type CommandName, PROGRAM_HELP } from './help.js';
import { ROTATE_SHAPE, rotateCommand } from './rotate/rotate-command.js';
import { SCHEMA_SHAPE, schemaCommand } from './schema-command.js';
import type { World } from './world.js';

interface Command {
  readonly shape: CommandShape;
  readonly run: (words: CommandWords, world: World) => Promise<number>;
}

const BY_NAME: Readonly<Record<CommandName, Command>> = {
  design: { shape: DESIGN_SHAPE, run: designCommand },
  analyze: { shape: ANALYZE_SHAPE, run: analyzeCommand },
  rotate: { shape: ROTATE_SHAPE, run: rotateCommand },
  schema: { shape: SCHEMA_SHAPE, run: schemaCommand },
};

const PROGRAM_OPTIONS = ['help', 'version'];

function isCommand(word: string): word is CommandName {
  return COMMANDS.some((name) => name === word);
}

function refuseFirstWord(word: string): never {
  if (word.startsWith('-')) {
    const nearest = nearestKey(word.replace(/^-+/, ''), PROGRAM_OPTIONS);
    const hint = nearest === undefined ? 'see irisloom --help' : `did you mean --${nearest}?`;
    throw usageFailure('E_OPTION', `the option ${shownWord(word)}`, 'a command, --help or --version', hint);
  }
  const nearest = nearestKey(word, COMMANDS);
  const forFile = word.endsWith('.json') ? 'did you mean irisloom design with this file?' : 'see irisloom --help';
  const hint = nearest === undefined ? forFile : `did you mean ${nearest}?`;
  throw usageFailure('E_COMMAND', `the command ${shownWord(word)}`, COMMANDS.join(', '), hint);
}

async function dispatch([first, ...rest]: readonly string[], world: World): Promise<number> {
  if (first === undefined) {
    world.stderr.write(PROGRAM_HELP);
    return EXIT.badInput;
  }
  if (first === '--help' || first === '-h' || first === '--version') {
    world.stdout.write(first === '--version' ? `${VERSION}\n` : PROGRAM_HELP);
    return EXIT.done;
  }
  if (!isCommand(first)) refuseFirstWord(first);
  const { shape, run: runCommand } = BY_NAME[first];
  const words = readWords(rest, shape);
  if (!words.flags.has('help')) return runCommand(words, world);
  world.stdout.write(COMMAND_HELP[first]);
  return EXIT.done;
}

/**
 * The program: reads its arguments, does one thing, and gives the exit status. Results go to `stdout`, refusals and
 * progress to `stderr`; on a refusal nothing goes to `stdout` and nothing is written.
 */
export async function run(args: readonly string[], world: World): Promise<number> {
  try {
    return await dispatch(args, world);
  } catch (error) {
    return reportFailure(error, world);
  }
}
