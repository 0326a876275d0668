import type { Correction } from '#rules/reading/correction';
import { saidInWords, type WordsFor } from '#rules/reading/mapping-sentence';
import type { ReadingAct } from '../db/queries/reading-acts';
import { readingLabel } from './present-preview';

/** Who corrected and typed what; a withdrawal is told with the act that it takes back. */
export function presentActs(acts: readonly ReadingAct[], words: WordsFor) {
  return acts.flatMap(({ id, act, by, at, takenBack }) => {
    if (act.kind === 'taken back') return [];
    const text =
      act.kind === 'correction'
        ? correctionText(act.correction, words)
        : `${readingLabel(act.reading, words)} typed as ${act.reading.value ?? act.reading.qualifier}`;
    const back = takenBack && { by: takenBack.by, at: takenBack.at.toISOString() };
    return [{ id, text, by, at: at.toISOString(), takenBack: back }];
  });
}

/** "Trials C5:C14 is Gmb, in g/cm³" */
function correctionText({ sheet, range, says }: Correction, words: WordsFor): string {
  return `${sheet === '' ? range : `${sheet} ${range}`} is ${saidInWords(says, words)}`;
}
