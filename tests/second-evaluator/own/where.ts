import type { Reading } from '#rules/record';
import type { Where } from '#rules/rule-sets/measure';
import { isOne, meanOf } from './interval';
import { knownOf } from './known';
import { limitsOf, sideOf } from './limits';
import { valuesOf } from './quantity-value';
import { select } from './selection';
import type { World } from './world';

/**
 * The readings whose specimens meet every condition. One condition that is not met settles that a specimen does not
 * count, whatever is known of the others; where it is not settled, nothing is.
 */
export function countingReadings(world: World, readings: Reading[], wheres: Where[]): Reading[] | null {
  const counting: Reading[] = [];
  for (const reading of readings) {
    const met = wheres.map((where) => meets(world, reading, where));
    if (met.includes(false)) continue;
    if (met.includes(null)) return null;
    counting.push(reading);
  }
  return counting;
}

function meets(world: World, reading: Reading, where: Where): boolean | null {
  const at = { trial: reading.at.trial, laboratory: reading.at.laboratory, ...where.at };
  const chosen = select(world, where.quantity, at, { specimen: reading.at.specimen ?? null });
  if (chosen.is !== 'readings') return null;
  const { unit } = knownOf(where.quantity);
  const values = valuesOf(where.quantity, chosen.readings, unit, true);
  const limits = limitsOf({ world, unit }, { min: where.min, max: where.max });
  if (values.is !== 'values' || limits.is !== 'resolved') return null;
  const value = meanOf(values.values.map(({ allowed }) => allowed));
  return isOne(value) ? sideOf(value.low, limits.value) === 'inside' : null;
}
