import { describe, expect, it } from 'vitest';
import { type Design, edgesOfBand, hzFromOmega, omegaFromHz, type SpecificationInput } from '../../../../src/index.js';
import { bandPicture } from '../../../../src/report/pictures/curves/band-picture.js';
import { groupDelayPicture } from '../../../../src/report/pictures/curves/group-delay-picture.js';
import { responsePicture } from '../../../../src/report/pictures/curves/response-picture.js';
import type { Picture } from '../../../../src/report/svg/drawing.js';
import { fixtureDesign, sampleDesign } from '../../designs.js';

const FIXTURES = ['brackwater', 'larkmoor', 'tern-quay'] as const;
const DRAW = [responsePicture, bandPicture, groupDelayPicture] as const;

interface Frame {
  readonly hz: (x: number) => number;
  readonly left: number;
  readonly right: number;
}

function frameOf(markup: string): Frame {
  const value = (name: string): number => Number(new RegExp(`data-${name}="([^"]+)"`).exec(markup)![1]);
  const [from, to, left, right] = ['from-hz', 'to-hz', 'left', 'right'].map(value) as [number, number, number, number];
  return { hz: (x) => from + ((x - left) / (right - left)) * (to - from), left, right };
}

/** Corner points of the paths of a class, straight pieces only. */
function pathsOf(markup: string, classes: string): [number, number][][] {
  return [...markup.matchAll(new RegExp(`<path d="([^"]*)" class="line ${classes}"`, 'g'))].map(([, d]) =>
    d!
      .slice(1)
      .split('L')
      .map((pair) => pair.split(',').map(Number) as [number, number]),
  );
}

/** The level axis of a panel from the numbers beside its hairlines; the unit ends each panel's numbers. */
function levelAxis(markup: string, panel: number): (y: number) => number {
  const part = markup.split(/>(?:dB|ns)<\/text>/)[panel]!;
  const ticks = [...part.matchAll(/y="([\d.]+)" class="tick end">([−\d.]+)</g)].map(([, y, text]) => ({
    y: Number(y) - 4.4,
    level: Number(text!.replace('−', '-')),
  }));
  const [a, b] = [ticks[0]!, ticks.at(-1)!];
  return (y) => a.level + ((y - a.y) / (b.y - a.y)) * (b.level - a.level);
}

/** 20 log10 of the size of prod(s - root). */
function productDb(roots: readonly { re: number; im: number }[], re: number, im: number): number {
  return roots.reduce((sum, root) => sum + 20 * Math.log10(Math.hypot(re - root.re, im - root.im)), 0);
}

/** S21 and S11 in dB from the roots by their definition, loss as a shift of s to the right. */
function decibelsAt(
  { polynomials, specification: { band, unloadedQ } }: Design,
  hz: number,
): { s21: number; s11: number } {
  const re = typeof unloadedQ === 'number' ? band.centerHz / (band.bandwidthHz * unloadedQ) : 0;
  const im = omegaFromHz(band, hz);
  const { poles, reflectionZeros, transmissionZeros, epsilon, epsilonR } = polynomials;
  const below = productDb(poles, re, im);
  return {
    s21: productDb(transmissionZeros, re, im) - below - 20 * Math.log10(epsilon),
    s11: productDb(reflectionZeros, re, im) - below - 20 * Math.log10(epsilonR),
  };
}

/** Whether the curve passes within a pixel of its place: horizontally or vertically, for it may be steep. */
function passes(
  value: (hz: number) => number,
  frame: Frame,
  axis: (y: number) => number,
  [x, y]: [number, number],
): boolean {
  const near = Array.from({ length: 41 }, (_, n) => value(frame.hz(x - 1 + n / 20)));
  const [high, low] = [axis(y - 1), axis(y + 1)];
  return Math.min(...near) <= Math.max(high, low) && Math.max(...near) >= Math.min(high, low);
}

