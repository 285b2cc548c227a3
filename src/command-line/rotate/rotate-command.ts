import { jsonText, rotationText, type TraceReport } from '../../report/index.js';
import { traceRotations } from '../../topology/index.js';
import type { CommandShape, CommandWords } from '../arguments.js';
import { EXIT } from '../failures.js';
import { readInput } from '../files/read-input.js';
import type { World } from '../world.js';
import { type RotationFile, readRotationFile } from './rotation-file.js';

/** What `irisloom rotate` accepts. */
export const ROTATE_SHAPE: CommandShape = { operands: ['rotation file'], options: { json: { takesValue: false } } };

function reportOf({ name, matrix, steps, pattern }: RotationFile): TraceReport {
  const trace = traceRotations(matrix, steps, pattern);
  return {
    ...(name === undefined ? {} : { name }),
    steps: trace.steps.map(({ rotation, annihilated, offPattern, drift }) => ({
      pivot: rotation.pivot,
      angleDegrees: (rotation.angle / Math.PI) * 180,
      ...(annihilated === undefined ? {} : { annihilated }),
      ...(offPattern === undefined ? {} : { offPattern }),
      drift,
    })),
    matrix: trace.matrix,
  };
}

/** `irisloom rotate`: replays a sequence of rotations and prints what each step did. */
export async function rotateCommand(words: CommandWords, world: World): Promise<number> {
  const { bytes } = await readInput(world.files, world.folder, words.operands[0] ?? '');
  const report = reportOf(readRotationFile(bytes));
  const isJson = words.flags.has('json');
  world.stdout.write(isJson ? `${jsonText(report)}\n` : rotationText(report, world.paint));
  return EXIT.done;
}
