import { changeProject as changeEndpoint } from '#shared/contracts/projects';
import { changeProject } from '../../commands/projects/keep-project';
import { expectVersion } from '../../middleware/if-match';
import { allow } from '../../policies/allow';
import { managesProjects } from '../../policies/session-abilities';
import { route } from '../define-route';
import { loadProject } from './load-project';
import { viewProject } from './view-project';

export const changeProjectRoute = route(
  changeEndpoint,
  async ({ deps, actor, params: { projectId }, body, version, requestId }) => {
    const present = await loadProject(deps, actor, projectId);
    allow(managesProjects(actor));
    expectVersion(version, await viewProject(deps, actor, present));
    await changeProject(deps, { actor, projectId, version, fields: body, requestId });
    return viewProject(deps, actor, await loadProject(deps, actor, projectId));
  },
);
