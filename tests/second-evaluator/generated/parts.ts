import type { MixRecordInput } from '#rules/record';
import type { LayerInput, RuleInput, RuleSetInput } from '#rules/rule-sets/schema';

export type ReadingInput = NonNullable<MixRecordInput['readings']>[number];
export type DoubtInput = NonNullable<MixRecordInput['doubts']>[number];
export type DocumentInput = NonNullable<MixRecordInput['documents']>[number];
export type TableInput = NonNullable<RuleSetInput['tables']>[number];
export type BoundInput = RuleInput['limit']['min'];

/** What one part of a case adds to its edition and its record. */
export interface Part {
  rules: RuleInput[];
  tables: TableInput[];
  readings: ReadingInput[];
  doubts: DoubtInput[];
  documents: DocumentInput[];
  /** How the edition reads the design between trials, where the part's rule rests on it. */
  designPoint?: RuleSetInput['designPoint'];
}

export interface GeneratedCase {
  base: RuleSetInput;
  layers: LayerInput[];
  record: MixRecordInput;
  context: {
    submittedOn: string | null;
    lettingOn: string | null;
    facts: Record<string, number | string | boolean>;
  };
}

export function emptyPart(): Part {
  return { rules: [], tables: [], readings: [], doubts: [], documents: [] };
}
