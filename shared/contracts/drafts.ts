import { z } from 'zod';
import { limits } from '../limits';
import { idSchema, instantSchema, personReferenceSchema } from './common';
import { endpoint } from './endpoint';
import { editionReferenceSchema } from './projects';

/** A rule set as it is being written; its own schema says at each change what is still wrong with it. */
export const draftDocumentSchema = z.record(z.string(), z.unknown());

export const draftSchema = z.strictObject({
  id: idSchema,
  ruleSet: z.string(),
  edition: z.string(),
  title: z.string(),
  state: z.enum(['draft', 'in review']),
  document: draftDocumentSchema,
  /** The published edition that it started from. */
  basedOn: editionReferenceSchema.nullable(),
  /** Adopted from a starting point, whose rules nobody of the agency has vouched for yet. */
  startingPoint: z.boolean(),
  createdBy: personReferenceSchema,
  updatedAt: instantSchema,
  /** Who asked for the review, and when; null while it is being written. */
  sentForReview: z.strictObject({ by: personReferenceSchema, at: instantSchema }).nullable(),
  version: z.number().int(),
  abilities: z.strictObject({
    change: z.boolean(),
    send: z.boolean(),
    takeBack: z.boolean(),
    verify: z.boolean(),
    publish: z.boolean(),
    discard: z.boolean(),
    comment: z.boolean(),
  }),
});

const draftParams = z.strictObject({ draftId: idSchema });
const editionName = z.string().trim().min(1, 'Name the edition, such as 2027.').max(40);
const ruleSetId = z
  .string()
  .trim()
  .regex(
    /^[a-z0-9][a-z0-9-]{0,78}$/,
    'Use small letters, digits and hyphens, beginning with a letter or digit.',
  );

export const startDraft = endpoint({
  method: 'post',
  path: '/api/drafts',
  summary: 'Begin a draft: from an edition, a starting point, a file, or with nothing in it',
  body: z.strictObject({
    edition: editionName,
    from: z.discriminatedUnion('kind', [
      z.strictObject({
        kind: z.literal('edition'),
        ruleSet: z.string().max(80),
        edition: z.string().max(40),
      }),
      z.strictObject({ kind: z.literal('starting point'), file: z.string().max(80) }),
      z.strictObject({ kind: z.literal('file'), document: draftDocumentSchema }),
      z.strictObject({
        kind: z.literal('nothing'),
        ruleSet: ruleSetId,
        title: z.string().trim().min(1, 'Give the rule set a title.').max(200),
        /** For a supplement or a special provision: the edition that it changes. */
        layerOf: z.strictObject({ id: z.string().max(80), edition: z.string().max(40) }).nullable(),
      }),
    ]),
  }),
  response: draftSchema,
  status: 201,
  idempotent: true,
});

export const getDraft = endpoint({
  method: 'get',
  path: '/api/drafts/:draftId',
  summary: 'A draft with its document',
  params: draftParams,
  response: draftSchema,
});

export const partChangeSchema = z.strictObject({
  /** `head`, an entry as `rules/vma`, or an order as `order/rules`. */
  part: z.string().min(1).max(200),
  /** Hash of the part as the author saw it; null where there was none. */
  before: z.string().length(64).nullable(),
  after: z.unknown(),
  position: z.number().int().nonnegative().optional(),
});

/** In `present` of a `draft-conflict`: each part that somebody else changed, as it is now. */
export const draftConflictSchema = z.strictObject({
  part: z.string(),
  present: z.unknown(),
  by: z.string().nullable(),
  at: instantSchema.nullable(),
});

export const changeDraft = endpoint({
  method: 'post',
  path: '/api/drafts/:draftId/changes',
  summary: 'Change parts of a draft, all or none',
  params: draftParams,
  body: z.strictObject({ changes: z.array(partChangeSchema).min(1).max(limits.changesAtOnce) }),
  response: z.strictObject({
    version: z.number().int(),
    updatedAt: instantSchema,
    /** The parts as they are kept: a changed rule carries who encoded it. */
    parts: z.array(z.strictObject({ part: z.string(), value: z.unknown() })),
  }),
  idempotent: true,
});

export const sendDraftForReview = endpoint({
  method: 'post',
  path: '/api/drafts/:draftId/review',
  summary: 'Send a draft for review by a second rule author',
  params: draftParams,
  response: draftSchema,
  versioned: true,
});

