import { listContractors } from '#shared/contracts/organisation';
import { listContractorsOf } from '../../db/queries/contractors';
import { allow } from '../../policies/allow';
import { managesProjects } from '../../policies/session-abilities';
import { route } from '../define-route';

export const listContractorsRoute = route(listContractors, async ({ deps, actor }) => {
  allow(actor.kind === 'agency', 'Contractors are listed for an agency.');
  return {
    contractors: await listContractorsOf(deps.db, { agencyId: actor.organisationId, now: deps.now() }),
    abilities: { add: managesProjects(actor) },
  };
});
