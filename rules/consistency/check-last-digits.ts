import { displayedUnit } from '../engine/analysis-digits';
import { quantityById } from '../quantities/registry';
import type { Reading } from '../record';
import { type ConsistencyInput, type ConsistencyObservation, knownReading } from './consistency-observation';

/** Read off an instrument whose last digit is as likely to be any as another. */
const instrumentQuantities = [
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'specimen-height',
  'failure-load',
  'bulk-specific-gravity-mix',
  'maximum-specific-gravity',
];

/** Fewer readings than this say nothing of their last digits. */
const leastReadings = 20;

/** One in five ends in 0 or 5 by chance; of twenty, twelve or more do so once in ten thousand (binomial). */
const suspiciousShare = 0.6;

/** Last digits that are 0 or 5 far too often: rounded by eye, or made up. */
export function checkLastDigits({ index }: ConsistencyInput): ConsistencyObservation[] {
  return instrumentQuantities.flatMap((quantity) => {
    const readings = index.all(quantity).filter(({ source }) => source !== null);
    if (readings.length < leastReadings) return [];
    const step = Math.min(...readings.map(displayedUnit));
    const preferred = readings.filter((reading) => Math.round(reading.value! / step) % 5 === 0);
    const share = preferred.length / readings.length;
    return share < suspiciousShare ? [] : [observation(quantity, readings, preferred.length)];
  });
}

function observation(
  quantity: string,
  readings: readonly Reading[],
  preferred: number,
): ConsistencyObservation {
  const label = quantityById(quantity)?.label ?? quantity;
  return {
    name: 'digit-preference',
    subject: `${label}, last digits`,
    severity: 'advisory',
    outcome: 'fail',
    observed: null,
    limit: null,
    unit: '1',
    sentence: `Of ${readings.length} values of ${label}, ${preferred} end in 0 or 5; one in five would by chance.`,
    reason:
      'The values may have been rounded before they were written down; report what the instrument shows.',
    evidence: readings.map((reading) => knownReading(reading).evidence),
    quantity,
    at: {},
  };
}
