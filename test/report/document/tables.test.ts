import { describe, expect, it } from 'vitest';
import type { Design } from '../../../src/index.js';
import { reportHtml, reportMarkdown } from '../../../src/report/index.js';
import { fixtureDesign, sampleDesign } from '../designs.js';
import { rowsOf, shows } from './table-reader.js';
import { attributeOf, elementsOf, parsed } from './tree.js';

const MEGA = 1e6;
/** Asserts that a row of cells shows the values; a text must stand as it is, undefined is not looked at. */
function expectRow(cells: readonly string[], wanted: readonly (string | number | undefined)[], where: string): void {
  expect(cells, where).toHaveLength(wanted.length);
  for (const [n, value] of wanted.entries()) {
    if (value === undefined) continue;
    if (typeof value === 'string') expect(cells[n], `${where}, column ${n}`).toBe(value);
    else expect([cells[n], value, shows(cells[n]!, value)], `${where}, column ${n}`).toEqual([cells[n], value, true]);
  }
}

function scaleOf(row: Design['mask'][number]): number {
  return 'groupDelayVariationSeconds' in row.line ? 1e9 : 1;
}

const DESIGNS: readonly (readonly [string, () => Design])[] = [
  ['larkmoor', () => fixtureDesign('larkmoor')],
  ['tern-quay', () => fixtureDesign('tern-quay')],
  ['brackwater', () => fixtureDesign('brackwater')],
  ['arrow', () => sampleDesign({ order: 7, transmissionZeros: [1.3, -1.5], topology: 'arrow', unloadedQ: 4000 })],
  ['transversal', () => sampleDesign({ order: 5, transmissionZeros: [1.5], topology: 'transversal' })],
  ['one resonator', () => sampleDesign({ order: 1 })],
  ['order 20', () => sampleDesign({ order: 20, transmissionZeros: [1.2, -1.2, 1.4], unloadedQ: 1e4 })],
];

