import type { Finding } from './finding';
import { naturalOrder } from './natural-order';

/** Clause, then subject: 412.03(b) before 412.03(k), 412.2 before 412.10, 0.075 mm before 2.36 mm. */
export function byClauseThenSubject(left: Finding, right: Finding): number {
  return (
    naturalOrder(left.clause ?? '', right.clause ?? '') ||
    bySubject(left.subject, right.subject) ||
    naturalOrder(left.rule, right.rule)
  );
}

function bySubject(left: string, right: string): number {
  const a = sieveMm(left);
  const b = sieveMm(right);
  return a !== null && b !== null ? a - b : naturalOrder(left, right);
}

function sieveMm(subject: string): number | null {
  const match = /^(\d+(?:\.\d+)?) mm$/.exec(subject);
  return match ? Number(match[1]) : null;
}
