import { edgesOfBand } from '../../../forms/index.js';
import type { Specification } from '../../../specification/index.js';
import type { DesignReport } from '../../design-report.js';
import type { DesignSource } from '../../files/result-json.js';
import { frequencyText, unitOf } from '../../words/numbers.js';
import { qualityText, UNNAMED } from '../../words/title.js';
import type { Cell } from './content.js';
import { userText } from './user-text.js';

/** Digits of the digest that are enough to tell two design files apart on paper. */
const DIGEST = 12;

/** What stands above the name. */
export const KICKER = 'Band-pass filter design sheet';

/** The people who sign. */
export const SIGNATURES: readonly string[] = ['Designed', 'Checked', 'Released'];

/** A labelled value of the title strip. */
export interface TitleCell {
  readonly head: string;
  readonly value: Cell;
}

function many(count: number, what: string): string {
  return `${count} ${what}${count === 1 ? '' : 's'}`;
}

/** The name of a design. */
export function nameOf({ name }: Specification): Cell {
  return name === undefined || name === '' ? UNNAMED : userText(name);
}

/** The name for the head of a window. */
export function windowTitle(specification: Specification): string {
  const name = nameOf(specification);
  return `${typeof name === 'string' ? name : name.user}: band-pass filter design`;
}

/** Band, order, zeros and topology; a hyphen between two numbers is a span. */
export function titleFacts({ band, order, transmissionZeros, topology }: Specification): readonly string[] {
  const unit = unitOf(band);
  const { lowerHz, upperHz } = edgesOfBand(band);
  const zeros = transmissionZeros.length;
  return [
    `${frequencyText(lowerHz, unit)}-${frequencyText(upperHz, unit)} ${unit.name}`,
    many(order, 'resonator'),
    zeros === 0 ? 'no finite transmission zeros' : many(zeros, 'transmission zero'),
    topology,
  ];
}

/** Revision, date, digest of the input and version; what is not known has no cell. */
export function titleCells({ specification, version }: DesignReport, source?: DesignSource): readonly TitleCell[] {
  const { revision, date } = specification;
  return [
    ...(revision === undefined || revision === '' ? [] : [{ head: 'Revision', value: userText(revision) }]),
    ...(date === undefined ? [] : [{ head: 'Date', value: date }]),
    ...(source === undefined ? [] : [{ head: 'Input digest', value: source.sha256.slice(0, DIGEST) }]),
    { head: 'Made with', value: `irisloom ${version}` },
  ];
}

/** Under what conditions the verdict holds. */
export function conditionsText({ unloadedQ }: Specification): string {
  const isOne = typeof unloadedQ === 'number';
  const loss =
    unloadedQ === undefined
      ? 'Computed without loss, since no unloaded Q was given'
      : `Computed with loss, ${qualityText(unloadedQ)}${isOne ? ' in every resonator' : ', one for each resonator'}`;
  return `${loss}; temperature not modeled; nominal parts.`;
}
