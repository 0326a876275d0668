import { type LoaderFunctionArgs, useSearchParams } from 'react-router-dom';
import { revisionStateSchema } from '#shared/contracts/submittals';
import { queryClient } from '../../lib/client';
import { projectsQuery } from '../../lib/queries/projects-query';
import { type SubmittalFilters, submittalsQuery } from './api/list-submittals';
import { SubmittalsPage } from './components/submittals-page';

export async function loader({ request }: LoaderFunctionArgs) {
  const filters = filtersOf(new URL(request.url).searchParams);
  await Promise.all([
    queryClient.ensureInfiniteQueryData(submittalsQuery(filters)),
    queryClient.ensureQueryData(projectsQuery()),
  ]);
  return null;
}

export function Component() {
  const [search] = useSearchParams();
  return <SubmittalsPage filters={filtersOf(search)} />;
}

/** A state that nobody knows filters nothing. */
function filtersOf(search: URLSearchParams): SubmittalFilters {
  const state = revisionStateSchema.safeParse(search.get('state'));
  const project = search.get('project');
  const q = search.get('q');
  return {
    ...(state.success ? { state: state.data } : {}),
    ...(project ? { project } : {}),
    ...(q ? { q } : {}),
  };
}
