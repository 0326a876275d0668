import { and, desc, eq, max } from 'drizzle-orm';
import type { Database } from '../client';
import { checks } from '../schema/checks';
import { people } from '../schema/people';
import { ofTenant, type Reader } from './reader';

export type CheckRow = typeof checks.$inferSelect;

/** The check that is shown of a revision, with its evidence document; null before the workbook is read. */
export async function newestCheckOf(
  db: Database,
  reader: Reader,
  revisionId: string,
): Promise<CheckRow | null> {
  const [row] = await db
    .select()
    .from(checks)
    .where(ofRevision(reader, revisionId))
    .orderBy(desc(checks.number))
    .limit(1);
  return row ?? null;
}

/** The same without the evidence, for pages that only count. */
export async function newestCheckHead(db: Database, reader: Reader, revisionId: string) {
  const [row] = await db
    .select({
      id: checks.id,
      kind: checks.kind,
      number: checks.number,
      submittedOn: checks.submittedOn,
      resolvedHash: checks.resolvedHash,
      seal: checks.seal,
      summary: checks.summary,
    })
    .from(checks)
    .where(ofRevision(reader, revisionId))
    .orderBy(desc(checks.number))
    .limit(1);
  return row ?? null;
}

const head = {
  number: checks.number,
  kind: checks.kind,
  madeAt: checks.madeAt,
  madeBy: people.name,
  submittedOn: checks.submittedOn,
  resolvedHash: checks.resolvedHash,
  engineVersion: checks.engineVersion,
  seal: checks.seal,
  summary: checks.summary,
};

export type CheckHeadRow = Awaited<ReturnType<typeof listCheckHeads>>[number];

/** Every check of a revision that is kept, newest first, without the evidence. */
export function listCheckHeads(db: Database, reader: Reader, revisionId: string) {
  return db
    .select(head)
    .from(checks)
    .leftJoin(people, eq(people.id, checks.madeById))
    .where(ofRevision(reader, revisionId))
    .orderBy(desc(checks.number));
}

/** One check of a revision with its evidence, or null. */
export async function findCheck(
  db: Database,
  reader: Reader,
  { revisionId, number }: { revisionId: string; number: number },
) {
  const [row] = await db
    .select({ head, result: checks.result })
    .from(checks)
    .leftJoin(people, eq(people.id, checks.madeById))
    .where(and(ofRevision(reader, revisionId), eq(checks.number, number)));
  return row ?? null;
}

export async function nextCheckNumber(db: Database, reader: Reader, revisionId: string): Promise<number> {
  const [row] = await db
    .select({ number: max(checks.number) })
    .from(checks)
    .where(ofRevision(reader, revisionId));
  return (row?.number ?? 0) + 1;
}

/** A draft keeps one pre-check; its findings go with it. */
export async function removePreChecks(db: Database, reader: Reader, revisionId: string): Promise<void> {
  await db.delete(checks).where(and(ofRevision(reader, revisionId), eq(checks.kind, 'pre-check')));
}

function ofRevision(reader: Reader, revisionId: string) {
  return and(eq(checks.revisionId, revisionId), ofTenant(checks, reader));
}
