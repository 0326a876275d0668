import { z } from 'zod';
import { creepCurveSchema, creepFitSchema, masterCurveSchema } from '#rules/engine/creep-analysis';
import { findingSchema, sealSchema } from '#rules/engine/finding';
import { endpoint } from './endpoint';
import { revisionParams } from './submittals';

/** A fitted curve at one time, 1/GPa; a bound that the points do not set is null. */
const sampleSchema = z.strictObject({
  time: z.number(),
  estimate: z.number(),
  lower: z.number().nullable(),
  upper: z.number().nullable(),
});

const describedFitSchema = creepFitSchema
  .omit({ lnParameters: true, covariance: true, covarianceFactor: true, residuals: true, lnCentre: true })
  .extend({ samples: z.array(sampleSchema) });

/** A finding on creep compliance with what it is about, for its flag in the chart. */
export const creepFindingSchema = z.strictObject({
  finding: findingSchema,
  temperature: z.number(),
  time: z.number(),
  stress: z.number().nullable(),
  model: z.enum(['sigmoid', 'power', 'prony']),
  /** Limits in 1/GPa. */
  min: z.number().nullable(),
  max: z.number().nullable(),
  /** Where the value came from: `measured`, `reported`, `fitted`, `extrapolated`; null where there is none. */
  source: z.string().nullable(),
  /** The value before any bound is taken, 1/GPa. */
  estimate: z.number().nullable(),
  /** The curve's band at the rule's time and confidence, 1/GPa. */
  band: z.strictObject({ lower: z.number().nullable(), upper: z.number().nullable() }).nullable(),
  confidence: z.number(),
});

export const creepCurveViewSchema = creepCurveSchema
  .omit({ kind: true, fits: true })
  .extend({ fits: z.array(describedFitSchema), findings: z.array(creepFindingSchema) });

export const masterCurveViewSchema = masterCurveSchema
  .omit({ kind: true, fit: true })
  .extend({ fit: describedFitSchema });

export const creepViewSchema = z.strictObject({
  /** One a temperature, one more for each stress where there are several. */
  curves: z.array(creepCurveViewSchema),
  master: masterCurveViewSchema.nullable(),
  /** Findings at a temperature or stress that no test was made at. */
  others: z.array(creepFindingSchema),
  seal: sealSchema,
  startingPoint: z.boolean(),
});

export const getCreep = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/creep',
  summary:
    'The creep tests of a revision: points, fitted curves with their bands, limits and the master curve',
  params: revisionParams,
  response: creepViewSchema,
});

export type CreepView = z.infer<typeof creepViewSchema>;
export type CreepCurveView = z.infer<typeof creepCurveViewSchema>;
export type MasterCurveView = z.infer<typeof masterCurveViewSchema>;
export type CreepFindingView = z.infer<typeof creepFindingSchema>;
export type CreepFitView = z.infer<typeof describedFitSchema>;
export type CreepSampleView = z.infer<typeof sampleSchema>;
