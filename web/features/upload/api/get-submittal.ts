import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getSubmittal, type Revision } from '#shared/contracts/submittals';
import { call } from '../../../lib/api';

export function submittalQuery(submittalId: string) {
  return queryOptions({
    queryKey: ['submittals', submittalId, 'latest'],
    queryFn: ({ signal }) => call(getSubmittal, { params: { submittalId }, signal }),
  });
}

export function useSubmittal(submittalId: string): Revision {
  return useSuspenseQuery(submittalQuery(submittalId)).data;
}
