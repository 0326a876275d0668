import { z } from 'zod';
import { conditionsSchema, originSchema, readingSchema, sourceSchema } from '../record';
import { creepAnalysisSchema } from './creep-analysis';
import { roomToMoveSchema } from './room';

export const outcomeSchema = z.enum(['pass', 'fail', 'not shown', 'undecided', 'not applicable']);
export const severitySchema = z.enum(['required', 'advisory']);

/** One step of the thread from a finding down to the cell. */
export interface Evidence {
  quantity: string;
  /** Null for a qualifier without a number, a document or a categorical attribute. */
  value: number | null;
  /** What stands instead of a number: `non-plastic`, a binder grade, a document's date. */
  text?: string | undefined;
  unit: string;
  at?: z.infer<typeof conditionsSchema> | undefined;
  origin: z.infer<typeof originSchema>;
  method?: string | undefined;
  /** The formula in trade symbols, `100 − Gmb·Ps/Gsb`; absent for what was read. */
  formula?: string | undefined;
  /** The formula's symbol for this value. */
  symbol?: string | undefined;
  /** What the workbook itself reports for a recomputed value. */
  reported?: { value: number; text: string; source: z.infer<typeof sourceSchema> | null } | undefined;
  inputs?: Evidence[] | undefined;
  source: z.infer<typeof sourceSchema> | null;
}

export const evidenceSchema: z.ZodType<Evidence> = z.lazy(() =>
  z.strictObject({
    quantity: z.string(),
    value: z.number().nullable(),
    text: z.string().optional(),
    unit: z.string(),
    at: conditionsSchema.optional(),
    origin: originSchema,
    method: z.string().optional(),
    formula: z.string().optional(),
    symbol: z.string().optional(),
    reported: z
      .strictObject({ value: z.number(), text: z.string(), source: sourceSchema.nullable() })
      .optional(),
    inputs: z.array(evidenceSchema).optional(),
    source: sourceSchema.nullable(),
  }),
);

export const observedSchema = z.strictObject({
  /** Unrounded; null for categorical values and documents. */
  value: z.number().nullable(),
  /** The value that was judged, after the rule's own rounding. */
  rounded: z.number().nullable(),
  /** The judged value as it is written, in the rule's decimals: `13.9`, `PG 64-22`, `2 February 2026`. */
  text: z.string(),
  unit: z.string(),
  statistic: z.string(),
  count: z.number().int(),
});

export const resolvedLimitSchema = z.strictObject({
  min: z.number().nullable(),
  max: z.number().nullable(),
  minExclusive: z.boolean().default(false),
  maxExclusive: z.boolean().default(false),
  target: z.number().nullable().default(null),
  tolerance: z.number().nullable().default(null),
  oneOf: z.array(z.string()).nullable().default(null),
  /** Decimals that the limit is written with, for figures under the ticks. */
  decimals: z.number().int().nonnegative().default(0),
  unit: z.string(),
  /** Which document supplied the limit, and the table row it came from. */
  from: z
    .strictObject({
      document: z.string(),
      table: z.string().nullable(),
      tableTitle: z.string().nullable(),
      row: z.record(z.string(), z.string()).nullable(),
      /** What a layer displaced: the earlier document and its limit in words. */
      displaced: z.array(z.strictObject({ document: z.string(), text: z.string() })),
    })
    .nullable()
    .default(null),
});

export const findingSchema = z.strictObject({
  rule: z.string(),
  clause: z.string().nullable(),
  title: z.string(),
  subject: z.string(),
  severity: severitySchema,
  outcome: outcomeSchema,
  borderline: z.boolean(),
  /** Measure kind of the rule, or `consistency`. */
  kind: z.string(),
  observed: observedSchema.nullable(),
  limit: resolvedLimitSchema.nullable(),
  margin: z.number().nullable(),
  /** The rule in general terms, naming its table. */
  ruleSentence: z.string(),
  /** The limits resolved for this mix: "Voids in the mineral aggregate are at least 14.0 %." */
  requirement: z.string(),
  /** Value, then limit: "Voids in the mineral aggregate are 13.9 %, at least 14.0." */
  sentence: z.string(),
  /** Why the outcome is what it is: what is missing, what is doubtful, which condition is false, what would decide it. */
  reason: z.string(),
  /** Of an undecided finding: the act that would decide it. Null in checks by engines that did not say. */
  wouldDecide: z.string().nullable().default(null),
  /** How the statistic was rounded, in words: "13.94 becomes 13.9: ASTM E29, rounding method, to 0.1". */
  roundingSentence: z.string().nullable(),
  /** ± precision used for borderline; null where there is none, and its origin in words. */
  precision: z.strictObject({ value: z.number(), origin: z.string() }).nullable(),
  advice: z.string().nullable(),
  source: z.string().nullable(),
  /** Gauge: registry's span, and whether the scale is logarithmic. */
  gauge: z.strictObject({ span: z.number(), scale: z.enum(['linear', 'log']) }).nullable(),
  evidence: z.array(evidenceSchema),
});

export const dispositionSchema = z.enum(['approved', 'approved as noted', 'revise and resubmit', 'rejected']);

export const summarySchema = z.strictObject({
  pass: z.number().int(),
  fail: z.number().int(),
  notShown: z.number().int(),
  undecided: z.number().int(),
  notApplicable: z.number().int(),
  /** Passes and fails that carry the mark. */
  borderline: z.number().int(),
  /** Consistency findings that fail. */
  doesNotAddUp: z.number().int(),
  recommended: dispositionSchema,
});

export const sealSchema = z.strictObject({
  seal: z.string(),
  record: z.string(),
  resolvedEdition: z.string(),
  context: z.string(),
  engineVersion: z.string(),
  engine: z.string(),
  findings: z.string(),
});

export const recomputedReadingSchema = readingSchema.extend({
  formula: z.string(),
  inputs: z.array(evidenceSchema),
  reported: z.number().nullable(),
});

export const checkResultSchema = z.strictObject({
  analysis: z.strictObject({
    recomputed: z.array(recomputedReadingSchema),
    designPoint: z
      .strictObject({
        declaredBinderContent: z.number().nullable(),
        computedBinderContent: z.number().nullable(),
        targetAirVoids: z.number(),
        fit: z.string(),
      })
      .nullable(),
    /** Null where the edition chose no rules for it, and in checks by engines that did not compute it. */
    roomToMove: roomToMoveSchema.nullable(),
    /** Empty where there is no creep test, and in checks by engines that did not compute it. */
    creep: creepAnalysisSchema,
  }),
  summary: summarySchema,
  findings: z.array(findingSchema),
  seal: sealSchema,
});

export type Outcome = z.infer<typeof outcomeSchema>;
export type Severity = z.infer<typeof severitySchema>;
export type Finding = z.infer<typeof findingSchema>;
export type ResolvedLimit = z.infer<typeof resolvedLimitSchema>;
export type Observed = z.infer<typeof observedSchema>;
export type Disposition = z.infer<typeof dispositionSchema>;
export type Summary = z.infer<typeof summarySchema>;
export type Seal = z.infer<typeof sealSchema>;
export type RecomputedReading = z.infer<typeof recomputedReadingSchema>;
export type CheckResult = z.infer<typeof checkResultSchema>;

/** A finding's key: rule id and subject. */
export function findingKey(finding: Pick<Finding, 'rule' | 'subject'>): string {
  return `${finding.rule}~${finding.subject}`;
}