export const takeDraftBack = endpoint({
  method: 'delete',
  path: '/api/drafts/:draftId/review',
  summary: 'Take a draft out of review, so that it can be changed',
  params: draftParams,
  response: draftSchema,
  versioned: true,
});

export const verifyRules = endpoint({
  method: 'post',
  path: '/api/drafts/:draftId/verified-rules',
  summary: 'State that rules say what the specification says; nobody verifies what they encoded',
  params: draftParams,
  body: z.strictObject({ rules: z.array(z.string().min(1).max(120)).min(1).max(limits.changesAtOnce) }),
  response: draftSchema,
  versioned: true,
});

export const publishDraft = endpoint({
  method: 'post',
  path: '/api/drafts/:draftId/publication',
  summary: 'Publish a reviewed draft as an edition that never changes',
  params: draftParams,
  body: z.strictObject({
    /** Where the draft has warnings, a word on why it is published with them. */
    word: z.string().trim().max(limits.reasonCharacters).nullable(),
  }),
  response: editionReferenceSchema,
  versioned: true,
});

export const discardDraft = endpoint({
  method: 'delete',
  path: '/api/drafts/:draftId',
  summary: 'Discard a draft with its comments',
  params: draftParams,
  status: 204,
  versioned: true,
});

export const exportDraft = endpoint({
  method: 'get',
  path: '/api/drafts/:draftId/rule-set.json',
  summary: 'A draft as a clauseway/rule-set@1 file',
  params: draftParams,
  sends: 'application/json',
});

export const withdrawEdition = endpoint({
  method: 'post',
  path: '/api/rule-sets/:ruleSetId/:edition/withdrawal',
  summary: 'Withdraw a published edition with a reason; checks made with it stay',
  params: z.strictObject({ ruleSetId: z.string().max(80), edition: z.string().max(40) }),
  body: z.strictObject({
    reason: z.string().trim().min(1, 'Say why it is withdrawn.').max(limits.reasonCharacters),
  }),
  response: editionReferenceSchema,
  idempotent: true,
});

export const draftCommentSchema = z.strictObject({
  id: idSchema,
  /** The rule that it is about; null for the draft as a whole. */
  rule: z.string().nullable(),
  text: z.string(),
  by: personReferenceSchema,
  at: instantSchema,
  version: z.number().int(),
  /** Of the reader's own. */
  mine: z.boolean(),
});

const commentText = z.string().trim().min(1, 'Write the comment first.').max(limits.noteCharacters);

export const listDraftComments = endpoint({
  method: 'get',
  path: '/api/drafts/:draftId/comments',
  summary: 'Comments on a draft, oldest first',
  params: draftParams,
  response: z.strictObject({ comments: z.array(draftCommentSchema) }),
});

export const writeDraftComment = endpoint({
  method: 'post',
  path: '/api/drafts/:draftId/comments',
  summary: 'Comment on a rule of a draft, or on the draft',
  params: draftParams,
  body: z.strictObject({ rule: z.string().max(120).nullable(), text: commentText }),
  response: draftCommentSchema,
  status: 201,
  idempotent: true,
});

const commentParams = z.strictObject({ draftId: idSchema, commentId: idSchema });

export const changeDraftComment = endpoint({
  method: 'patch',
  path: '/api/drafts/:draftId/comments/:commentId',
  summary: 'Change a comment of one’s own',
  params: commentParams,
  body: z.strictObject({ text: commentText }),
  response: draftCommentSchema,
  versioned: true,
});

export const removeDraftComment = endpoint({
  method: 'delete',
  path: '/api/drafts/:draftId/comments/:commentId',
  summary: 'Remove a comment of one’s own',
  params: commentParams,
  status: 204,
  versioned: true,
});

/** Shipped rule sets that an agency may adopt as a draft of its own. */
export const listStartingPoints = endpoint({
  method: 'get',
  path: '/api/starting-points',
  summary: 'Shipped rule sets, to be checked against the agency’s own specification before use',
  response: z.strictObject({
    startingPoints: z.array(
      z.strictObject({
        file: z.string(),
        ruleSet: z.string(),
        edition: z.string(),
        title: z.string(),
        rules: z.number().int(),
        layerOf: z.strictObject({ id: z.string(), edition: z.string() }).nullable(),
      }),
    ),
  }),
});

export type Draft = z.infer<typeof draftSchema>;
export type DraftComment = z.infer<typeof draftCommentSchema>;
export type DraftConflict = z.infer<typeof draftConflictSchema>;
