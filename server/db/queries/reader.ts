import { and, eq, ne, type SQL, sql } from 'drizzle-orm';
import type { AnyMySqlColumn } from 'drizzle-orm/mysql-core';
import type { OrganisationKind } from '#shared/contracts/roles';
import { projectContractors, projects } from '../schema/projects';
import { returns } from '../schema/returns';
import { revisions, submittals } from '../schema/submittals';

/** The organisation that asks. Every query is filtered by it, whatever its caller has seen before. */
export interface Reader {
  organisationId: string;
  kind: OrganisationKind;
}

/** Rows that carry both sides: an agency sees those that it judges, a contractor its own. */
export function ofTenant(
  table: { agencyId: AnyMySqlColumn; contractorId: AnyMySqlColumn },
  { kind, organisationId }: Reader,
): SQL {
  return eq(kind === 'agency' ? table.agencyId : table.contractorId, organisationId);
}

export function submittalsOf(reader: Reader): SQL {
  return ofTenant(submittals, reader);
}

/** A draft is its contractor's alone. */
export function revisionsOf(reader: Reader): SQL | undefined {
  const own = ofTenant(revisions, reader);
  return reader.kind === 'agency' ? and(own, ne(revisions.state, 'draft')) : own;
}

/** A return is the agency's alone until it is sent. */
export function returnsOf(reader: Reader): SQL | undefined {
  const own = ofTenant(returns, reader);
  return reader.kind === 'agency' ? own : and(own, eq(returns.state, 'sent'));
}

/** An agency sees its own projects, a contractor those that it works on. */
export function projectsOf({ kind, organisationId }: Reader): SQL {
  if (kind === 'agency') return eq(projects.agencyId, organisationId);
  return sql`${projects.id} in (select ${projectContractors.projectId} from ${projectContractors}
    where ${projectContractors.contractorId} = ${organisationId})`;
}
