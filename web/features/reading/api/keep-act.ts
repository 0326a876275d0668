import { keepCorrections, takeBackAct, typeReadings } from '#shared/contracts/corrections';
import { keepAnswer, type ReadingView } from '#shared/contracts/readings';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import type { GivenAnswer, ReadingAct } from '../lib/reading-act';
import { useReadingChange } from './use-reading-change';

/** Keeps all parts of an act, in the order in which the preview tries them; each part sees the version before it. */
export function useKeepAct(params: RevisionParams) {
  const key = useActKey();
  return useReadingChange<ReadingAct>(
    params,
    async (act, present) => {
      const { answers, corrections, typed, takeBack } = act;
      let reading = present;
      const keyOf = (part: unknown) => key.keyFor([reading.version, part]);
      for (const actId of takeBack) {
        const of = { ...params, actId };
        const { version } = reading;
        reading = await call(takeBackAct, { params: of, body: {}, version, idempotencyKey: keyOf(actId) });
      }
      if (answers.length > 0) {
        reading = await call(keepAnswer, { params, body: { answers }, version: reading.version });
      }
      if (corrections.length > 0) {
        const { version } = reading;
        const body = { corrections };
        reading = await call(keepCorrections, { params, body, version, idempotencyKey: keyOf(body) });
      }
      if (typed.length > 0) {
        const { version } = reading;
        const body = { readings: typed };
        reading = await call(typeReadings, { params, body, version, idempotencyKey: keyOf(body) });
      }
      key.done();
      return reading;
    },
    ({ answers }, present) => withAnswers(answers, present),
  );
}

function withAnswers(answers: GivenAnswer[], present: ReadingView): ReadingView {
  const doubts = present.doubts.map((doubt) => {
    const given = answers.find(({ sheet, cell }) => sheet === doubt.sheet && cell === doubt.cell);
    return given ? { ...doubt, answer: given.answer } : doubt;
  });
  return { ...present, doubts };
}
