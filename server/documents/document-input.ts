import { z } from 'zod';
import { explanationSchema } from '#rules/engine/explanation';
import { dispositionSchema, findingSchema, sealSchema, summarySchema } from '#rules/engine/finding';
import { roomWordsSchema } from '#rules/engine/room-words';
import { letterheadSchema } from '#shared/contracts/organisation';
import { recipientSchema, returnGroupSchema } from '#shared/contracts/returns';
import { creepWordsSchema } from './creep-words';

/**
 * What a letter, a findings workbook or a mail is rendered from. It is frozen with the decision, so that a
 * document can be told from its input years later. Internal notes never enter it.
 */
export const documentItemSchema = z.strictObject({
  group: returnGroupSchema,
  finding: findingSchema,
  waivedBecause: z.string().nullable(),
  notes: z.array(z.string()),
  previousText: z.string().nullable(),
  /** What would pass, in one sentence; empty where none can be computed. */
  toPass: z.string().default(''),
});

export const documentInputSchema = z.strictObject({
  kind: z.enum(['return', 'pre-check', 'check of record']),
  agency: z.strictObject({ name: z.string(), letterhead: letterheadSchema }),
  contractor: z.string(),
  project: z.strictObject({ number: z.string(), title: z.string() }),
  mixDesignation: z.string(),
  mixDescription: z.string(),
  revision: z.number().int(),
  /** Calendar dates in the agency's zone. */
  date: z.iso.date(),
  submittedOn: z.iso.date().nullable(),
  section: z.string(),
  disposition: dispositionSchema.nullable(),
  reason: z.string(),
  textAbove: z.string(),
  textBelow: z.string(),
  to: z.array(recipientSchema),
  copies: z.array(recipientSchema),
  signedBy: z.strictObject({ name: z.string(), function: z.string() }).nullable(),
  summary: summarySchema,
  waivedCount: z.number().int(),
  items: z.array(documentItemSchema),
  /** Every finding, for the workbook. */
  findings: z.array(findingSchema),
  generalNotes: z.array(z.string()),
  seal: sealSchema,
  checkedOn: z.iso.date(),
  startingPoint: z.boolean(),
  enclosesWorkbook: z.boolean(),
  /** Why each limit and what would pass, by finding, for the workbook. */
  explanations: z.record(z.string(), explanationSchema).default({}),
  room: roomWordsSchema.nullable().default(null),
  creep: creepWordsSchema.nullable().default(null),
});

export type DocumentInput = z.infer<typeof documentInputSchema>;
export type DocumentItem = z.infer<typeof documentItemSchema>;
