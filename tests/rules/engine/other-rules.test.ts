import { describe, expect, it } from 'vitest';
import type { DocumentRecord, MixRecordInput } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aReading, replicates } from '#tests/builders/a-reading';
import { attributes } from '#tests/builders/a-record';
import { aRule } from '#tests/builders/a-rule-set';
import { findingOf, findingsOf } from './check-with';

describe('a gradation rule', () => {
  const tables = [
    {
      id: 'control',
      title: 'Control points',
      keys: ['nominalMaximumSize', 'sieve'],
      columns: [
        { name: 'min', unit: '%' },
        { name: 'max', unit: '%' },
      ],
      rows: [
        { nominalMaximumSize: 12.5, sieve: 19, min: '100', max: null },
        { nominalMaximumSize: 12.5, sieve: 12.5, min: '90', max: '100' },
        { nominalMaximumSize: 12.5, sieve: 0.075, min: '2', max: '10' },
        { nominalMaximumSize: 9.5, sieve: 9.5, min: '90', max: '100' },
      ],
    },
  ];
  const rule = aRule({
    id: 'control',
    measure: { kind: 'gradation', table: 'control' },
    limit: { min: { table: 'control', column: 'min' }, max: { table: 'control', column: 'max' } },
    rounding: { method: 'rounding', to: 'limit' },
  });
  const passing = (values: Record<string, number>) =>
    Object.entries(values).map(([sieve, value]) =>
      aReading({ quantity: 'percent-passing', value, at: { trial: 'design', sieve: Number(sieve) } }),
    );
  const size = attributes({ nominalMaximumSize: 12.5 });
  const check = (record: MixRecordInput) =>
    findingsOf({ edition: { tables, rules: [rule] }, record }).map(({ subject, outcome, margin }) => [
      subject,
      outcome,
      margin,
    ]);

  it('gives one finding a sieve of the table, at the limit a pass, and none for other sieves', () => {
    const readings = passing({ 19: 100, 12.5: 89, 4.75: 60, 0.075: 10 });
    expect(check({ attributes: size, readings })).toEqual([
      ['0.075 mm', 'pass', 0],
      ['12.5 mm', 'fail', -1],
      ['19 mm', 'pass', 0],
    ]);
  });

  it('does not show a sieve without a reading, whatever lies on either side of it', () => {
    expect(check({ attributes: size, readings: passing({ 19: 100, 0.075: 5 }) })).toContainEqual([
      '12.5 mm',
      'not shown',
      null,
    ]);
  });

  it('is one finding, not shown, where there is no gradation at all', () => {
    expect(check({ attributes: size })).toEqual([['design point', 'not shown', null]]);
  });

  it('is undecided where the table’s key is missing or matches no row, never not applicable', () => {
    const readings = passing({ 19: 100 });
    expect(check({ readings })).toEqual([['design point', 'undecided', null]]);
    expect(check({ readings, attributes: attributes({ nominalMaximumSize: 25 }) })).toEqual([
      ['design point', 'undecided', null],
    ]);
  });

  it('is not applicable as one finding', () => {
    const conditional = { ...rule, when: { fact: 'course', operator: 'equal' as const, value: 'surface' } };
    const findings = findingsOf({
      edition: { tables, rules: [conditional] },
      record: { attributes: attributes({ course: 'base' }), readings: passing({ 19: 100 }) },
    });
    expect(findings.map(({ subject, outcome }) => [subject, outcome])).toEqual([
      ['design point', 'not applicable'],
    ]);
  });

  it('is undecided at a sieve whose reading is in another kind of unit', () => {
    const readings = passing({ 19: 100 }).map((reading) => ({ ...reading, unit: 'mm' }));
    expect(check({ attributes: size, readings })).toContainEqual(['19 mm', 'undecided', null]);
  });
});

