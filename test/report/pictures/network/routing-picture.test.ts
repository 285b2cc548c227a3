import { describe, expect, it } from 'vitest';
import { type CouplingMatrix, FilterFailure } from '../../../../src/index.js';
import { emblem } from '../../../../src/report/pictures/network/routing/emblem.js';
import { routingLayout, routingPicture } from '../../../../src/report/pictures/network/routing/routing-picture.js';
import type { Drawing } from '../../../../src/report/svg/drawing.js';
import { chain, entry, matrixOf } from '../../../support/models.js';
import { fixtureDesign, sampleDesign } from '../../designs.js';
import { attributes, drawingsOf, numberOf, textsOf } from './checks.js';
import { arrowDesign, fanDesign, foldedDesigns, type Named, otherDesigns, wired } from './network-designs.js';

const BAND = { centerHz: 3839.958e6, bandwidthHz: 36e6 };

/** Entries with i < j that four decimals show, as they are printed. */
function printedEntries({ order, values }: CouplingMatrix): string[] {
  return values
    .flatMap((row, i) => row.filter((value, j) => j > i && j <= order + 1 && Math.abs(value) >= 5e-5))
    .map((value) => value.toFixed(4))
    .sort();
}

/** Four-decimal numbers of a drawing. */
const printed = (drawing: Drawing): string[] =>
  textsOf(drawing)
    .filter((text) => /^[+−]\d+\.\d{4}$/.test(text))
    .map((text) => numberOf(text).toFixed(4))
    .sort();

const classesOf = (drawing: Drawing): string[] => attributes(drawing, 'path', 'class');

const small = (): Named[] => [...[2, 3, 4, 5, 6, 7, 8, 10, 12].flatMap(foldedDesigns), ...otherDesigns()];

