import type { Conditions, Reading } from '#rules/record';
import { type Exact, exact, minus } from './exact';
import { knownOf } from './known';
import { fitOf, isDoubted } from './selection';
import { converted } from './units';
import type { World } from './world';

const CUMULATIVE = 'cumulative-percent-retained';
const INDIVIDUAL = 'percent-retained';
export const RETAINED = [CUMULATIVE, INDIVIDUAL];

type Passing = { is: 'value'; value: Exact } | { is: 'missing' } | { is: 'doubtful' };

/**
 * What passes a sieve where only what stays is stated: 100 less the cumulative percent, else 100 less all the
 * individual ones on it and on coarser sieves. One of these that is no number, or in doubt, leaves it open.
 */
export function passingFromRetained(world: World, at: Conditions, sieve: number): Passing {
  const ofBlend = (quantity: string) =>
    world.record.readings.filter(
      (reading) => reading.quantity === quantity && fitOf(world, quantity, at, reading.at) === 'yes',
    );
  const cumulative = ofBlend(CUMULATIVE).filter((reading) => reading.at.sieve === sieve);
  const individual = ofBlend(INDIVIDUAL).filter((reading) => (reading.at.sieve ?? 0) >= sieve);
  if (isDoubted(world, CUMULATIVE, { ...at, sieve })) return { is: 'doubtful' };
  if (isDoubtedFrom(world, at, sieve)) return { is: 'doubtful' };
  if (cumulative.length > 0) return lessThanAll(cumulative);
  if (!individual.some((reading) => reading.at.sieve === sieve)) return { is: 'missing' };
  return lessThanAll(individual);
}

function isDoubtedFrom({ record, ...world }: World, at: Conditions, sieve: number): boolean {
  const doubts = record.doubts.filter(({ about }) => (about.at?.sieve ?? sieve) >= sieve);
  return isDoubted({ ...world, record: { ...record, doubts } }, INDIVIDUAL, at);
}

function lessThanAll(readings: Reading[]): Passing {
  let value = exact(100);
  for (const reading of readings) {
    if (reading.value === null || reading.qualifier !== undefined) return { is: 'doubtful' };
    const retained = converted(exact(reading.value), reading.unit, knownOf(reading.quantity).unit);
    if (retained === null) return { is: 'doubtful' };
    value = minus(value, retained);
  }
  return { is: 'value', value };
}
