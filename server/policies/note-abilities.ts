import type { Severity } from '#rules/engine/finding';
import type { Note, NoteKind } from '#shared/contracts/notes';
import type { Revision, RevisionState } from '#shared/contracts/submittals';
import type { Actor } from './actor';

type RevisionAbilities = Revision['abilities'];

/** Kinds of note that a person may write on a revision in its present state. */
export function writableKinds(
  actor: Pick<Actor, 'kind'>,
  state: RevisionState,
  abilities: Pick<RevisionAbilities, 'note' | 'reply'>,
): NoteKind[] {
  if (actor.kind === 'agency') {
    if (!abilities.note) return [];
    return state === 'submitted' || state === 'in review' ? ['internal', 'to be returned'] : ['internal'];
  }
  const kinds: NoteKind[] = [];
  if (abilities.note) kinds.push('internal');
  if (abilities.reply) kinds.push('reply');
  return kinds;
}

export interface OwnNote {
  writerId: string;
  organisationId: string;
  kind: NoteKind;
  /** True once the other side could read it: the return is sent, or the reply was carried over. */
  sent: boolean;
}

/** Only its writer changes or removes a note, and only until the other side can have read it. */
export function noteAbilities(
  actor: Pick<Actor, 'personId' | 'organisationId'>,
  note: OwnNote,
  revision: Pick<RevisionAbilities, 'note' | 'reply'>,
): Note['abilities'] {
  const own = note.writerId === actor.personId && note.organisationId === actor.organisationId;
  const open = own && !note.sent && (revision.note || revision.reply);
  return {
    change: open,
    remove: open,
    reply: note.organisationId !== actor.organisationId && note.kind === 'to be returned' && revision.reply,
  };
}

export function mayWaive(
  abilities: Pick<RevisionAbilities, 'waiveAdvisory' | 'waiveRequired'>,
  severity: Severity,
): boolean {
  return severity === 'required' ? abilities.waiveRequired : abilities.waiveAdvisory;
}
