import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { previewReading } from '#shared/contracts/corrections';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export type Proposal = z.input<NonNullable<typeof previewReading.body>>;

/** What a proposal would change of the reading as it stands at a version; nothing is kept by asking. */
export function previewQuery(params: RevisionParams, version: number, proposal: Proposal) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'reading preview', version, proposal],
    queryFn: ({ signal }) => call(previewReading, { params, body: proposal, signal }),
    staleTime: 60_000,
    gcTime: 60_000,
  });
}

export function usePreview(params: RevisionParams, version: number, proposal: Proposal) {
  return useQuery({ ...previewQuery(params, version, proposal), placeholderData: keepPreviousData });
}
