import { describe, expect, it } from 'vitest';
import { compareSeals } from '#server/commands/checks/prove-seal';
import { type CheckAge, checkStale } from '#server/presenters/check-stale';
import { clauseTitles } from '#server/presenters/clause-titles';
import { nextWords, type Standing } from '#server/presenters/next-words';

describe('a stale check', () => {
  const stated = { lettingOn: '2026-01-14', facts: { designTraffic: 12 } };
  const age = (overrides: Partial<CheckAge> = {}) =>
    checkStale({
      kind: 'pre-check',
      state: 'draft',
      submittedOn: '2026-03-09',
      today: '2026-03-09',
      resolvedHash: 'a',
      sectionHash: 'a',
      judgedWith: stated,
      project: stated,
      stored: null,
      ...overrides,
    });

  it('is a pre-check once the date of the agency is another', () => {
    expect(age()).toBeNull();
    expect(age({ today: '2026-03-10' })).toContain('took 9 March 2026 as the day of submission');
    expect(age({ kind: 'check of record', state: 'in review', today: '2026-03-10' })).toBeNull();
  });

  it('is any check whose section has another edition or other layers now', () => {
    expect(age({ sectionHash: 'b' })).toContain('edition or layers have changed');
    expect(age({ kind: 'check of record', state: 'submitted', sectionHash: 'b' })).not.toBeNull();
  });

  it('is any check whose project states another letting date or other facts now', () => {
    expect(age({ project: { ...stated, lettingOn: '2026-01-15' } })).toContain('letting date');
    expect(age({ project: { ...stated, facts: { designTraffic: 30 } } })).not.toBeNull();
    expect(age({ project: { lettingOn: stated.lettingOn, facts: { ...stated.facts } } })).toBeNull();
  });

  it('is never one of a revision that was returned or withdrawn', () => {
    expect(age({ kind: 'check of record', state: 'returned', sectionHash: 'b' })).toBeNull();
    expect(age({ kind: 'check of record', state: 'withdrawn', sectionHash: 'b' })).toBeNull();
  });
});

describe('a repeated seal', () => {
  const seal = (value: string, engine: string) => ({
    seal: value,
    record: '',
    resolvedEdition: '',
    context: '',
    engineVersion: '',
    engine,
    findings: '',
  });

  it('is the same, or different, or by another engine version and then never called different', () => {
    expect(compareSeals(seal('a', '1.0.0'), seal('a', '1.0.0'))).toBe('same');
    expect(compareSeals(seal('a', '1.0.0'), seal('b', '1.0.0'))).toBe('different');
    expect(compareSeals(seal('a', '1.0.0'), seal('b', '1.1.0'))).toBe('other engine version');
  });
});

describe('headings of clause groups', () => {
  it('say what most rules of the group are about', () => {
    const reading = (quantity: string) => ({ kind: 'reading', quantity, at: {}, statistic: 'mean' }) as const;
    const titles = clauseTitles([
      { clause: '412.02(a)', measure: { kind: 'attribute', attribute: 'binderGrade' } },
      { clause: '412.02(b)', measure: reading('sand-equivalent') },
      { clause: '412.03(a)', measure: reading('air-voids') },
      { clause: '412.05', measure: reading('tensile-strength-ratio') },
      { clause: '412.09(a)', measure: { kind: 'document', type: 'mix-design-report', enclosed: false } },
    ]);
    expect(titles).toEqual({
      '412.02': 'Materials',
      '412.03': 'Voids and density',
      '412.05': 'Resistance to moisture',
      '412.09': 'Certificates and reports',
    });
  });
});

describe('what comes next', () => {
  const summary = {
    pass: 30,
    fail: 2,
    notShown: 1,
    undecided: 1,
    notApplicable: 5,
    borderline: 0,
    doesNotAddUp: 0,
    recommended: 'revise and resubmit',
  } as const;
  const clean = { ...summary, fail: 0, notShown: 0, undecided: 0, recommended: 'approved' } as const;
  const standing = (overrides: Partial<Standing>): Standing => ({
    number: 0,
    state: 'draft',
    disposition: null,
    dueOn: null,
    doubts: 0,
    summary,
    job: null,
    ...overrides,
  });

  it.each<[string, Partial<Standing>, string]>([
    [
      'a reading that failed',
      { summary: null, job: { state: 'failed' } },
      'Upload a workbook that can be read',
    ],
    ['a reading under way', { summary: null, job: { state: 'running' } }, 'The workbook is being read'],
    ['one doubt', { doubts: 1 }, 'Say what one cell means'],
    ['several doubts', { doubts: 3 }, 'Say what 3 cells mean'],
    ['open findings', {}, '2 to put right, 1 to send, 1 to settle'],
    ['a clean draft', { summary: clean }, 'Submit revision 0'],
    ['the agency has it', { state: 'in review', dueOn: '2026-03-25' }, 'Answer expected by 25 March 2026'],
    [
      'returned',
      { state: 'returned', disposition: 'revise and resubmit' },
      '2 to put right, 1 to send, 1 to settle',
    ],
    ['approved', { state: 'returned', disposition: 'approved' }, 'Nothing'],
  ])('for a contractor with %s', (_name, overrides, words) => {
    expect(nextWords('contractor', standing(overrides))).toBe(words);
  });

  it.each<[string, Partial<Standing>, string]>([
    ['submitted', { state: 'submitted' }, 'Take for review'],
    ['in review', { state: 'in review', dueOn: '2026-03-25' }, 'Decide by 25 March 2026'],
    [
      'returned for revision',
      { state: 'returned', disposition: 'revise and resubmit' },
      'Revision 1 is awaited',
    ],
    ['rejected', { state: 'returned', disposition: 'rejected' }, 'Nothing'],
  ])('for an agency with one %s', (_name, overrides, words) => {
    expect(nextWords('agency', standing(overrides))).toBe(words);
  });
});
