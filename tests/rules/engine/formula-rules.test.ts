import { describe, expect, it } from 'vitest';
import type { Doubt, Reading } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aReading, replicates } from '#tests/builders/a-reading';
import { checkWith, findingOf, findingsOf } from './check-with';

/** "(P0.6 − P0.075)/(P2.36 − P0.075), in percent, at most 50": the sand ratio, an invented limit. */
const sandRatio: Partial<RuleInput> = {
  id: 'sand-ratio',
  measure: { kind: 'formula', expression: '100*(P0.6 - P0.075)/(P2.36 - P0.075)', unit: '%' },
  limit: { max: 50 },
  rounding: { method: 'rounding', to: 'limit' },
};

function gradation(passing: Record<number, number>): Reading[] {
  return Object.entries(passing).map(([sieve, value]) =>
    aReading({ quantity: 'percent-passing', value, at: { trial: 'design', sieve: Number(sieve) } }),
  );
}

const absorbs: Partial<RuleInput> = {
  id: 'absorbs',
  measure: { kind: 'formula', expression: 'Gse - Gsb' },
  limit: { min: '0.000' },
  rounding: { method: 'rounding', to: 0.001 },
};
/** Pb 5.0, Gb 1.030, Gmm 2.500: Gse = 95/(100/2.5 − 5/1.03) = 2.70304 by hand. */
const shown = (text: string) => ({ source: { sheet: 'Trials', cell: 'C3', text } });
const mixOfGse = [
  aReading({ quantity: 'binder-content', value: 5, ...shown('5.00') }),
  aReading({ quantity: 'binder-specific-gravity', value: 1.03, ...shown('1.030') }),
  aReading({ quantity: 'maximum-specific-gravity', value: 2.5, ...shown('2.500') }),
];
const gsb = (value: number) => aReading({ quantity: 'bulk-specific-gravity-aggregate', value });

