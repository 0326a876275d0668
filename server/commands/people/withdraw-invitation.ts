import { and, eq, or } from 'drizzle-orm';
import { invitations } from '../../db/schema/people';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';

interface Withdrawal {
  actor: Actor;
  invitationId: string;
  version: number;
  requestId: string;
}

/** The link in the mail stops working. */
export async function withdrawInvitation(deps: Deps, withdrawal: Withdrawal): Promise<void> {
  const { actor, invitationId, version, requestId } = withdrawal;
  await deps.db.transaction(async (tx) => {
    const result = await tx
      .update(invitations)
      .set({ status: 'canceled', version: version + 1 })
      .where(
        and(
          eq(invitations.id, invitationId),
          or(
            eq(invitations.invitedFromId, actor.organisationId),
            eq(invitations.organisationId, actor.organisationId),
          ),
          eq(invitations.status, 'pending'),
          eq(invitations.version, version),
        ),
      );
    expectWritten(result);
    await writeAudit(tx, deps, {
      actor,
      act: 'invitation withdrawn',
      subject: { kind: 'invitation', id: invitationId },
      requestId,
    });
  });
}
