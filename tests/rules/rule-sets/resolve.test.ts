import { describe, expect, it } from 'vitest';
import { resolveEdition } from '#rules/rule-sets/resolve';
import {
  type Layer,
  type LayerInput,
  parseRuleSet,
  type RuleSet,
  type RuleSetInput,
} from '#rules/rule-sets/schema';
import { aLayer, anEdition, aRule, aRuleSet } from '#tests/builders/a-rule-set';

const table = {
  id: 'vma-min',
  title: 'Minimum VMA',
  keys: ['designTraffic'],
  columns: [{ name: 'min', unit: '%' }],
  rows: [
    { designTraffic: { below: 3 }, min: '13.0' },
    { designTraffic: { from: 3 }, min: '14.0' },
  ],
};
const base: Partial<RuleSetInput> = {
  tables: [table],
  attributes: [{ name: 'fractionated', type: 'boolean', label: 'Fractionated' }],
  roomToMove: ['vma', 'voids'],
  rules: [
    aRule({ limit: { min: { table: 'vma-min', column: 'min' } } }),
    aRule({
      id: 'voids',
      clause: '1.2',
      title: 'Air voids',
      measure: { kind: 'reading', quantity: 'air-voids' },
      limit: { max: '5.0' },
    }),
  ],
};

function parsed(document: RuleSetInput | LayerInput): RuleSet | Layer {
  const result = parseRuleSet(document);
  if (!result.ok) throw new Error(JSON.stringify(result.problems));
  return result.ruleSet;
}

function refusals(layers: LayerInput[], edition: Partial<RuleSetInput> = base): string[] {
  const result = resolveEdition(parsed(aRuleSet(edition)), layers.map(parsed));
  return result.ok ? [] : result.problems.map(({ detail }) => detail);
}

describe('layers over a base edition', () => {
  it('change nothing where there is none', () => {
    const edition = anEdition(base);
    expect(edition.rules.map(({ id, supplied }) => [id, supplied])).toEqual([
      ['vma', { document: 'Section 900, 2026', displaced: [] }],
      ['voids', { document: 'Section 900, 2026', displaced: [] }],
    ]);
  });

  it('add whole rules, tables and attributes', () => {
    const layer = aLayer({
      add: {
        rules: [aRule({ id: 'new', when: { fact: 'lime', operator: 'equal', value: true } })],
        attributes: [{ name: 'lime', type: 'boolean' }],
      },
    });
    expect(anEdition(base, [layer]).rules.map(({ id }) => id)).toEqual(['vma', 'voids', 'new']);
  });

  it('replace a whole rule and keep what it displaced, and whose it was', () => {
    const layer = aLayer({ replace: { rules: [aRule({ id: 'voids', limit: { max: '4.5' } })] } });
    const rule = anEdition(base, [layer]).rules.find(({ id }) => id === 'voids');
    expect(rule?.limit).toEqual({ max: '4.5' });
    expect(rule?.supplied).toEqual({
      document: 'Supplement 1, 1',
      displaced: [{ document: 'Section 900, 2026', text: 'Air voids: at most 5.0 %' }],
    });
  });

  it('remove a rule, which then yields no finding and leaves room to move', () => {
    const edition = anEdition(base, [aLayer({ remove: { rules: ['voids'] } })]);
    expect(edition.rules.map(({ id }) => id)).toEqual(['vma']);
    expect(edition.roomToMove).toEqual(['vma']);
    expect(edition.removed).toEqual([
      { kind: 'rule', id: 'voids', document: 'Supplement 1, 1', text: 'Air voids: at most 5.0 %' },
    ]);
  });

  it('patch single rows, which keep what was displaced', () => {
    const layer = aLayer({
      patchRows: [{ table: 'vma-min', key: { designTraffic: { from: 3 } }, set: { min: '14.5' } }],
    });
    const [patched] = anEdition(base, [layer]).tables;
    expect(patched?.rows.map(({ min }) => min)).toEqual(['13.0', '14.5']);
    expect(patched?.rowsSupplied).toEqual([
      { document: 'Section 900, 2026', displaced: [] },
      { document: 'Supplement 1, 1', displaced: [{ document: 'Section 900, 2026', text: 'min 14.0 %' }] },
    ]);
  });

  it('apply in order, the later one wins and both that it displaced are kept', () => {
    const layers = ['4.5', '4.2'].map((max, i) =>
      aLayer({
        id: `s${i}`,
        title: `Supplement ${i}`,
        replace: {
          rules: [
            aRule({
              id: 'voids',
              title: 'Air voids',
              measure: { kind: 'reading', quantity: 'air-voids' },
              limit: { max },
            }),
          ],
        },
      }),
    );
    const limitOf = (order: LayerInput[]) => anEdition(base, order).rules.find(({ id }) => id === 'voids');
    expect(limitOf(layers)?.limit).toEqual({ max: '4.2' });
    expect(limitOf(layers.toReversed())?.limit).toEqual({ max: '4.5' });
    expect(limitOf(layers)?.supplied.displaced.map(({ text }) => text)).toEqual([
      'Air voids: at most 5.0 %',
      'Air voids: at most 4.5 %',
    ]);
  });

  it('may give another design point and documents of their own', () => {
    const layer = aLayer({ designPoint: { targetAirVoids: 3.5 }, documents: [{ type: 'lime-certificate' }] });
    const edition = anEdition(base, [layer]);
    expect(edition.designPoint).toEqual({ targetAirVoids: 3.5, fit: 'quadratic' });
    expect(edition.documents.map(({ type }) => type)).toEqual(['lime-certificate']);
  });
});

