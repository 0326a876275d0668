import { and, eq, isNull } from 'drizzle-orm';
import { findingKey } from '#rules/engine/finding';
import type { NoteKind } from '#shared/contracts/notes';
import type { Revision, RevisionState } from '#shared/contracts/submittals';
import type { Database } from '../../db/client';
import { newestCheckOf } from '../../db/queries/checks';
import { findOwnNote } from '../../db/queries/notes';
import { lockRevision, type RevisionRow } from '../../db/queries/revisions';
import { notes } from '../../db/schema/checks';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';
import { writableKinds } from '../../policies/note-abilities';
import { Problem } from '../../problem';

interface NewNote {
  actor: Actor;
  requestId: string;
  row: RevisionRow;
  abilities: Revision['abilities'];
  finding: string | null;
  kind: NoteKind;
  text: string;
  answers: string | null;
}

export async function writeNote(deps: Deps, note: NewNote): Promise<string> {
  const { actor, row, finding, kind, text } = note;
  const { revision, submittal } = row;
  const id = deps.newId();
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, actor, revision.id);
    if (locked === null) throw new Problem('not-found');
    const writable = writableKinds(actor, locked.state, note.abilities);
    if (!writable.includes(kind)) throw refusal(writable);
    if (finding !== null) await expectFinding(tx, actor, { revisionId: revision.id, key: finding });
    if (note.answers !== null) await expectAnswerable(tx, row, note.answers);
    const now = deps.now();
    await tx.insert(notes).values({
      id,
      submittalId: submittal.id,
      revisionId: revision.id,
      agencyId: revision.agencyId,
      contractorId: revision.contractorId,
      organisationId: actor.organisationId,
      side: actor.kind,
      kind,
      finding,
      text,
      answersId: note.answers,
      personId: actor.personId,
      createdAt: now,
      updatedAt: now,
      sentAt: sentAtOnce(kind, locked.state) ? now : null,
    });
    await writeAudit(tx, deps, {
      actor,
      act: 'note written',
      subject: { kind: 'note', id },
      detail: { revision: revision.id, kind },
      requestId: note.requestId,
    });
  });
  return id;
}

interface NoteChange {
  actor: Actor;
  requestId: string;
  noteId: string;
  revisionId: string;
  version: number;
  /** Kinds that the writer may give it now. */
  writable: NoteKind[];
  kind: NoteKind;
  text: string;
}

export async function changeNote(deps: Deps, change: NoteChange): Promise<void> {
  const { actor, noteId, version, kind, text } = change;
  if (!change.writable.includes(kind)) throw refusal(change.writable);
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, actor, change.revisionId);
    if (locked === null) throw new Problem('not-found');
    const now = deps.now();
    const sentAt = sentAtOnce(kind, locked.state) ? now : null;
    expectWritten(
      await tx
        .update(notes)
        .set({ kind, text, sentAt, updatedAt: now, version: version + 1 })
        .where(ofWriter(change)),
    );
    await writeAudit(tx, deps, {
      actor,
      act: 'note changed',
      subject: { kind: 'note', id: noteId },
      requestId: change.requestId,
    });
  });
}

export async function removeNote(
  deps: Deps,
  removal: Pick<NoteChange, 'actor' | 'requestId' | 'noteId' | 'version'>,
): Promise<void> {
  const { actor, requestId, noteId } = removal;
  await deps.db.transaction(async (tx) => {
    expectWritten(await tx.delete(notes).where(ofWriter(removal)));
    await writeAudit(tx, deps, {
      actor,
      act: 'note removed',
      subject: { kind: 'note', id: noteId },
      requestId,
    });
  });
}

/** While the agency has the revision, a reply has nothing to wait for. */
function sentAtOnce(kind: NoteKind, state: RevisionState): boolean {
  return kind === 'reply' && (state === 'submitted' || state === 'in review');
}

function ofWriter({ noteId, actor, version }: Pick<NoteChange, 'noteId' | 'actor' | 'version'>) {
  return and(
    eq(notes.id, noteId),
    eq(notes.organisationId, actor.organisationId),
    eq(notes.personId, actor.personId),
    eq(notes.version, version),
    isNull(notes.sentAt),
  );
}

/** Nobody writes at all, or not this kind now. */
function refusal(writable: NoteKind[]): Problem {
  if (writable.length === 0) return new Problem('not-allowed', { detail: 'Your role writes no notes here.' });
  const detail = `Here a note is ${writable.join(' or ')}.`;
  return new Problem('invalid-input', { detail, errors: [{ pointer: '/kind', detail }] });
}

async function expectFinding(
  tx: Database,
  actor: Actor,
  { revisionId, key }: { revisionId: string; key: string },
): Promise<void> {
  const check = await newestCheckOf(tx, actor, revisionId);
  if (check?.result.findings.some((finding) => findingKey(finding) === key)) return;
  const detail = 'The check has no such finding.';
  throw new Problem('invalid-input', { detail, errors: [{ pointer: '/finding', detail }] });
}

/** A reply answers a note of the same submittal that the writer's side was sent. */
async function expectAnswerable(tx: Database, row: RevisionRow, noteId: string): Promise<void> {
  const answered = await findOwnNote(tx, row.revision.agencyId, noteId);
  const sent = answered?.note.kind === 'to be returned' && answered.revision.state === 'returned';
  if (sent && answered?.submittalId === row.submittal.id) return;
  const detail = 'The note that this answers is not one that you were sent.';
  throw new Problem('invalid-input', { detail, errors: [{ pointer: '/answers', detail }] });
}
