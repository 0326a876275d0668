import { QueryCache, QueryClient } from '@tanstack/react-query';
import { Problem } from './problem';

const staleMilliseconds = 10_000;

export function createQueryClient({ onSignedOut }: { onSignedOut: () => void }): QueryClient {
  return new QueryClient({
    queryCache: new QueryCache({
      onError: (error) => {
        if (error instanceof Problem && error.slug === 'not-signed-in') onSignedOut();
      },
    }),
    defaultOptions: {
      queries: { staleTime: staleMilliseconds, retry: worthRepeating, refetchOnWindowFocus: true },
      mutations: { retry: false },
    },
  });
}

/** A refusal stays a refusal; only a lost connection or a server that is starting is asked once more. */
function worthRepeating(failures: number, error: unknown): boolean {
  if (failures >= 1) return false;
  return !(error instanceof Problem) || error.status === 0 || error.status === 503;
}
