/**
 * A calendar date so many months later, held to the end of a shorter month: 31 August + 6 months is 28 February,
 * or 29 in a leap year. Proleptic Gregorian calendar; no clock and no time zone are involved.
 *
 * @example addMonths('2026-08-31', 6) // '2027-02-28'
 */
export function addMonths(date: string, months: number): string {
  const [year = 0, month = 1, day = 1] = date.split('-').map(Number);
  const count = year * 12 + (month - 1) + months;
  const newYear = Math.floor(count / 12);
  const newMonth = count - newYear * 12 + 1;
  const newDay = Math.min(day, daysInMonth(newYear, newMonth));
  return [String(newYear).padStart(4, '0'), pad(newMonth), pad(newDay)].join('-');
}

/**
 * The earliest date that reaches a day in so many months, by `addMonths`: the same day of the earlier month, or the first
 * of the month after where that month is too short to have it.
 *
 * @example earliestDate('2026-03-31', 1) // '2026-03-01': 28 February + 1 month is 28 March
 */
export function earliestDate(on: string, months: number): string {
  const back = addMonths(on, -months);
  return back.slice(8) === on.slice(8) ? back : `${addMonths(back, 1).slice(0, 8)}01`;
}

function daysInMonth(year: number, month: number): number {
  if (month === 2) return isLeapYear(year) ? 29 : 28;
  return month === 4 || month === 6 || month === 9 || month === 11 ? 30 : 31;
}

function isLeapYear(year: number): boolean {
  return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
}

function pad(part: number): string {
  return String(part).padStart(2, '0');
}
