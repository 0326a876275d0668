import { describe, expect, it } from 'vitest';
import { understandCondition } from '#rules/reading/understand-condition';
import { cellOf } from '#tests/workbooks/grid-of';

const value = (stated: string | number) => ({ state: 'value', value: stated });

describe('what a key says', () => {
  it.each([
    ['No. 200', 0.075],
    ['#4', 4.75],
    ['3/4"', 19],
    ['12.5 mm', 12.5],
    ['75 µm', 0.075],
  ])('names the sieve %s by its opening', (text, opening) => {
    expect(understandCondition('sieve', cellOf('A6', text), null, '.')).toEqual(value(opening));
  });

  it('doubts a sieve outside the series, and a bare number that can be a sieve number', () => {
    expect(understandCondition('sieve', cellOf('A6', 13), null, '.')).toMatchObject({
      state: 'doubt',
      alternatives: [],
    });
    expect(understandCondition('sieve', cellOf('A6', 200), null, '.')).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '0.075 mm' }],
    });
  });

  it('doubts a sieve that the spreadsheet turned into a date, and offers the sieve', () => {
    const cell = cellOf('A6', { kind: 'date', value: '2026-03-08', text: '8-Mar' });
    expect(understandCondition('sieve', cell, null, '.')).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '9.5 mm', value: 9.5 }],
    });
  });

  it('knows the proposed job mix by its names', () => {
    for (const text of ['design', 'JMF', 'Job mix formula']) {
      expect(understandCondition('trial', cellOf('A6', text), null, '.')).toEqual(value('design'));
    }
    expect(understandCondition('trial', cellOf('A6', 'B'), null, '.')).toEqual(value('B'));
  });

  it.each([
    ['N des', 'design'],
    ['Nini', 'initial'],
    ['maximum', 'maximum'],
    ['100', 100],
  ])('reads the gyrations %s', (text, stated) => {
    expect(understandCondition('gyrations', cellOf('A6', text), null, '.')).toEqual(value(stated));
  });

  it('brings temperatures and stresses to their unit', () => {
    expect(understandCondition('temperature', cellOf('A6', 122), '°F', '.')).toEqual(value(50));
    expect(understandCondition('temperature', cellOf('A6', '50 °C'), null, '.')).toEqual(value(50));
    expect(understandCondition('stress', cellOf('A6', '0.2 MPa'), null, '.')).toEqual(value(200));
  });

  it('doubts a laboratory that is neither of the two', () => {
    expect(understandCondition('laboratory', cellOf('A6', 'Agency'), null, '.')).toEqual(value('agency'));
    expect(understandCondition('laboratory', cellOf('A6', 'QA'), null, '.')).toMatchObject({
      state: 'doubt',
    });
  });
});
