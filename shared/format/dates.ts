const months = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;
const weekdays = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'] as const;

/** `2026-03-12` as `12 March 2026`. Dates are never all figures. */
export function formatDate(date: string): string {
  const { year, month, day } = partsOf(date);
  return `${day} ${months[month - 1]} ${year}`;
}

/** `2026-03-12` as `12 Mar`, for tables. */
export function formatDateShort(date: string): string {
  const { month, day } = partsOf(date);
  return `${day} ${months[month - 1]?.slice(0, 3)}`;
}

/** `2026-03-12` as `Thursday 12 March 2026`. */
export function formatDateWithWeekday(date: string): string {
  const { year, month, day } = partsOf(date);
  return `${weekdays[new Date(Date.UTC(year, month - 1, day)).getUTCDay()]} ${formatDate(date)}`;
}

/** The calendar date of an instant in a zone. */
export function dateInZone(instant: string | Date, timeZone: string): string {
  return new Intl.DateTimeFormat('en-CA', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  }).format(new Date(instant));
}

/** An instant as `9 March 2026 14:02` in a zone. */
export function formatInstant(instant: string | Date, timeZone: string): string {
  const time = new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit' }).format(
    new Date(instant),
  );
  return `${formatDate(dateInZone(instant, timeZone))} ${time}`;
}

function partsOf(date: string): { year: number; month: number; day: number } {
  const [year, month, day] = date.slice(0, 10).split('-').map(Number);
  if (!year || !month || !day || month > 12) throw new RangeError(`Not a calendar date: ${date}`);
  return { year, month, day };
}
