import { getCreep } from '#shared/contracts/creep';
import { newestCheckOf } from '../../db/queries/checks';
import { isStartingPoint } from '../../db/queries/returns';
import { loadResolvedEdition } from '../../db/resolved-edition';
import { creepView } from '../../presenters/creep-view';
import { route } from '../define-route';
import { expectRevision } from '../submittals/load-revision';
import { unchecked } from './view-check';

export const getCreepRoute = route(getCreep, async ({ deps, params, actor }) => {
  const row = await expectRevision(deps, actor, params);
  const check = await newestCheckOf(deps.db, actor, row.revision.id);
  if (check === null) throw unchecked(row);
  const { findings, analysis, seal } = check.result;
  const [edition, startingPoint] = await Promise.all([
    loadResolvedEdition(deps.db, check.resolvedHash),
    isStartingPoint(deps.db, row.agency.id, row.revision.section.base),
  ]);
  const view = creepView({ creep: analysis.creep, findings, rules: edition.rules });
  return { ...view, seal, startingPoint };
});
