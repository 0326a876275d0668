import { describe, expect, it } from 'vitest';
import { dateFromText, understandDate } from '#rules/reading/parse-date';
import { cellOf } from '#tests/workbooks/grid-of';

describe('a date in a workbook', () => {
  it.each([
    ['2026-03-04', '2026-03-04'],
    ['2026/3/4', '2026-03-04'],
    ['4 Mar 2026', '2026-03-04'],
    ['4-Mar-2026', '2026-03-04'],
    ['4th March 2026', '2026-03-04'],
    ['March 4, 2026', '2026-03-04'],
    ['Sept 9 2026', '2026-09-09'],
    ['13/04/2026', '2026-04-13'],
    ['04/13/2026', '2026-04-13'],
    ['04/04/2026', '2026-04-04'],
    ['29.02.2028', '2028-02-29'],
  ])('reads %j as one day', (text, iso) => {
    expect(dateFromText(text)).toEqual({ state: 'value', value: iso });
  });

  it('doubts a date that can be two days, and offers both', () => {
    expect(dateFromText('03/04/2026')).toMatchObject({
      state: 'doubt',
      alternatives: [
        { answer: '2026-04-03', label: '3 April 2026' },
        { answer: '2026-03-04', label: '4 March 2026' },
      ],
    });
  });

  it.each(['30/02/2026', '2026-13-01', 'last spring', '04/03/26', '4 Mar 26'])('doubts %j', (text) => {
    expect(dateFromText(text).state).toBe('doubt');
  });

  it('takes a real date as it stands', () => {
    const cell = cellOf('B2', { kind: 'date', value: '2026-03-04', text: '04/03/2026' });
    expect(understandDate(cell, false)).toEqual({ state: 'value', value: '2026-03-04' });
  });

  it('doubts a day that was typed as a number, in either epoch', () => {
    // Day 46085 after 30 December 1899 is 4 March 2026: 45658 is 1 January 2025, and 365 + 62 days follow.
    expect(understandDate(cellOf('B2', 46085), false)).toMatchObject({
      state: 'doubt',
      alternatives: [{ value: '2026-03-04' }],
    });
    expect(understandDate(cellOf('B2', 44623), true)).toMatchObject({
      alternatives: [{ value: '2026-03-04' }],
    });
    expect(understandDate(cellOf('B2', 4.2), false)).toMatchObject({ state: 'doubt', alternatives: [] });
  });

  it('says that a dash is no date, and never makes one of it', () => {
    expect(understandDate(cellOf('B2', '–'), false)).toEqual({ state: 'none' });
    expect(understandDate(null, false)).toEqual({ state: 'blank' });
  });
});
