import { asNumber, compare, type Exact, exact, greatest, least, minus, over, times, total } from './exact';
import { toTwelveDigits } from './rounding';

export function mean(values: Exact[]): Exact {
  return over(total(values), exact(values.length));
}

/** Divided by n − 1; null of fewer than two. */
export function standardDeviation(values: Exact[]): Exact | null {
  if (values.length < 2) return null;
  const centre = mean(values);
  const squares = total(values.map((value) => times(minus(value, centre), minus(value, centre))));
  return toTwelveDigits(Math.sqrt(asNumber(over(squares, exact(values.length - 1)))));
}

export function range(values: Exact[]): Exact {
  return minus(greatest(values), least(values));
}

/** The mean without the smallest and the largest; null of fewer than three. */
export function trimmedMean(values: Exact[]): Exact | null {
  if (values.length < 3) return null;
  const inOrder = [...values].sort(compare);
  return mean(inOrder.slice(1, -1));
}

/**
 * Percent of the lot within limits from quality indices, the exact beta distribution with both exponents n/2 − 1
 * (AASHTO R 9; from memory, verify). Null of fewer than three.
 */
export function percentWithinLimits(values: Exact[], min: Exact | null, max: Exact | null): Exact | null {
  const spread = standardDeviation(values);
  if (values.length < 3 || spread === null) return null;
  const centre = asNumber(mean(values));
  const share = (distance: number) => shareBelow(distance, asNumber(spread), values.length);
  const lower = min === null ? 1 : share(centre - asNumber(min));
  const upper = max === null ? 1 : share(asNumber(max) - centre);
  return toTwelveDigits(Math.max(0, 100 * (lower + upper - 1)));
}

function shareBelow(distance: number, spread: number, count: number): number {
  if (spread === 0) return distance >= 0 ? 1 : 0;
  const at = 0.5 + (distance / spread) * (Math.sqrt(count) / (2 * (count - 1)));
  if (at <= 0) return 0;
  return at >= 1 ? 1 : symmetricBeta(at, count / 2 - 1);
}

/**
 * Share of the symmetric beta distribution below a point. With x = sin²(θ/2) its density is sin^(2a−1) θ, a whole
 * power for whole counts, whose integral has a recurrence.
 */
function symmetricBeta(at: number, exponent: number): number {
  const angle = Math.acos(Math.min(1, Math.max(-1, 1 - 2 * at)));
  const power = Math.round(2 * exponent - 1);
  return sinePower(angle, power) / sinePower(Math.PI, power);
}

function sinePower(angle: number, power: number): number {
  if (power === 0) return angle;
  if (power === 1) return 1 - Math.cos(angle);
  const below = ((power - 1) / power) * sinePower(angle, power - 2);
  return below - (Math.sin(angle) ** (power - 1) * Math.cos(angle)) / power;
}
