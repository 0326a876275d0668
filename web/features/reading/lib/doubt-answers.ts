import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';

export type ReadingDoubt = ReadingView['doubts'][number];

export interface ProposedAnswer {
  doubt: ReadingDoubt;
  /** Null: the answer that is kept would be taken back. */
  answer: string | null;
}

export const leaveOut = 'leave out';

export interface DoubtChoice {
  answer: string;
  label: string;
}

/** What a doubt can be answered with, in the order of the number keys; leaving out is always possible and comes last. */
export function choicesOf(doubt: Pick<ReadingDoubt, 'alternatives'>): DoubtChoice[] {
  const named = doubt.alternatives
    .filter((alternative) => alternative.answer !== leaveOut)
    .map(({ answer, label }) => ({ answer, label }));
  return [...named, { answer: leaveOut, label: 'Leave out' }];
}

/** The choice that a number key names: `1` is the first. */
export function choiceForKey(doubt: Pick<ReadingDoubt, 'alternatives'>, key: string): DoubtChoice | null {
  if (!/^[1-9]$/.test(key)) return null;
  return choicesOf(doubt)[Number(key) - 1] ?? null;
}

/** The doubt after (or before) the one at hand, round the end; the first one open where none is at hand. */
export function nextDoubt(
  doubts: readonly ReadingDoubt[],
  at: { sheet: string; cell: string } | null,
  step: 1 | -1,
): ReadingDoubt | null {
  if (doubts.length === 0) return null;
  const index = at ? doubts.findIndex((doubt) => isAt(doubt, at)) : -1;
  if (index < 0) return doubts.find((doubt) => doubt.answer === null) ?? doubts[0] ?? null;
  return doubts[(index + step + doubts.length) % doubts.length] ?? null;
}

/** The next doubt without an answer after the one at hand, round the end; null where every other one is answered. */
export function nextOpenDoubt(
  doubts: readonly ReadingDoubt[],
  at: { sheet: string; cell: string },
): ReadingDoubt | null {
  const index = doubts.findIndex((doubt) => isAt(doubt, at));
  const inTurn = [...doubts.slice(index + 1), ...doubts.slice(0, Math.max(index, 0))];
  return inTurn.find((doubt) => doubt.answer === null && !isAt(doubt, at)) ?? null;
}

export function isAt(doubt: { sheet: string; cell: string }, at: { sheet: string; cell: string }): boolean {
  return doubt.sheet === at.sheet && doubt.cell === at.cell;
}

export function openDoubts(doubts: readonly ReadingDoubt[]): number {
  return doubts.filter((doubt) => doubt.answer === null).length;
}

/** "4 cells, 3 answered" */
export function doubtCountWords(doubts: readonly ReadingDoubt[]): string {
  if (doubts.length === 0) return 'none';
  const cells = countInFigures(doubts.length, 'cell');
  const answered = doubts.length - openDoubts(doubts);
  return answered === 0 ? cells : `${cells}, ${answered} answered`;
}

/** "1 doubt left." or that none is. */
export function doubtsLeftWords(doubts: readonly ReadingDoubt[]): string {
  const left = openDoubts(doubts);
  if (left === 0) return doubts.length === 0 ? 'Nothing is in doubt.' : 'Every doubt is answered.';
  return `${countInFigures(left, 'doubt')} left.`;
}
