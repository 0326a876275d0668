import type { Conditions, Reading } from '../record';

/** Readings of one quantity that differ in nothing but the specimen. */
export function replicateGroups(readings: readonly Reading[]): Reading[][] {
  const groups = new Map<string, Reading[]>();
  for (const reading of readings) {
    const { specimen, ...others } = reading.at;
    if (specimen === undefined) continue;
    const key = conditionsKey(others);
    const group = groups.get(key);
    if (group) group.push(reading);
    else groups.set(key, [reading]);
  }
  return [...groups.values()];
}

/** The same for the same conditions, in whatever order they were stated. */
export function conditionsKey(at: Conditions): string {
  return JSON.stringify(Object.entries(at).toSorted(([a], [b]) => (a < b ? -1 : 1)));
}

/** Whole percentages and round numbers agree by chance: fewer than three significant digits say nothing. */
export function hasManyDigits({ value, source }: Reading): boolean {
  const digits = (source?.text ?? String(value)).replace(/[^0-9]/g, '').replace(/^0+/, '');
  return digits.length >= 3;
}
