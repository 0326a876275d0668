import { and, asc, desc, eq, inArray, lt } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { Database } from '../client';
import { rolesFromColumn } from '../roles-column';
import { notes, waivers } from '../schema/checks';
import { files } from '../schema/files';
import { members, organisations, people } from '../schema/people';
import { returns } from '../schema/returns';
import { editions } from '../schema/rule-sets';
import { revisions } from '../schema/submittals';
import { outbox } from '../schema/work';
import { ofTenant, type Reader, returnsOf, revisionsOf } from './reader';

export type ReturnRow = typeof returns.$inferSelect;

/** The return of a revision. A contractor sees it once it is sent. */
export async function findReturn(
  db: Database,
  reader: Reader,
  revisionId: string,
): Promise<ReturnRow | null> {
  const [row] = await db
    .select()
    .from(returns)
    .where(and(eq(returns.revisionId, revisionId), returnsOf(reader)));
  return row ?? null;
}

/** Locks the return for the act that signs it. */
export async function lockReturn(
  db: Database,
  agencyId: string,
  revisionId: string,
): Promise<ReturnRow | null> {
  const [row] = await db
    .select()
    .from(returns)
    .where(and(eq(returns.revisionId, revisionId), eq(returns.agencyId, agencyId)))
    .for('update');
  return row ?? null;
}

export async function letterheadOf(db: Database, agencyId: string) {
  const [row] = await db
    .select({ letterhead: organisations.letterhead })
    .from(organisations)
    .where(eq(organisations.id, agencyId));
  return row?.letterhead ?? null;
}

/** The revision before this one that was submitted, for what moved. */
export async function revisionBefore(
  db: Database,
  reader: Reader,
  { submittalId, number }: { submittalId: string; number: number },
) {
  const [row] = await db
    .select({ id: revisions.id, number: revisions.number })
    .from(revisions)
    .where(and(eq(revisions.submittalId, submittalId), lt(revisions.number, number), revisionsOf(reader)))
    .orderBy(desc(revisions.number))
    .limit(1);
  return row ?? null;
}

/** People of an organisation with a role, by name. */
export async function peopleWithRole(db: Database, organisationId: string, role: string) {
  const rows = await db
    .select({ id: people.id, name: people.name, email: people.email, role: members.role })
    .from(members)
    .innerJoin(people, eq(people.id, members.personId))
    .where(eq(members.organisationId, organisationId))
    .orderBy(asc(people.name));
  return rows.filter((row) => rolesFromColumn(row.role).some((one) => one === role));
}

/** Who submitted a revision, whether or not they still belong to the contractor. */
export async function submitterOf(db: Database, reader: Reader, revisionId: string) {
  const [row] = await db
    .select({ name: people.name, email: people.email })
    .from(revisions)
    .innerJoin(people, eq(people.id, revisions.submittedById))
    .where(and(eq(revisions.id, revisionId), revisionsOf(reader)));
  return row ?? null;
}

const preparer = alias(people, 'preparer');
const decider = alias(people, 'decider');

/** Who prepared and who signed a return; each null while nobody has. */
export async function peopleOfReturn(db: Database, reader: Reader, returnId: string) {
  const [row] = await db
    .select({
      preparedBy: { id: preparer.id, name: preparer.name },
      decidedBy: { id: decider.id, name: decider.name },
    })
    .from(returns)
    .leftJoin(preparer, eq(preparer.id, returns.preparedById))
    .leftJoin(decider, eq(decider.id, returns.decidedById))
    .where(and(eq(returns.id, returnId), returnsOf(reader)));
  return row ?? { preparedBy: null, decidedBy: null };
}

export function mailsOfReturn(db: Database, reader: Reader, returnId: string) {
  return db
    .select({
      recipients: outbox.recipients,
      copies: outbox.copies,
      state: outbox.state,
      attempts: outbox.attempts,
      lastProblem: outbox.lastProblem,
      subject: outbox.subject,
      text: outbox.text,
    })
    .from(outbox)
    .innerJoin(returns, eq(returns.id, outbox.subjectId))
    .where(and(eq(outbox.subjectKind, 'return'), eq(outbox.subjectId, returnId), returnsOf(reader)))
    .orderBy(asc(outbox.createdAt));
}

/** SHA-256 of the letter and of the workbook, once both are stored with the decision. */
export async function fileHashes(
  db: Database,
  kept: ReturnRow,
): Promise<{ letter: string; workbook: string | null } | null> {
  if (kept.letterFileId === null) return null;
  const rows = await db
    .select({ id: files.id, sha256: files.sha256 })
    .from(files)
    .where(
      and(
        inArray(files.id, [kept.letterFileId, kept.workbookFileId ?? kept.letterFileId]),
        eq(files.agencyId, kept.agencyId),
      ),
    );
  const hashOf = (id: string | null) => rows.find((row) => row.id === id)?.sha256 ?? null;
  const letter = hashOf(kept.letterFileId);
  return letter === null ? null : { letter, workbook: hashOf(kept.workbookFileId) };
}

/** A stored file of the agency's or contractor's own. */
export async function storedFile(db: Database, reader: Reader, fileId: string) {
  const [row] = await db
    .select()
    .from(files)
    .where(and(eq(files.id, fileId), ofTenant(files, reader)));
  return row ?? null;
}

export async function isStartingPoint(
  db: Database,
  agencyId: string,
  base: { ruleSet: string; edition: string },
) {
  const [row] = await db
    .select({ startingPoint: editions.startingPoint })
    .from(editions)
    .where(
      and(
        eq(editions.agencyId, agencyId),
        eq(editions.ruleSetKey, base.ruleSet),
        eq(editions.edition, base.edition),
      ),
    );
  return row?.startingPoint ?? false;
}

/**
 * A fingerprint of the notes and waivers that a letter would carry, so that one that changed while the letter was
 * rendered is noticed. With `lock` it reads what is committed now, whatever the transaction has read before.
 */
export async function stampsOfReturned(
  db: Database,
  agencyId: string,
  revisionId: string,
  { lock = false } = {},
): Promise<string> {
  const noteStamps = db
    .select({ id: notes.id, version: notes.version })
    .from(notes)
    .where(
      and(eq(notes.revisionId, revisionId), eq(notes.agencyId, agencyId), eq(notes.kind, 'to be returned')),
    )
    .orderBy(asc(notes.id));
  const waiverStamps = db
    .select({ id: waivers.id, version: waivers.version })
    .from(waivers)
    .where(and(eq(waivers.revisionId, revisionId), eq(waivers.agencyId, agencyId)))
    .orderBy(asc(waivers.id));
  const rows = lock
    ? [...(await noteStamps.for('update')), ...(await waiverStamps.for('update'))]
    : [...(await noteStamps), ...(await waiverStamps)];
  return rows.map(({ id, version }) => `${id}:${version}`).join(' ');
}
