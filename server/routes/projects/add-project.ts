import { addProject as addEndpoint } from '#shared/contracts/projects';
import { addProject } from '../../commands/projects/keep-project';
import { allow } from '../../policies/allow';
import { managesProjects } from '../../policies/session-abilities';
import { route } from '../define-route';
import { loadProject } from './load-project';
import { viewProject } from './view-project';

export const addProjectRoute = route(addEndpoint, async ({ deps, actor, body, requestId }) => {
  allow(managesProjects(actor));
  const id = await addProject(deps, { actor, fields: body, requestId });
  return viewProject(deps, actor, await loadProject(deps, actor, id));
});
