import { describe, expect, it } from 'vitest';
import {
  countInFigures,
  countOf,
  decimalsOf,
  formatFixed,
  formatPlain,
  formatSigned,
  groupThousands,
} from '#shared/format/numbers';

describe('numbers as people read them', () => {
  it('writes a fixed number of decimals, with a minus as wide as a figure', () => {
    expect(formatFixed(14, 1)).toBe('14.0');
    expect(formatFixed(-10, 0)).toBe('−10');
    expect(formatFixed(0.1 + 0.2, 1)).toBe('0.3');
  });

  it('never writes a negative zero', () => {
    expect(formatFixed(-0.04, 1)).toBe('0.0');
  });

  it('writes nothing for what is no number', () => {
    expect(formatFixed(Number.NaN, 1)).toBe('');
    expect(formatPlain(Number.POSITIVE_INFINITY)).toBe('');
  });

  it('always signs a margin, and leaves the limit itself without a sign', () => {
    expect(formatSigned(0.3, 1)).toBe('+0.3');
    expect(formatSigned(-0.1, 1)).toBe('−0.1');
    expect(formatSigned(0, 1)).toBe('0.0');
    expect(formatSigned(-0.1000000001, 1)).toBe('−0.1');
  });

  it('counts the decimals of a written number', () => {
    expect(decimalsOf('14.30')).toBe(2);
    expect(decimalsOf('76')).toBe(0);
  });

  it('drops the digits of the calculation from an unrounded value', () => {
    expect(formatPlain(4.434000000000001)).toBe('4.434');
    expect(formatPlain(-2.5)).toBe('−2.5');
    expect(formatPlain(0)).toBe('0');
  });

  it('groups thousands from 1,000 and leaves decimals alone', () => {
    expect(groupThousands('999')).toBe('999');
    expect(groupThousands('1000')).toBe('1,000');
    expect(groupThousands('20000.2500')).toBe('20,000.2500');
    expect(groupThousands('−1200')).toBe('−1,200');
    expect(groupThousands('PG 64-22')).toBe('PG 64-22');
  });

  it('counts in figures where numbers are compared', () => {
    expect(countInFigures(1, 'doubt')).toBe('1 doubt');
    expect(countInFigures(0, 'doubt')).toBe('0 doubts');
    expect(countInFigures(2, 'note stays', 'notes stay')).toBe('2 notes stay');
  });

  it('counts in words up to nine', () => {
    expect(countOf(1, 'rule')).toBe('one rule');
    expect(countOf(2, 'rule')).toBe('two rules');
    expect(countOf(12, 'rule')).toBe('12 rules');
    expect(countOf(2, 'is not shown', 'are not shown')).toBe('two are not shown');
  });
});
