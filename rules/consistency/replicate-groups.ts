import { type Conditions, conditionsSchema, type Reading } from '../record';

/** Readings of one quantity that differ in nothing but the specimen. */
export function replicateGroups(readings: readonly Reading[]): Reading[][] {
  const groups = new Map<string, Reading[]>();
  for (const reading of readings) {
    if (reading.at.specimen === undefined) continue;
    const key = conditionsKey(reading.at, 'specimen');
    const group = groups.get(key);
    if (group) group.push(reading);
    else groups.set(key, [reading]);
  }
  return [...groups.values()];
}

/** The same for the same conditions but one, in whatever order they were stated. */
export function conditionsKey(at: Conditions, without: keyof Conditions): string {
  let key = '';
  for (const name of CONDITIONS) {
    const value = name === without ? undefined : at[name];
    if (value !== undefined) key += `${name} ${typeof value === 'string' ? JSON.stringify(value) : value} `;
  }
  return key;
}

const CONDITIONS = Object.keys(conditionsSchema.shape) as (keyof Conditions)[];

/** Whole percentages and round numbers agree by chance: fewer than three significant digits say nothing. */
export function hasManyDigits({ value, source }: Reading): boolean {
  const digits = (source?.text ?? String(value)).replace(/[^0-9]/g, '').replace(/^0+/, '');
  return digits.length >= 3;
}
