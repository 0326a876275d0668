import { headFields } from '#rules/authoring/document-parts';
import type { Draft } from '#shared/contracts/drafts';
import type { DraftRow } from '../db/queries/drafts';
import type { Actor } from '../policies/actor';
import { draftAbilities } from '../policies/draft-abilities';

export function presentDraft(
  { draft, ruleSet, createdBy, sentBy, basedOn }: DraftRow,
  actor: Pick<Actor, 'kind' | 'roles' | 'personId'>,
): Draft {
  return {
    id: draft.id,
    ruleSet: ruleSet.key,
    edition: draft.edition,
    title: headFields.parse(draft.document).title,
    state: draft.state === 'in review' ? 'in review' : 'draft',
    document: draft.document,
    basedOn,
    startingPoint: draft.startingPoint,
    createdBy,
    updatedAt: draft.updatedAt.toISOString(),
    sentForReview: sentBy && draft.sentAt ? { by: sentBy, at: draft.sentAt.toISOString() } : null,
    version: draft.version,
    abilities: draftAbilities(actor, draft),
  };
}
