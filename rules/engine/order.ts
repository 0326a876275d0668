import type { ResolvedEdition } from '../rule-sets/resolve';
import type { Finding } from './finding';
import { naturalOrder } from './natural-order';

/** Clause, then subject: 412.03(b) before 412.03(k), 412.2 before 412.10, 0.075 mm before 2.36 mm. */
export function inOrder(findings: readonly Finding[], edition: ResolvedEdition): Finding[] {
  const ranks = clauseRanks(edition);
  const rankOf = ({ clause }: Finding) => ranks.get(clause ?? '') ?? -1;
  return findings.toSorted(
    (left, right) =>
      rankOf(left) - rankOf(right) ||
      bySubject(left.subject, right.subject) ||
      naturalOrder(left.rule, right.rule),
  );
}

/** The clauses of an edition are put in order once. */
function clauseRanks(edition: ResolvedEdition): ReadonlyMap<string, number> {
  const kept = ranksOfEditions.get(edition);
  if (kept) return kept;
  const clauses = [...new Set(edition.rules.map(({ clause }) => clause))].toSorted(naturalOrder);
  const ranks = new Map(clauses.map((clause, rank) => [clause, rank]));
  ranksOfEditions.set(edition, ranks);
  return ranks;
}

const ranksOfEditions = new WeakMap<ResolvedEdition, ReadonlyMap<string, number>>();

function bySubject(left: string, right: string): number {
  if (left === right) return 0;
  const a = sieveMm(left);
  const b = sieveMm(right);
  return a !== null && b !== null ? a - b : naturalOrder(left, right);
}

function sieveMm(subject: string): number | null {
  const match = /^(\d+(?:\.\d+)?) mm$/.exec(subject);
  return match ? Number(match[1]) : null;
}
