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
