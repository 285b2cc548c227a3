import type { Page } from 'playwright-core';
import { PICTURES } from '../reports.js';
import { labelFaultsOf } from './labels.js';
import { badRegionsOf, overflowOf } from './overflow.js';

/** For each picture, which of its two drawings are shown: "wide", "narrow", both, or none. */
export function shownDrawings(page: Page): Promise<readonly string[]> {
  return page.evaluate(
    (names) =>
      names.map((name) => {
        const drawings = [...document.querySelectorAll(`#figure-${name} .drawing > svg`)];
        const shown = drawings.filter((svg) => svg.checkVisibility() && svg.getBoundingClientRect().width > 100);
        return `${name}: ${shown.map((svg) => (svg.classList.contains('wide') ? 'wide' : 'narrow')).join(' ')}`;
      }),
    [...PICTURES],
  );
}

/** Ids that are there twice, and references to ids that are not there. */
export function idFaultsOf(page: Page): Promise<readonly string[]> {
  return page.evaluate(() => {
    const ids = [...document.querySelectorAll('[id]')].map(({ id }) => id);
    const twice = ids.filter((id, n) => ids.indexOf(id) !== n).map((id) => `id twice: ${id}`);
    const wanted = [...document.querySelectorAll('*')].flatMap((element) =>
      [...element.attributes].flatMap(({ name, value }) => {
        if (/^aria-(labelledby|describedby|controls)$/.test(name) || name === 'for') return value.split(' ');
        if (/href$/.test(name)) return value.startsWith('#') ? [value.slice(1)] : [];
        return [...value.matchAll(/url\(["']?#([^)"']+)/g)].map((match) => match[1] as string);
      }),
    );
    const known = new Set(ids);
    return [...twice, ...wanted.filter((id) => !known.has(id)).map((id) => `id not there: ${id}`)];
  });
}

/**
 * Everything wrong with the way a document stands in its window or on its paper. Letters have 10.5 px at least on a screen, 7
 * points on paper.
 */
export async function layoutFaultsOf(page: Page, medium: 'screen' | 'paper'): Promise<readonly string[]> {
  const drawings = (await shownDrawings(page)).filter((shown) => !/: (wide|narrow)$/.test(shown));
  const labels = await labelFaultsOf(page, medium === 'screen' ? 10.5 : (7 * 96) / 72);
  return [
    ...drawings.map((shown) => `drawings of ${shown}`),
    ...(await idFaultsOf(page)),
    ...(await overflowOf(page)).map((fault) => `sticks out: ${fault}`),
    ...(medium === 'screen' ? await badRegionsOf(page) : []),
    ...labels.small.map((fault) => `small: ${fault}`),
    ...labels.outside.map((fault) => `leaves its drawing: ${fault}`),
    ...labels.overlaps.map((fault) => `overlap: ${fault}`),
    ...(labels.texts < 40 ? [`only ${labels.texts} texts in drawings`] : []),
  ];
}
