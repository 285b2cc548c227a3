import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { edgesOfBand } from '../../src/index.js';
import { type Paint, summaryText } from '../../src/report/index.js';
import { fixtureDesign, sampleDesign } from './designs.js';

const golden = readFileSync(new URL('./tern-quay.txt', import.meta.url), 'utf8');
const tagged: Paint = {
  strong: (text) => `<b>${text}</b>`,
  dim: (text) => `<d>${text}</d>`,
  alarm: (text) => `<a>${text}</a>`,
};

/** The share of the limits used is rounding noise, which differs between machines. */
const withoutNoise = (text: string): string => text.replace(/none beyond \d+ %/, 'none beyond X %');

describe('summaryText(design)', () => {
  it('of a fixture is this text', () => {
    expect(withoutNoise(summaryText(fixtureDesign('tern-quay')))).toBe(withoutNoise(golden));
  });

  it.each([
    [
      'larkmoor',
      ['27.08', '26.61', '36.31', '99.46', '16.489', '+0.008118', '+31.172', '-0.001463', '-5.618', '-0.1561'],
    ],
    [
      'tern-quay',
      ['32.72', '45.75', '28.22', '21.69', '58.56', '14.695', '2554.729', '2535.665', '-0.8454', '+0.4990'],
    ],
    ['brackwater', ['30.89', '16.89', '249.1', '+0.0765', '+0.8217', '+0.8181', '-0.3866', '+1.0018']],
  ])('of %s shows the known numbers', (name, numbers) => {
    const text = summaryText(fixtureDesign(name));
    for (const number of numbers) expect(text).toContain(number);
    expect(text).toContain('Meets all 9 requirements.');
    expect(text).toMatch(/Certificates: (\d+) of \1 hold/);
  });

  it.each([
    ['order 1', { order: 1 }],
    ['order 8, leading zeros dropped', { order: 8, transmissionZeros: [1.3, -1.3] }],
    ['order 10, matrix in two pieces', { order: 10, transmissionZeros: [1.2, 1.3, -1.4], topology: 'arrow' as const }],
    ['order 40', { order: 40, transmissionZeros: [1.5] }],
    ['transversal', { order: 5, transmissionZeros: [1.5], topology: 'transversal' as const }],
    ['a long name', { name: 'filter '.repeat(17).trim() }],
    ['a wide high band', { passband: { centerHz: '77.123456 GHz', bandwidthHz: '20 GHz' } }],
    ['many remarks', { unloadedQ: 50, passband: { centerHz: '1 GHz', bandwidthHz: '1 MHz' }, returnLossDb: 46 }],
    [
      'a mask with wide numbers',
      {
        mask: [
          { fromHz: '1234.567 MHz', toHz: '1345.678 MHz', rejectionDb: 20, relativeTo: 'center' as const },
          { fromHz: '991.234567 MHz', toHz: '1008.7654321 MHz', groupDelayVariationSeconds: 1e-12 },
        ],
      },
    ],
  ])('stays within 80 columns for %s', (_, more) => {
    const lines = summaryText(sampleDesign(more)).split('\n');
    expect(lines.filter((line) => line.length > 80)).toEqual([]);
    expect(lines.filter((line) => line.endsWith(' '))).toEqual([]);
  });

  it('lists the external Q of each coupling where a port touches several resonators', () => {
    const report = sampleDesign({ order: 5, topology: 'arrow', transmissionZeros: [1.4, -1.6, 2] });
    const text = summaryText(report);
    const own = report.matrix.values[6]!.slice(1, -1).flatMap((m, n) => (m === 0 ? [] : [{ m, n }]));
    expect(own.length).toBeGreaterThan(2);
    for (const { m, n } of own) {
      // f0/B is 50.
      const quality = (50 / (m * m)).toPrecision(4).replace(/\.$/, '');
      const sign = m < 0 ? '-' : '+';
      const line = new RegExp(`^load +${n + 1} +${quality} +\\${sign}${Math.abs(m).toFixed(4)}$`, 'm');
      if (Number(quality) < 1e4) expect(text).toMatch(line);
    }
    expect(text).toContain('taken alone');
    expect(text).not.toMatch(/several$/m);
    expect(text).not.toMatch(/^ *\d+-L /m);
    expect(summaryText(sampleDesign({}))).not.toContain('taken alone');
  });

  it('puts a missed requirement first and in words, with the sign of alarm', () => {
    const mask = [
      { fromHz: '1011 MHz', rejectionDb: 60 },
      { fromHz: '900 MHz', toHz: '900 MHz', rejectionDb: 20 },
    ];
    const text = summaryText(sampleDesign({ mask }), tagged);
    expect(text.replaceAll('</a>\n<a>', ' ')).toMatch(
      /<a>Misses 1 of 2 requirements\. Farthest off for its limit: rejection at and above 1011 MHz, short by \d/,
    );
    expect(text.match(/<a>rejection, dB +>= 1011 .*short by +\d+\.\d\d +1011\.000<\/a>/)).not.toBeNull();
  });

  it('counts a requirement that is met to rounding as met', () => {
    const { lowerHz, upperHz } = edgesOfBand({ centerHz: 1e9, bandwidthHz: 20e6 });
    const mask = [{ fromHz: lowerHz, toHz: upperHz, returnLossDb: 20 }];
    expect(summaryText(sampleDesign({ mask }))).toContain('Meets the only requirement.');
  });

  it('says that there is no mask, and shows no table', () => {
    const text = summaryText(sampleDesign({}));
    expect(text).toContain('No mask was given');
    expect(text).not.toContain('predicted');
  });

  it('says where a worst point has no frequency', () => {
    const mask = [{ fromHz: '1.2 GHz', rejectionDb: 80 }];
    const zeros = [1.5, 2, -1.5, -2];
    expect(summaryText(sampleDesign({ mask, transmissionZeros: zeros }))).toContain('far above the band');
  });

  it('shows the tightest 20 of many requirements and counts the others', () => {
    const mask = Array.from({ length: 30 }, (_, n) => ({ fromHz: 1.05e9 + n * 1e6, rejectionDb: 10 + n }));
    const text = summaryText(sampleDesign({ mask }));
    expect(text.match(/^rejection, dB/gm)).toHaveLength(20);
    expect(text).toContain('(10 requirements with more room not shown; all are in result.json)');
  });

  it('warns of a wide band, and always that no number is a safety clearance', () => {
    const wide = summaryText(sampleDesign({ passband: { centerHz: '1 GHz', bandwidthHz: '201 MHz' } }));
    expect(wide).toContain('Caution: the band is 20.1 % wide');
    const narrow = summaryText(sampleDesign({}));
    expect(narrow).not.toContain('Caution');
    expect(narrow.replace(/\s+/g, ' ')).toContain('not a safety clearance.');
  });

  it('repeats what the reader of the design file remarked', () => {
    const text = summaryText(sampleDesign({ returnLossDb: 46 }));
    expect(text).toContain('Remark: ');
  });
});

