import { spawnSync } from 'node:child_process';
import type { Drawing, Picture } from '../../../../src/report/svg/drawing.js';
import { inlineSvg } from '../../../../src/report/svg/drawing.js';

/** A drawing as it stands in a document. */
export const svgOf = (drawing: Drawing, name = ''): string => inlineSvg(drawing, name, '').markup;

/** Both drawings of a picture. */
export const drawingsOf = ({ wide, narrow }: Picture): readonly Drawing[] => [wide, narrow];

/** All texts of a drawing, entities as they are. */
export function textsOf(drawing: Drawing): string[] {
  return [...drawing.body.markup.matchAll(/<text[^>]*>([^<]*)<\/text>/g)].map((match) => match[1] ?? '');
}

/** Numbers in an attribute of elements of a kind, in the order of the drawing. */
export function attributes(drawing: Drawing, element: string, name: string): string[] {
  const elements = [...drawing.body.markup.matchAll(new RegExp(`<${element}\\b[^>]*>`, 'g'))].map(([text]) => text);
  return elements.map((text) => new RegExp(` ${name}="([^"]*)"`).exec(text)?.[1] ?? '');
}

/** What no drawing may hold; the points of polygons and paths count as text here too. */
export function faultsOf(drawing: Drawing): string[] {
  const { markup } = drawing.body;
  const faults = [...markup.matchAll(/NaN|undefined|Infinity|null|\[object|style=/g)].map(([text]) => text);
  const ids = [...markup.matchAll(/ id="([^"]*)"/g)].map((match) => match[1] ?? '');
  if (new Set(ids).size !== ids.length) faults.push('an id twice');
  if (!(drawing.width > 0 && drawing.height > 0)) faults.push(`size ${drawing.width} x ${drawing.height}`);
  return faults;
}

const PARSER = `
import json, sys
import xml.etree.ElementTree as tree
bad = []
for n, text in enumerate(json.load(sys.stdin)):
    try:
        tree.fromstring(text)
    except tree.ParseError as error:
        bad.append([n, str(error)])
print(json.dumps(bad))
`;

/** What Python's expat finds wrong with documents; nothing for well-formed ones. */
export function xmlFaults(documents: readonly string[]): unknown[] {
  const run = spawnSync('python3', ['-c', PARSER], {
    input: JSON.stringify(documents),
    encoding: 'utf8',
    maxBuffer: 1e8,
  });
  if (run.status !== 0) throw new Error(`python3: ${run.stderr}`);
  return JSON.parse(run.stdout) as unknown[];
}

/** The true minus sign as the hyphen that numbers are read with. */
export const numberOf = (text: string): number => Number(text.replace('−', '-'));
