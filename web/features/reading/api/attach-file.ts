import { attachFile } from '#shared/contracts/readings';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useReadingChange } from './use-reading-change';

/** The version is the document row's own, as its If-Match guards that row. */
export function useAttachFile(params: RevisionParams) {
  return useReadingChange<{ documentId: string; version: number; file: File }>(
    params,
    ({ documentId, version, file }) =>
      call(attachFile, { params: { ...params, documentId }, body: {}, files: { file }, version }),
  );
}
