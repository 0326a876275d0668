import { describe, expect, it } from 'vitest';
import { viewOf } from '#rules/rule-sets/edition-view';
import { matchValue, normaliseText } from '#rules/rule-sets/match-value';
import type { RuleInput } from '#rules/rule-sets/schema';
import { conditionSentence, ruleSentence } from '#rules/rule-sets/sentences';
import type { Condition } from '#rules/rule-sets/when';
import { computedWords, dateWords, numberWords } from '#rules/rule-sets/words';
import { aReading, replicates } from '#tests/builders/a-reading';
import { anEdition, aRule } from '#tests/builders/a-rule-set';
import { findingOf } from '../engine/check-with';

const tables = [
  {
    id: 'vma-min',
    title: 'Minimum VMA',
    keys: ['nominalMaximumSize', 'designTraffic'],
    columns: [
      { name: 'min', unit: '%' },
      { name: 'max', unit: '%' },
    ],
    rows: [],
  },
];

function sentenceOf(overrides: Partial<RuleInput>): string {
  const edition = anEdition({ tables, rules: [aRule({ rounding: { method: 'absolute' }, ...overrides })] });
  return ruleSentence(edition.rules[0]!, viewOf(edition));
}

describe('the sentence of a rule', () => {
  it.each([
    ['a least', { limit: { min: '14.0' } }, 'at least 14.0 %'],
    ['a most', { limit: { max: '14.0' } }, 'at most 14.0 %'],
    ['a stretch', { limit: { min: '65', max: '75' } }, '65 to 75 %'],
    ['more than', { limit: { min: '14.0', exclusive: true } }, 'more than 14.0 %'],
    ['less than', { limit: { max: '14.0', exclusive: true } }, 'less than 14.0 %'],
    ['a target', { limit: { target: '4.0', tolerance: '0.5' } }, 'within 0.5 % of 4.0'],
    [
      'a column of a table',
      { limit: { min: { table: 'vma-min', column: 'min' } } },
      'at least the value in Minimum VMA by nominal maximum aggregate size and design traffic',
    ],
    [
      'two columns of a table',
      { limit: { min: { table: 'vma-min', column: 'min' }, max: { table: 'vma-min', column: 'max' } } },
      'within the limits in Minimum VMA by nominal maximum aggregate size and design traffic',
    ],
    [
      'another quantity',
      { limit: { min: { quantity: 'air-voids', plus: '-1.0' } } },
      'at least the air voids less 1.0 %',
    ],
  ])('%s', (_, change, words) => {
    expect(sentenceOf(change)).toBe(
      `Voids in the mineral aggregate are ${words}; not rounded (ASTM E29, absolute method).`,
    );
  });

  it('says how it counts, rounds and when it applies', () => {
    const sentence = sentenceOf({
      measure: { kind: 'reading', quantity: 'voids-in-mineral-aggregate', minimumCount: 2 },
      rounding: { method: 'rounding', to: 0.1 },
      when: {
        all: [
          { fact: 'mixType', operator: 'equal', value: 'dense-graded' },
          { fact: 'designTraffic', operator: 'greaterThanInclusive', value: 3 },
        ],
      },
    });
    expect(sentence).toBe(
      'Voids in the mineral aggregate are at least 14.0 %; mean of at least 2 results; rounded to 0.1 (ASTM E29, rounding method). Applies where mix type is dense-graded and design traffic is at least 3 million ESAL.',
    );
  });

  it('uses words, never signs, for comparing', () => {
    for (const limit of [{ min: 1 }, { max: 1 }, { min: 1, max: 2 }, { min: 1, exclusive: true }]) {
      expect(sentenceOf({ limit })).not.toMatch(/[≥≤<>!…]/);
    }
  });
});

describe('the sentence of a condition', () => {
  const view = viewOf(anEdition());
  it.each<[string, Condition | undefined, string]>([
    ['none', undefined, 'Always applies.'],
    ['equal', { fact: 'course', operator: 'equal', value: 'surface' }, 'Applies where course is surface.'],
    [
      'not equal',
      { fact: 'course', operator: 'notEqual', value: 'base' },
      'Applies where course is not base.',
    ],
    [
      'in',
      { fact: 'course', operator: 'in', value: ['surface', 'binder'] },
      'Applies where course is surface or binder.',
    ],
    [
      'not in',
      { fact: 'course', operator: 'notIn', value: ['binder', 'base'] },
      'Applies where course is neither binder nor base.',
    ],
    [
      'less than',
      { fact: 'designTraffic', operator: 'lessThan', value: 3 },
      'Applies where design traffic is less than 3 million ESAL.',
    ],
    [
      'more than',
      { fact: 'designTraffic', operator: 'greaterThan', value: 3 },
      'Applies where design traffic is more than 3 million ESAL.',
    ],
    [
      'a quantity',
      {
        fact: 'quantity',
        params: { quantity: 'rap-content', at: {} },
        operator: 'lessThanInclusive',
        value: 20,
      },
      'Applies where reclaimed asphalt pavement content is at most 20 %.',
    ],
    [
      'nested groups',
      {
        all: [
          {
            any: [
              { fact: 'course', operator: 'equal', value: 'surface' },
              { fact: 'course', operator: 'equal', value: 'binder' },
            ],
          },
          { not: { fact: 'mixType', operator: 'equal', value: 'open-graded' } },
        ],
      },
      'Applies where either course is surface or course is binder and it is not so that mix type is open-graded.',
    ],
  ])('%s', (_, condition, sentence) => {
    expect(conditionSentence(condition, view)).toBe(sentence);
  });
});

