import { and, asc, count, desc, eq, gte, inArray, sql, sum } from 'drizzle-orm';
import type { Database } from '../client';
import { findings, notes } from '../schema/checks';
import { laboratories, organisations, people } from '../schema/people';
import { returns } from '../schema/returns';
import { revisions, submittals } from '../schema/submittals';

const shownNotes = 12;

/** What agencies wrote to a contractor with the returns that still stand, newest first. */
export function notesFromAgencies(db: Database, contractorId: string) {
  return db
    .select({
      note: notes,
      by: people.name,
      revision: { id: revisions.id, number: revisions.number, state: revisions.state },
      mixDesignation: submittals.mixDesignation,
    })
    .from(notes)
    .innerJoin(people, eq(people.id, notes.personId))
    .innerJoin(revisions, eq(revisions.id, notes.revisionId))
    .innerJoin(submittals, eq(submittals.id, notes.submittalId))
    .where(
      and(
        eq(notes.contractorId, contractorId),
        eq(notes.side, 'agency'),
        eq(notes.kind, 'to be returned'),
        eq(revisions.state, 'returned'),
        // Once a later revision is returned, its notes stand in place of these.
        gte(revisions.number, sql`${submittals.latestNumber} - 1`),
      ),
    )
    .orderBy(desc(revisions.returnedAt), asc(notes.createdAt), asc(notes.id))
    .limit(shownNotes);
}

/** Clause by finding key for the findings of some revisions. */
export async function clausesOf(
  db: Database,
  contractorId: string,
  revisionIds: string[],
): Promise<Map<string, string | null>> {
  if (revisionIds.length === 0) return new Map();
  const rows = await db
    .select({
      revisionId: findings.revisionId,
      rule: findings.rule,
      subject: findings.subject,
      clause: findings.clause,
    })
    .from(findings)
    .where(and(inArray(findings.revisionId, revisionIds), eq(findings.contractorId, contractorId)));
  return new Map(rows.map((row) => [`${row.revisionId} ${row.rule}~${row.subject}`, row.clause]));
}

/** The newest return that a contractor was sent. */
export async function lastLetter(db: Database, contractorId: string) {
  const [row] = await db
    .select({
      submittalId: returns.submittalId,
      revision: revisions.number,
      sentAt: returns.sentAt,
      workbookFileId: returns.workbookFileId,
      timeZone: organisations.timeZone,
    })
    .from(returns)
    .innerJoin(organisations, eq(organisations.id, returns.agencyId))
    .innerJoin(revisions, eq(revisions.id, returns.revisionId))
    .where(and(eq(returns.contractorId, contractorId), eq(returns.state, 'sent')))
    .orderBy(desc(returns.sentAt))
    .limit(1);
  return row ?? null;
}

/** Laboratories with how many workbooks of theirs were read, and with how many doubts in all. */
export function laboratoriesRead(db: Database, organisationId: string) {
  return db
    .select({ name: laboratories.name, workbooks: count(revisions.id), doubts: sum(revisions.doubtCount) })
    .from(laboratories)
    .leftJoin(revisions, eq(revisions.laboratoryId, laboratories.id))
    .where(eq(laboratories.organisationId, organisationId))
    .groupBy(laboratories.id, laboratories.name)
    .orderBy(asc(laboratories.name));
}
