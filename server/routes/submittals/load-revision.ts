import type { Revision } from '#shared/contracts/submittals';
import { newestCheckHead } from '../../db/queries/checks';
import { newestJobOf } from '../../db/queries/jobs';
import { listReplacedWorkbooks } from '../../db/queries/records';
import { findRevision, listRevisions, nameOfDecider, type RevisionRow } from '../../db/queries/revisions';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { presentRevision } from '../../presenters/present-revision';
import { Problem } from '../../problem';

export interface RevisionPlace {
  submittalId: string;
  number: number;
}

/** A revision that the actor's organisation may see; everything else answers as absent. */
export async function expectRevision(
  deps: Deps,
  actor: RequestActor,
  place: RevisionPlace,
): Promise<RevisionRow> {
  const row = await findRevision(deps.db, actor, place);
  if (row === null) throw new Problem('not-found');
  return row;
}

/** A revision as its page shows it, with what the actor may do. */
export async function viewRevision(deps: Deps, actor: RequestActor, row: RevisionRow): Promise<Revision> {
  const { revision } = row;
  const [all, check, job, replaced, decidedBy] = await Promise.all([
    listRevisions(deps.db, actor, row.submittal.id),
    newestCheckHead(deps.db, actor, revision.id),
    // Its reading is the contractor's business: the agency sees what was submitted.
    actor.kind === 'contractor'
      ? newestJobOf(deps.db, actor.organisationId, { subjectKind: 'revision', subjectId: revision.id })
      : null,
    actor.kind === 'contractor' ? listReplacedWorkbooks(deps.db, actor.organisationId, revision.id) : [],
    revision.state === 'returned' ? nameOfDecider(deps.db, actor, revision.id) : null,
  ]);
  return presentRevision({
    row,
    actor,
    now: deps.now(),
    job,
    hasCheck: check !== null,
    all,
    replaced,
    decidedBy,
  });
}

/** The same after an act: read anew, by whatever state it is in now. */
export async function viewRevisionAt(
  deps: Deps,
  actor: RequestActor,
  place: RevisionPlace,
): Promise<Revision> {
  return viewRevision(deps, actor, await expectRevision(deps, actor, place));
}

/** Refuses a writer who saw an older version, with the present state beside it. */
export async function expectSeen(
  deps: Deps,
  actor: RequestActor,
  row: RevisionRow,
  version: number,
): Promise<void> {
  if (version === row.revision.version) return;
  throw new Problem('version-stale', { present: await viewRevision(deps, actor, row) });
}
