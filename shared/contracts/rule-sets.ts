import { z } from 'zod';
import { severitySchema } from '#rules/engine/finding';
import { quantitySchema } from '#rules/quantities/quantity';
import { dateSchema, idSchema } from './common';
import { endpoint } from './endpoint';
import { editionReferenceSchema } from './projects';

export const editionStateSchema = z.enum([
  'draft',
  'in review',
  'in force',
  'superseded',
  'not yet in force',
  'withdrawn',
]);

export const editionListItemSchema = editionReferenceSchema.extend({
  state: editionStateSchema,
  from: dateSchema.nullable(),
  to: dateSchema.nullable(),
  rules: z.number().int(),
  /** The edition that a layer sits over; null for a base edition. */
  layerOf: z.strictObject({ ruleSet: z.string(), edition: z.string() }).nullable(),
  startingPoint: z.boolean(),
  /** Of a draft; null for a published edition. */
  draftId: idSchema.nullable(),
});

export const listRuleSets = endpoint({
  method: 'get',
  path: '/api/rule-sets',
  summary: 'Rule sets: an agency sees its own, a contractor those of its projects',
  response: z.strictObject({
    ruleSets: z.array(
      z.strictObject({
        id: z.string(),
        title: z.string(),
        agency: z.string(),
        editions: z.array(editionListItemSchema),
      }),
    ),
  }),
});

export const ruleViewSchema = z.strictObject({
  id: z.string(),
  clause: z.string(),
  title: z.string(),
  severity: severitySchema,
  /** The rule in general terms. */
  sentence: z.string(),
  /** When it applies, in words; null where it always does. */
  condition: z.string().nullable(),
  rounding: z.string(),
  precision: z.string().nullable(),
  minimumCount: z.number().int().nullable(),
  /** What is measured; null for an attribute, a document and a formula of several. */
  quantity: z
    .strictObject({
      id: z.string(),
      label: z.string(),
      /** Declared by this rule set, and shown on its page. */
      own: z.boolean(),
    })
    .nullable()
    .default(null),
  advice: z.string().nullable(),
  source: z.string(),
  sourceOrigin: z.enum(['read', 'derived', 'memory', 'agency']),
  /** Which document supplied it, and what a layer displaced. */
  document: z.string(),
  displaced: z.array(z.strictObject({ document: z.string(), text: z.string() })),
  tables: z.array(z.string()),
  encodedBy: z.string().nullable(),
  verifiedBy: z.string().nullable(),
});

export const tableViewSchema = z.strictObject({
  id: z.string(),
  title: z.string(),
  /** Column heads in order, keys first, with units. */
  columns: z.array(
    z.strictObject({ name: z.string(), label: z.string(), unit: z.string().nullable(), key: z.boolean() }),
  ),
  rows: z.array(
    z.strictObject({ cells: z.array(z.string()), document: z.string(), displaced: z.string().nullable() }),
  ),
  usedBy: z.array(z.string()),
});

export const ruleSetViewSchema = editionListItemSchema.extend({
  agency: z.string(),
  /** Layers applied in this view, in order. */
  layers: z.array(editionReferenceSchema),
  availableLayers: z.array(editionReferenceSchema),
  otherEditions: z.array(editionListItemSchema),
  ruleViews: z.array(ruleViewSchema),
  /** Rules that a layer removed. */
  removed: z.array(
    z.strictObject({ id: z.string(), clause: z.string(), title: z.string(), document: z.string() }),
  ),
  tables: z.array(tableViewSchema),
  /** Those that the edition declares itself, beside the registry's. */
  quantities: z.array(quantitySchema).default([]),
  caseCount: z.number().int(),
  hash: z.string(),
  templateHref: z.string(),
  /** The template filled in with an invented mix; null where no example fits the edition. */
  exampleHref: z.string().nullable(),
});

const editionParams = z.strictObject({ ruleSetId: z.string().max(80), edition: z.string().max(40) });

export const getRuleSet = endpoint({
  method: 'get',
  path: '/api/rule-sets/:ruleSetId/:edition',
  summary: 'An edition, every rule as a sentence, with the chosen layers applied',
  params: editionParams,
  /** `cvra-s-07@2026,…` in order. */
  query: z.strictObject({ layers: z.string().max(400).optional() }),
  response: ruleSetViewSchema,
});

export const getRuleSetTemplate = endpoint({
  method: 'get',
  path: '/api/rule-sets/:ruleSetId/:edition/template.xlsx',
  summary: 'The template for an edition',
  params: editionParams,
  query: z.strictObject({ layers: z.string().max(400).optional() }),
  sends: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
});

export const getRuleSetExample = endpoint({
  method: 'get',
  path: '/api/rule-sets/:ruleSetId/:edition/example.xlsx',
  summary: 'The template for an edition, filled in with an invented mix',
  params: editionParams,
  query: z.strictObject({ layers: z.string().max(400).optional() }),
  sends: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
});

export const getRuleSetDocument = endpoint({
  method: 'get',
  path: '/api/rule-sets/:ruleSetId/:edition/document',
  summary: 'An edition as it was written, without layers',
  params: editionParams,
  response: z.strictObject({ document: z.record(z.string(), z.unknown()) }),
});

export const exportRuleSet = endpoint({
  method: 'get',
  path: '/api/rule-sets/:ruleSetId/:edition/rule-set.json',
  summary: 'An edition as a clauseway/rule-set@1 file',
  params: editionParams,
  sends: 'application/json',
});

export type RuleSetView = z.infer<typeof ruleSetViewSchema>;
export type RuleView = z.infer<typeof ruleViewSchema>;
export type TableView = z.infer<typeof tableViewSchema>;
export type EditionListItem = z.infer<typeof editionListItemSchema>;
