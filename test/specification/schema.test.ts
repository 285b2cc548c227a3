import { describe, expect, it } from 'vitest';
import { specificationJsonSchema } from '../../src/specification/index.js';

interface Node {
  readonly description?: string;
  readonly properties?: Readonly<Record<string, Node>>;
  readonly items?: Node;
  readonly required?: readonly string[];
  readonly additionalProperties?: boolean;
}

/** Every property of a schema with its path. */
function propertiesOf(node: Node, path = ''): readonly (readonly [string, Node])[] {
  const own = Object.entries(node.properties ?? {}).flatMap(([key, inner]) => [
    [`${path}${key}`, inner] as const,
    ...propertiesOf(inner, `${path}${key}.`),
  ]);
  return node.items === undefined ? own : [...own, ...propertiesOf(node.items, path)];
}

describe('specificationJsonSchema()', () => {
  const schema = specificationJsonSchema() as Node;

  it('describes every key', () => {
    const properties = propertiesOf(schema);
    expect(properties.length).toBeGreaterThan(25);
    for (const [path, node] of properties) expect([path, node.description?.length ?? 0]).not.toEqual([path, 0]);
  });

  it('names the unit of every quantity', () => {
    for (const [path, node] of propertiesOf(schema)) {
      if (path.endsWith('Hz')) expect(node.description).toContain('hertz');
      if (path.endsWith('Db')) expect(node.description).toContain('dB');
      if (path.endsWith('Seconds')) expect(node.description).toContain('seconds');
    }
  });

  it('states what is required and shuts out unknown keys', () => {
    expect(schema.required).toEqual(['passband', 'order']);
    expect(schema.additionalProperties).toBe(false);
    expect(schema.properties?.order).toMatchObject({ type: 'integer', minimum: 1, maximum: 100 });
  });

  it('is a fresh plain object each time', () => {
    expect(specificationJsonSchema()).toEqual(schema);
    expect(specificationJsonSchema()).not.toBe(schema);
    expect(JSON.parse(JSON.stringify(schema))).toEqual(schema);
  });
});
