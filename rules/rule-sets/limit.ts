import { z } from 'zod';
import { conditionsSchema } from '../record';

/** A number, or a decimal string that keeps its written decimals: `"14.0"`. */
export const writtenNumberSchema = z.union([
  z.number(),
  z.string().regex(/^-?\d+(\.\d+)?$/, 'is not a decimal number such as "14.0"'),
]);

export const tableReferenceSchema = z.strictObject({
  table: z.string(),
  column: z.string(),
  exclusive: z.boolean().optional(),
});

/** The value of another quantity of the same mix, plus a constant. */
export const quantityReferenceSchema = z.strictObject({
  quantity: z.string(),
  at: conditionsSchema.default({}),
  plus: writtenNumberSchema.default(0),
  exclusive: z.boolean().optional(),
});

const exclusiveNumberSchema = z.strictObject({
  value: writtenNumberSchema,
  exclusive: z.boolean().optional(),
});

export const boundSchema = z.union([
  writtenNumberSchema,
  tableReferenceSchema,
  quantityReferenceSchema,
  exclusiveNumberSchema,
]);

export const allowedValueSchema = z.union([z.number(), z.string(), z.boolean()]);

export const limitSchema = z
  .strictObject({
    /** Inclusive unless `exclusive` says otherwise, here for both ends or in the bound itself for one. */
    min: boundSchema.optional(),
    max: boundSchema.optional(),
    exclusive: z.boolean().optional(),
    target: boundSchema.optional(),
    tolerance: boundSchema.optional(),
    oneOf: z.union([z.array(allowedValueSchema).min(1), tableReferenceSchema]).optional(),
    present: z.literal(true).optional(),
  })
  .superRefine((limit, context) => {
    const families = [
      limit.min !== undefined || limit.max !== undefined,
      limit.target !== undefined,
      limit.oneOf !== undefined,
      limit.present !== undefined,
    ].filter(Boolean).length;
    if (families === 0) {
      context.addIssue({ code: 'custom', message: 'sets no limit', params: { fix: LIMIT_CHOICES } });
    } else if (families > 1) {
      context.addIssue({
        code: 'custom',
        message: 'mixes limits that exclude each other',
        params: { fix: LIMIT_CHOICES },
      });
    }
    if ((limit.target === undefined) !== (limit.tolerance === undefined)) {
      context.addIssue({
        code: 'custom',
        message: 'gives a target without a tolerance, or a tolerance without a target',
        params: { fix: 'Give both target and tolerance.' },
      });
    }
  });

/** Ends of an interval that a single value must lie in: `where`, `alsoEach`, `within`. */
export const intervalSchema = z
  .strictObject({ min: boundSchema.optional(), max: boundSchema.optional() })
  .refine((interval) => interval.min !== undefined || interval.max !== undefined, {
    error: 'has neither min nor max',
    params: { fix: 'Give min, max or both.' },
  });

export const roundingSchema = z.strictObject({
  method: z.enum(['rounding', 'absolute', 'half-up', 'truncate']),
  /** A step such as 0.1, `limit` for the limit's own decimals, or a table's column. */
  to: z
    .union([
      z.number().positive(),
      z.literal('limit'),
      z.string().regex(/^\d+(\.\d+)?$/, 'is not a decimal step such as "0.1"'),
      z.strictObject({ table: z.string(), column: z.string() }),
    ])
    .default('limit'),
});

const LIMIT_CHOICES = 'Give min, max or both; or target with tolerance; or oneOf; or present.';

export type WrittenNumber = z.infer<typeof writtenNumberSchema>;
export type Bound = z.infer<typeof boundSchema>;
export type TableReference = z.infer<typeof tableReferenceSchema>;
export type QuantityReference = z.infer<typeof quantityReferenceSchema>;
export type Limit = z.infer<typeof limitSchema>;
