import { edgesOfBand } from '../../../forms/index.js';
import type { Specification } from '../../../specification/index.js';
import type { DesignReport } from '../../design-report.js';
import type { DesignSource } from '../../files/result-json.js';
import { MODEL_ONLY, wideCautions } from '../../words/conventions.js';
import { frequencyText, unitOf } from '../../words/numbers.js';
import { familyText, levelText, qualityText, UNNAMED } from '../../words/title.js';
import type { Cell } from './content.js';
import { userText } from './user-text.js';

/** Digits of the digest that are enough to tell two design files apart on paper. */
const DIGEST = 12;

/** What stands above the name. */
export const KICKER = 'Band-pass filter design sheet';

const NOT_STATED = 'not stated';

/** The people who sign, each with the date. */
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

/** Where half-power edges lie, for a reader who knows the edges of an equal ripple. */
const HALF_POWER = ', half-power edges (about 3 dB down, plus loss)';

/** Band and what its edges are, order, zeros, family and topology; a hyphen between two numbers is a span. */
export function titleFacts(specification: Specification): readonly string[] {
  const { band, order, family, returnLossDb, transmissionZeros, topology } = specification;
  const unit = unitOf(band);
  const { lowerHz, upperHz } = edgesOfBand(band);
  const zeros = transmissionZeros.length;
  const edges = returnLossDb === undefined ? HALF_POWER : `, ${levelText(specification)}`;
  return [
    `${frequencyText(lowerHz, unit)}-${frequencyText(upperHz, unit)} ${unit.name}${edges}`,
    many(order, 'resonator'),
    zeros === 0 ? 'no finite transmission zeros' : many(zeros, 'transmission zero'),
    familyText(family),
    topology,
  ];
}

/** Revision, date, digest of the input and version; a sheet to sign says where the first two are missing. */
export function titleCells({ specification, version }: DesignReport, source?: DesignSource): readonly TitleCell[] {
  const { revision, date } = specification;
  return [
    { head: 'Revision', value: revision === undefined || revision === '' ? NOT_STATED : userText(revision) },
    { head: 'Date', value: date ?? NOT_STATED },
    ...(source === undefined ? [] : [{ head: 'Input digest', value: source.sha256.slice(0, DIGEST) }]),
    { head: 'Made with', value: `irisloom ${version}` },
  ];
}

function lossText({ unloadedQ }: Specification): string {
  const isOne = typeof unloadedQ === 'number' || new Set(unloadedQ).size === 1;
  const loss =
    unloadedQ === undefined
      ? 'Computed without loss, since no unloaded Q was given'
      : `Computed with loss, ${qualityText(unloadedQ)}${isOne ? ' in every resonator' : ', given for each resonator'}`;
  return `${loss}.`;
}

/** Under what conditions the verdict holds, a sentence or two each. */
export function conditions(specification: Specification): readonly string[] {
  return [lossText(specification), ...wideCautions(specification.band), MODEL_ONLY];
}
