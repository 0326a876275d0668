import type { Draft } from '#shared/contracts/drafts';
import { findDraft } from '../../db/queries/drafts';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { allow } from '../../policies/allow';
import { presentDraft } from '../../presenters/present-draft';
import { Problem } from '../../problem';

/** A draft is its agency's alone; to anybody else it is not there. */
export async function loadDraft(deps: Deps, actor: RequestActor, draftId: string): Promise<Draft> {
  const row = actor.kind === 'agency' ? await findDraft(deps.db, actor.organisationId, draftId) : null;
  if (row === null) throw new Problem('not-found');
  return presentDraft(row, actor);
}

export function allowWriting(allowed: boolean): void {
  allow(allowed, 'Editions are written by rule authors.');
}
