import { and, asc, desc, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { files } from '../schema/files';
import { people } from '../schema/people';
import {
  answers,
  documents,
  mixRecords,
  replacedWorkbooks,
  revisions,
  typedAttributes,
} from '../schema/submittals';
import { ofTenant, type Reader, revisionsOf } from './reader';

/** The canonical record of a revision, and how it was read; null before the workbook is read. */
export async function findMixRecord(db: Database, reader: Reader, revisionId: string) {
  const [row] = await db
    .select()
    .from(mixRecords)
    .where(and(eq(mixRecords.revisionId, revisionId), ofTenant(mixRecords, reader)));
  return row ?? null;
}

export function listAnswers(db: Database, reader: Reader, revisionId: string) {
  return db
    .select({ sheet: answers.sheet, cell: answers.cell, text: answers.text, answer: answers.answer })
    .from(answers)
    .innerJoin(revisions, eq(revisions.id, answers.revisionId))
    .where(and(eq(answers.revisionId, revisionId), revisionsOf(reader)))
    .orderBy(asc(answers.sheet), asc(answers.cell));
}

export function listTypedAttributes(db: Database, reader: Reader, revisionId: string) {
  return db
    .select({
      name: typedAttributes.name,
      value: typedAttributes.value,
      by: people.name,
      on: typedAttributes.typedOn,
    })
    .from(typedAttributes)
    .innerJoin(revisions, eq(revisions.id, typedAttributes.revisionId))
    .innerJoin(people, eq(people.id, typedAttributes.personId))
    .where(and(eq(typedAttributes.revisionId, revisionId), revisionsOf(reader)))
    .orderBy(asc(typedAttributes.name));
}

export type DocumentRow = Awaited<ReturnType<typeof listDocuments>>[number];

export function listDocuments(db: Database, reader: Reader, revisionId: string) {
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
    .where(and(eq(documents.revisionId, revisionId), ofTenant(documents, reader)))
    .orderBy(asc(documents.position), asc(documents.id));
}

/** Workbooks of a draft that later uploads replaced, newest first. They are their contractor's alone. */
export function listReplacedWorkbooks(db: Database, contractorId: string, revisionId: string) {
  return db
    .select({
      id: replacedWorkbooks.id,
      fileId: files.id,
      fileName: files.fileName,
      bytes: files.sizeBytes,
      replacedBy: people.name,
      replacedAt: replacedWorkbooks.replacedAt,
    })
    .from(replacedWorkbooks)
    .innerJoin(files, eq(files.id, replacedWorkbooks.fileId))
    .innerJoin(people, eq(people.id, replacedWorkbooks.replacedById))
    .where(
      and(eq(replacedWorkbooks.revisionId, revisionId), eq(replacedWorkbooks.contractorId, contractorId)),
    )
    .orderBy(desc(replacedWorkbooks.replacedAt), desc(replacedWorkbooks.id));
}

/** Bytes of a stored file with its name. */
export async function loadFile(db: Database, reader: Reader, fileId: string) {
  const [row] = await db
    .select({ bytes: files.bytes, mediaType: files.mediaType, fileName: files.fileName })
    .from(files)
    .where(and(eq(files.id, fileId), ofTenant(files, reader)));
  return row ?? null;
}
