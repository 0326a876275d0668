import type { Project, ProjectListItem } from '#shared/contracts/projects';
import { listEditions } from '../../db/queries/editions';
import {
  contactsOfProject,
  contractorsOfProjects,
  countSubmittals,
  type ProjectRow,
  sectionsOfProjects,
} from '../../db/queries/projects';
import type { Deps } from '../../deps';
import type { Actor } from '../../policies/actor';
import { confirmsSections } from '../../policies/session-abilities';
import { presentProject, presentProjectList } from '../../presenters/present-project';

export async function viewProject(
  { db, now }: Pick<Deps, 'db' | 'now'>,
  actor: Actor,
  row: ProjectRow,
): Promise<Project> {
  const { id, agencyId } = row.project;
  const [sections, contacts, contractors, editions] = await Promise.all([
    sectionsOfProjects(db, actor, [id]),
    contactsOfProject(db, actor, id),
    contractorsOfProjects(db, actor, [id]),
    confirmsSections(actor) ? listEditions(db, agencyId) : [],
  ]);
  return presentProject({ actor, now: now(), row, sections, contacts, contractors, editions });
}

export async function viewProjectList(
  { db }: Pick<Deps, 'db'>,
  actor: Actor,
  rows: ProjectRow[],
): Promise<ProjectListItem[]> {
  const ids = rows.map(({ project }) => project.id);
  const [sections, contractors, submittals] = await Promise.all([
    sectionsOfProjects(db, actor, ids),
    contractorsOfProjects(db, actor, ids),
    countSubmittals(db, actor, ids),
  ]);
  return presentProjectList(rows, { sections, contractors, submittals });
}
