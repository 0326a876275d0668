import { and, eq } from 'drizzle-orm';
import { type Role, rolesOf } from '#shared/contracts/roles';
import { findMember, listMembers } from '../../db/queries/people';
import { rolesToColumn } from '../../db/roles-column';
import { members, organisations, sessions } from '../../db/schema/people';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { expectVersion, expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';
import { isOnlyAdministrator, presentPerson } from '../../presenters/present-person';
import { Problem } from '../../problem';

interface Change {
  actor: Actor;
  membershipId: string;
  version: number;
  requestId: string;
}

export async function changeRoles(deps: Deps, change: Change & { roles: Role[] }): Promise<void> {
  const { actor, membershipId, version, roles, requestId } = change;
  refuseForeignRoles(roles, actor);
  await deps.db.transaction(async (tx) => {
    const { member, only } = await loadMember({ ...deps, db: tx }, change);
    if (only && !roles.includes('administrator')) throw lastAdministrator();
    const result = await tx
      .update(members)
      .set({ role: rolesToColumn(roles), version: version + 1 })
      .where(and(eq(members.id, membershipId), eq(members.version, version)));
    expectWritten(result);
    await writeAudit(tx, deps, {
      actor,
      act: 'roles changed',
      subject: { kind: 'person', id: member.personId },
      detail: { from: member.roles, to: roles },
      requestId,
    });
  });
}

/** Ends the membership and what sessions hold of it; what the person did stays under their name. */
export async function removeMember(deps: Deps, change: Change): Promise<void> {
  const { actor, membershipId, version, requestId } = change;
  await deps.db.transaction(async (tx) => {
    const { member, only } = await loadMember({ ...deps, db: tx }, change);
    if (only) throw lastAdministrator();
    expectWritten(
      await tx.delete(members).where(and(eq(members.id, membershipId), eq(members.version, version))),
    );
    await tx
      .update(sessions)
      .set({ activeOrganisationId: null })
      .where(
        and(eq(sessions.personId, member.personId), eq(sessions.activeOrganisationId, actor.organisationId)),
      );
    await writeAudit(tx, deps, {
      actor,
      act: 'person removed',
      subject: { kind: 'person', id: member.personId },
      detail: { roles: member.roles },
      requestId,
    });
  });
}

/** Locks the organisation, so that two administrators cannot take each other's role away at the same time. */
async function loadMember(deps: Deps, { actor, membershipId, version }: Change) {
  const { organisationId } = actor;
  await deps.db
    .select({ id: organisations.id })
    .from(organisations)
    .where(eq(organisations.id, organisationId))
    .for('update');
  const member = await findMember(deps.db, { membershipId, organisationId });
  if (!member) throw new Problem('not-found');
  const all = await listMembers(deps.db, organisationId);
  const only = isOnlyAdministrator(member, all);
  expectVersion(version, presentPerson(member, { actor, onlyAdministrator: only }));
  return { member, only };
}

export function refuseForeignRoles(roles: readonly Role[], { kind }: Pick<Actor, 'kind'>): void {
  const foreign = roles.filter((role) => !rolesOf(kind).includes(role));
  if (foreign.length === 0) return;
  const detail = `${kind === 'agency' ? 'An agency' : 'A contractor'} has no role ${foreign.join(', ')}.`;
  throw new Problem('invalid-input', { detail, errors: [{ pointer: '/roles', detail }] });
}

function lastAdministrator(): Problem {
  return new Problem('wrong-state', {
    detail: 'This is the only administrator of the organisation.',
    fix: 'Make somebody else administrator first.',
  });
}
