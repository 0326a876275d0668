import { eq } from 'drizzle-orm';
import type { DocumentRecord } from '#rules/record';
import type { Database } from '../../db/client';
import type { Reader } from '../../db/queries/reader';
import { type DocumentRow, listDocuments } from '../../db/queries/records';
import { documents } from '../../db/schema/submittals';
import type { Deps } from '../../deps';

interface KeepDocuments {
  reader: Reader;
  revision: { id: string; agencyId: string; contractorId: string };
  stated: readonly DocumentRecord[];
}

/**
 * Brings the document rows of a revision in line with what its workbook states now. A row keeps its file while the
 * workbook still states the same document; a file whose document is no longer stated stays as an added row.
 */
export async function keepDocuments(
  tx: Database,
  { newId }: Pick<Deps, 'newId'>,
  { reader, revision, stated }: KeepDocuments,
): Promise<DocumentRecord[]> {
  const present = (await listDocuments(tx, reader, revision.id)).map((row) => row.document);
  const unmatched = present.filter((row) => !row.added);
  for (const [position, record] of stated.entries()) {
    const found = unmatched.findIndex((row) => row.stated !== null && sameDocument(row.stated, record));
    const [row] = found === -1 ? [] : unmatched.splice(found, 1);
    const fields = { ...fieldsOf(record), position, source: record.source, stated: record };
    if (row !== undefined) {
      await tx.update(documents).set(fields).where(eq(documents.id, row.id));
    } else {
      const tenant = {
        revisionId: revision.id,
        agencyId: revision.agencyId,
        contractorId: revision.contractorId,
      };
      await tx.insert(documents).values({ id: newId(), ...tenant, ...fields, added: false, fileId: null });
    }
  }
  for (const row of unmatched) {
    if (row.fileId === null) await tx.delete(documents).where(eq(documents.id, row.id));
    else {
      const added = { added: true, stated: null, source: null, position: stated.length };
      await tx.update(documents).set(added).where(eq(documents.id, row.id));
    }
  }
  return (await listDocuments(tx, reader, revision.id)).map(recordOf);
}

/** A document row as the engine sees it: enclosed where its file is attached. */
export function recordOf({ document }: Pick<DocumentRow, 'document'>): DocumentRecord {
  return { ...fieldsOf(document), enclosed: document.fileId !== null, source: document.source };
}

function fieldsOf({ type, issuer, reference, date, validTo }: Omit<DocumentRecord, 'enclosed' | 'source'>) {
  return { type, issuer, reference, date, validTo };
}

function sameDocument(one: DocumentRecord, other: DocumentRecord): boolean {
  // A renewed certificate is another document: the old file is not its enclosure.
  return (
    one.type === other.type &&
    one.reference === other.reference &&
    one.issuer === other.issuer &&
    one.date === other.date &&
    one.validTo === other.validTo
  );
}
