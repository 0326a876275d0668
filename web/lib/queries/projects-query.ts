import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getProject, listProjects, type Project } from '#shared/contracts/projects';
import { call } from '../api';

export function projectsQuery() {
  return queryOptions({
    queryKey: ['projects', 'list'],
    queryFn: ({ signal }) => call(listProjects, { signal }),
  });
}

export function useProjects() {
  return useSuspenseQuery(projectsQuery()).data;
}

export function projectQuery(projectId: string) {
  return queryOptions({
    queryKey: ['projects', projectId],
    queryFn: ({ signal }) => call(getProject, { params: { projectId }, signal }),
  });
}

export function useProject(projectId: string): Project {
  return useSuspenseQuery(projectQuery(projectId)).data;
}
