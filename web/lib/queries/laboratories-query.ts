import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { listLaboratories } from '#shared/contracts/people';
import { call } from '../api';

export function laboratoriesQuery() {
  return queryOptions({
    queryKey: ['laboratories'],
    queryFn: ({ signal }) => call(listLaboratories, { signal }),
  });
}

export function useLaboratories() {
  return useSuspenseQuery(laboratoriesQuery()).data;
}
