import { quantityById } from '#rules/quantities/registry';
import type { ConditionName } from '#rules/reading/mapping';

/** What is asked of every value of a quantity: what it means nothing without, and to what it belongs. */
export function neededConditions(quantityId: string): ConditionName[] {
  const quantity = quantityById(quantityId);
  const own = quantity?.conditions ?? [];
  const subject = quantity?.subject ?? 'mix';
  const belongsTo: ConditionName[] =
    subject === 'specimen' ? ['trial', 'specimen'] : subject === 'aggregate' ? ['stockpile'] : ['trial'];
  return [...new Set([...belongsTo, ...own])];
}
