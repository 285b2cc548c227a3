import { describe, expect, it } from 'vitest';
import { type Design, edgesOfBand, type MaskLineInput, parseSpecification, sweepHz } from '../../src/index.js';
import { reportHtml, reportMarkdown, responseText, summaryText } from '../../src/report/index.js';
import { delayUnitOf } from '../../src/report/words/numbers.js';
import { sampleDesign } from './designs.js';
import { rowsOf } from './document/table-reader.js';
import { elementsOf, parsed, textOf } from './document/tree.js';

const flat = (text: string): string => text.replace(/\s+/g, ' ');
const page = (design: Design) => parsed(reportHtml(design));
const textOfPage = (design: Design): string => {
  const parts = elementsOf(page(design)).filter(({ tagName }) => tagName === 'header' || tagName === 'main');
  return flat(parts.map(textOf).join(' '));
};
const nearest = (design: Design): string => flat(summaryText(design));
const masked = (...mask: readonly MaskLineInput[]): Design => sampleDesign({ mask, unloadedQ: 4000 });

const BAND = { fromHz: '992 MHz', toHz: '1008 MHz' } as const;
const SLOPE: MaskLineInput = { fromHz: '1.03 GHz', toHz: '1.05 GHz', rejectionDb: [20, 30.5] };

describe('a limit that slopes', () => {
  const design = masked(SLOPE);

  it('stands with both of its ends in every table of requirements', () => {
    expect(rowsOf(page(design), 'requirements')[1]?.[2]).toBe('>= 20 → 30.5');
    expect(summaryText(design)).toMatch(/^rejection, dB +1030-1050 +20 → 30\.5 +\d/m);
    expect(reportMarkdown(design)).toMatch(/^\| .*1 Rejection, dB.*20 → 30\.5/m);
  });

  it('stands with its value at the worst point in the table of all points', () => {
    const [head = [], cells = []] = rowsOf(page(design), 'mask-points');
    const at = head.findIndex((text) => text.startsWith('Limit at the worst point'));
    expect(Number(cells[at])).toBeCloseTo(design.mask[0]!.limit, 2);
    expect(cells[at - 1]).toBe('20 → 30.5');
  });
});

describe('a miss', () => {
  const over = masked({ ...BAND, insertionLossDb: 0.1 });

  it.each([
    ['insertion loss', { ...BAND, insertionLossDb: 0.1 }],
    ['loss variation', { ...BAND, insertionLossVariationDb: 0.01 }],
    ['delay variation', { ...BAND, groupDelayVariationSeconds: 1e-9 }],
  ] as const)('of a greatest value is over: %s', (_, line) => {
    const design = masked(line);
    expect(nearest(design)).toMatch(/Misses the only requirement\. Farthest off .* over by \d/);
    expect(summaryText(design)).toMatch(/ over by +\d/);
    expect(rowsOf(page(design), 'requirements')[1]?.[4]).toMatch(/^over by \d/);
    expect(summaryText(design) + reportMarkdown(design).split('## Band in detail')[0]).not.toContain('short by');
  });

  it.each([
    ['rejection', { fromHz: '1.011 GHz', toHz: '1.02 GHz', rejectionDb: 60 }],
    ['return loss', { ...BAND, returnLossDb: 30 }],
  ] as const)('of a least value is short: %s', (_, line) => {
    const design = masked(line);
    expect(summaryText(design)).toMatch(/ short by +\d/);
    expect(rowsOf(page(design), 'requirements')[1]?.[4]).toMatch(/^short by \d/);
  });

  it('is told as a share of its limit above 100 % too', () => {
    const [row] = over.mask;
    const percent = Math.round((-100 * row!.margin) / row!.limit);
    expect(percent).toBeGreaterThan(100);
    expect(nearest(over)).toContain(`(${percent} % of the limit)`);
    expect(nearest(masked({ ...BAND, insertionLossDb: 0.001 }))).toContain('(over 1000 % of the limit)');
  });
});

describe('what the model is', () => {
  const only =
    'Model only: ideal part values; no tolerances, temperature, spurious resonances or power handling; not a safety clearance.';

  it('stands under the verdict of the page, and last in a terminal', () => {
    const design = masked(SLOPE);
    expect(textOfPage(design).indexOf(only)).toBeGreaterThan(0);
    expect(textOfPage(design).indexOf(only)).toBeLessThan(textOfPage(design).indexOf('Designed'));
    expect(nearest(design)).toMatch(/not a safety clearance\. Multipaction, corona, heating and exposure .* staff\. $/);
    expect(responseText(design)).toContain('! model only, no safety clearance');
  });

  it('says where a limit is open-ended that the lumped model judges it, and only there', () => {
    const open = masked({ fromHz: '1.2 GHz', rejectionDb: 30 });
    const shut = masked({ fromHz: '1.2 GHz', toHz: '1.3 GHz', rejectionDb: 30 });
    for (const text of [nearest(open), textOfPage(open)]) expect(text).toContain('in the lumped model');
    for (const text of [nearest(shut), textOfPage(shut)]) expect(text).not.toContain('in the lumped model');
  });

  it('warns of a wide band on the first page', () => {
    const wide = sampleDesign({ passband: { centerHz: '1 GHz', bandwidthHz: '201 MHz' } });
    expect(textOfPage(wide).indexOf('Caution: the band is 20.1 % wide')).toBeLessThan(
      textOfPage(wide).indexOf('Designed'),
    );
    expect(textOfPage(sampleDesign({}))).not.toContain('Caution');
  });
});

