import { and, eq } from 'drizzle-orm';
import { lockDraft } from '../../db/queries/drafts';
import { draftComments } from '../../db/schema/rule-sets';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';

interface Commenting {
  actor: Actor;
  requestId: string;
  draftId: string;
}

interface OwnComment extends Commenting {
  commentId: string;
  version: number;
}

export async function writeComment(
  deps: Deps,
  { actor, requestId, draftId, rule, text }: Commenting & { rule: string | null; text: string },
): Promise<string> {
  const id = deps.newId();
  await deps.db.transaction(async (tx) => {
    const draft = await lockDraft(tx, actor.organisationId, draftId);
    if (draft === null) throw new Problem('not-found');
    await tx.insert(draftComments).values({
      id,
      agencyId: actor.organisationId,
      draftId,
      rule,
      text,
      personId: actor.personId,
      createdAt: deps.now(),
    });
    await writeAudit(tx, deps, {
      actor,
      act: 'draft commented on',
      subject: { kind: 'draft', id: draftId },
      detail: { comment: id, rule },
      requestId,
    });
  });
  return id;
}

export async function changeComment(deps: Deps, change: OwnComment & { text: string }): Promise<void> {
  const { actor, requestId, draftId, commentId, version, text } = change;
  await deps.db.transaction(async (tx) => {
    expectWritten(
      await tx
        .update(draftComments)
        .set({ text, version: version + 1 })
        .where(ofWriter(change)),
    );
    await writeAudit(tx, deps, {
      actor,
      act: 'draft comment changed',
      subject: { kind: 'draft', id: draftId },
      detail: { comment: commentId },
      requestId,
    });
  });
}

export async function removeComment(deps: Deps, removal: OwnComment): Promise<void> {
  const { actor, requestId, draftId, commentId } = removal;
  await deps.db.transaction(async (tx) => {
    expectWritten(await tx.delete(draftComments).where(ofWriter(removal)));
    await writeAudit(tx, deps, {
      actor,
      act: 'draft comment removed',
      subject: { kind: 'draft', id: draftId },
      detail: { comment: commentId },
      requestId,
    });
  });
}

function ofWriter({ draftId, commentId, actor, version }: OwnComment) {
  return and(
    eq(draftComments.id, commentId),
    eq(draftComments.draftId, draftId),
    eq(draftComments.agencyId, actor.organisationId),
    eq(draftComments.personId, actor.personId),
    eq(draftComments.version, version),
  );
}
