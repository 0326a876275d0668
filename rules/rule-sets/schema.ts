import { z } from 'zod';
import { outcomeSchema, severitySchema } from '../engine/finding';
import { quantitySchema } from '../quantities/quantity';
import { mixRecordSchema } from '../record';
import { declaredAttributeSchema } from './attribute';
import { checkEdition, duplicates } from './check-edition';
import { documentTypeSchema } from './document-types';

import { limitSchema, roundingSchema } from './limit';
import { measureSchema, precisionSchema } from './measure';
import { type DocumentProblem, problemsOfIssues } from './problem';
import { sourceSchema, tableSchema } from './table';
import { conditionSchema } from './when';

export const RULE_SET_FORMAT = 'clauseway/rule-set@1';

export const ruleSchema = z.strictObject({
  id: z.string().min(1),
  clause: z.string().min(1),
  title: z.string().min(1),
  severity: severitySchema,
  /** Always applies where left out. */
  when: conditionSchema.optional(),
  measure: measureSchema,
  limit: limitSchema,
  /** Absolute (no rounding) where left out. */
  rounding: roundingSchema.optional(),
  precision: precisionSchema.optional(),
  advice: z.string().nullable().optional(),
  source: sourceSchema.nullable().optional(),
  encodedBy: z.string().nullable().optional(),
  verifiedBy: z.string().nullable().optional(),
});

export const expectedFindingSchema = z.strictObject({
  rule: z.string(),
  subject: z.string().optional(),
  outcome: outcomeSchema,
  borderline: z.boolean().optional(),
  rounded: z.number().nullable().optional(),
  margin: z.number().nullable().optional(),
  limit: z
    .strictObject({ min: z.number().nullable().optional(), max: z.number().nullable().optional() })
    .optional(),
});

export const caseSchema = z.strictObject({
  id: z.string().min(1),
  title: z.string().min(1),
  record: mixRecordSchema,
  context: z
    .strictObject({
      submittedOn: z.iso.date().nullable().default(null),
      lettingOn: z.iso.date().nullable().default(null),
      facts: z.record(z.string(), z.union([z.number(), z.string(), z.boolean()])).default({}),
    })
    .default({ submittedOn: null, lettingOn: null, facts: {} }),
  expected: z.array(expectedFindingSchema),
});

export const designPointSchema = z.strictObject({
  /** % */
  targetAirVoids: z.number().positive().default(4),
  fit: z.enum(['quadratic', 'linear']).default('quadratic'),
});

const headFields = {
  format: z.literal(RULE_SET_FORMAT),
  id: z.string().min(1),
  title: z.string().min(1),
  agency: z.string().min(1),
  edition: z.string().min(1),
  effective: z.strictObject({
    from: z.iso.date().nullable().default(null),
    to: z.iso.date().nullable().default(null),
  }),
};

const extensionFields = {
  quantities: z.array(quantitySchema).default([]),
  documents: z.array(documentTypeSchema).default([]),
  cases: z.array(caseSchema).default([]),
  /** Tolerance between a reported and a recomputed value by quantity, in place of the propagated one. */
  reportedTolerance: z.record(z.string(), z.number().nonnegative()).default({}),
};

export const ruleSetSchema = z.strictObject({
  ...headFields,
  layerOf: z.null(),
  designPoint: designPointSchema.default({ targetAirVoids: 4, fit: 'quadratic' }),
  roomToMove: z.array(z.string()).default([]),
  attributes: z.array(declaredAttributeSchema).default([]),
  tables: z.array(tableSchema).default([]),
  ...extensionFields,
  rules: z.array(ruleSchema),
});

const contentSchema = z.strictObject({
  rules: z.array(ruleSchema).default([]),
  tables: z.array(tableSchema).default([]),
  attributes: z.array(declaredAttributeSchema).default([]),
});

const removalSchema = z.strictObject({
  rules: z.array(z.string()).default([]),
  tables: z.array(z.string()).default([]),
  attributes: z.array(z.string()).default([]),
});

export const rowPatchSchema = z.strictObject({
  table: z.string(),
  key: tableSchema.shape.rows.element,
  set: tableSchema.shape.rows.element,
});

const noContent = { rules: [], tables: [], attributes: [] };

export const layerSchema = z.strictObject({
  ...headFields,
  layerOf: z.strictObject({ id: z.string().min(1), edition: z.string().min(1) }),
  designPoint: designPointSchema.optional(),
  roomToMove: z.array(z.string()).optional(),
  ...extensionFields,
  add: contentSchema.default(noContent),
  replace: contentSchema.default(noContent),
  remove: removalSchema.default(noContent),
  patchRows: z.array(rowPatchSchema).default([]),
});

export type Rule = z.infer<typeof ruleSchema>;
export type RuleSetCase = z.infer<typeof caseSchema>;
export type ExpectedFinding = z.infer<typeof expectedFindingSchema>;
export type RuleSet = z.infer<typeof ruleSetSchema>;
export type Layer = z.infer<typeof layerSchema>;
export type RowPatch = z.infer<typeof rowPatchSchema>;
/** What people and files write: defaults may be left out. */
export type RuleSetInput = z.input<typeof ruleSetSchema>;
export type LayerInput = z.input<typeof layerSchema>;
export type RuleInput = z.input<typeof ruleSchema>;

export function isLayer(document: RuleSet | Layer): document is Layer {
  return document.layerOf !== null;
}

export type ParsedRuleSet =
  | { ok: true; ruleSet: RuleSet | Layer }
  | { ok: false; problems: DocumentProblem[] };

/**
 * A base edition or a layer, checked by the schema and then for what a schema cannot see. All faults are
 * returned at once. What a layer refers to in its base is checked when the two are resolved.
 */
export function parseRuleSet(json: unknown): ParsedRuleSet {
  const wantsLayer = isObject(json) && isObject(json.layerOf);
  const parsed = wantsLayer ? layerSchema.safeParse(json) : ruleSetSchema.safeParse(json);
  if (!parsed.success) return { ok: false, problems: problemsOfIssues(json, parsed.error.issues) };
  const ruleSet: RuleSet | Layer = parsed.data;
  const problems = [
    ...checkEffective(ruleSet),
    ...(isLayer(ruleSet) ? namesGivenTwice(ruleSet) : checkEdition(ruleSet)),
  ];
  return problems.length === 0 ? { ok: true, ruleSet } : { ok: false, problems };
}

function checkEffective({ effective }: RuleSet | Layer): DocumentProblem[] {
  if (effective.from === null || effective.to === null || effective.from <= effective.to) return [];
  return [
    {
      pointer: '/effective',
      detail: 'The edition ends before it begins.',
      fix: 'Give a "to" on or after "from", or null while it has no end.',
    },
  ];
}

function namesGivenTwice(layer: Layer): DocumentProblem[] {
  return duplicates({
    rules: [...layer.add.rules, ...layer.replace.rules],
    tables: [...layer.add.tables, ...layer.replace.tables],
    attributes: [...layer.add.attributes, ...layer.replace.attributes],
    quantities: layer.quantities,
    documents: layer.documents,
    cases: layer.cases,
  });
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
