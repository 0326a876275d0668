import { keepAnswer } from '#shared/contracts/readings';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useReadingChange } from './use-reading-change';

export interface KeptAnswer {
  sheet: string;
  cell: string;
  text: string;
  answer: string | null;
}

export function useKeepAnswers(params: RevisionParams) {
  return useReadingChange<KeptAnswer[]>(params, (answers, { version }) =>
    call(keepAnswer, { params, body: { answers }, version }),
  );
}
