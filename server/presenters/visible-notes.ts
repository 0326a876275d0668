import { asc, eq } from 'drizzle-orm';
import type { Note, Waiver } from '#shared/contracts/notes';
import type { Revision } from '#shared/contracts/submittals';
import type { Database } from '../db/client';
import { listNotes, listWaivers, type NoteRow, type WaiverRow } from '../db/queries/notes';
import type { RevisionRow } from '../db/queries/revisions';
import { revisions } from '../db/schema/submittals';
import type { Actor } from '../policies/actor';
import { noteAbilities } from '../policies/note-abilities';
import { type NoteFacts, type RevisionSpan, seesNote, seesWaiver } from '../policies/note-visibility';

interface Of {
  row: Pick<RevisionRow, 'submittal' | 'revision'>;
  abilities: Pick<Revision['abilities'], 'note' | 'reply' | 'waiveAdvisory' | 'waiveRequired'>;
}

/** Every note of a submittal that the actor may see, oldest first. */
export async function visibleNotes(db: Database, actor: Actor, { row, abilities }: Of): Promise<Note[]> {
  const spans = await revisionSpans(db, row.submittal.id);
  const all = await listNotes(db, actor, row.submittal.id);
  return all
    .filter((each) => seesNote(actor, factsOf(each), spans))
    .map((each) => presentNote(each, actor, spans, abilities));
}

/** When each revision was in the agency's hands. */
export async function revisionSpans(db: Database, submittalId: string): Promise<RevisionSpan[]> {
  const rows = await db
    .select({
      submittedAt: revisions.submittedAt,
      returnedAt: revisions.returnedAt,
      withdrawnAt: revisions.withdrawnAt,
    })
    .from(revisions)
    .where(eq(revisions.submittalId, submittalId))
    .orderBy(asc(revisions.number));
  return rows.map((row) => ({ submittedAt: row.submittedAt, leftAt: row.returnedAt ?? row.withdrawnAt }));
}

export function presentNote(
  row: Pick<NoteRow, 'note' | 'by' | 'revision'>,
  actor: Actor,
  spans: readonly RevisionSpan[],
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
        sent: isSent(row, spans),
      },
      abilities,
    ),
  };
}

/** True once the other side could read it. */
export function isSent(row: Pick<NoteRow, 'note' | 'revision'>, spans: readonly RevisionSpan[]): boolean {
  const { agencyId, contractorId, side } = row.note;
  const other =
    side === 'agency'
      ? ({ organisationId: contractorId, kind: 'contractor' } as const)
      : ({ organisationId: agencyId, kind: 'agency' } as const);
  return seesNote(other, factsOf(row), spans);
}

/** Waivers of a revision that the actor may see. */
export async function visibleWaivers(db: Database, actor: Actor, { row, abilities }: Of): Promise<Waiver[]> {
  const all = await listWaivers(db, actor, row.revision.id);
  return all
    .filter(({ waiver, revision }) =>
      seesWaiver(actor, { toBeReturned: waiver.toBeReturned, revisionState: revision.state }),
    )
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

function factsOf({ note, revision }: Pick<NoteRow, 'note' | 'revision'>): NoteFacts {
  return {
    organisationId: note.organisationId,
    side: note.side,
    kind: note.kind,
    writtenAt: note.createdAt,
    revisionState: revision.state,
  };
}
