import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';

/** For whom it was read, or where what people said is kept for the next workbook. */
export function learnedWords({ learned }: Pick<ReadingView, 'learned'>, laboratory: string): string {
  if (learned === null) return `Read for ${laboratory}.`;
  const rules = countInFigures(learned.rules, 'rule');
  return `What was said is kept as version ${learned.number} of ${learned.name}, ${rules}.`;
}
