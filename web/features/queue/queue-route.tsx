import { type LoaderFunctionArgs, useSearchParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { type QueueFilters, queueQuery } from './api/get-queue';
import { QueuePage } from './components/queue-page';

export async function loader({ request }: LoaderFunctionArgs) {
  await queryClient.ensureQueryData(queueQuery(filtersOf(new URL(request.url).searchParams)));
  return null;
}

export function Component() {
  const [search] = useSearchParams();
  return <QueuePage filters={filtersOf(search)} />;
}

/** An address with a word that no filter knows shows everything. */
function filtersOf(search: URLSearchParams): QueueFilters {
  const who = search.get('who');
  return {
    who: who === 'mine' || who === 'not taken' || who === 'to sign' ? who : 'everyone',
    by: search.get('by') === 'project' ? 'project' : 'due',
  };
}
