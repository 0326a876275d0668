const millisecondsPerDay = 86_400_000;

/** Working days (Monday to Friday) from one calendar date to another; negative backwards; 0 on the same day. */
export function workingDaysBetween(from: string, to: string): number {
  const start = dayNumber(from);
  const end = dayNumber(to);
  return end >= start ? countForward(start, end) : -countForward(end, start);
}

function countForward(start: number, end: number): number {
  const wholeWeeks = Math.floor((end - start) / 7);
  let count = wholeWeeks * 5;
  for (let day = start + wholeWeeks * 7 + 1; day <= end; day++) {
    if (isWorkingDay(day)) count += 1;
  }
  return count;
}

function dayNumber(date: string): number {
  return Date.parse(`${date}T00:00:00Z`) / millisecondsPerDay;
}

/** Day 0 of the epoch was a Thursday. */
function isWorkingDay(day: number): boolean {
  const weekday = (day + 4) % 7;
  return weekday !== 0 && weekday !== 6;
}
