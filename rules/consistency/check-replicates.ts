import { allQuantities, quantityById } from '../quantities/registry';
import type { Reading } from '../record';
import { numberWords, unitSuffix } from '../rule-sets/words';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  knownReading,
  placeOf,
  subjectOf,
} from './consistency-observation';
import { hasManyDigits, replicateGroups } from './replicate-groups';

/** Measured with so many digits that even two specimens hardly ever agree in all of them. */
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

/** The same for every specimen by nature, or one result that is written beside each. */
const commonQuantities = new Set([
  'binder-content',
  'maximum-specific-gravity',
  'specimen-diameter',
  'specimen-thickness',
  'specimen-height',
  'mixing-temperature',
  'compaction-temperature',
]);

/** Replicates that are the same to the last digit look copied: two of a sensitive quantity, three of another. */
export function checkReplicates({ index }: ConsistencyInput): ConsistencyObservation[] {
  return allQuantities()
    .filter(
      ({ id, kind }) => sensitiveQuantities.has(id) || (kind === 'measured' && !commonQuantities.has(id)),
    )
    .flatMap(({ id }) => replicateGroups(index.all(id)).flatMap((readings) => observed(id, readings) ?? []));
}

function observed(quantity: string, readings: Reading[]): ConsistencyObservation | null {
  const specimens = new Set(readings.map(({ at }) => at.specimen)).size;
  const [first] = readings;
  if (!first || readings.some(({ value }) => value !== first.value)) return null;
  if (specimens < (sensitiveQuantities.has(quantity) ? 2 : 3) || !readings.every(hasManyDigits)) return null;
  const { specimen: _specimen, ...at } = first.at;
  const label = quantityById(quantity)?.label ?? quantity;
  return {
    name: 'identical-replicates',
    subject: subjectOf(quantity, at),
    severity: 'advisory',
    outcome: 'fail',
    observed: first.value,
    limit: null,
    unit: first.unit,
    sentence: `All ${specimens} specimens${placeOf(at)} have the same ${label}, ${numberWords(first.value!)}${unitSuffix(first.unit)}.`,
    reason: 'Separate specimens hardly ever agree in every digit; a value may have been copied.',
    evidence: readings.map((reading) => knownReading(reading).evidence),
    quantity,
    at,
  };
}