describe.each(DESIGNS)('tables of the report of %s', (_, make) => {
  const design = make();
  const tree = parsed(reportHtml(design));
  const { handOver, specification, coefficients, polynomials } = design;
  const { centerHz } = specification.band;
  const body = (id: string) => rowsOf(tree, id).slice(1);

  it('requirements: limit, prediction and room of each row of the mask', () => {
    if (design.mask.length === 0) {
      expect(elementsOf(tree).some((each) => attributeOf(each, 'id') === 'requirements')).toBe(false);
      return;
    }
    const rows = body('requirements');
    expect(rows).toHaveLength(design.mask.length);
    for (const [n, row] of design.mask.entries()) {
      const [, , limit = '', predicted = '', room = ''] = rows[n]!;
      const scale = scaleOf(row);
      expect(shows(limit, row.limit * scale)).toBe(true);
      expect(limit.startsWith('rejectionDb' in row.line || 'returnLossDb' in row.line ? '>= ' : '<= ')).toBe(true);
      expect(shows(predicted.replace('predicted ', ''), row.predicted * scale)).toBe(true);
      expect(shows(room.replace('clear by ', ''), row.margin * scale)).toBe(true);
    }
    for (const [n, row] of design.mask.entries()) {
      const cells = body('mask-points')[n]!;
      const scale = scaleOf(row);
      const values = [row.limit * scale, row.predicted * scale, row.margin * scale, (100 * row.margin) / row.limit];
      const ends = [row.line.fromHz, row.line.toHz].map((hertz) => (hertz === undefined ? 'open' : hertz / MEGA));
      expectRow(cells, [undefined, ...ends, ...values, (row.worstHz ?? 0) / MEGA], `mask point ${n}`);
    }
  });

  it('couplings, resonators and ports', () => {
    const m = (i: number, j: number): number => design.matrix.values[i]![j]!;
    const couplings = handOver.couplings.length === 0 ? [] : body('couplings');
    for (const [n, { between, k, bandwidthHz }] of handOver.couplings.entries()) {
      const [i, j] = between;
      expectRow(couplings[n]!, [`${i} - ${j}`, undefined, m(i, j), k, bandwidthHz / MEGA], `coupling ${n}`);
      expect(couplings[n]![1]).toMatch(m(i, j) < 0 ? /^◇ (main|cross), negative$/ : /^(main|cross)$/);
    }
    for (const [n, { frequencyHz }] of handOver.resonators.entries()) {
      const { unloadedQ } = specification;
      const quality = typeof unloadedQ === 'object' ? unloadedQ[n] : unloadedQ;
      const wanted = [n + 1, frequencyHz / MEGA, (frequencyHz - centerHz) / MEGA, m(n + 1, n + 1)];
      expectRow(body('resonators')[n]!, quality === undefined ? wanted : [...wanted, quality], `resonator ${n}`);
    }
    const ports = body('ports');
    const touched = [0, design.matrix.order + 1].flatMap((node) =>
      design.matrix.values[node]!.slice(1, -1).filter((value) => value !== 0),
    );
    expect(ports).toHaveLength(touched.length);
    for (const [n, value] of touched.entries()) {
      // Qe = f0/(B*M^2) and 2*Qe/(pi*f0): R. J. Cameron, C. M. Kudsia, R. R. Mansour, Microwave Filters for Communication
      // Systems, 2007 (from memory).
      const quality = centerHz / (specification.band.bandwidthHz * value * value);
      expectRow(ports[n]!, [undefined, value, quality, (2e9 * quality) / (Math.PI * centerHz)], `port ${n}`);
    }
  });

  it('matrix: every entry, in as many tables as fit a page', () => {
    const size = design.matrix.order + 2;
    const ids = elementsOf(tree).flatMap((each) => attributeOf(each, 'id') ?? []);
    const pieces = ids.filter((id) => /^matrix(-\d+)?$/.test(id)).map((id) => rowsOf(tree, id));
    const whole = Array.from({ length: size + 1 }, (__, n) => pieces.flatMap((rows) => rows[n]!.slice(1)));
    const names = ['S', ...Array.from({ length: size - 2 }, (__, n) => String(n + 1)), 'L'];
    expect(whole[0]).toEqual(names);
    for (const [n, name] of names.entries()) {
      for (const rows of pieces) expect(rows[n + 1]![0]).toBe(name);
      expectRow(
        whole[n + 1]!,
        design.matrix.values[n]!.map((value) => (value === 0 ? '·' : value)),
        `row ${name}`,
      );
    }
  });

  it('certificates: check, value, limit, and whether it holds', () => {
    const rows = body('certificates');
    expect(rows).toHaveLength(design.certificates.length);
    for (const [n, { check, value, limit, holds }] of design.certificates.entries())
      expectRow(rows[n]!, [check, value, limit, holds ? 'holds' : 'fails'], check);
  });

  it('roots and coefficients: twelve figures', () => {
    const { poles, reflectionZeros, transmissionZeros } = polynomials;
    const roots = [...poles, ...reflectionZeros, ...transmissionZeros];
    const { e, f, p, epsilon, epsilonR } = coefficients;
    const powers = [...e, ...f, ...p, { re: epsilon, im: undefined }, { re: epsilonR, im: undefined }];
    expect([body('roots').length, body('coefficients').length]).toEqual([roots.length, powers.length]);
    for (const [id, values] of [
      ['roots', roots],
      ['coefficients', powers],
    ] as const) {
      for (const [n, { re, im }] of values.entries()) {
        const cells = body(id)[n]!;
        expectRow(cells, [undefined, re, im ?? ''], `${id} ${n}`);
        for (const cell of cells.slice(1).filter((text) => /[1-9]/.test(text) && !/e-(1[6-9]|[2-9]\d)/.test(text)))
          expect(cell.replace(/e.*$/, '').replace(/[^\d]/g, '').replace(/^0+/, ''), `${id} ${n}`).toHaveLength(12);
      }
    }
  });

  it('are the same in Markdown, cell by cell', () => {
    const lines = reportMarkdown(design)
      .split('\n')
      .filter((line) => line.startsWith('| '));
    const cells = lines.map((line) =>
      line
        .slice(2, -2)
        .split(' | ')
        .map((cell) =>
          cell
            .replace(/\\(.)/g, '$1')
            .replace(/^\*\*(.*)\*\*$/, '$1')
            .trim(),
        ),
    );
    const inMarkdown = new Set(cells.map((row) => row.join(';')));
    const ids = ['couplings', 'resonators', 'ports', 'certificates', 'matrix', 'mask-points'].filter((id) =>
      elementsOf(tree).some((each) => attributeOf(each, 'id') === id),
    );
    for (const id of ids) for (const row of body(id)) expect([...inMarkdown], id).toContain(row.join(';'));
  });
});
