import { describe, expect, it } from 'vitest';
import type { MixRecordInput, Reading } from '#rules/record';
import { aReading, replicates } from '#tests/builders/a-reading';
import { attributes } from '#tests/builders/a-record';
import { findingOf } from './check-with';

const absorption = {
  measure: { kind: 'reading' as const, quantity: 'water-absorption' },
  limit: { max: '2.0' },
};
type DoubtInput = NonNullable<MixRecordInput['doubts']>[number];

function aDoubt(overrides: Partial<DoubtInput>): DoubtInput {
  return {
    sheet: 'Aggregates',
    cell: 'C4',
    text: '1,8',
    reason: 'a decimal comma',
    alternatives: [],
    ...overrides,
  };
}

function meaning(reading: Reading) {
  return { answer: String(reading.value), label: `${reading.value} %`, reading };
}

describe('an unanswered doubt', () => {
  const about = { quantity: 'water-absorption' };

  it('makes a value doubtful where no sure reading exists, never not shown', () => {
    const finding = findingOf({ rule: absorption, record: { doubts: [aDoubt({ about })] } });
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toContain('Aggregates C4');
  });

  it('leaves a finding alone where a sure reading exists and nothing it may mean would change it', () => {
    const readings = [aReading({ quantity: 'water-absorption', value: 1.5, at: {} })];
    const alternatives = [meaning(aReading({ quantity: 'water-absorption', value: 1.8, at: {} }))];
    expect(
      findingOf({ rule: absorption, record: { readings, doubts: [aDoubt({ about, alternatives })] } })
        .outcome,
    ).toBe('pass');
  });

  it('leaves a finding undecided where one of its meanings would change it, and says which', () => {
    const readings = [aReading({ quantity: 'water-absorption', value: 1.5, at: {} })];
    const alternatives = [1.8, 18].map((value) =>
      meaning(aReading({ quantity: 'water-absorption', value, at: {} })),
    );
    const finding = findingOf({
      rule: absorption,
      record: { readings, doubts: [aDoubt({ about, alternatives })] },
    });
    expect(finding).toMatchObject({ outcome: 'undecided', margin: null, borderline: false });
    expect(finding.reason).toBe(
      'Aggregates C4 was not read with certainty (a decimal comma); read as "18 %", this would be fail.',
    );
  });

  it('about another quantity changes nothing', () => {
    const readings = [aReading({ quantity: 'water-absorption', value: 1.5, at: {} })];
    const doubts = [aDoubt({ about: { quantity: 'sand-equivalent' } })];
    expect(findingOf({ rule: absorption, record: { readings, doubts } }).outcome).toBe('pass');
  });

  it('about one of several specimens leaves their mean undecided', () => {
    const gmm = 'maximum-specific-gravity';
    const rule = { measure: { kind: 'reading' as const, quantity: gmm }, limit: { min: 2.4 } };
    const at = (specimen: string) => ({ quantity: gmm, at: { trial: 'design', specimen } });
    const outcome = (specimen: string) =>
      findingOf({
        rule,
        record: { readings: replicates(gmm, [2.5, 2.51]), doubts: [aDoubt({ about: at(specimen) })] },
      }).outcome;
    expect([outcome('3'), outcome('2')]).toEqual(['undecided', 'pass']);
  });

  it('about a raw reading leaves what is derived from it undecided', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: 'air-voids' }, limit: { max: 5 } };
    const readings = [aReading({ quantity: 'bulk-specific-gravity-mix', value: 2.4 })];
    const doubts = [aDoubt({ about: { quantity: 'maximum-specific-gravity', at: { trial: 'design' } } })];
    expect(findingOf({ rule, record: { readings, doubts } }).outcome).toBe('undecided');
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('not shown');
  });

  it('about a reported value does not touch the recomputed one', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: 'air-voids' }, limit: { max: 5 } };
    const readings = [
      aReading({ quantity: 'bulk-specific-gravity-mix', value: 2.4 }),
      aReading({ quantity: 'maximum-specific-gravity', value: 2.5 }),
    ];
    const doubts = [aDoubt({ about: { quantity: 'air-voids', at: { trial: 'design' } } })];
    expect(findingOf({ rule, record: { readings, doubts } }).outcome).toBe('pass');
  });

  it('about an attribute leaves a rule undecided whose condition or table needs it', () => {
    const rule = { ...absorption, when: { fact: 'course', operator: 'equal' as const, value: 'surface' } };
    const readings = [aReading({ quantity: 'water-absorption', value: 1.5, at: {} })];
    const doubts = [aDoubt({ about: { attribute: 'course' } })];
    const finding = findingOf({ rule, record: { readings, doubts } });
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toContain('course is in doubt (Aggregates C4)');
  });

  it('about an attribute that is also stated matters only where it would change the outcome', () => {
    const rule = { ...absorption, when: { fact: 'course', operator: 'notEqual' as const, value: 'base' } };
    const readings = [aReading({ quantity: 'water-absorption', value: 1.5, at: {} })];
    const doubted = (value: string) =>
      aDoubt({
        about: { attribute: 'course' },
        alternatives: [
          {
            answer: value,
            label: value,
            attribute: { name: 'course', value: { value, origin: 'reported', source: null } },
          },
        ],
      });
    const outcome = (value: string) =>
      findingOf({
        rule,
        record: { readings, attributes: attributes({ course: 'surface' }), doubts: [doubted(value)] },
      }).outcome;
    expect([outcome('binder'), outcome('base')]).toEqual(['pass', 'undecided']);
  });

  it('about a document leaves it undecided rather than not shown', () => {
    const rule = {
      measure: { kind: 'document' as const, type: 'binder-certificate' },
      limit: { present: true as const },
    };
    expect(
      findingOf({ rule, record: { doubts: [aDoubt({ about: { document: 'binder-certificate' } })] } })
        .outcome,
    ).toBe('undecided');
  });
});
