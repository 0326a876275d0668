import { describe, expect, it } from 'vitest';
import { parseNumberText } from '#rules/reading/parse-number';

describe('a number written as text', () => {
  it.each([
    ['4.2', '4.2', ''],
    ['  4.2\u00a0%', '4.2', '%'],
    ['4.2 %', '4.2', '%'],
    ['112 psi', '112', 'psi'],
    ['２．４１', '2.41', ''],
    ['−10', '-10', ''],
    ['20 000', '20000', ''],
    ["20'000", '20000', ''],
    ['4,721.5', '4721.5', ''],
    ['.075', '0.075', ''],
    ['1.2e-4', '1.2e-4', ''],
    ['2.41*', '2.41', '*'],
  ])('takes %j for %s, followed by %j', (text, digits, rest) => {
    expect(parseNumberText(text, '.')).toEqual({ state: 'number', number: { digits, rest } });
  });

  it.each([
    ['<0.1', '<', '0.1'],
    ['> 20000', '>', '20000'],
    ['less than 0.1', '<', '0.1'],
    ['20000+', '>', '20000'],
  ])('reads the limit in %j', (text, qualifier, digits) => {
    expect(parseNumberText(text, '.')).toEqual({ state: 'number', number: { digits, rest: '', qualifier } });
  });

  it('cannot tell a decimal comma from one that groups thousands, and offers both', () => {
    expect(parseNumberText('2,492', '.')).toMatchObject({
      state: 'ambiguous',
      reason: 'comma',
      numbers: [{ digits: '2.492' }, { digits: '2492' }],
    });
    expect(parseNumberText('4,2', '.')).toMatchObject({ state: 'ambiguous', numbers: [{ digits: '4.2' }] });
  });

  it('takes the comma for decimals where the mapping says so, and then doubts the point', () => {
    expect(parseNumberText('4,2', ',')).toEqual({ state: 'number', number: { digits: '4.2', rest: '' } });
    expect(parseNumberText('4.721,5', ',')).toMatchObject({ state: 'number', number: { digits: '4721.5' } });
    expect(parseNumberText('2.492', ',')).toMatchObject({ state: 'ambiguous', reason: 'point' });
  });

  it('finds both ends of a range', () => {
    expect(parseNumberText('150-155 °C', '.')).toMatchObject({
      state: 'ambiguous',
      reason: 'range',
      numbers: [
        { digits: '150', rest: '°C' },
        { digits: '155', rest: '°C' },
      ],
    });
  });

  it.each(['see note', 'A', '2.4.92', ''])('sees no number in %j', (text) => {
    expect(parseNumberText(text, '.')).toEqual({ state: 'text' });
  });
});
