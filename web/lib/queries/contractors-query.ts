import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { listContractors } from '#shared/contracts/organisation';
import { call } from '../api';

export function contractorsQuery() {
  return queryOptions({
    queryKey: ['contractors'],
    queryFn: ({ signal }) => call(listContractors, { signal }),
  });
}

export function useContractors() {
  return useSuspenseQuery(contractorsQuery()).data;
}
