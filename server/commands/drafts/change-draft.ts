import { and, eq } from 'drizzle-orm';
import { changeParts, type DraftDocument, type PartChange } from '#rules/authoring/document-parts';
import { stampRules } from '#rules/authoring/stamp-rules';
import type { DraftConflict } from '#shared/contracts/drafts';
import { dateOfInstant } from '#shared/format/dates';
import type { Database } from '../../db/client';
import { isDuplicateEntry } from '../../db/duplicate-entry';
import { listDraftChanges, lockDraft } from '../../db/queries/drafts';
import { listEditions } from '../../db/queries/editions';
import { editionDrafts } from '../../db/schema/rule-sets';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { Problem } from '../../problem';
import { draftHead } from './draft-head';
import { expectState } from './review-draft';
import { nameTaken } from './start-draft';

interface Changing {
  actor: RequestActor;
  requestId: string;
  draftId: string;
  changes: PartChange[];
}

export interface ChangedDraft {
  version: number;
  updatedAt: string;
  parts: { part: string; value: unknown }[];
}

type LockedDraft = NonNullable<Awaited<ReturnType<typeof lockDraft>>>;

/** All changes or none. Whoever changes a rule has encoded it, and what was verified before no longer is. */
export async function changeDraft(deps: Deps, changing: Changing): Promise<ChangedDraft> {
  const { actor, draftId, changes, requestId } = changing;
  return deps.db.transaction(async (tx) => {
    const draft = await lockDraft(tx, actor.organisationId, draftId);
    if (draft === null) throw new Problem('not-found');
    expectState(draft, 'draft');
    const changed = changeParts(draft.document, changes);
    if (!changed.ok) throw await refusal(tx, { agencyId: actor.organisationId, draftId, changed });
    const on = dateOfInstant(deps.now().toISOString(), actor.organisation.timeZone);
    const stamped = stampRules({
      before: draft.document,
      after: changed.document,
      by: actor.person.name,
      on,
    });
    await keep(tx, deps, { draft, document: stamped.document });
    const parts = [...new Set([...changes.map(({ part }) => part), ...stamped.parts.keys()])];
    const version = draft.version + 1;
    await writeAudit(tx, deps, {
      actor,
      act: 'draft changed',
      subject: { kind: 'draft', id: draftId },
      detail: { version, parts },
      requestId,
    });
    return {
      version,
      updatedAt: deps.now().toISOString(),
      parts: [...stamped.parts].map(([part, value]) => ({ part, value })),
    };
  });
}

async function keep(
  tx: Database,
  deps: Deps,
  { draft, document }: { draft: LockedDraft; document: DraftDocument },
): Promise<void> {
  const { edition } = draftHead(document, draft.document);
  if (edition !== draft.edition) {
    const published = await listEditions(tx, draft.agencyId);
    const taken = published.some((each) => each.ruleSetId === draft.ruleSetId && each.edition === edition);
    if (taken) throw nameTaken(`There is a published edition ${edition} already.`);
  }
  try {
    await tx
      .update(editionDrafts)
      .set({ document, edition, updatedAt: deps.now(), version: draft.version + 1 })
      .where(and(eq(editionDrafts.id, draft.id), eq(editionDrafts.agencyId, draft.agencyId)));
  } catch (error) {
    if (!isDuplicateEntry(error)) throw error;
    throw nameTaken(`There is another draft ${edition} of this rule set.`);
  }
}

type Refused = Extract<ReturnType<typeof changeParts>, { ok: false }>;

async function refusal(
  tx: Database,
  { agencyId, draftId, changed }: { agencyId: string; draftId: string; changed: Refused },
): Promise<Problem> {
  const [fault] = changed.faults;
  if (fault !== undefined) {
    const errors = changed.faults.map(({ detail, fix }) => ({ pointer: '/changes', detail, fix }));
    return new Problem('invalid-input', { detail: fault.detail, errors });
  }
  const history = await listDraftChanges(tx, agencyId, draftId);
  const present = changed.conflicts.map(({ part, present }): DraftConflict => {
    const last = history.find(({ detail }) => Array.isArray(detail.parts) && detail.parts.includes(part));
    return { part, present, by: last?.by ?? null, at: last?.at.toISOString() ?? null };
  });
  const names = present.map(({ part }) => part).join(', ');
  return new Problem('draft-conflict', {
    detail: `Somebody else changed ${names} in the meantime.`,
    present,
  });
}
