import { makeReturnReady } from '#shared/contracts/returns';
import { loadReturn, viewReturn } from '../../commands/returns/load-return';
import { makeReturnReady as makeReady } from '../../commands/returns/make-return-ready';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const makeReturnReadyRoute = route(
  makeReturnReady,
  async ({ deps, actor, params, body, version, requestId }) => {
    const { row, loaded, fields, abilities } = await loadReturn(deps, actor, params);
    if (!abilities.prepareReturn) throw new Problem('not-allowed');
    await makeReady(deps, { actor, row, loaded, fields, seenVersion: version, ...body, requestId });
    return viewReturn(deps, actor, params);
  },
);
