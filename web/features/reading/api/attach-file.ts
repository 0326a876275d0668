import { attachFile } from '#shared/contracts/readings';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useReadingChange } from './use-reading-change';

export function useAttachFile(params: RevisionParams) {
  const act = useActKey();
  return useReadingChange<{ documentId: string; file: File }>(
    params,
    async ({ documentId, file }, { version }) => {
      const reading = await call(attachFile, {
        params: { ...params, documentId },
        body: {},
        files: { file },
        version,
        idempotencyKey: act.keyFor([documentId, version, file]),
      });
      act.done();
      return reading;
    },
  );
}
