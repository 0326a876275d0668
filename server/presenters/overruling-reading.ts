import { conditionsKey } from '#rules/reading/reading-log';
import type { MixRecord, Reading } from '#rules/record';

/** The workbook's own statement of what was typed: it wins, as it does over attributes that were typed. */
export function overrulingReading(typed: Reading, { readings }: Pick<MixRecord, 'readings'>): Reading | null {
  const at = conditionsKey(typed.at);
  return readings.find((each) => each.quantity === typed.quantity && conditionsKey(each.at) === at) ?? null;
}
