import { describe, expect, it } from 'vitest';
import { earliestDate } from '#rules/engine/calendar';
import { evaluate } from '#rules/engine/evaluate';
import { explainFindings } from '#rules/engine/explain';
import type { ToPass } from '#rules/engine/explanation';
import { type Finding, findingKey } from '#rules/engine/finding';
import type { MixRecordInput, Reading } from '#rules/record';
import type { RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { aCreepTest, curveAtMinusTen } from '#tests/builders/a-creep-test';
import { aContext, aRecord, attributes } from '#tests/builders/a-record';
import { anEdition, aRule } from '#tests/builders/a-rule-set';
import fc from '#tests/builders/seeded-fast-check';
import { aggregateReadings, reading, trialReadings } from './analysis-record';

function asked(rule: RuleInput, record: MixRecordInput, edition: Partial<RuleSetInput> = {}) {
  const resolved = anEdition({ rules: [rule], ...edition });
  const context = aContext({ submittedOn: '2026-03-09', lettingOn: '2026-01-14' });
  const whole = aRecord(record);
  const { findings } = evaluate(whole, resolved, context);
  const finding = findings.find((each) => each.rule === rule.id);
  if (!finding) throw new Error(`No finding of ${rule.id}.`);
  const explanations = explainFindings({ record: whole, edition: resolved, context, findings });
  return { finding, ways: explanations[findingKey(finding)]?.toPass ?? [] };
}

const words = (ways: readonly ToPass[]) => ways.map((way) => way.words);

function nearOf({ from, to, present }: ToPass): number {
  const near = from !== null && from > (present ?? 0) ? from : to;
  if (near === null) throw new Error('A way has no end.');
  return near;
}

function formula(
  expression: string,
  limit: RuleInput['limit'],
  overrides: Partial<RuleInput> = {},
): RuleInput {
  return aRule({
    id: 'formula',
    measure: { kind: 'formula', expression, at: { trial: 'design' } },
    limit,
    rounding: { method: 'rounding', to: 0.01 },
    ...overrides,
  });
}

const design = () => [...trialReadings('design'), ...aggregateReadings()];

/** The readings with another value for one quantity of the design. */
function withValue(readings: Reading[], quantity: string, value: number): Reading[] {
  return readings.map((each) =>
    each.quantity === quantity
      ? { ...each, value, source: { sheet: 'Trials', cell: 'Z1', text: value.toFixed(3) } }
      : each,
  );
}

describe('a formula', () => {
  it('moves each reading behind its symbols, in all of them at once', () => {
    // Gmm − Gmb is 2.492 − 2.392 = 0.100; at most 0.09 passes below 0.095, which rounds to the even 0.10: Gmb above 2.397,
    // Gmm below 2.487.
    const { finding, ways } = asked(formula('Gmm - Gmb', { max: '0.09' }), { readings: design() });
    expect(finding.outcome).toBe('fail');
    expect(words(ways)).toEqual([
      'Gmb of 2.398 or more instead of 2.392 (mean of 2)',
      'Gmm of 2.486 or less instead of 2.492',
    ]);
  });

  it('is silent on a reading that the value follows both ways, and on one that no plausible number mends', () => {
    const both = asked(formula('abs(Gmb - 2.39) + 1', { max: '0.5' }), { readings: design() });
    expect([both.finding.outcome, words(both.ways)]).toEqual(['fail', []]);
    const never = asked(formula('Gmb', { min: '9' }), { readings: design() });
    expect([never.finding.outcome, words(never.ways)]).toEqual(['fail', []]);
  });

  it('never asks to move what the binder brings or what is only weighed', () => {
    const { ways } = asked(formula('Vbe', { min: '14' }), { readings: design() });
    expect(ways.length).toBeGreaterThan(0);
    expect(ways.map(({ quantity }) => quantity)).not.toContain('binder-specific-gravity');
  });

  it('reads another binder content where its symbols follow it', () => {
    const trial = (name: string, binder: number, gmb: number) => [
      reading('binder-content', binder, { trial: name }),
      reading('maximum-specific-gravity', 2.5, { trial: name }),
      reading('bulk-specific-gravity-mix', gmb, { trial: name, specimen: '1' }),
    ];
    // Va is 17.5 − 2.5·Pb: Pb/Va of 1.5 or more from 5.5263 on.
    const readings = [...trial('A', 5, 2.375), ...trial('B', 6, 2.4375), reading('binder-content', 5.2)];
    const rule = formula('Pb/Va', { min: '1.5' }, { rounding: { method: 'absolute' } });
    expect(words(asked(rule, { readings }).ways)).toEqual([
      'Pb of 5.53 to 6.00 % instead of 5.20 (read between the trials)',
    ]);
  });

  it('is true: with that reading the rule passes, and one digit nearer it does not', () => {
    const anything = fc.record({
      expression: fc.constantFrom(
        'Va',
        'Gmm - Gmb',
        'Gmb/Gmm*100',
        'Va/VMA',
        'VMA - Va',
        'sqrt(Va)',
        'Gse - Gsb',
      ),
      isLeast: fc.boolean(),
      share: fc.integer({ min: 80, max: 120 }),
      to: fc.constantFrom(0.001, 0.01, 0.1),
      gmb: fc.integer({ min: 2300, max: 2450 }),
    });
    let moved = 0;
    fc.assert(
      fc.property(anything, ({ expression, isLeast, share, to, gmb }) => {
        const readings = withValue(design(), 'bulk-specific-gravity-mix', gmb / 1000);
        const now = asked(formula(expression, { min: '-1000' }), { readings }).finding.observed?.value ?? 0;
        const end = ((now * share) / 100).toFixed(3);
        const rule = formula(expression, isLeast ? { min: end } : { max: end }, {
          rounding: { method: 'rounding', to },
        });
        for (const way of asked(rule, { readings }).ways) {
          const near = nearOf(way);
          const back = near > (way.present ?? 0) ? -0.001 : 0.001;
          const outcome = (value: number) =>
            asked(rule, { readings: withValue(readings, way.quantity, Number(value.toFixed(3))) }).finding
              .outcome;
          expect([way.words, outcome(near), outcome(near + back)]).toEqual([way.words, 'pass', 'fail']);
          moved += 1;
        }
      }),
      { numRuns: 40 },
    );
    expect(moved).toBeGreaterThan(10);
  }, 120_000);
});

describe('creep compliance', () => {
  const creep = (limit: RuleInput['limit'], measure: object = {}): RuleInput =>
    aRule({
      id: 'creep',
      measure: { kind: 'creep-compliance', temperature: -10, time: 100, ...measure },
      limit,
      rounding: { method: 'rounding', to: '0.001' },
    });
  const stated = (values: number[]) =>
    values.map((value, place) =>
      reading('creep-compliance', value, { temperature: -10, time: 100, specimen: `${place + 1}` }),
    );

  it('as measured names the mean and the specimen farthest out', () => {
    // Mean 0.096. At least 0.100 passes from a mean of 0.0995 (0.100, half to even): 0.100 in three decimals. Alone,
    // specimen 2 has to bring the sum of three to 0.2985: 0.2985 − 0.200 is 0.0985, 0.099 in three decimals.
    const { ways } = asked(creep({ min: '0.100' }), { readings: stated([0.1, 0.088, 0.1]) });
    expect(words(ways)).toEqual([
      'creep compliance at −10 °C at 100 s of 0.100 1/GPa or more instead of 0.096 (mean of 3)',
      'creep compliance at −10 °C at 100 s, specimen 2 of 0.099 1/GPa or more instead of 0.088',
    ]);
  });

  it('speaks of strain where strain was read', () => {
    // 20.0 µε under 200 kPa is 0.100; at most 0.090 passes below 0.0905 (0.090, half to even): 18.1 µε.
    const readings = [
      reading('creep-strain', 20, { temperature: -10, time: 100, stress: 200, specimen: '1' }),
    ];
    expect(words(asked(creep({ max: '0.090' }), { readings }).ways)).toEqual([
      'creep strain at −10 °C at 100 s at 200 kPa of 18.1 µε or less instead of 20.0',
    ]);
  });

  it('on a curve says by what factor every compliance would have to change', () => {
    // 0.1201664 on the curve at 100 s; at least 0.150 passes from 0.1495 on: 1.2441 times, 1.25 in two decimals.
    const rule = creep({ min: '0.150' }, { source: 'fitted' });
    const { ways } = asked(rule, { readings: aCreepTest({ specimens: [1, 1, 1] }) });
    expect(words(ways)).toEqual(['every creep compliance at −10 °C times 1.25 or more']);
    const outcomeAt = (factor: number) =>
      asked(rule, {
        readings: aCreepTest({ specimens: [1, 1, 1], compliance: (t) => factor * curveAtMinusTen(t) }),
      }).finding.outcome;
    expect([outcomeAt(1.25), outcomeAt(1.24)]).toEqual(['pass', 'fail']);
  });

  it('says both ends of a band, as the nearer and the farther factor', () => {
    // 0.1201664·f from 0.1495 to 0.2005: 1.2441 to 1.6685.
    const rule = creep({ min: '0.150', max: '0.200' }, { source: 'fitted' });
    const { ways } = asked(rule, { readings: aCreepTest({ specimens: [1, 1, 1] }) });
    expect(words(ways)).toEqual(['every creep compliance at −10 °C times 1.25 to 1.66']);
  });

  it('is true for any readings and limit, by mean, by specimen and by bound', () => {
    const anything = fc.record({
      factors: fc.array(fc.integer({ min: 90, max: 110 }), { minLength: 1, maxLength: 3 }),
      limit: fc.integer({ min: 40, max: 300 }),
      isLeast: fc.boolean(),
      measure: fc.constantFrom(
        {},
        { source: 'fitted' },
        { source: 'fitted', use: 'upper' },
        { use: 'lower' },
      ),
    });
    let moved = 0;
    fc.assert(
      fc.property(anything, ({ factors, limit, isLeast, measure }) => {
        const end = (limit / 1000).toFixed(3);
        const rule = creep(isLeast ? { min: end } : { max: end }, measure);
        const test = (factor: number) =>
          aCreepTest({ specimens: factors.map((each) => (each / 100) * factor), as: 'compliance' });
        const readings = test(1);
        for (const way of asked(rule, { readings }).ways) {
          const near = nearOf(way);
          const isAlone = way.name.includes('specimen');
          const one = /specimen (\d)/.exec(way.name)?.[1];
          const changed =
            way.unit === '1'
              ? readings.map((each) => ({ ...each, value: (each.value ?? 0) * near }))
              : readings.map((each) =>
                  each.at.time === 100 && (!isAlone || each.at.specimen === one)
                    ? { ...each, value: near }
                    : each,
                );
          expect([way.words, asked(rule, { readings: changed }).finding.outcome]).toEqual([
            way.words,
            'pass',
          ]);
          moved += 1;
        }
      }),
      { numRuns: 40 },
    );
    expect(moved).toBeGreaterThan(15);
  }, 120_000);
});

describe('a document', () => {
  const certificate = (measure: object = {}): RuleInput =>
    aRule({
      id: 'certificate',
      measure: {
        kind: 'document',
        type: 'binder-certificate',
        maximumAgeMonths: 6,
        on: 'submitted',
        ...measure,
      },
      limit: { present: true },
    });
  const of = (
    rule: RuleInput,
    documents: MixRecordInput['documents'] = [],
  ): [Finding['outcome'], string[]] => {
    const { finding, ways } = asked(rule, { documents });
    return [finding.outcome, words(ways)];
  };
  const type = 'binder-certificate';

  it('that is too old says which dates would do, and they do', () => {
    expect(of(certificate(), [{ type, date: '2025-09-08' }])).toEqual([
      'fail',
      ['binder certificate dated 9 September 2025 to 9 March 2026 instead of 8 September 2025'],
    ]);
    expect(of(certificate(), [{ type, date: '2025-09-09' }])).toEqual(['pass', []]);
  });

  it('that is not shown is named with its dates, enclosed where that is asked for', () => {
    expect(of(certificate())).toEqual([
      'not shown',
      ['binder certificate dated 9 September 2025 to 9 March 2026'],
    ]);
    expect(of(certificate({ enclosed: true, on: 'letting' }), [{ type, date: '2025-12-01' }])).toEqual([
      'not shown',
      ['binder certificate enclosed, dated 14 July 2025 to 14 January 2026'],
    ]);
    const plain = aRule({ id: 'plain', measure: { kind: 'document', type }, limit: { present: true } });
    expect(of(plain)).toEqual(['not shown', ['binder certificate stated']]);
  });

  it('that ran out has to be valid on the day', () => {
    expect(of(certificate(), [{ type, date: '2026-01-20', validTo: '2026-03-01' }])[1]).toEqual([
      'binder certificate dated 9 September 2025 to 9 March 2026 and valid on 9 March 2026 instead of to 1 March 2026',
    ]);
  });

  it.each([
    // By the calendar: 28 February + 1 month is 28 March, before the 31st; 1 March + 1 month is 1 April.
    ['2026-03-31', 1, '2026-03-01'],
    ['2026-03-28', 1, '2026-02-28'],
    ['2026-02-28', 12, '2025-02-28'],
    ['2028-02-29', 12, '2027-03-01'],
    ['2026-01-31', 2, '2025-12-01'],
    ['2026-01-31', 1, '2025-12-31'],
  ])('for %s and %d months is dated %s at the earliest', (on, months, earliest) => {
    expect(earliestDate(on, months)).toBe(earliest);
  });
});

describe('an attribute', () => {
  const rule = (limit: RuleInput['limit'], attribute = 'grade'): RuleInput =>
    aRule({ id: 'attribute', measure: { kind: 'attribute', attribute }, limit });
  const edition: Partial<RuleSetInput> = {
    attributes: [
      { name: 'grade', label: 'Binder grade', type: 'text', values: ['PG 64-22', 'PG 70-22', 'PG 58-28'] },
      { name: 'size', label: 'Nominal size', type: 'number', unit: 'mm', values: [9.5, 12.5, 19] },
      { name: 'blows', label: 'Compaction blows', type: 'number', unit: 'blows' },
    ],
  };
  const of = (limit: RuleInput['limit'], attribute: string, value: number | string) =>
    words(asked(rule(limit, attribute), { attributes: attributes({ [attribute]: value }) }, edition).ways);

  it('names the values that are allowed', () => {
    expect(of({ oneOf: ['PG 64-22', 'PG 70-22'] }, 'grade', 'PG 58-28')).toEqual([
      'binder grade of PG 64-22 or PG 70-22 instead of PG 58-28',
    ]);
  });

  it('of a closed list names those of its own that lie inside', () => {
    expect(of({ max: 13 }, 'size', 19)).toEqual(['nominal size of 9.5 mm or 12.5 mm instead of 19 mm']);
    expect(of({ max: 9 }, 'size', 19)).toEqual([]);
  });

  it('that is an open number names the nearest end', () => {
    expect(of({ target: 75, tolerance: 0 }, 'blows', 50)).toEqual([
      'compaction blows of 75 blows instead of 50',
    ]);
    expect(of({ min: 50, max: 75 }, 'blows', 112)).toEqual([
      'compaction blows of 50 to 75 blows instead of 112',
    ]);
  });
});

it('asks first for what a designer sets and last for what the materials bring', () => {
  const readings = [...design(), reading('percent-passing', 9, { trial: 'design', sieve: 0.075 })];
  const rule = aRule({
    id: 'dust',
    measure: { kind: 'reading', quantity: 'dust-proportion', at: { trial: 'design' } },
    limit: { max: '1.2' },
    rounding: { method: 'rounding', to: 0.1 },
  });
  const order = asked(rule, { readings }).ways.map(({ quantity }) => quantity);
  expect(order[0]).toBe('percent-passing');
  expect(order).not.toContain('binder-specific-gravity');
});

it('counts only specimens that the rule’s conditions admit', () => {
  const rule = aRule({
    id: 'strength',
    measure: {
      kind: 'reading',
      quantity: 'flow-number',
      at: { trial: 'design' },
      where: [{ quantity: 'air-voids', at: { trial: 'design' }, min: '6.5', max: '7.5' }],
    },
    limit: { min: '190' },
    rounding: { method: 'rounding', to: 1 },
  });
  const specimen = (name: string, flow: number, voids: number) => [
    reading('flow-number', flow, { trial: 'design', specimen: name }),
    reading('air-voids', voids, { trial: 'design', specimen: name }),
  ];
  const readings = [...specimen('1', 180, 7), ...specimen('2', 190, 7.1), ...specimen('3', 400, 5)];
  expect(words(asked(rule, { readings }).ways)).toEqual([
    'flow number of 190 cycles or more instead of 185 (mean of 2)',
  ]);
});

describe('single values', () => {
  const of = (measure: object, limit: RuleInput['limit'], values: number[]) => {
    const rule = aRule({
      id: 'single',
      measure: { kind: 'reading', quantity: 'flow-number', at: { trial: 'design' }, ...measure },
      limit,
      rounding: { method: 'rounding', to: 1 },
    });
    const readings = values.map((value, place) =>
      reading('flow-number', value, { trial: 'design', specimen: `${place + 1}` }),
    );
    const { finding, ways } = asked(rule, { readings });
    return [finding.outcome, words(ways)];
  };

  it('that are outside have to move together', () => {
    expect(of({ statistic: 'each' }, { min: '50' }, [40, 60, 45])).toEqual([
      'fail',
      [
        'flow number, specimen 1 of 50 cycles or more instead of 40 and flow number, specimen 3 of 50 cycles or more instead of 45',
      ],
    ]);
    expect(of({ statistic: 'max' }, { max: '50' }, [60, 40, 55])[1]).toEqual([
      'flow number, specimen 1 of 50 cycles or less instead of 60 and flow number, specimen 3 of 50 cycles or less instead of 55',
    ]);
  });

  it('of a least or a greatest are moved alone where one suffices', () => {
    expect(of({ statistic: 'max' }, { min: '70' }, [60, 40])[1]).toEqual([
      'flow number, specimen 1 of 70 cycles or more instead of 60',
    ]);
    expect(of({ statistic: 'min' }, { max: '30' }, [60, 40])[1]).toEqual([
      'flow number, specimen 2 of 30 cycles or less instead of 40',
    ]);
  });

  it('beside a mean are named where the mean itself holds, and nothing where both are outside', () => {
    const beside = { statistic: 'mean', alsoEach: { min: '20' } };
    expect(of(beside, { min: '50' }, [10, 90, 80])).toEqual([
      'fail',
      ['flow number, specimen 1 of 20 cycles or more instead of 10'],
    ]);
    expect(of(beside, { min: '50' }, [30, 40, 50])[1]).toEqual([
      'flow number of 50 cycles or more instead of 40 (mean of 3)',
    ]);
    expect(of(beside, { min: '50' }, [10, 20, 30])[1]).toEqual([]);
  });
});
