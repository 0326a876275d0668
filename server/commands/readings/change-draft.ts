import { and, eq } from 'drizzle-orm';
import type { ReadingResult } from '#rules/reading/reading-result';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { Database } from '../../db/client';
import { findMixRecord } from '../../db/queries/records';
import { lockRevision, type RevisionRow } from '../../db/queries/revisions';
import { type SectionSnapshot, snapshotOfSection } from '../../db/queries/section-snapshot';
import { loadResolvedEdition } from '../../db/resolved-edition';
import { revisions } from '../../db/schema/submittals';
import type { Deps } from '../../deps';
import { expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';
import { keepReading } from './keep-reading';

export interface DraftChange {
  actor: Actor;
  row: RevisionRow;
}

export interface KeptDraft {
  read: ReadingResult;
  mapping: { name: string; document: Record<string, unknown> };
  section: SectionSnapshot;
  edition: ResolvedEdition;
}

/**
 * A change on the reading page: made under the draft's lock, then the record is put together and checked anew. The
 * change may give another reading of the workbook; without one the kept reading stands.
 */
export async function changeDraft(
  deps: Deps,
  { actor, row }: DraftChange,
  change: (tx: Database, kept: KeptDraft) => Promise<Pick<KeptDraft, 'read' | 'mapping'> | undefined>,
): Promise<void> {
  const { revision, submittal } = row;
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, actor, revision.id);
    if (locked?.state !== 'draft') {
      throw new Problem('wrong-state', { detail: 'Only a draft can be changed.' });
    }
    const record = await findMixRecord(tx, actor, revision.id);
    const section = await snapshotOfSection(tx, actor, submittal);
    if (record === null || section === null) {
      throw new Problem('wrong-state', { detail: 'The workbook has not been read yet.' });
    }
    const edition = await loadResolvedEdition(tx, section.resolvedHash);
    const kept = {
      read: record.reading,
      mapping: { name: record.mappingName, document: record.mapping },
      section,
      edition,
    };
    const reread = (await change(tx, kept)) ?? kept;
    await keepReading(tx, deps, {
      reader: actor,
      row: { ...row, revision: locked },
      section,
      edition,
      read: reread.read,
      mapping: reread.mapping,
      madeById: actor.personId,
    });
    expectWritten(
      await tx
        .update(revisions)
        .set({ version: revision.version + 1 })
        .where(and(eq(revisions.id, revision.id), eq(revisions.version, revision.version))),
    );
  });
}
