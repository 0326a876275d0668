import { z } from 'zod';
import { doubtSchema, mixRecordSchema } from '../record';

/** A cell that holds something and was not used, with a reason from a closed list. */
export const unreadSchema = z.strictObject({
  sheet: z.string(),
  cell: z.string(),
  text: z.string(),
  reason: z.string(),
});

/** What one cell was taken for, for the reading page's tints. */
export const cellUseSchema = z.strictObject({
  sheet: z.string(),
  cell: z.string(),
  use: z.enum(['read', 'doubt', 'unused', 'label']),
  /** "Gmb, trial B, specimen 3 · measured, AASHTO T 166" */
  taken: z.string(),
});

/** An answer to one doubt. It belongs to its revision and holds while the cell's text is unchanged. */
export const answerSchema = z.strictObject({
  sheet: z.string(),
  cell: z.string(),
  text: z.string(),
  answer: z.string(),
});

/** Where a workbook is not as the layout that its mapping was learned from. */
export const departureSchema = z.strictObject({
  /** Id of the mapping's rule. */
  rule: z.string(),
  kind: z.enum(['gone', 'moved', 'unit']),
  /** Where it shows; null where a heading is nowhere to be found. */
  sheet: z.string().nullable(),
  cell: z.string().nullable(),
  /** "The heading “Bulk SG” is nowhere in this workbook." */
  text: z.string(),
});

export const readingResultSchema = z.strictObject({
  record: mixRecordSchema,
  doubts: z.array(doubtSchema),
  unread: z.array(unreadSchema),
  uses: z.array(cellUseSchema),
  /** Answers that still hold, and those whose cell has changed. */
  answered: z.array(answerSchema),
  stale: z.array(answerSchema),
  departures: z.array(departureSchema).default([]),
});

export type Unread = z.infer<typeof unreadSchema>;
export type CellUse = z.infer<typeof cellUseSchema>;
export type Answer = z.infer<typeof answerSchema>;
export type Departure = z.infer<typeof departureSchema>;
export type ReadingResult = z.infer<typeof readingResultSchema>;
