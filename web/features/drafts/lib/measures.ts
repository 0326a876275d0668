import type { RuleField } from './rule-fields';

export const measureKinds = [
  { value: 'reading', label: 'a reading' },
  { value: 'gradation', label: 'the gradation' },
  { value: 'creep-compliance', label: 'creep compliance' },
  { value: 'formula', label: 'a formula' },
  { value: 'difference', label: 'a difference' },
  { value: 'attribute', label: 'an attribute' },
  { value: 'document', label: 'a document' },
] as const;

type Kind = (typeof measureKinds)[number]['value'];

export const statistics = [
  { value: 'mean', label: 'the mean' },
  { value: 'each', label: 'each result' },
  { value: 'min', label: 'the lowest' },
  { value: 'max', label: 'the highest' },
  { value: 'range', label: 'the range' },
  { value: 'standard-deviation', label: 'the standard deviation' },
  { value: 'trimmed-mean', label: 'the trimmed mean' },
  { value: 'count', label: 'the number of results' },
  { value: 'percent-within-limits', label: 'percent within limits' },
] as const;

const fresh: Record<Kind, RuleField> = {
  reading: { quantity: 'air-voids', at: { trial: 'design' } },
  gradation: { table: '' },
  'creep-compliance': { temperature: 0, time: 100 },
  formula: { expression: '' },
  difference: { quantity: 'air-voids', between: ['contractor', 'agency'] },
  attribute: { attribute: 'binderGrade' },
  document: { type: 'binder-certificate' },
};

/** A measure of another kind: what both kinds have stays, the rest begins anew. */
export function freshMeasure(kind: Kind, before: RuleField): RuleField {
  const kept = Object.fromEntries(Object.entries(before).filter(([field]) => field in fresh[kind]));
  return { kind, ...fresh[kind], ...kept, ...(before.where === undefined ? {} : { where: before.where }) };
}
