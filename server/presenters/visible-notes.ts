import type { Note, Waiver } from '#shared/contracts/notes';
import type { Revision } from '#shared/contracts/submittals';
import type { Database } from '../db/client';
import { listNotes, listWaivers, type NoteRow, type WaiverRow } from '../db/queries/notes';
import type { RevisionRow } from '../db/queries/revisions';
import type { Actor } from '../policies/actor';
import { noteAbilities } from '../policies/note-abilities';
import { seesNote, seesWaiver } from '../policies/note-visibility';

interface Of {
  row: Pick<RevisionRow, 'submittal' | 'revision'>;
  abilities: Pick<Revision['abilities'], 'note' | 'reply' | 'waiveAdvisory' | 'waiveRequired'>;
}

/** Every note of a submittal that the actor may see, oldest first. */
export async function visibleNotes(db: Database, actor: Actor, { row, abilities }: Of): Promise<Note[]> {
  const all = await listNotes(db, actor, row.submittal.id);
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

/** Waivers of a revision that the actor may see. */
export async function visibleWaivers(db: Database, actor: Actor, { row, abilities }: Of): Promise<Waiver[]> {
  const all = await listWaivers(db, actor, row.revision.id);
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
