import type { Conditions } from '#rules/record';
import { compare, type Exact, exact, magnitude, minus, over, plus, times, total } from './exact';
import type { World } from './world';

/** Properties of a blend that follow from those of its stockpiles. */
export const OF_BLEND = ['bulk-specific-gravity-aggregate', 'water-absorption'];

interface Part {
  share: Exact;
  value: Exact;
}

/** By volume for a gravity, by mass for an absorption; null where a stockpile in use has no value. */
export function ofStockpiles(world: World, quantity: string): Exact | null {
  const parts = partsOf(world, quantity, {});
  if (parts === null) return null;
  const all = total(parts.map(({ share }) => share));
  if (quantity === 'water-absorption') return over(total(parts.map(byMass)), all);
  return over(all, total(parts.map(({ share, value }) => over(share, value))));
}

/** Percent passing of the blend; null too where the shares are more than a tenth off 100. */
export function passingOfStockpiles(world: World, sieve: number): Exact | null {
  const parts = partsOf(world, 'percent-passing', { sieve });
  if (parts === null) return null;
  const off = magnitude(minus(total(parts.map(({ share }) => share)), exact(100)));
  if (compare(off, exact('0.1')) > 0) return null;
  return over(total(parts.map(byMass)), exact(100));
}

/**
 * How far a stated value may lie off: half a unit of its own last digit and as much of every input, as far as it moves
 * the result.
 */
export function isWithinDigits(world: World, quantity: string, stated: number): boolean {
  const parts = partsOf(world, quantity, {})!;
  const value = ofStockpiles(world, quantity)!;
  const all = total(parts.map(({ share }) => share));
  let allowed = halfUnit(exact(stated));
  for (const { share, value: own } of parts) {
    const ofMass = over(share, all);
    const isMass = quantity === 'water-absorption';
    const byValue = isMass ? ofMass : times(ofMass, times(over(value, own), over(value, own)));
    const byShare = over(isMass ? minus(own, value) : minus(value, over(times(value, value), own)), all);
    allowed = plus(allowed, times(magnitude(byValue), halfUnit(own)));
    allowed = plus(allowed, times(magnitude(byShare), halfUnit(share)));
  }
  return compare(magnitude(minus(exact(stated), value)), allowed) <= 0;
}

/** Of a number that is written out, its last digit's half. */
function halfUnit({ bottom }: Exact): Exact {
  return { top: 1n, bottom: 2n * bottom };
}

function byMass({ share, value }: Part): Exact {
  return times(share, value);
}

function partsOf({ record }: World, quantity: string, at: Conditions): Part[] | null {
  const parts: Part[] = [];
  for (const reading of record.readings) {
    const { stockpile } = reading.at;
    if (reading.quantity !== 'stockpile-share' || reading.value === null || reading.value === 0) continue;
    const own = record.readings.find(
      (other) =>
        other.quantity === quantity && other.at.stockpile === stockpile && other.at.sieve === at.sieve,
    );
    if (own?.value == null) return null;
    parts.push({ share: exact(reading.value), value: exact(own.value) });
  }
  return parts.length === 0 ? null : parts;
}
