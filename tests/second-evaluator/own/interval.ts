import type { Reading } from '#rules/record';
import { compare, type Exact, exact, greatest, least, minus, plus } from './exact';
import { mean, range, trimmedMean } from './statistics';

/** Every value that a reading allows: one, or all on one side of a censored one. */
export interface Allowed {
  low: Exact;
  high: Exact;
}

const FAR = exact('1e30');
const HAIR = exact('1e-30');

export function isOne({ low, high }: Allowed): boolean {
  return compare(low, high) === 0;
}

export function one(value: Exact): Allowed {
  return { low: value, high: value };
}

/** What `<` or `>` leaves open; the number itself is not among it. Null for a result without a number. */
export function allowedBy(reading: Reading, value: Exact | null): Allowed | null {
  if (value === null || reading.qualifier === 'none' || reading.qualifier === 'non-plastic') return null;
  if (reading.qualifier === '<') return { low: minus(exact(0), FAR), high: minus(value, HAIR) };
  if (reading.qualifier === '>') return { low: plus(value, HAIR), high: FAR };
  return one(value);
}

export function meanOf(values: Allowed[]): Allowed {
  return { low: mean(lows(values)), high: mean(highs(values)) };
}

export function leastOf(values: Allowed[]): Allowed {
  return { low: least(lows(values)), high: least(highs(values)) };
}

export function greatestOf(values: Allowed[]): Allowed {
  return { low: greatest(lows(values)), high: greatest(highs(values)) };
}

export function trimmedOf(values: Allowed[]): Allowed | null {
  const low = trimmedMean(lows(values));
  const high = trimmedMean(highs(values));
  return low === null || high === null ? null : { low, high };
}

export function rangeOf(values: Allowed[]): Allowed {
  if (values.every(isOne)) return one(range(lows(values)));
  const smallest = minus(greatest(lows(values)), least(highs(values)));
  return {
    low: compare(smallest, exact(0)) < 0 ? exact(0) : smallest,
    high: minus(greatest(highs(values)), least(lows(values))),
  };
}

function lows(values: Allowed[]): Exact[] {
  return values.map(({ low }) => low);
}

function highs(values: Allowed[]): Exact[] {
  return values.map(({ high }) => high);
}
