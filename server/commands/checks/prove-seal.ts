import { evaluate } from '#rules/engine/evaluate';
import type { Seal } from '#rules/engine/finding';
import type { Database } from '../../db/client';
import { newestCheckOf } from '../../db/queries/checks';
import type { Reader } from '../../db/queries/reader';
import { findMixRecord } from '../../db/queries/records';
import { loadResolvedEdition } from '../../db/resolved-edition';

export interface SealProof {
  result: 'same' | 'other engine version' | 'different';
  stored: Seal;
  repeated: Seal;
}

/** Runs a stored check again on the record, edition and context that it names; null where there is no check. */
export async function proveSeal(db: Database, reader: Reader, revisionId: string): Promise<SealProof | null> {
  const check = await newestCheckOf(db, reader, revisionId);
  const kept = await findMixRecord(db, reader, revisionId);
  if (check === null || kept === null) return null;
  const edition = await loadResolvedEdition(db, check.resolvedHash);
  const { seal: repeated } = evaluate(kept.record, edition, check.context);
  const { seal: stored } = check.result;
  return { result: compareSeals(stored, repeated), stored, repeated };
}

/** A check by another engine version may differ and is never called broken. */
export function compareSeals(stored: Seal, repeated: Seal): SealProof['result'] {
  if (stored.seal === repeated.seal) return 'same';
  return stored.engine === repeated.engine ? 'different' : 'other engine version';
}
