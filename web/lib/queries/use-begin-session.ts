import { useQueryClient } from '@tanstack/react-query';
import type { Session } from '#shared/contracts/session';
import { sessionQuery } from './session-query';

/** A new session, or another organisation: nothing that was fetched for the one before may stay. */
export function useBeginSession(): (session: Session) => Session {
  const client = useQueryClient();
  return (session) => {
    client.clear();
    client.setQueryData(sessionQuery().queryKey, session);
    return session;
  };
}
