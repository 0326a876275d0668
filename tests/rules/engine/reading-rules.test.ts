import { describe, expect, it } from 'vitest';
import { aReading, replicates } from '#tests/builders/a-reading';
import { attributes } from '#tests/builders/a-record';
import { findingOf, findingsOf } from './check-with';

const absorption = { kind: 'reading' as const, quantity: 'water-absorption' };
const gmm = 'maximum-specific-gravity';

function waterAbsorption(value: number, overrides = {}) {
  return { readings: [aReading({ quantity: 'water-absorption', value, at: {}, ...overrides })] };
}

describe('a reading held against a limit', () => {
  it.each([
    ['inside', 1.9, 'pass', 0.1],
    ['at the limit', 2.0, 'pass', 0],
    ['outside', 2.1, 'fail', -0.1],
  ] as const)('%s', (_, value, outcome, margin) => {
    const finding = findingOf({
      rule: { measure: absorption, limit: { max: '2.0' } },
      record: waterAbsorption(value),
    });
    expect(finding).toMatchObject({ outcome, margin, subject: 'mix' });
  });

  it('fails with margin 0 on an exclusive limit', () => {
    for (const limit of [{ max: '2.0', exclusive: true }, { max: { value: '2.0', exclusive: true } }]) {
      const finding = findingOf({ rule: { measure: absorption, limit }, record: waterAbsorption(2.0) });
      expect(finding).toMatchObject({ outcome: 'fail', margin: 0 });
      expect(finding.sentence).toBe('Water absorption of the aggregate is 2.0 %, less than 2.0.');
    }
  });

  it.each([
    ['below', 3.4, 'fail', -0.1],
    ['at the lower end', 3.5, 'pass', 0],
    ['at the target', 4.0, 'pass', 0.5],
    ['at the upper end', 4.5, 'pass', 0],
    ['above', 4.6, 'fail', -0.1],
  ] as const)('a target with tolerance: %s', (_, value, outcome, margin) => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: 'air-voids' },
      limit: { target: '4.0', tolerance: '0.5' },
    };
    const finding = findingOf({ rule, record: { readings: [aReading({ quantity: 'air-voids', value })] } });
    expect(finding).toMatchObject({
      outcome,
      margin,
      limit: { min: 3.5, max: 4.5, target: 4, tolerance: 0.5 },
    });
  });

  it('is not shown without any reading, before any condition is looked at', () => {
    const rule = { measure: { ...absorption, at: { variant: 'sodium' } }, limit: { max: 2 } };
    expect(findingOf({ rule })).toMatchObject({ outcome: 'not shown', margin: null, observed: null });
  });

  it('is undecided with fewer results than the rule asks for, and says what would decide it', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: gmm, minimumCount: 3 }, limit: { min: 2 } };
    const finding = findingOf({ rule, record: { readings: replicates(gmm, [2.5, 2.51]) } });
    expect(finding).toMatchObject({ outcome: 'undecided', margin: null, observed: { count: 2 } });
    expect(finding.reason).toContain('1 more result would decide it');
  });

  it('passes with exactly as many results as the rule asks for', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: gmm, minimumCount: 2 }, limit: { min: 2 } };
    expect(findingOf({ rule, record: { readings: replicates(gmm, [2.5, 2.51]) } }).outcome).toBe('pass');
  });

  it('is not applicable where its condition is false, with the reason', () => {
    const rule = { when: { fact: 'course', operator: 'equal' as const, value: 'surface' } };
    const finding = findingOf({ rule, record: { attributes: attributes({ course: 'base' }) } });
    expect(finding).toMatchObject({ outcome: 'not applicable', margin: null });
    expect(finding.reason).toBe('The rule applies where course is surface; here course is base.');
  });

  it('is undecided where it is not known whether it applies, naming the missing attribute', () => {
    const rule = { when: { fact: 'designTraffic', operator: 'greaterThan' as const, value: 3 } };
    const finding = findingOf({ rule });
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toBe('Whether this rule applies is not known: design traffic is missing.');
  });

  it('is undecided where a reading is in a unit of another kind', () => {
    const record = waterAbsorption(1.0, { unit: 'kPa' });
    const finding = findingOf({ rule: { measure: absorption, limit: { max: '2.0' } }, record });
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toContain('kPa cannot be converted to %');
  });

  it('converts a reading in another unit of the same kind', () => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: 'tensile-strength-dry' },
      limit: { min: 690 },
    };
    // 100 psi is 689.476 kPa (NIST SP 811, appendix B.8): 689.5 to 0.1, short of 690 by 0.5.
    const readings = [aReading({ quantity: 'tensile-strength-dry', value: 100, unit: 'psi' })];
    expect(findingOf({ rule, record: { readings } })).toMatchObject({ outcome: 'fail', margin: -0.5 });
  });

  it('holds a value against a table in another unit in the table’s own unit', () => {
    const tables = [
      {
        id: 'strength',
        keys: ['course'],
        columns: [{ name: 'min', unit: 'psi' }],
        rows: [{ course: 'surface', min: '100' }],
      },
    ];
    const rule = {
      measure: { kind: 'reading' as const, quantity: 'tensile-strength-dry' },
      limit: { min: { table: 'strength', column: 'min' } },
      rounding: { method: 'rounding' as const, to: 1 },
    };
    const record = {
      attributes: attributes({ course: 'surface' }),
      readings: [aReading({ quantity: 'tensile-strength-dry', value: 690 })],
    };
    const finding = findingOf({ rule, edition: { tables, rules: [ruleOf(rule)] }, record });
    expect(finding).toMatchObject({
      outcome: 'pass',
      observed: { rounded: 100, unit: 'psi' },
      limit: { unit: 'psi' },
    });
  });

  it('never takes another trial’s measured value', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: gmm }, limit: { min: 2 } };
    const readings = [aReading({ quantity: gmm, value: 2.5, at: { trial: 'B' } })];
    const finding = findingOf({ rule, record: { readings } });
    expect(finding.outcome).toBe('not shown');
    expect(finding.reason).toBe(
      'There is no reading of maximum specific gravity for the design, only for trial B.',
    );
  });

  it('takes a reading without a trial for the design’s', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: gmm }, limit: { min: 2 } };
    const readings = [aReading({ quantity: gmm, value: 2.5, at: {} })];
    expect(findingOf({ rule, record: { readings } })).toMatchObject({
      outcome: 'pass',
      subject: 'design point',
    });
  });

  it('takes an aggregate property without a trial for every trial’s', () => {
    const rule = { measure: { ...absorption, at: { trial: 'B' } }, limit: { max: 2 } };
    expect(findingOf({ rule, record: waterAbsorption(1) }).outcome).toBe('pass');
  });

  it('sees the contractor’s readings unless the rule names the agency', () => {
    const readings = [aReading({ quantity: gmm, value: 2.5, at: { trial: 'design', laboratory: 'agency' } })];
    const measure = { kind: 'reading' as const, quantity: gmm };
    expect(findingOf({ rule: { measure, limit: { min: 2 } }, record: { readings } }).outcome).toBe(
      'not shown',
    );
    const agency = { ...measure, at: { laboratory: 'agency' as const } };
    expect(findingOf({ rule: { measure: agency, limit: { min: 2 } }, record: { readings } }).outcome).toBe(
      'pass',
    );
  });

  it('only asks whether a value is there where the limit is present', () => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: 'mixing-temperature' },
      limit: { present: true as const },
    };
    const readings = [aReading({ quantity: 'mixing-temperature', value: 155 })];
    expect(findingOf({ rule, record: { readings } })).toMatchObject({ outcome: 'pass', margin: null });
    expect(findingOf({ rule }).outcome).toBe('not shown');
  });

  it('gives one finding a stockpile where the rule asks for each', () => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: 'deleterious-materials', at: { stockpile: 'each' } },
      limit: { max: '1.0' },
    };
    const readings = [
      aReading({ quantity: 'deleterious-materials', value: 0.4, at: { stockpile: 'Coarse 2' } }),
      aReading({ quantity: 'deleterious-materials', value: 1.2, at: { stockpile: 'Coarse 10' } }),
    ];
    expect(
      findingsOf({ rule, record: { readings } }).map(({ subject, outcome }) => [subject, outcome]),
    ).toEqual([
      ['stockpile Coarse 2', 'pass'],
      ['stockpile Coarse 10', 'fail'],
    ]);
  });

  it('does not take a stockpile’s value for the blend’s', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: 'abrasion-loss' }, limit: { max: 40 } };
    const readings = [aReading({ quantity: 'abrasion-loss', value: 20, at: { stockpile: 'Coarse' } })];
    const finding = findingOf({ rule, record: { readings } });
    expect(finding).toMatchObject({ outcome: 'not shown', subject: 'mix' });
  });

  it('leaves two readings of the same conditions that disagree undecided, whichever comes first', () => {
    const rule = { measure: absorption, limit: { max: 2 } };
    const readings = [1.0, 1.4].map((value) => aReading({ quantity: 'water-absorption', value, at: {} }));
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('undecided');
    expect(findingOf({ rule, record: { readings: readings.toReversed() } }).outcome).toBe('undecided');
  });

  it('counts a stated mean beside its specimens as no further specimen', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: gmm, minimumCount: 3 }, limit: { min: 2 } };
    const readings = [...replicates(gmm, [2.5, 2.51]), aReading({ quantity: gmm, value: 2.505 })];
    expect(findingOf({ rule, record: { readings } })).toMatchObject({
      outcome: 'undecided',
      observed: { count: 2 },
    });
  });

  it('leaves the design undecided where several blends are given and none is named', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: 'sand-equivalent' }, limit: { min: 45 } };
    const readings = ['1', '2'].map((blend) =>
      aReading({ quantity: 'sand-equivalent', value: 60, at: { blend } }),
    );
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('undecided');
    const named = [
      ...readings,
      aReading({ quantity: 'binder-content', value: 5, at: { trial: 'design', blend: '2' } }),
    ];
    expect(findingOf({ rule, record: { readings: named } }).outcome).toBe('pass');
  });
});

function ruleOf(rule: object) {
  return {
    id: 'strength',
    clause: '1.2',
    title: 'Strength',
    severity: 'required' as const,
    measure: { kind: 'reading' as const, quantity: 'tensile-strength-dry' },
    limit: { min: 0 },
    ...rule,
  };
}
