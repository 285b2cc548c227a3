import * as z from 'zod';
import type { SpecificationInput } from './specification.js';
import { VOCABULARY } from './vocabulary.js';

/** Attaches the meaning of a key, and what JSON Schema can say of its range, to a schema. */
function described<Schema extends z.ZodType>(schema: Schema, key: string, more: Record<string, unknown> = {}): Schema {
  return schema.meta({ description: VOCABULARY[key]?.meaning ?? key, ...more });
}

function frequency(key: string): z.ZodUnion<readonly [z.ZodNumber, z.ZodString]> {
  return described(z.union([z.number(), z.string()]), key);
}

function level(key: string): z.ZodUnion<readonly [z.ZodNumber, z.ZodTuple<[z.ZodNumber, z.ZodNumber], null>]> {
  return described(z.union([z.number(), z.tuple([z.number(), z.number()])]), key);
}

const nonNegative = { minimum: 0 };
const quality = z.number().meta({ exclusiveMinimum: 0 });

const passband = described(
  z.strictObject({
    lowerHz: frequency('lowerHz').optional(),
    upperHz: frequency('upperHz').optional(),
    centerHz: frequency('centerHz').optional(),
    bandwidthHz: frequency('bandwidthHz').optional(),
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
  fromHz: frequency('fromHz').optional(),
  toHz: frequency('toHz').optional(),
  relativeTo: described(z.literal('center'), 'relativeTo').optional(),
  rejectionDb: level('rejectionDb').optional(),
  returnLossDb: level('returnLossDb').optional(),
  insertionLossDb: level('insertionLossDb').optional(),
  insertionLossVariationDb: described(z.number(), 'insertionLossVariationDb', nonNegative).optional(),
  groupDelayVariationSeconds: described(z.number(), 'groupDelayVariationSeconds', nonNegative).optional(),
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
export const specificationSchema: z.ZodType<SpecificationInput> = z.strictObject({
  $schema: described(z.string(), '$schema').optional(),
  name: described(z.string(), 'name', { maxLength: 120 }).optional(),
  notes: described(z.string(), 'notes', { maxLength: 1000 }).optional(),
  revision: described(z.string(), 'revision', { maxLength: 20 }).optional(),
  date: described(z.string(), 'date', { format: 'date' }).optional(),
  passband,
  family: described(z.enum(['generalizedChebyshev', 'chebyshev', 'butterworth']), 'family', {
    default: 'generalizedChebyshev',
  }).optional(),
  order: described(z.number(), 'order', { type: 'integer', minimum: 1, maximum: 100 }),
  returnLossDb: described(z.number(), 'returnLossDb', { minimum: 0.01, maximum: 100 }).optional(),
  transmissionZeros: described(z.array(zero), 'transmissionZeros', { default: [], maxItems: 100 }).optional(),
  topology: described(z.enum(['folded', 'arrow', 'inline', 'transversal']), 'topology', {
    default: 'folded',
  }).optional(),
  portCouplings: described(z.enum(['any', 'noDirect', 'single']), 'portCouplings', { default: 'any' }).optional(),
  unloadedQ: described(z.union([quality, z.array(quality)]), 'unloadedQ').optional(),
  mask: described(z.array(maskLine), 'mask', { default: [] }).optional(),
  sweep: described(sweep, 'sweep').optional(),
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
