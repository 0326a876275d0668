import { describe, expect, it } from 'vitest';
import type { Analysis } from '#rules/engine/analysis';
import { addMonths } from '#rules/engine/calendar';
import { canonicalText } from '#rules/engine/canonical-text';
import { recommendDisposition, summarise } from '#rules/engine/disposition';
import { ENGINE_VERSION } from '#rules/engine/engine-version';
import { evaluate } from '#rules/engine/evaluate';
import { evaluateRule } from '#rules/engine/evaluate-rule';
import { findingKey } from '#rules/engine/finding';
import { naturalOrder } from '#rules/engine/natural-order';
import { sealOf } from '#rules/engine/seal';
import { worldOf } from '#rules/engine/world';
import { aFinding } from '#tests/builders/a-finding';
import { aReading, replicates } from '#tests/builders/a-reading';
import { aContext, aRecord, attributes } from '#tests/builders/a-record';
import { anEdition, aRule } from '#tests/builders/a-rule-set';
import fc from '#tests/builders/seeded-fast-check';
import { checkWith } from './check-with';

const nothingComputed: Analysis = {
  recomputed: [],
  designPoint: {
    declaredBinderContent: null,
    computedBinderContent: null,
    targetAirVoids: 4,
    fit: 'quadratic',
    trial: null,
  },
  testedContents: [],
  creepFailures: [],
};

describe('the recommended disposition', () => {
  const of = (overrides: object, waived: string[] = []) =>
    recommendDisposition([aFinding({ outcome: 'pass', ...overrides })], new Set(waived));

  it.each([
    ['required', 'pass', false, 'approved'],
    ['required', 'pass', true, 'approved as noted'],
    ['required', 'fail', false, 'revise and resubmit'],
    ['required', 'not shown', false, 'revise and resubmit'],
    ['required', 'undecided', false, 'revise and resubmit'],
    ['required', 'not applicable', false, 'approved'],
    ['advisory', 'pass', false, 'approved'],
    ['advisory', 'pass', true, 'approved'],
    ['advisory', 'fail', false, 'approved as noted'],
    ['advisory', 'not shown', false, 'approved as noted'],
    ['advisory', 'undecided', false, 'approved as noted'],
    ['advisory', 'not applicable', false, 'approved'],
  ] as const)('%s %s, borderline %s: %s', (severity, outcome, borderline, disposition) => {
    expect(of({ severity, outcome, borderline })).toBe(disposition);
  });

  it('is approved as noted where every required fail is waived', () => {
    expect(of({ severity: 'required', outcome: 'fail' }, ['vma~design point'])).toBe('approved as noted');
  });

  it('takes no waiver of what is not a fail', () => {
    expect(of({ severity: 'required', outcome: 'undecided' }, ['vma~design point'])).toBe(
      'revise and resubmit',
    );
    expect(of({ severity: 'required', outcome: 'not shown' }, ['vma~design point'])).toBe(
      'revise and resubmit',
    );
    expect(of({ outcome: 'pass' }, ['vma~design point'])).toBe('approved');
  });

  it('counts findings, and what does not add up by itself', () => {
    const findings = [
      aFinding(),
      aFinding({ rule: 'va', outcome: 'pass', borderline: true }),
      aFinding({ rule: 'consistency/blend', clause: null, kind: 'consistency' }),
    ];
    expect(summarise(findings)).toMatchObject({ pass: 1, fail: 2, borderline: 1, doesNotAddUp: 1 });
  });
});

describe('the order of findings', () => {
  it.each([
    ['412.03(b)', '412.03(k)'],
    ['412.2', '412.10'],
    ['412.03(z)', '412.03(aa)'],
    ['stockpile Coarse 2', 'stockpile Coarse 10'],
  ])('%s before %s', (first, second) => {
    expect(naturalOrder(first, second)).toBeLessThan(0);
    expect(naturalOrder(second, first)).toBeGreaterThan(0);
  });

  it('is clause, then subject, with what does not add up last', () => {
    const rules = [
      aRule({ id: 'b', clause: '1.10' }),
      aRule({ id: 'c', clause: '1.2' }),
      aRule({
        id: 'p',
        clause: '1.3',
        measure: { kind: 'reading', quantity: 'percent-passing' },
        limit: { max: '100' },
      }),
    ];
    const passing = (sieve: number, value: number) =>
      aReading({ quantity: 'percent-passing', value, at: { trial: 'design', sieve } });
    const { findings } = checkWith({
      edition: { rules },
      record: { readings: [passing(12.5, 80), passing(9.5, 90)] },
    });
    expect(findings.slice(0, 4).map(findingKey)).toEqual([
      'c~design point',
      'p~9.5 mm',
      'p~12.5 mm',
      'b~design point',
    ]);
    expect(findings.length).toBeGreaterThan(4);
    expect(
      findings.slice(4).every(({ clause, rule }) => clause === null && rule.startsWith('consistency/')),
    ).toBe(true);
  });
});

