import type { LedgerRow } from './ledger';
import { nameOfFinding } from './row-words';

/** Why a row cannot be waived by this reader, or null where it can; whether they may is said with the revision. */
export function whyNotWaived(
  { finding, waiver }: Pick<LedgerRow, 'finding' | 'waiver'>,
  abilities: { waiveAdvisory: boolean; waiveRequired: boolean },
): string | null {
  const name = nameOfFinding(finding);
  if (finding.outcome !== 'fail') return `${name} is ${finding.outcome}; only a fail can be waived.`;
  if (waiver) return `${name} is waived already.`;
  if (finding.severity === 'advisory' ? abilities.waiveAdvisory : abilities.waiveRequired) return null;
  return `${name} is ${finding.severity}; you may not waive it.`;
}
