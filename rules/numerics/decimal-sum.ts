import Decimal from 'decimal.js';
import { decimalsOf } from './round';
import { tenTo } from './transcendental';

/**
 * a − b on the shortest decimal forms of both: 14.1 − 14.0 is 0.1, not 0.09999999999999964.
 *
 * Source: textbook arithmetic. Domain: finite numbers; decimal.js throws on what is none.
 *
 * @example decimalDifference(14.1, 14) // 0.1
 */
export function decimalDifference(a: number, b: number): number {
  const scale = commonScale([a, b]);
  if (scale === null) return new Decimal(a).minus(b).toNumber() + 0;
  return (Math.round(a * scale) - Math.round(b * scale)) / scale + 0;
}

/**
 * The mean on the shortest decimal forms of the values: of 0.1, 0.2 and 0.3 it is 0.2.
 *
 * Source: textbook arithmetic. Domain: at least one value, all finite.
 *
 * @example decimalMean([2.41, 2.42]) // 2.415
 */
export function decimalMean(values: readonly number[]): number {
  const scale = commonScale(values);
  if (scale === null) {
    const sum = values.reduce((total, value) => total.plus(value), new Exact(0));
    return sum.div(values.length).toNumber() + 0;
  }
  // One division of two exact integers: the nearest number to the true mean.
  return values.reduce((total, value) => total + Math.round(value * scale), 0) / (scale * values.length) + 0;
}

/** A power of ten that makes all of them whole and small enough to be added exactly, or null. */
function commonScale(values: readonly number[]): number | null {
  let decimals = 0;
  let largest = 0;
  for (const value of values) {
    decimals = Math.max(decimals, decimalsOf(value));
    largest = Math.max(largest, Math.abs(value));
  }
  const scale = tenTo(decimals);
  const isExact = decimals <= 9 && largest * scale * values.length < EXACT_WHOLE && values.length < 1000;
  return isExact ? scale : null;
}

/** A tenth of the largest whole numbers that are exact: what is multiplied by the scale is rounded to the right one. */
const EXACT_WHOLE = 1e14;

const Exact = Decimal.clone({ precision: 40 });
