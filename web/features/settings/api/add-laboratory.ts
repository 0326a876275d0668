import { useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { addLaboratory } from '#shared/contracts/people';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { laboratoriesQuery } from '../../../lib/queries/laboratories-query';

export type LaboratoryFields = z.input<NonNullable<typeof addLaboratory.body>>;

export function useAddLaboratory() {
  const client = useQueryClient();
  const act = useActKey();
  return async (fields: LaboratoryFields) => {
    const laboratory = await call(addLaboratory, { body: fields, idempotencyKey: act.keyFor(fields) });
    act.done();
    await client.invalidateQueries({ queryKey: laboratoriesQuery().queryKey });
    return laboratory;
  };
}