describe('a formula rule', () => {
  it.each([
    // 100·(22 − 5)/(35 − 5) = 56.7; (20 − 5)/(35 − 5) = 50; (19 − 5)/(35 − 5) = 46.7
    [22, 'fail', 57],
    [20, 'pass', 50],
    [20.15, 'pass', 50],
    [19, 'pass', 47],
  ] as const)('with %d %% passing 0.6 mm is %s', (passing, outcome, rounded) => {
    const finding = findingOf({
      rule: sandRatio,
      record: { readings: gradation({ 2.36: 35, 0.6: passing, 0.075: 5 }) },
    });
    expect(finding).toMatchObject({
      outcome,
      subject: 'mix',
      observed: { rounded, unit: '%', statistic: 'formula' },
    });
  });

  it('is not shown where a symbol has no value, and names it', () => {
    const finding = findingOf({ rule: sandRatio, record: { readings: gradation({ 2.36: 35, 0.075: 5 }) } });
    expect(finding.outcome).toBe('not shown');
    expect(finding.reason).toBe('There is no reading of percent passing 0.6 mm, only 2.36 mm or 0.075 mm.');
    expect(finding.evidence.map(({ symbol }) => symbol)).toEqual(['P0.075', 'P2.36']);
  });

  it('is undecided where it divides by zero', () => {
    const readings = gradation({ 2.36: 5, 0.6: 5, 0.075: 5 });
    const finding = findingOf({ rule: sandRatio, record: { readings } });
    expect(finding).toMatchObject({
      outcome: 'undecided',
      reason: 'The formula divides by zero.',
      observed: null,
    });
  });

  it('is undecided where a symbol is doubtful', () => {
    const doubt: Doubt = {
      sheet: 'Blend',
      cell: 'C7',
      text: '2 2',
      reason: 'the text is not a number',
      alternatives: [],
      about: { quantity: 'percent-passing', at: { trial: 'design', sieve: 0.6 } },
    };
    const readings = gradation({ 2.36: 35, 0.075: 5 });
    // Absent and in doubt at once: what is in doubt is not absent.
    const finding = findingOf({ rule: sandRatio, record: { readings, doubts: [doubt] } });
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toContain('Blend C7');
  });

  it('is undecided where a symbol is censored or has several values', () => {
    const censored = aReading({
      quantity: 'percent-passing',
      value: 5,
      qualifier: '<',
      at: { trial: 'design', sieve: 0.075 },
    });
    const one = findingOf({
      rule: sandRatio,
      record: { readings: [...gradation({ 2.36: 35, 0.6: 20 }), censored] },
    });
    expect(one.outcome).toBe('undecided');
    expect(one.reason).toContain('only known as <5');
    const twice = [...gradation({ 2.36: 35, 0.6: 20, 0.075: 5 }), ...gradation({ 0.075: 6 })];
    expect(findingOf({ rule: sandRatio, record: { readings: twice } }).outcome).toBe('undecided');
  });

  it('is not applicable where its condition is false', () => {
    const when = { fact: 'course', operator: 'equal' as const, value: 'base' };
    const finding = findingOf({
      rule: { ...sandRatio, when },
      record: { attributes: { course: { value: 'surface', origin: 'reported' } } },
    });
    expect(finding.outcome).toBe('not applicable');
  });

  it('takes a derived symbol as it is judged: recomputed before reported', () => {
    // Gse = 2.703, so with Gsb 2.700 the difference is +0.003, whatever the workbook reports for Gse.
    const reported = aReading({ quantity: 'effective-specific-gravity-aggregate', value: 2.703 });
    const finding = findingOf({ rule: absorbs, record: { readings: [...mixOfGse, gsb(2.7), reported] } });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { rounded: 0.003 }, subject: 'design point' });
    expect(finding.evidence[0]).toMatchObject({ formula: 'Gse − Gsb', origin: 'recomputed' });
    expect(finding.evidence[0]?.inputs?.map(({ symbol, origin }) => [symbol, origin])).toEqual([
      ['Gse', 'recomputed'],
      ['Gsb', 'measured'],
    ]);
  });

  it('is undecided where a reported symbol would turn the outcome and no cause explains it', () => {
    const reported = aReading({ quantity: 'effective-specific-gravity-aggregate', value: 2.651 });
    const result = checkWith({ rule: absorbs, record: { readings: [...mixOfGse, gsb(2.7), reported] } });
    const finding = result.findings.find(({ rule }) => rule === 'absorbs');
    expect(finding?.outcome).toBe('undecided');
    expect(finding?.reason).toContain('Gse is reported as 2.651');
    const consistency = result.findings.find(({ rule }) => rule === 'consistency/reported-differs');
    expect(consistency?.severity).toBe('required');
  });

  it('takes a derived symbol as reported where nothing gives it', () => {
    const reported = aReading({ quantity: 'effective-specific-gravity-aggregate', value: 2.7 });
    const finding = findingOf({ rule: absorbs, record: { readings: [gsb(2.7), reported] } });
    // On the limit, which is included.
    expect(finding).toMatchObject({ outcome: 'pass', margin: 0 });
  });

  it('takes a derived symbol interpolated between trials, and says so', () => {
    const trial = (name: string, pb: number, gmm: number, gmb: number) => [
      aReading({ quantity: 'binder-content', value: pb, at: { trial: name } }),
      aReading({ quantity: 'maximum-specific-gravity', value: gmm, at: { trial: name } }),
      ...replicates('bulk-specific-gravity-mix', [gmb, gmb], { at: { trial: name } }),
    ];
    // Va of A is 100·(2.5 − 2.375)/2.5 = 5, of B 100·(2.48 − 2.4056)/2.48 = 3; half-way 4.
    const readings = [
      ...trial('A', 5, 2.5, 2.375),
      ...trial('B', 6, 2.48, 2.4056),
      aReading({ quantity: 'binder-content', value: 5.5 }),
    ];
    const rule: Partial<RuleInput> = {
      measure: { kind: 'formula', expression: '100 - Va', unit: '%' },
      limit: { min: '96.0' },
      rounding: { method: 'rounding', to: 0.1 },
    };
    const finding = findingOf({ rule, record: { readings } });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { rounded: 96 } });
    expect(finding.reason).toContain('interpolated between trials');
  });

  it('takes the mean of measured replicates, with each of them in the thread', () => {
    const rule: Partial<RuleInput> = {
      measure: { kind: 'formula', expression: '100*S2/S1', unit: '%' },
      limit: { min: 80 },
    };
    const readings = [
      ...replicates('tensile-strength-dry', [1000, 1100]),
      ...replicates('tensile-strength-conditioned', [800, 880]),
    ];
    // 840/1050 = 80 %
    const finding = findingOf({ rule, record: { readings } });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { value: 80, count: 2 }, margin: 0 });
    const [dry] = finding.evidence[0]?.inputs?.filter(({ symbol }) => symbol === 'S1') ?? [];
    expect(dry).toMatchObject({ value: 1050, formula: 'mean of 2' });
    expect(dry?.inputs?.map(({ source }) => source?.cell)).toEqual(['E9', 'E10']);
  });

  it('gives one finding a stockpile where it asks for each', () => {
    const rule: Partial<RuleInput> = {
      measure: { kind: 'formula', expression: 'Gsa - Gsb', at: { stockpile: 'each' } },
      limit: { min: '0.000' },
      rounding: { method: 'absolute' },
    };
    const of = (stockpile: string, apparent: number, bulk: number) => [
      aReading({ quantity: 'apparent-specific-gravity-aggregate', value: apparent, at: { stockpile } }),
      aReading({ quantity: 'bulk-specific-gravity-aggregate', value: bulk, at: { stockpile } }),
    ];
    const findings = findingsOf({
      rule,
      record: { readings: [...of('Coarse', 2.7, 2.65), ...of('Fine', 2.6, 2.61)] },
    });
    expect(findings.map(({ subject, outcome }) => [subject, outcome])).toEqual([
      ['stockpile Coarse', 'pass'],
      ['stockpile Fine', 'fail'],
    ]);
  });

  it('looks only at readings under the conditions that it names', () => {
    const rule: Partial<RuleInput> = {
      measure: { kind: 'formula', expression: '100*S2/S1', unit: '%', at: { temperature: 25 } },
      limit: { min: 80 },
    };
    const at = (temperature: number) => ({ trial: 'design', temperature });
    const readings = [
      aReading({ quantity: 'tensile-strength-dry', value: 1000, at: at(25) }),
      aReading({ quantity: 'tensile-strength-conditioned', value: 900, at: at(25) }),
      aReading({ quantity: 'tensile-strength-conditioned', value: 100, at: at(40) }),
    ];
    expect(findingOf({ rule, record: { readings } })).toMatchObject({
      outcome: 'pass',
      observed: { value: 90 },
    });
  });

  it('counts only specimens that meet its own condition', () => {
    const rule: Partial<RuleInput> = {
      measure: {
        kind: 'formula',
        expression: '100*S2/S1',
        unit: '%',
        where: [{ quantity: 'degree-of-saturation', at: {}, min: 55, max: 80 }],
      },
      limit: { min: 80 },
    };
    const saturation = replicates('degree-of-saturation', [60, 90]);
    const readings = [
      aReading({ quantity: 'tensile-strength-dry', value: 1000 }),
      ...replicates('tensile-strength-conditioned', [850, 100]),
      ...saturation,
    ];
    // Specimen 2 is too wet to count: 850/1000.
    expect(findingOf({ rule, record: { readings } })).toMatchObject({
      outcome: 'pass',
      observed: { value: 85 },
    });
  });

  it('converts its value to the unit of a table column', () => {
    const finding = findingOf({
      rule: {
        measure: { kind: 'formula', expression: 'S1 - S2', unit: 'kPa' },
        limit: { max: { table: 'loss', column: 'max' } },
      },
      edition: {
        tables: [
          {
            id: 'loss',
            keys: ['course'],
            columns: [{ name: 'max', unit: 'MPa' }],
            rows: [{ course: 'base', max: '0.2' }],
          },
        ],
      },
      record: {
        attributes: { course: { value: 'base', origin: 'reported' } },
        readings: [
          aReading({ quantity: 'tensile-strength-dry', value: 1000 }),
          aReading({ quantity: 'tensile-strength-conditioned', value: 800 }),
        ],
      },
    });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { value: 0.2, unit: 'MPa' }, margin: 0 });
  });

  it('says the same in its three forms', () => {
    const finding = findingOf({
      rule: sandRatio,
      record: { readings: gradation({ 2.36: 35, 0.6: 22, 0.075: 5 }) },
    });
    expect(finding.ruleSentence).toBe(
      "100·(P0.6 − P0.075)/(P2.36 − P0.075) is at most 50 %; P0.6 is percent passing 0.6 mm; P0.075 is percent passing 0.075 mm; P2.36 is percent passing 2.36 mm; rounded to the limit's own decimals (ASTM E29, rounding method).",
    );
    expect(finding.requirement).toBe('100·(P0.6 − P0.075)/(P2.36 − P0.075) is at most 50 %.');
    expect(finding.sentence).toBe('100·(P0.6 − P0.075)/(P2.36 − P0.075) is 57 %, at most 50.');
  });
});
