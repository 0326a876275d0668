import { z } from 'zod';
import { findingSchema, summarySchema } from '#rules/engine/finding';
import { dateSchema, idSchema } from './common';
import { endpoint } from './endpoint';
import { noteSchema } from './notes';
import { projectListItemSchema } from './projects';
import { revisionListItemSchema, submittalListItemSchema } from './submittals';

export const homeSchema = z.strictObject({
  submittals: z.array(submittalListItemSchema),
  /** The draft, or else the newest revision, that is nearest to being sent; with its findings to look at. */
  current: z
    .strictObject({
      submittalId: idSchema,
      mixDesignation: z.string(),
      /** The agency's, in which its dates are told. */
      timeZone: z.string(),
      revision: z.number().int(),
      state: z.string(),
      heading: z.string(),
      changes: z.string().nullable(),
      summary: summarySchema,
      findings: z.array(
        z.strictObject({
          finding: findingSchema,
          previousText: z.string().nullable(),
          previousOutcome: z.string().nullable(),
        }),
      ),
      canSubmit: z.boolean(),
      history: z.array(revisionListItemSchema),
    })
    .nullable(),
  fromAgency: z.array(
    noteSchema.extend({ submittalId: idSchema, mixDesignation: z.string(), clause: z.string().nullable() }),
  ),
  lastLetter: z
    .strictObject({
      submittalId: idSchema,
      revision: z.number().int(),
      on: dateSchema,
      workbook: z.boolean(),
    })
    .nullable(),
  projects: z.array(projectListItemSchema),
  laboratories: z.array(z.strictObject({ name: z.string(), note: z.string() })),
  templates: z.array(z.strictObject({ label: z.string(), href: z.string() })),
  abilities: z.strictObject({ upload: z.boolean() }),
});

export const getHome = endpoint({
  method: 'get',
  path: '/api/home',
  summary: "A contractor's home: what stands where, what to do next, what the agency wrote",
  response: homeSchema,
});

export type Home = z.infer<typeof homeSchema>;
