import { describe, expect, it } from 'vitest';
import { aReading, replicates } from '#tests/builders/a-reading';
import { findingOf } from './check-with';

const voids = {
  measure: { kind: 'reading' as const, quantity: 'air-voids' },
  limit: { target: 4, tolerance: 1 },
};
const gravity = {
  measure: { kind: 'reading' as const, quantity: 'bulk-specific-gravity-mix' },
  limit: { min: '2.300' },
};

describe('the reason of a value that is not shown', () => {
  it('says which mass is missing where the others are given', () => {
    const readings = [
      ...replicates('mass-in-air', [4800, 4805]),
      ...replicates('mass-in-water', [2790, 2791]),
    ];
    const finding = findingOf({ rule: gravity, record: { readings } });
    expect(finding.outcome).toBe('not shown');
    expect(finding.reason).toBe(
      'There is no reading of bulk specific gravity of the compacted mix. It cannot be computed either: saturated surface-dry mass is missing.',
    );
  });

  it('says so where the masses are of different specimens', () => {
    const mass = (quantity: string, value: number, specimen: string) =>
      aReading({ quantity, value, at: { trial: 'design', specimen } });
    const readings = [
      mass('mass-in-air', 4800, '1'),
      mass('mass-in-water', 2790, '2'),
      mass('mass-saturated-surface-dry', 4810, '3'),
    ];
    expect(findingOf({ rule: gravity, record: { readings } }).reason).toContain('does not belong together');
  });

  it('looks through a derived value down to the raw readings', () => {
    const readings = [
      aReading({ quantity: 'maximum-specific-gravity', value: 2.5 }),
      ...replicates('mass-in-air', [4800]),
      ...replicates('mass-in-water', [2790]),
    ];
    const finding = findingOf({ rule: voids, record: { readings } });
    expect(finding.reason).toContain('It cannot be computed either: saturated surface-dry mass is missing.');
  });

  it('says nothing of it where nothing of what it is computed from is given', () => {
    expect(findingOf({ rule: gravity }).reason).toBe(
      'There is no reading of bulk specific gravity of the compacted mix.',
    );
  });
});

describe('recycled material that is stated as none', () => {
  const ratio = {
    measure: { kind: 'reading' as const, quantity: 'recycled-binder-ratio' },
    limit: { max: '0.25' },
  };
  const pb = aReading({ quantity: 'binder-content', value: 5.2 });
  const content = (material: 'rap' | 'ras', value: number) =>
    aReading({ quantity: `${material}-content`, value });

  it('gives a recycled binder ratio of zero, with both contents in the thread', () => {
    const finding = findingOf({
      rule: ratio,
      record: { readings: [pb, content('rap', 0), content('ras', 0)] },
    });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { value: 0 } });
    expect(finding.evidence[0]?.inputs?.map(({ symbol, value }) => [symbol, value])).toEqual([
      ['RAP', 0],
      ['RAS', 0],
      ['Pb', 5.2],
    ]);
  });

  it('decides a condition on the ratio', () => {
    const when = {
      fact: 'quantity',
      params: { quantity: 'recycled-binder-ratio', at: {} },
      operator: 'greaterThan' as const,
      value: 0.25,
    };
    const readings = [pb, content('rap', 0), content('ras', 0)];
    expect(findingOf({ rule: { when }, record: { readings } }).outcome).toBe('not applicable');
  });

  it('gives none where some of one material is in the mix and its binder content is missing', () => {
    const readings = [pb, content('rap', 0), content('ras', 5)];
    expect(findingOf({ rule: ratio, record: { readings } }).outcome).toBe('not shown');
  });
});
