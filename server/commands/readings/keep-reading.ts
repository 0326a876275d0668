import { and, eq, lt, ne } from 'drizzle-orm';
import { evaluate } from '#rules/engine/evaluate';
import type { CheckResult } from '#rules/engine/finding';
import type { ReadingResult } from '#rules/reading/reading-result';
import type { CheckContext, MixRecord } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { dateOfInstant } from '#shared/format/dates';
import type { Database } from '../../db/client';
import { type Reader, revisionsOf } from '../../db/queries/reader';
import { listReadingActs } from '../../db/queries/reading-acts';
import { listTypedAttributes } from '../../db/queries/records';
import type { RevisionRow } from '../../db/queries/revisions';
import type { SectionSnapshot } from '../../db/queries/section-snapshot';
import { mixRecords, readings, revisions, submittals } from '../../db/schema/submittals';
import type { Deps } from '../../deps';
import { changeSummary } from '../../presenters/change-summary';
import { mixDescription } from '../../presenters/mix-description';
import { storeCheck } from '../checks/store-check';
import { typedInForce } from './acts-in-force';
import { composeRecord } from './compose-record';
import { keepDocuments } from './keep-documents';
import type { MappingUsed } from './read-grid';

export interface KeptReading {
  reader: Reader;
  row: Pick<RevisionRow, 'revision' | 'submittal' | 'project' | 'agency'>;
  /** As it stands now, and its resolved edition. */
  section: SectionSnapshot;
  edition: ResolvedEdition;
  read: ReadingResult;
  mapping: MappingUsed;
  /** Null where the product itself reads it. */
  madeById: string | null;
}

/** Keeps how a draft was read: canonical record, searchable readings, documents and a new pre-check, all or none. */
export async function keepReading(
  tx: Database,
  deps: Pick<Deps, 'now' | 'newId'>,
  { reader, row, section, edition, read, mapping, madeById }: KeptReading,
): Promise<{ record: MixRecord; result: CheckResult; context: CheckContext }> {
  const { revision, project, agency } = row;
  const record = composeRecord({
    read,
    typed: await listTypedAttributes(tx, reader, revision.id),
    typedReadings: typedInForce(await listReadingActs(tx, reader, revision.id)).map(({ reading }) => reading),
    documents: await keepDocuments(tx, deps, { reader, revision, stated: read.record.documents }),
    edition,
    facts: project.facts,
  });
  const now = deps.now();
  const submittedOn = dateOfInstant(now.toISOString(), agency.timeZone);
  const context = { submittedOn, lettingOn: project.lettingOn, facts: project.facts };
  const result = evaluate(record, edition, context);
  await storeRecord(tx, deps, { revision, record, read, mapping, recordHash: result.seal.record });
  await storeCheck(tx, deps, { reader, revision, kind: 'pre-check', context, result, madeById });
  await tx
    .update(revisions)
    .set({
      description: mixDescription(record.attributes).slice(0, 300),
      doubtCount: record.doubts.length,
      changes: await changesSinceBefore(tx, reader, { revision, record }),
      section,
      mappingId: mapping.learned?.id ?? null,
      mappingNumber: mapping.learned?.number ?? null,
      updatedAt: now,
    })
    .where(eq(revisions.id, revision.id));
  await tx.update(submittals).set({ updatedAt: now }).where(eq(submittals.id, revision.submittalId));
  return { record, result, context };
}

interface StoreRecord {
  revision: KeptReading['row']['revision'];
  record: MixRecord;
  read: ReadingResult;
  mapping: KeptReading['mapping'];
  recordHash: string;
}

async function storeRecord(
  tx: Database,
  { now, newId }: Pick<Deps, 'now' | 'newId'>,
  { revision, record, read, mapping, recordHash }: StoreRecord,
): Promise<void> {
  const tenant = {
    revisionId: revision.id,
    agencyId: revision.agencyId,
    contractorId: revision.contractorId,
  };
  const kept = {
    record,
    recordHash,
    reading: read,
    mapping: mapping.document,
    mappingName: mapping.name,
    readAt: now(),
  };
  await tx
    .insert(mixRecords)
    .values({ ...tenant, ...kept })
    .onDuplicateKeyUpdate({ set: kept });
  await tx.delete(readings).where(eq(readings.revisionId, revision.id));
  const rows = record.readings.map(({ quantity, value, qualifier, unit, at, origin, source }, position) => ({
    id: newId(),
    ...tenant,
    position,
    quantity,
    value: value === null ? null : String(value),
    qualifier: qualifier ?? null,
    unit,
    trial: at.trial ?? null,
    specimen: at.specimen ?? null,
    sieveMm: at.sieve === undefined ? null : String(at.sieve),
    origin,
    sheet: source?.sheet ?? null,
    cell: source?.cell ?? null,
  }));
  for (let from = 0; from < rows.length; from += 500) {
    await tx.insert(readings).values(rows.slice(from, from + 500));
  }
}

/** In words, against the newest revision before that was submitted; null for the first. */
async function changesSinceBefore(
  tx: Database,
  reader: Reader,
  { revision, record }: Pick<StoreRecord, 'revision' | 'record'>,
): Promise<string | null> {
  const earlier = await tx
    .select({ number: revisions.number, record: mixRecords.record })
    .from(revisions)
    .innerJoin(mixRecords, eq(mixRecords.revisionId, revisions.id))
    .where(
      and(
        eq(revisions.submittalId, revision.submittalId),
        lt(revisions.number, revision.number),
        ne(revisions.state, 'draft'),
        revisionsOf(reader),
      ),
    )
    .orderBy(revisions.number);
  const previous = earlier.at(-1);
  return previous === undefined ? null : changeSummary(previous.record, record);
}
