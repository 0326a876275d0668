import { type Exact, exact, over, times } from './exact';

export type RoundingMethod = 'rounding' | 'absolute' | 'half-up' | 'truncate';

/** To the nearest multiple of the step: a tie goes to the even one (ASTM E29), up, or everything towards zero. */
export function rounded(value: Exact, method: RoundingMethod, step: Exact): Exact {
  if (method === 'absolute') return value;
  const isNegative = value.top < 0n;
  const steps = over({ top: isNegative ? -value.top : value.top, bottom: value.bottom }, step);
  let whole = steps.top / steps.bottom;
  const twiceTheRest = 2n * (steps.top - whole * steps.bottom);
  if (method !== 'truncate') {
    const isTie = twiceTheRest === steps.bottom;
    const goesUp = isTie ? method === 'half-up' || whole % 2n === 1n : twiceTheRest > steps.bottom;
    if (goesUp) whole += 1n;
  }
  return times({ top: isNegative ? -whole : whole, bottom: 1n }, step);
}

/** Decimals that a limit is written with: none in 14, one in "14.0". */
export function decimalsOf(written: number | string): number {
  const [mantissa = '', exponent = '0'] = String(written).split('e');
  return Math.max(0, (mantissa.split('.')[1] ?? '').length - Number(exponent));
}

export function stepOfDecimals(decimals: number): Exact {
  return { top: 1n, bottom: 10n ** BigInt(decimals) };
}

export function toTwelveDigits(value: number): Exact {
  return exact(Number(value.toPrecision(12)));
}
