import { z } from 'zod';
import { outcomeSchema, severitySchema, summarySchema } from '#rules/engine/finding';
import { correctionSchema } from '#rules/reading/correction';
import { answerSchema } from '#rules/reading/reading-result';
import { conditionsSchema, qualifierSchema, readingSchema } from '#rules/record';
import { limits } from '../limits';
import { dateSchema, idSchema, instantSchema } from './common';
import { endpoint } from './endpoint';
import { readingViewSchema } from './readings';
import { revisionParams } from './submittals';

const path = '/api/submittals/:submittalId/revisions/:number/reading';

/** A reading entered by hand. Its place says where it can be seen, as on a certificate beside the workbook's cell. */
export const typedReadingInputSchema = z.strictObject({
  quantity: z.string().min(1, 'Choose a quantity.').max(80),
  /** Null only with the qualifiers `none` and `non-plastic`. */
  value: z.number().nullable(),
  qualifier: qualifierSchema.nullable().default(null),
  /** One of the quantity's units; it is converted. */
  unit: z.string().min(1, 'Choose a unit.').max(40),
  at: conditionsSchema.default({}),
  method: z.string().trim().max(limits.nameCharacters).nullable().default(null),
  testedOn: dateSchema.nullable().default(null),
});

const answersSchema = z.array(answerSchema.extend({ answer: z.string().max(200).nullable() }));
const correctionsSchema = z.array(correctionSchema).max(200, 'At most 200 at once.');
const typedSchema = z.array(typedReadingInputSchema).max(200, 'At most 200 at once.');

/** The same acts as below, all optional; they are tried in this order: taken back, answered, corrected, typed. */
const proposalSchema = z.strictObject({
  takeBack: z.array(idSchema).default([]),
  answers: answersSchema.default([]),
  corrections: correctionsSchema.default([]),
  typed: typedSchema.default([]),
});

const shownFindingSchema = z.strictObject({
  outcome: outcomeSchema,
  borderline: z.boolean(),
  /** "13.9 % against at least 14.0 %" */
  sentence: z.string(),
});

export const readingChangeSchema = z.strictObject({
  before: readingSchema.nullable(),
  after: readingSchema.nullable(),
  /** "Gmb, trial B, specimen 3" */
  label: z.string(),
});

export const previewSchema = z.strictObject({
  /** Those of `readings` are cut after the first 200; these count all. */
  counts: z.strictObject({
    added: z.number().int(),
    removed: z.number().int(),
    changed: z.number().int(),
  }),
  /** Added (no before), removed (no after) and changed, in the record's order. */
  readings: z.array(readingChangeSchema),
  attributes: z.array(
    z.strictObject({
      name: z.string(),
      label: z.string(),
      before: z.union([z.string(), z.number(), z.boolean()]).nullable(),
      after: z.union([z.string(), z.number(), z.boolean()]).nullable(),
    }),
  ),
  doubts: z.strictObject({
    /** Number of doubts that are open before and after. */
    before: z.number().int(),
    after: z.number().int(),
    /** Doubts that the change itself raises. */
    raised: z.array(z.strictObject({ sheet: z.string(), cell: z.string(), reason: z.string() })),
  }),
  /** Findings whose outcome changes, in the order of the findings. */
  findings: z.array(
    z.strictObject({
      key: z.string(),
      clause: z.string().nullable(),
      title: z.string(),
      severity: severitySchema,
      before: shownFindingSchema.nullable(),
      after: shownFindingSchema.nullable(),
    }),
  ),
  summary: z.strictObject({ before: summarySchema, after: summarySchema }),
  /** What the laboratory's mapping would remember, a sentence each. */
  learned: z.array(z.string()),
  /** What would hold for this workbook only, and why, a sentence each. */
  notLearned: z.array(z.string()),
});

export const previewReading = endpoint({
  method: 'post',
  path: `${path}/preview`,
  summary: 'What answers, corrections, typed readings or taking acts back would change; nothing is kept',
  params: revisionParams,
  body: proposalSchema,
  response: previewSchema,
});

export const keepCorrections = endpoint({
  method: 'post',
  path: `${path}/corrections`,
  summary: 'Say what cells or blocks are; the workbook is read and checked again, and the mapping learns it',
  params: revisionParams,
  body: z.strictObject({ corrections: correctionsSchema.min(1, 'Say what at least one cell is.') }),
  response: readingViewSchema,
  status: 201,
  idempotent: true,
  versioned: true,
});

export const typeReadings = endpoint({
  method: 'post',
  path: `${path}/typed`,
  summary: 'Enter readings by hand; each is kept as typed, by whom and on which day',
  params: revisionParams,
  body: z.strictObject({ readings: typedSchema.min(1, 'Enter at least one reading.') }),
  response: readingViewSchema,
  status: 201,
  idempotent: true,
  versioned: true,
});

export const takeBackAct = endpoint({
  method: 'post',
  path: `${path}/acts/:actId/withdrawal`,
  summary: 'Take a correction or a typed reading back; the act and its withdrawal are both kept',
  params: revisionParams.extend({ actId: idSchema }),
  body: z.strictObject({}),
  response: readingViewSchema,
  status: 201,
  idempotent: true,
  versioned: true,
});

/** Every act on how the workbook is read, with those that were taken back, oldest first. */
export const listReadingActs = endpoint({
  method: 'get',
  path: `${path}/acts`,
  summary: 'Who corrected, typed and took back what, and when',
  params: revisionParams,
  response: z.strictObject({
    acts: z.array(
      z.strictObject({
        id: idSchema,
        /** "Trials C5:C14 is Gmb" */
        text: z.string(),
        by: z.string(),
        at: instantSchema,
        takenBack: z.strictObject({ by: z.string(), at: instantSchema }).nullable(),
      }),
    ),
  }),
});

/** What a cell can be said to be in this section. */
export const getReadingChoices = endpoint({
  method: 'get',
  path: `${path}/choices`,
  summary: 'Quantities with their units, attributes and kinds of document that cells can be said to be',
  params: revisionParams,
  response: z.strictObject({
    quantities: z.array(
      z.strictObject({
        id: z.string(),
        label: z.string(),
        symbol: z.string(),
        /** The canonical unit; `1` where it has none. */
        unit: z.string(),
        /** Every unit that it may be stated in, the canonical one first. */
        units: z.array(z.string()),
        aliases: z.array(z.string()),
        /** True where the section has rules on it. */
        judged: z.boolean(),
      }),
    ),
    attributes: z.array(
      z.strictObject({
        name: z.string(),
        label: z.string(),
        unit: z.string().nullable(),
        values: z.array(z.union([z.string(), z.number()])),
      }),
    ),
    documents: z.array(z.strictObject({ type: z.string(), label: z.string() })),
  }),
});

export type ReadingProposal = z.infer<typeof proposalSchema>;
export type ReadingPreview = z.infer<typeof previewSchema>;
export type TypedReadingInput = z.infer<typeof typedReadingInputSchema>;
