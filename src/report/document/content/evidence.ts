import type { Certificate } from '../../../forms/index.js';
import type { DesignReport } from '../../design-report.js';
import { CONVENTIONS, POWER, wideCautions } from '../../words/conventions.js';
import { sizeText } from '../../words/numbers.js';
import { qualityText } from '../../words/title.js';
import { type Block, numberColumn, type Row, type Table, textColumn } from './content.js';
import { userLines } from './user-text.js';

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
    note: 'Each was computed from the numbers handed over, by code that shares no computation with the code that made them.',
  };
}

/** Formulas that the hand-over numbers follow, beside those that every export states. */
const FORMULAS: readonly string[] = [
  'f0 = sqrt(f1*f2), B = f2 - f1; loss turns w into w - j*f0/(B*Qu)',
  'k = M_ij*B/f0; coupling bandwidth M_ij*B; Qe = f0/(B*M_S1^2); reflected delay 2*Qe/(pi*f0)',
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
      'Left out: tolerances of parts, temperature, aging, assembly, measurement, spurious modes and port lengths.',
      ...wideCautions(band),
    ],
  };
}

/** What no number of the document is. */
export function powerBlock(): Block {
  return {
    kind: 'text',
    head: 'Power',
    sentences: [`No number here is a safety clearance. ${POWER}`],
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
