import { type EditionView, viewOf } from '../../rule-sets/edition-view';
import type { ResolvedEdition, ResolvedRule } from '../../rule-sets/resolve';
import { conditionClause } from '../../rule-sets/sentences';
import { holds, pointsOf } from './condition-points';
import type { LintRemark } from './remark';

/** Rules that no mix meets, and conditions that every mix meets. */
export function lintConditions(edition: ResolvedEdition): LintRemark[] {
  const view = viewOf(edition);
  return edition.rules.flatMap((rule) => lintCondition(rule, view));
}

function lintCondition({ id, title, when }: ResolvedRule, view: EditionView): LintRemark[] {
  if (when === undefined) return [];
  const points = pointsOf([when], view);
  if (points === null) return [];
  const met = points.filter((point) => holds(when, point)).length;
  const part = `rules/${id}`;
  if (met === 0) {
    return [
      {
        level: 'error',
        check: 'never applies',
        part,
        detail: `${title} never applies: no mix meets “${conditionClause(when, view)}”.`,
        fix: 'Loosen its condition, or remove the rule.',
      },
    ];
  }
  if (met < points.length) return [];
  return [
    {
      level: 'warning',
      check: 'always applies',
      part,
      detail: `${title} has a condition that every mix meets.`,
      fix: 'Remove the condition, or say what it was meant to leave out.',
    },
  ];
}
