import { quantityById } from '../quantities/registry';
import type { Reading } from '../record';
import { numberWords, unitSuffix } from '../rule-sets/words';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  knownReading,
  placeOf,
  subjectOf,
} from './consistency-observation';

/**
 * Measured with enough digits that two specimens hardly ever agree in all of them. Dimensions, binder contents and
 * whole-number results do so by nature and are left alone.
 */
const sensitiveQuantities = new Set([
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'bulk-specific-gravity-mix',
  'failure-load',
  'tensile-strength-dry',
  'tensile-strength-conditioned',
  'marshall-stability',
  'fracture-energy',
]);

/** Replicates that are the same to the last digit look copied. */
export function checkReplicates({ index }: ConsistencyInput): ConsistencyObservation[] {
  return [...sensitiveQuantities].flatMap((quantity) =>
    [...alike(index.all(quantity)).values()].flatMap((readings) => {
      const specimens = new Set(readings.map(({ at }) => at.specimen));
      const [first] = readings;
      if (!first || specimens.size < 2 || readings.some(({ value }) => value !== first.value)) return [];
      const { specimen: _specimen, ...at } = first.at;
      const label = quantityById(quantity)?.label ?? quantity;
      return {
        name: 'identical-replicates',
        subject: subjectOf(quantity, at),
        severity: 'advisory' as const,
        outcome: 'fail' as const,
        observed: first.value,
        limit: null,
        unit: first.unit,
        sentence: `All ${specimens.size} specimens${placeOf(at)} have the same ${label}, ${numberWords(first.value!)}${unitSuffix(first.unit)}.`,
        reason: 'Separate specimens hardly ever agree in every digit; a value may have been copied.',
        evidence: readings.map((reading) => knownReading(reading).evidence),
        quantity,
        at,
      };
    }),
  );
}

function alike(readings: Reading[]): Map<string, Reading[]> {
  const groups = new Map<string, Reading[]>();
  for (const reading of readings) {
    const { specimen, ...others } = reading.at;
    if (specimen === undefined) continue;
    const key = JSON.stringify(Object.entries(others).toSorted(([a], [b]) => (a < b ? -1 : 1)));
    groups.set(key, [...(groups.get(key) ?? []), reading]);
  }
  return groups;
}
