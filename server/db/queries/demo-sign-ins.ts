import { asc, eq } from 'drizzle-orm';
import type { DemoPerson } from '#shared/contracts/session';
import type { Database } from '../client';
import { rolesFromColumn } from '../roles-column';
import { demoSignIns, members, organisations, people } from '../schema/people';

/** People whose password the sign-in page may show; empty without the demo. */
export async function listDemoPeople(db: Database): Promise<DemoPerson[]> {
  const rows = await db
    .select({
      name: people.name,
      email: people.email,
      password: demoSignIns.password,
      organisation: organisations.name,
      role: members.role,
    })
    .from(demoSignIns)
    .innerJoin(people, eq(people.id, demoSignIns.personId))
    .innerJoin(members, eq(members.personId, people.id))
    .innerJoin(organisations, eq(organisations.id, members.organisationId))
    .orderBy(asc(demoSignIns.position));
  return rows.map(({ role, ...person }) => ({ ...person, roles: rolesFromColumn(role) }));
}
