import { describe, expect, it } from 'vitest';
import {
  enSieveOpeningsMm,
  isStandardSieve,
  sieveFromName,
  sieveLabel,
  usSieveName,
  usSieveOpeningsMm,
} from '#rules/quantities/sieves';

describe('names', () => {
  it.each([
    ['1 1/2 in', 37.5],
    ['1-1/2"', 37.5],
    ['1½"', 37.5],
    ['1.5 in', 37.5],
    ['3/4"', 19],
    ['3/4', 19],
    ['3⁄4 in.', 19],
    ['1"', 25],
    ['2 in', 50],
    ['No. 4', 4.75],
    ['#200', 0.075],
    ['No.200 sieve', 0.075],
    ['0.075 mm', 0.075],
    ['.075', 0.075],
    ['75 µm', 0.075],
    ['75um', 0.075],
    ['4.75', 4.75],
    ['4,75 mm', 4.75],
    ['2', 2],
    ['19.05 mm', 19],
    ['0.063 mm', 0.063],
  ])('%s is %d mm', (name, openingMm) => {
    expect(sieveFromName(name)).toBe(openingMm);
  });

  it.each(['', 'Pan', 'No. 9', '#', '200', '13 mm', '3/5 in', 'mm', '-4.75', 'Total'])(
    '%s is no sieve',
    (name) => {
      expect(sieveFromName(name)).toBeNull();
    },
  );

  it('writes openings and US names', () => {
    expect(sieveLabel(12.5)).toBe('12.5 mm');
    expect(sieveLabel(0.075)).toBe('0.075 mm');
    expect(usSieveName(0.075)).toBe('No. 200');
    expect(usSieveName(19)).toBe('3/4 in');
    expect(usSieveName(8)).toBe('5/16 in');
    expect(usSieveName(10)).toBeNull();
  });

  it('reads every US name back to its opening', () => {
    for (const openingMm of usSieveOpeningsMm()) {
      expect(sieveFromName(usSieveName(openingMm)!)).toBe(openingMm);
    }
  });
});

it('runs both series from coarse to fine and knows their sieves', () => {
  for (const series of [usSieveOpeningsMm(), enSieveOpeningsMm()]) {
    expect(series).toEqual(series.toSorted((a, b) => b - a));
    expect(series.every(isStandardSieve)).toBe(true);
  }
  expect(isStandardSieve(13)).toBe(false);
});
