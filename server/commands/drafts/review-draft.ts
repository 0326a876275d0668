import { and, eq } from 'drizzle-orm';
import { type DraftDocument, partsOf, withParts } from '#rules/authoring/document-parts';
import { dateOfInstant } from '#shared/format/dates';
import { lockDraft } from '../../db/queries/drafts';
import { draftComments, editionDrafts } from '../../db/schema/rule-sets';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { expectVersion } from '../../middleware/if-match';
import { Problem } from '../../problem';

interface Act {
  actor: RequestActor;
  requestId: string;
  draftId: string;
  version: number;
}

type Change = Partial<typeof editionDrafts.$inferInsert>;
type LockedDraft = NonNullable<Awaited<ReturnType<typeof lockDraft>>>;

export function sendForReview(deps: Deps, act: Act): Promise<void> {
  return changeState(deps, act, {
    from: 'draft',
    audited: 'draft sent for review',
    to: () => ({ state: 'in review', sentById: act.actor.personId, sentAt: deps.now() }),
  });
}

export function takeBack(deps: Deps, act: Act): Promise<void> {
  return changeState(deps, act, {
    from: 'in review',
    audited: 'draft taken out of review',
    to: () => ({ state: 'draft', sentById: null, sentAt: null }),
  });
}

/** Four eyes on every rule: nobody verifies what they encoded themselves. */
export function verify(deps: Deps, act: Act & { rules: string[] }): Promise<void> {
  const { actor, rules } = act;
  const on = dateOfInstant(deps.now().toISOString(), actor.organisation.timeZone);
  return changeState(deps, act, {
    from: 'in review',
    audited: 'rules verified',
    detail: { rules },
    to: ({ document }) => ({ document: verified(document, { rules, by: actor.person.name, on }) }),
  });
}

function verified(
  document: DraftDocument,
  { rules, by, on }: { rules: string[]; by: string; on: string },
): DraftDocument {
  const parts = partsOf(document);
  const changed = new Map<string, unknown>();
  for (const id of rules) {
    const part = ['rules', 'add.rules', 'replace.rules']
      .map((list) => `${list}/${id}`)
      .find((each) => parts.has(each));
    if (part === undefined) throw refused(`The draft has no rule ${id}.`);
    const rule = parts.get(part) as { encodedBy?: string | null };
    if (rule.encodedBy?.startsWith(`${by}, `)) {
      throw new Problem('not-allowed', {
        detail: `The rule ${id} was encoded by ${by}; somebody else verifies it.`,
      });
    }
    changed.set(part, { ...rule, verifiedBy: `${by}, ${on}` });
  }
  return withParts(document, changed);
}

function refused(detail: string): Problem {
  return new Problem('invalid-input', { detail, errors: [{ pointer: '/rules', detail }] });
}

interface StateChange {
  from: LockedDraft['state'];
  audited: string;
  detail?: Record<string, unknown>;
  to(draft: LockedDraft): Change;
}

async function changeState(deps: Deps, act: Act, change: StateChange): Promise<void> {
  const { actor, draftId, version, requestId } = act;
  await deps.db.transaction(async (tx) => {
    const draft = await lockDraft(tx, actor.organisationId, draftId);
    if (draft === null) throw new Problem('not-found');
    expectState(draft, change.from);
    expectVersion(version, draft);
    await tx
      .update(editionDrafts)
      .set({ ...change.to(draft), updatedAt: deps.now(), version: version + 1 })
      .where(ownDraft(actor.organisationId, draftId));
    await writeAudit(tx, deps, {
      actor,
      act: change.audited,
      subject: { kind: 'draft', id: draftId },
      detail: change.detail ?? {},
      requestId,
    });
  });
}

export function expectState({ state }: Pick<LockedDraft, 'state'>, wanted: LockedDraft['state']): void {
  if (state === wanted) return;
  throw wanted === 'draft'
    ? new Problem('wrong-state', {
        detail: 'The draft is in review and does not change.',
        fix: 'Take it out of review first.',
      })
    : new Problem('wrong-state', {
        detail: 'The draft is not in review.',
        fix: 'Send it for review first.',
      });
}

/** An edition that was never published leaves nothing behind but the audit trail. */
export async function discardDraft(deps: Deps, { actor, draftId, version, requestId }: Act): Promise<void> {
  await deps.db.transaction(async (tx) => {
    const draft = await lockDraft(tx, actor.organisationId, draftId);
    if (draft === null) throw new Problem('not-found');
    expectState(draft, 'draft');
    expectVersion(version, draft);
    await tx
      .delete(draftComments)
      .where(and(eq(draftComments.draftId, draftId), eq(draftComments.agencyId, actor.organisationId)));
    await tx.delete(editionDrafts).where(ownDraft(actor.organisationId, draftId));
    await writeAudit(tx, deps, {
      actor,
      act: 'draft discarded',
      subject: { kind: 'draft', id: draftId },
      detail: { edition: draft.edition },
      requestId,
    });
  });
}

function ownDraft(agencyId: string, draftId: string) {
  return and(eq(editionDrafts.id, draftId), eq(editionDrafts.agencyId, agencyId));
}
