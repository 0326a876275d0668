import { expect, it } from 'vitest';
import type { RoomOfRule, RoomToMove } from '#rules/engine/room';
import { roomWords } from '#rules/engine/room-words';

const stretch = (from: number, to: number) => ({
  from,
  to,
  below: 'limit' as const,
  above: 'limit' as const,
});

const rule = (id: string, title: string, overrides: Partial<RoomOfRule> = {}): RoomOfRule => ({
  rule: id,
  clause: '1.1',
  title,
  state: 'computed',
  reason: null,
  limitWords: '0.6 to 1.2',
  fit: 'quadratic',
  trials: { from: 4.8, to: 6.3 },
  holds: [stretch(5.35, 5.6)],
  ...overrides,
});

const dust = rule('dust', 'Dust proportion');
const filled = rule('filled', 'Voids filled with asphalt', { holds: [stretch(4.9, 5.49)] });

const room = (overrides: Partial<RoomToMove> = {}): RoomToMove => ({
  declaredBinderContent: 5.4,
  trials: [
    { trial: 'A', binderContent: 4.8, source: null },
    { trial: 'B', binderContent: 5.3, source: null },
    { trial: 'C', binderContent: 5.8, source: null },
    { trial: 'D', binderContent: 6.3, source: null },
  ],
  rules: [dust, filled],
  room: { from: 5.35, to: 5.49, closedBelowBy: ['dust'], closedAboveBy: ['filled'], containsDeclared: true },
  excluding: [],
  reason: null,
  ...overrides,
});

const answer = (overrides: Partial<RoomToMove> = {}) => roomWords(room(overrides)).answer;
const closedBy = (below: string[], above: string[]) => ({
  room: { from: 5.35, to: 5.49, closedBelowBy: below, closedAboveBy: above, containsDeclared: true },
});

it('says from where to where, which rule closes each end, and where the declared content lies', () => {
  expect(answer()).toBe(
    'A binder content of 5.35 to 5.49 % meets both rules. Dust proportion closes it below, voids filled with asphalt above. The declared 5.40 % lies within.',
  );
});

it('says that the trials end, and that one rule closes both ends', () => {
  expect(answer(closedBy([], ['filled']))).toContain(
    'The trials end below, voids filled with asphalt closes it above.',
  );
  expect(answer(closedBy(['dust'], []))).toContain('Dust proportion closes it below, the trials end above.');
  expect(answer(closedBy([], []))).toContain('The trials end at both sides.');
  expect(answer(closedBy(['dust'], ['dust']))).toContain('Dust proportion closes it at both ends.');
  expect(answer(closedBy(['dust', 'filled'], []))).toContain(
    'Dust proportion and voids filled with asphalt close it below',
  );
});

it('names the rules that leave no room', () => {
  expect(answer({ room: null, excluding: ['dust', 'filled'] })).toBe(
    'No binder content meets both rules: dust proportion holds from 5.35 to 5.60 %, voids filled with asphalt holds from 4.90 to 5.49 %.',
  );
  expect(answer({ room: null, excluding: ['dust'] })).toBe(
    'No binder content meets both rules: dust proportion holds nowhere within the trials.',
  );
  expect(answer({ room: null })).toBe(
    'No binder content meets both rules; no two of them exclude each other alone.',
  );
});

it('says why there is no answer', () => {
  expect(answer({ room: null, reason: 'Air voids: No trial has a recomputed value of air voids.' })).toBe(
    'Room to move is not known. Air voids: No trial has a recomputed value of air voids.',
  );
});

it('tells of each rule where it holds, and what is left out', () => {
  const words = roomWords(
    room({
      rules: [
        dust,
        rule('all', 'VMA', { holds: [stretch(4.8, 6.3)] }),
        rule('none', 'Air voids', { holds: [] }),
        rule('density', 'Relative density', {
          state: 'left out',
          reason: 'It is never taken from other trials.',
          fit: null,
        }),
        rule('other', 'Film thickness', { state: 'not applicable', reason: 'x', fit: null }),
      ],
    }),
  );
  expect(words.lines.map(({ holds }) => holds)).toEqual([
    '5.35 to 5.60 %',
    'at every content of the trials',
    'nowhere within the trials',
    'left out',
    'does not apply',
  ]);
  expect(words.notes).toEqual([
    'Read between four trials from 4.80 to 6.30 %, off a quadratic; each rule with its own rounding, at the gradation of the trials.',
    'Left out: relative density. It is never taken from other trials.',
    'Film thickness does not apply.',
  ]);
});
