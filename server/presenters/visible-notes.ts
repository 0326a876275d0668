import type { Note, Waiver } from '#shared/contracts/notes';
import type { Revision } from '#shared/contracts/submittals';
import type { NoteRow, WaiverRow } from '../db/queries/notes';
import type { Actor } from '../policies/actor';
import { noteAbilities } from '../policies/note-abilities';
import { seesNote, seesWaiver } from '../policies/note-visibility';

/** Those notes that the actor may see, in their order. */
export function visibleNotes(
  all: readonly NoteRow[],
  actor: Actor,
  abilities: Pick<Revision['abilities'], 'note' | 'reply'>,
): Note[] {
  return all.filter((each) => seesNote(actor, each.note)).map((each) => presentNote(each, actor, abilities));
}

export function presentNote(
  row: Pick<NoteRow, 'note' | 'by' | 'revision'>,
  actor: Actor,
  abilities: Pick<Revision['abilities'], 'note' | 'reply'>,
): Note {
  const { note, by, revision } = row;
  return {
    id: note.id,
    finding: note.finding,
    kind: note.kind,
    side: note.side,
    text: note.text,
    by,
    at: note.createdAt.toISOString(),
    revision: revision.number,
    answers: note.answersId,
    version: note.version,
    abilities: noteAbilities(
      actor,
      {
        writerId: note.personId,
        organisationId: note.organisationId,
        kind: note.kind,
        sent: note.sentAt !== null,
      },
      abilities,
    ),
  };
}

/** Those waivers that the actor may see, in their order. */
export function visibleWaivers(
  all: readonly WaiverRow[],
  actor: Actor,
  abilities: Pick<Revision['abilities'], 'waiveAdvisory' | 'waiveRequired'>,
): Waiver[] {
  return all
    .filter(({ waiver }) => seesWaiver(actor, waiver))
    .map((each) => presentWaiver(each, actor, abilities));
}

export function presentWaiver(
  { waiver, by, revision }: WaiverRow,
  actor: Pick<Actor, 'kind' | 'personId'>,
  abilities: Pick<Revision['abilities'], 'waiveAdvisory' | 'waiveRequired'>,
): Waiver {
  const own = waiver.personId === actor.personId && abilities.waiveAdvisory;
  return {
    id: waiver.id,
    finding: waiver.finding,
    reason: waiver.reason,
    toBeReturned: waiver.toBeReturned,
    by,
    at: waiver.createdAt.toISOString(),
    version: waiver.version,
    abilities: { remove: revision.state === 'in review' && (own || abilities.waiveRequired) },
  };
}
