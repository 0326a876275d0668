import { and, asc, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { readingActs } from '../schema/learning';
import { people } from '../schema/people';
import { revisions } from '../schema/submittals';
import { type Reader, revisionsOf } from './reader';

/** Everything that people did to the reading of a revision, oldest first. */
export async function listReadingActs(db: Database, reader: Reader, revisionId: string) {
  const rows = await db
    .select({
      id: readingActs.id,
      fileId: readingActs.fileId,
      act: readingActs.act,
      takesBackId: readingActs.takesBackId,
      by: people.name,
      at: readingActs.at,
    })
    .from(readingActs)
    .innerJoin(revisions, eq(revisions.id, readingActs.revisionId))
    .innerJoin(people, eq(people.id, readingActs.personId))
    .where(and(eq(readingActs.revisionId, revisionId), revisionsOf(reader)))
    .orderBy(asc(readingActs.at), asc(readingActs.id));
  const takenBack = new Map(rows.map((row) => [row.takesBackId, { by: row.by, at: row.at }]));
  return rows.map((row) => ({ ...row, takenBack: takenBack.get(row.id) ?? null }));
}

export type ReadingAct = Awaited<ReturnType<typeof listReadingActs>>[number];
