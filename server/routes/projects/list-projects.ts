import { listProjects } from '#shared/contracts/projects';
import { listProjectRows } from '../../db/queries/projects';
import { managesProjects } from '../../policies/session-abilities';
import { presentProjectList } from '../../presenters/present-project';
import { route } from '../define-route';

export const listProjectsRoute = route(listProjects, async ({ deps, actor }) => ({
  projects: await presentProjectList(deps.db, actor, await listProjectRows(deps.db, actor)),
  abilities: { add: managesProjects(actor) },
}));
