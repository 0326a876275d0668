import type { RevisionRow } from '../../db/queries/revisions';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { expectAbility } from '../submittals/expect-ability';
import { expectRevision, expectSeen, type RevisionPlace, viewRevision } from '../submittals/load-revision';

/** A draft whose reading the actor may change, at the version that they saw. */
export async function expectDraft(
  deps: Deps,
  actor: RequestActor,
  place: RevisionPlace,
  version: number | null,
): Promise<RevisionRow> {
  const row = await expectRevision(deps, actor, place);
  expectAbility(await viewRevision(deps, actor, row), {
    ability: 'answer',
    states: ['draft'],
    done: 'changed',
  });
  if (version !== null) await expectSeen(deps, actor, row, version);
  return row;
}
