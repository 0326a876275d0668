import { useQueryClient } from '@tanstack/react-query';
import { type Revision, replaceWorkbook, startRevision, uploadSubmittal } from '#shared/contracts/submittals';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { revisionQuery } from '../../../lib/queries/revision-query';

export interface NewSubmittal {
  projectId: string;
  sectionId: string;
  laboratoryId: string;
  mixDesignation: string;
}

export function useUploadSubmittal() {
  const keep = useKeepRevision();
  const act = useActKey();
  return async (fields: NewSubmittal, workbook: File) => {
    const key = act.keyFor([fields, workbook]);
    const revision = await call(uploadSubmittal, { body: fields, files: { workbook }, idempotencyKey: key });
    act.done();
    return keep(revision);
  };
}

export function useStartRevision(submittalId: string) {
  const keep = useKeepRevision();
  const act = useActKey();
  return async (fields: { laboratoryId: string; reason?: string }, workbook: File) => {
    const key = act.keyFor([fields, workbook]);
    const revision = await call(startRevision, {
      params: { submittalId },
      body: fields,
      files: { workbook },
      idempotencyKey: key,
    });
    act.done();
    return keep(revision);
  };
}

export function useReplaceWorkbook({
  submittalId,
  number,
  version,
}: Pick<Revision, 'submittalId' | 'number' | 'version'>) {
  const client = useQueryClient();
  const keep = useKeepRevision();
  const act = useActKey();
  return async (workbook: File) => {
    const revision = await call(replaceWorkbook, {
      params: { submittalId, number },
      body: {},
      files: { workbook },
      version,
      idempotencyKey: act.keyFor([version, workbook]),
    }).catch(async (error: unknown) => {
      // Whoever repeats it after "it has changed" has to have the present version.
      await client.invalidateQueries({ queryKey: revisionQuery({ submittalId, number }).queryKey });
      throw error;
    });
    act.done();
    return keep(revision);
  };
}

function useKeepRevision() {
  const client = useQueryClient();
  return async (revision: Revision): Promise<Revision> => {
    await client.invalidateQueries({ queryKey: ['submittals'], refetchType: 'none' });
    await client.invalidateQueries({ queryKey: ['home'], refetchType: 'none' });
    client.setQueryData(revisionQuery(revision).queryKey, revision);
    return revision;
  };
}
