import type { ResolvedEdition, ResolvedRule } from '../../rule-sets/resolve';
import { tablesOf } from '../../rule-sets/tables-of';
import type { LintRemark } from './remark';

/** Rules whose clause, source or verification leaves a reader without proof. */
export function lintSources(edition: ResolvedEdition): LintRemark[] {
  const memory = new Set(
    edition.tables.filter(({ source }) => source?.origin === 'memory').map(({ id }) => id),
  );
  return [
    ...edition.rules.flatMap((rule) => [...withoutSource(rule), ...fromMemory(rule, memory)]),
    ...sharedClauses(edition.rules),
  ];
}

function withoutSource({ id, title, source }: ResolvedRule): LintRemark[] {
  const says = [source?.title, source?.number, source?.section].some((text) => text);
  if (says || source?.origin === 'agency') return [];
  return [
    {
      level: 'warning',
      check: 'missing source',
      part: `rules/${id}`,
      detail: `${title} names no source.`,
      fix: 'Name the document and section, or say that it is the agency’s own.',
    },
  ];
}

function fromMemory(rule: ResolvedRule, memory: ReadonlySet<string>): LintRemark[] {
  const isMemory = rule.source?.origin === 'memory' || [...tablesOf(rule)].some((id) => memory.has(id));
  if (!isMemory || rule.verifiedBy) return [];
  return [
    {
      level: 'warning',
      check: 'from memory',
      part: `rules/${rule.id}`,
      detail: `${rule.title} has a limit from memory that nobody has verified.`,
      fix: 'Hold it against the printed standard, then have a second author verify it.',
    },
  ];
}

function sharedClauses(rules: readonly ResolvedRule[]): LintRemark[] {
  const first = new Map<string, string>();
  return rules.flatMap(({ id, title, clause }): LintRemark[] => {
    const other = first.get(clause);
    if (other === undefined) {
      first.set(clause, title);
      return [];
    }
    return [
      {
        level: 'warning',
        check: 'clause used twice',
        part: `rules/${id}`,
        detail: `${title} stands at clause ${clause}, as ${other} does.`,
        fix: 'Give each rule a clause of its own, such as a letter after it.',
      },
    ];
  });
}
