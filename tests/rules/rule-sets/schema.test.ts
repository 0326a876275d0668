import { describe, expect, it } from 'vitest';
import { parseRuleSet } from '#rules/rule-sets/schema';
import { aLayer, aRule, aRuleSet } from '#tests/builders/a-rule-set';

function problems(document: unknown) {
  const result = parseRuleSet(document);
  return result.ok ? [] : result.problems;
}

const vmaMin = {
  id: 'vma-min',
  keys: ['nominalMaximumSize'],
  columns: [
    { name: 'min', unit: '%' },
    { name: 'max', unit: '%' },
  ],
  rows: [
    { nominalMaximumSize: 9.5, min: '15.0', max: '17.0' },
    { nominalMaximumSize: 12.5, min: '14.0', max: '16.0' },
  ],
};
const byTable = aRule({ limit: { min: { table: 'vma-min', column: 'min' } } });

describe('a rule set', () => {
  it('fills in the stated defaults', () => {
    const parsed = parseRuleSet(aRuleSet());
    if (!parsed.ok || parsed.ruleSet.layerOf !== null) throw new Error('expected a base edition');
    expect(parsed.ruleSet.designPoint).toEqual({ targetAirVoids: 4, fit: 'quadratic' });
    expect(parsed.ruleSet.rules[0]?.measure).toMatchObject({ statistic: 'mean', at: {} });
  });

  it.each([
    ['a standard attribute', { name: 'nominalMaximumSize', values: [9.5] }, { type: 'number', unit: 'mm' }],
    ['numbers', { name: 'lifts', values: [1, 2] }, { type: 'number' }],
    ['yes or no', { name: 'lime', values: [true, false] }, { type: 'boolean' }],
    ['nothing', { name: 'note' }, { type: 'text' }],
    ['itself', { name: 'note', type: 'date' }, { type: 'date' }],
  ] as const)('takes the type of an attribute from %s', (_, attribute, expected) => {
    const parsed = parseRuleSet({ ...aRuleSet(), attributes: [attribute] });
    if (!parsed.ok || parsed.ruleSet.layerOf !== null) throw new Error('expected a base edition');
    expect(parsed.ruleSet.attributes[0]).toMatchObject(expected);
  });

  it.each([
    ['reading', { kind: 'reading', quantity: 'air-voids' }, { max: 5 }],
    ['gradation', { kind: 'gradation', table: 'sieves' }, { max: { table: 'sieves', column: 'max' } }],
    ['creep-compliance', { kind: 'creep-compliance', temperature: -10, time: 100 }, { max: 0.5 }],
    ['formula', { kind: 'formula', expression: 'Gse - Gsb' }, { min: 0 }],
    [
      'difference',
      { kind: 'difference', quantity: 'air-voids', between: ['contractor', 'agency'] },
      { max: 1 },
    ],
    ['attribute', { kind: 'attribute', attribute: 'course' }, { oneOf: ['surface'] }],
    ['document', { kind: 'document', type: 'binder-certificate' }, { present: true }],
  ])('reads the measure kind %s with only what it requires', (_, measure, limit) => {
    const tables = [
      { id: 'sieves', keys: ['sieve'], columns: [{ name: 'max' }], rows: [{ sieve: 19, max: 100 }] },
    ];
    expect(problems(aRuleSet({ tables, rules: [aRule({ measure, limit } as object)] }))).toEqual([]);
  });

  it.each([
    ['a missing field', { title: undefined }, '/title', 'title is missing.', 'Give a text.'],
    [
      'an unknown field',
      { colour: 'red' },
      '/colour',
      'colour is not a known field.',
      'Remove it, or correct its name.',
    ],
    [
      'another format',
      { format: 'clauseway/rule-set@2' },
      '/format',
      'format has the value "clauseway/rule-set@2", which is not known.',
      'Write clauseway/rule-set@1.',
    ],
    [
      'a date that is none',
      { effective: { from: '1 January', to: null } },
      '/effective/from',
      'from is not a date.',
      'Write year, month and day as 2026-03-09.',
    ],
  ])('refuses %s with its place and the remedy', (_, change, pointer, detail, fix) => {
    expect(problems({ ...aRuleSet(), ...change })).toEqual([{ pointer, detail, fix }]);
  });

  it.each([
    [
      'an unknown severity',
      { severity: 'strict' },
      '/rules/0/severity',
      'Rule vma: severity has the value "strict", which is not known.',
    ],
    [
      'an unknown measure kind',
      { measure: { kind: 'guess' } },
      '/rules/0/measure/kind',
      'Rule vma: kind has a value that is not known.',
    ],
    [
      'a field of another kind',
      { measure: { kind: 'document', type: 'x', quantity: 'y' } },
      '/rules/0/measure/quantity',
      'Rule vma: quantity is not a known field.',
    ],
    ['no limit', { limit: {} }, '/rules/0/limit', 'Rule vma: limit sets no limit.'],
    [
      'a target without a tolerance',
      { limit: { target: 4 } },
      '/rules/0/limit',
      'Rule vma: limit gives a target without a tolerance, or a tolerance without a target.',
    ],
    [
      'a list compared with equal',
      { when: { fact: 'course', operator: 'equal', value: ['surface'] } },
      '/rules/0/when',
      'Rule vma: when compares with equal but its value is a list.',
    ],
    ['an empty group', { when: { all: [] } }, '/rules/0/when/all', 'Rule vma: all is empty or too small.'],
  ])('refuses in a rule %s', (_, change, pointer, detail) => {
    expect(problems(aRuleSet({ rules: [{ ...aRule(), ...change } as never] }))).toContainEqual(
      expect.objectContaining({ pointer, detail }),
    );
  });

  it.each([
    [
      'quantity',
      { measure: { kind: 'reading', quantity: 'vma' } },
      '/rules/0/measure/quantity',
      'the quantity vma is not known',
    ],
    [
      'table',
      { limit: { min: { table: 'vma', column: 'min' } } },
      '/rules/0/limit/min/table',
      'the table vma is not known',
    ],
    [
      'column',
      { limit: { min: { table: 'vma-min', column: 'least' } } },
      '/rules/0/limit/min/column',
      'has no column least',
    ],
    [
      'attribute',
      { when: { fact: 'coarse', operator: 'equal', value: 1 } },
      '/rules/0/when/fact',
      'the attribute coarse is not known',
    ],
    [
      'document type',
      { measure: { kind: 'document', type: 'note' }, limit: { present: true } },
      '/rules/0/measure/type',
      'the document type note is not known',
    ],
    [
      'value of a closed attribute',
      { when: { fact: 'course', operator: 'equal', value: 'sub-base' } },
      '/rules/0/when/value',
      'which it can never be',
    ],
    [
      'quantity in where',
      { measure: { kind: 'reading', quantity: 'air-voids', where: [{ quantity: 'x', min: 1 }] } },
      '/rules/0/measure/where/0/quantity',
      'the quantity x is not known',
    ],
    [
      'rounding table',
      { rounding: { method: 'rounding', to: { table: 'x', column: 'y' } } },
      '/rules/0/rounding/to/table',
      'the table x is not known',
    ],
  ])('refuses an unknown %s', (_, change, pointer, detail) => {
    const found = problems(aRuleSet({ tables: [vmaMin], rules: [{ ...aRule(), ...change } as never] }));
    expect(found).toContainEqual(
      expect.objectContaining({ pointer, detail: expect.stringContaining(detail) }),
    );
  });

  it.each([
    ['in the rule itself', aRule({ limit: { min: '5', max: '4' } })],
    [
      'in a row of its table',
      aRule({
        limit: { min: { table: 'crossed', column: 'min' }, max: { table: 'crossed', column: 'max' } },
      }),
    ],
    [
      'in what each value has to be',
      aRule({ measure: { kind: 'reading', quantity: 'air-voids', alsoEach: { min: 5, max: 4 } } }),
    ],
  ])('refuses a min above a max %s', (_, rule) => {
    const crossed = { ...vmaMin, id: 'crossed', rows: [{ nominalMaximumSize: 9.5, min: '15', max: '14' }] };
    expect(
      problems(aRuleSet({ tables: [crossed], rules: [rule] }))
        .map(({ detail }) => detail)
        .join(),
    ).toMatch(/min 1?5 is above the max 1?4/);
  });

  it('does not compare the min of one row with the max of another', () => {
    const rule = aRule({
      limit: { min: { table: 'vma-min', column: 'min' }, max: { table: 'vma-min', column: 'max' } },
    });
    const far = { ...vmaMin, rows: [...vmaMin.rows, { nominalMaximumSize: 25, min: '18', max: '19' }] };
    expect(problems(aRuleSet({ tables: [far], rules: [rule] }))).toEqual([]);
  });

  it.each([
    ['ranges that share values', [{ from: 3, below: 30 }, { from: 29 }], true],
    ['ranges that meet', [{ from: 3, below: 30 }, { from: 30 }], false],
    ['a value inside a range', [{ below: 30 }, 29], true],
    ['a value at the excluded end of a range', [{ below: 30 }, 30], false],
    ['equal values', [30, 30], true],
    ['equal values, one of them in quotes', [30, '30'], true],
  ])('%s overlap: %s', (_, cells, overlaps) => {
    const table = {
      ...vmaMin,
      keys: ['designTraffic'],
      rows: cells.map((designTraffic) => ({ designTraffic, min: 14, max: 20 })),
    };
    expect(
      problems(aRuleSet({ tables: [table as never], rules: [byTable] })).map(({ pointer }) => pointer),
    ).toEqual(overlaps ? ['/tables/0/rows/1'] : []);
  });

  it('refuses a column in a unit of another kind than what is measured', () => {
    const table = {
      ...vmaMin,
      columns: [
        { name: 'min', unit: 'kPa' },
        { name: 'max', unit: '%' },
      ],
    };
    expect(problems(aRuleSet({ tables: [table], rules: [byTable] }))[0]?.detail).toBe(
      'Rule vma: the column min is in kPa, but the value is in %.',
    );
  });

  it('refuses names given twice', () => {
    const document = aRuleSet({
      rules: [aRule(), aRule()],
      tables: [vmaMin, vmaMin],
      attributes: [{ name: 'x' }, { name: 'x' }],
    });
    expect(problems(document).map(({ pointer }) => pointer)).toEqual([
      '/rules/1',
      '/tables/1',
      '/attributes/1',
    ]);
  });

  it('refuses cases that expect a rule the edition does not have, and roomToMove that names one', () => {
    const record = {};
    const document = aRuleSet({
      roomToMove: ['vfa'],
      cases: [{ id: 'c', title: 'C', record, expected: [{ rule: 'vfa', outcome: 'pass' }] }],
    });
    expect(problems(document).map(({ pointer }) => pointer)).toEqual([
      '/roomToMove/0',
      '/cases/0/expected/0/rule',
    ]);
  });

  it('returns every fault at once', () => {
    const document = aRuleSet({
      rules: [
        aRule({ measure: { kind: 'reading', quantity: 'a' } }),
        aRule({ id: 'b', limit: { min: 2, max: 1 } }),
      ],
    });
    expect(problems(document)).toHaveLength(2);
    expect(problems({ ...document, title: 5, agency: undefined, colour: 1 })).toHaveLength(3);
  });

  it('gives a remedy with every fault', () => {
    const found = problems({
      ...aRuleSet(),
      rules: [{ id: 'x', limit: 5, measure: [], when: 3 }],
      tables: {},
    });
    expect(found.length).toBeGreaterThan(4);
    for (const { detail, fix } of found) {
      expect(detail.length).toBeGreaterThan(5);
      expect(fix).toMatch(/\.$/);
    }
  });

  it.each([[null], [5], ['text'], [[]], [{}]])('refuses %s without throwing', (json) => {
    expect(problems(json).length).toBeGreaterThan(0);
  });
});

describe('a layer', () => {
  it('has no rules of its own, and everything in it may be left out', () => {
    expect(problems(aLayer())).toEqual([]);
    expect(problems({ ...aLayer(), rules: [] })[0]?.pointer).toBe('/rules');
  });

  it('may refer to tables and attributes that only its base has', () => {
    const rule = aRule({ limit: { min: { table: 'of-the-base', column: 'min' } } });
    expect(problems(aLayer({ add: { rules: [rule] } }))).toEqual([]);
  });
});
