import { listProjects } from '#shared/contracts/projects';
import { listProjectRows } from '../../db/queries/projects';
import { managesProjects } from '../../policies/session-abilities';
import { route } from '../define-route';
import { viewProjectList } from './view-project';

export const listProjectsRoute = route(listProjects, async ({ deps, actor }) => ({
  projects: await viewProjectList(deps, actor, await listProjectRows(deps.db, actor)),
  abilities: { add: managesProjects(actor) },
}));
