import { describe, expect, it } from 'vitest';
import type { Design } from '../../../src/index.js';
import { reportHtml, reportMarkdown } from '../../../src/report/index.js';
import { fixtureDesign, sampleDesign } from '../designs.js';
import { attributeOf, byId, type Element, elementsOf, parsed, textOf } from './tree.js';

const SOURCE = { file: '../one.json', sha256: '0123456789abcdef'.repeat(4) };
const LINE = { fromHz: '1.03 GHz', rejectionDb: 20 } as const;

const DESIGNS: readonly (readonly [string, () => Design])[] = [
  ['larkmoor', () => fixtureDesign('larkmoor')],
  ['brackwater', () => fixtureDesign('brackwater')],
  ['no mask, no loss, no name', () => sampleDesign({})],
  ['one resonator', () => sampleDesign({ order: 1, unloadedQ: 2000 })],
  ['half-power edges', () => sampleDesign({ family: 'butterworth', returnLossDb: undefined, mask: [LINE] })],
  ['transversal', () => sampleDesign({ order: 5, transmissionZeros: [1.5], topology: 'transversal', unloadedQ: 9e3 })],
  ['order 20', () => sampleDesign({ order: 20, transmissionZeros: [1.2, -1.4], mask: [LINE], unloadedQ: 9e3 })],
  ['a band in kHz', () => sampleDesign({ passband: { centerHz: '455 kHz', bandwidthHz: '10 kHz' } })],
];

const REFERENCES = ['aria-labelledby', 'aria-describedby', 'aria-controls', 'for', 'headers'];

function named(all: readonly Element[], tagName: string): readonly Element[] {
  return all.filter((each) => each.tagName === tagName);
}

