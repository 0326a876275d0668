import { z } from 'zod';
import { originSchema, sourceSchema } from '../record';

const parameterSchema = z.strictObject({
  /** `D0`, `D∞`, `τ`, `n`; `D1`, `m`; `D0`, `D1`, `D2` … of a Prony series. */
  symbol: z.string(),
  unit: z.string(),
  value: z.number(),
  /** Two-sided at 95 %; null where the points set no bound. */
  low: z.number().nullable(),
  high: z.number().nullable(),
  /** False where no tested point holds it. */
  held: z.boolean(),
});

/** A fitted curve as plain data: its value and band at any time follow from it by `creepBandAt`. */
export const creepFitSchema = z.strictObject({
  model: z.enum(['sigmoid', 'power', 'prony']),
  parameters: z.array(parameterSchema),
  lnParameters: z.array(z.number()),
  covariance: z.array(z.array(z.number())),
  covarianceFactor: z.array(z.array(z.number())),
  retardationTimes: z.array(z.number()),
  lnCentre: z.number(),
  degreesOfFreedom: z.number().int(),
  residualDeviation: z.number(),
  /** In the order of the curve's points. */
  residuals: z.array(z.number()),
  rSquared: z.number(),
  converged: z.boolean(),
  iterations: z.number().int(),
  starts: z.number().int(),
  startsAgreeing: z.number().int(),
  window: z.strictObject({ from: z.number(), to: z.number() }),
  pointCount: z.number().int(),
  timeCount: z.number().int(),
  steep: z.boolean(),
  tauDecadesBeyond: z.number().nullable(),
  rejected: z.string().nullable(),
  /** What the points hold and what they do not, in sentences. */
  words: z.array(z.string()),
});

const pointSchema = z.strictObject({
  specimen: z.string().nullable(),
  /** °C, s, kPa */
  temperature: z.number().nullable(),
  time: z.number(),
  stress: z.number().nullable(),
  /** 1/GPa */
  value: z.number(),
  /** Specimens behind it. */
  count: z.number().int(),
  origin: originSchema,
  /** Its cell, or the first of the cells that it was computed from. */
  source: sourceSchema.nullable(),
});

/** What is looked at before a curve is fitted. */
const remarkSchema = z.strictObject({ holds: z.boolean(), text: z.string() });

/** The compliances at one temperature, under one stress or under all of them together, with their curves. */
export const creepCurveSchema = z.strictObject({
  kind: z.literal('curve'),
  /** °C, to 0.1; null where the readings do not say. */
  temperature: z.number().nullable(),
  /** kPa; null where the levels are taken together or none is stated. */
  stress: z.number().nullable(),
  /** kPa, every level among the points. */
  stresses: z.array(z.number()),
  method: z.string().nullable(),
  specimens: z.array(z.string()),
  points: z.array(pointSchema),
  /** The sigmoid first; a model that the points are too few for is left out. */
  fits: z.array(creepFitSchema),
  remarks: z.array(remarkSchema),
  /** Readings that could not be used, and why no curve is fitted. */
  problems: z.array(z.string()),
});

/** Several temperatures on one curve: D(T, t) = D(reference, t/aT). */
export const masterCurveSchema = z.strictObject({
  kind: z.literal('master-curve'),
  referenceTemperature: z.number(),
  shifts: z.array(
    z.strictObject({
      temperature: z.number(),
      /** log10 aT */
      logShift: z.number(),
      low: z.number().nullable(),
      high: z.number().nullable(),
      overlaps: z.boolean(),
    }),
  ),
  /** In the order of `fit.residuals`, each with its own temperature and its time there, not the shifted one. */
  points: z.array(pointSchema),
  fit: creepFitSchema,
  problems: z.array(z.string()),
});

/** One entry a temperature, one more for each stress where there are several, then the master curve if there is one. */
export const creepAnalysisSchema = z.array(
  z.discriminatedUnion('kind', [creepCurveSchema, masterCurveSchema]),
);

export type CreepCurve = z.infer<typeof creepCurveSchema>;
export type CreepMasterCurve = z.infer<typeof masterCurveSchema>;
export type CreepAnalysis = z.infer<typeof creepAnalysisSchema>;
export type CreepAnalysisPoint = z.infer<typeof pointSchema>;
export type DescribedFit = z.infer<typeof creepFitSchema>;
