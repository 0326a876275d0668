import { removeWaiver, waive } from '#shared/contracts/notes';
import { removeWaiver as remove, waive as write } from '../../commands/notes/waive';
import { findWaiver } from '../../db/queries/notes';
import { presentWaiver } from '../../presenters/visible-notes';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectRevision, viewRevision } from '../submittals/load-revision';

export const waiveRoute = route(waive, async ({ deps, params, body, actor, requestId }) => {
  const row = await expectRevision(deps, actor, params);
  if (actor.kind !== 'agency') throw new Problem('not-allowed');
  const { abilities } = await viewRevision(deps, actor, row);
  const waiverId = await write(deps, { actor, requestId, row, abilities, ...body });
  const waiver = await findWaiver(deps.db, actor.organisationId, waiverId);
  if (waiver === null) throw new Error(`The waiver ${waiverId} was written and is not there.`);
  return presentWaiver(waiver, actor, abilities);
});

export const removeWaiverRoute = route(
  removeWaiver,
  async ({ deps, params: { waiverId }, version, actor, requestId }) => {
    const found = await findWaiver(deps.db, actor.organisationId, waiverId);
    if (found === null) throw new Problem('not-found');
    const { waiver, revision } = found;
    const place = { submittalId: waiver.submittalId, number: revision.number };
    const { abilities } = await viewRevision(deps, actor, await expectRevision(deps, actor, place));
    const view = presentWaiver(found, actor, abilities);
    if (!view.abilities.remove) {
      if (revision.state !== 'in review') {
        throw new Problem('wrong-state', { detail: `The revision is ${revision.state}; its waivers stand.` });
      }
      throw new Problem('not-allowed');
    }
    if (view.version !== version) throw new Problem('version-stale', { present: view });
    await remove(deps, { actor, requestId, waiver, version });
    return undefined;
  },
);