describe('limits from tables', () => {
  const tables = [
    {
      id: 'by-traffic',
      title: 'Minimum by traffic',
      keys: ['designTraffic'],
      columns: [{ name: 'min', unit: '%' }],
      rows: [
        { designTraffic: { below: 3 }, min: '13.0' },
        { designTraffic: { from: 3, below: 30 }, min: '14.0' },
        { designTraffic: { from: 40 }, min: null },
      ],
    },
  ];
  const rules = [aRule({ limit: { min: { table: 'by-traffic', column: 'min' } } })];
  const check = (designTraffic: number | null, value = 13.5) =>
    findingOf({
      edition: { tables, rules },
      record: {
        attributes: designTraffic === null ? {} : attributes({ designTraffic }),
        readings: [aReading({ quantity: 'voids-in-mineral-aggregate', value })],
      },
    });

  it.each([
    ['below the first end', 2.99, 'pass'],
    ['at the first end, which belongs to the next row', 3, 'fail'],
    ['just below the second end', 29.9, 'fail'],
    ['in a gap between rows', 30, 'undecided'],
    ['in a row that sets no limit', 40, 'not applicable'],
    ['not stated', null, 'undecided'],
  ] as const)('traffic %s', (_, traffic, outcome) => {
    expect(check(traffic).outcome).toBe(outcome);
  });

  it('name the table, its row and the document that gave them', () => {
    expect(check(12).limit?.from).toEqual({
      document: 'Section 900, 2026',
      table: 'by-traffic',
      tableTitle: 'Minimum by traffic',
      row: { designTraffic: '3 to below 30 million ESAL' },
      displaced: [],
    });
  });

  it('are looked up with what the project states where the record has nothing', () => {
    const finding = findingOf({
      edition: { tables, rules },
      record: { readings: [aReading({ quantity: 'voids-in-mineral-aggregate', value: 13.5 })] },
      context: { facts: { designTraffic: 2 } },
    });
    expect(finding.outcome).toBe('pass');
  });
});

describe('a limit that is another quantity', () => {
  const rule = {
    measure: { kind: 'reading' as const, quantity: 'compaction-temperature' },
    limit: { max: { quantity: 'mixing-temperature', plus: '-5' } },
  };
  const temperatures = (compaction: number, mixing: number | null) => ({
    readings: [
      aReading({ quantity: 'compaction-temperature', value: compaction }),
      ...(mixing === null ? [] : [aReading({ quantity: 'mixing-temperature', value: mixing })]),
    ],
  });

  it.each([
    ['inside', 144, 150, 'pass', 1],
    ['at the limit', 145, 150, 'pass', 0],
    ['outside', 146, 150, 'fail', -1],
    ['the other quantity is absent', 140, null, 'not shown', null],
  ] as const)('%s', (_, compaction, mixing, outcome, margin) => {
    expect(findingOf({ rule, record: temperatures(compaction, mixing) })).toMatchObject({ outcome, margin });
  });
});

