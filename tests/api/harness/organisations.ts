import { newOrganisation } from '#server/commands/organisation/new-organisation';
import { createPerson } from '#server/commands/people/create-person';
import { rolesToColumn } from '#server/db/roles-column';
import { agencyContractors, members, organisations } from '#server/db/schema/people';
import type { OrganisationKind, Role } from '#shared/contracts/roles';
import { type Browser, browser, type TestApp } from './test-app';

export const password = 'a password of the tests';

interface Made {
  id: string;
  name: string;
}

export async function makeOrganisation(
  { deps }: TestApp,
  { name, kind }: { name: string; kind: OrganisationKind },
): Promise<Made> {
  const id = deps.newId();
  await deps.db.insert(organisations).values({
    ...newOrganisation({ id, name, kind, createdAt: deps.now() }),
    ...(kind === 'agency' ? { timeZone: 'Europe/London' } : {}),
  });
  return { id, name };
}

export async function makePerson(
  { deps }: TestApp,
  { name, email }: { name: string; email: string },
): Promise<{ id: string; email: string }> {
  const id = await createPerson(deps.db, deps, { name, email, password });
  return { id, email };
}

export async function makeMember(
  { deps }: TestApp,
  { organisationId, personId, roles }: { organisationId: string; personId: string; roles: Role[] },
): Promise<string> {
  const id = deps.newId();
  await deps.db
    .insert(members)
    .values({ id, organisationId, personId, role: rolesToColumn(roles), createdAt: deps.now() });
  return id;
}

export async function tieContractor(
  { deps }: TestApp,
  { agencyId, contractorId }: { agencyId: string; contractorId: string },
): Promise<void> {
  await deps.db
    .insert(agencyContractors)
    .values({ id: deps.newId(), agencyId, contractorId, createdAt: deps.now() });
}

/** Signs in through the API. */
export async function signIn(test: TestApp, email: string): Promise<Browser> {
  const person = browser(test.app);
  await person.post('/api/session').send({ email, password }).expect(200);
  return person;
}

/** A new person of an organisation with these roles, signed in. */
export async function aSignedIn(
  test: TestApp,
  { organisation, roles, name }: { organisation: Made; roles: Role[]; name?: string },
): Promise<Browser & { personId: string; membershipId: string; email: string }> {
  const id = test.deps.newId();
  const email = `${id}@${organisation.name.toLowerCase().replace(/[^a-z]+/g, '-')}.example`;
  const person = await makePerson(test, { name: name ?? roles.join(' and '), email });
  const membershipId = await makeMember(test, {
    organisationId: organisation.id,
    personId: person.id,
    roles,
  });
  return { ...(await signIn(test, email)), personId: person.id, membershipId, email };
}
