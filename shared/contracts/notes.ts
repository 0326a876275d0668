import { z } from 'zod';
import { limits } from '../limits';
import { idSchema, instantSchema } from './common';
import { endpoint } from './endpoint';
import { organisationKindSchema } from './roles';
import { revisionParams } from './submittals';

/** `internal` stays in the writer's organisation; `to be returned` goes with the return; `reply` answers one. */
export const noteKindSchema = z.enum(['internal', 'to be returned', 'reply']);

export const noteSchema = z.strictObject({
  id: idSchema,
  /** `ruleId~subject`; null for a note on the whole submittal. */
  finding: z.string().nullable(),
  kind: noteKindSchema,
  side: organisationKindSchema,
  text: z.string(),
  by: z.string(),
  at: instantSchema,
  revision: z.number().int(),
  answers: idSchema.nullable(),
  version: z.number().int(),
  abilities: z.strictObject({ change: z.boolean(), remove: z.boolean(), reply: z.boolean() }),
});

export const waiverSchema = z.strictObject({
  id: idSchema,
  finding: z.string(),
  reason: z.string(),
  toBeReturned: z.boolean(),
  by: z.string(),
  at: instantSchema,
  version: z.number().int(),
  abilities: z.strictObject({ remove: z.boolean() }),
});

const noteText = z.string().trim().min(1, 'Write the note first.').max(limits.noteCharacters);

export const writeNote = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions/:number/notes',
  summary: 'Write a note on a finding or on the whole submittal',
  params: revisionParams,
  body: z.strictObject({
    finding: z.string().max(300).nullable(),
    kind: noteKindSchema,
    text: noteText,
    answers: idSchema.nullable().default(null),
  }),
  response: noteSchema,
  status: 201,
  idempotent: true,
});

export const changeNote = endpoint({
  method: 'patch',
  path: '/api/notes/:noteId',
  summary: 'Change a note that has not been sent',
  params: z.strictObject({ noteId: idSchema }),
  body: z.strictObject({ kind: noteKindSchema, text: noteText }),
  response: noteSchema,
  versioned: true,
});

export const removeNote = endpoint({
  method: 'delete',
  path: '/api/notes/:noteId',
  summary: 'Remove a note that has not been sent',
  params: z.strictObject({ noteId: idSchema }),
  status: 204,
  versioned: true,
});

export const waive = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions/:number/waivers',
  summary: 'Waive a failing finding with a reason; the outcome stays fail',
  params: revisionParams,
  body: z.strictObject({
    finding: z.string().max(300),
    reason: z.string().trim().min(1, 'Give the reason.').max(limits.reasonCharacters),
    toBeReturned: z.boolean(),
  }),
  response: waiverSchema,
  status: 201,
  idempotent: true,
});

export const removeWaiver = endpoint({
  method: 'delete',
  path: '/api/waivers/:waiverId',
  summary: 'Take a waiver back before the return is sent',
  params: z.strictObject({ waiverId: idSchema }),
  status: 204,
  versioned: true,
});

export type Note = z.infer<typeof noteSchema>;
export type NoteKind = z.infer<typeof noteKindSchema>;
export type Waiver = z.infer<typeof waiverSchema>;
