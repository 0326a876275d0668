import { z } from 'zod';
import { dispositionSchema, findingSchema } from '#rules/engine/finding';
import { limits } from '../limits';
import { dateSchema, idSchema, instantSchema, personReferenceSchema } from './common';
import { endpoint } from './endpoint';
import { noteSchema } from './notes';
import { emailSchema, nameSchema } from './session';
import { revisionParams } from './submittals';

export const recipientSchema = z.strictObject({
  name: nameSchema,
  email: emailSchema,
  function: z.string().max(limits.nameCharacters),
});

/** The letter's order: what to do next. */
export const returnGroupSchema = z.enum(['put right', 'send', 'settle', 'for information']);

export const returnItemSchema = z.strictObject({
  key: z.string(),
  group: returnGroupSchema,
  included: z.boolean(),
  /** False where the letter has to carry it: required fails, not shown, undecided. */
  optional: z.boolean(),
  finding: findingSchema,
  waived: z.string().nullable(),
  notes: z.array(z.string()),
  previousText: z.string().nullable(),
});

export const returnViewSchema = z.strictObject({
  id: idSchema,
  state: z.enum(['draft', 'ready to sign', 'sent']),
  version: z.number().int(),
  disposition: dispositionSchema,
  recommended: dispositionSchema,
  recommendation: z.string(),
  reason: z.string(),
  textAbove: z.string(),
  textBelow: z.string(),
  to: z.array(recipientSchema),
  copies: z.array(recipientSchema),
  items: z.array(returnItemSchema),
  enclosures: z.strictObject({ letter: z.literal(true), findingsWorkbook: z.boolean() }),
  internalNotes: z.number().int(),
  preparedBy: personReferenceSchema.nullable(),
  signingEngineers: z.array(personReferenceSchema),
  sent: z
    .strictObject({
      at: instantSchema,
      by: z.string(),
      mail: z.array(
        z.strictObject({
          to: z.string(),
          state: z.enum(['waiting', 'sent', 'failed']),
          attempts: z.number().int(),
          lastProblem: z.string().nullable(),
        }),
      ),
      letterSha256: z.string(),
      workbookSha256: z.string().nullable(),
    })
    .nullable(),
  savedAt: instantSchema.nullable(),
  abilities: z.strictObject({ change: z.boolean(), makeReady: z.boolean(), send: z.boolean() }),
});

export const getReturn = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/return',
  summary: 'The return of a revision: a draft for the agency; for both once sent',
  params: revisionParams,
  response: returnViewSchema,
});

export const returnFieldsSchema = z.strictObject({
  disposition: dispositionSchema,
  reason: z.string().trim().max(limits.reasonCharacters),
  textAbove: z.string().max(limits.letterTextCharacters),
  textBelow: z.string().max(limits.letterTextCharacters),
  to: z.array(recipientSchema).min(1, 'Name at least one recipient.'),
  copies: z.array(recipientSchema),
  /** Keys of optional items that are included. */
  included: z.array(z.string()),
  findingsWorkbook: z.boolean(),
});

export const changeReturn = endpoint({
  method: 'put',
  path: '/api/submittals/:submittalId/revisions/:number/return',
  summary: 'Keep the draft of a return',
  params: revisionParams,
  body: returnFieldsSchema,
  response: returnViewSchema,
  versioned: true,
});

export const makeReturnReady = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions/:number/return/readiness',
  summary: 'Send the return to a signing engineer',
  params: revisionParams,
  body: z.strictObject({ signingEngineerId: idSchema }),
  response: returnViewSchema,
  idempotent: true,
  versioned: true,
});

export const sendReturn = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions/:number/return/sending',
  summary: 'Decide, sign and send: letter, workbook and mail are stored with the decision',
  params: revisionParams,
  body: z.strictObject({}),
  response: returnViewSchema,
  idempotent: true,
  versioned: true,
});

export const getLetter = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/return/letter.pdf',
  summary: 'The letter: a preview of the draft, or the stored one once sent',
  params: revisionParams,
  sends: 'application/pdf',
});

export const getReturnWorkbook = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/return/findings.xlsx',
  summary: 'The findings workbook of the return',
  params: revisionParams,
  sends: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
});

export const getReturnMail = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/return/mail',
  summary: 'Subject and text of the e-mail that carries the return',
  params: revisionParams,
  response: z.strictObject({ subject: z.string(), text: z.string() }),
});

/** What the contractor is asked, with its own answers. */
export const answerListSchema = z.array(
  z.strictObject({
    note: noteSchema,
    findingTitle: z.string().nullable(),
    clause: z.string().nullable(),
    replies: z.array(noteSchema),
  }),
);

export const listReturnedNotes = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/returned-notes',
  summary: "The agency's returned notes with the contractor's replies",
  params: revisionParams,
  response: z.strictObject({ notes: answerListSchema, sentOn: dateSchema.nullable() }),
});

export type ReturnView = z.infer<typeof returnViewSchema>;
export type ReturnItem = z.infer<typeof returnItemSchema>;
export type ReturnFields = z.infer<typeof returnFieldsSchema>;
export type Recipient = z.infer<typeof recipientSchema>;
