import { keepAnswer, type ReadingView } from '#shared/contracts/readings';
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
  return useReadingChange<KeptAnswer[]>(
    params,
    (answers, { version }) => call(keepAnswer, { params, body: { answers }, version }),
    withAnswers,
  );
}

function withAnswers(answers: KeptAnswer[], present: ReadingView): ReadingView {
  const answerTo = (doubt: ReadingView['doubts'][number]) =>
    answers.find(({ sheet, cell }) => sheet === doubt.sheet && cell === doubt.cell);
  const doubts = present.doubts.map((doubt) => ({ ...doubt, ...pickAnswer(answerTo(doubt)) }));
  return { ...present, doubts };
}

function pickAnswer(kept: KeptAnswer | undefined): { answer?: string | null } {
  return kept ? { answer: kept.answer } : {};
}
