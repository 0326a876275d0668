import { addContractor as addEndpoint } from '#shared/contracts/organisation';
import { addContractor } from '../../commands/organisation/add-contractor';
import { allow } from '../../policies/allow';
import { managesProjects } from '../../policies/session-abilities';
import { route } from '../define-route';

export const addContractorRoute = route(addEndpoint, async ({ deps, actor, body, requestId }) => {
  allow(managesProjects(actor));
  const id = await addContractor(deps, { actor, ...body, requestId });
  return { id, name: body.name, projects: 0, joined: false, invited: true };
});
