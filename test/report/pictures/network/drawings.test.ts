import { describe, expect, it } from 'vitest';
import { design, FilterFailure } from '../../../../src/index.js';
import { matrixPicture } from '../../../../src/report/pictures/network/matrix/matrix-picture.js';
import { polesAndZerosPicture } from '../../../../src/report/pictures/network/poles-zeros/poles-zeros-picture.js';
import { resonatorPicture } from '../../../../src/report/pictures/network/resonators/resonator-picture.js';
import { emblem } from '../../../../src/report/pictures/network/routing/emblem.js';
import { routingPicture } from '../../../../src/report/pictures/network/routing/routing-picture.js';
import { FORMAT_WIDTH, type Picture, pictureSvg } from '../../../../src/report/svg/drawing.js';
import { randomMatrix } from '../../../support/models.js';
import { seeded } from '../../../support/random.js';
import { randomSpec } from '../../../support/random-designs.js';
import { fixtureDesign } from '../../designs.js';
import { drawingsOf, faultsOf, svgOf, xmlFaults } from './checks.js';
import { foldedDesign, foldedDesigns, otherDesigns } from './network-designs.js';

const BAND = { centerHz: 10e9, bandwidthHz: 40e6 };

/** Pictures of random designs, of every class of wiring, and of random full matrices. */
function pictures(): Picture[] {
  const random = seeded(77);
  const made: Picture[] = [];
  while (made.length < 120) {
    const spec = randomSpec(random);
    try {
      const { matrix, polynomials } = design({ passband: { lowerHz: 1e9, upperHz: 1.02e9 }, ...spec });
      made.push(
        routingPicture(matrix, BAND),
        matrixPicture(matrix),
        resonatorPicture(matrix, BAND),
        polesAndZerosPicture(polynomials),
      );
    } catch (error) {
      if (!(error instanceof FilterFailure)) throw error;
    }
  }
  const wirings = [...[2, 7, 14].flatMap(foldedDesigns), ...otherDesigns(), foldedDesign(60), foldedDesign(1, 1)];
  const full = [1, 2, 3, 6, 12].map((order) => ({ matrix: randomMatrix(order, seeded(order)) }));
  for (const { matrix } of [...wirings, ...full])
    made.push(routingPicture(matrix), matrixPicture(matrix), resonatorPicture(matrix, BAND));
  return made;
}

describe('drawings of the network', () => {
  const all = pictures();

  it('hold no NaN, no missing value, no style and no id twice, and have the width of their format', () => {
    for (const picture of all) {
      expect(drawingsOf(picture).flatMap(faultsOf), picture.finding).toEqual([]);
      expect(picture.wide.width).toBe(FORMAT_WIDTH.wide);
      expect(picture.narrow.width).toBe(FORMAT_WIDTH.narrow);
    }
  });

  it('are well-formed XML to a parser that is not ours (expat, through Python)', () => {
    const documents = all.flatMap((picture) => [
      pictureSvg(picture),
      ...drawingsOf(picture).map((drawing) => svgOf(drawing)),
    ]);
    expect(xmlFaults(documents)).toEqual([]);
    expect(xmlFaults(['<svg><g></svg>']).length).toBe(1);
  });

  it('carry a finding, a caption of at most two sentences and one sentence for readers who do not see them', () => {
    for (const { finding, caption, alternative } of all) {
      expect(finding).not.toMatch(/\.$|NaN|undefined/);
      expect(caption).toMatch(/\.$/);
      expect(caption.split(/\.(?: |$)/).filter((sentence) => sentence !== '').length).toBeLessThanOrEqual(2);
      expect(alternative).toContain(finding);
    }
  });

  it('same input, same bytes', () => {
    const { matrix, polynomials, specification } = fixtureDesign('brackwater');
    const make = (): string =>
      [
        routingPicture(matrix, specification.band),
        matrixPicture(matrix),
        resonatorPicture(matrix, specification.band),
        polesAndZerosPicture(polynomials),
      ]
        .map((picture) => JSON.stringify(picture))
        .join('') + JSON.stringify(emblem(matrix));
    expect(make()).toBe(make());
  });

  it('coordinates are rounded to a tenth of a pixel', () => {
    for (const picture of all)
      for (const drawing of drawingsOf(picture))
        expect(/\d\.\d\d+[ ,"LQM]/.exec(drawing.body.markup.replace(/<text[^>]*>[^<]*/g, ''))).toBeNull();
  });
});
