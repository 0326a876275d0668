import type { Conditions, Reading } from '#rules/record';
import { type Exact, exact } from './exact';
import { type Allowed, ANYTHING, above, below, meanOf, one } from './interval';
import { knownOf } from './known';
import { select } from './selection';
import { converted } from './units';
import type { World } from './world';

export type Values = { is: 'values'; values: Value[] } | { is: 'doubtful' };

export interface Value {
  allowed: Allowed;
  /** A result in words, `none`: there is no number to show. */
  isWord: boolean;
}

/**
 * What each specimen's reading allows, in the unit that is judged in; doubtful where a unit measures something else.
 * A result of none is no amount against a most, and anything against a least.
 */
export function valuesOf(quantity: string, readings: Reading[], unit: string, hasMin: boolean): Values {
  const values: Value[] = [];
  for (const reading of readings) {
    if (reading.value === null) {
      values.push({ allowed: hasMin ? ANYTHING : one(exact(0)), isWord: true });
      continue;
    }
    const own = converted(exact(reading.value), reading.unit, knownOf(quantity).unit);
    const value = own === null ? null : converted(own, knownOf(quantity).unit, unit);
    if (value === null) return { is: 'doubtful' };
    values.push({ allowed: allowedBy(reading.qualifier, value), isWord: false });
  }
  return { is: 'values', values };
}

/** Whether the units of all readings measure what the quantity measures. */
export function haveUnits(quantity: string, readings: Reading[]): boolean {
  return readings.every(
    (reading) => reading.value === null || converted(exact(1), reading.unit, knownOf(quantity).unit) !== null,
  );
}

function allowedBy(qualifier: Reading['qualifier'], value: Exact): Allowed {
  if (qualifier === '<') return below(value);
  return qualifier === '>' ? above(value) : one(value);
}

/**
 * The mean of a quantity at some conditions, for a limit, a `when` or a formula that refers to it; of a formula only
 * over the specimens that count.
 */
export function meanAt(
  world: World,
  quantity: string,
  at: Conditions,
  keep: (readings: Reading[]) => Reading[] | null = (readings) => readings,
): { is: 'value'; value: Allowed } | { is: 'missing' } | { is: 'doubtful' } {
  const chosen = select(world, quantity, at);
  if (chosen.is !== 'readings') return chosen;
  if (!haveUnits(quantity, chosen.readings)) return { is: 'doubtful' };
  const kept = keep(chosen.readings);
  if (kept === null) return { is: 'doubtful' };
  if (kept.length === 0) return { is: 'missing' };
  const values = valuesOf(quantity, kept, knownOf(quantity).unit, true);
  if (values.is !== 'values' || values.values.some(({ isWord }) => isWord)) return { is: 'doubtful' };
  return { is: 'value', value: meanOf(values.values.map(({ allowed }) => allowed)) };
}
