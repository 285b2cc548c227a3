import { approximate, zerosAskedFor } from '../../approximation/index.js';
import { denormalize, evaluateMask, type LossyBand } from '../../bandpass/index.js';
import { certify, certifyMatrix } from '../../certification/index.js';
import { type Certificate, edgesOfBand, omegaFromHz } from '../../forms/index.js';
import { type Analysis, analysisText, jsonText } from '../../report/index.js';
import type { CommandShape, CommandWords } from '../arguments.js';
import { EXIT } from '../failures.js';
import { readInput } from '../files/read-input.js';
import type { World } from '../world.js';
import { dipsOf } from './dips.js';
import { type MatrixFile, readMatrixFile } from './matrix-file.js';

/** What `irisloom analyze` accepts. */
export const ANALYZE_SHAPE: CommandShape = { operands: ['matrix file'], options: { json: { takesValue: false } } };

/** Stands for the passband where none is known: any band shows the same response over omega. */
const UNIT_BAND: LossyBand = { centerHz: 1e9, bandwidthHz: 1e9 };

function certificatesOf({ matrix, specification, isStated, hasForm }: MatrixFile): readonly Certificate[] {
  if (!isStated) return certifyMatrix(matrix);
  const structure = hasForm ? { structure: specification.topology } : {};
  const asked = zerosAskedFor(specification);
  const askedZeros = asked === undefined ? {} : { askedZeros: asked };
  return certify(approximate(specification), matrix, { ...structure, ...askedZeros });
}

function factsOf(file: MatrixFile, band: LossyBand): Pick<Analysis, 'worstReturnLoss' | 'centerLossDb' | 'dips'> {
  const { lowerHz, upperHz } = edgesOfBand(band);
  const { centerHz } = band;
  const [worst] = evaluateMask(file.matrix, band, [{ fromHz: lowerHz, toHz: upperHz, returnLossDb: 0 }]);
  const [center] = evaluateMask(file.matrix, band, [{ fromHz: centerHz, toHz: centerHz, insertionLossDb: 0 }]);
  return {
    worstReturnLoss: { db: worst?.predicted ?? 0, omega: omegaFromHz(band, worst?.worstHz ?? centerHz) },
    centerLossDb: center?.predicted ?? 0,
    dips: dipsOf(file.matrix),
  };
}

/** Everything that can be told about a matrix file. */
function analysisOf(file: MatrixFile): Analysis {
  const { matrix, specification, isStated, hasBand } = file;
  const { name, band, unloadedQ, mask } = specification;
  const lossy = unloadedQ === undefined ? band : { ...band, unloadedQ };
  const inHertz = {
    band,
    ...(unloadedQ === undefined ? {} : { unloadedQ }),
    handOver: denormalize(matrix, band),
    mask: evaluateMask(matrix, lossy, mask),
  };
  return {
    ...(name === undefined ? {} : { name }),
    matrix,
    isStated,
    ...factsOf(file, hasBand ? lossy : UNIT_BAND),
    ...(hasBand ? inHertz : {}),
    certificates: certificatesOf(file),
  };
}

/** `irisloom analyze`: prints what a matrix is and does; status 3 when it has not the response that its file states. */
export async function analyzeCommand(words: CommandWords, world: World): Promise<number> {
  const { bytes } = await readInput(world.files, world.folder, words.operands[0] ?? '');
  const analysis = analysisOf(readMatrixFile(bytes));
  const isJson = words.flags.has('json');
  world.stdout.write(isJson ? `${jsonText(analysis)}\n` : analysisText(analysis, world.paint));
  return analysis.certificates.every(({ holds }) => holds) ? EXIT.done : EXIT.certificate;
}
