import { type JsonValue, kindFault, type Path } from '../../specification/index.js';
import type { RotationRequest } from '../../topology/index.js';
import { addFault, checkKeys, type Members, membersAt, pairAt, type Reading } from '../json-file.js';

type Pair = readonly [number, number];

const MOST_STEPS = 10_000;
const ALLOWED = 'an object with pivot and angleDegrees, or with pivot and annihilate';

function isPort(node: number, last: number): boolean {
  return node === 0 || node === last;
}

function readPivot(reading: Reading, value: JsonValue | undefined, path: Path, last: number): Pair | undefined {
  const pivot = pairAt(reading, value, path, last);
  if (pivot === undefined) return undefined;
  const [i, j] = pivot;
  const base = { code: 'E_PIVOT', path, found: `[${i}, ${j}]`, value: pivot, limit: last - 1 };
  const allowed = `two different resonators, 1 to ${last - 1}`;
  if (isPort(i, last) || isPort(j, last)) {
    addFault(reading, { ...base, allowed, advice: 'leave source and load alone: turning a port changes the response' });
    return undefined;
  }
  if (i !== j) return pivot;
  addFault(reading, { ...base, allowed, advice: 'change one of the two' });
  return undefined;
}

/** An entry shares exactly one index with the pivot, or is the pivot. */
function fits([i, j]: Pair, [k, l]: Pair): boolean {
  const common = [k, l].filter((node) => node === i || node === j).length;
  return k !== l && (common === 1 || common === 2);
}

function readElement(reading: Reading, value: JsonValue, path: Path, last: number, pivot: Pair): Pair | undefined {
  const element = pairAt(reading, value, path, last);
  if (element === undefined || fits(pivot, element)) return element;
  const found = `[${element[0]}, ${element[1]}]`;
  const allowed = `the pivot [${pivot[0]}, ${pivot[1]}] itself, or an entry that shares exactly one index with it`;
  const advice = 'choose another entry or another pivot';
  addFault(reading, { code: 'E_ELEMENT', path, found, allowed, advice, value: element, limit: pivot });
  return undefined;
}

function readAction(
  reading: Reading,
  step: Members,
  path: Path,
  last: number,
  pivot: Pair,
): RotationRequest | undefined {
  const { angleDegrees, annihilate } = step;
  if (annihilate !== undefined) {
    const element = readElement(reading, annihilate, [...path, 'annihilate'], last, pivot);
    return element === undefined ? undefined : { pivot, annihilate: element };
  }
  if (typeof angleDegrees === 'number') return { pivot, angle: (angleDegrees / 180) * Math.PI };
  const where = [...path, 'angleDegrees'];
  addFault(reading, kindFault(where, angleDegrees, 'a number of degrees', 'write a number, or "annihilate" instead'));
  return undefined;
}

function readStep(reading: Reading, value: JsonValue, path: Path, last: number): RotationRequest | undefined {
  const step = membersAt(reading, value, path, ALLOWED);
  if (step === undefined) return undefined;
  checkKeys(reading, step, path, ['pivot', 'angleDegrees', 'annihilate']);
  if (step.angleDegrees !== undefined && step.annihilate !== undefined) {
    const base = { code: 'E_CHOICE', path: [...path, 'angleDegrees'], found: 'an angle beside an entry to annihilate' };
    addFault(reading, { ...base, allowed: 'one of the two', advice: 'remove one', onKey: true });
  }
  const pivot = readPivot(reading, step.pivot, [...path, 'pivot'], last);
  return pivot === undefined ? undefined : readAction(reading, step, path, last, pivot);
}

/** Reads the steps; their nodes can be checked only where the order of the matrix is known. */
export function readSteps(
  reading: Reading,
  value: JsonValue | undefined,
  order: number | undefined,
): readonly RotationRequest[] {
  if (!Array.isArray(value)) {
    addFault(reading, kindFault(['steps'], value, 'a list of steps', 'write a list, [] for none'));
    return [];
  }
  if (value.length > MOST_STEPS) {
    const base = { code: 'E_TYPE', path: ['steps'], found: `${value.length} steps` };
    addFault(reading, { ...base, allowed: `at most ${MOST_STEPS}`, advice: 'split the sequence' });
    return [];
  }
  if (order === undefined) return [];
  const steps = value.map((step, n) => readStep(reading, step, ['steps', n], order + 1));
  return steps.filter((step) => step !== undefined);
}