describe('layers that are refused', () => {
  it.each([
    [
      'a replaced rule that is not there',
      { replace: { rules: [aRule({ id: 'gone' })] } },
      'replaces the rule gone, which the edition does not have',
    ],
    [
      'a removed rule that is not there',
      { remove: { rules: ['gone'] } },
      'removes the rule gone, which the edition does not have',
    ],
    [
      'a removed table that is not there',
      { remove: { tables: ['gone'] } },
      'removes the table gone, which the edition does not have',
    ],
    [
      'an added rule that is there',
      { add: { rules: [aRule()] } },
      'adds the rule vma, which the edition already has',
    ],
    [
      'a patched table that is not there',
      { patchRows: [{ table: 'gone', key: {}, set: {} }] },
      'patches the table gone, which the edition does not have',
    ],
    [
      'a patched row that is not there',
      { patchRows: [{ table: 'vma-min', key: { designTraffic: { from: 5 } }, set: { min: 1 } }] },
      'a row that the table vma-min does not have',
    ],
    [
      'a patch that means several rows',
      { patchRows: [{ table: 'vma-min', key: {}, set: { min: 1 } }] },
      '2 rows at once where one row of the table vma-min is meant',
    ],
    [
      'a patched column that is not there',
      { patchRows: [{ table: 'vma-min', key: {}, set: { max: 1 } }] },
      'the column max, which the table vma-min does not have',
    ],
    [
      'a rule left without its table',
      { remove: { tables: ['vma-min'] } },
      'Rule vma: the table vma-min is not known',
    ],
    [
      'a row patched above a max',
      {
        add: { rules: [aRule({ id: 'x', limit: { min: { table: 'vma-min', column: 'min' }, max: 13.5 } })] },
      },
      'the min 14 is above the max 13.5',
    ],
  ])('%s', (_, change, detail) => {
    expect(refusals([aLayer(change as Partial<LayerInput>)]).join()).toContain(detail);
  });

  it('over the wrong base edition', () => {
    expect(refusals([aLayer({ layerOf: { id: 'cvra-900', edition: '2024' } })])).toEqual([
      'Supplement 1, 1 is a layer of cvra-900, edition 2024, but the base is cvra-900, edition 2026.',
    ]);
  });

  it('over another layer', () => {
    const second = aLayer({
      id: 'cvra-900-s2',
      title: 'Supplement 2',
      layerOf: { id: 'cvra-900-s1', edition: '1' },
    });
    expect(refusals([aLayer(), second])).toEqual([
      'Supplement 2, 1 is a layer over cvra-900-s1, edition 1, which is itself a layer.',
    ]);
  });

  it('a layer in the place of the base, and a base in the place of a layer', () => {
    const first = resolveEdition(parsed(aLayer()), []);
    expect(first.ok).toBe(false);
    const second = resolveEdition(parsed(aRuleSet(base)), [parsed(aRuleSet(base))]);
    expect(second.ok).toBe(false);
  });

  it('all at once', () => {
    const layer = aLayer({ remove: { rules: ['a', 'b'] }, replace: { rules: [aRule({ id: 'c' })] } });
    expect(refusals([layer])).toHaveLength(3);
  });
});

describe('a table that a layer gives anew', () => {
  const table = (rows: { nominalMaximumSize: number; min: string }[]) => ({
    id: 'vma-min',
    title: 'Minimum VMA',
    keys: ['nominalMaximumSize'],
    columns: [{ name: 'min', unit: '%' }],
    rows,
  });

  it('keeps for each row what stood there before, and nothing for a new one', () => {
    const edition = anEdition({ tables: [table([{ nominalMaximumSize: 12.5, min: '14.0' }])] }, [
      aLayer({
        replace: {
          tables: [
            table([
              { nominalMaximumSize: 12.5, min: '14.5' },
              { nominalMaximumSize: 19, min: '13.0' },
            ]),
          ],
        },
      }),
    ]);
    expect(edition.tables[0]?.rowsSupplied).toEqual([
      { document: 'Supplement 1, 1', displaced: [{ document: 'Section 900, 2026', text: 'min 14.0 %' }] },
      { document: 'Supplement 1, 1', displaced: [] },
    ]);
  });
});

describe('a difference over a statistic that is no one value of each side', () => {
  it.each(['each', 'percent-within-limits'] as const)('is refused: %s', (statistic) => {
    const rule = aRule({
      measure: {
        kind: 'difference',
        quantity: 'air-voids',
        between: ['contractor', 'agency'],
        statistic,
      },
      limit: { max: 1 },
    });
    const parsed = parseRuleSet(aRuleSet({ rules: [rule] }));
    expect(parsed.ok ? [] : parsed.problems.map(({ pointer }) => pointer)).toEqual([
      '/rules/0/measure/statistic',
    ]);
  });
});
