import { findProjectRow, type ProjectRow } from '../../db/queries/projects';
import type { Deps } from '../../deps';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';

/** The project, where the actor's organisation may see it; all others are not there. */
export async function loadProject(
  deps: Pick<Deps, 'db'>,
  actor: Actor,
  projectId: string,
): Promise<ProjectRow> {
  const row = await findProjectRow(deps.db, actor, projectId);
  if (!row) throw new Problem('not-found');
  return row;
}
