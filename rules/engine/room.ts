import { z } from 'zod';
import { sourceSchema } from '../record';

/** One unbroken range of binder contents, both ends included, % of mix, to 0.01. */
export const roomStretchSchema = z.strictObject({
  from: z.number(),
  to: z.number(),
  /** What ends it at either side: the rule's limit, or the last of the trials. */
  below: z.enum(['limit', 'trials']),
  above: z.enum(['limit', 'trials']),
});

/** Where one of the chosen rules holds. */
export const roomOfRuleSchema = z.strictObject({
  rule: z.string(),
  clause: z.string(),
  title: z.string(),
  /**
   * `left out`: by its nature it cannot be followed along the binder content (relative density, single specimens).
   * `not computed`: data are missing or doubtful; then there is no telling where every rule holds.
   */
  state: z.enum(['computed', 'not applicable', 'left out', 'not computed']),
  /** Why it is not computed, left out or does not apply; null where it was computed. */
  reason: z.string().nullable(),
  /** The limit resolved for this mix, "at least 14.0 %"; empty where it is not known. */
  limitWords: z.string(),
  fit: z.enum(['quadratic', 'linear']).nullable(),
  /** Tested binder contents between which values can be read; null where not computed. */
  trials: z.strictObject({ from: z.number(), to: z.number() }).nullable(),
  /** Empty where it holds at no content within the trials. */
  holds: z.array(roomStretchSchema),
});

/** The range of binder content in which every chosen rule holds, each with its own rounding. */
export const roomToMoveSchema = z.strictObject({
  /** %, the content that is judged. */
  declaredBinderContent: z.number().nullable(),
  /** Tested contents in rising order, each with the cell that states it. */
  trials: z.array(
    z.strictObject({
      trial: z.string(),
      binderContent: z.number(),
      source: sourceSchema.nullable(),
    }),
  ),
  rules: z.array(roomOfRuleSchema),
  /** Null where no content meets every rule, or where one of them could not be computed. */
  room: z
    .strictObject({
      from: z.number(),
      to: z.number(),
      /** Rules that close it; none where the trials end there. */
      closedBelowBy: z.array(z.string()),
      closedAboveBy: z.array(z.string()),
      /** False where the declared content lies outside; the widest range is then given. */
      containsDeclared: z.boolean(),
    })
    .nullable(),
  /** Without room: the rule that holds nowhere, or the two that cross; empty where only three or more exclude each other. */
  excluding: z.array(z.string()),
  /** Why there is no answer at all, in words; null where there is one. */
  reason: z.string().nullable(),
});

export type RoomStretch = z.infer<typeof roomStretchSchema>;
export type RoomOfRule = z.infer<typeof roomOfRuleSchema>;
export type RoomToMove = z.infer<typeof roomToMoveSchema>;
