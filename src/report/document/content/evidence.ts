import type { Certificate } from '../../../forms/index.js';
import type { DesignReport } from '../../design-report.js';
import type { DesignSource } from '../../files/result-json.js';
import { CONVENTIONS, cautionsOf } from '../../words/conventions.js';
import { sizeText, unitOf } from '../../words/numbers.js';
import { bandText, levelText, qualityText, zerosText } from '../../words/title.js';
import { counted } from '../../words/verdict.js';
import { type Block, numberColumn, type Row, type Table, textColumn } from './content.js';
import { userLines, userText } from './user-text.js';

/** The limit with the side on which a value may lie; a count that must be met exactly has none. */
function limitText({ value, limit, holds }: Certificate): string {
  if (value === limit) return sizeText(limit);
  return `${holds === value > limit ? '>=' : '<='} ${sizeText(limit)}`;
}

/** Every run-time check of the result. */
export function certificateTable(certificates: readonly Certificate[]): Table {
  const held = certificates.filter(({ holds }) => holds).length;
  return {
    id: 'certificates',
    caption: `Certificates: ${held} of ${certificates.length} hold`,
    columns: [textColumn('Check'), numberColumn('Value'), numberColumn('Limit'), textColumn('')],
    rows: certificates.map((certificate): Row => {
      const { check, value, holds } = certificate;
      const cells = [check, sizeText(value), limitText(certificate), holds ? 'holds' : 'fails'];
      return { cells, tones: holds ? [] : ['short'] };
    }),
    note: 'Each was computed from the numbers handed over, by code that shares nothing with the code that made them.',
  };
}

/** Formulas that the hand-over numbers follow, beside those that every export states. */
const FORMULAS: readonly string[] = [
  'f0 = sqrt(f1*f2), B = f2 - f1; loss turns w into w - j*f0/(B*Qu)',
  'k = M_ij*B/f0; coupling bandwidth M_ij*B; Qe = f0/(B*M_S1^2); peak delay 2*Qe/(pi*f0)',
  'resonator i at f0*(sqrt(1 + (b/2)^2) - b/2) with b = M_ii*B/f0',
  'E and F have leading coefficient 1, P one of size 1; s = j*w, band edges at w = -1 and 1',
  'decibels are positive: rejection and insertion loss -20*log10|S21|, return loss -20*log10|S11|',
];

/** Signs, units and formulas. */
export function conventionBlock(): Block {
  return { kind: 'list', head: 'Conventions', isFormula: true, items: [...CONVENTIONS, ...FORMULAS] };
}

/** What the model takes as given and what it leaves out. */
export function assumptionBlock({ specification }: DesignReport): Block {
  const { unloadedQ, band } = specification;
  const loss =
    unloadedQ === undefined
      ? 'No loss: no unloaded Q was given.'
      : `Loss: ${qualityText(unloadedQ)}, constant over the band.`;
  return {
    kind: 'list',
    head: 'What the model takes and leaves out',
    items: [
      'Lumped resonators on the exact band-pass map; couplings constant over the band; matched source and load.',
      loss,
      'The verdict is taken at the true worst point of each requirement, not on the points of a sweep.',
      'Left out: tolerances of parts, temperature, aging, assembly and measurement.',
      ...cautionsOf(band),
    ],
  };
}

/** What no number of the document is. */
export function powerBlock(): Block {
  return {
    kind: 'text',
    head: 'Power',
    sentences: [
      'No number here is a safety clearance. Multipaction, corona, heating and exposure are not computed: they belong to the applicable standards, local codes and qualified, licensed staff.',
    ],
  };
}

/** The design file, as it was understood. */
export function inputTable({ specification }: DesignReport, source?: DesignSource): Table {
  const { name, revision, date, band, family, order, returnLossDb, topology, portCouplings, unloadedQ, mask, sweep } =
    specification;
  const unit = unitOf(band);
  const optional = (head: string, line: string | undefined): readonly Row[] =>
    line === undefined || line === '' ? [] : [{ cells: [head, userText(line)] }];
  const stated = (head: string, value: string): Row => ({ cells: [head, value] });
  const hertz = (value: number): string => String(Number((value / unit.hertz).toPrecision(12)));
  return {
    id: 'inputs',
    caption: 'Inputs as understood',
    columns: [textColumn('Input'), textColumn('Value')],
    rows: [
      ...optional('Name', name),
      ...optional('Revision', revision),
      ...optional('Date', date),
      stated('Passband', bandText(band, unit)),
      stated('Family', `${family}, ${levelText(returnLossDb)}`),
      stated('Order', String(order)),
      stated('Zeros', zerosText(specification, unit)),
      stated('Topology', `${topology}, port couplings ${portCouplings}`),
      stated('Loss', qualityText(unloadedQ)),
      stated('Mask', mask.length === 0 ? 'none' : counted(mask.length)),
      ...(sweep === undefined
        ? []
        : [stated('Sweep', `${sweep.points} points, ${hertz(sweep.fromHz)} to ${hertz(sweep.toHz)} ${unit.name}`)]),
      ...optional('Design file', source?.file),
      ...(source === undefined ? [] : [stated('SHA-256', source.sha256)]),
    ],
  };
}

/** Notes of the user and remarks of the reader of the design file, where there are any. */
export function remarkBlocks({ specification: { notes, remarks } }: DesignReport): readonly Block[] {
  const lines = userLines(notes ?? '');
  const own: readonly Block[] = lines.length === 0 ? [] : [{ kind: 'text', head: 'Notes', sentences: lines }];
  const read: readonly Block[] =
    remarks.length === 0 ? [] : [{ kind: 'list', head: 'Remarks on the input', items: remarks }];
  return [...own, ...read];
}
