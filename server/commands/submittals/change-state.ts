import { and, eq, sql } from 'drizzle-orm';
import type { Database } from '../../db/client';
import { lockRevision, type RevisionRow } from '../../db/queries/revisions';
import { people } from '../../db/schema/people';
import { returns } from '../../db/schema/returns';
import { revisions, submittals } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';

interface Act {
  actor: Actor;
  requestId: string;
  row: RevisionRow;
}

/** One reviewer at a time: whoever comes second is told who was first. */
export async function takeRevision(deps: Deps, act: Act): Promise<void> {
  await changing(deps, act, 'revision taken', async (tx, present, now) => {
    if (present.state === 'in review' && present.takenById !== act.actor.personId) {
      throw new Problem('taken', {
        detail: `${await nameOf(tx, present.takenById)} has taken this revision.`,
      });
    }
    if (present.state !== 'submitted') throw wrongState(present, 'taken');
    return { state: 'in review' as const, takenById: act.actor.personId, takenAt: now };
  });
}

export async function giveBackRevision(deps: Deps, act: Act): Promise<void> {
  await changing(deps, act, 'revision given back', async (tx, present) => {
    if (present.state !== 'in review') throw wrongState(present, 'given back');
    await takeFromSigner(tx, present.id);
    return { state: 'submitted' as const, takenById: null, takenAt: null };
  });
}

/** A withdrawn revision 0 ends its submittal and frees the designation. */
export async function withdrawRevision(deps: Deps, act: Act & { reason: string }): Promise<void> {
  await changing(deps, act, 'revision withdrawn', async (tx, present, now) => {
    if (present.state !== 'submitted' && present.state !== 'in review')
      throw wrongState(present, 'withdrawn');
    await takeFromSigner(tx, present.id);
    if (present.number === 0) {
      await tx
        .update(submittals)
        .set({ activeDesignation: null })
        .where(eq(submittals.id, present.submittalId));
    }
    return { state: 'withdrawn' as const, withdrawnAt: now, withdrawalReason: act.reason };
  });
}

type Present = typeof revisions.$inferSelect;
type Change = Partial<typeof revisions.$inferInsert>;

async function changing(
  deps: Deps,
  { actor, requestId, row }: Act,
  name: string,
  change: (tx: Database, present: Present, now: Date) => Promise<Change>,
): Promise<void> {
  await deps.db.transaction(async (tx) => {
    const present = await lockRevision(tx, actor, row.revision.id);
    if (present === null) throw new Problem('not-found');
    const now = deps.now();
    const changed = await change(tx, present, now);
    if (present.version !== row.revision.version) throw new Problem('version-stale');
    await tx
      .update(revisions)
      .set({ ...changed, updatedAt: now, version: present.version + 1 })
      .where(eq(revisions.id, present.id));
    await tx
      .update(submittals)
      .set({ updatedAt: now, agencyUpdatedAt: now })
      .where(eq(submittals.id, present.submittalId));
    await writeAudit(tx, deps, {
      actor,
      act: name,
      subject: { kind: 'revision', id: present.id },
      detail: { number: present.number },
      requestId,
    });
  });
}

/** A return that waits for its signature was prepared by whoever held the revision: it waits no longer. */
async function takeFromSigner(tx: Database, revisionId: string): Promise<void> {
  await tx
    .update(returns)
    .set({ state: 'draft', signingEngineerId: null, version: sql`${returns.version} + 1` })
    .where(and(eq(returns.revisionId, revisionId), eq(returns.state, 'ready to sign')));
}

function wrongState({ state }: Present, done: string): Problem {
  return new Problem('wrong-state', { detail: `The revision is ${state}, so it cannot be ${done}.` });
}

async function nameOf(tx: Database, personId: string | null): Promise<string> {
  if (personId === null) return 'Somebody else';
  const [person] = await tx.select({ name: people.name }).from(people).where(eq(people.id, personId));
  return person?.name ?? 'Somebody else';
}
