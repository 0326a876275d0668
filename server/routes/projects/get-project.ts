import { getProject } from '#shared/contracts/projects';
import { presentProject } from '../../presenters/present-project';
import { route } from '../define-route';
import { loadProject } from './load-project';

export const getProjectRoute = route(getProject, async ({ deps, actor, params }) =>
  presentProject(deps, actor, await loadProject(deps, actor, params.projectId)),
);
