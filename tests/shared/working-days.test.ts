import { describe, expect, it } from 'vitest';
import { dateOfInstant } from '#shared/format/dates';
import { endOfWeek, workingDayAfter, workingDaysBetween } from '#shared/working-days';

// Dates counted by hand on a calendar of 2026: 9 March 2026 is a Monday.
describe('working days', () => {
  it('puts the tenth working day after a Monday on the Monday two weeks later', () => {
    expect(workingDayAfter('2026-03-09', 10)).toBe('2026-03-23');
  });

  it('counts from the Monday after a submission on a Saturday or Sunday', () => {
    expect(workingDayAfter('2026-03-07', 1)).toBe('2026-03-09');
    expect(workingDayAfter('2026-03-08', 1)).toBe('2026-03-09');
    expect(workingDayAfter('2026-03-08', 10)).toBe('2026-03-20');
  });

  it('crosses the end of a year and 29 February', () => {
    expect(workingDayAfter('2026-12-31', 1)).toBe('2027-01-01');
    expect(workingDayAfter('2028-02-28', 2)).toBe('2028-03-01');
  });

  it('counts the working days left, none on the due day, negative when late', () => {
    expect(workingDaysBetween('2026-03-12', '2026-03-23')).toBe(7);
    expect(workingDaysBetween('2026-03-12', '2026-03-12')).toBe(0);
    expect(workingDaysBetween('2026-03-12', '2026-03-10')).toBe(-2);
    expect(workingDaysBetween('2026-03-14', '2026-03-13')).toBe(0);
  });

  it('ends the week on Sunday, that day included', () => {
    expect(endOfWeek('2026-03-09')).toBe('2026-03-15');
    expect(endOfWeek('2026-03-15')).toBe('2026-03-15');
    expect(endOfWeek('2026-03-14')).toBe('2026-03-15');
  });
});

describe('day 0, the local date of an instant', () => {
  it('is the next day where the zone is ahead and the day before where it is behind', () => {
    const instant = '2026-03-09T23:30:00Z';
    expect(dateOfInstant(instant, 'UTC')).toBe('2026-03-09');
    expect(dateOfInstant(instant, 'Pacific/Auckland')).toBe('2026-03-10');
    expect(dateOfInstant('2026-03-09T02:00:00Z', 'America/Denver')).toBe('2026-03-08');
  });

  it('follows summer time: 23:30 UTC is the next day in London after the last Sunday in March', () => {
    expect(dateOfInstant('2026-03-28T23:30:00Z', 'Europe/London')).toBe('2026-03-28');
    expect(dateOfInstant('2026-03-29T23:30:00Z', 'Europe/London')).toBe('2026-03-30');
  });
});
