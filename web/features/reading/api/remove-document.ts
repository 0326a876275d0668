import { removeDocument } from '#shared/contracts/readings';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useReadingChange } from './use-reading-change';

export function useRemoveDocument(params: RevisionParams) {
  return useReadingChange<{ documentId: string }>(params, ({ documentId }, { version }) =>
    call(removeDocument, { params: { ...params, documentId }, version }),
  );
}
