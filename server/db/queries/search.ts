import { and, desc, eq, like, or } from 'drizzle-orm';
import type { Database } from '../client';
import { projectContractors, projects } from '../schema/projects';
import { listSubmittals } from './list-submittals';
import type { Reader } from './reader';

export const resultsPerKind = 8;

export function searchSubmittals(db: Database, reader: Reader, q: string) {
  return listSubmittals(db, reader, { q, rows: resultsPerKind });
}

export async function searchProjects(db: Database, reader: Reader, q: string) {
  const pattern = `%${q.replace(/[\\%_]/g, '\\$&')}%`;
  const matches = or(like(projects.number, pattern), like(projects.title, pattern));
  const fields = { id: projects.id, number: projects.number, title: projects.title };
  if (reader.kind === 'agency') {
    return db
      .select(fields)
      .from(projects)
      .where(and(eq(projects.agencyId, reader.organisationId), matches))
      .orderBy(desc(projects.createdAt), projects.id)
      .limit(resultsPerKind);
  }
  return db
    .select(fields)
    .from(projects)
    .innerJoin(projectContractors, eq(projectContractors.projectId, projects.id))
    .where(and(eq(projectContractors.contractorId, reader.organisationId), matches))
    .orderBy(desc(projects.createdAt), projects.id)
    .limit(resultsPerKind);
}
