import { addLaboratory as addEndpoint } from '#shared/contracts/people';
import { addLaboratory } from '../../commands/organisation/add-laboratory';
import { allow } from '../../policies/allow';
import { keepsLaboratories } from '../../policies/session-abilities';
import { presentLaboratory } from '../../presenters/present-laboratory';
import { route } from '../define-route';

export const addLaboratoryRoute = route(addEndpoint, async ({ deps, actor, body, requestId }) => {
  allow(keepsLaboratories(actor));
  const row = await addLaboratory(deps, { actor, ...body, requestId });
  return presentLaboratory(row, actor.organisation);
});