describe('routing picture', () => {
  it('prints each coupling once, to the digits of the matrix, in both formats', () => {
    for (const { name, matrix } of small()) {
      for (const drawing of drawingsOf(routingPicture(matrix))) {
        expect(printed(drawing), name).toEqual(printedEntries(matrix));
      }
    }
  });

  it('prints the couplings of random matrices that are full', () => {
    for (const seed of [1, 2, 3]) {
      const { matrix } = wired(
        '',
        3,
        [
          [0, 2],
          [0, 3],
          [0, 4],
          [1, 3],
          [1, 4],
          [2, 4],
        ],
        seed,
        true,
      );
      for (const drawing of drawingsOf(routingPicture(matrix))) {
        const all = printedEntries(matrix);
        const shown = printed(drawing);
        // What is shown is in the matrix, and what is not shown has been counted as left out.
        expect(shown.filter((text) => !all.includes(text))).toEqual([]);
        const { dropped } = routingLayout(matrix, undefined, drawing.width === 560 ? 'wide' : 'narrow');
        expect(shown.length).toBe(all.length - dropped);
        expect(dropped).toBeLessThanOrEqual(1);
      }
    }
  });

  it('draws one line a coupling: thick for the main path, dashed for cross couplings, teal for negative ones', () => {
    for (const { matrix } of small()) {
      const { order, values } = matrix;
      const pairs = values.flatMap((row, i) =>
        row.map((value, j) => ({ i, j, value })).filter(({ j, value }) => j > i && Math.abs(value) >= 5e-5),
      );
      const fan = pairs.every(({ i, j }) => i === 0 || j === order + 1) && order > 1 && pairs.length >= 2 * order;
      const isMain = ({ i, j }: { i: number; j: number }): boolean => (fan ? j - i <= order : j === i + 1);
      for (const drawing of drawingsOf(routingPicture(matrix, BAND))) {
        const classes = classesOf(drawing);
        expect(classes.length).toBe(pairs.length);
        expect(classes.filter((text) => text.includes('dash')).length).toBe(
          pairs.filter((each) => !isMain(each)).length,
        );
        expect(classes.filter((text) => text.includes('thick')).length).toBe(pairs.filter(isMain).length);
        expect(classes.filter((text) => text.includes('s-negative')).length).toBe(
          pairs.filter(({ value }) => value < 0).length,
        );
        expect(attributes(drawing, 'polygon', 'points').length).toBe(pairs.filter(({ value }) => value < 0).length);
        expect(attributes(drawing, 'rect', 'rx').length).toBe(order + 2);
      }
    }
  });

  it('writes bandwidths, external Q and offsets that the hand-over numbers hold', () => {
    const { matrix, handOver, specification } = fixtureDesign('tern-quay');
    const texts = textsOf(routingPicture(matrix, specification.band).wide);
    const bare = texts.map((text) => text.replace(' MHz', ''));
    for (const { bandwidthHz } of handOver.couplings) {
      if (Math.abs(bandwidthHz) < 2e3) continue;
      const digits = `${bandwidthHz < 0 ? '−' : '+'}${Math.abs(bandwidthHz / 1e6).toFixed(2)}`;
      expect(bare).toContain(digits);
    }
    expect(texts.filter((text) => text === `Qe ${handOver.externalQ.source?.toFixed(2)}`).length).toBe(2);
    handOver.resonators.forEach(({ frequencyHz }) => {
      const offset = (frequencyHz - specification.band.centerHz) / 1e6;
      expect(bare).toContain(`${offset < 0 ? '−' : '+'}${Math.abs(offset).toFixed(2)}`);
    });
  });

  it('states what it sees', () => {
    expect(routingPicture(fixtureDesign('larkmoor').matrix).finding).toBe(
      'Folded in two lines: one cross coupling, 2\u2060–\u20605, of −0.1561',
    );
    expect(routingPicture(chain([1, 0.8, 0.8, 1])).finding).toBe('A chain: no cross coupling');
    expect(
      routingPicture(
        wired('', 9, [
          [1, 3],
          [5, 8],
        ]).matrix,
      ).finding,
    ).toMatch(/^A chain with 1 triangle and 1 square: 2 cross/);
    expect(routingPicture(arrowDesign(6, 3).matrix).finding).toMatch(/^A chain in arrow form: 3 cross couplings/);
    expect(routingPicture(fanDesign(4, 4).matrix).finding).toMatch(
      /^Resonators in parallel between source and load: source and load also coupled directly$/,
    );
  });

  it('says arrow form of exactly that: a whole chain, cross couplings at one port', () => {
    const { matrix } = arrowDesign(6, 3);
    const values = matrix.values.map((row) => [...row]);
    values[2]![3] = values[3]![2] = 0;
    expect(routingPicture({ order: 6, values }).finding).toMatch(/^A chain: /);
    const { finding } = routingPicture(
      wired(
        '',
        8,
        [
          [1, 7],
          [2, 5],
        ],
        14,
      ).matrix,
    );
    expect(finding).toMatch(/^A chain: /);
  });

  it('each coupling of a port has its own external Q, f0/(B*M^2), and source to load nothing but M', () => {
    const factor = BAND.centerHz / BAND.bandwidthHz;
    for (const { name, matrix } of [arrowDesign(6, 3), fanDesign(4, 4), foldedDesigns(6).at(-1)!, arrowDesign(8, 8)]) {
      const { labels } = routingLayout(matrix, BAND, 'wide');
      const { order, values } = matrix;
      const text = (m: number): string => `${m < 0 ? '−' : '+'}${Math.abs(m).toFixed(4)}`;
      for (const [i, row] of values.entries())
        for (const [j, m] of row.entries()) {
          if (j <= i || Math.abs(m) < 5e-5) continue;
          const seconds = labels
            .filter(({ lines }) => lines[0]!.text === text(m))
            .map(({ lines }) => lines[1]?.text ?? '');
          const isPort = (i === 0) !== (j === order + 1);
          const mine = seconds.filter((each) => each.startsWith('Qe ')).map((each) => Number(each.slice(3)) * m * m);
          if (isPort)
            expect(
              mine.some((each) => Math.abs(each / factor - 1) < 2e-3),
              `${name} ${i} ${j}`,
            ).toBe(true);
          if (i === 0 && j === order + 1) expect(seconds, name).toContain('');
        }
      const qualities = labels.filter(({ lines }) => lines[1]?.text.startsWith('Qe ')).length;
      const ports = [...values[0]!.slice(1, -1), ...values[order + 1]!.slice(1, -1)].filter((m) => Math.abs(m) >= 5e-5);
      expect(qualities, name).toBe(ports.length);
    }
  });

  it('captions name only what is drawn, in words that are true of both drawings', () => {
    const designs = [...[1, 2, 5, 8, 9, 14, 16].flatMap(foldedDesigns), ...otherDesigns(), arrowDesign(16, 6)];
    for (const { name, matrix } of designs) {
      for (const band of [BAND, undefined]) {
        const { caption, finding } = routingPicture(matrix, band);
        const layouts = (['wide', 'narrow'] as const).map((format) => routingLayout(matrix, band, format));
        const seconds = layouts.map(({ labels }) =>
          labels.flatMap(({ lines }) => lines.slice(1).map(({ text }) => text)),
        );
        expect(caption.includes('second line'), name).toBe(seconds.some((each) => each.length > 0));
        expect(caption.includes('Qe'), name).toBe(seconds.flat().some((text) => text.startsWith('Qe')));
        expect(caption.includes('bandwidth'), name).toBe(seconds.flat().some((text) => !text.startsWith('Qe')));
        if (seconds[0]!.length !== seconds[1]!.length && caption.includes('second line'))
          expect(caption, name).toContain('where there is room');
        expect(caption.includes('lozenge'), name).toBe(layouts[0]!.lozenges.length > 0);
        expect(finding, name).not.toMatch(/[\dSL]–|–[\dSL]/);
      }
    }
  });

  it('leaves missing couplings of the main path out, and whole resonators unconnected', () => {
    const matrix = matrixOf(4, [
      [0, 1, 1],
      [1, 4, 0.5],
      [4, 5, 1],
    ]);
    for (const drawing of drawingsOf(routingPicture(matrix))) {
      expect(classesOf(drawing).length).toBe(3);
      expect(attributes(drawing, 'rect', 'rx').length).toBe(6);
    }
    expect(drawingsOf(routingPicture(matrixOf(2, []))).map((drawing) => classesOf(drawing).length)).toEqual([0, 0]);
  });

  it('says when couplings are too weak to be drawn', () => {
    const { matrix } = wired('', 6, [[2, 5]]);
    const values = matrix.values.map((row) => [...row]);
    values[1]![6] = values[6]![1] = 2e-5;
    const picture = routingPicture({ order: 6, values });
    expect(picture.caption).toContain('one more coupling is not drawn');
    expect(classesOf(picture.wide).length).toBe(8);
  });

  it('refuses what is no coupling matrix or band', () => {
    const codeOf = (run: () => unknown): string => {
      try {
        run();
      } catch (error) {
        return error instanceof FilterFailure ? error.code : String(error);
      }
      return 'none';
    };
    const { matrix } = sampleDesign({});
    const skew = matrix.values.map((row, i) => row.map((value, j) => (i < j ? value + 1 : value)));
    expect(codeOf(() => routingPicture({ order: 4, values: skew }))).toBe('E_NOT_SYMMETRIC');
    expect(codeOf(() => routingPicture(matrix, { centerHz: 0, bandwidthHz: 1 }))).toBe('E_BAND');
    expect(codeOf(() => emblem({ order: 3, values: matrix.values }))).toBe('E_MATRIX_SHAPE');
    expect(codeOf(() => routingPicture(matrix, { centerHz: 1e9, bandwidthHz: Number.NaN }))).toBe('E_NOT_FINITE');
  });

  it('an emblem has the lines of the picture and no text', () => {
    for (const { matrix } of small()) {
      const drawing = emblem(matrix);
      expect(textsOf(drawing)).toEqual([]);
      expect(classesOf(drawing).sort()).toEqual(classesOf(routingPicture(matrix).wide).sort());
    }
    const { matrix } = fixtureDesign('larkmoor');
    expect(Math.max(...attributes(emblem(matrix), 'rect', 'rx').map(Number))).toBe(8);
    expect(entry(matrix, 2, 5)).toBeLessThan(0);
  });
});
