import { queryOptions, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { changeOrganisation, getOrganisation, type Organisation } from '#shared/contracts/organisation';
import { call } from '../../../lib/api';
import { sessionQuery } from '../../../lib/queries/session-query';

export type OrganisationFields = z.input<NonNullable<typeof changeOrganisation.body>>;

export function organisationQuery() {
  return queryOptions({
    queryKey: ['organisation'],
    queryFn: ({ signal }) => call(getOrganisation, { signal }),
  });
}

export function useOrganisation(): Organisation {
  return useSuspenseQuery(organisationQuery()).data;
}

export function useChangeOrganisation() {
  const client = useQueryClient();
  return async (fields: OrganisationFields, version: number) => {
    const organisation = await call(changeOrganisation, { body: fields, version });
    client.setQueryData(organisationQuery().queryKey, organisation);
    await client.invalidateQueries({ queryKey: sessionQuery().queryKey });
    return organisation;
  };
}
