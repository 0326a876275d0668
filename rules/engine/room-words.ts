import { z } from 'zod';
import { formatDecimals } from '../numerics/round';
import { andList, capitalised, uncapitalised } from '../rule-sets/words';
import type { RoomOfRule, RoomStretch, RoomToMove } from './room';

/** The room to move in words: the same on the screen, in the letter and in the findings workbook. */
export const roomWordsSchema = z.strictObject({
  /** The answer in one or two sentences. */
  answer: z.string(),
  /** One line a rule: where it holds, or why that is not known. */
  lines: z.array(
    z.strictObject({ clause: z.string(), title: z.string(), limit: z.string(), holds: z.string() }),
  ),
  /** How it was read, and what is left out. */
  notes: z.array(z.string()),
});

export type RoomWords = z.infer<typeof roomWordsSchema>;

export function roomWords(room: RoomToMove): RoomWords {
  return {
    answer: answerOf(room),
    lines: room.rules.map((rule) => ({
      clause: rule.clause,
      title: rule.title,
      limit: rule.limitWords,
      holds: holdsWords(rule),
    })),
    notes: [...readFrom(room), ...leftOut(room)],
  };
}

/** "5.37 %" as the room is given: to 0.01. */
export function contentWords(binderContent: number): string {
  return formatDecimals(binderContent, 2);
}

/** "5.10 to 5.51 %", "at every content of the trials", "nowhere within the trials" */
export function holdsWords({ state, reason, holds, trials }: RoomOfRule): string {
  if (state === 'not applicable') return 'does not apply';
  if (state === 'left out') return 'left out';
  if (state === 'not computed') return reason ?? 'not computed';
  const [only] = holds;
  if (only === undefined) return 'nowhere within the trials';
  if (holds.length === 1 && only.from === trials?.from && only.to === trials.to)
    return 'at every content of the trials';
  return andList(holds.map(rangeWords));
}

function rangeWords({ from, to }: Pick<RoomStretch, 'from' | 'to'>): string {
  return from === to ? `${contentWords(from)} %` : `${contentWords(from)} to ${contentWords(to)} %`;
}

function answerOf(room: RoomToMove): string {
  const { reason, excluding, declaredBinderContent: declared } = room;
  if (reason !== null) return `Room to move is not known. ${reason}`;
  if (room.room === null)
    return `No binder content meets ${countWords(room)}${crossingWords(room, excluding)}`;
  const { closedBelowBy, closedAboveBy, containsDeclared } = room.room;
  const answer = `A binder content of ${rangeWords(room.room)} meets ${countWords(room)}. ${closedWords(room, closedBelowBy, closedAboveBy)}`;
  if (declared === null) return answer;
  return `${answer} The declared ${contentWords(declared)} % lies ${containsDeclared ? 'within' : 'outside'}.`;
}

function countWords({ rules }: RoomToMove): string {
  const count = rules.filter(({ state }) => state === 'computed').length;
  const some = rules.some(({ state }) => state === 'left out') ? ' that can be followed' : '';
  if (count === 1) return 'the one rule that can be followed';
  if (count === 2) return `both rules${some}`;
  return `all ${NUMBERS[count] ?? count} rules${some}`;
}

const NUMBERS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

function closedWords(room: RoomToMove, below: readonly string[], above: readonly string[]): string {
  const low = below.length === 0 ? 'the trials end below' : `${named(room, below)} ${closes(below)} it below`;
  const sameBoth = below.length > 0 && below.join() === above.join();
  if (sameBoth) return `${capitalised(named(room, below))} ${closes(below)} it at both ends.`;
  const high =
    above.length === 0
      ? 'the trials end above'
      : `${named(room, above)} ${below.length === 0 ? `${closes(above)} it ` : ''}above`;
  if (below.length === 0 && above.length === 0) return 'The trials end at both sides.';
  return `${capitalised(low)}, ${high}.`;
}

function closes(rules: readonly string[]): string {
  return rules.length === 1 ? 'closes' : 'close';
}

function crossingWords(room: RoomToMove, excluding: readonly string[]): string {
  const [first, second] = excluding;
  if (first === undefined) return '; no two of them exclude each other alone.';
  if (second === undefined) return `: ${named(room, [first])} holds nowhere within the trials.`;
  const of = (id: string) => room.rules.find(({ rule }) => rule === id);
  const where = (id: string) => {
    const rule = of(id);
    return rule ? `${uncapitalised(rule.title)} holds from ${andList(rule.holds.map(rangeWords))}` : id;
  };
  return `: ${where(first)}, ${where(second)}.`;
}

function named(room: RoomToMove, rules: readonly string[]): string {
  return andList(rules.map((id) => uncapitalised(room.rules.find(({ rule }) => rule === id)?.title ?? id)));
}

function readFrom({ trials, rules }: RoomToMove): string[] {
  const fits = new Set(rules.flatMap(({ fit }) => (fit === null ? [] : [fit])));
  const [first] = trials;
  const last = trials.at(-1);
  if (fits.size === 0 || first === undefined || last === undefined) return [];
  const how = [...fits].map((fit) => FITS[fit]);
  const count = NUMBERS[trials.length] ?? trials.length;
  return [
    `Read between ${count} trials from ${contentWords(first.binderContent)} to ${contentWords(last.binderContent)} %, ${andList(how)}; each rule with its own rounding, at the gradation of the trials.`,
  ];
}

const FITS = { quadratic: 'off a quadratic', linear: 'on the line between neighbours' };

/** What the answer says nothing of, and why. */
function leftOut({ rules }: RoomToMove): string[] {
  return rules
    .filter(({ state }) => state === 'left out' || state === 'not applicable')
    .map(({ title, reason, state }) =>
      state === 'left out'
        ? `Left out: ${uncapitalised(title)}. ${reason ?? ''}`
        : `${title} does not apply.`,
    );
}
