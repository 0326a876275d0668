import { queryOptions, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { type Draft, listStartingPoints, startDraft } from '#shared/contracts/drafts';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { ruleSetsQuery } from '../../../lib/queries/rule-sets-query';

export type NewDraft = z.input<NonNullable<typeof startDraft.body>>;

export function startingPointsQuery() {
  return queryOptions({
    queryKey: ['starting-points'],
    queryFn: ({ signal }) => call(listStartingPoints, { signal }),
    staleTime: Number.POSITIVE_INFINITY,
  });
}

export function useStartDraft() {
  const client = useQueryClient();
  const act = useActKey();
  return async (body: NewDraft): Promise<Draft> => {
    const draft = await call(startDraft, { body, idempotencyKey: act.keyFor(body) });
    act.done();
    await client.invalidateQueries({ queryKey: ruleSetsQuery().queryKey });
    return draft;
  };
}
