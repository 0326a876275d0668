import { describe, expect, it } from 'vitest';
import { workingDaysBetween } from '#shared/working-days';
import { dueWords } from '../../../../web/features/queue/lib/due-words';
import { timeGaugePlaces } from '../../../../web/features/queue/lib/time-gauge';

// Counted on a calendar of March 2026: the 9th, 16th and 23rd are Mondays.
describe('working days between two dates', () => {
  it.each([
    ['2026-03-12', '2026-03-12', 0],
    ['2026-03-12', '2026-03-13', 1],
    ['2026-03-13', '2026-03-14', 0],
    ['2026-03-13', '2026-03-16', 1],
    ['2026-03-14', '2026-03-16', 1],
    ['2026-03-12', '2026-03-23', 7],
    ['2026-03-12', '2026-03-26', 10],
    ['2026-03-12', '2026-03-10', -2],
    ['2026-03-16', '2026-03-13', -1],
  ])('from %s to %s are %i', (from, to, days) => {
    expect(workingDaysBetween(from, to)).toBe(days);
  });
});

describe('the time gauge', () => {
  it('fixes today at the middle', () => {
    const places = timeGaugePlaces({ today: '2026-03-12', receivedOn: '2026-03-09', dueOn: '2026-03-23' });
    expect(places.today).toBe(75);
  });

  it('stands fourteen working days for half of its width', () => {
    const places = timeGaugePlaces({ today: '2026-03-12', receivedOn: '2026-03-12', dueOn: '2026-03-26' });
    expect(places.received).toBe(75);
    // 10 of 14 days: 75 + 10/14 × 75 = 128.571…
    expect(places.due).toBeCloseTo(128.571, 3);
  });

  it('is late from the day after the due date on, not on the day itself', () => {
    const receivedOn = '2026-02-26';
    expect(timeGaugePlaces({ today: '2026-03-12', receivedOn, dueOn: '2026-03-12' }).late).toBe(false);
    expect(timeGaugePlaces({ today: '2026-03-13', receivedOn, dueOn: '2026-03-12' }).late).toBe(true);
  });

  it('pins what lies beyond its width at the edge, and says so', () => {
    const places = timeGaugePlaces({ today: '2026-03-12', receivedOn: '2025-11-03', dueOn: '2026-03-20' });
    expect(places.receivedOff).toBe(true);
    expect(places.received).toBe(4);
    expect(places.dueOff).toBe(false);
  });
});

describe('the words of the due date', () => {
  it.each([
    [-2, '2 days late'],
    [-1, '1 day late'],
    [0, 'today'],
    [1, '1 day'],
    [7, '7 days'],
  ])('are for %i working days left: %s', (left, words) => {
    expect(dueWords(left)).toBe(words);
  });
});
