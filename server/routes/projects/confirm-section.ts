import { confirmSection as confirmEndpoint } from '#shared/contracts/projects';
import { confirmSection } from '../../commands/projects/keep-section';
import { allow } from '../../policies/allow';
import { confirmsSections } from '../../policies/session-abilities';
import { route } from '../define-route';
import { loadProject } from './load-project';
import { viewProject } from './view-project';

export const confirmSectionRoute = route(
  confirmEndpoint,
  async ({ deps, actor, params: { projectId }, body, requestId }) => {
    await loadProject(deps, actor, projectId);
    allow(confirmsSections(actor));
    await confirmSection(deps, { actor, projectId, choice: body, requestId });
    return viewProject(deps, actor, await loadProject(deps, actor, projectId));
  },
);
