import * as z from 'zod/mini';
import type { SpecificationInput } from './specification.js';
import { VOCABULARY } from './vocabulary.js';

/** Attaches the meaning of a key, and what JSON Schema can say of its range, to a schema. */
function described<Schema extends z.ZodMiniType>(
  schema: Schema,
  key: string,
  more: Record<string, unknown> = {},
): Schema {
  return schema.check(z.meta({ description: VOCABULARY[key]?.meaning ?? key, ...more }));
}

function frequency(key: string): z.ZodMiniUnion<readonly [z.ZodMiniNumber, z.ZodMiniString]> {
  return described(z.union([z.number(), z.string()]), key);
}

function level(
  key: string,
): z.ZodMiniUnion<readonly [z.ZodMiniNumber, z.ZodMiniTuple<[z.ZodMiniNumber, z.ZodMiniNumber], null>]> {
  return described(z.union([z.number(), z.tuple([z.number(), z.number()])]), key);
}

const FAMILIES = [
  'generalizedChebyshev',
  'chebyshev',
  'butterworth',
  'inverseChebyshev',
  'elliptic',
  'bessel',
] as const;

const nonNegative = { minimum: 0 };
const quality = z.number().check(z.meta({ exclusiveMinimum: 0 }));

const passband = described(
  z.strictObject({
    lowerHz: z.optional(frequency('lowerHz')),
    upperHz: z.optional(frequency('upperHz')),
    centerHz: z.optional(frequency('centerHz')),
    bandwidthHz: z.optional(frequency('bandwidthHz')),
  }),
  'passband',
  { oneOf: [{ required: ['lowerHz', 'upperHz'] }, { required: ['centerHz', 'bandwidthHz'] }] },
);

const zero = z.union([
  z.number(),
  z.string(),
  z.strictObject({ re: described(z.number(), 're'), im: described(z.number(), 'im') }),
]);

const maskLine = z.strictObject({
  fromHz: z.optional(frequency('fromHz')),
  toHz: z.optional(frequency('toHz')),
  relativeTo: z.optional(described(z.literal('center'), 'relativeTo')),
  rejectionDb: z.optional(level('rejectionDb')),
  returnLossDb: z.optional(level('returnLossDb')),
  insertionLossDb: z.optional(level('insertionLossDb')),
  insertionLossVariationDb: z.optional(described(z.number(), 'insertionLossVariationDb', nonNegative)),
  groupDelayVariationSeconds: z.optional(described(z.number(), 'groupDelayVariationSeconds', nonNegative)),
});

const sweep = z.strictObject({
  fromHz: frequency('fromHz'),
  toHz: frequency('toHz'),
  points: described(z.number(), 'points', { type: 'integer', minimum: 2, maximum: 100_001 }),
});

/**
 * Structure of a design file: types, shapes and keys. Ranges stand here for the JSON Schema only; the rules that need
 * more than one value, or wording of their own, are checked after it.
 */
export const specificationSchema: z.ZodMiniType<SpecificationInput> = z.strictObject({
  $schema: z.optional(described(z.string(), '$schema')),
  name: z.optional(described(z.string(), 'name', { maxLength: 120 })),
  notes: z.optional(described(z.string(), 'notes', { maxLength: 1000 })),
  revision: z.optional(described(z.string(), 'revision', { maxLength: 20 })),
  date: z.optional(described(z.string(), 'date', { format: 'date' })),
  passband,
  family: z.optional(described(z.enum(FAMILIES), 'family', { default: 'generalizedChebyshev' })),
  order: described(z.number(), 'order', { type: 'integer', minimum: 1, maximum: 100 }),
  returnLossDb: z.optional(described(z.number(), 'returnLossDb', { minimum: 0.01, maximum: 100 })),
  rejectionDb: z.optional(described(z.number(), 'rejectionDb', { minimum: 0.1, maximum: 300 })),
  stopBandEdge: z.optional(described(z.number(), 'stopBandEdge', { exclusiveMinimum: 1, maximum: 10_000 })),
  largestPairAtInfinity: z.optional(described(z.boolean(), 'largestPairAtInfinity', { default: false })),
  reflectionSide: z.optional(
    described(z.enum(['left', 'right', 'alternating']), 'reflectionSide', { default: 'left' }),
  ),
  transmissionZeros: z.optional(described(z.array(zero), 'transmissionZeros', { default: [], maxItems: 100 })),
  topology: z.optional(
    described(z.enum(['folded', 'arrow', 'inline', 'transversal']), 'topology', { default: 'folded' }),
  ),
  portCouplings: z.optional(described(z.enum(['any', 'noDirect', 'single']), 'portCouplings', { default: 'any' })),
  unloadedQ: z.optional(described(z.union([quality, z.array(quality)]), 'unloadedQ')),
  mask: z.optional(described(z.array(maskLine), 'mask', { default: [] })),
  sweep: z.optional(described(sweep, 'sweep')),
});

/**
 * The JSON Schema (draft 2020-12) of a design file, with the meaning and unit of every key, for editors.
 *
 * It describes types, keys and single-value ranges; rules between values are checked by `checkSpecification` only.
 *
 * @returns a fresh plain object
 * @example
 * Object.keys(specificationJsonSchema()).includes('properties'); // true
 */
export function specificationJsonSchema(): object {
  return z.toJSONSchema(specificationSchema, { io: 'input', target: 'draft-2020-12' });
}
