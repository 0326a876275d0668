import { z } from 'zod';

/** Where a value came from in the workbook. A `.csv` has the sheet name `""`. */
export const sourceSchema = z.strictObject({
  sheet: z.string(),
  cell: z.string(),
  text: z.string(),
});

export const originSchema = z.enum([
  'measured',
  'reported',
  'typed',
  'recomputed',
  'fitted',
  'interpolated',
  'extrapolated',
  'converted',
]);

export const qualifierSchema = z.enum(['<', '>', 'none', 'non-plastic']);

/** Conditions of a reading; only those that the workbook states are recorded. */
export const conditionsSchema = z.strictObject({
  trial: z.string().optional(),
  blend: z.string().optional(),
  variant: z.string().optional(),
  specimen: z.string().optional(),
  stockpile: z.string().optional(),
  /** Opening in mm. */
  sieve: z.number().positive().optional(),
  gyrations: z.union([z.number().int().nonnegative(), z.enum(['initial', 'design', 'maximum'])]).optional(),
  /** °C */
  temperature: z.number().optional(),
  /** Loading time in s. */
  time: z.number().nonnegative().optional(),
  /** kPa */
  stress: z.number().optional(),
  passes: z.number().nonnegative().optional(),
  /** Hz */
  frequency: z.number().nonnegative().optional(),
  aging: z.string().optional(),
  laboratory: z.enum(['contractor', 'agency']).optional(),
});

const typedSchema = z.strictObject({ by: z.string(), on: z.string() });

export const readingSchema = z.strictObject({
  quantity: z.string(),
  /** In the quantity's canonical unit. Null only with the qualifiers `none` and `non-plastic`. */
  value: z.number().nullable(),
  qualifier: qualifierSchema.optional(),
  unit: z.string(),
  at: conditionsSchema.default({}),
  method: z.string().optional(),
  origin: originSchema,
  testedOn: z.iso.date().optional(),
  typed: typedSchema.optional(),
  source: sourceSchema.nullable().default(null),
});

export const attributeValueSchema = z.strictObject({
  value: z.union([z.number(), z.string(), z.boolean()]),
  unit: z.string().optional(),
  origin: originSchema,
  typed: typedSchema.optional(),
  source: sourceSchema.nullable().default(null),
});

export const documentRecordSchema = z.strictObject({
  type: z.string(),
  issuer: z.string().nullable().default(null),
  reference: z.string().nullable().default(null),
  date: z.iso.date().nullable().default(null),
  validTo: z.iso.date().nullable().default(null),
  /** True where the document's own file is attached. */
  enclosed: z.boolean().default(false),
  source: sourceSchema.nullable().default(null),
});

/** A cell that could not be read with certainty; unanswered it makes a fact doubtful. */
export const doubtSchema = z.strictObject({
  sheet: z.string(),
  cell: z.string(),
  text: z.string(),
  reason: z.string(),
  /** What the cell may mean; the answer names one by its `answer` or is `leave out`. */
  alternatives: z.array(
    z.strictObject({
      answer: z.string(),
      label: z.string(),
      reading: readingSchema.optional(),
      attribute: z.strictObject({ name: z.string(), value: attributeValueSchema }).optional(),
      document: documentRecordSchema.optional(),
    }),
  ),
  /** What the doubt is about, where that is known, so that the engine can call the fact doubtful. */
  about: z
    .strictObject({
      quantity: z.string().optional(),
      at: conditionsSchema.optional(),
      attribute: z.string().optional(),
      document: z.string().optional(),
    })
    .default({}),
});

export const mixRecordSchema = z.strictObject({
  attributes: z.record(z.string(), attributeValueSchema).default({}),
  readings: z.array(readingSchema).default([]),
  documents: z.array(documentRecordSchema).default([]),
  /** Doubts without an answer. They are part of the record because they can make a finding undecided. */
  doubts: z.array(doubtSchema).default([]),
});

export type Source = z.infer<typeof sourceSchema>;
export type Origin = z.infer<typeof originSchema>;
export type Conditions = z.infer<typeof conditionsSchema>;
export type Reading = z.infer<typeof readingSchema>;
export type AttributeValue = z.infer<typeof attributeValueSchema>;
export type DocumentRecord = z.infer<typeof documentRecordSchema>;
export type Doubt = z.infer<typeof doubtSchema>;
export type MixRecord = z.infer<typeof mixRecordSchema>;
/** What people and files write: defaults may be left out. */
export type MixRecordInput = z.input<typeof mixRecordSchema>;

export interface CheckContext {
  /** Calendar dates, `2026-03-09`, or null where not known. */
  submittedOn: string | null;
  lettingOn: string | null;
  /** Attributes that the project states, used where the record has none. */
  facts: Record<string, number | string | boolean>;
}
