import { getSectionTemplate } from '#shared/contracts/projects';
import { sectionsOfProjects } from '../../db/queries/projects';
import { loadResolvedEdition } from '../../db/resolved-edition';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { loadProject } from './load-project';

export const getSectionTemplateRoute = route(
  getSectionTemplate,
  async ({ deps, actor, params: { projectId, sectionId } }) => {
    const { project } = await loadProject(deps, actor, projectId);
    const sections = await sectionsOfProjects(deps.db, actor, [projectId]);
    const found = sections.find(({ section }) => section.id === sectionId);
    if (!found) throw new Problem('not-found');
    const { resolvedHash } = found.section;
    const edition = await loadResolvedEdition(deps.db, resolvedHash);
    const { writeTemplate } = await import('../../workbook/write-template');
    return {
      bytes: await writeTemplate(edition, { editionHash: resolvedHash, projectFacts: project.facts }),
      mediaType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
      fileName: `${project.number} ${found.base.ruleSetKey} ${found.base.edition} template.xlsx`,
    };
  },
);
