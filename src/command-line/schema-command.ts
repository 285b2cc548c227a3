import { jsonText } from '../report/index.js';
import { specificationJsonSchema } from '../specification/index.js';
import type { CommandShape, CommandWords } from './arguments.js';
import { EXIT } from './failures.js';
import type { World } from './world.js';

/** What `irisloom schema` accepts. */
export const SCHEMA_SHAPE: CommandShape = { operands: [], options: {} };

/** The JSON Schema of a design file as text. */
export function schemaText(): string {
  return `${jsonText(specificationJsonSchema())}\n`;
}

/** `irisloom schema`: prints the JSON Schema of a design file. */
export async function schemaCommand(_words: CommandWords, world: World): Promise<number> {
  world.stdout.write(schemaText());
  return EXIT.done;
}
