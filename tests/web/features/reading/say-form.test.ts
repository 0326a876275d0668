import { describe, expect, it } from 'vitest';
import type { Cell } from '#rules/reading/cell-grid';
import { emptySayForm, type SayForm, sayingOf } from '../../../../web/features/reading/lib/say-form';

const block = { from: { row: 6, column: 7 }, to: { row: 9, column: 8 } };
const texts: Record<string, string> = {
  '6 1': 'A',
  '7 1': 'A',
  '8 1': 'B',
  '9 1': 'B',
  '4 7': '25',
  '4 8': '40',
};

function cellAt({ row, column }: { row: number; column: number }): Cell | undefined {
  const text = texts[`${row} ${column}`];
  if (text === undefined) return undefined;
  const rest = { format: null, formula: null, cached: false, comment: null, bold: false };
  return { address: '', row, column, kind: 'text', value: text, text, ...rest };
}

const say = (form: Partial<SayForm>) =>
  sayingOf({ ...emptySayForm, ...form }, { sheet: 'Trials', block, cellAt });
const gmb = { kind: 'reading', quantity: 'bulk-specific-gravity-of-mix' } as const;
const plain = { ...gmb, unit: null, at: {}, without: [] };

describe('what is said of a block', () => {
  it('is not complete before a kind and a quantity are chosen, and complains of nothing', () => {
    expect(say({})).toEqual({ ok: false, fault: null });
    expect(say({ kind: 'reading' })).toEqual({ ok: false, fault: null });
    expect(say({ kind: 'attribute' })).toEqual({ ok: false, fault: null });
  });

  it('leaves to row and column whatever is not said', () => {
    expect(say(gmb)).toEqual({
      ok: true,
      corrections: [{ sheet: 'Trials', range: 'G6:H9', says: plain }],
    });
  });

  it('gives one value for all, and names what does not hold', () => {
    const saying = say({
      ...gmb,
      unit: 'g/cm³',
      conditions: { trial: { how: 'all', text: 'C' }, specimen: { how: 'none', text: '' } },
    });
    expect(saying).toEqual({
      ok: true,
      corrections: [
        {
          sheet: 'Trials',
          range: 'G6:H9',
          says: { ...plain, unit: 'g/cm³', at: { trial: 'C' }, without: ['specimen'] },
        },
      ],
    });
  });

  it('names trials row by row from a column, rows of one trial together', () => {
    const saying = say({ ...gmb, conditions: { trial: { how: 'row', text: 'a' } } });
    expect(saying).toEqual({
      ok: true,
      corrections: [
        { sheet: 'Trials', range: 'G6:H7', says: { ...plain, at: { trial: 'A' } } },
        { sheet: 'Trials', range: 'G8:H9', says: { ...plain, at: { trial: 'B' } } },
      ],
    });
  });

  it('crosses rows with columns where both name something', () => {
    const saying = say({
      ...gmb,
      conditions: { trial: { how: 'row', text: 'A' }, temperature: { how: 'column', text: '4' } },
    });
    expect(
      saying.ok && saying.corrections.map(({ range, says }) => [range, 'at' in says && says.at]),
    ).toEqual([
      ['G6:G7', { trial: 'A', temperature: 25 }],
      ['H6:H7', { trial: 'A', temperature: 40 }],
      ['G8:G9', { trial: 'B', temperature: 25 }],
      ['H8:H9', { trial: 'B', temperature: 40 }],
    ]);
  });

  it('says which cell names nothing', () => {
    const saying = say({ ...gmb, conditions: { trial: { how: 'row', text: 'B' } } });
    expect(saying).toEqual({ ok: false, fault: 'Trial: B6 is empty.' });
  });

  it('asks for the column where none is given', () => {
    const saying = say({ ...gmb, conditions: { trial: { how: 'row', text: '4' } } });
    expect(saying).toEqual({ ok: false, fault: 'Trial: Enter the letter of its column.' });
  });

  it('refuses a temperature that is not one', () => {
    const saying = say({ ...gmb, conditions: { temperature: { how: 'all', text: 'warm' } } });
    expect(saying.ok).toBe(false);
    expect(!saying.ok && saying.fault).toMatch(/^Temperature, °C: “warm” /);
  });

  it('says that cells are no readings at all', () => {
    expect(say({ kind: 'not a reading' })).toEqual({
      ok: true,
      corrections: [{ sheet: 'Trials', range: 'G6:H9', says: { kind: 'not a reading' } }],
    });
  });
});
