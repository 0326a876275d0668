import { getProject } from '#shared/contracts/projects';
import { route } from '../define-route';
import { loadProject } from './load-project';
import { viewProject } from './view-project';

export const getProjectRoute = route(getProject, async ({ deps, actor, params }) =>
  viewProject(deps, actor, await loadProject(deps, actor, params.projectId)),
);
