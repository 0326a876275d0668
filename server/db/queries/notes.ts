import { and, asc, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { notes, waivers } from '../schema/checks';
import { people } from '../schema/people';
import { revisions } from '../schema/submittals';
import { ofTenant, type Reader } from './reader';

export type NoteRow = Awaited<ReturnType<typeof listNotes>>[number];
export type WaiverRow = Awaited<ReturnType<typeof listWaivers>>[number];

const noteFields = {
  note: notes,
  by: people.name,
  revision: { id: revisions.id, number: revisions.number, state: revisions.state },
};

const waiverFields = {
  waiver: waivers,
  by: people.name,
  revision: { id: revisions.id, number: revisions.number, state: revisions.state },
};

/** Every note of a submittal; the policy of notes decides which of them a reader sees. */
export function listNotes(db: Database, reader: Reader, submittalId: string) {
  return db
    .select(noteFields)
    .from(notes)
    .innerJoin(people, eq(people.id, notes.personId))
    .innerJoin(revisions, eq(revisions.id, notes.revisionId))
    .where(and(eq(notes.submittalId, submittalId), ofTenant(notes, reader)))
    .orderBy(asc(notes.createdAt), asc(notes.id));
}

/** A note of the reader's own organisation, or null. */
export async function findOwnNote(db: Database, organisationId: string, noteId: string) {
  const [row] = await db
    .select({ ...noteFields, submittalId: notes.submittalId })
    .from(notes)
    .innerJoin(people, eq(people.id, notes.personId))
    .innerJoin(revisions, eq(revisions.id, notes.revisionId))
    .where(and(eq(notes.id, noteId), eq(notes.organisationId, organisationId)));
  return row ?? null;
}

export function listWaivers(db: Database, reader: Reader, revisionId: string) {
  return db
    .select(waiverFields)
    .from(waivers)
    .innerJoin(people, eq(people.id, waivers.personId))
    .innerJoin(revisions, eq(revisions.id, waivers.revisionId))
    .where(and(eq(waivers.revisionId, revisionId), ofTenant(waivers, reader)))
    .orderBy(asc(waivers.createdAt), asc(waivers.id));
}

export async function findWaiver(db: Database, agencyId: string, waiverId: string) {
  const [row] = await db
    .select(waiverFields)
    .from(waivers)
    .innerJoin(people, eq(people.id, waivers.personId))
    .innerJoin(revisions, eq(revisions.id, waivers.revisionId))
    .where(and(eq(waivers.id, waiverId), eq(waivers.agencyId, agencyId)));
  return row ?? null;
}
