import { asc, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { files } from '../schema/files';
import { people } from '../schema/people';
import { answers, documents, mixRecords, typedAttributes } from '../schema/submittals';

/** The canonical record of a revision, and how it was read; null before the workbook is read. */
export async function findMixRecord(db: Database, revisionId: string) {
  const [row] = await db.select().from(mixRecords).where(eq(mixRecords.revisionId, revisionId));
  return row ?? null;
}

export function listAnswers(db: Database, revisionId: string) {
  return db
    .select({ sheet: answers.sheet, cell: answers.cell, text: answers.text, answer: answers.answer })
    .from(answers)
    .where(eq(answers.revisionId, revisionId))
    .orderBy(asc(answers.sheet), asc(answers.cell));
}

export function listTypedAttributes(db: Database, revisionId: string) {
  return db
    .select({
      name: typedAttributes.name,
      value: typedAttributes.value,
      by: people.name,
      on: typedAttributes.typedOn,
    })
    .from(typedAttributes)
    .innerJoin(people, eq(people.id, typedAttributes.personId))
    .where(eq(typedAttributes.revisionId, revisionId))
    .orderBy(asc(typedAttributes.name));
}

export type DocumentRow = Awaited<ReturnType<typeof listDocuments>>[number];

export function listDocuments(db: Database, revisionId: string) {
  return db
    .select({
      document: documents,
      file: {
        id: files.id,
        fileName: files.fileName,
        mediaType: files.mediaType,
        sizeBytes: files.sizeBytes,
      },
    })
    .from(documents)
    .leftJoin(files, eq(files.id, documents.fileId))
    .where(eq(documents.revisionId, revisionId))
    .orderBy(asc(documents.position), asc(documents.id));
}

/** Bytes of a stored file with its name; the caller has checked whose it is. */
export async function loadFile(db: Database, fileId: string) {
  const [row] = await db
    .select({ bytes: files.bytes, mediaType: files.mediaType, fileName: files.fileName })
    .from(files)
    .where(eq(files.id, fileId));
  return row ?? null;
}
