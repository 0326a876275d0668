import { changeSection as changeEndpoint } from '#shared/contracts/projects';
import { changeSection } from '../../commands/projects/keep-section';
import { allow } from '../../policies/allow';
import { confirmsSections } from '../../policies/session-abilities';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { loadProject } from './load-project';
import { viewProject } from './view-project';

/** If-Match carries the version of the section, not of the project. */
export const changeSectionRoute = route(
  changeEndpoint,
  async ({ deps, actor, params: { projectId, sectionId }, body, version, requestId }) => {
    const row = await loadProject(deps, actor, projectId);
    const present = await viewProject(deps, actor, row);
    const section = present.sections.find((each) => each.id === sectionId);
    if (!section) throw new Problem('not-found');
    allow(confirmsSections(actor));
    if (section.version !== version) throw new Problem('version-stale', { present });
    await changeSection(deps, { actor, projectId, sectionId, version, choice: body, requestId });
    return viewProject(deps, actor, await loadProject(deps, actor, projectId));
  },
);
