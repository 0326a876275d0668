import { z } from 'zod';
import { dispositionSchema, summarySchema } from '#rules/engine/finding';
import { limits } from '../limits';
import {
  agencyReferenceSchema,
  dateSchema,
  idSchema,
  instantSchema,
  organisationReferenceSchema,
  pageOf,
  personReferenceSchema,
} from './common';
import { endpoint } from './endpoint';
import { sectionSchema } from './projects';

export const revisionStateSchema = z.enum(['draft', 'submitted', 'in review', 'returned', 'withdrawn']);

export const jobSchema = z.strictObject({
  id: idSchema,
  kind: z.string(),
  state: z.enum(['waiting', 'running', 'done', 'failed', 'cancelled']),
  /** "Reading 7 sheets, 3 done." */
  progress: z.string(),
  done: z.number().int(),
  total: z.number().int(),
  /** Why it failed: one sentence with place and remedy. */
  problem: z
    .strictObject({ slug: z.string(), detail: z.string(), fix: z.string(), href: z.string().nullable() })
    .nullable(),
  /** Of what a canceller has to know: it moves when the work is to be cancelled and when it has ended. */
  version: z.number().int(),
});

export const revisionListItemSchema = z.strictObject({
  number: z.number().int(),
  state: revisionStateSchema,
  disposition: dispositionSchema.nullable(),
  submittedAt: instantSchema.nullable(),
  returnedAt: instantSchema.nullable(),
  dueOn: dateSchema.nullable(),
  workingDaysTaken: z.number().int().nullable(),
  summary: summarySchema.nullable(),
  /** "binder content 5.1 to 5.3 %; 14 readings changed" */
  changes: z.string().nullable(),
});

export const submittalListItemSchema = z.strictObject({
  id: idSchema,
  mixDesignation: z.string(),
  description: z.string(),
  project: z.strictObject({ id: idSchema, number: z.string(), title: z.string() }),
  contractor: organisationReferenceSchema,
  agency: agencyReferenceSchema,
  revision: revisionListItemSchema,
  standingApproval: z
    .strictObject({ revision: z.number().int(), disposition: dispositionSchema, on: dateSchema })
    .nullable(),
  doubts: z.number().int(),
  updatedAt: instantSchema,
  /** What the reader would do next, in words. */
  next: z.string(),
});

export const revisionSchema = z.strictObject({
  submittalId: idSchema,
  mixDesignation: z.string(),
  number: z.number().int(),
  state: revisionStateSchema,
  disposition: dispositionSchema.nullable(),
  version: z.number().int(),
  project: z.strictObject({
    id: idSchema,
    number: z.string(),
    title: z.string(),
    lettingOn: dateSchema.nullable(),
  }),
  contractor: organisationReferenceSchema,
  agency: agencyReferenceSchema,
  section: sectionSchema,
  laboratory: z.strictObject({ id: idSchema, name: z.string() }),
  /** "12.5 mm dense-graded surface course · PG 64-22 · 12 million ESAL" */
  description: z.string(),
  revisions: z.array(revisionListItemSchema),
  standingApproval: submittalListItemSchema.shape.standingApproval,
  reasonForRevision: z.string().nullable(),
  workbook: z
    .strictObject({
      fileName: z.string(),
      sha256: z.string(),
      bytes: z.number().int(),
      uploadedBy: z.string(),
      uploadedAt: instantSchema,
    })
    .nullable(),
  /** Workbooks of the draft that a later upload replaced, newest first; the contractor alone sees them. */
  replacedWorkbooks: z.array(
    z.strictObject({
      id: idSchema,
      fileName: z.string(),
      bytes: z.number().int(),
      replacedBy: z.string(),
      replacedAt: instantSchema,
    }),
  ),
  mappingName: z.string().nullable(),
  reviewer: personReferenceSchema.nullable(),
  receivedOn: dateSchema.nullable(),
  dueOn: dateSchema.nullable(),
  workingDaysLeft: z.number().int().nullable(),
  declaration: z.strictObject({ text: z.string(), by: z.string(), at: instantSchema }).nullable(),
  job: jobSchema.nullable(),
  doubts: z.number().int(),
  hasCheck: z.boolean(),
  returned: z.strictObject({ at: instantSchema, disposition: dispositionSchema, by: z.string() }).nullable(),
  abilities: z.strictObject({
    answer: z.boolean(),
    replaceWorkbook: z.boolean(),
    submit: z.boolean(),
    withdraw: z.boolean(),
    startRevision: z.boolean(),
    /** A next revision needs a reason after an approval. */
    revisionNeedsReason: z.boolean(),
    take: z.boolean(),
    giveBack: z.boolean(),
    note: z.boolean(),
    reply: z.boolean(),
    waiveAdvisory: z.boolean(),
    waiveRequired: z.boolean(),
    prepareReturn: z.boolean(),
    sendReturn: z.boolean(),
    checkAgain: z.boolean(),
    seeReturn: z.boolean(),
  }),
});

