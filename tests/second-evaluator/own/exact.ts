/** A number held exactly: a quotient of whole numbers, the lower one positive. */
export interface Exact {
  top: bigint;
  bottom: bigint;
}

/** The number as its shortest decimal form writes it; a text as it stands. */
export function exact(value: number | string): Exact {
  const [mantissa = '0', exponent = '0'] = String(value).toLowerCase().split('e');
  const [whole = '0', fraction = ''] = mantissa.split('.');
  const places = fraction.length - Number(exponent);
  const digits = BigInt(whole + fraction);
  return places >= 0 ? { top: digits, bottom: 10n ** BigInt(places) } : whole10(digits, -places);
}

export function plus(left: Exact, right: Exact): Exact {
  if (left.bottom === right.bottom) return { top: left.top + right.top, bottom: left.bottom };
  return { top: left.top * right.bottom + right.top * left.bottom, bottom: left.bottom * right.bottom };
}

export function minus(left: Exact, right: Exact): Exact {
  return plus(left, { top: -right.top, bottom: right.bottom });
}

export function times(left: Exact, right: Exact): Exact {
  return { top: left.top * right.top, bottom: left.bottom * right.bottom };
}

export function over(left: Exact, right: Exact): Exact {
  const sign = right.top < 0n ? -1n : 1n;
  return { top: left.top * right.bottom * sign, bottom: left.bottom * right.top * sign };
}

/** Below zero where the left is smaller. */
export function compare(left: Exact, right: Exact): number {
  const difference = left.top * right.bottom - right.top * left.bottom;
  return difference < 0n ? -1 : difference > 0n ? 1 : 0;
}

export function least(values: Exact[]): Exact {
  let found = values[0]!;
  for (const value of values) if (compare(value, found) < 0) found = value;
  return found;
}

export function greatest(values: Exact[]): Exact {
  let found = values[0]!;
  for (const value of values) if (compare(value, found) > 0) found = value;
  return found;
}

export function total(values: Exact[]): Exact {
  let sum = exact(0);
  for (const value of values) sum = plus(sum, value);
  return sum;
}

export function magnitude(value: Exact): Exact {
  return value.top < 0n ? { top: -value.top, bottom: value.bottom } : value;
}

export function asNumber(value: Exact): number {
  return Number((value.top * SCALE) / value.bottom) / Number(SCALE);
}

/** Quotients of long numbers would leave the range of a floating one. */
const SCALE = 10n ** 40n;

function whole10(digits: bigint, zeros: number): Exact {
  return { top: digits * 10n ** BigInt(zeros), bottom: 1n };
}