describe('texts of a caller', () => {
  it('bring no escape sequence, direction mark or line break to the terminal', () => {
    const made = sampleDesign({ name: 'x' });
    const specification = { ...made.specification, name: 'a\u001b[2Jb\u202ec\u0007\nd', remarks: ['e\u001b]0;f'] };
    const text = summaryText({ ...made, specification });
    // biome-ignore lint/suspicious/noControlCharactersInRegex: what must not be there
    expect(text).not.toMatch(/[\u0000-\u0009\u000b-\u001f\u202e]/);
    expect(text.split('\n')[0]).toBe('a\ufffd[2Jb\ufffdc\ufffd d');
  });
});

describe('delays of a narrow band', () => {
  it('have a unit of their size in the ports table too', () => {
    const text = summaryText(sampleDesign({ passband: { centerHz: '450 kHz', bandwidthHz: '5 kHz' } }));
    expect(text).toContain('reflected delay, µs');
    expect(text).toMatch(/^source +1 +[\d.]+ +(?:[1-9]\d{1,2})\.\d{3} /m);
  });
});

describe('families that place their own zeros', () => {
  it('are named with the levels of both bands', () => {
    const text = summaryText(sampleDesign({ family: 'elliptic', order: 5, rejectionDb: 50 }));
    expect(text).toContain('Order 5, folded, elliptic, return loss 20 dB, stop band 50 dB, lossless');
    const byEdge = summaryText(sampleDesign({ family: 'elliptic', order: 5, stopBandEdge: 1.25 }));
    expect(byEdge).toContain('elliptic, return loss 20 dB, stop band from w = 1.25, lossless');
  });
});
