import { z } from 'zod';
import { explanationSchema } from '#rules/engine/explanation';
import { dispositionSchema, findingSchema, sealSchema, summarySchema } from '#rules/engine/finding';
import { dateSchema, instantSchema } from './common';
import { endpoint } from './endpoint';
import { noteSchema, waiverSchema } from './notes';
import { editionReferenceSchema } from './projects';
import { revisionParams } from './submittals';

/** What a finding was in the revision before, where it moved. */
export const movedSchema = z.strictObject({
  key: z.string(),
  previousOutcome: z.string(),
  previousText: z.string().nullable(),
  previousLimit: z.string().nullable(),
});

export const gradationPointSchema = z.strictObject({
  /** Opening in mm. */
  sieve: z.number(),
  usName: z.string().nullable(),
  passing: z.number(),
  min: z.number().nullable(),
  max: z.number().nullable(),
  outcome: z.string().nullable(),
  sheet: z.string().nullable(),
  cell: z.string().nullable(),
});

export const checkViewSchema = z.strictObject({
  kind: z.enum(['pre-check', 'check of record']),
  madeAt: instantSchema,
  /** The date that was used as the date of submission. */
  submittedOn: dateSchema,
  seal: sealSchema,
  section: z.strictObject({
    base: editionReferenceSchema,
    layers: z.array(editionReferenceSchema),
    state: z.string(),
  }),
  summary: summarySchema,
  findings: z.array(findingSchema),
  /** Why each limit and what would pass, by finding; none for a check of another engine version. */
  explanations: z.record(z.string(), explanationSchema).default({}),
  /** True where there is a room to move to look at. */
  hasRoom: z.boolean().default(false),
  notes: z.array(noteSchema),
  waivers: z.array(waiverSchema),
  /** Findings that moved since the revision before; empty for revision 0. */
  moved: z.array(movedSchema),
  /** Why the check is stale, or null. */
  stale: z.string().nullable(),
  /** The recommendation in words: "Two required rules fail without a waiver, two are not shown." */
  recommendation: z.string(),
  /** True where a shipped starting point was used. */
  startingPoint: z.boolean(),
  /** Groups of clauses with their titles: "412.02" → "Materials". */
  clauseTitles: z.record(z.string(), z.string()),
  gradation: z
    .strictObject({ maximumSizeMm: z.number().nullable(), points: z.array(gradationPointSchema) })
    .nullable(),
  /** Whether there are creep tests to draw. */
  hasCreep: z.boolean(),
  /** The declaration that submitting would show; only for a draft. */
  declaration: z.string().nullable(),
});

export const getCheck = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/check',
  summary: 'The findings of a revision with notes, waivers and what moved since the revision before',
  params: revisionParams,
  response: checkViewSchema,
});

export const checkAgain = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions/:number/checks',
  summary: 'Run a new sealed check; earlier ones are kept',
  params: revisionParams,
  body: z.strictObject({}),
  response: checkViewSchema,
  status: 201,
  idempotent: true,
  versioned: true,
});

export const checkHeadSchema = z.strictObject({
  /** Counts up within the revision; the highest is the one that is shown on its page. */
  number: z.number().int(),
  kind: z.enum(['pre-check', 'check of record']),
  madeAt: instantSchema,
  /** Null where the product itself made it. */
  madeBy: z.string().nullable(),
  /** The date that was used as the date of submission. */
  submittedOn: dateSchema,
  base: editionReferenceSchema,
  layers: z.array(editionReferenceSchema),
  engineVersion: z.string(),
  seal: z.string(),
  /** As it was recommended then, before any waiver. */
  recommended: dispositionSchema,
});

export const listChecks = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/checks',
  summary: 'Every check of a revision that is kept, newest first',
  params: revisionParams,
  response: z.strictObject({ checks: z.array(checkHeadSchema) }),
});

export const getKeptCheck = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/checks/:check',
  summary: 'One check of a revision as it was made, with its findings',
  params: revisionParams.extend({ check: z.coerce.number().int().min(1) }),
  response: checkHeadSchema.extend({
    summary: summarySchema,
    findings: z.array(findingSchema),
    /** True where a shipped starting point was used. */
    startingPoint: z.boolean(),
  }),
});

export const proveSeal = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/check/proof',
  summary: 'Run the stored check again on its own record and edition and compare the seals',
  params: revisionParams,
  response: z.strictObject({
    result: z.enum(['same', 'other engine version', 'different']),
    stored: sealSchema,
    repeated: sealSchema,
  }),
});

export const getFindingsPdf = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/findings.pdf',
  summary: 'The findings as a PDF',
  params: revisionParams,
  sends: 'application/pdf',
});

export const getFindingsWorkbook = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/findings.xlsx',
  summary: 'The findings as a workbook',
  params: revisionParams,
  sends: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
});

export type CheckHead = z.infer<typeof checkHeadSchema>;
export type CheckView = z.infer<typeof checkViewSchema>;
export type Moved = z.infer<typeof movedSchema>;
export type GradationPoint = z.infer<typeof gradationPointSchema>;