describe('a difference rule', () => {
  const gmm = 'maximum-specific-gravity';
  const rule: Partial<RuleInput> = {
    measure: { kind: 'difference', quantity: gmm, between: ['contractor', 'agency'] },
    limit: { max: '0.020' },
    rounding: { method: 'rounding', to: 0.001 },
  };
  const both = (contractor: number[], agency: number[]) => ({
    readings: [...replicates(gmm, contractor), ...replicates(gmm, agency, { at: { laboratory: 'agency' } })],
  });

  it.each([
    ['inside', [2.5, 2.51], [2.51], 'pass', 0.015],
    ['at the limit, whichever is larger', [2.5], [2.48], 'pass', 0],
    ['outside', [2.5], [2.521], 'fail', -0.001],
    ['the agency has none', [2.5], [], 'not shown', null],
    ['the contractor has none', [], [2.5], 'not shown', null],
  ] as const)('of two laboratories: %s', (_, contractor, agency, outcome, margin) => {
    const finding = findingOf({ rule, record: both([...contractor], [...agency]) });
    expect(finding).toMatchObject({ outcome, margin, subject: 'design point' });
  });

  it('is undecided where a reading is in a unit of another kind', () => {
    const record = both([2.5], [2.5]);
    const readings = record.readings.map((reading) => ({ ...reading, unit: 'kPa' }));
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('undecided');
  });

  const reported: Partial<RuleInput> = {
    measure: { kind: 'difference', quantity: 'air-voids', between: ['reported', 'recomputed'] },
    limit: { max: '0.2' },
    rounding: { method: 'rounding', to: 0.1 },
  };
  /** 100·(2.500 − 2.400)/2.500 = 4.0 % */
  const raw = [
    aReading({ quantity: gmm, value: 2.5 }),
    aReading({ quantity: 'bulk-specific-gravity-mix', value: 2.4 }),
  ];
  const stated = (value: number) => aReading({ quantity: 'air-voids', value });

  it.each([
    ['inside', [...raw, stated(4.1)], 'pass', 0.1],
    ['at the limit', [...raw, stated(4.2)], 'pass', 0],
    ['outside', [...raw, stated(4.3)], 'fail', -0.1],
    ['nothing reported', raw, 'not shown', null],
    ['nothing to recompute from', [stated(4)], 'not shown', null],
  ] as const)('of the reported and the recomputed value: %s', (_, readings, outcome, margin) => {
    expect(findingOf({ rule: reported, record: { readings: [...readings] } })).toMatchObject({
      outcome,
      margin,
    });
  });
});

describe('an attribute rule', () => {
  const grade: Partial<RuleInput> = {
    measure: { kind: 'attribute', attribute: 'binderGrade' },
    limit: { oneOf: ['PG 64-22', 'PG 70-22'] },
  };

  it.each([
    ['allowed', 'PG 64-22', 'pass'],
    ['allowed, written without spaces and hyphens', 'pg6422', 'pass'],
    ['not allowed', 'PG 58-28', 'fail'],
  ] as const)('%s', (_, binderGrade, outcome) => {
    const finding = findingOf({ rule: grade, record: { attributes: attributes({ binderGrade }) } });
    expect(finding).toMatchObject({ outcome, margin: null, subject: 'mix' });
  });

  it('says the value, then what is allowed', () => {
    const record = { attributes: attributes({ binderGrade: 'PG 58-28' }) };
    expect(findingOf({ rule: grade, record }).sentence).toBe(
      'Binder grade is PG 58-28, allowed PG 64-22 or PG 70-22.',
    );
  });

  it('is not shown without the attribute and undecided while it is in doubt', () => {
    expect(findingOf({ rule: grade }).outcome).toBe('not shown');
    const doubt = {
      sheet: 'Cover',
      cell: 'C5',
      text: '64-22?',
      reason: 'a mark',
      alternatives: [],
      about: { attribute: 'binderGrade' },
    };
    expect(findingOf({ rule: grade, record: { doubts: [doubt] } }).outcome).toBe('undecided');
  });

  it('is undecided by a value that the edition does not know', () => {
    const course: Partial<RuleInput> = {
      measure: { kind: 'attribute', attribute: 'course' },
      limit: { oneOf: ['surface'] },
    };
    expect(
      findingOf({ rule: course, record: { attributes: attributes({ course: 'Wearing course' }) } }).outcome,
    ).toBe('pass');
    expect(
      findingOf({ rule: course, record: { attributes: attributes({ course: 'sub-base' }) } }).outcome,
    ).toBe('undecided');
  });

  it('holds a numeric attribute against a limit, at the limit a pass', () => {
    const blows: Partial<RuleInput> = {
      measure: { kind: 'attribute', attribute: 'compactionBlows' },
      limit: { min: 75 },
    };
    const outcome = (compactionBlows: number) =>
      findingOf({ rule: blows, record: { attributes: attributes({ compactionBlows }) } });
    expect([74, 75, 76].map((each) => [outcome(each).outcome, outcome(each).margin])).toEqual([
      ['fail', -1],
      ['pass', 0],
      ['pass', 1],
    ]);
  });
});

