import Decimal from 'decimal.js';

export type RoundingMethod = 'rounding' | 'half-up' | 'truncate' | 'absolute';

export interface RoundingOptions {
  value: number;
  /** The unit of rounding, `0.1` or `5`; ignored by the absolute method. */
  to: number;
  method: RoundingMethod;
}

/**
 * Rounding for comparison with a limit, on the shortest decimal form of the number, once.
 *
 * - `rounding`: the rounding method, an exact half to the even digit (ASTM E29-13, section 6.4; from memory,
 *   verify; the same rule with cases in Alberta Transportation ATT-70/96, section 3 and table 1).
 * - `half-up`: an exact half away from zero (Iowa DOT IM 202).
 * - `truncate`: further digits are dropped, towards zero.
 * - `absolute`: no rounding (ASTM E29, the absolute method).
 *
 * The decimal form matters: 13.95 is held as 13.94999999999999929 in binary, and rounding that gives 13.9.
 * Throws on a value or unit that is not a finite number, or a unit that is not above zero: such a call is a
 * defect of the caller, and no number could stand for it.
 *
 * @example roundTo({ value: 13.95, to: 0.1, method: 'rounding' }) // 14
 * @example roundTo({ value: 5.05, to: 0.1, method: 'rounding' }) // 5, the even digit
 */
export function roundTo({ value, to, method }: RoundingOptions): number {
  if (!Number.isFinite(value)) throw new RangeError('Only a finite number can be rounded.');
  if (method === 'absolute') return value;
  if (!Number.isFinite(to) || to <= 0) throw new RangeError('The unit of rounding must be above zero.');
  const decimals = decimalSteps.get(to);
  const short = decimals === undefined ? null : fixedText(value, decimals, method);
  if (short !== null) return Number(short) + 0;
  const unit = new Exact(to);
  return new Exact(value).div(unit).toDecimalPlaces(0, modes[method]).mul(unit).toNumber() + 0;
}

/**
 * Decimals that a number is written with: of a text as it stands (`14.0` has one), of a number in its
 * shortest form (14 has none). Text without a number has none.
 *
 * @example decimalsOf('0.80') // 2
 */
export function decimalsOf(written: string | number): number {
  if (typeof written === 'number' && Number.isFinite(written)) {
    const text = `${written}`;
    const point = text.indexOf('.');
    if (!text.includes('e')) return point < 0 ? 0 : text.length - point - 1;
  }
  const match = /^[-+]?\d*(?:\.(\d*))?(?:e([-+]?\d+))?$/i.exec(String(written).trim());
  if (!match) return 0;
  return Math.max(0, (match[1]?.length ?? 0) - Number(match[2] ?? 0));
}

/** A number written with so many decimals, an exact half to the even digit. */
export function formatDecimals(value: number, decimals: number): string {
  const text =
    fixedText(value, decimals, 'rounding') ?? new Exact(value).toFixed(decimals, Decimal.ROUND_HALF_EVEN);
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text;
}

/**
 * The number with so many decimals, worked out on the digits of its shortest decimal form; null where it is written
 * with an exponent or has more digits than an integer holds exactly, for the slow way to do.
 */
function fixedText(
  value: number,
  decimals: number,
  method: Exclude<RoundingMethod, 'absolute'>,
): string | null {
  const text = `${Math.abs(value)}`;
  if (text.includes('e') || text === 'Infinity' || text === 'NaN') return null;
  const point = text.indexOf('.');
  const whole = point < 0 ? text : text.slice(0, point);
  const fraction = point < 0 ? '' : text.slice(point + 1);
  const kept = whole + fraction.slice(0, decimals).padEnd(decimals, '0');
  if (kept.length > EXACT_DIGITS) return null;
  const digits = Number(kept) + (roundsUp(kept, fraction.slice(decimals), method) ? 1 : 0);
  const all = `${digits}`.padStart(decimals + 1, '0');
  const cut = all.length - decimals;
  const sign = value < 0 && digits !== 0 ? '-' : '';
  return `${sign}${all.slice(0, cut)}${decimals === 0 ? '' : `.${all.slice(cut)}`}`;
}

function roundsUp(kept: string, rest: string, method: Exclude<RoundingMethod, 'absolute'>): boolean {
  if (rest === '' || method === 'truncate' || rest < '5') return false;
  if (rest !== '5' || method === 'half-up') return true;
  return Number(kept.at(-1)) % 2 === 1;
}

/** Every integer of so many digits, and the next one, is a number of its own. */
const EXACT_DIGITS = 15;

const decimalSteps = new Map(
  Array.from({ length: 10 }, (_, decimals) => [Number(`1e-${decimals}`), decimals]),
);

/** Wide enough that the quotient of two doubles in shortest form is never itself rounded at a half. */
const Exact = Decimal.clone({ precision: 60 });

const modes = {
  rounding: Decimal.ROUND_HALF_EVEN,
  'half-up': Decimal.ROUND_HALF_UP,
  truncate: Decimal.ROUND_DOWN,
} as const;
