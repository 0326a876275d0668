import { describe, expect, it } from 'vitest';
import { mixRecordSchema } from '#rules/record';
import { changeSummary } from '#server/presenters/change-summary';
import { movedFindings } from '#server/presenters/moved-findings';
import { aFinding } from '#tests/builders/a-finding';
import { aLimit } from '#tests/builders/a-limit';

describe('findings that moved since the revision before', () => {
  const now = aFinding({
    outcome: 'pass',
    observed: { value: 14.32, rounded: 14.3, text: '14.3', unit: '%', statistic: 'mean', count: 2 },
  });

  it('keeps the old outcome and value where either is another now', () => {
    expect(movedFindings([aFinding()], [now])).toEqual([
      { key: 'vma~design point', previousOutcome: 'fail', previousText: '13.9', previousLimit: null },
    ]);
  });

  it('gives the old limit where the limit moved', () => {
    const before = { ...now, limit: aLimit({ min: 15, decimals: 1 }) };
    expect(movedFindings([before], [now])[0]?.previousLimit).toBe('at least 15.0');
  });

  it('leaves out what stayed and what was not judged before', () => {
    const added = aFinding({ rule: 'air-voids' });
    expect(movedFindings([now], [{ ...now, reason: 'worded anew' }, added])).toEqual([]);
  });

  it('counts a mark of borderline that came or went as a move', () => {
    expect(movedFindings([now], [{ ...now, borderline: true }])).toHaveLength(1);
  });
});

describe('the change between two revisions in words', () => {
  const record = (binderContent: number, more: { air?: number; sand?: number; grade?: string } = {}) =>
    mixRecordSchema.parse({
      attributes: { binderGrade: { value: more.grade ?? 'PG 64-22', origin: 'reported' } },
      readings: [
        {
          quantity: 'binder-content',
          value: binderContent,
          unit: '%',
          at: { trial: 'design' },
          origin: 'measured',
        },
        ...(more.air === undefined
          ? []
          : [{ quantity: 'air-voids', value: more.air, unit: '%', at: { trial: 'A' }, origin: 'reported' }]),
        {
          quantity: 'stockpile-share',
          value: more.sand ?? 18,
          unit: '%',
          at: { stockpile: 'sand' },
          origin: 'measured',
        },
      ],
    });

  it('names the binder content first and counts the readings that changed', () => {
    expect(changeSummary(record(5.1), record(5.3))).toBe('binder content 5.1 to 5.3 %; 1 reading changed');
  });

  it('names attributes and shares, and counts new readings and those that are gone', () => {
    expect(changeSummary(record(5.3), record(5.3, { sand: 14, grade: 'PG 70-22', air: 4 }))).toBe(
      'binder grade PG 64-22 to PG 70-22; sand 18 to 14 %; 1 reading changed; 1 reading new',
    );
    expect(changeSummary(record(5.3, { air: 4 }), record(5.3))).toBe('1 reading gone');
  });

  it('is absent where both hold the same, wherever the cells stand', () => {
    const moved = record(5.3);
    const [first] = moved.readings;
    if (first !== undefined) first.source = { sheet: 'Trials', cell: 'B2', text: '5.3' };
    expect(changeSummary(record(5.3), moved)).toBeNull();
  });
});
