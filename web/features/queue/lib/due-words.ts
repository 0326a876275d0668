import { countInFigures } from '#shared/format/numbers';

/** "2 days late", "today", "1 day", "7 days": working days, as the agency's clock counts them. */
export function dueWords(workingDaysLeft: number): string {
  if (workingDaysLeft === 0) return 'today';
  const days = Math.abs(workingDaysLeft);
  const words = countInFigures(days, 'day');
  return workingDaysLeft < 0 ? `${words} late` : words;
}
