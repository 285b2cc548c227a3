import { approximationLaws } from './approximation-laws.js';
import type { Law } from './law.js';
import { matrixLaws } from './matrix-laws.js';
import { responseLaws } from './response-laws.js';
import { rotationLaws } from './rotation-laws.js';

export const LAWS: readonly Law[] = [...approximationLaws, ...matrixLaws, ...rotationLaws, ...responseLaws];