export const submittalParams = z.strictObject({ submittalId: idSchema });
export const revisionParams = z.strictObject({
  submittalId: idSchema,
  number: z.coerce.number().int().min(0),
});

export const listSubmittals = endpoint({
  method: 'get',
  path: '/api/submittals',
  summary: 'Submittals of the active organisation, newest change first',
  query: z.strictObject({
    state: revisionStateSchema.optional(),
    project: idSchema.optional(),
    q: z.string().max(limits.searchCharacters).optional(),
    cursor: z.string().max(200).optional(),
  }),
  response: pageOf(submittalListItemSchema),
});

export const uploadSubmittal = endpoint({
  method: 'post',
  path: '/api/submittals',
  summary: 'Upload a workbook as revision 0 of a new submittal; answers while it is being read',
  body: z.strictObject({
    projectId: idSchema,
    sectionId: idSchema,
    laboratoryId: idSchema,
    mixDesignation: z
      .string()
      .trim()
      .min(1, 'Enter the mix designation.')
      .max(limits.mixDesignationCharacters),
  }),
  files: ['workbook'],
  response: revisionSchema,
  status: 202,
  idempotent: true,
});

export const getRevision = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number',
  summary: 'A revision: its state, files, clock and what the reader may do',
  params: revisionParams,
  response: revisionSchema,
});

export const getSubmittal = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId',
  summary: 'The latest revision of a submittal that the reader may see',
  params: submittalParams,
  response: revisionSchema,
});

export const startRevision = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions',
  summary: 'Upload a workbook as the next revision; a reason is needed after an approval',
  params: submittalParams,
  body: z.strictObject({
    laboratoryId: idSchema,
    reason: z.string().trim().max(limits.reasonCharacters).optional(),
  }),
  files: ['workbook'],
  response: revisionSchema,
  status: 202,
  idempotent: true,
});

export const replaceWorkbook = endpoint({
  method: 'put',
  path: '/api/submittals/:submittalId/revisions/:number/workbook',
  summary: 'Replace the workbook of a draft; the replaced file stays with the contractor',
  params: revisionParams,
  body: z.strictObject({}),
  files: ['workbook'],
  response: revisionSchema,
  status: 202,
  idempotent: true,
  versioned: true,
});

export const getWorkbook = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/workbook',
  summary: 'The workbook as uploaded, byte for byte',
  params: revisionParams,
  sends: '*/*',
});

export const getReplacedWorkbook = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/replaced-workbooks/:replacedId',
  summary: 'A workbook that a later upload replaced, byte for byte; for the contractor alone',
  params: revisionParams.extend({ replacedId: idSchema }),
  sends: '*/*',
});

export const submitRevision = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions/:number/submission',
  summary: 'Submit: runs the check of record, starts the clock, mails a receipt and word to the reviewers',
  params: revisionParams,
  body: z.strictObject({
    /** The declaration as it was shown, with the doubts, fails and not shown that it lists. */
    declaration: z.string().min(1).max(limits.letterTextCharacters),
    accepted: z.literal(true, 'Tick the declaration before submitting.'),
    seal: z.string(),
  }),
  response: revisionSchema,
  idempotent: true,
  versioned: true,
});

export const withdrawRevision = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions/:number/withdrawal',
  summary: 'Withdraw a submitted revision, or one in review',
  params: revisionParams,
  body: z.strictObject({ reason: z.string().trim().min(1, 'Say why.').max(limits.reasonCharacters) }),
  response: revisionSchema,
  idempotent: true,
  versioned: true,
});

export const takeRevision = endpoint({
  method: 'put',
  path: '/api/submittals/:submittalId/revisions/:number/reviewer',
  summary: 'Take a submitted revision for review',
  params: revisionParams,
  body: z.strictObject({}),
  response: revisionSchema,
  versioned: true,
});

export const giveBackRevision = endpoint({
  method: 'delete',
  path: '/api/submittals/:submittalId/revisions/:number/reviewer',
  summary: 'Give a revision back to the queue',
  params: revisionParams,
  response: revisionSchema,
  versioned: true,
});

export const cancelJob = endpoint({
  method: 'post',
  path: '/api/jobs/:jobId/cancellation',
  summary: 'Cancel long work',
  params: z.strictObject({ jobId: idSchema }),
  response: jobSchema,
  versioned: true,
});

export type Job = z.infer<typeof jobSchema>;
export type Revision = z.infer<typeof revisionSchema>;
export type RevisionListItem = z.infer<typeof revisionListItemSchema>;
export type SubmittalListItem = z.infer<typeof submittalListItemSchema>;
export type RevisionState = z.infer<typeof revisionStateSchema>;
