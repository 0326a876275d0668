/** A number, or the reason why there is none. `NaN` and `Infinity` never leave a numeric function. */
export type NumericResult = { ok: true; value: number } | { ok: false; reason: string };

/**
 * Wraps a computed number. It keeps 12 significant digits: far more than any reading carries, and few enough
 * that the noise of binary arithmetic (100·(2.5 − 2.4)/2.5 as 4.0000000000000036) never crosses a limit, and
 * that every engine that runs this code comes to the same number.
 */
export function known(value: number): NumericResult {
  if (!Number.isFinite(value)) return cannot('the result is not a finite number');
  return { ok: true, value: settled(value) };
}

export function cannot(reason: string): { ok: false; reason: string } {
  return { ok: false, reason };
}

/** The first reason for which one of the named inputs cannot be used, or null. */
export function unusable(
  inputs: Record<string, number>,
  kind: 'finite' | 'positive' = 'finite',
): string | null {
  for (const name in inputs) {
    const value = inputs[name]!;
    if (!Number.isFinite(value)) return `${name} is not a number`;
    if (kind === 'positive' && value <= 0) return `${name} must be above zero`;
  }
  return null;
}

const significantDigits = 12;

function settled(value: number): number {
  return Number(value.toPrecision(significantDigits)) + 0;
}
