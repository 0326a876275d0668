import { changeNote, removeNote, writeNote } from '#shared/contracts/notes';
import {
  changeNote as change,
  removeNote as remove,
  writeNote as write,
} from '../../commands/notes/write-note';
import { findOwnNote } from '../../db/queries/notes';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { writableKinds } from '../../policies/note-abilities';
import { presentNote } from '../../presenters/visible-notes';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectRevision, viewRevision } from '../submittals/load-revision';

export const writeNoteRoute = route(writeNote, async ({ deps, params, body, actor, requestId }) => {
  const row = await expectRevision(deps, actor, params);
  const { abilities } = await viewRevision(deps, actor, row);
  const noteId = await write(deps, { actor, requestId, row, abilities, ...body });
  return (await expectNote(deps, actor, noteId)).view;
});

export const changeNoteRoute = route(
  changeNote,
  async ({ deps, params: { noteId }, body, version, actor, requestId }) => {
    const { view, revision, note } = await expectChangeable(deps, actor, noteId, version);
    await change(deps, {
      actor,
      requestId,
      noteId,
      revisionId: note.note.revisionId,
      version: view.version,
      writable: writableKinds(actor, revision.state, revision.abilities),
      ...body,
    });
    return (await expectNote(deps, actor, noteId)).view;
  },
);

export const removeNoteRoute = route(
  removeNote,
  async ({ deps, params: { noteId }, version, actor, requestId }) => {
    await expectChangeable(deps, actor, noteId, version);
    await remove(deps, { actor, requestId, noteId, version });
    return undefined;
  },
);

/** A note of the actor's own organisation as it shows it; any other answers as absent. */
async function expectNote(deps: Deps, actor: RequestActor, noteId: string) {
  const note = await findOwnNote(deps.db, actor.organisationId, noteId);
  if (note === null) throw new Problem('not-found');
  const place = { submittalId: note.submittalId, number: note.revision.number };
  const revision = await viewRevision(deps, actor, await expectRevision(deps, actor, place));
  return { view: presentNote(note, actor, revision.abilities), revision, note };
}

async function expectChangeable(deps: Deps, actor: RequestActor, noteId: string, version: number) {
  const found = await expectNote(deps, actor, noteId);
  const { view, note } = found;
  if (!view.abilities.change) {
    if (note.note.personId !== actor.personId) {
      throw new Problem('not-allowed', { detail: 'A note is changed by its writer alone.' });
    }
    throw new Problem('wrong-state', {
      detail: 'The other side can have read this note, so it stays as it is.',
      fix: 'Write another note.',
    });
  }
  if (view.version !== version) throw new Problem('version-stale', { present: view });
  return found;
}
