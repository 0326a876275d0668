import Decimal from 'decimal.js';
import { describe, expect, it } from 'vitest';
import { decimalDifference, decimalMean } from '#rules/numerics/decimal-sum';
import { formatDecimals, roundTo } from '#rules/numerics/round';
import fc from '#tests/builders/seeded-fast-check';

const Exact = Decimal.clone({ precision: 60 });
/** What stands in cells: few decimals, or a computed number with all its digits. */
const cell = fc.oneof(
  fc
    .tuple(fc.integer({ min: -9_999_999, max: 9_999_999 }), fc.integer({ min: 0, max: 6 }))
    .map(([n, d]) => n / 10 ** d),
  fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e12, max: 1e12 }),
  fc.constantFrom(0, -0, 13.95, 5.05, 0.5, 1.5, 2.5, 1e-7, 1e21, 999.9995, 0.1 + 0.2),
);

describe('decimal arithmetic', () => {
  it('takes 14.0 from 14.1 and is left with 0.1', () => {
    expect(decimalDifference(14.1, 14)).toBe(0.1);
    expect(decimalMean([2.41, 2.42])).toBe(2.415);
    expect(decimalMean([0.1, 0.2, 0.3])).toBe(0.2);
  });

  it('is exact up to many values and to very small ones', () => {
    // A thousand times 0.1, and 0.3 at the end: (100 + 0.3)/1001.
    expect(decimalMean([...Array(1000).fill(0.1), 0.3])).toBe(100.3 / 1001);
    expect(decimalDifference(3e-25, 1e-25)).toBe(2e-25);
    expect(decimalDifference(1e15 + 0.5, 1e15)).toBe(0.5);
    // Too long for one whole number.
    expect(decimalDifference(1234567.12345679, 1234567.12345678)).toBe(1e-8);
  });

  it('has no negative zero, even where the mean is too small for a number', () => {
    expect(decimalMean([0, 5e-324, -1e-323])).toBe(0);
    expect(decimalDifference(-0, 0)).toBe(0);
  });

  it('agrees with a decimal library on every difference and mean', () => {
    fc.assert(
      fc.property(cell, cell, cell, (a, b, c) => {
        expect(decimalDifference(a, b)).toBe(new Decimal(a).minus(b).toNumber() + 0);
        const sum = new Exact(a).plus(b).plus(c);
        expect(decimalMean([a, b, c])).toBe(sum.div(3).toNumber() + 0);
      }),
      { numRuns: 5000 },
    );
  });

  it('agrees with a decimal library on every rounding to decimals', () => {
    const modes = {
      rounding: Decimal.ROUND_HALF_EVEN,
      'half-up': Decimal.ROUND_HALF_UP,
      truncate: Decimal.ROUND_DOWN,
    } as const;
    fc.assert(
      fc.property(
        cell,
        fc.integer({ min: 0, max: 4 }),
        fc.constantFrom('rounding', 'half-up', 'truncate'),
        (value, decimals, method) => {
          const expected = new Exact(value).toDecimalPlaces(decimals, modes[method]);
          expect(roundTo({ value, to: Number(`1e-${decimals}`), method })).toBe(expected.toNumber() + 0);
          const text = new Exact(value).toFixed(decimals, Decimal.ROUND_HALF_EVEN);
          expect(formatDecimals(value, decimals)).toBe(text.replace(/^-(0(\.0*)?)$/, '$1'));
        },
      ),
      { numRuns: 5000 },
    );
  });
});
