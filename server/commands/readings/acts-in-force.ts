import type { Correction } from '#rules/reading/correction';
import type { Reading } from '#rules/record';
import type { ReadingAct } from '../../db/queries/reading-acts';

/** Corrections of this very workbook that nobody took back, oldest first. */
export function correctionsInForce(acts: readonly ReadingAct[], fileId: string) {
  return acts.flatMap(({ id, act, by, at, takenBack, fileId: of }) =>
    act.kind === 'correction' && takenBack === null && of === fileId
      ? [{ id, by, at, correction: act.correction satisfies Correction }]
      : [],
  );
}

/** Readings that were typed and that nobody took back, oldest first. */
export function typedInForce(acts: readonly ReadingAct[]) {
  return acts.flatMap(({ id, act, by, at, takenBack }) =>
    act.kind === 'typed' && takenBack === null
      ? [{ id, by, at, reading: act.reading satisfies Reading }]
      : [],
  );
}
