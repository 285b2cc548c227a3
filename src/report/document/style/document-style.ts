import { COLORS } from './colors.js';
import { FIGURES } from './figures.js';
import { PAGE } from './page.js';
import { PRINT_RULES } from './print.js';
import { TABLES } from './tables.js';

/** The one style of the document; its digest stands in the policy. */
export const DOCUMENT_STYLE: string = [COLORS, PAGE, TABLES, FIGURES, PRINT_RULES].join('\n');