describe('the sentence of a result', () => {
  const sentence = (rule: Partial<RuleInput>, value: number | null) =>
    findingOf({
      rule,
      record:
        value === null ? {} : { readings: [aReading({ quantity: 'voids-in-mineral-aggregate', value })] },
    });

  it('gives the value, then the limit', () => {
    const finding = sentence({}, 13.94);
    expect(finding.sentence).toBe('Voids in the mineral aggregate are 13.9 %, at least 14.0.');
    expect(finding.requirement).toBe('Voids in the mineral aggregate are at least 14.0 %.');
    expect(finding.reason).toContain('13.9 is below 14.0 by 0.1.');
  });

  it('keeps the limit where the value is missing', () => {
    expect(sentence({}, null).sentence).toBe(
      'Voids in the mineral aggregate are not shown, at least 14.0 %.',
    );
  });

  it('gives both ends as one stretch, and a target with its tolerance', () => {
    expect(
      sentence({ limit: { min: '13', max: '15' }, rounding: { method: 'rounding', to: 1 } }, 16).sentence,
    ).toBe('Voids in the mineral aggregate are 16 %, 13 to 15.');
    expect(sentence({ limit: { target: '14.0', tolerance: '0.5' } }, 14.2).sentence).toBe(
      'Voids in the mineral aggregate are 14.2 %, 14.0 ± 0.5.',
    );
  });

  it('says a rule that does not apply is not judged', () => {
    const rule = { when: { fact: 'course', operator: 'equal' as const, value: 'surface' } };
    const record = { attributes: { course: { value: 'base', origin: 'reported' as const } } };
    expect(findingOf({ rule, record }).sentence).toBe(
      'Voids in the mineral aggregate are not judged, as the rule does not apply.',
    );
  });

  it('names the statistic and the specimens it is taken over', () => {
    const rule: Partial<RuleInput> = {
      measure: {
        kind: 'reading',
        quantity: 'wheel-track-rut-depth',
        at: { passes: 20000 },
        statistic: 'max',
      },
      limit: { max: '12.5' },
    };
    const readings = replicates('wheel-track-rut-depth', [10.2, 11.4], { at: { passes: 20000 } });
    expect(findingOf({ rule, record: { readings } }).sentence).toBe(
      'Wheel-track rut depth after 20,000 passes, highest of 2 specimens, is 11.4 mm, at most 12.5.',
    );
  });
});

describe('numbers and dates in words', () => {
  it.each([
    [-0.1, undefined, '−0.1'],
    [20000, undefined, '20,000'],
    [999, undefined, '999'],
    [1234567.5, undefined, '1,234,567.5'],
    ['14.0', undefined, '14.0'],
    [14, 1, '14.0'],
    [0.00001, undefined, '0.00001'],
  ])('%s with %s decimals is %s', (value, decimals, text) => {
    expect(numberWords(value, decimals)).toBe(text);
  });

  it('never hides on which side of a half a computed number lies', () => {
    expect(computedWords(13.94, 1)).toBe('13.94');
    expect(computedWords(13.9412345, 1)).toBe('13.941');
    expect(computedWords(13.94999999, 1)).toBe('13.94999999');
  });

  it('writes dates with the month in words', () => {
    expect(dateWords('2026-03-09')).toBe('9 March 2026');
  });
});

describe('matching a stated value', () => {
  const course = {
    name: 'course',
    type: 'text' as const,
    values: [{ value: 'surface', label: 'Surface course', aliases: ['wearing'] }, 'base'],
  };
  it.each([
    ['surface', 'surface'],
    ['Surface Course', 'surface'],
    ['WEARING LAYER', 'surface'],
    ['Base-course', 'base'],
    ['sub-base', null],
    ['', null],
  ])('"%s" is %s', (stated, value) => {
    expect(matchValue(course, stated)).toBe(value);
  });

  it('reads a number only from a plain number', () => {
    const size = { name: 'size', type: 'number' as const, values: [9.5, 12.5] };
    expect([12.5, '12.5', '12.5 mm', 13, true].map((each) => matchValue(size, each))).toEqual([
      12.5,
      12.5,
      null,
      null,
      null,
    ]);
  });

  it('keeps a value that consists of nothing but the words it leaves out', () => {
    expect(normaliseText('Mix')).toBe('mix');
  });
});

describe('a list of allowed words', () => {
  const grades = (oneOf: string[], binderGrade: string) =>
    findingOf({
      rule: { measure: { kind: 'attribute', attribute: 'binderGrade' }, limit: { oneOf } },
      record: { attributes: { binderGrade: { value: binderGrade, origin: 'reported' } } },
    });

  it('is "one of" where there are several, in the rule and in the requirement', () => {
    const finding = grades(['PG 58-28', 'PG 64-22', 'PG 70-22'], 'PG 52-28');
    expect(finding.ruleSentence).toBe('Binder grade is one of PG 58-28, PG 64-22 or PG 70-22.');
    expect(finding.requirement).toBe('Binder grade is one of PG 58-28, PG 64-22 or PG 70-22.');
    expect(finding.sentence).toBe('Binder grade is PG 52-28, allowed PG 58-28, PG 64-22 or PG 70-22.');
  });

  it('is the word itself where there is one', () => {
    const finding = grades(['PG 64-22'], 'PG 64-22');
    expect(finding.ruleSentence).toBe('Binder grade is PG 64-22.');
    expect(finding.requirement).toBe('Binder grade is PG 64-22.');
    expect(finding.sentence).toBe('Binder grade is PG 64-22, allowed PG 64-22.');
  });
});
