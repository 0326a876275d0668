import type { Reading } from '#rules/record';

/**
 * One reading a specimen. The same number twice is one; two that differ leave all in doubt. A value without a specimen
 * beside values with one is their stated mean.
 */
export function oneASpecimen(readings: Reading[]): Reading[] | null {
  const ofSpecimens = readings.filter(({ at }) => at.specimen !== undefined);
  const counting = ofSpecimens.length > 0 ? ofSpecimens : readings;
  const kept: Reading[] = [];
  for (const reading of counting) {
    const twin = kept.find(({ at }) => at.specimen === reading.at.specimen);
    if (twin === undefined) kept.push(reading);
    else if (twin.value !== reading.value || twin.qualifier !== reading.qualifier) return null;
  }
  return kept;
}
