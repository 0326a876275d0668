const dayMilliseconds = 86_400_000;

/** Monday to Friday; holidays are not known here. */
export function isWorkingDay(date: string): boolean {
  const day = weekday(date);
  return day >= 1 && day <= 5;
}

/** The n-th working day after a date, which itself is day 0. */
export function workingDayAfter(date: string, count: number): string {
  let current = date;
  for (let left = count; left > 0; ) {
    current = dayAfter(current, 1);
    if (isWorkingDay(current)) left -= 1;
  }
  return current;
}

/** Working days after `from` up to and including `to`; negative where `to` lies before `from`. */
export function workingDaysBetween(from: string, to: string): number {
  if (to < from) {
    const count = workingDaysBetween(to, from);
    return count === 0 ? 0 : -count;
  }
  let count = 0;
  for (let current = dayAfter(from, 1); current <= to; current = dayAfter(current, 1)) {
    if (isWorkingDay(current)) count += 1;
  }
  return count;
}

/** The Sunday that ends the week of a date; weeks begin on Monday. */
export function endOfWeek(date: string): string {
  return dayAfter(date, (7 - weekday(date)) % 7);
}

function weekday(date: string): number {
  return new Date(`${date}T00:00:00Z`).getUTCDay();
}

function dayAfter(date: string, days: number): string {
  return new Date(Date.parse(`${date}T00:00:00Z`) + days * dayMilliseconds).toISOString().slice(0, 10);
}
