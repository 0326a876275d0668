import { and, eq } from 'drizzle-orm';
import { findingKey } from '#rules/engine/finding';
import type { Revision } from '#shared/contracts/submittals';
import { isDuplicateEntry } from '../../db/duplicate-entry';
import { newestCheckOf } from '../../db/queries/checks';
import { lockRevision, type RevisionRow } from '../../db/queries/revisions';
import { waivers } from '../../db/schema/checks';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';
import { mayWaive } from '../../policies/note-abilities';
import { Problem } from '../../problem';

interface NewWaiver {
  actor: Actor;
  requestId: string;
  row: RevisionRow;
  abilities: Revision['abilities'];
  finding: string;
  reason: string;
  toBeReturned: boolean;
}

/** Accepts a failing finding with a reason. The outcome itself never changes. */
export async function waive(deps: Deps, waiver: NewWaiver): Promise<string> {
  const { actor, row, finding, reason, toBeReturned } = waiver;
  const { revision, submittal } = row;
  const id = deps.newId();
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, actor, revision.id);
    if (locked?.state !== 'in review') {
      throw new Problem('wrong-state', {
        detail: `Revision ${revision.number} is ${locked?.state ?? 'gone'}, not in review.`,
        fix: 'Take it for review, then waive.',
      });
    }
    const check = await newestCheckOf(tx, actor, revision.id);
    const found = check?.result.findings.find((each) => findingKey(each) === finding);
    if (found === undefined) {
      const detail = 'The check has no such finding.';
      throw new Problem('invalid-input', { detail, errors: [{ pointer: '/finding', detail }] });
    }
    if (!mayWaive(waiver.abilities, found.severity)) {
      throw new Problem('not-allowed', {
        detail: `A ${found.severity} finding is waived by a signing engineer, or by its reviewer where the agency lets reviewers.`,
      });
    }
    if (found.outcome !== 'fail') {
      throw new Problem('wrong-state', {
        detail: `${found.title} is “${found.outcome}”; only fails can be waived.`,
        fix: found.outcome === 'pass' ? 'Nothing has to be waived.' : 'Ask for what is missing with a note.',
      });
    }
    const values = {
      id,
      submittalId: submittal.id,
      revisionId: revision.id,
      agencyId: revision.agencyId,
      contractorId: revision.contractorId,
      finding,
      reason,
      toBeReturned,
      personId: actor.personId,
      createdAt: deps.now(),
    };
    try {
      await tx.insert(waivers).values(values);
    } catch (error) {
      if (!isDuplicateEntry(error)) throw error;
      throw new Problem('already-exists', {
        detail: 'This finding is waived already.',
        fix: 'Take the waiver back to give another reason.',
      });
    }
    await writeAudit(tx, deps, {
      actor,
      act: 'finding waived',
      subject: { kind: 'revision', id: revision.id },
      detail: { finding, reason, toBeReturned },
      requestId: waiver.requestId,
    });
  });
  return id;
}

interface Removal {
  actor: Actor;
  requestId: string;
  waiver: { id: string; revisionId: string; finding: string };
  version: number;
}

export async function removeWaiver(
  deps: Deps,
  { actor, requestId, waiver, version }: Removal,
): Promise<void> {
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, actor, waiver.revisionId);
    if (locked?.state !== 'in review') {
      throw new Problem('wrong-state', {
        detail: 'The return is sent, or the revision is no longer in review.',
      });
    }
    expectWritten(
      await tx
        .delete(waivers)
        .where(
          and(
            eq(waivers.id, waiver.id),
            eq(waivers.agencyId, actor.organisationId),
            eq(waivers.version, version),
          ),
        ),
    );
    await writeAudit(tx, deps, {
      actor,
      act: 'waiver taken back',
      subject: { kind: 'revision', id: waiver.revisionId },
      detail: { finding: waiver.finding },
      requestId,
    });
  });
}
