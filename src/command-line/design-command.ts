import { createHash } from 'node:crypto';
import { resolve } from 'node:path';
import { designChecked } from '../design.js';
import {
  documentParts,
  handOverCsv,
  matrixCsv,
  reportFileNames,
  reportFiles,
  responseText,
  resultJson,
  summaryText,
} from '../report/index.js';
import { decodeUtf8, parseSpecification } from '../specification/index.js';
import type { CommandShape, CommandWords } from './arguments.js';
import { EXIT, Interrupted } from './failures.js';
import { folderBeside, type OutputFolder, RESULT_NAME, settleFolder } from './files/output-folder.js';
import { type InputFile, readInput } from './files/read-input.js';
import { ioFailure, shownPath } from './files/trouble.js';
import { type OutputFile, replaceFiles, writeNewFolder } from './files/write-folder.js';
import { type Progress, progressOf } from './progress.js';
import type { World } from './world.js';

/** Names of the files with numbers; the last tells that all others are there. */
const NUMBER_NAMES = ['matrix.csv', 'hand-over.csv', 'response.s2p', RESULT_NAME] as const;

const WIDTH = 80;

/** What `irisloom design` accepts. */
export const DESIGN_SHAPE: CommandShape = {
  operands: ['design file'],
  options: { out: { takesValue: true }, overwrite: { takesValue: false } },
};

/** Everything a design file leads to, before any of it is written. */
interface Results {
  readonly summary: string;
  /** In the order in which they are told. */
  readonly names: readonly string[];
  readonly outputs: (toDesign: string) => readonly OutputFile[];
}

function resultsOf({ bytes }: InputFile, world: World, progress: Progress): Results {
  const specification = parseSpecification(decodeUtf8(bytes));
  const design = designChecked(specification);
  progress.step('Predicting the response');
  const response = responseText(design);
  progress.step('Drawing the pictures');
  const parts = documentParts(design);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  return {
    summary: summaryText(design, world.paint),
    names: [...reportFileNames(parts), ...NUMBER_NAMES],
    outputs: (toDesign) => {
      const source = { file: toDesign, sha256 };
      return [
        ...reportFiles(design, source, parts),
        { name: 'matrix.csv', text: matrixCsv(design.matrix) },
        { name: 'hand-over.csv', text: handOverCsv(design) },
        { name: 'response.s2p', text: response },
        { name: RESULT_NAME, text: resultJson(design, source) },
      ];
    },
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

/** Names in lines that fit a terminal. */
function namesText(names: readonly string[]): string {
  const lines: string[] = [];
  for (const name of names) {
    const longer = lines.length === 0 ? '' : `${lines.at(-1)}, ${name}`;
    if (longer !== '' && longer.length < WIDTH) lines[lines.length - 1] = longer;
    else lines.push(`  ${name}`);
  }
  return lines.map((line, n) => `${line}${n === lines.length - 1 ? '' : ','}\n`).join('');
}

async function writeResults(results: Results, input: InputFile, words: CommandWords, world: World): Promise<string> {
  const wanted = words.values.get('out') ?? folderBeside(words.operands[0] ?? '');
  try {
    const absolute = resolve(world.folder, wanted);
    const mayOverwrite = words.flags.has('overwrite');
    const request = { input: input.path, wanted, absolute, names: results.names, mayOverwrite };
    const place = await settleFolder(world.files, request);
    await write(world, place, results.outputs(place.toDesign));
    return wanted;
  } catch (error) {
    throw ioFailure(error, wanted, 'writing the results');
  }
}

/** `irisloom design`: from a design file to a folder of results and a summary. */
export async function designCommand(words: CommandWords, world: World): Promise<number> {
  const input = await readInput(world.files, world.folder, words.operands[0] ?? '');
  const progress = progressOf(world);
  try {
    const results = resultsOf(input, world, progress);
    progress.step('Writing the results');
    const folder = await writeResults(results, input, words, world);
    progress.end();
    world.stdout.write(`${results.summary}\nWritten to ${shownPath(folder)}:\n${namesText(results.names)}`);
  } finally {
    // What was told must be gone before a refusal is told.
    progress.end();
  }
  return EXIT.done;
}