describe('a document rule', () => {
  const aDocument = (date: string | null, overrides: Partial<DocumentRecord> = {}) => ({
    type: 'binder-certificate',
    date,
    ...overrides,
  });
  const check = (measure: object, documents: object[], context = {}) =>
    findingOf({
      rule: {
        measure: { kind: 'document', type: 'binder-certificate', ...measure },
        limit: { present: true },
      } as object,
      record: { documents } as MixRecordInput,
      context,
    });
  const sixMonths = { maximumAgeMonths: 6, on: 'submitted' };

  it.each([
    ['young enough', '2025-11-02', '2026-03-09', 'pass'],
    ['on the last day', '2025-09-09', '2026-03-09', 'pass'],
    ['a day too old', '2025-09-08', '2026-03-09', 'fail'],
    ['31 August, on the last day of February', '2025-08-31', '2026-02-28', 'pass'],
    ['31 August, on 1 March', '2025-08-31', '2026-03-01', 'fail'],
    ['31 August, on the leap day', '2027-08-31', '2028-02-29', 'pass'],
    ['of the same day', '2026-03-09', '2026-03-09', 'pass'],
    ['later than the stated date', '2026-03-10', '2026-03-09', 'undecided'],
    ['without a date', null, '2026-03-09', 'undecided'],
  ] as const)('%s', (_, date, submittedOn, outcome) => {
    expect(check(sixMonths, [aDocument(date)], { submittedOn })).toMatchObject({ outcome, margin: null });
  });

  it('is not shown without the document, and says so', () => {
    expect(check(sixMonths, [])).toMatchObject({
      outcome: 'not shown',
      reason: 'No binder certificate is stated.',
      sentence: 'Binder certificate is not shown, at most 6 months before 9 March 2026.',
    });
  });

  it('is undecided where the date it counts to is not given', () => {
    expect(check(sixMonths, [aDocument('2026-01-01')], { submittedOn: null }).outcome).toBe('undecided');
  });

  it('counts to the letting date or to a fixed date where the rule says so', () => {
    const on = (date: string) => check({ maximumAgeMonths: 6, on: date }, [aDocument('2025-07-20')]).outcome;
    expect([on('letting'), on('submitted'), on('2026-01-20'), on('2026-01-21')]).toEqual([
      'pass',
      'fail',
      'pass',
      'fail',
    ]);
  });

  it('takes the newest one', () => {
    const documents = [aDocument('2024-01-01'), aDocument('2026-01-01'), aDocument('2025-01-01')];
    expect(check(sixMonths, documents)).toMatchObject({
      outcome: 'pass',
      observed: { text: '1 January 2026', count: 3 },
    });
  });

  it('does not fail an old one while another without a date may be newer', () => {
    expect(check(sixMonths, [aDocument('2024-01-01'), aDocument(null)]).outcome).toBe('undecided');
  });

  it('passes a stated one of any date where no age is asked', () => {
    expect(check({}, [aDocument(null)])).toMatchObject({
      outcome: 'pass',
      sentence: 'Binder certificate is stated.',
    });
  });

  it('does not show one that is stated only where it must be enclosed', () => {
    expect(check({ enclosed: true }, [aDocument('2026-01-01')])).toMatchObject({
      outcome: 'not shown',
      reason: 'It is stated, but not enclosed.',
    });
    expect(check({ enclosed: true }, [aDocument('2026-01-01', { enclosed: true })]).outcome).toBe('pass');
  });

  it('fails one whose own validity ended before the stated date', () => {
    expect(check(sixMonths, [aDocument('2026-01-01', { validTo: '2026-03-08' })]).outcome).toBe('fail');
    expect(check(sixMonths, [aDocument('2026-01-01', { validTo: '2026-03-09' })]).outcome).toBe('pass');
  });
});
