import type { RuleView } from '#shared/contracts/rule-sets';
import { sectionOfClause } from '#shared/format/clause';
import { groupBy } from '../../../lib/group-by';

export interface RuleGroup {
  /** `412.03` */
  section: string;
  rules: RuleView[];
}

/** Rules under the section their clause hangs from, in the order in which they stand in the edition. */
export function groupRules(rules: readonly RuleView[]): RuleGroup[] {
  return [...groupBy(rules, (rule) => sectionOfClause(rule.clause) ?? '')].map(([section, inSection]) => ({
    section,
    rules: inSection,
  }));
}