describe('units', () => {
  it('of transmission zeros stand with frequencies only', () => {
    const transmissionZeros = [-1.5, { re: 0.8, im: 0.3 }, { re: -0.8, im: 0.3 }];
    const text = 'Transmission zeros at 985.112 MHz; normalized s = -0.8+j0.3, 0.8+j0.3';
    expect(nearest(sampleDesign({ order: 6, transmissionZeros }))).toContain(`${text} `);
  });

  it.each([
    [200e6, 'ns', 1e-9],
    [1e6, 'ns', 1e-9],
    [0.99e6, 'µs', 1e-6],
    [1e3, 'µs', 1e-6],
    [400, 'ms', 1e-3],
  ])('of delays for a width of %d Hz: %s', (bandwidthHz, name, seconds) => {
    expect(delayUnitOf({ centerHz: 1e9, bandwidthHz })).toEqual({ name, seconds, digits: 3 });
  });

  it('of delays are one and the same all over a document', () => {
    const design = sampleDesign({
      passband: { centerHz: '137 kHz', bandwidthHz: '2 kHz' },
      mask: [{ fromHz: '136.3 kHz', toHz: '137.7 kHz', groupDelayVariationSeconds: 400e-6 }],
    });
    const delay = design.handOver.reflectedDelaySeconds.source! * 1e6;
    expect(rowsOf(page(design), 'ports')[0]?.[3]).toBe('Reflected delay µs');
    expect(Number(rowsOf(page(design), 'ports')[1]?.[3])).toBeCloseTo(delay, 3);
    expect(rowsOf(page(design), 'requirements')[1]?.slice(0, 3)).toEqual([
      '1 Delay variation µs',
      '136.3-137.7 kHz',
      '<= 400.0',
    ]);
    expect(summaryText(design)).toMatch(/^delay variation, µs .* 400\.00 /m);
    expect(textOfPage(design)).not.toMatch(/\bns\b/);
  });

  it('stand in a remark about a low center', () => {
    const text = '{"passband":{"centerHz":137000,"bandwidthHz":400},"order":4,"returnLossDb":18}';
    expect(parseSpecification(text).remarks.join()).toContain('center 137000 Hz, low');
  });
});

describe('words', () => {
  it('name the family and half-power edges on the first page, and no key of the code anywhere', () => {
    const half = sampleDesign({ family: 'butterworth', returnLossDb: undefined, unloadedQ: 5000 });
    const first = textOfPage(half).split('Designed')[0];
    expect(first).toContain('half-power edges (about 3 dB down, plus loss)');
    expect(first).toContain('Butterworth (maximally flat)');
    expect(summaryText(half)).toContain('Butterworth (maximally flat), half-power edges');
    for (const each of [half, sampleDesign({}), sampleDesign({ portCouplings: 'noDirect', transmissionZeros: [1.5] })])
      for (const text of [textOfPage(each), reportMarkdown(each), summaryText(each)])
        expect(text).not.toMatch(/generalizedChebyshev|noDirect|butterworth/);
  });

  it('say one unloaded Q where all are equal', () => {
    const equal = sampleDesign({ unloadedQ: [4000, 4000, 4000, 4000] });
    expect(nearest(equal)).toContain('unloaded Q 4000 ');
    expect(nearest(sampleDesign({ unloadedQ: [4000, 4000, 4000, 5000] }))).toContain('unloaded Q 4000 to 5000 ');
  });

  it('call the delay of a reflection by one name', () => {
    expect(textOfPage(sampleDesign({}))).not.toMatch(/peak delay/i);
  });

  it('say of a variation nothing about the center, where levels relative to it are marked', () => {
    const variation = masked({ ...BAND, insertionLossVariationDb: 0.4, relativeTo: 'center' });
    const level = masked({ ...BAND, insertionLossDb: 0.4, relativeTo: 'center' });
    expect(nearest(variation)).not.toContain('relative to');
    expect(nearest(level)).toContain('insertion loss relative to the center');
  });

  it('give predictions for the band on the first page where no mask asks for any', () => {
    const design = sampleDesign({ unloadedQ: 4000, transmissionZeros: [1.4] });
    const { band } = design.specification;
    const { lowerHz, upperHz } = edgesOfBand(band);
    const grid = Array.from({ length: 4001 }, (_, n) => lowerHz + ((upperHz - lowerHz) * n) / 4000);
    const { s11, s21 } = sweepHz(design.matrix, { ...band, unloadedQ: 4000 }, [band.centerHz, ...grid]);
    const db = ({ re, im }: typeof s11, n: number): number => -20 * Math.log10(Math.hypot(re[n]!, im[n]!));
    const least = Math.min(...grid.map((_, n) => db(s11, n + 1)));
    const [, ...rows] = rowsOf(page(design), 'band-facts');
    const values = [db(s21, 0), db(s21, 1), db(s21, 4001), least];
    for (const [n, value] of values.entries()) expect(Math.abs(Number(rows[n]?.[2]) - value)).toBeLessThan(0.006);
    expect(rows.slice(0, 3).map((row) => Number(row[1]))).toEqual(
      [band.centerHz, lowerHz, upperHz].map((hertz) => Number((hertz / 1e6).toFixed(3))),
    );
    expect(reportMarkdown(design)).toContain(`| Insertion loss at the center | 1000.000 | ${values[0]!.toFixed(2)} |`);
  });
});
