import { createHash } from 'node:crypto';
import { resolve } from 'node:path';
import { designChecked } from '../design.js';
import { handOverCsv, matrixCsv, responseText, resultJson, summaryText } from '../report/index.js';
import { decodeUtf8, parseSpecification } from '../specification/index.js';
import type { CommandShape, CommandWords } from './arguments.js';
import { EXIT, Interrupted } from './failures.js';
import { folderBeside, type OutputFolder, RESULT_NAME, settleFolder } from './files/output-folder.js';
import { type InputFile, readInput } from './files/read-input.js';
import { ioFailure, shownPath } from './files/trouble.js';
import { type OutputFile, replaceFiles, writeNewFolder } from './files/write-folder.js';
import { progressOf } from './progress.js';
import type { World } from './world.js';

const NAMES = ['matrix.csv', 'hand-over.csv', 'response.s2p', RESULT_NAME] as const;

/** What `irisloom design` accepts. */
export const DESIGN_SHAPE: CommandShape = {
  operands: ['design file'],
  options: { out: { takesValue: true }, overwrite: { takesValue: false } },
};

/** Everything a design file leads to, before any of it is written. */
interface Results {
  readonly summary: string;
  readonly outputs: (toDesign: string) => readonly OutputFile[];
}

function resultsOf({ bytes }: InputFile, world: World): Results {
  const progress = progressOf(world);
  const specification = parseSpecification(decodeUtf8(bytes));
  const design = designChecked(specification);
  progress.step('Predicting the response');
  const response = responseText(design);
  progress.end();
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  return {
    summary: summaryText(design, world.paint),
    outputs: (toDesign) => [
      { name: 'matrix.csv', text: matrixCsv(design.matrix) },
      { name: 'hand-over.csv', text: handOverCsv(design) },
      { name: 'response.s2p', text: response },
      { name: RESULT_NAME, text: resultJson(design, { file: toDesign, sha256 }) },
    ],
  };
}

/** Writes all or nothing; the user's interrupt is heeded until the last step begins. */
async function write(world: World, place: OutputFolder, outputs: readonly OutputFile[]): Promise<void> {
  let isInterrupted = false;
  const stop = world.onInterrupt(() => {
    isInterrupted = true;
  });
  const checkInterrupt = (): void => {
    if (isInterrupted) throw new Interrupted('interrupted');
  };
  const writing = { files: world.files, process: world.process, checkInterrupt };
  try {
    await (place.exists ? replaceFiles : writeNewFolder)(writing, place.path, outputs);
  } finally {
    stop();
  }
}

/** `irisloom design`: from a design file to a folder of results and a summary. */
export async function designCommand(words: CommandWords, world: World): Promise<number> {
  const [path = ''] = words.operands;
  const input = await readInput(world.files, world.folder, path);
  const results = resultsOf(input, world);
  const wanted = words.values.get('out') ?? folderBeside(path);
  try {
    const absolute = resolve(world.folder, wanted);
    const mayOverwrite = words.flags.has('overwrite');
    const request = { input: input.path, wanted, absolute, names: NAMES, mayOverwrite };
    const place = await settleFolder(world.files, request);
    await write(world, place, results.outputs(place.toDesign));
  } catch (error) {
    throw ioFailure(error, wanted, 'writing the results');
  }
  const names = NAMES.map((name) => `  ${name}`).join('\n');
  world.stdout.write(`${results.summary}\nWritten to ${shownPath(wanted)}:\n${names}\n`);
  return EXIT.done;
}
