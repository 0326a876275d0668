import { z } from 'zod';
import { sheetGridSchema } from '#rules/reading/cell-grid';
import { correctionSchema } from '#rules/reading/correction';
import { answerSchema, cellUseSchema, departureSchema, unreadSchema } from '#rules/reading/reading-result';
import { documentRecordSchema, doubtSchema, readingSchema } from '#rules/record';
import { limits } from '../limits';
import { dateSchema, idSchema, instantSchema } from './common';
import { endpoint } from './endpoint';
import { revisionParams } from './submittals';

/** An attribute that rules branch on and that neither the workbook nor the project states, or in which they differ. */
export const askedAttributeSchema = z.strictObject({
  name: z.string(),
  label: z.string(),
  type: z.enum(['number', 'text', 'boolean', 'date']),
  unit: z.string().nullable(),
  values: z.array(z.union([z.string(), z.number()])),
  /** Why it is asked: "Neither the workbook nor the project states it." or the conflict in words. */
  reason: z.string(),
  value: z.union([z.string(), z.number(), z.boolean()]).nullable(),
});

export const documentRowSchema = documentRecordSchema.extend({
  id: idSchema,
  label: z.string(),
  file: z
    .strictObject({ id: idSchema, fileName: z.string(), mediaType: z.string(), bytes: z.number().int() })
    .nullable(),
  /** True where the row was added on the page, not read from the workbook. */
  added: z.boolean(),
});

const actFields = { by: z.string(), at: instantSchema };

export const readingViewSchema = z.strictObject({
  version: z.number().int(),
  fileName: z.string(),
  sha256: z.string(),
  mappingName: z.string(),
  sheets: z.array(
    z.strictObject({
      name: z.string(),
      hidden: z.boolean(),
      read: z.number().int(),
      doubts: z.number().int(),
      unused: z.number().int(),
    }),
  ),
  /** All doubts of the workbook, with the answer where one is kept. */
  doubts: z.array(doubtSchema.extend({ letter: z.string(), answer: z.string().nullable() })),
  /** Answers kept before whose cell has changed. */
  stale: z.array(answerSchema),
  unread: z.array(unreadSchema),
  counts: z.strictObject({
    readings: z.number().int(),
    attributes: z.number().int(),
    documents: z.number().int(),
  }),
  /** What was understood, in groups, each with its first cell. */
  understood: z.array(
    z.strictObject({ label: z.string(), count: z.number().int(), sheet: z.string(), cell: z.string() }),
  ),
  asked: z.array(askedAttributeSchema),
  documents: z.array(documentRowSchema),
  /** The laboratory's mapping that the workbook was read with; null where it was read by its headings alone. */
  mapping: z
    .strictObject({
      id: idSchema,
      name: z.string(),
      number: z.number().int(),
      /** Where the workbook departs from the layout that was learned. */
      departures: z.array(departureSchema),
    })
    .nullable(),
  /** What the newest version of the laboratory's mapping has learned from this revision; null where nothing. */
  learned: z
    .strictObject({ id: idSchema, name: z.string(), number: z.number().int(), rules: z.number().int() })
    .nullable(),
  /** Corrections that hold, oldest first; the last one is what undo takes back. */
  corrections: z.array(correctionSchema.extend({ id: idSchema, ...actFields })),
  /** Readings entered by hand. */
  typed: z.array(
    z.strictObject({
      id: idSchema,
      reading: readingSchema,
      label: z.string(),
      /** Why it does not count: the workbook states the same thing by now. Null while it counts. */
      overruled: z.string().nullable(),
      ...actFields,
    }),
  ),
  abilities: z.strictObject({ answer: z.boolean(), attach: z.boolean() }),
});

export const getReading = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/reading',
  summary: 'How the workbook was read: doubts, what was understood, what was not used',
  params: revisionParams,
  response: readingViewSchema,
});

export const getSheet = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/sheet',
  summary: 'A sheet as uploaded with what each cell was taken for; rows may be narrowed',
  params: revisionParams,
  query: z.strictObject({
    sheet: z.string().max(120),
    from: z.coerce.number().int().min(1).optional(),
    to: z.coerce.number().int().min(1).optional(),
  }),
  response: z.strictObject({ sheet: sheetGridSchema, uses: z.array(cellUseSchema) }),
});

export const keepAnswer = endpoint({
  method: 'put',
  path: '/api/submittals/:submittalId/revisions/:number/answers',
  summary: 'Keep answers to doubts (an answer of null takes one back); the pre-check runs again',
  params: revisionParams,
  body: z.strictObject({
    answers: z.array(answerSchema.extend({ answer: z.string().max(200).nullable() })).min(1),
  }),
  response: readingViewSchema,
  versioned: true,
});

export const keepAttributes = endpoint({
  method: 'put',
  path: '/api/submittals/:submittalId/revisions/:number/attributes',
  summary: 'Keep attributes that were asked, as typed',
  params: revisionParams,
  body: z.strictObject({
    attributes: z.record(z.string(), z.union([z.string(), z.number(), z.boolean()]).nullable()),
  }),
  response: readingViewSchema,
  versioned: true,
});

const documentFields = {
  type: z.string().min(1, 'Choose the kind of document.'),
  issuer: z.string().trim().max(limits.nameCharacters).nullable(),
  reference: z.string().trim().max(limits.nameCharacters).nullable(),
  date: dateSchema.nullable(),
  validTo: dateSchema.nullable(),
};

export const addDocument = endpoint({
  method: 'post',
  path: '/api/submittals/:submittalId/revisions/:number/documents',
  summary: 'Add a certificate or report, with its file (PDF or image)',
  params: revisionParams,
  /** Multipart text fields arrive as strings; empty means not given. */
  body: z.strictObject({
    type: documentFields.type,
    issuer: z.string().trim().max(limits.nameCharacters).default(''),
    reference: z.string().trim().max(limits.nameCharacters).default(''),
    date: z.union([dateSchema, z.literal('')]).default(''),
    validTo: z.union([dateSchema, z.literal('')]).default(''),
  }),
  files: ['file'],
  response: readingViewSchema,
  status: 201,
  idempotent: true,
});

export const attachFile = endpoint({
  method: 'put',
  path: '/api/submittals/:submittalId/revisions/:number/documents/:documentId/file',
  summary: 'Attach the file of a document row (PDF or image, checked by content)',
  params: revisionParams.extend({ documentId: idSchema }),
  body: z.strictObject({}),
  files: ['file'],
  response: readingViewSchema,
  idempotent: true,
  versioned: true,
});

export const removeDocument = endpoint({
  method: 'delete',
  path: '/api/submittals/:submittalId/revisions/:number/documents/:documentId',
  summary: 'Remove a document row that was added on the page, or the file of one that was read',
  params: revisionParams.extend({ documentId: idSchema }),
  response: readingViewSchema,
  versioned: true,
});

export const getDocumentFile = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/documents/:documentId/file',
  summary: 'The file of a document row',
  params: revisionParams.extend({ documentId: idSchema }),
  sends: '*/*',
});

export const documentTypesSchema = z.array(z.strictObject({ type: z.string(), label: z.string() }));

export const getDocumentTypes = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/document-types',
  summary: 'Kinds of document that the section knows',
  params: revisionParams,
  response: z.strictObject({ types: documentTypesSchema, asOf: instantSchema }),
});

export type ReadingView = z.infer<typeof readingViewSchema>;
export type DocumentRow = z.infer<typeof documentRowSchema>;
export type AskedAttribute = z.infer<typeof askedAttributeSchema>;
