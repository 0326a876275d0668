import { z } from 'zod';
import { conditionsSchema } from '../record';
import { intervalSchema, writtenNumberSchema } from './limit';

export const statisticSchema = z.enum([
  'mean',
  'each',
  'min',
  'max',
  'range',
  'standard-deviation',
  'trimmed-mean',
  'count',
  'percent-within-limits',
]);

export const whereSchema = z
  .strictObject({
    quantity: z.string(),
    at: conditionsSchema.default({}),
    min: intervalSchema.shape.min,
    max: intervalSchema.shape.max,
  })
  .refine((where) => where.min !== undefined || where.max !== undefined, {
    error: 'has neither min nor max',
    params: { fix: 'Give min, max or both.' },
  });

const whereField = { where: z.array(whereSchema).optional() };

export const readingMeasureSchema = z.strictObject({
  kind: z.literal('reading'),
  quantity: z.string(),
  at: conditionsSchema.default({}),
  statistic: statisticSchema.default('mean'),
  within: intervalSchema.optional(),
  minimumCount: z.number().int().positive().optional(),
  alsoEach: intervalSchema.optional(),
  ...whereField,
});

export const gradationMeasureSchema = z.strictObject({
  kind: z.literal('gradation'),
  at: conditionsSchema.default({}),
  table: z.string(),
  ...whereField,
});

export const creepComplianceMeasureSchema = z.strictObject({
  kind: z.literal('creep-compliance'),
  /** °C */
  temperature: z.number(),
  /** Loading time in s. */
  time: z.number().positive(),
  /** kPa; all levels pooled where left out. */
  stress: z.number().positive().optional(),
  source: z.enum(['measured', 'fitted', 'either']).default('either'),
  model: z.enum(['sigmoid', 'power', 'prony']).default('sigmoid'),
  extrapolationDecades: z.number().nonnegative().default(0),
  use: z.enum(['estimate', 'upper', 'lower']).optional(),
  confidence: z.number().gt(0).lt(1).default(0.95),
  ...whereField,
});

export const formulaMeasureSchema = z.strictObject({
  kind: z.literal('formula'),
  expression: z.string().min(1),
  at: conditionsSchema.default({}),
  unit: z.string().optional(),
  ...whereField,
});

export const differenceMeasureSchema = z.strictObject({
  kind: z.literal('difference'),
  quantity: z.string(),
  between: z.union([
    z.tuple([z.literal('contractor'), z.literal('agency')]),
    z.tuple([z.literal('reported'), z.literal('recomputed')]),
  ]),
  statistic: statisticSchema.default('mean'),
  ...whereField,
});

export const attributeMeasureSchema = z.strictObject({
  kind: z.literal('attribute'),
  attribute: z.string(),
  ...whereField,
});

export const documentMeasureSchema = z.strictObject({
  kind: z.literal('document'),
  type: z.string(),
  /** False: a stated document suffices. */
  enclosed: z.boolean().default(false),
  maximumAgeMonths: z.number().int().positive().optional(),
  on: z.union([z.enum(['submitted', 'letting']), z.iso.date()]).optional(),
  ...whereField,
});

export const measureSchema = z.discriminatedUnion('kind', [
  readingMeasureSchema,
  gradationMeasureSchema,
  creepComplianceMeasureSchema,
  formulaMeasureSchema,
  differenceMeasureSchema,
  attributeMeasureSchema,
  documentMeasureSchema,
]);

/** ± precision of a result: within it of the nearest limit a finding is borderline. */
export const precisionSchema = z.strictObject({
  value: writtenNumberSchema,
  source: z.string().nullable().optional(),
  origin: z.enum(['read', 'derived', 'memory', 'agency']).default('agency'),
});

export type Statistic = z.infer<typeof statisticSchema>;
export type Where = z.infer<typeof whereSchema>;
export type Measure = z.infer<typeof measureSchema>;
export type ReadingMeasure = z.infer<typeof readingMeasureSchema>;
export type GradationMeasure = z.infer<typeof gradationMeasureSchema>;
export type FormulaMeasure = z.infer<typeof formulaMeasureSchema>;
export type DifferenceMeasure = z.infer<typeof differenceMeasureSchema>;
export type AttributeMeasure = z.infer<typeof attributeMeasureSchema>;
export type DocumentMeasure = z.infer<typeof documentMeasureSchema>;
export type CreepComplianceMeasure = z.infer<typeof creepComplianceMeasureSchema>;
