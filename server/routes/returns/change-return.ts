import { changeReturn } from '#shared/contracts/returns';
import { keepReturn } from '../../commands/returns/keep-return';
import { loadReturn, viewReturn } from '../../commands/returns/load-return';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const changeReturnRoute = route(changeReturn, async ({ deps, actor, params, body, version }) => {
  const { row, abilities } = await loadReturn(deps, actor, params);
  if (!abilities.prepareReturn) throw new Problem('not-allowed');
  await keepReturn(deps, { actor, row, fields: body, seenVersion: version });
  return viewReturn(deps, actor, params);
});
