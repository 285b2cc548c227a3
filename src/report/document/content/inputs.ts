import { hzFromOmega, type MaskRow } from '../../../forms/index.js';
import type { Specification } from '../../../specification/index.js';
import type { DesignReport } from '../../design-report.js';
import type { DesignSource } from '../../files/result-json.js';
import { type FrequencyUnit, unitOf } from '../../words/numbers.js';
import { askedText, RELATIVE, requirementOf } from '../../words/requirement.js';
import { bandText, familyText, levelText, qualityText, zerosText } from '../../words/title.js';
import { counted } from '../../words/verdict.js';
import { numberColumn, type Row, type Table, textColumn } from './content.js';
import { requirementName } from './requirements.js';
import { userText } from './user-text.js';

const PORT_COUPLINGS: Readonly<Record<Specification['portCouplings'], string>> = {
  any: 'ports touch what the zeros need',
  noDirect: 'no direct coupling of source and load',
  single: 'source and load touch one resonator each',
};

/** A number as it was given, to twelve figures. */
function given(value: number): string {
  return String(Number(value.toPrecision(12)));
}

function lossText({ unloadedQ }: Specification): string {
  if (typeof unloadedQ !== 'object') return qualityText(unloadedQ);
  return `unloaded Q of resonators 1 to ${unloadedQ.length}: ${unloadedQ.map(given).join(', ')}`;
}

/** The design file, as it was understood. */
export function inputTable({ specification }: DesignReport, source?: DesignSource): Table {
  const { name, revision, date, band, family, order, topology, portCouplings, mask, sweep } = specification;
  const unit = unitOf(band);
  const optional = (head: string, line: string | undefined): readonly Row[] =>
    line === undefined || line === '' ? [] : [{ cells: [head, userText(line)] }];
  const stated = (head: string, value: string): Row => ({ cells: [head, value] });
  const hertz = (value: number): string => given(value / unit.hertz);
  return {
    id: 'inputs',
    caption: 'Inputs as understood',
    columns: [textColumn('Input'), textColumn('Value')],
    rows: [
      ...optional('Name', name),
      ...optional('Revision', revision),
      ...optional('Date', date),
      stated('Passband', bandText(band, unit)),
      stated('Family', `${familyText(family)}, ${levelText(specification)}`),
      stated('Order', String(order)),
      stated('Zeros', zerosText(specification, unit)),
      stated('Topology', `${topology}; ${PORT_COUPLINGS[portCouplings]}`),
      stated('Loss', lossText(specification)),
      stated('Mask', mask.length === 0 ? 'none' : counted(mask.length)),
      ...(sweep === undefined
        ? []
        : [stated('Sweep', `${sweep.points} points, ${hertz(sweep.fromHz)} to ${hertz(sweep.toHz)} ${unit.name}`)]),
      ...optional('Design file', source?.file),
      ...(source === undefined ? [] : [stated('SHA-256', source.sha256)]),
    ],
  };
}

function zeroTable({ transmissionZeros, band }: Specification, unit: FrequencyUnit): Table {
  const hertz = (im: number): string => given(hzFromOmega(band, im) / unit.hertz);
  return {
    id: 'input-zeros',
    caption: 'Transmission zeros asked for',
    columns: [
      textColumn('Zero'),
      numberColumn('Real part'),
      numberColumn('Imaginary part, omega'),
      numberColumn('Frequency', unit.name),
    ],
    rows: transmissionZeros.map(({ re, im }, n) => ({
      cells: [String(n + 1), given(re), given(im), re === 0 ? hertz(im) : ''],
    })),
  };
}

function levelsText({ relativeTo, ...line }: MaskRow['line']): string {
  if (relativeTo === undefined) return 'absolute';
  const isVariation = 'insertionLossVariationDb' in line || 'groupDelayVariationSeconds' in line;
  return `relative to the center${isVariation ? ', which changes no variation' : ''}`;
}

function maskTable(rows: readonly MaskRow[], unit: FrequencyUnit): Table {
  const end = (hertz: number | undefined): string => (hertz === undefined ? 'open' : given(hertz / unit.hertz));
  return {
    id: 'input-mask',
    caption: 'Mask, line by line',
    columns: [
      textColumn('Line'),
      textColumn('Quantity'),
      numberColumn('From', unit.name),
      numberColumn('To', unit.name),
      numberColumn('Limit'),
      textColumn('Levels'),
    ],
    rows: rows.map((row, n): Row => {
      const requirement = requirementOf(row, unit);
      const side = requirement.bound === 'atLeast' ? '>=' : '<=';
      const quantity = `${requirementName(requirement).replace(RELATIVE, '')}, ${requirement.unit}`;
      const limit = `${side} ${askedText(requirement, 0)}`;
      const { fromHz, toHz } = row.line;
      return { cells: [String(n + 1), quantity, end(fromHz), end(toHz), limit, levelsText(row.line)] };
    }),
  };
}

/** Zeros and mask of the design file, one by one, the mask numbered as in all other tables. */
export function inputLists({ specification, mask }: DesignReport): readonly Table[] {
  const unit = unitOf(specification.band);
  return [
    ...(specification.transmissionZeros.length === 0 ? [] : [zeroTable(specification, unit)]),
    ...(mask.length === 0 ? [] : [maskTable(mask, unit)]),
  ];
}
