import { and, desc, eq, lt, lte, or, type SQL, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { RevisionState } from '#shared/contracts/submittals';
import type { Database } from '../client';
import { checks } from '../schema/checks';
import { organisations } from '../schema/people';
import { projects } from '../schema/projects';
import { revisions, submittals } from '../schema/submittals';
import type { Cursor } from './cursor';
import type { Reader } from './reader';
import { newestCheck, revisionColumns } from './revisions';

export interface SubmittalFilter {
  state?: RevisionState | undefined;
  project?: string | undefined;
  q?: string | undefined;
  after?: Cursor | undefined;
  rows: number;
}

export type SubmittalRow = Awaited<ReturnType<typeof listSubmittals>>[number];

/**
 * A page of submittals with the latest revision that the reader may see, newest change first. The page is a range
 * over one index with a tie-break, and each combination of filters is built once.
 */
export async function listSubmittals(db: Database, reader: Reader, filter: SubmittalFilter) {
  const { state, project, q, after, rows } = filter;
  const found = await preparedFor(db, reader, filter).execute({
    organisationId: reader.organisationId,
    rows,
    ...(state === undefined ? {} : { state }),
    ...(project === undefined ? {} : { project }),
    ...(q === undefined ? {} : { pattern: `%${escapeLike(q)}%` }),
    ...(after === undefined ? {} : { at: after.at, id: after.id }),
  });
  return found.map(complete);
}

type Found = Awaited<ReturnType<Prepared['execute']>>[number];

/** The joins are outer for the optimizer's sake only: every submittal has all of these. */
function complete({ revision, project, contractor: builder, agency: judge, ...row }: Found) {
  if (revision === null || project === null || builder === null || judge === null) {
    throw new Error(`Submittal ${row.id} lacks its revision, project or organisations.`);
  }
  return { ...row, revision, project, contractor: builder, agency: judge };
}

const contractor = alias(organisations, 'contractor');
const agency = alias(organisations, 'agency');
const latest = alias(revisions, 'latest');

/**
 * Outer joins keep the order of the joins: from an inner one the optimizer starts at the few projects and sorts every
 * submittal of the agency for one page.
 */
function build(db: Database, reader: Reader, filter: SubmittalFilter) {
  const changedAt = reader.kind === 'agency' ? submittals.agencyUpdatedAt : submittals.updatedAt;
  const conditions: (SQL | undefined)[] = [
    eq(
      reader.kind === 'agency' ? submittals.agencyId : submittals.contractorId,
      sql.placeholder('organisationId'),
    ),
    reader.kind === 'agency' ? sql`${submittals.agencyUpdatedAt} is not null` : undefined,
  ];
  if (filter.state !== undefined) conditions.push(eq(revisions.state, sql.placeholder('state')));
  if (filter.project !== undefined) conditions.push(eq(submittals.projectId, sql.placeholder('project')));
  if (filter.q !== undefined) {
    const searched = [submittals.mixDesignation, revisions.description, projects.number, projects.title];
    conditions.push(or(...searched.map((column) => sql`${column} like ${sql.placeholder('pattern')}`)));
  }
  if (filter.after !== undefined) {
    const at = sql.placeholder('at');
    conditions.push(and(lte(changedAt, at), or(lt(changedAt, at), lt(submittals.id, sql.placeholder('id')))));
  }
  return db
    .select({
      id: submittals.id,
      mixDesignation: submittals.mixDesignation,
      standingRevision: submittals.standingRevision,
      standingDisposition: submittals.standingDisposition,
      standingOn: submittals.standingOn,
      changedAt,
      project: { id: projects.id, number: projects.number, title: projects.title },
      contractor: { id: contractor.id, name: contractor.name },
      agency: { id: agency.id, name: agency.name, timeZone: agency.timeZone },
      revision: revisionColumns,
      summary: checks.summary,
    })
    .from(submittals)
    .leftJoin(latest, and(eq(latest.submittalId, submittals.id), eq(latest.number, submittals.latestNumber)))
    .leftJoin(
      revisions,
      and(eq(revisions.submittalId, submittals.id), eq(revisions.number, visibleNumber(reader))),
    )
    .leftJoin(projects, eq(projects.id, submittals.projectId))
    .leftJoin(contractor, eq(contractor.id, submittals.contractorId))
    .leftJoin(agency, eq(agency.id, submittals.agencyId))
    .leftJoin(checks, and(eq(checks.revisionId, revisions.id), eq(checks.number, newestCheck)))
    .where(and(...conditions))
    .orderBy(desc(changedAt), desc(submittals.id))
    .limit(sql.placeholder('rows'))
    .prepare();
}

/** Only the latest revision can be a draft, so what the agency sees lies at most one before it. */
function visibleNumber(reader: Reader): SQL<number> {
  return reader.kind === 'agency'
    ? sql<number>`${submittals.latestNumber} - (${latest.state} = 'draft')`
    : sql<number>`${submittals.latestNumber}`;
}

type Prepared = ReturnType<typeof build>;
const prepared = new WeakMap<Database, Map<string, Prepared>>();

function preparedFor(db: Database, reader: Reader, filter: SubmittalFilter): Prepared {
  const variant = [
    reader.kind,
    filter.state !== undefined,
    filter.project !== undefined,
    filter.q !== undefined,
    filter.after !== undefined,
  ].join();
  const kept = prepared.get(db) ?? new Map<string, Prepared>();
  prepared.set(db, kept);
  const found = kept.get(variant) ?? build(db, reader, filter);
  kept.set(variant, found);
  return found;
}

function escapeLike(text: string): string {
  return text.replace(/[\\%_]/g, '\\$&');
}
