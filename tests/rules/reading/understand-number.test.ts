import { describe, expect, it } from 'vitest';
import { quantityById } from '#rules/quantities/registry';
import { understandNumber } from '#rules/reading/understand-number';
import { cellOf, type GridCell } from '#tests/workbooks/grid-of';

interface Options {
  unit?: string;
  unknownUnit?: string;
  decimal?: '.' | ',';
}

function understand(id: string, value: GridCell, options: Options = {}) {
  const quantity = quantityById(id);
  if (!quantity) throw new Error(`no quantity ${id}`);
  const { unit = null, unknownUnit = null, decimal = '.' } = options;
  return understandNumber(cellOf('C7', value), { quantity, unit, unknownUnit, decimal });
}

const sure = (value: number, more: object = {}) => ({
  state: 'value',
  value: { value, converted: false, ...more },
});

describe('a cell as the value of a quantity', () => {
  it('takes a plain number as it is stored, not as it is shown', () => {
    const cell = { kind: 'number', value: '13.9584', text: '14.0', format: '0.0' } as const;
    expect(understand('voids-in-mineral-aggregate', cell)).toEqual(sure(13.9584));
  });

  it('lets the percent format decide, without binary noise', () => {
    const cell = { kind: 'number', value: '0.057', text: '5.7%', format: '0.0%' } as const;
    expect(understand('binder-content', cell)).toEqual(sure(5.7));
    const ratio = { kind: 'number', value: '0.18', text: '18%', format: '0%' } as const;
    expect(understand('recycled-binder-ratio', ratio)).toEqual(sure(0.18));
  });

  it('doubts a fraction where a percentage belongs and offers the percentage first', () => {
    expect(understand('voids-filled-with-asphalt', 0.869)).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '86.9 %' }, { answer: '0.869 %' }],
    });
  });

  it('doubts a fraction also where it is plausible, if the quantity is reported in whole percent', () => {
    expect(understand('coarse-aggregate-angularity-one-face', 0.97)).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '97 %' }, { answer: '0.97 %' }],
    });
    expect(understand('deleterious-materials', 0.4)).toEqual(sure(0.4));
  });

  it('doubts a percentage that was entered as a whole number into a percent format', () => {
    const cell = { kind: 'number', value: '4.5', text: '450%', format: '0%' } as const;
    expect(understand('air-voids', cell)).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '4.5 %' }, { answer: '450 %' }],
    });
  });

  it('takes a text number with its unit, and converts it', () => {
    expect(understand('air-voids', '4.2 %')).toEqual(sure(4.2));
    // 100 psi is 689.476 kPa (NIST SP 811, 2008, appendix B.8: 1 psi = 6.894757 kPa).
    const strength = understand('tensile-strength-dry', '100 psi');
    expect(strength).toMatchObject({ state: 'value', value: { converted: true } });
    if (strength.state === 'value') expect(strength.value.value).toBeCloseTo(689.4757, 3);
  });

  it('follows the unit of the header, and of the number format before it', () => {
    expect(understand('mixing-temperature', 311, { unit: '°F' })).toEqual(sure(155, { converted: true }));
    const shown = { kind: 'number', value: '4.4', text: '4.4 in', format: '0.0" in"' } as const;
    // 4.4 in of 25.4 mm.
    expect(understand('specimen-height', shown, { unit: 'mm' })).toEqual(sure(111.76, { converted: true }));
  });

  it('keeps censored values with their sign', () => {
    expect(understand('draindown', '<0.1')).toEqual(sure(0.1, { qualifier: '<' }));
    expect(understand('stripping-inflection-point', '>20,000')).toEqual(sure(20_000, { qualifier: '>' }));
    expect(understand('stripping-inflection-point', 'none')).toMatchObject({
      value: { value: null, qualifier: 'none' },
    });
    expect(understand('plasticity-index', 'NP')).toMatchObject({
      value: { value: null, qualifier: 'non-plastic' },
    });
  });

  it('doubts a decimal comma unless the mapping says that it is one', () => {
    expect(understand('mass-saturated-surface-dry', '4721,5')).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '4721.5 g' }],
    });
    expect(understand('mass-saturated-surface-dry', '4721,5', { decimal: ',' })).toEqual(sure(4721.5));
  });

  it('doubts a marked number and offers it without the mark', () => {
    expect(understand('bulk-specific-gravity-mix', '2.40*')).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '2.4', value: { value: 2.4 } }],
    });
  });

  it.each(['N/A', 'ND', '–', '-', 'n/t', 'pending'])(
    'takes %j for a statement that there is no value',
    (text) => {
      expect(understand('air-voids', text)).toEqual({ state: 'none' });
    },
  );

  it('takes a blank for a blank, never for zero', () => {
    expect(understand('air-voids', ' \u00a0')).toEqual({ state: 'blank' });
    expect(understand('rap-content', 0)).toEqual(sure(0));
  });

  it.each<[string, GridCell, RegExp]>([
    ['an error', { kind: 'error', value: '#DIV/0!', text: '#DIV/0!' }, /#DIV\/0!, an error/],
    [
      'a formula without a result',
      { kind: 'formula-without-result', value: '', text: '' },
      /result was not saved/,
    ],
    ['a date', { kind: 'date', value: '2026-03-04', text: '4-Mar' }, /shows a date/],
    ['words', 'see note 3', /where air voids belongs/],
    ['a truth value', { kind: 'boolean', value: 'true', text: 'TRUE' }, /says TRUE/],
    ['a value that cannot be', 91, /outside the plausible 0 to 28 %/],
  ])('doubts %s where a number belongs', (_, value, reason) => {
    const understood = understand('air-voids', value);
    expect(understood.state).toBe('doubt');
    if (understood.state === 'doubt') expect(understood.reason).toMatch(reason);
  });

  it('offers the other units of a value that is implausible in the stated one', () => {
    // A specimen 4.5 units high: 4.5 in is 114.3 mm.
    expect(understand('specimen-height', 4.5)).toMatchObject({
      state: 'doubt',
      alternatives: expect.arrayContaining([
        expect.objectContaining({ answer: '4.5 in', value: { value: 114.3, converted: true } }),
      ]),
    });
  });

  it('offers a ratio that is given in percent on its own scale, and the reverse', () => {
    expect(understand('recycled-binder-ratio', '18 %')).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '0.18', value: { value: 0.18 } }],
    });
    expect(understand('tensile-strength-ratio', 0.87, { unit: '1' })).toMatchObject({
      state: 'doubt',
      alternatives: [{ answer: '87 %', value: { value: 87 } }],
    });
  });

  it('doubts a density where a gravity belongs, and offers nothing that cannot be', () => {
    expect(understand('maximum-specific-gravity', '2486 kg/m³')).toMatchObject({
      state: 'doubt',
      alternatives: [],
    });
  });

  it('doubts a value under a unit that nobody knows, and a unit of another kind', () => {
    expect(understand('mass-in-air', 4700, { unknownUnit: 'stone' })).toMatchObject({
      state: 'doubt',
      reason: expect.stringMatching(/"stone", which is not known/),
    });
    expect(understand('mass-in-air', '4700 mm')).toMatchObject({ state: 'doubt' });
  });
});
