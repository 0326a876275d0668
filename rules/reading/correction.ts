import { z } from 'zod';
import { conditionsSchema } from '../record';

const conditionNameSchema = z.enum(
  Object.keys(conditionsSchema.shape) as [
    keyof typeof conditionsSchema.shape,
    ...(keyof typeof conditionsSchema.shape)[],
  ],
);

/** What a person says that cells are. */
export const saidSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('reading'),
    quantity: z.string().min(1, 'Choose a quantity.').max(80),
    /** In which the cells state it; null where the headings or the cells say so themselves. */
    unit: z.string().min(1).max(40).nullable().default(null),
    /** These win; whatever else the row and the column say of the value stays. */
    at: conditionsSchema.default({}),
    /** Conditions that the row or the column seems to say and that do not hold. */
    without: z.array(conditionNameSchema).default([]),
  }),
  z.strictObject({ kind: z.literal('attribute'), name: z.string().min(1, 'Choose an attribute.').max(120) }),
  z.strictObject({
    kind: z.literal('document date'),
    type: z.string().min(1, 'Choose the kind of document.').max(80),
    part: z.enum(['date', 'validTo']).default('date'),
  }),
  z.strictObject({ kind: z.literal('not a reading') }),
]);

/** What a rectangular block of cells is; it holds for the workbook that it was said of. */
export const correctionSchema = z.strictObject({
  /** `""` in a text table. */
  sheet: z.string().max(120),
  /** `C5` or `C5:D14` */
  range: z.string().regex(/^[A-Z]{1,3}[1-9]\d{0,6}(:[A-Z]{1,3}[1-9]\d{0,6})?$/, 'Write a range as C5:D14.'),
  says: saidSchema,
});

export type Said = z.infer<typeof saidSchema>;
export type Correction = z.infer<typeof correctionSchema>;
