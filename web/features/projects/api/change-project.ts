import { useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { addProject, changeProject, type Project } from '#shared/contracts/projects';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { projectQuery, projectsQuery } from '../../../lib/queries/projects-query';

export type ProjectFields = z.input<NonNullable<typeof addProject.body>>;

export function useAddProject() {
  const keep = useKeepProject();
  const act = useActKey();
  return async (fields: ProjectFields) => {
    const project = await call(addProject, { body: fields, idempotencyKey: act.keyFor(fields) });
    act.done();
    return keep(project);
  };
}

export function useChangeProject() {
  const keep = useKeepProject();
  return async ({ id, version }: Pick<Project, 'id' | 'version'>, fields: ProjectFields) =>
    keep(await call(changeProject, { params: { projectId: id }, body: fields, version }));
}

export function useKeepProject() {
  const client = useQueryClient();
  return async (project: Project): Promise<Project> => {
    client.setQueryData(projectQuery(project.id).queryKey, project);
    await client.invalidateQueries({ queryKey: projectsQuery().queryKey });
    return project;
  };
}
