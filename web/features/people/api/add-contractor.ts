import { useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { addContractor } from '#shared/contracts/organisation';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { contractorsQuery } from '../../../lib/queries/contractors-query';

export type ContractorFields = z.input<NonNullable<typeof addContractor.body>>;

export function useAddContractor() {
  const client = useQueryClient();
  const act = useActKey();
  return async (fields: ContractorFields) => {
    const contractor = await call(addContractor, { body: fields, idempotencyKey: act.keyFor(fields) });
    act.done();
    await client.invalidateQueries({ queryKey: contractorsQuery().queryKey });
    return contractor;
  };
}
