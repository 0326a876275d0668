import { describe, expect, it } from 'vitest';
import { mixRecordSchema } from '#rules/record';
import { ruleSetSchema } from '#rules/rule-sets/schema';
import { composeRecord, type RecordParts } from '#server/commands/readings/compose-record';
import { plainFileName } from '#server/commands/submittals/store-workbook';

const edition = ruleSetSchema.parse({
  format: 'clauseway/rule-set@1',
  id: 'cvra-412',
  title: 'Section 412',
  agency: 'Carrow Valley Roads Authority',
  edition: '2026',
  effective: { from: '2026-01-01', to: null },
  layerOf: null,
  rules: [
    {
      id: 'va',
      clause: '412.03(a)',
      title: 'Air voids',
      severity: 'required',
      when: {
        all: [
          { fact: 'designTraffic', operator: 'lessThan', value: 30 },
          { fact: 'course', operator: 'equal', value: 'surface' },
        ],
      },
      measure: { kind: 'reading', quantity: 'air-voids' },
      limit: { min: 3, max: 5 },
    },
  ],
});

const source = { sheet: 'Submittal', cell: 'B7', text: '12' };
const read = (overrides: object = {}): RecordParts['read'] => ({
  record: mixRecordSchema.parse({
    attributes: { designTraffic: { value: 12, unit: 'million ESAL', origin: 'reported', source } },
    documents: [{ type: 'binder-certificate' }],
    doubts: [
      { sheet: 'Trials', cell: 'C2', text: '2.40*', reason: 'Marked.', alternatives: [] },
      {
        sheet: 'Submittal',
        cell: 'B9',
        text: 'top',
        reason: 'Unknown.',
        alternatives: [],
        about: { attribute: 'course' },
      },
    ],
    ...overrides,
  }),
});
const parts = (overrides: Partial<RecordParts> = {}): RecordParts => ({
  read: read(),
  typed: [],
  documents: [],
  edition,
  facts: {},
  ...overrides,
});
const typedTraffic = { name: 'designTraffic', value: 30, by: 'Sorcha Lund', on: '2026-03-09' };

describe('the canonical record', () => {
  it('takes what was typed for what nobody states, with who and when', () => {
    const { attributes } = composeRecord(parts({ read: read({ attributes: {} }), typed: [typedTraffic] }));
    expect(attributes.designTraffic).toEqual({
      value: 30,
      unit: 'million ESAL',
      origin: 'typed',
      typed: { by: 'Sorcha Lund', on: '2026-03-09' },
      source: null,
    });
  });

  it('lets a replaced workbook that states a value win over what was typed before it did', () => {
    const { attributes, doubts } = composeRecord(parts({ typed: [typedTraffic] }));
    expect(attributes.designTraffic).toMatchObject({ value: 12, origin: 'reported' });
    expect(doubts.map(({ cell }) => cell)).toEqual(['C2', 'B9']);
  });

  it('asks again where the workbook changed after somebody said which of two values holds', () => {
    const old = { ...typedTraffic, value: 3 };
    const { attributes, doubts } = composeRecord(parts({ facts: { designTraffic: 30 }, typed: [old] }));
    expect(attributes.designTraffic?.value).toBe(12);
    expect(doubts.at(-1)).toMatchObject({ about: { attribute: 'designTraffic' } });
  });

  it('leaves a doubt about an attribute behind once it is typed, and no other', () => {
    const typed = [{ name: 'course', value: 'surface', by: 'Sorcha Lund', on: '2026-03-09' }];
    expect(composeRecord(parts({ typed })).doubts.map(({ cell }) => cell)).toEqual(['C2']);
    expect(composeRecord(parts()).doubts.map(({ cell }) => cell)).toEqual(['C2', 'B9']);
  });

  it('is in doubt where workbook and project differ, until somebody says which holds', () => {
    const facts = { designTraffic: 30 };
    const doubted = composeRecord(parts({ facts }));
    expect(doubted.attributes.designTraffic?.value).toBe(12);
    expect(doubted.doubts.at(-1)).toMatchObject({ cell: 'B7', about: { attribute: 'designTraffic' } });
    expect(composeRecord(parts({ facts, typed: [typedTraffic] })).doubts).toHaveLength(2);
  });

  it('holds the documents of the page, not those of the workbook alone', () => {
    const enclosed = mixRecordSchema.parse({
      documents: [{ type: 'mix-design-report', enclosed: true }],
    }).documents;
    expect(composeRecord(parts({ documents: enclosed })).documents).toEqual(enclosed);
  });

  it('leaves what was read as it was', () => {
    const given = read();
    const before = structuredClone(given);
    composeRecord(parts({ read: given, typed: [typedTraffic], facts: { designTraffic: 3 } }));
    expect(given).toEqual(before);
  });
});

it('keeps of a file name what prints, without its path, and never nothing', () => {
  expect(plainFileName('C:\\labs\\mix r0.xlsx')).toBe('mix r0.xlsx');
  expect(plainFileName('../../etc/mix.xlsx')).toBe('mix.xlsx');
  expect(plainFileName('a\u0000b\nc.xlsx')).toBe('abc.xlsx');
  expect(plainFileName('Mélange №7.xlsx')).toBe('Mélange №7.xlsx');
  expect(plainFileName('/')).toBe('workbook');
  expect(plainFileName(`${'x'.repeat(300)}.xlsx`)).toHaveLength(255);
});
