import { describe, expect, it } from 'vitest';
import { declarationText } from '#server/presenters/declaration-text';
import { doubtLetter } from '#server/presenters/doubt-letter';
import { mixDescription } from '#server/presenters/mix-description';
import { recommendationText } from '#server/presenters/recommendation-text';
import { aFinding } from '#tests/builders/a-finding';

describe('the description of a mix', () => {
  const attributes = {
    nominalMaximumSize: { value: 12.5 },
    mixType: { value: 'dense-graded' },
    course: { value: 'surface' },
    binderGrade: { value: 'PG 64-22' },
    designTraffic: { value: 12 },
  };

  it('names size, type, course, binder and traffic', () => {
    expect(mixDescription(attributes)).toBe(
      '12.5 mm dense-graded surface course · PG 64-22 · 12 million ESAL',
    );
  });

  it('leaves out what is not stated, and is empty when nothing is', () => {
    expect(mixDescription({ nominalMaximumSize: { value: 19 }, course: { value: 'Base course' } })).toBe(
      '19 mm Base course',
    );
    expect(mixDescription({ binderGrade: { value: 'PG 70-22' } })).toBe('PG 70-22');
    expect(mixDescription({})).toBe('');
  });
});

describe('the declaration', () => {
  const input = {
    mixDesignation: 'BW-125-S4',
    revision: 1,
    projectNumber: 'CV-2031',
    section: 'Section 412, edition 2026',
  };

  it('lists every fail, everything not shown or undecided, and every doubt', () => {
    const text = declarationText({
      ...input,
      findings: [
        aFinding({ outcome: 'fail', clause: '412.03(d)', title: 'Dust proportion' }),
        aFinding({ outcome: 'fail', clause: '412.04', title: 'Gradation', subject: '2.36 mm' }),
        aFinding({ outcome: 'not shown', clause: '412.02(k)', title: 'Binder certificate', subject: 'mix' }),
        aFinding({
          outcome: 'undecided',
          clause: null,
          title: 'Air voids do not follow',
          subject: 'air-voids, trial B',
        }),
        aFinding({ outcome: 'pass', clause: '412.03(b)', title: 'Voids in the mineral aggregate' }),
        aFinding({ outcome: 'not applicable', clause: '412.09', title: 'Recycled binder' }),
      ],
      doubts: ['Trials F20'],
    });
    expect(text).toContain('We submit BW-125-S4 revision 1 for CV-2031 under Section 412, edition 2026.');
    expect(text).toContain('– 2 fail: 412.03(d) Dust proportion; 412.04 Gradation, 2.36 mm.');
    expect(text).toContain('– 1 is not shown: 412.02(k) Binder certificate.');
    expect(text).toContain('– 1 is undecided: Air voids do not follow, air-voids, trial B.');
    expect(text).toContain('– 1 doubt is not answered: Trials F20.');
    expect(text).not.toContain('Voids in the mineral aggregate');
    expect(text).not.toContain('Recycled binder');
  });

  it('says so when nothing is open', () => {
    const text = declarationText({ ...input, findings: [aFinding({ outcome: 'pass' })], doubts: [] });
    expect(text).toContain('Nothing is known to be open.');
    expect(text).not.toContain('We know that');
  });
});

describe('the recommendation in words', () => {
  const none = new Set<string>();

  it('counts what blocks an approval: required findings without a waiver', () => {
    const findings = [
      aFinding({ rule: 'dust', outcome: 'fail' }),
      aFinding({ rule: 'tsr', outcome: 'fail' }),
      aFinding({ rule: 'sand', outcome: 'fail' }),
      aFinding({ rule: 'certificate', outcome: 'not shown' }),
      aFinding({ rule: 'creep', outcome: 'undecided' }),
      aFinding({ rule: 'advice', outcome: 'fail', severity: 'advisory' }),
    ];
    expect(recommendationText(findings, new Set(['sand~design point']))).toBe(
      'Two required findings fail without a waiver, one is not shown, one is undecided.',
    );
  });

  it('counts what an approval has to note', () => {
    const findings = [
      aFinding({ rule: 'sand', outcome: 'fail' }),
      aFinding({ rule: 'advice', outcome: 'not shown', severity: 'advisory' }),
      aFinding({ rule: 'vma', outcome: 'pass', borderline: true }),
    ];
    expect(recommendationText(findings, new Set(['sand~design point']))).toBe(
      'One finding fails and is waived, one is advisory and not a pass, one passes borderline.',
    );
  });

  it('says that every finding passes', () => {
    expect(recommendationText([aFinding({ outcome: 'pass' })], none)).toBe(
      'Every finding that applies passes.',
    );
  });
});

it('letters doubts from a to z, then from aa', () => {
  expect([0, 1, 25, 26, 51, 52].map(doubtLetter)).toEqual(['a', 'b', 'z', 'aa', 'az', 'ba']);
});
