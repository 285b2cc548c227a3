import { describe, expect, it } from 'vitest';
import { sweepHz } from '../../src/index.js';
import {
  csvCell,
  csvText,
  handOverCsv,
  jsonText,
  matrixCsv,
  responseGrid,
  responseText,
  resultJson,
} from '../../src/report/index.js';
import { readTwoPort } from '../measurement/read-two-port.js';
import { fixtureDesign, sampleDesign } from './designs.js';

const rowsOf = (csv: string): string[][] =>
  csv
    .trimEnd()
    .split('\r\n')
    .map((row) => row.split(','));

describe('csvCell(value)', () => {
  it.each(['=1+1', '+1', '-1', '@A1', '\tx', '\rx', '\nx', '＝1', '＋1', '－1', '＠a', '"=1+1', "'=1", '""=1', '＂=1'])(
    'guards the text %j',
    (text) => {
      expect(csvCell(text).replace(/^"/, '')).toMatch(/^'/);
    },
  );

  it.each(['a', '1-2', 'S', '', 'x=1', ' a', '"quoted"'])('leaves the text %j alone', (text) => {
    expect(
      csvCell(text)
        .replaceAll('""', '"')
        .replace(/^"(.*)"$/, '$1'),
    ).toBe(text === '"quoted"' ? '"quoted"' : text);
  });

  it('keeps numbers numbers, with 12 significant digits', () => {
    expect(csvCell(-1.5)).toBe('-1.5');
    expect(csvCell(-0)).toBe('0');
    expect(csvCell(1 / 3)).toBe('0.333333333333');
    expect(csvCell(3839957812.2682543)).toBe('3839957812.27');
    expect(csvCell(null)).toBe('');
  });

  it('quotes as RFC 4180 says', () => {
    expect(csvText([['a,b', 'say "x"', 'two\nlines', 1]])).toBe('"a,b","say ""x""","two\nlines",1\r\n');
  });
});

describe('matrixCsv(matrix)', () => {
  it('holds the matrix of the result to 12 digits, under the names of its nodes', () => {
    const { matrix } = fixtureDesign('tern-quay');
    const [head, ...rows] = rowsOf(matrixCsv(matrix));
    expect(head).toEqual(['node', 'S', '1', '2', '3', '4', '5', 'L']);
    expect(rows.map(([name]) => name)).toEqual(['S', '1', '2', '3', '4', '5', 'L']);
    rows.forEach((row, i) => {
      row.slice(1).forEach((cell, j) => {
        const exact = matrix.values[i]![j]!;
        expect(Math.abs(Number(cell) - exact)).toBeLessThanOrEqual(5e-12 * Math.abs(exact));
      });
    });
  });
});

describe('handOverCsv(design)', () => {
  it('has one row for each resonator, coupling and port, units in the head', () => {
    const [head, ...rows] = rowsOf(handOverCsv(fixtureDesign('larkmoor')));
    expect(head).toContain('coupling bandwidth (Hz)');
    const kinds = rows.map(([kind]) => kind);
    expect(kinds.filter((kind) => kind === 'resonator')).toHaveLength(6);
    expect(kinds.filter((kind) => kind === 'coupling')).toHaveLength(6);
    expect(kinds.filter((kind) => kind === 'port')).toHaveLength(2);
    expect(rows.every((row) => row.length === head!.length)).toBe(true);
    const cross = rows.find(([, from, to]) => from === '2' && to === '5')!;
    expect(Number(cross[4])).toBeCloseTo(-0.001463, 6);
    expect(Number(cross[5])).toBeCloseTo(-5.618e6, -3);
    const port = rows.find(([, from]) => from === 'S')!;
    expect(Number(port[8])).toBeCloseTo(99.46, 2);
    expect(Number(port[9])).toBeCloseTo(16.489e-9, 12);
  });

  it('has a row for the direct coupling, and one for each coupling of a port', () => {
    const direct = rowsOf(handOverCsv(fixtureDesign('brackwater'))).find(([kind]) => kind === 'direct')!;
    expect(direct.slice(1, 3)).toEqual(['S', 'L']);
    expect(Math.abs(Number(direct[3]))).toBeCloseTo(0.07646, 5);
    const transversal = rowsOf(handOverCsv(sampleDesign({ topology: 'transversal' })));
    expect(transversal.filter(([kind]) => kind === 'port')).toHaveLength(8);
  });

  it('gives couplings of a port their external Q, f0/(B*M^2) each alone, and no coupling bandwidth', () => {
    for (const topology of ['folded', 'arrow', 'transversal'] as const) {
      const report = sampleDesign({ topology, transmissionZeros: [1.4, -1.6] });
      const ports = rowsOf(handOverCsv(report)).filter(([kind]) => kind === 'port');
      expect(ports.length).toBeGreaterThan(1);
      for (const [, , , m, k, bandwidth, , , quality] of ports) {
        expect([k, bandwidth]).toEqual(['', '']);
        expect(Number(quality) * 20e6 * Number(m) ** 2).toBeCloseTo(1e9, 0);
      }
    }
  });
});

describe('resultJson(design, source)', () => {
  it('reads back to every digit of the design', () => {
    const design = fixtureDesign('brackwater');
    const read = JSON.parse(resultJson(design, { file: '../brackwater.json', sha256: 'ab' }));
    expect(read.source).toEqual({ file: '../brackwater.json', sha256: 'ab' });
    const { version, source: _, conventions: __, ...rest } = read;
    expect(version).toBe(design.version);
    const { version: ___, ...expected } = JSON.parse(JSON.stringify(design));
    expect(rest).toEqual(expected);
  });

  it('writes a row of a matrix on one line', () => {
    expect(jsonText({ a: [[1, 2], [3]], b: {}, c: [], d: undefined, e: null })).toBe(
      '{\n  "a": [\n    [1, 2],\n    [3]\n  ],\n  "b": {},\n  "c": [],\n  "e": null\n}',
    );
  });
});

describe('responseText(design)', () => {
  it.each(['larkmoor', 'tern-quay', 'brackwater'])('of %s holds what sweepHz gives, to 1e-12', (name) => {
    const design = fixtureDesign(name);
    const { band, unloadedQ } = design.specification;
    const { option, records } = readTwoPort(responseText(design));
    expect(option).toBe('# Hz S RI R 50');
    const grid = records.map(([hertz]) => hertz!);
    const expected = sweepHz(design.matrix, { ...band, unloadedQ: unloadedQ! }, grid);
    let worst = 0;
    records.forEach((record, n) => {
      const { s11, s21, s12, s22 } = expected;
      [s11, s21, s12, s22].forEach(({ re, im }, k) => {
        worst = Math.max(worst, Math.abs(record[1 + 2 * k]! - re[n]!), Math.abs(record[2 + 2 * k]! - im[n]!));
      });
    });
    expect(worst).toBeLessThanOrEqual(1e-12);
  });

  it('says whose response it is, in ASCII', () => {
    const { comments } = readTwoPort(responseText(sampleDesign({ name: 'Größe 7' })));
    expect(comments).toContain('Gr??e 7');
    expect(comments).toContain('lossless');
  });
});

describe('responseGrid(specification)', () => {
  it('is 1001 round frequencies over the band and its mask', () => {
    const grid = responseGrid(fixtureDesign('larkmoor').specification);
    expect(grid).toHaveLength(1001);
    expect(grid.every((hertz) => hertz % 200e3 === 0)).toBe(true);
    expect(grid[0]).toBeLessThanOrEqual(3750e6);
    expect(grid[1000]).toBeGreaterThanOrEqual(3930e6);
  });

  it('reaches the far ends of a mask, and stays above 0 Hz for a wide band', () => {
    const grid = responseGrid(fixtureDesign('brackwater').specification);
    expect(grid[0]).toBeLessThanOrEqual(9800e6);
    expect(grid[1000]).toBeGreaterThanOrEqual(10200e6);
    const wide = responseGrid(sampleDesign({ passband: { centerHz: '1 GHz', bandwidthHz: '1.5 GHz' } }).specification);
    expect(wide[0]).toBeGreaterThan(0);
    expect(wide.every((hertz, n) => n === 0 || hertz > wide[n - 1]!)).toBe(true);
  });

  it('is the sweep that was asked for, both ends exact', () => {
    const sweep = { fromHz: '0.9 GHz', toHz: '1.1 GHz', points: 7 };
    const grid = responseGrid(sampleDesign({ sweep }).specification);
    expect([grid.length, grid[0], grid[6]]).toEqual([7, 0.9e9, 1.1e9]);
  });
});
