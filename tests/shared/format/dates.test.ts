import { describe, expect, it } from 'vitest';
import {
  dateOfInstant,
  formatDate,
  formatDateShort,
  formatDateWithWeekday,
  formatDayAndMonth,
  formatInstant,
  formatTime,
} from '#shared/format/dates';

describe('dates as people read them', () => {
  it('writes the month as a word', () => {
    expect(formatDate('2026-03-12')).toBe('12 March 2026');
    expect(formatDateShort('2026-03-02')).toBe('2 Mar');
    expect(formatDayAndMonth('2026-03-23')).toBe('23 March');
  });

  // 16 March 2026 is a Monday by any calendar.
  it('names the weekday', () => {
    expect(formatDateWithWeekday('2026-03-16')).toBe('Monday 16 March 2026');
  });

  it('shows an instant in the zone of its reader, over midnight too', () => {
    expect(formatInstant('2026-03-09T14:02:00.000Z', 'Europe/London')).toBe('9 March 2026 14:02');
    expect(formatInstant('2026-07-09T23:30:00.000Z', 'Europe/London')).toBe('10 July 2026 00:30');
    expect(dateOfInstant('2026-03-09T02:00:00.000Z', 'America/Denver')).toBe('2026-03-08');
    expect(formatTime('2026-03-09T10:41:00.000Z', 'UTC')).toBe('10:41');
  });
});
