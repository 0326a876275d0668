import { compare, type Exact, exact, greatest, least, minus, plus } from './exact';
import { mean } from './statistics';

/** Every value that a reading allows: one, or all on one side of a censored one. */
export interface Allowed {
  low: Exact;
  high: Exact;
}

const FAR = exact('1e30');
const HAIR = exact('1e-30');

export const ANYTHING: Allowed = { low: minus(exact(0), FAR), high: FAR };

export function isOne({ low, high }: Allowed): boolean {
  return compare(low, high) === 0;
}

export function one(value: Exact): Allowed {
  return { low: value, high: value };
}

/** All below the number, which is not itself among them. */
export function below(value: Exact): Allowed {
  return { low: ANYTHING.low, high: minus(value, HAIR) };
}

export function above(value: Exact): Allowed {
  return { low: plus(value, HAIR), high: FAR };
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

function lows(values: Allowed[]): Exact[] {
  return values.map(({ low }) => low);
}

function highs(values: Allowed[]): Exact[] {
  return values.map(({ high }) => high);
}
