import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

const pauseMilliseconds = 700;

/** Asks again while work runs in the background; stops by itself. */
export function useRenewWhileRunning({ submittalId, number }: RevisionParams, running: boolean): void {
  const client = useQueryClient();
  useEffect(() => {
    if (!running) return;
    const timer = setInterval(() => {
      void client.invalidateQueries({ queryKey: revisionKey({ submittalId, number }) });
    }, pauseMilliseconds);
    return () => clearInterval(timer);
  }, [client, submittalId, number, running]);
}