describe('the seal', () => {
  const record = aRecord({
    attributes: attributes({ course: 'surface' }),
    readings: replicates('maximum-specific-gravity', [2.5, 2.51]),
  });
  const edition = anEdition();
  const context = aContext();

  it('is the same for shuffled keys', () => {
    const shuffled = JSON.parse(JSON.stringify(reversedKeys(record)));
    expect(canonicalText(shuffled)).toBe(canonicalText(record));
    expect(evaluate(shuffled, edition, context).seal).toEqual(evaluate(record, edition, context).seal);
  });

  it('does not hang on who typed a value or when', () => {
    const typed = (by: string) =>
      evaluate(
        {
          ...record,
          readings: record.readings.map((each) => ({ ...each, typed: { by, on: '2026-03-01' } })),
        },
        edition,
        context,
      ).seal.seal;
    expect(typed('Ida Marsh')).toBe(typed('Tom Reed'));
  });

  it('does not hang on sentences', () => {
    const { findings, seal } = evaluate(record, edition, context);
    const reworded = findings.map((finding) => ({
      ...finding,
      sentence: 'x',
      reason: 'y',
      requirement: 'z',
      ruleSentence: 'r',
    }));
    expect(sealOf({ record, edition, context, findings: reworded })).toEqual(seal);
  });

  it.each([
    ['record', { record: aRecord({ attributes: attributes({ course: 'base' }) }) }],
    ['resolvedEdition', { edition: anEdition({ title: 'Another' }) }],
    ['context', { context: aContext({ submittedOn: null }) }],
    ['engineVersion', { engineVersion: '0.0.0' }],
    ['findings', { findings: [] }],
  ] as const)('moves with the %s, and only that hash', (part, change) => {
    const { findings } = evaluate(record, edition, context);
    const before = sealOf({ record, edition, context, findings });
    const after = sealOf({ record, edition, context, findings, ...change });
    expect(after[part]).not.toBe(before[part]);
    expect(after.seal).not.toBe(before.seal);
    const others = (['record', 'resolvedEdition', 'context', 'engineVersion', 'findings'] as const).filter(
      (each) => each !== part,
    );
    for (const each of others) expect(after[each]).toBe(before[each]);
  });

  it('names the engine version that made it', () => {
    expect(evaluate(record, edition, context).seal.engine).toBe(ENGINE_VERSION);
  });

  it('writes JSON as RFC 8785 does', () => {
    // RFC 8785, section 3.2.2, the example of that section.
    const sample = {
      numbers: [Number('333333333.33333329'), 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
      string: '€$\u000f\nA\'B"\\\\"/',
      literals: [null, true, false],
    };
    expect(canonicalText(sample)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
    expect(() => canonicalText({ value: Number.NaN })).toThrow(/not finite/);
  });
});

describe('safety of a verdict', () => {
  it('leaves a rule undecided where the engine itself fails, and says so', () => {
    const record = aRecord();
    Object.defineProperty(record.attributes, 'course', {
      enumerable: true,
      get() {
        throw new Error('broken');
      },
    });
    const edition = anEdition({
      rules: [
        aRule({ when: { fact: 'course', operator: 'equal', value: 'surface' } }),
        aRule({ id: 'other' }),
      ],
    });
    const world = worldOf({
      record,
      edition,
      context: aContext(),
      analysis: nothingComputed,
    });
    const [finding] = evaluateRule(world, edition.rules[0]!);
    expect(finding?.outcome).toBe('undecided');
    expect(finding?.reason).toContain('An internal error occurred');
  });

  it('throws on two findings with one key: that would be our error', () => {
    const edition = anEdition();
    const doubled = { ...edition, rules: [...edition.rules, ...edition.rules] };
    expect(() => evaluate(aRecord(), doubled, aContext())).toThrow(/key vma~design point/);
  });

  it('never passes what is not a number', () => {
    const reading = { ...aReading({ quantity: 'water-absorption', value: 1, at: {} }), value: Number.NaN };
    const edition = anEdition({
      rules: [aRule({ measure: { kind: 'reading', quantity: 'water-absorption' }, limit: { max: 2 } })],
    });
    const world = worldOf({
      record: { ...aRecord(), readings: [reading] },
      edition,
      context: aContext(),
      analysis: nothingComputed,
    });
    expect(evaluateRule(world, edition.rules[0]!)[0]?.outcome).toBe('undecided');
  });
});

describe('properties of any check', () => {
  const gmm = fc.array(fc.integer({ min: 2400, max: 2600 }), { minLength: 1, maxLength: 5 });
  const rules = [
    aRule({
      id: 'mean',
      clause: '1',
      measure: { kind: 'reading', quantity: 'maximum-specific-gravity' },
      limit: { min: '2.500' },
    }),
    aRule({
      id: 'range',
      clause: '2',
      measure: { kind: 'reading', quantity: 'maximum-specific-gravity', statistic: 'range' },
      limit: { max: '0.050' },
    }),
  ];

  it('the order of readings changes no finding', () => {
    fc.assert(
      fc.property(gmm, fc.nat(), (values, turn) => {
        const readings = replicates(
          'maximum-specific-gravity',
          values.map((value) => value / 1000),
        );
        const turned = [
          ...readings.slice(turn % readings.length),
          ...readings.slice(0, turn % readings.length),
        ];
        const outcomes = (list: typeof readings) =>
          checkWith({ edition: { rules }, record: { readings: list } }).findings.map((each) => [
            findingKey(each),
            each.outcome,
            each.observed?.rounded,
          ]);
        expect(outcomes(turned)).toEqual(outcomes(readings));
      }),
      { numRuns: 60 },
    );
  });

  it('a condition said twice changes no outcome', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('surface', 'base', null),
        fc.constantFrom('all', 'any'),
        (course, group) => {
          const leaf = { fact: 'course', operator: 'equal' as const, value: 'surface' };
          const record = {
            attributes: course === null ? {} : attributes({ course }),
            readings: [aReading({ quantity: 'voids-in-mineral-aggregate', value: 14.2 })],
          };
          const outcome = (when: object) =>
            checkWith({ rule: { when } as object, record }).findings[0]?.outcome;
          expect(outcome({ [group]: [leaf, leaf, leaf] })).toBe(outcome(leaf));
        },
      ),
    );
  });

  it('no rule passes once what it needs is taken away or put in doubt', () => {
    fc.assert(
      fc.property(fc.double({ min: 10, max: 20, noNaN: true }), fc.boolean(), (value, doubted) => {
        const record = {
          attributes: attributes({ course: 'surface' }),
          readings: [aReading({ quantity: 'voids-in-mineral-aggregate', value })],
        };
        const doubt = { sheet: 'S', cell: 'A1', text: '?', reason: 'unclear', alternatives: [] };
        const when = { fact: 'course', operator: 'equal' as const, value: 'surface' };
        const without = [
          {
            ...record,
            attributes: {},
            doubts: doubted ? [{ ...doubt, about: { attribute: 'course' } }] : [],
          },
          {
            ...record,
            readings: [],
            doubts: doubted
              ? [{ ...doubt, about: { quantity: 'voids-in-mineral-aggregate', at: { trial: 'design' } } }]
              : [],
          },
        ];
        for (const each of without) {
          expect(['not shown', 'undecided']).toContain(
            checkWith({ rule: { when }, record: each }).findings[0]?.outcome,
          );
        }
      }),
      { numRuns: 40 },
    );
  });
});

describe('adding months', () => {
  it.each([
    ['2026-01-31', 1, '2026-02-28'],
    ['2027-11-30', 3, '2028-02-29'],
    ['2026-12-15', 1, '2027-01-15'],
    ['2024-02-29', 12, '2025-02-28'],
    ['1899-12-31', 2, '1900-02-28'],
    ['1999-12-31', 2, '2000-02-29'],
  ])('%s and %s months is %s', (date, months, later) => {
    expect(addMonths(date, months)).toBe(later);
  });
});

function reversedKeys(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reversedKeys);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, member]) => [key, reversedKeys(member)]),
  );
}
