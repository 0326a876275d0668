import { and, asc, count, eq, gt, inArray, like } from 'drizzle-orm';
import type { Database } from '../client';
import { agencyContractors, invitations, members, organisations } from '../schema/people';
import { projectContractors, projects } from '../schema/projects';

interface OfAgency {
  agencyId: string;
  now: Date;
}

/**
 * Contractors that work with an agency, by name; their projects are counted with this agency only. How many people
 * a contractor has is its own affair: the agency is told whether the first has joined.
 */
export async function listContractorsOf(db: Database, { agencyId, now }: OfAgency) {
  const contractors = await db
    .select({ id: organisations.id, name: organisations.name })
    .from(agencyContractors)
    .innerJoin(organisations, eq(organisations.id, agencyContractors.contractorId))
    .where(eq(agencyContractors.agencyId, agencyId))
    .orderBy(asc(organisations.name), asc(organisations.id));
  const ids = contractors.map(({ id }) => id);
  if (ids.length === 0) return [];
  const projectCounts = await db
    .select({ id: projectContractors.contractorId, total: count() })
    .from(projectContractors)
    .innerJoin(projects, eq(projects.id, projectContractors.projectId))
    .where(and(eq(projects.agencyId, agencyId), inArray(projectContractors.contractorId, ids)))
    .groupBy(projectContractors.contractorId);
  const joined = await db
    .selectDistinct({ id: members.organisationId })
    .from(members)
    .innerJoin(agencyContractors, eq(agencyContractors.contractorId, members.organisationId))
    .where(eq(agencyContractors.agencyId, agencyId));
  const open = await db
    .select({ id: invitations.organisationId })
    .from(invitations)
    .where(
      and(
        inArray(invitations.organisationId, ids),
        eq(invitations.invitedFromId, agencyId),
        eq(invitations.status, 'pending'),
        gt(invitations.expiresAt, now),
      ),
    );
  return contractors.map((contractor) => ({
    ...contractor,
    projects: projectCounts.find(({ id }) => id === contractor.id)?.total ?? 0,
    joined: joined.some(({ id }) => id === contractor.id),
    invited: open.some(({ id }) => id === contractor.id),
  }));
}

/** A contractor that works with the agency; null for any other organisation. */
export async function findContractorOf(
  db: Database,
  { agencyId, contractorId }: { agencyId: string; contractorId: string },
) {
  const [row] = await db
    .select({ id: organisations.id, name: organisations.name })
    .from(agencyContractors)
    .innerJoin(organisations, eq(organisations.id, agencyContractors.contractorId))
    .where(and(eq(agencyContractors.agencyId, agencyId), eq(agencyContractors.contractorId, contractorId)))
    .limit(1);
  return row ?? null;
}

export async function hasAdministrator(
  db: Database,
  { agencyId, contractorId }: { agencyId: string; contractorId: string },
): Promise<boolean> {
  const rows = await db
    .select({ id: members.id })
    .from(members)
    .innerJoin(agencyContractors, eq(agencyContractors.contractorId, members.organisationId))
    .where(
      and(
        eq(agencyContractors.agencyId, agencyId),
        eq(members.organisationId, contractorId),
        like(members.role, '%administrator%'),
      ),
    )
    .limit(1);
  return rows.length > 0;
}
