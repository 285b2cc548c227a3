import { writeFileSync } from 'node:fs';
import { schemaText } from './schema-command.js';

// Run by the build from dist/command-line: puts design-file.schema.json into dist.
writeFileSync(new URL('../design-file.schema.json', import.meta.url), schemaText());
