import type { Conditions, Reading } from '#rules/record';
import { exact } from './exact';
import { type Allowed, allowedBy, meanOf } from './interval';
import { knownOf } from './known';
import { select } from './selection';
import { converted } from './units';
import type { World } from './world';

export type Values = { is: 'values'; values: Allowed[] } | { is: 'missing' } | { is: 'doubtful' };

/** What each reading allows, in the quantity's own unit; doubtful where one has no number or another kind of unit. */
export function valuesOf(quantity: string, readings: Reading[]): Values {
  const values: Allowed[] = [];
  for (const reading of readings) {
    const allowed = allowedOf(quantity, reading);
    if (allowed === null) return { is: 'doubtful' };
    values.push(allowed);
  }
  return { is: 'values', values };
}

export function allowedOf(quantity: string, reading: Reading): Allowed | null {
  if (reading.value === null) return null;
  return allowedBy(reading, converted(exact(reading.value), reading.unit, knownOf(quantity).unit));
}

/** The mean of a quantity at some conditions, for a limit, a `when` or a `where` that refers to it. */
export function meanAt(
  world: World,
  quantity: string,
  at: Conditions,
): { is: 'value'; value: Allowed } | { is: 'missing' } | { is: 'doubtful' } {
  const chosen = select(world, quantity, at);
  if (chosen.is !== 'readings') return chosen;
  const values = valuesOf(quantity, chosen.readings);
  return values.is === 'values' ? { is: 'value', value: meanOf(values.values) } : values;
}
