import { useQuery } from '@tanstack/react-query';
import type { Revision } from '#shared/contracts/submittals';
import { type RevisionParams, revisionQuery } from '../../../lib/queries/revision-query';

const pollMilliseconds = 500;

/** A revision whose workbook is being read is asked for until the job ends. */
export function useWatchedRevision(params: RevisionParams, isWatched: boolean) {
  return useQuery({
    ...revisionQuery(params),
    enabled: isWatched,
    refetchInterval: (query) => (isRunning(query.state.data) ? pollMilliseconds : false),
  });
}

export function isRunning(revision: Revision | undefined): boolean {
  return revision?.job?.state === 'waiting' || revision?.job?.state === 'running';
}
