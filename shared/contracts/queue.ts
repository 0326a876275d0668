import { z } from 'zod';
import { findingSchema, summarySchema } from '#rules/engine/finding';
import { dateSchema, idSchema, organisationReferenceSchema, personReferenceSchema } from './common';
import { endpoint } from './endpoint';

export const queueItemSchema = z.strictObject({
  submittalId: idSchema,
  mixDesignation: z.string(),
  revision: z.number().int(),
  version: z.number().int(),
  contractor: organisationReferenceSchema,
  project: z.strictObject({ id: idSchema, number: z.string(), title: z.string() }),
  description: z.string(),
  group: z.enum(['late', 'due this week', 'next week and after', 'with the contractor']),
  receivedOn: dateSchema.nullable(),
  dueOn: dateSchema.nullable(),
  workingDaysLeft: z.number().int().nullable(),
  summary: summarySchema.nullable(),
  reviewer: personReferenceSchema.nullable(),
  returnState: z.enum(['draft', 'ready to sign', 'sent']).nullable(),
  /** "revise and resubmit" for those with the contractor. */
  stands: z.string(),
  returnedOn: dateSchema.nullable(),
  abilities: z.strictObject({ take: z.boolean(), giveBack: z.boolean() }),
});

export const getQueue = endpoint({
  method: 'get',
  path: '/api/queue',
  summary: 'The review queue of the active agency by due date',
  query: z.strictObject({
    who: z.enum(['everyone', 'mine', 'not taken', 'to sign']).default('everyone'),
    by: z.enum(['due', 'project']).default('due'),
  }),
  response: z.strictObject({
    today: dateSchema,
    items: z.array(queueItemSchema),
    counts: z.strictObject({
      everyone: z.number().int(),
      mine: z.number().int(),
      notTaken: z.number().int(),
      toSign: z.number().int(),
      late: z.number().int(),
      withContractors: z.number().int(),
    }),
    reviewWorkingDays: z.number().int(),
  }),
});

export const getQueueItem = endpoint({
  method: 'get',
  path: '/api/queue/:submittalId',
  summary: 'At the cursor: what needs looking at, what changed, internal notes',
  params: z.strictObject({ submittalId: idSchema }),
  response: z.strictObject({
    item: queueItemSchema,
    findings: z.array(findingSchema),
    waived: z.array(z.string()),
    changes: z.string().nullable(),
    internalNotes: z.array(z.strictObject({ text: z.string(), by: z.string(), on: dateSchema })),
  }),
});

export type QueueItem = z.infer<typeof queueItemSchema>;