describe.each(FIXTURES)('curves of %s', (name) => {
  const design = fixtureDesign(name);

  it.each(['wide', 'narrow'] as const)('%s response: stands where the roots say', (format) => {
    const { markup } = responsePicture(design)[format].body;
    const [frame, axis] = [frameOf(markup), levelAxis(markup, 0)];
    for (const [classes, key] of [
      ['thick s-transmission', 's21'],
      ['medium s-reflection', 's11'],
    ] as const) {
      const [points = []] = pathsOf(markup, classes);
      const inside = points.filter(([x, y]) => x > frame.left && x < frame.right && axis(y) > -50 && axis(y) < -0.5);
      expect(inside.length).toBeGreaterThan(20);
      for (const point of inside)
        expect(
          passes((hz) => decibelsAt(design, hz)[key], frame, axis, point),
          `${key} ${point}`,
        ).toBe(true);
    }
  });

  it.each(['wide', 'narrow'] as const)('%s band picture: loss down, return loss down', (format) => {
    const { markup } = bandPicture(design)[format].body;
    const frame = frameOf(markup);
    const [loss = []] = pathsOf(markup, 'thick s-transmission');
    const inside = loss.filter(([x, y]) => x > frame.left && x < frame.right && levelAxis(markup, 0)(y) < 0.9);
    expect(inside.length).toBeGreaterThan(5);
    for (const point of inside)
      expect(
        passes((hz) => -decibelsAt(design, hz).s21, frame, levelAxis(markup, 0), point),
        `${point}`,
      ).toBe(true);
    const [match = []] = pathsOf(markup, 'medium s-reflection');
    const lower = match.filter(
      ([x, y]) => x > frame.left && x < frame.right && Math.abs(levelAxis(markup, 1)(y) - 25) < 8,
    );
    expect(lower.length).toBeGreaterThan(10);
    for (const point of lower)
      expect(
        passes((hz) => -decibelsAt(design, hz).s11, frame, levelAxis(markup, 1), point),
        `${point}`,
      ).toBe(true);
  });

  it('group delay: lowest point and worst points are those of the mask rows', () => {
    const { markup } = groupDelayPicture(design).wide.body;
    const [frame, axis] = [frameOf(markup), levelAxis(markup, 0)];
    const [points = []] = pathsOf(markup, 'thick s-transmission');
    for (const row of design.mask.filter(({ line }) => 'groupDelayVariationSeconds' in line)) {
      const { fromHz = 0, toHz = 0 } = row.line;
      const ends = [fromHz, toHz].map((hz) => {
        const next = points.findIndex(([x]) => frame.hz(x) >= hz);
        const [[x0, y0], [x1, y1]] = [points[next - 1]!, points[next]!];
        return axis(y0 + ((hz - frame.hz(x0)) / (frame.hz(x1) - frame.hz(x0))) * (y1 - y0));
      });
      const inner = points.filter(([x]) => frame.hz(x) >= fromHz && frame.hz(x) <= toHz).map(([, y]) => axis(y));
      const within = [...ends, ...inner];
      const spread = Math.max(...within) - Math.min(...within);
      // A pixel is 0.3 to 0.5 ns.
      expect(Math.abs(spread - 1e9 * row.predicted)).toBeLessThan(0.6);
    }
  });

  it('marks the worst point of every rejection line in the picture where its row has it', () => {
    const { markup } = responsePicture(design).wide.body;
    const [frame, axis] = [frameOf(markup), levelAxis(markup, 0)];
    const dots = [...markup.matchAll(/<circle cx="([\d.]+)" cy="([\d.]+)" r="3.6" class="f-ink/g)].map(
      ([, x, y]) => [frame.hz(Number(x)), axis(Number(y))] as const,
    );
    const rows = design.mask.filter(({ line }) => 'rejectionDb' in line);
    expect(dots).toHaveLength(rows.length);
    for (const { worstHz, predicted } of rows)
      expect(dots.some(([hz, db]) => Math.abs(hz - worstHz!) < 2e-4 * hz && Math.abs(db + predicted) < 0.2)).toBe(true);
  });
});

/** Designs at the edges of what a file may ask for. */
const HARD: readonly (readonly [string, Partial<SpecificationInput>])[] = [
  ['order 1, no mask', { order: 1 }],
  ['order 2', { order: 2, unloadedQ: 300 }],
  ['order 40', { order: 40, returnLossDb: 26, transmissionZeros: [1.05, 1.2, -1.1], unloadedQ: 50_000 }],
  ['Butterworth', { family: 'butterworth', returnLossDb: undefined, order: 5 }],
  [
    'complex zeros',
    {
      order: 6,
      transmissionZeros: [
        { re: 0.8, im: 0 },
        { re: -0.8, im: 0 },
      ],
    },
  ],
  ['Q of each', { order: 4, unloadedQ: [1000, 2000, 3000, 4000] }],
  ['heavy loss', { order: 8, unloadedQ: 60 }],
  ['return loss 60 dB', { order: 5, returnLossDb: 60 }],
  ['return loss 0.1 dB', { order: 5, returnLossDb: 0.1 }],
  ['two-point sweep', { sweep: { fromHz: '0.9 GHz', toHz: '1.2 GHz', points: 2 } }],
  ['sweep without the band', { sweep: { fromHz: '2 GHz', toHz: '3 GHz', points: 101 } }],
  ['a band of hertz', { passband: { centerHz: 20, bandwidthHz: 0.002 }, unloadedQ: 1e6 }],
  ['a band of an octave', { passband: { lowerHz: '1 GHz', upperHz: '2 GHz' } }],
  [
    'slopes, relative levels, open ends, misses',
    {
      order: 5,
      unloadedQ: 700,
      mask: [
        { fromHz: '1.02 GHz', toHz: '1.05 GHz', rejectionDb: [20, 50], relativeTo: 'center' },
        { fromHz: '1.04 GHz', rejectionDb: 95 },
        { toHz: '0.1 GHz', rejectionDb: 200 },
        { fromHz: '0.985 GHz', toHz: '0.985 GHz', rejectionDb: 30 },
        { fromHz: '0.99 GHz', toHz: '1.01 GHz', insertionLossDb: [0.1, 0.2], relativeTo: 'center' },
        { fromHz: '0.991 GHz', toHz: '1.009 GHz', insertionLossVariationDb: 0 },
        { fromHz: '0.99 GHz', toHz: '1.01 GHz', returnLossDb: [30, 10] },
        { fromHz: '0.95 GHz', toHz: '1.06 GHz', returnLossDb: 25 },
        { fromHz: '0.999 GHz', toHz: '1.001 GHz', groupDelayVariationSeconds: 0 },
        { fromHz: '0.99 GHz', toHz: '1.01 GHz', groupDelayVariationSeconds: 1e-12 },
        { rejectionDb: 1, fromHz: '10 GHz', toHz: '20 GHz' },
      ],
    },
  ],
];

describe.each(HARD)('hard case: %s', (_, more) => {
  const design = sampleDesign(more);

  it.each(DRAW.map((draw) => [draw.name, draw] as const))('%s draws without a hole, the same twice', (__, draw) => {
    const picture = draw(design);
    for (const { body, width, height } of [picture.wide, picture.narrow]) {
      expect(body.markup).not.toMatch(/NaN|Infinity|undefined|null/);
      for (const [, value] of body.markup.matchAll(/ (?:x|y|x1|x2|y1|y2|cx|cy)="(-?[\d.]+)"/g))
        expect(Math.abs(Number(value))).toBeLessThan(5000);
      expect(width).toBeGreaterThan(300);
      expect(height).toBeGreaterThan(200);
    }
    expect(`${picture.finding}${picture.caption}${picture.alternative}`).not.toMatch(/NaN|Infinity|undefined/);
    const again: Picture = draw(sampleDesign(more));
    expect(again).toEqual(picture);
  });
});

describe('what a missed limit looks like', () => {
  const design = sampleDesign({
    order: 3,
    mask: [
      { fromHz: '1.02 GHz', rejectionDb: 60 },
      { fromHz: '0.992 GHz', toHz: '1.008 GHz', returnLossDb: 30 },
    ],
  });

  it('has an octagon, the word short and a finding that says so', () => {
    const { finding, wide } = responsePicture(design);
    expect(finding).toMatch(/^Rejection short by [\d.]+ dB; return loss short by [\d.]+ dB$/);
    expect(wide.body.markup.match(/class="f-short s-window edge"/g)).toHaveLength(2);
    expect(wide.body.markup).toMatch(/dB short</);
  });
});

describe('the lit window', () => {
  it('is the passband', () => {
    const design = fixtureDesign('larkmoor');
    const { lowerHz, upperHz } = edgesOfBand(design.specification.band);
    const { markup } = responsePicture(design).wide.body;
    const frame = frameOf(markup);
    const [, x, , width] = /<rect x="([\d.]+)" y="([\d.]+)" width="([\d.]+)" height="[\d.]+" class="f-window"/.exec(
      markup,
    )!;
    const pixel = frame.hz(1) - frame.hz(0);
    expect(Math.abs(frame.hz(Number(x)) - lowerHz)).toBeLessThan(0.1 * pixel);
    expect(Math.abs(frame.hz(Number(x) + Number(width)) - upperHz)).toBeLessThan(0.1 * pixel);
    expect(hzFromOmega(design.specification.band, 1)).toBe(upperHz);
  });
});

/** Masks, sweeps and bands that once led a mark out of its panel, a curve off its frame, or an axis below 0 Hz. */
const OFF: readonly (readonly [string, Partial<SpecificationInput>])[] = [
  ['a wall that runs on', { mask: [{ fromHz: '1.06 GHz', rejectionDb: 30 }] }],
  [
    'a coarse sweep',
    { sweep: { fromHz: '0.92 GHz', toHz: '1.09 GHz', points: 5 }, mask: [{ fromHz: '1.03 GHz', rejectionDb: 20 }] },
  ],
  ['one side far', { mask: [{ toHz: '0.9 GHz', rejectionDb: 30 }], transmissionZeros: [1.995, -6.87], order: 3 }],
  ['a band of 100 %', { passband: { lowerHz: 1e9, upperHz: 3e9 } }],
  ['loss on the skirt', { mask: [{ fromHz: '0.99 GHz', toHz: '1.0108 GHz', insertionLossDb: 1 }] }],
  ['return loss on the skirt', { mask: [{ fromHz: '0.95 GHz', toHz: '1.005 GHz', returnLossDb: 20 }] }],
  ['a reflection zero', { mask: [{ fromHz: 999999990, toHz: 1000000010, returnLossDb: 300 }], order: 3 }],
  [
    'limits far below the floor',
    {
      mask: [
        { fromHz: '1.03 GHz', toHz: '1.05 GHz', rejectionDb: 300 },
        { fromHz: '0.999 GHz', toHz: '1.001 GHz', returnLossDb: 300 },
      ],
    },
  ],
  [
    'variation beside the picture',
    {
      mask: [
        { fromHz: '1.04 GHz', toHz: '1.05 GHz', insertionLossVariationDb: 1 },
        { fromHz: '1.04 GHz', toHz: '1.05 GHz', groupDelayVariationSeconds: 1e-9 },
      ],
    },
  ],
  [
    'variation half in the picture',
    {
      mask: [
        { fromHz: '0.9 GHz', toHz: '1.005 GHz', insertionLossVariationDb: 1 },
        { fromHz: '0.97 GHz', toHz: '1.005 GHz', groupDelayVariationSeconds: 1e-7 },
      ],
    },
  ],
  [
    'delay below zero',
    {
      unloadedQ: 120,
      transmissionZeros: [1.5, -1.5],
      mask: [{ fromHz: '0.984 GHz', toHz: '1.016 GHz', groupDelayVariationSeconds: 1e-6 }],
    },
  ],
  ['a sweep beside the band', { sweep: { fromHz: '1.2 GHz', toHz: '1.3 GHz', points: 101 } }],
  ['long sweep', { sweep: { fromHz: '0.99 GHz', toHz: '1.01 GHz', points: 100_001 } }],
];

describe.each(OFF)('%s', (_, more) => {
  const design = sampleDesign({ unloadedQ: 2000, ...more });

  it.each(DRAW.map((draw) => [draw.name, draw] as const))(
    '%s: marks stay in their frame, curves reach its sides',
    (__, draw) => {
      const { wide, narrow } = draw(design);
      for (const { body, height } of [wide, narrow]) {
        const frame = frameOf(body.markup);
        expect(frame.hz(frame.left)).toBeGreaterThan(0);
        const value = (name: string): number => Number(new RegExp(`data-${name}="([^"]+)"`).exec(body.markup)![1]);
        const [top, bottom] = [value('top'), value('bottom')];
        for (const [, x, y] of body.markup.matchAll(/<circle cx="(-?[\d.]+)" cy="(-?[\d.]+)" r="3.6"/g)) {
          expect(Number(x)).toBeGreaterThanOrEqual(frame.left - 0.1);
          expect(Number(x)).toBeLessThanOrEqual(frame.right + 0.1);
          expect(Number(y)).toBeGreaterThanOrEqual(top - 1.1);
          expect(Number(y)).toBeLessThanOrEqual(bottom + 1.1);
        }
        for (const [, points] of body.markup.matchAll(/<polygon points="([^"]+)" class="f-short/g))
          for (const pair of points!.split(' ')) {
            const [x, y] = pair.split(',').map(Number) as [number, number];
            expect(x).toBeGreaterThan(frame.left - 8);
            expect(x).toBeLessThan(frame.right + 8);
            expect(y).toBeGreaterThan(top - 8);
            expect(y).toBeLessThan(bottom + 8);
          }
        for (const [, y] of body.markup.matchAll(/<text [^>]*y="(-?[\d.]+)"/g)) {
          expect(Number(y)).toBeGreaterThan(0);
          expect(Number(y)).toBeLessThan(height);
        }
        for (const classes of ['thick s-transmission', 'medium s-reflection'])
          for (const points of pathsOf(body.markup, classes)) {
            expect(points[0]![0]).toBeLessThanOrEqual(frame.left + 0.1);
            expect(points.at(-1)![0]).toBeGreaterThanOrEqual(frame.right - 0.1);
          }
      }
    },
  );

  it('the curves of the response are those of the roots, whatever the sweep', () => {
    const { markup } = responsePicture(design).wide.body;
    const [frame, axis] = [frameOf(markup), levelAxis(markup, 0)];
    const [points = []] = pathsOf(markup, 'thick s-transmission');
    // Between two corner points of the path as well: the line itself must be the curve.
    const middles = points
      .slice(1)
      .map(([x, y], n) => [(x + points[n]![0]) / 2, (y + points[n]![1]) / 2] as [number, number]);
    const shown = [...points, ...middles].filter(
      ([x, y]) => x > frame.left && x < frame.right && axis(y) > -45 && axis(y) < -0.5,
    );
    for (const point of shown)
      expect(
        passes((hz) => decibelsAt(design, hz).s21, frame, axis, point),
        `${point}`,
      ).toBe(true);
  });
});

