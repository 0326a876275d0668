import type { z } from 'zod';
import { addDocument } from '#shared/contracts/readings';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useReadingChange } from './use-reading-change';

export type AddedDocument = z.input<NonNullable<typeof addDocument.body>>;

export function useAddDocument(params: RevisionParams) {
  const act = useActKey();
  return useReadingChange<{ fields: AddedDocument; file: File | null }>(params, async (given) => {
    const reading = await call(addDocument, {
      params,
      body: given.fields,
      ...(given.file ? { files: { file: given.file } } : {}),
      idempotencyKey: act.keyFor(given),
    });
    act.done();
    return reading;
  });
}
