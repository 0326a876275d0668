import { and, asc, desc, eq, gt, or } from 'drizzle-orm';
import type { Database } from '../client';
import { rolesFromColumn } from '../roles-column';
import { invitations, members, organisations, people } from '../schema/people';
import { outbox } from '../schema/work';

const memberColumns = {
  membershipId: members.id,
  personId: people.id,
  name: people.name,
  email: people.email,
  role: members.role,
  version: members.version,
};

/** The people of one organisation, by name. */
export async function listMembers(db: Database, organisationId: string) {
  const rows = await db
    .select(memberColumns)
    .from(members)
    .innerJoin(people, eq(people.id, members.personId))
    .where(eq(members.organisationId, organisationId))
    .orderBy(asc(people.name), asc(members.id));
  return rows.map(withRoles);
}

export type MemberRow = Awaited<ReturnType<typeof listMembers>>[number];

export async function findMember(
  db: Database,
  { membershipId, organisationId }: { membershipId: string; organisationId: string },
): Promise<MemberRow | null> {
  const [row] = await db
    .select(memberColumns)
    .from(members)
    .innerJoin(people, eq(people.id, members.personId))
    .where(and(eq(members.id, membershipId), eq(members.organisationId, organisationId)))
    .limit(1);
  return row ? withRoles(row) : null;
}

function withRoles<Row extends { role: string }>({ role, ...row }: Row) {
  return { ...row, roles: rolesFromColumn(role) };
}

const invitationColumns = {
  id: invitations.id,
  organisationId: invitations.organisationId,
  email: invitations.email,
  name: invitations.name,
  role: invitations.role,
  organisation: organisations.name,
  createdAt: invitations.createdAt,
  expiresAt: invitations.expiresAt,
  version: invitations.version,
};

/** Open invitations that an organisation made, or that lead into it; newest first. */
export async function listOpenInvitations(
  db: Database,
  { organisationId, now }: { organisationId: string; now: Date },
) {
  const rows = await db
    .select({ ...invitationColumns, mail: outbox.state })
    .from(invitations)
    .innerJoin(organisations, eq(organisations.id, invitations.organisationId))
    .leftJoin(outbox, and(eq(outbox.subjectKind, 'invitation'), eq(outbox.subjectId, invitations.id)))
    .where(
      and(
        or(eq(invitations.organisationId, organisationId), eq(invitations.invitedFromId, organisationId)),
        eq(invitations.status, 'pending'),
        gt(invitations.expiresAt, now),
      ),
    )
    .orderBy(desc(invitations.createdAt), desc(invitations.id));
  return rows.map((row) => ({ ...withRoles(row), mail: row.mail ?? ('waiting' as const) }));
}

export type InvitationRow = Awaited<ReturnType<typeof listOpenInvitations>>[number];

/** A link that still holds, with where it leads; null where it was used, withdrawn or has expired. */
export async function findInvitationByToken(
  db: Database,
  { tokenHash, now }: { tokenHash: string; now: Date },
) {
  const [row] = await db
    .select({ ...invitationColumns, kind: organisations.kind })
    .from(invitations)
    .innerJoin(organisations, eq(organisations.id, invitations.organisationId))
    .where(
      and(
        eq(invitations.tokenHash, tokenHash),
        eq(invitations.status, 'pending'),
        gt(invitations.expiresAt, now),
      ),
    )
    .limit(1);
  return row ? withRoles(row) : null;
}

export async function findPersonByEmail(db: Database, email: string) {
  const [row] = await db
    .select({ id: people.id, name: people.name, email: people.email })
    .from(people)
    .where(eq(people.email, email.toLowerCase()))
    .limit(1);
  return row ?? null;
}
