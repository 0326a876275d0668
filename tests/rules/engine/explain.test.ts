import { describe, expect, it } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import { explainFindings } from '#rules/engine/explain';
import type { Explanation } from '#rules/engine/explanation';
import { type Finding, findingKey } from '#rules/engine/finding';
import { RULE_WORDS } from '#rules/engine/obstacle';
import { toPassWords } from '#rules/engine/to-pass';
import type { MixRecord, Reading } from '#rules/record';
import type { LayerInput, RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import edition2026 from '#rules/sets/cvra-412-2026.json';
import { shippedRuleSets } from '#rules/sets/shipped-rule-sets';
import { aContext, aRecord, attributes } from '#tests/builders/a-record';
import { aLayer, anEdition, aRule } from '#tests/builders/a-rule-set';
import fc from '#tests/builders/seeded-fast-check';
import { aggregateReadings, reading, trialReadings } from './analysis-record';

interface Asked {
  rules: RuleInput[];
  readings: Reading[];
  edition?: Partial<RuleSetInput>;
  layers?: LayerInput[];
  values?: Record<string, number | string | boolean>;
}

function explained({ rules, readings, edition = {}, layers = [], values = {} }: Asked) {
  const resolved = anEdition({ rules, ...edition }, layers);
  const record = aRecord({ readings, attributes: attributes(values) });
  const context = aContext();
  const { findings } = evaluate(record, resolved, context);
  const explanations = explainFindings({ record, edition: resolved, context, findings });
  const of = (rule: string): { finding: Finding; explanation: Explanation } => {
    const finding = findings.find((each) => each.rule === rule);
    if (!finding) throw new Error(`No finding of ${rule}.`);
    return { finding, explanation: explanations[findingKey(finding)] ?? { whyThisLimit: null, toPass: [] } };
  };
  const again = (changed: Reading[]): Finding | undefined =>
    evaluate(aRecord({ readings: changed, attributes: attributes(values) }), resolved, context).findings.find(
      ({ rule }) => rule === rules[0]?.id,
    );
  return { of, again };
}

const volumetric = (quantity: string, limit: RuleInput['limit'], to = 0.1): RuleInput =>
  aRule({
    id: 'rule',
    measure: { kind: 'reading', quantity, at: { trial: 'design' } },
    limit,
    rounding: { method: 'rounding', to },
  });

const design = () => [...trialReadings('design'), ...aggregateReadings()];

describe('to pass', () => {
  it('moves each raw reading alone, in the digits that the laboratory writes', () => {
    // Va is 100·(2.492 − 2.392)/2.492 = 4.01. At most 3.5 passes below 3.55: Gmb above 2.492·0.9645 = 2.40353;
    // Gmm below 2.392/0.9645 = 2.48004. A least is not set, so that each is open on the far side.
    const { of } = explained({ rules: [volumetric('air-voids', { max: '3.5' })], readings: design() });
    expect(of('rule').finding.outcome).toBe('fail');
    expect(of('rule').explanation.toPass.map(({ words }) => words)).toEqual([
      'Gmb of 2.404 or more instead of 2.392 (mean of 2)',
      'Gmm of 2.480 or less instead of 2.492',
    ]);
    expect(toPassWords(of('rule').explanation.toPass)).toBe(
      'Gmb of 2.404 or more instead of 2.392 (mean of 2); or Gmm of 2.480 or less instead of 2.492.',
    );
  });

  it('says both ends where the limit has two', () => {
    // 5.0 to 6.0 passes from 4.95 (half to even: 5.0) to 6.05 (6.0): Gmb 2.492·0.9505 = 2.36865 to 2.492·0.9395 = 2.34123.
    const { of } = explained({
      rules: [volumetric('air-voids', { min: '5.0', max: '6.0' })],
      readings: design(),
    });
    expect(of('rule').explanation.toPass[0]).toMatchObject({
      quantity: 'bulk-specific-gravity-mix',
      from: 2.342,
      to: 2.368,
    });
  });

  it('is true: with that reading the rule passes, and one digit nearer it does not', () => {
    const rule = volumetric('voids-filled-with-asphalt', { min: '75' }, 1);
    const { of, again } = explained({ rules: [rule], readings: design() });
    const ways = of('rule').explanation.toPass.filter(({ quantity }) => quantity !== 'binder-content');
    expect(ways.map(({ name }) => name).toSorted()).toEqual(['Gmb', 'Gmm', 'Gsb']);
    for (const { quantity, present, from, to } of ways) {
      const near = from !== null && from > (present ?? 0) ? from : to;
      if (near === null || present === null) throw new Error('A way has no end.');
      const back = near > present ? -0.001 : 0.001;
      const withValue = (value: number) =>
        design().map((each) =>
          each.quantity === quantity ? { ...each, value: Number(value.toFixed(3)) } : each,
        );
      expect([quantity, again(withValue(near))?.outcome]).toEqual([quantity, 'pass']);
      expect([quantity, again(withValue(near + back))?.outcome]).toEqual([quantity, 'fail']);
    }
  });

  it('reads another binder content between the trials, where every chosen rule holds', () => {
    const trial = (name: string, binder: number, gmb: number) => [
      reading('binder-content', binder, { trial: name }),
      reading('maximum-specific-gravity', 2.5, { trial: name }),
      reading('bulk-specific-gravity-mix', gmb, { trial: name, specimen: '1' }),
    ];
    // Air voids 5 at 5.0 and 2.5 at 6.0: at most 4.0 passes below 4.05, from 5.38 on.
    const readings = [...trial('A', 5, 2.375), ...trial('B', 6, 2.4375), reading('binder-content', 5.2)];
    const rule = volumetric('air-voids', { max: '4.0' });
    const least = aRule({
      id: 'content',
      measure: { kind: 'reading', quantity: 'binder-content', at: { trial: 'design' } },
      limit: { max: '5.60' },
      rounding: { method: 'absolute' },
    });
    const alone = explained({ rules: [rule], readings }).of('rule');
    expect(alone.explanation.toPass.map(({ words }) => words)).toEqual([
      'Pb of 5.38 to 6.00 % instead of 5.20 (read between the trials)',
    ]);
    const edition = { roomToMove: ['rule', 'content'] };
    const chosen = explained({ rules: [rule, least], readings, edition }).of('rule');
    expect(chosen.explanation.toPass[0]?.words).toBe(
      'Pb of 5.38 to 5.60 % instead of 5.20 (the room to move)',
    );
  });

  it('names a measured quantity by its label, and the specimens that are outside', () => {
    const rules = [
      aRule({
        id: 'sand',
        measure: { kind: 'reading', quantity: 'sand-equivalent' },
        limit: { min: '45' },
        rounding: { method: 'rounding', to: 1 },
      }),
      aRule({
        id: 'saturation',
        measure: { kind: 'reading', quantity: 'degree-of-saturation', statistic: 'each' },
        limit: { min: '70', max: '80' },
        rounding: { method: 'rounding', to: 1 },
      }),
      aRule({
        id: 'count',
        measure: { kind: 'reading', quantity: 'rap-binder-content', statistic: 'count' },
        limit: { min: 3 },
      }),
      aRule({
        id: 'range',
        measure: { kind: 'reading', quantity: 'rap-binder-content', statistic: 'range' },
        limit: { max: '0.1' },
      }),
    ];
    const { of } = explained({
      rules,
      readings: [
        reading('sand-equivalent', 43),
        ...[72, 82, 75].map((value, place) =>
          reading('degree-of-saturation', value, { specimen: `W${place + 1}` }),
        ),
        ...[4.6, 4.9].map((value, place) =>
          reading('rap-binder-content', value, { specimen: `${place + 1}` }),
        ),
      ],
    });
    const words = (rule: string) => of(rule).explanation.toPass.map((way) => way.words);
    expect(words('sand')).toEqual(['sand equivalent of 45 % or more instead of 43']);
    expect(words('saturation')).toEqual(['degree of saturation, specimen W2 of 70 to 80 % instead of 82']);
    expect(words('count')).toEqual(['3 results or more instead of 2']);
    // Either end of 4.6 to 4.9 may come within 0.1 of the other.
    expect(words('range')).toEqual([
      'binder content of the reclaimed asphalt pavement, specimen 2 of 4.5 to 4.7 % instead of 4.9',
      'binder content of the reclaimed asphalt pavement, specimen 1 of 4.8 to 5.0 % instead of 4.6',
    ]);
  });

  it('moves the percent passing of a sieve to its control point', () => {
    const { of } = explained({
      rules: [
        aRule({
          id: 'control',
          measure: { kind: 'gradation', table: 'control', at: { trial: 'design' } },
          limit: { min: { table: 'control', column: 'min' }, max: { table: 'control', column: 'max' } },
          rounding: { method: 'rounding', to: 'limit' },
        }),
      ],
      edition: {
        tables: [
          {
            id: 'control',
            keys: ['sieve'],
            columns: [
              { name: 'min', unit: '%' },
              { name: 'max', unit: '%' },
            ],
            rows: [{ sieve: 2.36, min: '28', max: '58' }],
          },
        ],
      },
      readings: [reading('percent-passing', 61, { trial: 'design', sieve: 2.36 }, { text: '61' })],
    });
    expect(of('control').explanation.toPass.map(({ words }) => words)).toEqual([
      'percent passing 2.36 mm of 28 to 58 % instead of 61',
    ]);
  });

  it('brings the contractor to the agency, and the reported value to the recomputed', () => {
    const rules = [
      aRule({
        id: 'agency',
        measure: {
          kind: 'difference',
          quantity: 'maximum-specific-gravity',
          between: ['contractor', 'agency'],
        },
        limit: { max: '0.020' },
        rounding: { method: 'rounding', to: 0.001 },
      }),
      aRule({
        id: 'reported',
        measure: { kind: 'difference', quantity: 'air-voids', between: ['reported', 'recomputed'] },
        limit: { max: '0.2' },
        rounding: { method: 'rounding', to: 0.1 },
      }),
    ];
    const { of } = explained({
      rules,
      readings: [
        ...design(),
        reading('maximum-specific-gravity', 2.52, { laboratory: 'agency' }),
        reading('air-voids', 4.8, { trial: 'design' }, { origin: 'reported' }),
      ],
    });
    // 2.520 ± 0.0205, half to even: 2.4995 makes 0.0205, which rounds to 0.020.
    expect(of('agency').explanation.toPass[0]).toMatchObject({ present: 2.492, from: 2.5, to: 2.54 });
    // Recomputed 4.0128; a difference of 0.25 rounds to 0.2: 3.7628 to 4.2628.
    expect(of('reported').explanation.toPass.map(({ words }) => words)).toEqual([
      'the reported air voids of 3.8 to 4.2 % instead of 4.8',
    ]);
  });

  it('says nothing of a pass, of a censored result or where nothing plausible would do', () => {
    const rule = (limit: RuleInput['limit']) =>
      aRule({ id: 'rule', measure: { kind: 'reading', quantity: 'sand-equivalent' }, limit });
    const words = (limit: RuleInput['limit'], result: Reading) =>
      explained({ rules: [rule(limit)], readings: [result] }).of('rule').explanation.toPass;
    expect(words({ min: '40' }, reading('sand-equivalent', 43))).toEqual([]);
    expect(words({ min: '45' }, reading('sand-equivalent', 40, {}, { qualifier: '<', text: '<40' }))).toEqual(
      [],
    );
    expect(words({ min: '101' }, reading('sand-equivalent', 43))).toEqual([]);
  });
});

it('explains whatever there is, and only what fails, without stumbling over impossible data', () => {
  const edition = anEdition(edition2026 as unknown as Partial<RuleSetInput>);
  const value = fc.oneof(
    fc.constantFrom(0, -1, 1e-9, 1e9, 2.4, 2.5, 5, 100),
    fc.double({ min: -10, max: 5000, noNaN: true }),
  );
  const anyReading = fc
    .record({
      quantity: fc.constantFrom(
        'binder-content',
        'binder-specific-gravity',
        'maximum-specific-gravity',
        'bulk-specific-gravity-mix',
        'bulk-specific-gravity-aggregate',
        'percent-passing',
        'sand-equivalent',
        'tensile-strength-dry',
        'tensile-strength-conditioned',
        'air-voids',
      ),
      trial: fc.constantFrom('A', 'B', 'C', 'D', 'design'),
      specimen: fc.constantFrom(undefined, '1', '2'),
      sieve: fc.constantFrom(2.36, 0.075),
      value,
    })
    .map(({ quantity, trial, specimen, sieve, value: number }) =>
      reading(quantity, number, {
        trial,
        ...(specimen === undefined ? {} : { specimen }),
        ...(quantity === 'percent-passing' ? { sieve } : {}),
      }),
    );
  fc.assert(
    fc.property(fc.array(anyReading, { minLength: 10, maxLength: 60 }), (readings) => {
      const record = aRecord({
        readings,
        attributes: attributes({
          nominalMaximumSize: 12.5,
          designTraffic: 4,
          mixType: 'dense-graded',
          course: 'surface',
        }),
      });
      const context = aContext();
      const { findings } = evaluate(record, edition, context);
      const explanations = explainFindings({ record, edition, context, findings });
      for (const finding of findings) {
        const ways = explanations[findingKey(finding)]?.toPass ?? [];
        const isDocument = finding.outcome === 'not shown' && finding.evidence.length === 0;
        if (finding.outcome !== 'fail' && !isDocument) expect(ways).toEqual([]);
        for (const { from, to, present } of ways) {
          if (present === null) continue;
          expect(from !== null || to !== null).toBe(true);
          expect((from !== null && from > present) || (to !== null && to < present)).toBe(true);
        }
      }
    }),
    { numRuns: 60 },
  );
}, 120_000);

describe('why this limit', () => {
  const table = {
    id: 'vfa',
    title: 'Voids filled',
    keys: ['designTraffic'],
    columns: [{ name: 'min', unit: '%' }],
    rows: [
      { designTraffic: { below: 3 }, min: '65' },
      { designTraffic: { from: 3 }, min: '70' },
    ],
  };
  const rule = aRule({
    id: 'rule',
    measure: { kind: 'reading', quantity: 'voids-filled-with-asphalt', at: { trial: 'design' } },
    limit: { min: { table: 'vfa', column: 'min' } },
  });

  it('names the attribute, the row, the table and the document', () => {
    const { of } = explained({
      rules: [rule],
      edition: { tables: [table] },
      readings: design(),
      values: { designTraffic: 4 },
    });
    expect(of('rule').explanation.whyThisLimit).toBe(
      'Design traffic 4 million ESAL, in the row 3 and more million ESAL: Voids filled of Section 900, 2026 gives the limit.',
    );
  });

  it('says which document put it in place of which', () => {
    const layer = aLayer({
      patchRows: [{ table: 'vfa', key: { designTraffic: { from: 3 } }, set: { min: '72' } }],
    });
    const { of } = explained({
      rules: [rule],
      edition: { tables: [table] },
      layers: [layer],
      readings: design(),
      values: { designTraffic: 4 },
    });
    expect(of('rule').explanation.whyThisLimit).toMatch(
      /Voids filled of Supplement 1, 1 gives the limit\. It stands in place of .*70.* of Section 900, 2026\./,
    );
  });

  it('says that the rule itself sets it', () => {
    const { of } = explained({ rules: [volumetric('air-voids', { max: '3.5' })], readings: design() });
    expect(of('rule').explanation.whyThisLimit).toBe('Section 900, 2026 sets it in the rule itself.');
  });
});

describe('what would decide it', () => {
  it('is said on every undecided finding of the shipped cases', () => {
    const bases = shippedRuleSets.filter(
      ({ document }) => (document as { layerOf?: unknown }).layerOf == null,
    );
    expect(bases.length).toBeGreaterThan(1);
    const silent = bases.flatMap(({ file, document }) => {
      const edition = anEdition(document as unknown as Partial<RuleSetInput>);
      return edition.cases.flatMap(({ id, record, context, expected }) => {
        const rules = new Set(expected.map(({ rule }) => rule));
        return evaluate(record, edition, context)
          .findings.filter(({ outcome, rule }) => outcome === 'undecided' && rules.has(rule))
          .filter(({ wouldDecide }) => !wouldDecide || wouldDecide === RULE_WORDS)
          .map(({ rule, reason }) => `${file} ${id} ${rule}: ${reason}`);
      });
    });
    expect(silent).toEqual([]);
  }, 120_000);

  it('is silent on anything else', () => {
    const { of } = explained({ rules: [volumetric('air-voids', { max: '3.5' })], readings: design() });
    expect(of('rule').finding.wouldDecide).toBeNull();
  });

  const decides = (record: Partial<MixRecord>, overrides: Partial<RuleInput>) => {
    const edition = anEdition({ rules: [aRule(overrides)] });
    const [finding] = evaluate(aRecord(record), edition, aContext()).findings;
    return [finding?.outcome, finding?.wouldDecide];
  };

  it('asks for the answer, the statement or the specimens that are missing', () => {
    const doubt = {
      sheet: 'Trials',
      cell: 'E9',
      text: '2.40*',
      reason: 'E9 has a mark',
      alternatives: [],
      about: { quantity: 'sand-equivalent' },
    };
    const sand = { measure: { kind: 'reading' as const, quantity: 'sand-equivalent' }, limit: { min: '45' } };
    expect(decides({ doubts: [doubt] }, sand)).toEqual(['undecided', 'Answer the doubt at Trials E9.']);
    expect(
      decides(
        { readings: [reading('sand-equivalent', 50)] },
        { ...sand, when: { fact: 'designTraffic', operator: 'lessThan', value: 3 } },
      ),
    ).toEqual(['undecided', 'State the design traffic.']);
    expect(
      decides(
        { readings: [reading('sand-equivalent', 50)] },
        { ...sand, measure: { ...sand.measure, minimumCount: 3 } },
      ),
    ).toEqual(['undecided', 'Add 2 more results of the same kind.']);
    expect(
      decides(
        { readings: [reading('wheel-track-rut-depth', 5)] },
        {
          measure: { kind: 'reading', quantity: 'wheel-track-rut-depth', at: { temperature: 50 } },
          limit: { max: '12' },
        },
      ),
    ).toEqual(['undecided', 'State the temperature of each reading of wheel-track rut depth.']);
  });
});
