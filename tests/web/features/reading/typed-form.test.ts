import { describe, expect, it } from 'vitest';
import { typedAgain } from '../../../../web/features/reading/lib/reading-act';
import {
  emptyTypedForm,
  formOfTyped,
  type TypedForm,
  typedReading,
} from '../../../../web/features/reading/lib/typed-form';

const form: TypedForm = { ...emptyTypedForm, quantity: 'plasticity-index', value: '4.5', unit: '%' };
const given = {
  quantity: 'plasticity-index',
  qualifier: null,
  unit: '%',
  at: {},
  method: null,
  testedOn: null,
};
const value = (text: string) => typedReading({ ...form, value: text });

describe('a reading that is typed', () => {
  it('is not complete without a quantity and a value, and complains of nothing', () => {
    expect(typedReading(emptyTypedForm)).toEqual({ ok: false, faults: {} });
    expect(value(' ')).toEqual({ ok: false, faults: {} });
  });

  it.each([
    ['4.5', 4.5, null],
    ['4,5', 4.5, null],
    ['−10', -10, null],
    ['< 0.1', 0.1, '<'],
    ['>90', 90, '>'],
    ['none', null, 'none'],
    ['Non-plastic', null, 'non-plastic'],
  ])('takes %j for what it says', (text, number, qualifier) => {
    expect(value(text)).toEqual({ ok: true, reading: { ...given, value: number, qualifier } });
  });

  it.each(['4.5 %', '1,000.5', 'about 4', '--'])('refuses %j and says what to enter', (text) => {
    expect(value(text)).toEqual({
      ok: false,
      faults: { value: 'Enter a number, < 0.1, none or non-plastic.' },
    });
  });

  it('understands its conditions as cells are understood', () => {
    expect(typedReading({ ...form, at: { trial: 'B', temperature: '-10', specimen: '' } })).toMatchObject({
      reading: { at: { trial: 'B', temperature: -10 } },
    });
    const wrong = typedReading({ ...form, at: { temperature: 'cold' } });
    expect(wrong.ok).toBe(false);
  });

  it('comes back to the form as it was typed', () => {
    const result = typedReading({ ...form, value: '< 0.1', at: { trial: 'B' }, method: 'AASHTO T 90' });
    const again = result.ok ? formOfTyped(result.reading) : null;
    expect(again).toEqual({ ...form, value: '< 0.1', at: { trial: 'B' }, method: 'AASHTO T 90' });
  });

  it('keeps every part of a kept reading when it is typed again', () => {
    const kept = {
      quantity: 'plasticity-index',
      value: null,
      qualifier: 'non-plastic' as const,
      unit: '%',
      at: { stockpile: 'Sand' },
      method: 'AASHTO T 90',
      origin: 'typed' as const,
      testedOn: '2026-03-04',
      source: null,
    };
    expect(typedAgain(kept)).toEqual({
      ...given,
      value: null,
      qualifier: 'non-plastic',
      at: { stockpile: 'Sand' },
      method: 'AASHTO T 90',
      testedOn: '2026-03-04',
    });
  });
});
