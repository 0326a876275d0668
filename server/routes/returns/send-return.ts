import { sendReturn } from '#shared/contracts/returns';
import { loadReturn, viewReturn } from '../../commands/returns/load-return';
import { sendReturn as send } from '../../commands/returns/send-return';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const sendReturnRoute = route(sendReturn, async ({ deps, actor, params, version, requestId }) => {
  const { row, loaded, fields, abilities } = await loadReturn(deps, actor, params);
  if (!abilities.sendReturn) throw new Problem('not-allowed');
  await send(deps, { actor, row, loaded, fields, seenVersion: version, requestId });
  return viewReturn(deps, actor, params);
});
