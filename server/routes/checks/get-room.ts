import { getRoom } from '#shared/contracts/room';
import { newestCheckOf } from '../../db/queries/checks';
import { isStartingPoint, revisionBefore } from '../../db/queries/returns';
import { roomView } from '../../presenters/room-view';
import { route } from '../define-route';
import { expectRevision } from '../submittals/load-revision';
import { unchecked } from './view-check';

export const getRoomRoute = route(getRoom, async ({ deps, params, actor }) => {
  const row = await expectRevision(deps, actor, params);
  const { revision, agency } = row;
  const [check, before, startingPoint] = await Promise.all([
    newestCheckOf(deps.db, actor, revision.id),
    revisionBefore(deps.db, actor, revision),
    isStartingPoint(deps.db, agency.id, revision.section.base),
  ]);
  if (check === null) throw unchecked(row);
  const earlier = before && (await newestCheckOf(deps.db, actor, before.id));
  const view = roomView(
    check.result,
    before && earlier && { revision: before.number, result: earlier.result },
  );
  return { ...view, seal: check.result.seal, startingPoint };
});
