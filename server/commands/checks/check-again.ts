import { eq } from 'drizzle-orm';
import { evaluate } from '#rules/engine/evaluate';
import { dateOfInstant } from '#shared/format/dates';
import { findMixRecord } from '../../db/queries/records';
import { lockRevision, type RevisionRow } from '../../db/queries/revisions';
import { snapshotOfSection } from '../../db/queries/section-snapshot';
import { loadResolvedEdition } from '../../db/resolved-edition';
import { revisions } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';
import { learnedOf } from '../readings/change-draft';
import { keepReading } from '../readings/keep-reading';
import { storeCheck } from './store-check';

interface Recheck {
  actor: Actor;
  requestId: string;
  row: RevisionRow;
  version: number;
}

/**
 * A draft's pre-check is made anew as of today. Of what is submitted a new sealed check is added: same record, same
 * date of submission, the section as it stands now; the earlier ones stay.
 */
export async function checkAgain(deps: Deps, { actor, requestId, row, version }: Recheck): Promise<void> {
  const { revision, submittal, project, agency } = row;
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, actor, revision.id);
    const kept = await findMixRecord(tx, actor, revision.id);
    const section = await snapshotOfSection(tx, actor, submittal);
    if (locked === null || kept === null || section === null) {
      throw new Problem('wrong-state', { detail: 'There is no reading to check yet.' });
    }
    if (locked.version !== version) throw new Problem('version-stale');
    const edition = await loadResolvedEdition(tx, section.resolvedHash);
    if (locked.state === 'draft') {
      await keepReading(tx, deps, {
        reader: actor,
        row: { ...row, revision: locked },
        section,
        edition,
        read: kept.reading,
        mapping: { name: kept.mappingName, document: kept.mapping, learned: learnedOf(locked) },
        madeById: actor.personId,
      });
      return;
    }
    const now = deps.now();
    const submittedOn = locked.receivedOn ?? dateOfInstant(now.toISOString(), agency.timeZone);
    const context = { submittedOn, lettingOn: project.lettingOn, facts: project.facts };
    const result = evaluate(kept.record, edition, context);
    await storeCheck(tx, deps, {
      reader: actor,
      revision,
      kind: 'check of record',
      context,
      result,
      madeById: actor.personId,
    });
    await tx
      .update(revisions)
      .set({ section, updatedAt: now, version: version + 1 })
      .where(eq(revisions.id, revision.id));
    await writeAudit(tx, deps, {
      actor,
      act: 'revision checked again',
      subject: { kind: 'revision', id: revision.id },
      detail: { seal: result.seal.seal },
      requestId,
    });
  });
}
