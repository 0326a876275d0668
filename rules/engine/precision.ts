import Decimal from 'decimal.js';
import type { Quantity } from '../quantities/quantity';
import type { Statistic } from '../rule-sets/measure';
import type { Rule } from '../rule-sets/schema';

export interface UsedPrecision {
  value: number;
  /** In words, for the reader: whose it is, and whether it is from memory. */
  origin: string;
}

/**
 * ± precision of a result: the rule's own, else 1.96·s/√n from the method's published single-operator standard
 * deviation of a mean of n; else none, and then nothing is called borderline.
 */
export function precisionOf(input: {
  rule: Rule;
  quantity: Quantity | undefined;
  statistic: Statistic;
  count: number;
  /** Unit that the value is judged in. */
  unit: string;
}): UsedPrecision | null {
  const { rule, quantity, statistic, count, unit } = input;
  if (rule.precision) {
    const { value, source, origin } = rule.precision;
    return { value: Number(value), origin: originWords(source ?? "the rule's own precision", origin) };
  }
  const published = quantity?.methodPrecision;
  const isOfSingleResults =
    statistic === 'mean' || statistic === 'each' || statistic === 'min' || statistic === 'max';
  if (!published || !quantity || !isOfSingleResults || count < 1 || unit !== quantity.unit) return null;
  const averaged = statistic === 'mean' ? count : 1;
  const value = (1.96 * published.singleOperatorStandardDeviation) / Math.sqrt(averaged);
  return {
    value: new Decimal(value).toSignificantDigits(12).toNumber(),
    origin: originWords(`1.96·s/√n, s from ${published.source}`, published.origin),
  };
}

/** |margin|, which is a decimal difference, within the precision, exactly as the whisker is drawn. */
export function isBorderline(margin: number | null, precision: UsedPrecision | null): boolean {
  if (margin === null || precision === null) return false;
  return Math.abs(margin) <= precision.value;
}

function originWords(source: string, origin: string): string {
  return origin === 'memory' && !source.includes('from memory') ? `${source}; from memory, verify` : source;
}