it('a limit is never shown rounded', () => {
  const { wide } = responsePicture(
    sampleDesign({ mask: [{ fromHz: '1.03 GHz', toHz: '1.06 GHz', rejectionDb: 33.9996 }] }),
  );
  expect(wide.body.markup).toContain('of 33.9996 at');
});

it('the label of a wall that the curve runs through stands clear of the curve', () => {
  const design = sampleDesign({
    passband: { lowerHz: '1710 MHz', upperHz: '1785 MHz' },
    order: 8,
    returnLossDb: 21,
    transmissionZeros: [1.18, 1.35, -1.6],
    mask: [
      { fromHz: '1805 MHz', toHz: '1880 MHz', rejectionDb: 70 },
      { toHz: '1690 MHz', rejectionDb: 30 },
    ],
  });
  const { markup } = responsePicture(design).wide.body;
  const [, x, y] = /<text x="([\d.]+)" y="([\d.]+)" class="[^"]*">reject ≥ 70 dB</.exec(markup)!;
  const [points = []] = pathsOf(markup, 'thick s-transmission');
  // A text of this size is at least 80 px wide and 12 px high, its base at y.
  const [left, right, top, bottom] = [Number(x) - 40, Number(x) + 40, Number(y) - 11, Number(y) + 3];
  const along = points.slice(1).flatMap(([bx, by], n) => {
    const [ax, ay] = points[n]!;
    return Array.from({ length: 50 }, (_, k) => [ax + ((bx - ax) * k) / 50, ay + ((by - ay) * k) / 50] as const);
  });
  expect(along.filter(([px, py]) => px > left && px < right && py > top && py < bottom)).toHaveLength(0);
});
