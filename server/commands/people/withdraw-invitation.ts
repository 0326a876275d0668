import { and, eq, or } from 'drizzle-orm';
import { invitations } from '../../db/schema/people';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';

interface Withdrawal {
  actor: Actor;
  invitationId: string;
  requestId: string;
}

/** The link in the mail stops working. */
export async function withdrawInvitation(deps: Deps, withdrawal: Withdrawal): Promise<void> {
  const { actor, invitationId, requestId } = withdrawal;
  await deps.db.transaction(async (tx) => {
    const [result] = await tx
      .update(invitations)
      .set({ status: 'canceled' })
      .where(
        and(
          eq(invitations.id, invitationId),
          or(
            eq(invitations.invitedFromId, actor.organisationId),
            eq(invitations.organisationId, actor.organisationId),
          ),
          eq(invitations.status, 'pending'),
        ),
      );
    if (result.affectedRows !== 1) throw new Problem('not-found');
    await writeAudit(tx, deps, {
      actor,
      act: 'invitation withdrawn',
      subject: { kind: 'invitation', id: invitationId },
      requestId,
    });
  });
}
