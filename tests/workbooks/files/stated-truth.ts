import { z } from 'zod';
import { conditionsSchema } from '#rules/record';

const statedReadingSchema = z.object({
  quantity: z.string(),
  value: z.number().nullable(),
  unit: z.string(),
  at: conditionsSchema,
  qualifier: z.string().optional(),
  may: conditionsSchema.optional(),
  sheet: z.string(),
  cell: z.string(),
});

/** What a careful quality manager takes from one of the files. */
export const statedTruthSchema = z.object({
  file: z.string(),
  readings: z.array(statedReadingSchema),
  optional: z.array(statedReadingSchema),
  attributes: z.record(z.string(), z.union([z.string(), z.number(), z.boolean()])),
  documents: z.array(
    z.object({ type: z.string(), date: z.string().nullish(), validTo: z.string().nullish() }),
  ),
});

export type StatedTruth = z.infer<typeof statedTruthSchema>;
export type StatedReading = z.infer<typeof statedReadingSchema>;
