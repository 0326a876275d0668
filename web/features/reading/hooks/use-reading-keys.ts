import type { ReadingView } from '#shared/contracts/readings';
import { useShortcuts } from '../../../lib/shortcuts';
import { choiceForKey, isAt, nextDoubt, type ReadingDoubt } from '../lib/doubt-answers';
import type { Place } from '../lib/first-place';

const numberKeys = ['1', '2', '3', '4', '5', '6', '7', '8', '9'];

/** J and K go from doubt to doubt, a number answers the one at the cursor, G asks for a cell. */
export function useReadingKeys(options: {
  reading: ReadingView;
  cursor: Place;
  onCursor: (place: Place) => void;
  onAnswer: (doubt: ReadingDoubt, answer: string) => void;
  onFindings: () => void;
}): void {
  const { reading, cursor, onCursor, onAnswer, onFindings } = options;
  const go = (step: 1 | -1) => {
    const doubt = nextDoubt(reading.doubts, cursor, step);
    if (doubt) onCursor({ sheet: doubt.sheet, cell: doubt.cell });
  };
  const answer = (key: string) => {
    const doubt = reading.doubts.find((one) => isAt(one, cursor));
    const choice = doubt ? choiceForKey(doubt, key) : null;
    if (doubt && choice) onAnswer(doubt, choice.answer);
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
    { key: 'Enter', label: 'see the findings', run: onFindings },
  ]);
}

export const cellToGoToId = 'cell-to-go-to';
