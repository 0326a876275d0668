import { describe, expect, it } from 'vitest';
import { ruleSetContents } from '#server/presenters/rule-set-view';
import { anEdition, aRule } from '#tests/builders/a-rule-set';

const jointDensity = { id: 'joint-density', symbol: 'JD', label: 'joint density', unit: '%' };

describe('an edition as its page shows it', () => {
  it('hands over the quantities that it declares, completed by their defaults', () => {
    const edition = anEdition({ quantities: [jointDensity] });
    const { quantities } = ruleSetContents(edition, edition);
    expect(quantities).toMatchObject([{ ...jointDensity, methods: [], derivation: null }]);
  });

  it('says a precision of such a quantity in its unit', () => {
    const edition = anEdition({
      quantities: [jointDensity],
      rules: [
        aRule({
          measure: { kind: 'reading', quantity: 'joint-density' },
          precision: { value: '0.6', source: null, origin: 'agency' },
        }),
      ],
    });
    expect(ruleSetContents(edition, edition).ruleViews[0]?.precision).toBe('± 0.6 %');
  });

  it('names the quantity that a rule measures, and whether the rule set declares it', () => {
    const edition = anEdition({
      quantities: [jointDensity],
      rules: [
        aRule(),
        aRule({ id: 'joint', clause: '1.2', measure: { kind: 'reading', quantity: 'joint-density' } }),
        aRule({
          id: 'certificate',
          clause: '1.3',
          measure: { kind: 'document', type: 'binder-certificate' },
          limit: { present: true },
          rounding: undefined,
        }),
      ],
    });
    expect(ruleSetContents(edition, edition).ruleViews.map(({ quantity }) => quantity)).toEqual([
      { id: 'voids-in-mineral-aggregate', label: 'voids in the mineral aggregate', own: false },
      { id: 'joint-density', label: 'joint density', own: true },
      null,
    ]);
  });

  it('heads the columns of a table with words', () => {
    const edition = anEdition({
      attributes: [{ name: 'course', type: 'text', values: ['surface', 'base'] }],
      tables: [
        {
          id: 'temperatures',
          keys: ['course'],
          columns: [{ name: 'mixingMin', unit: '°C' }, { name: 'max' }],
          rows: [{ course: 'surface', mixingMin: '150', max: '163' }],
        },
      ],
    });
    const [table] = ruleSetContents(edition, edition).tables;
    expect(table?.columns.map(({ label }) => label)).toEqual(['Course', 'Mixing min', 'At most']);
  });

  it('has none where the edition declares none', () => {
    const edition = anEdition();
    expect(ruleSetContents(edition, edition).quantities).toEqual([]);
  });
});
