import { and, eq } from 'drizzle-orm';
import { isMember } from '../../db/queries/memberships';
import { findInvitationByToken, findPersonByEmail } from '../../db/queries/people';
import { rolesToColumn } from '../../db/roles-column';
import { invitations, members } from '../../db/schema/people';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { Problem } from '../../problem';
import { hashToken } from '../make-set-up-link';
import { createPerson } from './create-person';

interface Acceptance {
  token: string;
  name: string;
  password: string;
  requestId: string;
}

export async function loadInvitation(deps: Pick<Deps, 'db' | 'now'>, token: string) {
  const invitation = await findInvitationByToken(deps.db, { tokenHash: hashToken(token), now: deps.now() });
  if (!invitation) throw new Problem('link-used');
  const person = await findPersonByEmail(deps.db, invitation.email);
  return { invitation, person };
}

/**
 * Uses the link up and makes the membership. Somebody whose address is known must have given their
 * password before: the link alone adds no organisation to a stranger's sign-in.
 */
export async function acceptInvitation(
  deps: Deps,
  acceptance: Acceptance,
): Promise<{ organisationId: string }> {
  const { invitation, person } = await loadInvitation(deps, acceptance.token);
  const { organisationId } = invitation;
  await deps.db.transaction(async (tx) => {
    const [used] = await tx
      .update(invitations)
      .set({ status: 'accepted', version: invitation.version + 1 })
      .where(and(eq(invitations.id, invitation.id), eq(invitations.status, 'pending')));
    if (used.affectedRows !== 1) throw new Problem('link-used');
    const { name, password } = acceptance;
    const personId =
      person?.id ?? (await createPerson(tx, deps, { name, password, email: invitation.email }));
    if (!(await isMember(tx, { personId, organisationId }))) {
      await tx.insert(members).values({
        id: deps.newId(),
        organisationId,
        personId,
        role: rolesToColumn(invitation.roles),
        createdAt: deps.now(),
      });
    }
    await writeAudit(tx, deps, {
      actor: { organisationId, personId },
      act: 'invitation accepted',
      subject: { kind: 'invitation', id: invitation.id },
      detail: { roles: invitation.roles },
      requestId: acceptance.requestId,
    });
  });
  return { organisationId };
}
