import { describe, expect, it } from 'vitest';
import { decimalsOf, formatDecimals, type RoundingMethod, roundTo } from '#rules/numerics/round';
import fc from '#tests/builders/seeded-fast-check';

const methods: RoundingMethod[] = ['rounding', 'half-up', 'truncate', 'absolute'];

describe('the four methods', () => {
  it.each([
    // value, to, half even, half up, truncated; by hand from the definitions
    [13.95, 0.1, 14, 14, 13.9],
    [5.05, 0.1, 5, 5.1, 5],
    [2.5, 1, 2, 3, 2],
    [-2.5, 1, -2, -3, -2],
    [-0.04, 0.1, 0, 0, 0],
    [59950, 100, 60000, 60000, 59900],
    [4.625, 0.05, 4.6, 4.65, 4.6],
    [1e-7, 0.1, 0, 0, 0],
  ])('%d to %d', (value, to, halfEven, halfUp, truncated) => {
    expect(roundTo({ value, to, method: 'rounding' })).toBe(halfEven);
    expect(roundTo({ value, to, method: 'half-up' })).toBe(halfUp);
    expect(roundTo({ value, to, method: 'truncate' })).toBe(truncated);
    expect(roundTo({ value, to, method: 'absolute' })).toBe(value);
  });

  it('ignores the unit in the absolute method', () => {
    expect(roundTo({ value: 13.94, to: 0, method: 'absolute' })).toBe(13.94);
  });

  it('refuses what is not a number, and a unit that is not above zero', () => {
    expect(() => roundTo({ value: Number.NaN, to: 0.1, method: 'rounding' })).toThrow(RangeError);
    expect(() => roundTo({ value: Number.POSITIVE_INFINITY, to: 0.1, method: 'absolute' })).toThrow(
      RangeError,
    );
    expect(() => roundTo({ value: 1, to: 0, method: 'rounding' })).toThrow(RangeError);
  });

  it('says what is wrong with the value or the unit', () => {
    const rounding = (value: number, to: number) => () => roundTo({ value, to, method: 'rounding' });
    expect(rounding(Number.NaN, 0.1)).toThrow(/finite number/);
    expect(rounding(1, 0)).toThrow(/above zero/);
    expect(rounding(1, -0.1)).toThrow(/above zero/);
    expect(rounding(1, Number.POSITIVE_INFINITY)).toThrow(/above zero/);
  });

  it('rounds a rounded number to itself', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.constantFrom(0.001, 0.01, 0.1, 0.5, 1, 5),
        fc.constantFrom(...methods),
        (value, to, method) => {
          const once = roundTo({ value, to, method });
          expect(roundTo({ value: once, to, method })).toBe(once);
        },
      ),
    );
  });
});

describe('decimals', () => {
  it.each([
    ['14.0', 1],
    ['0.80', 2],
    ['14', 0],
    ['1e-7', 7],
    ['2.5e3', 0],
    ['', 0],
    ['NP', 0],
    ['x1.25', 0],
    ['1.25x', 0],
    [' 1.25 ', 2],
    ['1.5e-3', 4],
    ['1e12', 0],
    [0.5, 1],
    [-0.25, 2],
    [1.5e-7, 8],
    [1e21, 0],
    [Number.NaN, 0],
    [14, 0],
    [0.075, 3],
  ])('of %s are %d', (written, decimals) => {
    expect(decimalsOf(written)).toBe(decimals);
  });

  it('are written as asked, the half to even, and zero without a sign', () => {
    expect(formatDecimals(14, 1)).toBe('14.0');
    expect(formatDecimals(13.95, 1)).toBe('14.0');
    expect(formatDecimals(0.285, 2)).toBe('0.28');
    expect(formatDecimals(-0.04, 1)).toBe('0.0');
    expect(formatDecimals(-10, 1)).toBe('-10.0');
    expect(formatDecimals(-0.5, 1)).toBe('-0.5');
    expect(formatDecimals(0.25, 0)).toBe('0');
    expect(formatDecimals(2.5e-7, 7)).toBe('0.0000002');
    expect(formatDecimals(123456789012345.5, 0)).toBe('123456789012346');
    expect(formatDecimals(1e21, 0)).toBe('1000000000000000000000');
  });
});
