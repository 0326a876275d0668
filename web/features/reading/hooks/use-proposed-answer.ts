import { useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import { isAt, nextOpenDoubt, type ProposedAnswer, type ReadingDoubt } from '../lib/doubt-answers';
import type { Place } from '../lib/first-place';
import { anAct, type ReadingAct } from '../lib/reading-act';
import type { ReadingActs } from './use-reading-acts';

/** An answer is shown with what it would change; once kept, the next doubt without one is at the cursor. */
export function useProposedAnswer({
  reading,
  acts,
  onCursor,
}: {
  reading: ReadingView;
  acts: ReadingActs;
  onCursor: (place: Place) => void;
}) {
  const [proposed, setProposed] = useState<ProposedAnswer | null>(null);
  const propose = (doubt: ReadingDoubt, answer: string | null) => {
    if (reading.abilities.answer) setProposed({ doubt, answer });
  };
  const leave = () => setProposed(null);
  const keep = () => {
    if (!proposed) return;
    const { doubt, answer } = proposed;
    acts.keep(answerAct(doubt, answer), `the answer at ${`${doubt.sheet} ${doubt.cell}`.trim()}`);
    leave();
    const next = nextOpenDoubt(reading.doubts, doubt);
    if (answer !== null && next) onCursor({ sheet: next.sheet, cell: next.cell });
  };
  const isStill = proposed !== null && reading.doubts.some((doubt) => isAt(doubt, proposed.doubt));
  return { proposed: isStill ? proposed : null, propose, keep, leave };
}

export function answerAct({ sheet, cell, text }: ReadingDoubt, answer: string | null): ReadingAct {
  return anAct({ answers: [{ sheet, cell, text, answer }] });
}
