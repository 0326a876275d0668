import { queryOptions, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { getReadingChoices } from '#shared/contracts/corrections';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export type ReadingChoices = z.output<NonNullable<typeof getReadingChoices.response>>;

export function readingChoicesQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'reading choices'],
    queryFn: ({ signal }) => call(getReadingChoices, { params, signal }),
    staleTime: 300_000,
  });
}

export function useReadingChoices(params: RevisionParams) {
  return useQuery(readingChoicesQuery(params));
}
