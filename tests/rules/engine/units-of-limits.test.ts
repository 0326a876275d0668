import { describe, expect, it } from 'vitest';
import type { RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { parseRuleSet } from '#rules/rule-sets/schema';
import { aReading, replicates } from '#tests/builders/a-reading';
import { attributes } from '#tests/builders/a-record';
import { aRule, aRuleSet } from '#tests/builders/a-rule-set';
import { findingOf } from './check-with';

/** 100 psi is 689.476 kPa (the conversion of NIST SP 811, 6.894757 kPa a psi). */
const tables: RuleSetInput['tables'] = [
  {
    id: 'strength',
    keys: ['course'],
    columns: [
      { name: 'min', unit: 'psi' },
      { name: 'plain', unit: 'kPa' },
    ],
    rows: [{ course: 'base', min: 100, plain: 700 }],
  },
];
const record = { attributes: attributes({ course: 'base' }) };

function strength(values: number[], rule: Partial<RuleInput>) {
  const readings = replicates('tensile-strength-dry', values);
  return findingOf({
    rule: { rounding: { method: 'absolute' }, ...rule },
    edition: { tables },
    record: { ...record, readings },
  });
}
const measure = { kind: 'reading' as const, quantity: 'tensile-strength-dry' };

describe('limits in several units', () => {
  it('hold a number of the rule, in the unit of the quantity, beside a column in another unit', () => {
    const limit = { min: { table: 'strength', column: 'min' }, max: 700 };
    expect(strength([695], { measure, limit })).toMatchObject({
      outcome: 'pass',
      limit: { min: 100, unit: 'psi' },
    });
    expect(strength([701], { measure, limit }).outcome).toBe('fail');
    expect(strength([689], { measure, limit }).outcome).toBe('fail');
  });

  it('hold two columns in two units', () => {
    const limit = { min: { table: 'strength', column: 'min' }, max: { table: 'strength', column: 'plain' } };
    expect(strength([699], { measure, limit }).outcome).toBe('pass');
    expect(strength([701], { measure, limit }).outcome).toBe('fail');
  });

  it('hold each single value against numbers in the unit of the quantity', () => {
    const limit = { min: { table: 'strength', column: 'min' } };
    const alsoEach = { min: 650 };
    expect(strength([660, 800], { measure: { ...measure, alsoEach }, limit }).outcome).toBe('pass');
    expect(strength([640, 800], { measure: { ...measure, alsoEach }, limit }).outcome).toBe('fail');
  });

  it('count percent within limits from limits in another unit', () => {
    const within = { min: { table: 'strength', column: 'min' } };
    const pwl = { ...measure, statistic: 'percent-within-limits' as const, within };
    // All of 700, 700, 700 lie above 689.5 kPa; all of 680 below.
    expect(strength([700, 700, 700], { measure: pwl, limit: { min: 90 } }).observed?.value).toBe(100);
    expect(strength([680, 680, 680], { measure: pwl, limit: { min: 90 } }).observed?.value).toBe(0);
  });

  it('take a tolerance as a distance: 18 °F are 10 °C, not −7.8', () => {
    const temperatures: RuleSetInput['tables'] = [
      {
        id: 'mixing',
        keys: ['course'],
        columns: [
          { name: 'target', unit: '°C' },
          { name: 'tolerance', unit: '°F' },
        ],
        rows: [{ course: 'base', target: 150, tolerance: 18 }],
      },
    ];
    const limit = {
      target: { table: 'mixing', column: 'target' },
      tolerance: { table: 'mixing', column: 'tolerance' },
    };
    const outcome = (value: number) =>
      findingOf({
        rule: { measure: { kind: 'reading', quantity: 'mixing-temperature' }, limit },
        edition: { tables: temperatures },
        record: { ...record, readings: [aReading({ quantity: 'mixing-temperature', value })] },
      });
    expect(outcome(160)).toMatchObject({ outcome: 'pass', limit: { min: 140, max: 160 }, margin: 0 });
    expect(outcome(160.5).outcome).toBe('fail');
  });

  it('are refused where another quantity is of another kind', () => {
    const rule = aRule({ limit: { min: { quantity: 'specimen-height' } } });
    const parsed = parseRuleSet(aRuleSet({ rules: [rule] }));
    expect(parsed.ok ? [] : parsed.problems.map(({ detail }) => detail)).toEqual([
      'Rule vma: the quantity specimen-height is in mm, but the value is in %.',
    ]);
  });
});
