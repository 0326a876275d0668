import { ENGINE_VERSION } from '#rules/engine/engine-version';
import { explainFindings } from '#rules/engine/explain';
import type { Explanation } from '#rules/engine/explanation';
import { recordHash } from '#rules/engine/seal';
import type { MixRecord } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { CheckRow } from '../db/queries/checks';

type Explained = Pick<CheckRow, 'id' | 'result' | 'context' | 'recordHash' | 'engineVersion'>;

/**
 * Why each limit, and what would pass, by finding. Only where the record that was judged is still at hand and the
 * engine is the one that judged it; else another engine's words would stand beside its findings.
 */
export function explainCheck(
  check: Explained,
  record: MixRecord,
  edition: ResolvedEdition,
): Record<string, Explanation> {
  const known = kept.get(check.id);
  if (known) return known;
  const { result, context, engineVersion } = check;
  if (engineVersion !== ENGINE_VERSION || recordHash(record) !== check.recordHash) return {};
  const explanations = explainFindings({ record, edition, context, findings: result.findings });
  if (kept.size >= keptChecks) kept.delete([...kept.keys()][0] ?? '');
  kept.set(check.id, explanations);
  return explanations;
}

/** A check never changes, and is looked at more than once. */
const kept = new Map<string, Record<string, Explanation>>();
const keptChecks = 64;
