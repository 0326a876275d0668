import { z } from 'zod';

/** What would have to be otherwise, alone, for a failing finding to pass: a reading, an attribute or a document. */
export const toPassSchema = z.strictObject({
  /** Id of the quantity; of an attribute its name, of a document its type. */
  quantity: z.string(),
  /** As the laboratory writes it: "Gmb", "sand equivalent". */
  name: z.string(),
  unit: z.string(),
  /** Null where it is no number. */
  present: z.number().nullable(),
  /** Ends of what would pass, both included; null where that side is open or it is no number. */
  from: z.number().nullable(),
  to: z.number().nullable(),
  /** "Gmb of 2.431 or less instead of 2.442 (mean of 3)" */
  words: z.string(),
});

/** What a reader asks about a finding beyond its outcome. */
export const explanationSchema = z.strictObject({
  /** Document, table, row and the mix's own attributes that gave the limit, and what it displaced. */
  whyThisLimit: z.string().nullable(),
  /** Each a way of its own; empty where none can be computed. */
  toPass: z.array(toPassSchema),
});

export type ToPass = z.infer<typeof toPassSchema>;
export type Explanation = z.infer<typeof explanationSchema>;
