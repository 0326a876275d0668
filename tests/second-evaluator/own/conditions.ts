import type { Conditions } from '#rules/record';
import { compare, exact, magnitude, minus, over } from './exact';
import type { World } from './world';

export const CONDITIONS = [
  'variant',
  'passes',
  'frequency',
  'aging',
  'stress',
  'gyrations',
  'temperature',
  'time',
  'sieve',
] as const;
export type ConditionName = (typeof CONDITIONS)[number];

/** Whether a stated condition is the one that a rule names; perhaps, where it is not stated. */
export function agreement(
  world: World,
  name: ConditionName,
  wanted: string | number,
  stated: string | number | undefined,
): 'yes' | 'no' | 'perhaps' | 'unresolved' {
  if (stated === undefined) return 'perhaps';
  if (name === 'gyrations' && typeof wanted !== typeof stated) {
    const [named, number] = typeof wanted === 'string' ? [wanted, stated] : [stated, wanted];
    const resolved = gyrationsOf(world, String(named));
    return resolved === null ? 'unresolved' : resolved === number ? 'yes' : 'no';
  }
  return isSameCondition(name, wanted, stated) ? 'yes' : 'no';
}

/** Temperatures within half a degree, loading times within one percent, all else exactly. */
export function isSameCondition(
  name: ConditionName,
  wanted: Conditions[ConditionName],
  stated: Conditions[ConditionName],
): boolean {
  if (typeof wanted !== 'number' || typeof stated !== 'number') return wanted === stated;
  const apart = magnitude(minus(exact(wanted), exact(stated)));
  let allowed = exact(0);
  if (name === 'temperature') allowed = exact('0.5');
  if (name === 'time') allowed = over(exact(wanted), exact(100));
  return compare(apart, allowed) <= 0;
}

/** The one number that the workbook states for a name: the design's, else any trial's. */
function gyrationsOf({ record }: World, name: string): number | null {
  const stated = record.readings.filter(
    ({ quantity, at }) => quantity === `gyrations-${name}` && at.laboratory !== 'agency',
  );
  const ofDesign = stated.filter(({ at }) => (at.trial ?? 'design') === 'design');
  const values = new Set((ofDesign.length > 0 ? ofDesign : stated).map(({ value }) => value));
  return values.size === 1 ? [...values][0]! : null;
}
