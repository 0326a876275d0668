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
];
const weekdays = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'];

/** `2026-03-12` as "12 March 2026"; dates are never all figures. */
export function formatDate(date: string): string {
  const { day, month, year } = partsOf(date);
  return `${day} ${months[month - 1] ?? ''} ${year}`;
}

/** "12 Mar", for tables and bylines. */
export function formatDateShort(date: string): string {
  const { day, month } = partsOf(date);
  return `${day} ${(months[month - 1] ?? '').slice(0, 3)}`;
}

/** "12 March", where the year is plain from what stands beside it. */
export function formatDayAndMonth(date: string): string {
  const { day, month } = partsOf(date);
  return `${day} ${months[month - 1] ?? ''}`;
}

/** "Monday 16 March 2026" */
export function formatDateWithWeekday(date: string): string {
  const { day, month, year } = partsOf(date);
  const weekday = weekdays[new Date(Date.UTC(year, month - 1, day)).getUTCDay()] ?? '';
  return `${weekday} ${formatDate(date)}`;
}

/** The calendar date of an instant in a zone, `2026-03-09`. */
export function dateOfInstant(instant: string, timeZone: string): string {
  const { year, month, day } = zoned(instant, timeZone);
  return `${year}-${month}-${day}`;
}

/** "9 March 2026 14:02" in the zone of the reader's organisation. */
export function formatInstant(instant: string, timeZone: string): string {
  const { hour, minute } = zoned(instant, timeZone);
  return `${formatDate(dateOfInstant(instant, timeZone))} ${hour}:${minute}`;
}

/** "12 Mar" of an instant. */
export function formatInstantShort(instant: string, timeZone: string): string {
  return formatDateShort(dateOfInstant(instant, timeZone));
}

/** "10:41" */
export function formatTime(instant: string, timeZone: string): string {
  const { hour, minute } = zoned(instant, timeZone);
  return `${hour}:${minute}`;
}

function partsOf(date: string): { year: number; month: number; day: number } {
  const [year = 0, month = 0, day = 0] = date.slice(0, 10).split('-').map(Number);
  return { year, month, day };
}

function zoned(instant: string, timeZone: string) {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  }).formatToParts(new Date(instant));
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((each) => each.type === type)?.value ?? '';
  return {
    year: part('year'),
    month: part('month'),
    day: part('day'),
    hour: part('hour'),
    minute: part('minute'),
  };
}
