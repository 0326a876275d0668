import type { Reading } from '#rules/record';
import type { Where } from '#rules/rule-sets/measure';
import { meanOf } from './interval';
import { knownOf } from './known';
import { type Limits, limitsOf, sideOf } from './limits';
import { valuesOf } from './quantity-value';
import { select } from './selection';
import type { World } from './world';

/** The readings whose specimens meet every condition; null where it is not known whether one does. */
export function countingReadings(world: World, readings: Reading[], wheres: Where[]): Reading[] | null {
  const counting: Reading[] = [];
  for (const reading of readings) {
    let isMet: boolean | null = true;
    for (const where of wheres) {
      const met = meets(world, reading, where);
      if (met === null) isMet = null;
      else if (!met && isMet !== null) isMet = false;
    }
    if (isMet === null) return null;
    if (isMet) counting.push(reading);
  }
  return counting;
}

function meets(world: World, reading: Reading, where: Where): boolean | null {
  const { specimen } = reading.at;
  if (specimen === undefined) return null;
  const at = { trial: reading.at.trial, laboratory: reading.at.laboratory, ...where.at };
  const chosen = select(world, where.quantity, at, { specimen });
  if (chosen.is !== 'readings') return null;
  const values = valuesOf(where.quantity, chosen.readings);
  const limits = limitsOf({ world, unit: knownOf(where.quantity).unit }, { min: where.min, max: where.max });
  if (values.is !== 'values' || limits.is !== 'resolved') return null;
  return isInside(meanOf(values.values), limits.value);
}

function isInside({ low, high }: ReturnType<typeof meanOf>, limits: Limits): boolean | null {
  const side = sideOf(low, limits);
  return side === sideOf(high, limits) ? side === 'inside' : null;
}