describe.each(DESIGNS)('the document of %s', (_, make) => {
  const html = reportHtml(make(), SOURCE);
  const tree = parsed(html);
  const all = elementsOf(tree);
  const ids = all.flatMap((each) => attributeOf(each, 'id') ?? []);

  it('has each id once, and every reference resolves', () => {
    expect(ids.length).toBeGreaterThan(20);
    expect(ids.filter((id, n) => ids.indexOf(id) !== n)).toEqual([]);
    const told = all.flatMap(({ attrs }) =>
      attrs.flatMap(({ name, value }) => {
        if (REFERENCES.includes(name)) return value.split(' ');
        if (name === 'href') return [value.slice(1)];
        return [...value.matchAll(/url\(#([^)]*)\)/g)].map((match) => match[1]!);
      }),
    );
    expect(told.length).toBeGreaterThan(10);
    expect(told.filter((id) => !ids.includes(id))).toEqual([]);
  });

  it('has a language, a title, one first head, and no level left out', () => {
    expect(attributeOf(named(all, 'html')[0]!, 'lang')).toBe('en');
    expect(textOf(named(all, 'title')[0]!).length).toBeGreaterThan(10);
    const levels = all.filter(({ tagName }) => /^h[1-6]$/.test(tagName)).map(({ tagName }) => Number(tagName[1]));
    expect(levels.filter((level) => level === 1)).toHaveLength(1);
    expect(levels[0]).toBe(1);
    expect(levels.filter((level, n) => n > 0 && level > levels[n - 1]! + 1)).toEqual([]);
    expect(named(all, 'main')).toHaveLength(1);
  });

  it('lets no sheet, stack, list or table be empty', () => {
    for (const name of ['section', 'div', 'ul', 'table', 'tbody', 'figure', 'p', 'li', 'h2', 'h3'])
      for (const each of named(all, name))
        if (attributeOf(each, 'hidden') === undefined) expect(textOf(each).trim(), name).not.toBe('');
    const sheets = named(all, 'section')
      .slice(1)
      .map((each) => attributeOf(each, 'id'));
    expect(sheets).toEqual(['band-in-detail', 'network', 'hand-over', 'evidence']);
  });

  it('names the columns and rows of every table, and what scrolls can be reached', () => {
    for (const table of named(all, 'table')) {
      const inner = elementsOf(table);
      expect(inner[0]?.tagName).toBe('caption');
      const rows = named(inner, 'tr').map((row) => elementsOf(row).filter(({ tagName }) => /^t[hd]$/.test(tagName)));
      expect(new Set(rows.map((row) => row.length)).size).toBe(1);
      expect(rows[0]?.every((cell) => cell.tagName === 'th' && attributeOf(cell, 'scope') === 'col')).toBe(true);
      for (const [first, ...rest] of rows.slice(1)) {
        expect(attributeOf(first!, 'scope')).toBe('row');
        expect(rest.every(({ tagName }) => tagName === 'td')).toBe(true);
      }
    }
    const regions = all.filter((each) => attributeOf(each, 'class') === 'scroll');
    expect(regions.length).toBeGreaterThan(2);
    for (const region of regions) {
      expect(['role', 'tabindex'].map((name) => attributeOf(region, name))).toEqual(['region', '0']);
      expect(textOf(byId(tree, attributeOf(region, 'aria-labelledby')!))).not.toBe('');
    }
  });

  it('gives every picture a text, and hides what repeats one', () => {
    for (const svg of named(all, 'svg')) {
      if (attributeOf(svg, 'aria-hidden') === 'true') continue;
      expect(attributeOf(svg, 'role')).toBe('img');
      expect(attributeOf(svg, 'aria-label')!.length).toBeGreaterThan(20);
    }
    for (const figure of named(all, 'figure')) {
      const drawings = named(elementsOf(figure), 'svg').map((svg) => attributeOf(svg, 'class'));
      expect(drawings).toEqual(['pic wide', 'pic narrow']);
      expect(named(elementsOf(figure), 'figcaption')).toHaveLength(1);
    }
    const numbers = all.filter((each) => attributeOf(each, 'class') === 'number').map(textOf);
    expect(numbers).toEqual(numbers.map((__, n) => String(n + 1)));
  });

  it('holds no number that is none, and true minus signs', () => {
    const words = named(all, 'body')
      .map(textOf)
      .join('')
      .replace(textOf(named(all, 'script').at(-1)!), '');
    expect(words).not.toMatch(/NaN|Infinity|undefined|\[object|null/);
    for (const cell of named(all, 'td')) expect(textOf(cell)).not.toMatch(/(^|[\s(])-\d|[<>]=/);
  });

  it('is the same twice, and so is its Markdown', () => {
    expect(reportHtml(make(), SOURCE)).toBe(html);
    expect(reportMarkdown(make(), SOURCE)).toBe(reportMarkdown(make(), SOURCE));
  });
});

function all(tree: Parameters<typeof byId>[0], cssClass: string): readonly Element[] {
  return elementsOf(tree).filter((each) => attributeOf(each, 'class')?.split(' ').includes(cssClass) === true);
}

describe('what a document says', () => {
  it('title strip: what is stated, and that revision or date is not', () => {
    const full = textOf(
      parsed(reportHtml(sampleDesign({ name: 'Heron', revision: 'B2', date: '2026-12-01' }), SOURCE)),
    );
    for (const part of ['Heron', 'RevisionB2', 'Date2026-12-01', 'Input digest0123456789ab', 'Made withirisloom'])
      expect(full).toContain(part);
    expect(full).toContain(SOURCE.sha256);
    const bare = textOf(parsed(reportHtml(sampleDesign({}))));
    expect(bare).toContain('Unnamed design');
    for (const part of ['Revisionnot stated', 'Datenot stated']) expect(bare).toContain(part);
    for (const part of ['Input digest', 'SHA-256']) expect(bare).not.toContain(part);
  });

  it('lists twenty of many requirements, ten of them on paper, and counts the others; all stand in the next sheet', () => {
    const lists = (count: number, rejectionDb?: number) => {
      const lines = Array.from({ length: count }, (_, n) => ({
        fromHz: 1.02e9 + n * 1e6,
        rejectionDb: rejectionDb ?? 12 + n,
      }));
      const tree = parsed(reportHtml(sampleDesign({ mask: lines })));
      const rows = (id: string) => named(elementsOf(byId(tree, id)), 'tr').slice(1);
      const isExtra = (row: Element): boolean => attributeOf(row, 'class')?.split(' ').includes('on-screen') === true;
      const notes = all(tree, 'note').map((each) => [attributeOf(each, 'class'), textOf(each)]);
      const listed = rows('requirements');
      return { counts: [listed.length, listed.filter(isExtra).length, rows('mask-points').length], notes };
    };
    expect(lists(10).counts).toEqual([10, 0, 10]);
    const { counts, notes } = lists(23);
    expect(counts).toEqual([20, 10, 23]);
    const clear = 'more requirements are clear by a larger share of the limit; all stand in Band in detail.';
    expect(notes).toContainEqual(['note on-screen', `3 ${clear}`]);
    expect(notes).toContainEqual(['note on-paper', `13 ${clear}`]);
    const missed = lists(13, 90);
    expect(missed.counts).toEqual([13, 3, 13]);
    expect(missed.notes).toContainEqual([
      'note on-paper',
      '3 more requirements miss their limit by a smaller share; all stand in Band in detail.',
    ]);
  });

  it('a miss: the word short, the bar, an octagon', () => {
    const tree = parsed(reportHtml(sampleDesign({ mask: [LINE, { fromHz: '1.012 GHz', rejectionDb: 60 }] })));
    const verdicts = elementsOf(tree).filter((each) => attributeOf(each, 'class')?.split(' ').includes('verdict'));
    expect(verdicts.map((each) => attributeOf(each, 'class'))).toEqual(['verdict short']);
    const rows = named(elementsOf(byId(tree, 'requirements')), 'tr');
    expect(rows.map((row) => /short/.test(textOf(row)))).toEqual([false, false, true]);
    expect(named(elementsOf(rows[2]!), 'polygon')).toHaveLength(1);
    expect(named(elementsOf(rows[1]!), 'polygon')).toHaveLength(0);
  });

  it('a clearance that would round to zero has more digits', () => {
    const measured = sampleDesign({ mask: [{ ...LINE, rejectionDb: 1 }] }).mask[0]!.predicted;
    const tight = sampleDesign({ mask: [{ ...LINE, rejectionDb: measured - 0.003 }] });
    expect(textOf(byId(parsed(reportHtml(tight)), 'requirements'))).toContain('0.003');
  });

  it('a switch for lossless curves only where there are both', () => {
    const boxes = (design: Design) => named(elementsOf(parsed(reportHtml(design))), 'input');
    const [box] = boxes(sampleDesign({ unloadedQ: 3000 }));
    expect(['type', 'id', 'checked'].map((name) => attributeOf(box!, name))).toEqual(['checkbox', 'show-lossless', '']);
    expect(boxes(sampleDesign({}))).toEqual([]);
  });

  it('a slope: both of its ends', () => {
    const slope = { fromHz: '1.03 GHz', toHz: '1.05 GHz', rejectionDb: [20, 30.5] as [number, number] };
    const text = textOf(byId(parsed(reportHtml(sampleDesign({ mask: [slope] }))), 'mask-points'));
    expect(text).toContain('20 → 30.5');
  });

  it('power: no number is a safety clearance', () => {
    const text = textOf(parsed(reportHtml(sampleDesign({}))));
    for (const word of ['No number here is a safety clearance', 'Multipaction', 'corona', 'heating', 'licensed staff'])
      expect(text).toContain(word);
  });
});

describe('size and time of a document', () => {
  const { specification } = fixtureDesign('larkmoor');
  const large = sampleDesign({
    passband: { lowerHz: '3822 MHz', upperHz: '3858 MHz' },
    order: 14,
    returnLossDb: 22,
    transmissionZeros: [1.2, -1.2, 1.4, -1.35, 1.6, -2],
    unloadedQ: 9000,
    mask: specification.mask,
    sweep: { fromHz: '3740 MHz', toHz: '3940 MHz', points: 2001 },
  });

  it('of order 14 with 2001 points: below 500 kB, and below 150 ms', () => {
    const times = Array.from({ length: 7 }, () => {
      const from = performance.now();
      const size = Buffer.byteLength(reportHtml(large, SOURCE));
      expect(size).toBeLessThan(500_000);
      return [performance.now() - from, size] as const;
    });
    const best = Math.min(...times.map(([time]) => time));
    console.log(`order 14, 2001 points: ${times[0]![1]} bytes, ${best.toFixed(1)} ms`);
    expect(best).toBeLessThan(150);
  });
});
