import { evaluateMask } from '../../../bandpass/index.js';
import { edgesOfBand, type MaskRow } from '../../../forms/index.js';
import type { DesignReport } from '../../design-report.js';
import { type FrequencyUnit, fixed } from '../../words/numbers.js';
import { numberColumn, type Table, textColumn } from './content.js';

/** Limits that nothing is held against: only what is predicted counts. */
const ANY_DB = 1;

/** The same verdict engine that judges a mask, asked where no mask is: loss at the center and edges, return loss in the band. */
function factRows({ specification, polynomials, matrix }: DesignReport): readonly MaskRow[] {
  const { band, unloadedQ } = specification;
  const { lowerHz, upperHz } = edgesOfBand(band);
  const lossAt = (hertz: number) => ({ fromHz: hertz, toHz: hertz, insertionLossDb: ANY_DB });
  const model = typeof unloadedQ === 'object' ? matrix : polynomials;
  return evaluateMask(model, unloadedQ === undefined ? band : { ...band, unloadedQ }, [
    lossAt(band.centerHz),
    lossAt(lowerHz),
    lossAt(upperHz),
    { fromHz: lowerHz, toHz: upperHz, returnLossDb: ANY_DB },
  ]);
}

/** What stands in the place of requirements where there are none. */
export function bandFacts(design: DesignReport, unit: FrequencyUnit): Table {
  const names = [
    'Insertion loss at the center',
    'Insertion loss at the lower edge',
    'Insertion loss at the upper edge',
    'Least return loss in the band',
  ];
  return {
    id: 'band-facts',
    caption: 'What is predicted for the band',
    columns: [textColumn('Quantity'), numberColumn('At', unit.name), numberColumn('Predicted', 'dB')],
    rows: factRows(design).map(({ predicted, worstHz }, n) => ({
      cells: [names[n] ?? '', fixed((worstHz ?? 0) / unit.hertz, unit.digits), fixed(predicted, 2)],
    })),
  };
}
