import { describe, expect, it } from 'vitest';
import {
  choiceForKey,
  choicesOf,
  doubtCountWords,
  doubtsLeftWords,
  nextDoubt,
  type ReadingDoubt,
} from '../../../../web/features/reading/lib/doubt-answers';

function aDoubt(given: Partial<ReadingDoubt>): ReadingDoubt {
  return {
    sheet: 'Trials',
    cell: 'C2',
    text: '03/04/2026',
    reason: 'Which day was it tested?',
    alternatives: [
      { answer: '2026-04-03', label: '3 April 2026' },
      { answer: '2026-03-04', label: '4 March 2026' },
    ],
    about: {},
    letter: 'a',
    answer: null,
    ...given,
  };
}

const three = [
  aDoubt({ cell: 'C2', answer: '2026-03-04' }),
  aDoubt({ cell: 'G18', letter: 'b' }),
  aDoubt({ sheet: 'TSR', cell: 'F20', letter: 'c' }),
];

describe('answering a doubt', () => {
  it('offers what the cell may mean, then to leave it out', () => {
    expect(choicesOf(aDoubt({})).map((choice) => choice.label)).toEqual([
      '3 April 2026',
      '4 March 2026',
      'Leave out',
    ]);
  });

  it('does not offer to leave out twice where the reading names it itself', () => {
    const doubt = aDoubt({
      alternatives: [
        { answer: 'leave out', label: 'Leave the value out' },
        { answer: '86.9', label: '86.9 %' },
      ],
    });
    expect(choicesOf(doubt).map((choice) => choice.answer)).toEqual(['86.9', 'leave out']);
  });

  it('takes the number keys as the choices in order', () => {
    expect(choiceForKey(aDoubt({}), '2')?.answer).toBe('2026-03-04');
    expect(choiceForKey(aDoubt({}), '3')?.answer).toBe('leave out');
  });

  it.each(['0', '4', '12', 'j', 'Enter'])('ignores the key %s where it names no choice', (key) => {
    expect(choiceForKey(aDoubt({}), key)).toBeNull();
  });
});

describe('going from doubt to doubt', () => {
  it('begins with the first doubt that has no answer', () => {
    expect(nextDoubt(three, null, 1)?.cell).toBe('G18');
  });

  it('begins with the first doubt where the cursor stands on none', () => {
    expect(nextDoubt(three, { sheet: 'Trials', cell: 'A1' }, 1)?.cell).toBe('G18');
  });

  it('goes across sheets and round both ends', () => {
    expect(nextDoubt(three, { sheet: 'Trials', cell: 'G18' }, 1)?.sheet).toBe('TSR');
    expect(nextDoubt(three, { sheet: 'TSR', cell: 'F20' }, 1)?.cell).toBe('C2');
    expect(nextDoubt(three, { sheet: 'Trials', cell: 'C2' }, -1)?.cell).toBe('F20');
  });

  it('finds none where nothing is in doubt', () => {
    expect(nextDoubt([], null, 1)).toBeNull();
  });
});

describe('counting doubts', () => {
  it('counts cells and answers', () => {
    expect(doubtCountWords(three)).toBe('3 cells, 1 answered');
    expect(doubtCountWords([aDoubt({})])).toBe('1 cell');
    expect(doubtCountWords([])).toBe('none');
  });

  it('says how many are left', () => {
    expect(doubtsLeftWords(three)).toBe('2 doubts left.');
    expect(doubtsLeftWords([aDoubt({ answer: 'leave out' })])).toBe('Every doubt is answered.');
    expect(doubtsLeftWords([])).toBe('Nothing is in doubt.');
  });
});
