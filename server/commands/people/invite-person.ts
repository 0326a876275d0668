import { and, eq, gt } from 'drizzle-orm';
import type { Role } from '#shared/contracts/roles';
import { dateOfInstant } from '#shared/format/dates';
import type { Database } from '../../db/client';
import { isMember } from '../../db/queries/memberships';
import { findPersonByEmail } from '../../db/queries/people';
import { rolesToColumn } from '../../db/roles-column';
import { invitations } from '../../db/schema/people';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { enqueueMail } from '../../mail/enqueue-mail';
import { invitationMail } from '../../mail/templates/account-mails';
import type { RequestActor } from '../../middleware/authenticate';
import { Problem } from '../../problem';
import { hashToken } from '../make-set-up-link';

interface NewInvitation {
  actor: RequestActor;
  /** Where the person is invited to; the actor's own organisation or a contractor of its. */
  organisation: { id: string; name: string };
  name: string;
  email: string;
  roles: readonly Role[];
  requestId: string;
}

const daysThatItHolds = 7;

/** Writes the invitation and its mail in the caller's transaction; the token stands in the mail alone. */
export async function invitePerson(tx: Database, deps: Deps, invitation: NewInvitation): Promise<string> {
  const { actor, organisation, name, roles, requestId } = invitation;
  const email = invitation.email.toLowerCase();
  await refuseWhereKnown(tx, deps, { organisationId: organisation.id, email });
  const id = deps.newId();
  const token = deps.newToken();
  const expiresAt = new Date(deps.now().getTime() + daysThatItHolds * 24 * 3600 * 1000);
  await tx.insert(invitations).values({
    id,
    organisationId: organisation.id,
    invitedFromId: actor.organisationId,
    inviterId: actor.personId,
    name,
    email,
    role: rolesToColumn(roles),
    status: 'pending',
    tokenHash: hashToken(token),
    expiresAt,
    createdAt: deps.now(),
  });
  await enqueueMail(tx, deps, {
    organisationId: actor.organisationId,
    kind: 'invitation',
    subject: { kind: 'invitation', id },
    recipients: [{ name, email }],
    content: invitationMail({
      name,
      invitedBy: `${actor.person.name}, ${actor.organisation.name},`,
      organisation: organisation.name,
      roles,
      expiresOn: dateOfInstant(expiresAt.toISOString(), actor.organisation.timeZone),
      address: `${deps.settings.publicUrl}/invitations/${token}`,
    }),
  });
  await writeAudit(tx, deps, {
    actor,
    act: 'person invited',
    subject: { kind: 'invitation', id },
    detail: { email, roles, organisationId: organisation.id },
    requestId,
  });
  deps.wake.mail();
  return id;
}

async function refuseWhereKnown(
  tx: Database,
  deps: Pick<Deps, 'now'>,
  { organisationId, email }: { organisationId: string; email: string },
): Promise<void> {
  const person = await findPersonByEmail(tx, email);
  if (person && (await isMember(tx, { personId: person.id, organisationId }))) {
    throw new Problem('already-exists', {
      detail: `${email} belongs to the organisation already.`,
      fix: 'Change the roles of the person.',
    });
  }
  const [open] = await tx
    .select({ id: invitations.id })
    .from(invitations)
    .where(
      and(
        eq(invitations.organisationId, organisationId),
        eq(invitations.email, email),
        eq(invitations.status, 'pending'),
        gt(invitations.expiresAt, deps.now()),
      ),
    )
    .limit(1);
  if (!open) return;
  throw new Problem('already-exists', {
    detail: `${email} has an open invitation already.`,
    fix: 'Withdraw it first to send another.',
  });
}
