import { evaluate } from '#rules/engine/evaluate';
import type { CheckResult, Finding } from '#rules/engine/finding';
import type { CheckContext, MixRecordInput } from '#rules/record';
import type { RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { aContext, aRecord } from '#tests/builders/a-record';
import { anEdition, aRule } from '#tests/builders/a-rule-set';

export interface Check {
  rule?: Partial<RuleInput>;
  edition?: Partial<RuleSetInput>;
  record?: MixRecordInput;
  context?: Partial<CheckContext>;
}

/** The whole result of a check with one rule. */
export function checkWith({ rule = {}, edition = {}, record = {}, context = {} }: Check): CheckResult {
  return evaluate(aRecord(record), anEdition({ rules: [aRule(rule)], ...edition }), aContext(context));
}

/** The findings of that rule alone, without what does not add up. */
export function findingsOf(check: Check): Finding[] {
  return checkWith(check).findings.filter(({ kind }) => kind !== 'consistency');
}

/** Its only finding; fails the test where there are several. */
export function findingOf(check: Check): Finding {
  const [finding, ...others] = findingsOf(check);
  if (!finding || others.length > 0)
    throw new Error(`Expected one finding, got ${others.length + (finding ? 1 : 0)}.`);
  return finding;
}
