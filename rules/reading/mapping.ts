import { z } from 'zod';
import { conditionsSchema } from '../record';

export const mappingFormat = 'clauseway/mapping@1';

/**
 * Where something stands relative to the value: under or beside a header, at the head of the value's own
 * column, or so many rows below the anchor in that column.
 */
export const referenceSchema = z.union([
  z.strictObject({
    header: z.array(z.string()).min(1),
    unit: z.string().optional(),
    /** Without it the value cannot be understood: an empty cell is a doubt. */
    required: z.boolean().default(false),
  }),
  z.strictObject({ key: z.literal('column') }),
  z.strictObject({ below: z.number().int().positive() }),
]);

const literalOrReference = z.union([z.string(), z.number(), referenceSchema]);

const conditionNames = Object.keys(conditionsSchema.shape);
const documentNames = ['type', 'issuer', 'reference', 'date', 'validTo'];
const atNames = [...conditionNames, ...documentNames, 'method', 'testedOn'];

export const mappingRuleSchema = z.strictObject({
  id: z.string().min(1),
  anchor: z.strictObject({
    /** Null: whichever sheet carries the header. */
    sheet: z.string().nullable(),
    /** Header texts from the top row to the lowest; a unit behind a comma or in brackets may follow each. */
    header: z.array(z.string()).min(1),
    /** Of values beside a label: the heads of the columns that are meant; without it all of them. */
    under: z.array(z.string()).optional(),
    /** Unit that the heading stated when the rule was learned; another one now is a doubt. */
    unit: z.string().nullable().optional(),
    /** Headings before and behind it then: where neither stands there now, it is a doubt that it is the same one. */
    between: z.tuple([z.string().nullable(), z.string().nullable()]).optional(),
    /** How often it stood in the workbook that it was learned from. */
    times: z.number().int().positive().optional(),
  }),
  range: z
    .strictObject({
      /** Rows (or columns, to the right) between the anchor and the first value. */
      skip: z.number().int().nonnegative().default(0),
      /** Most values taken; null as far as the sheet goes. */
      most: z.number().int().positive().nullable().default(null),
    })
    .default({ skip: 0, most: null }),
  /** `down`: values under the anchor; `right`: beside it; `cross`: under each column of a merged anchor. */
  axis: z.enum(['down', 'right', 'cross']),
  /**
   * A quantity's id, where it stands as a reference, `attribute:<name>`, `document`, `label` for text that is
   * furniture of the layout, `not-a-reading`, or a document's date, `document-date:<type>`, `document-validTo:<type>`.
   */
  quantity: z.union([z.string().min(1), referenceSchema]),
  unit: z.union([z.string(), referenceSchema]).nullable().default(null),
  at: z
    .record(z.string(), literalOrReference)
    .refine((at) => Object.keys(at).every((name) => atNames.includes(name)), {
      error: `names a condition that is not known; known are ${atNames.join(', ')}`,
    })
    .default({}),
  /** Conditions that headings and keys seem to state and that do not hold. */
  without: z.array(z.string()).optional(),
  decimal: z.enum(['.', ',']).nullable().default(null),
});

export const mappingSchema = z.strictObject({
  format: z.literal(mappingFormat).default(mappingFormat),
  laboratory: z.string(),
  fingerprint: z.string(),
  version: z.number().int().positive(),
  /** What reads the cells that no rule speaks of: nothing, or their headings as in a layout that nobody described. */
  rest: z.enum(['unused', 'headings']).default('unused'),
  rules: z.array(mappingRuleSchema),
});

export type Mapping = z.infer<typeof mappingSchema>;
export type MappingInput = z.input<typeof mappingSchema>;
export type MappingRule = z.infer<typeof mappingRuleSchema>;
export type MappingReference = z.infer<typeof referenceSchema>;
export type ConditionName = keyof typeof conditionsSchema.shape;

export const attributePrefix = 'attribute:';
export const documentQuantity = 'document';
export const labelQuantity = 'label';
export const notAReading = 'not-a-reading';

export function isReference(value: unknown): value is MappingReference {
  return typeof value === 'object' && value !== null;
}
