import { and, eq } from 'drizzle-orm';
import type { CheckResult } from '#rules/engine/finding';
import type { ReadingResult } from '#rules/reading/reading-result';
import type { CheckContext, MixRecord } from '#rules/record';
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
import type { MappingUsed } from './read-grid';

export interface DraftChange {
  actor: Actor;
  row: RevisionRow;
}

export interface KeptDraft {
  read: ReadingResult;
  mapping: MappingUsed;
  record: MixRecord;
  /** The workbook's file; it may have been replaced since the page was opened. */
  fileId: string;
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
): Promise<ChangedDraft> {
  const { revision, submittal } = row;
  return deps.db.transaction(async (tx) => {
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
      mapping: { name: record.mappingName, document: record.mapping, learned: learnedOf(locked) },
      record: record.record,
      fileId: locked.workbookFileId,
      section,
      edition,
    };
    const reread = (await change(tx, kept)) ?? kept;
    const changed = await keepReading(tx, deps, {
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
    return { before: kept, ...changed };
  });
}

interface ChangedDraft {
  before: KeptDraft;
  record: MixRecord;
  result: CheckResult;
  context: CheckContext;
}

/** The laboratory's mapping that a revision's workbook was read with, where it was one. */
export function learnedOf({
  mappingId,
  mappingNumber,
}: Pick<RevisionRow['revision'], 'mappingId' | 'mappingNumber'>): MappingUsed['learned'] {
  return mappingId === null || mappingNumber === null ? null : { id: mappingId, number: mappingNumber };
}
