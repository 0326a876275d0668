import type { ReadingView } from '#shared/contracts/readings';
import { useShortcuts } from '../../../lib/shortcuts';
import { choiceForKey, isAt, nextDoubt, type ReadingDoubt } from '../lib/doubt-answers';
import type { Place } from '../lib/first-place';
import type { ReadingActs } from './use-reading-acts';

const numberKeys = ['1', '2', '3', '4', '5', '6', '7', '8', '9'];

/**
 * J and K go from doubt to doubt, a number proposes an answer to the one at the cursor and Enter keeps it, G asks for
 * a cell, U and R undo and do again.
 */
export function useReadingKeys(options: {
  reading: ReadingView;
  cursor: Place;
  onCursor: (place: Place) => void;
  onPropose: (doubt: ReadingDoubt, answer: string) => void;
  /** Keeps and leaves the answer that is proposed; null where none is. */
  proposal: { keep: () => void; leave: () => void } | null;
  acts: Pick<ReadingActs, 'undo' | 'redo'>;
  onFindings: () => void;
}): void {
  const { reading, cursor, onCursor, onPropose, proposal, acts, onFindings } = options;
  const go = (step: 1 | -1) => {
    const doubt = nextDoubt(reading.doubts, cursor, step);
    if (doubt) onCursor({ sheet: doubt.sheet, cell: doubt.cell });
  };
  const answer = (key: string) => {
    const doubt = reading.doubts.find((one) => isAt(one, cursor));
    const choice = doubt ? choiceForKey(doubt, key) : null;
    if (doubt && choice) onPropose(doubt, choice.answer);
  };
  useShortcuts([
    { key: 'j', label: 'next doubt', foot: true, run: () => go(1) },
    { key: 'k', label: 'previous doubt', run: () => go(-1) },
    ...numberKeys.map((key, index) => ({
      key,
      label: index === 0 ? 'to 9 answer' : `answer ${key}`,
      foot: index === 0,
      run: () => answer(key),
    })),
    {
      key: 'g',
      label: 'go to cell',
      foot: true,
      run: () => document.getElementById(cellToGoToId)?.focus(),
    },
    { key: 'u', label: 'undo', foot: true, run: acts.undo },
    { key: 'r', label: 'do again', run: acts.redo },
    proposal
      ? { key: 'Enter', label: 'keep', foot: true, run: proposal.keep }
      : { key: 'Enter', label: 'see the findings', run: onFindings },
    { key: 'Escape', label: 'leave what is proposed', run: () => proposal?.leave() },
    { key: 'Enter ', label: 'on a cell: say what it is', listedOnly: true, run: () => undefined },
    { key: 'Shift arrows', label: 'choose a block of cells', listedOnly: true, run: () => undefined },
  ]);
}

export const cellToGoToId = 'cell-to-go-to';
