import { and, asc, desc, eq, inArray, isNull, or, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { Database } from '../client';
import { checks, notes } from '../schema/checks';
import { organisations, people } from '../schema/people';
import { projects } from '../schema/projects';
import { returns } from '../schema/returns';
import { revisions, submittals } from '../schema/submittals';
import { newestCheck, revisionColumns } from './revisions';

export type QueueRow = Awaited<ReturnType<typeof listQueue>>[number];

const newer = alias(revisions, 'newer');

function build(db: Database) {
  return db
    .select({
      submittal: { id: submittals.id, mixDesignation: submittals.mixDesignation },
      revision: revisionColumns,
      project: { id: projects.id, number: projects.number, title: projects.title },
      contractor: { id: organisations.id, name: organisations.name },
      reviewer: people.name,
      summary: checks.summary,
      returnState: returns.state,
      signingEngineerId: returns.signingEngineerId,
    })
    .from(revisions)
    .innerJoin(submittals, eq(submittals.id, revisions.submittalId))
    .innerJoin(projects, eq(projects.id, submittals.projectId))
    .innerJoin(organisations, eq(organisations.id, submittals.contractorId))
    .leftJoin(people, eq(people.id, revisions.takenById))
    .leftJoin(returns, eq(returns.revisionId, revisions.id))
    .leftJoin(checks, and(eq(checks.revisionId, revisions.id), eq(checks.number, newestCheck)))
    .leftJoin(
      newer,
      and(
        eq(newer.submittalId, revisions.submittalId),
        sql`${newer.number} = ${revisions.number} + 1`,
        sql`${newer.state} <> 'draft'`,
      ),
    )
    .where(
      and(
        eq(revisions.agencyId, sql.placeholder('agencyId')),
        or(
          inArray(revisions.state, ['submitted', 'in review']),
          and(
            eq(revisions.state, 'returned'),
            eq(revisions.disposition, 'revise and resubmit'),
            // Once the next revision is in, the agency waits no longer.
            isNull(newer.id),
          ),
        ),
      ),
    )
    .orderBy(asc(revisions.dueOn), asc(submittals.mixDesignation), asc(revisions.id))
    .prepare();
}

const prepared = new WeakMap<Database, ReturnType<typeof build>>();

/** What an agency has to decide, by due date, and what it waits for. */
export function listQueue(db: Database, agencyId: string) {
  const query = prepared.get(db) ?? build(db);
  prepared.set(db, query);
  return query.execute({ agencyId });
}

/** Internal notes of the agency on a submittal, newest first. */
export function internalNotes(db: Database, agencyId: string, submittalId: string) {
  return db
    .select({ text: notes.text, by: people.name, at: notes.createdAt })
    .from(notes)
    .innerJoin(people, eq(people.id, notes.personId))
    .where(
      and(eq(notes.submittalId, submittalId), eq(notes.organisationId, agencyId), eq(notes.kind, 'internal')),
    )
    .orderBy(desc(notes.createdAt), desc(notes.id))
    .limit(20);
}
