import type { Draft } from '#shared/contracts/drafts';
import { type Actor, hasRole } from './actor';

interface DraftInHand {
  state: 'draft' | 'in review' | 'published';
  sentById: string | null;
}

/** Drafts are written by rule authors; the rest of the agency reads them. */
export function writesRules(actor: Pick<Actor, 'kind' | 'roles'>): boolean {
  return actor.kind === 'agency' && hasRole(actor, 'rule author');
}

/** Nothing is published by the person who sent it for review: it takes a second rule author. */
export function draftAbilities(
  actor: Pick<Actor, 'kind' | 'roles' | 'personId'>,
  draft: DraftInHand,
): Draft['abilities'] {
  const author = writesRules(actor);
  const writing = author && draft.state === 'draft';
  const reviewing = author && draft.state === 'in review';
  return {
    change: writing,
    send: writing,
    discard: writing,
    takeBack: reviewing,
    verify: reviewing,
    publish: reviewing && draft.sentById !== actor.personId,
    comment: author && draft.state !== 'published',
  };
}
