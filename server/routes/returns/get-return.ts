import { getReturn } from '#shared/contracts/returns';
import { viewReturn } from '../../commands/returns/load-return';
import { route } from '../define-route';

export const getReturnRoute = route(getReturn, async ({ deps, actor, params }) =>
  viewReturn(deps, actor, params),
);
