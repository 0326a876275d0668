import { and, asc, desc, eq, ne } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { Database } from '../client';
import { audit, people } from '../schema/people';
import { draftComments, editionDrafts, editions, ruleSets } from '../schema/rule-sets';

const sender = alias(people, 'sender');

/** A draft of the agency that is still being written or reviewed, or null. */
export async function findDraft(db: Database, agencyId: string, draftId: string) {
  const [row] = await db
    .select({
      draft: editionDrafts,
      ruleSet: ruleSets,
      createdBy: { id: people.id, name: people.name },
      sentBy: { id: sender.id, name: sender.name },
      basedOn: { ruleSet: editions.ruleSetKey, edition: editions.edition, title: editions.title },
    })
    .from(editionDrafts)
    .innerJoin(ruleSets, eq(ruleSets.id, editionDrafts.ruleSetId))
    .innerJoin(people, eq(people.id, editionDrafts.createdById))
    .leftJoin(sender, eq(sender.id, editionDrafts.sentById))
    .leftJoin(editions, eq(editions.id, editionDrafts.basedOnId))
    .where(ofAgency(agencyId, draftId))
    .limit(1);
  return row ?? null;
}

export type DraftRow = NonNullable<Awaited<ReturnType<typeof findDraft>>>;

/** The same, held until the end of the transaction. */
export async function lockDraft(tx: Database, agencyId: string, draftId: string) {
  const [row] = await tx
    .select()
    .from(editionDrafts)
    .where(ofAgency(agencyId, draftId))
    .limit(1)
    .for('update');
  return row ?? null;
}

export function listDraftComments(db: Database, agencyId: string, draftId: string) {
  return db
    .select({ comment: draftComments, by: { id: people.id, name: people.name } })
    .from(draftComments)
    .innerJoin(people, eq(people.id, draftComments.personId))
    .where(and(eq(draftComments.draftId, draftId), eq(draftComments.agencyId, agencyId)))
    .orderBy(asc(draftComments.createdAt), asc(draftComments.id));
}

/** Who changed which parts of a draft, newest first. */
export function listDraftChanges(db: Database, agencyId: string, draftId: string) {
  return db
    .select({ at: audit.at, by: people.name, detail: audit.detail })
    .from(audit)
    .innerJoin(people, eq(people.id, audit.personId))
    .where(
      and(
        eq(audit.organisationId, agencyId),
        eq(audit.subjectKind, 'draft'),
        eq(audit.subjectId, draftId),
        eq(audit.act, 'draft changed'),
      ),
    )
    .orderBy(desc(audit.at), desc(audit.id));
}

function ofAgency(agencyId: string, draftId: string) {
  return and(
    eq(editionDrafts.id, draftId),
    eq(editionDrafts.agencyId, agencyId),
    ne(editionDrafts.state, 'published'),
  );
}
