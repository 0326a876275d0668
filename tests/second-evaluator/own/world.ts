import type { CheckContext, MixRecord } from '#rules/record';
import type { Layer, RuleSet } from '#rules/rule-sets/schema';
import { type LaidOut, layOut } from './edition';

/** All that a rule is judged by. */
export interface World {
  record: MixRecord;
  context: CheckContext;
  edition: LaidOut;
}

export interface Verdict {
  rule: string;
  subject: string;
  outcome: 'pass' | 'fail' | 'not shown' | 'undecided' | 'not applicable';
  /** Null where nothing was judged as one number. */
  rounded: number | null;
  margin: number | null;
  borderline: boolean;
  /** False where the contract does not say which number stands for an undecided or censored result. */
  figuresAreLaidDown: boolean;
}

export function worldOf(record: MixRecord, base: RuleSet, layers: Layer[], context: CheckContext): World {
  return { record, context, edition: layOut(base, layers) };
}

export function without(outcome: Verdict['outcome']): Omit<Verdict, 'rule' | 'subject'> {
  return { outcome, rounded: null, margin: null, borderline: false, figuresAreLaidDown: true };
}
