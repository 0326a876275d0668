import { z } from 'zod';
import { mappingSchema } from '#rules/reading/mapping';
import { limits } from '../limits';
import { idSchema, instantSchema } from './common';
import { endpoint } from './endpoint';

const mappingNameSchema = z.string().trim().min(1, 'Give a name.').max(limits.nameCharacters);

export const mappingItemSchema = z.strictObject({
  id: idSchema,
  name: z.string(),
  laboratory: z.strictObject({ id: idSchema, name: z.string() }),
  /** Of its newest version. */
  number: z.number().int(),
  rules: z.number().int(),
  /** Revisions that were read with any version of it. */
  usedBy: z.number().int(),
  changedBy: z.string(),
  changedAt: instantSchema,
  retiredAt: instantSchema.nullable(),
  version: z.number().int(),
  abilities: z.strictObject({ change: z.boolean() }),
});

export const mappingViewSchema = mappingItemSchema.extend({
  /** What the newest version says, a sentence a rule. */
  sentences: z.array(z.string()),
  /** Newest first. */
  versions: z.array(
    z.strictObject({
      number: z.number().int(),
      rules: z.number().int(),
      /** "Learned from BW-125-S4 r1.xlsx", "Imported" */
      origin: z.string(),
      by: z.string(),
      at: instantSchema,
    }),
  ),
});

export const listMappings = endpoint({
  method: 'get',
  path: '/api/mappings',
  summary: "Mappings of the active organisation's laboratories, retired ones last",
  response: z.strictObject({
    mappings: z.array(mappingItemSchema),
    abilities: z.strictObject({ import: z.boolean() }),
  }),
});

const mappingParams = z.strictObject({ mappingId: idSchema });

export const getMapping = endpoint({
  method: 'get',
  path: '/api/mappings/:mappingId',
  summary: 'A mapping: what it says and its versions',
  params: mappingParams,
  response: mappingViewSchema,
});

export const changeMapping = endpoint({
  method: 'patch',
  path: '/api/mappings/:mappingId',
  summary: 'Rename a mapping, retire it, or take it into use again; a retired one is no longer applied',
  params: mappingParams,
  body: z.strictObject({ name: mappingNameSchema.optional(), retired: z.boolean().optional() }),
  response: mappingViewSchema,
  versioned: true,
});

export const exportMapping = endpoint({
  method: 'get',
  path: '/api/mappings/:mappingId/document',
  summary: 'A version of a mapping as a document, the newest where none is named',
  params: mappingParams,
  query: z.strictObject({ number: z.coerce.number().int().min(1).optional() }),
  sends: 'application/json',
});

const importBody = z.strictObject({
  laboratoryId: idSchema,
  name: mappingNameSchema,
  document: mappingSchema,
});

export const previewImport = endpoint({
  method: 'post',
  path: '/api/mappings/import/preview',
  summary: 'What importing a mapping would do; nothing is kept',
  body: importBody,
  response: z.strictObject({
    /** A mapping of the same layout in the same laboratory, which would get another version; null: a new one. */
    replaces: z.strictObject({ id: idSchema, name: z.string(), number: z.number().int() }).nullable(),
    /** Sentences of rules that come, go and stay. */
    added: z.array(z.string()),
    removed: z.array(z.string()),
    unchanged: z.number().int(),
    /** "It would become version 3 of …" */
    text: z.string(),
  }),
});

export const importMapping = endpoint({
  method: 'post',
  path: '/api/mappings/import',
  summary: 'Import a mapping: a new one, or another version where the laboratory has one of the same layout',
  body: importBody,
  response: mappingViewSchema,
  status: 201,
  idempotent: true,
});

export type MappingView = z.infer<typeof mappingViewSchema>;
export type MappingItem = z.infer<typeof mappingItemSchema>;
