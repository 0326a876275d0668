import { describe, expect, it } from 'vitest';
import type { Conditions } from '#rules/record';
import { analysisOf, computed, reading, reported, trialReadings } from './analysis-record';

const stockpile = (name: string, share: number, gsb: number, at: Conditions = {}) => [
  reading('stockpile-share', share, { ...at, stockpile: name }, { text: share.toFixed(1) }),
  reading('bulk-specific-gravity-aggregate', gsb, { stockpile: name }, { text: gsb.toFixed(3) }),
];

describe('a blend of stockpiles', () => {
  it('combines gravities by the harmonic mean of the shares', () => {
    const analysis = analysisOf([...stockpile('coarse', 50, 2.6), ...stockpile('fine', 50, 2.8)]);
    // 100/(50/2.6 + 50/2.8) = 2.696296.
    expect(computed(analysis, 'bulk-specific-gravity-aggregate', {})?.value).toBeCloseTo(2.696296, 6);
  });

  it('combines absorptions by the arithmetic mean', () => {
    const analysis = analysisOf([
      reading('stockpile-share', 60, { stockpile: 'coarse' }),
      reading('stockpile-share', 40, { stockpile: 'fine' }),
      reading('water-absorption', 1, { stockpile: 'coarse' }),
      reading('water-absorption', 2, { stockpile: 'fine' }),
    ]);
    expect(computed(analysis, 'water-absorption', {})?.value).toBe(1.4);
  });

  it('is not combined where one stockpile in use has no gravity; the stated one is raw then', () => {
    const analysis = analysisOf([
      ...stockpile('coarse', 50, 2.6),
      reading('stockpile-share', 50, { stockpile: 'fine' }),
      reading('bulk-specific-gravity-aggregate', 2.64),
      reading('binder-specific-gravity', 1.03),
      ...trialReadings('B'),
    ]);
    expect(computed(analysis, 'bulk-specific-gravity-aggregate', {})).toBeUndefined();
    expect(computed(analysis, 'voids-in-mineral-aggregate', { trial: 'B' })?.value).toBeCloseTo(14.2, 2);
  });

  it('takes the combined, not the stated, gravity into VMA', () => {
    const analysis = analysisOf([
      ...stockpile('coarse', 50, 2.6),
      ...stockpile('fine', 50, 2.8),
      reported('bulk-specific-gravity-aggregate', 2.7, {}, '2.700'),
      ...trialReadings('B'),
    ]);
    // 100 − 2.392·94.7/2.696296 = 15.9876.
    expect(computed(analysis, 'voids-in-mineral-aggregate', { trial: 'B' })?.value).toBeCloseTo(15.9876, 3);
    const gravity = computed(analysis, 'bulk-specific-gravity-aggregate', {});
    expect(gravity?.agrees).toBe(false);
    expect(gravity?.cause?.id).toBe('arithmetic-for-harmonic-mean');
  });

  it('combines a gradation only where the shares close', () => {
    const gradation = [
      reading('percent-passing', 40, { stockpile: 'coarse', sieve: 4.75 }),
      reading('percent-passing', 90, { stockpile: 'fine', sieve: 4.75 }),
    ];
    const closed = analysisOf([...stockpile('coarse', 50, 2.6), ...stockpile('fine', 50, 2.8), ...gradation]);
    const open = analysisOf([...stockpile('coarse', 50, 2.6), ...stockpile('fine', 40, 2.8), ...gradation]);
    expect(computed(closed, 'percent-passing', { sieve: 4.75 })?.value).toBe(65);
    expect(computed(open, 'percent-passing', { sieve: 4.75 })).toBeUndefined();
  });

  it('reads a gradation given as retained', () => {
    const stack = (name: string, retained: number[]) =>
      [9.5, 4.75, 0.075].map((sieve, place) =>
        reading('percent-retained', retained[place]!, { stockpile: name, sieve }),
      );
    const analysis = analysisOf([
      ...stockpile('coarse', 50, 2.6),
      ...stockpile('fine', 50, 2.8),
      ...stack('coarse', [30, 50, 19]),
      reading('cumulative-percent-retained', 0, { stockpile: 'fine', sieve: 9.5 }),
      reading('cumulative-percent-retained', 10, { stockpile: 'fine', sieve: 4.75 }),
      reading('cumulative-percent-retained', 91, { stockpile: 'fine', sieve: 0.075 }),
    ]);
    // Coarse passes 70, 20, 1; fine passes 100, 90, 9.
    const passing = [9.5, 4.75, 0.075].map(
      (sieve) => computed(analysis, 'percent-passing', { sieve })?.value,
    );
    expect(passing).toEqual([85, 55, 5]);
  });

  it('uses the stated fines for the dust proportion and keeps the blend for comparison', () => {
    const analysis = analysisOf([
      ...stockpile('coarse', 50, 2.6),
      ...stockpile('fine', 50, 2.68),
      reading('percent-passing', 2, { stockpile: 'coarse', sieve: 0.075 }, { text: '2.0' }),
      reading('percent-passing', 9, { stockpile: 'fine', sieve: 0.075 }, { text: '9.0' }),
      reading('percent-passing', 5, { sieve: 0.075 }, { text: '5.0' }),
      reading('binder-specific-gravity', 1.03),
      ...trialReadings('B'),
    ]);
    expect(computed(analysis, 'percent-passing', { sieve: 0.075 })).toMatchObject({
      value: 5.5,
      agrees: false,
    });
    const dust = computed(analysis, 'dust-proportion', { trial: 'B' });
    expect(dust?.inputs[0]?.value).toBe(5);
  });
});

it('combines the stockpiles beside a stated job-mix gradation, and compares with that', () => {
  const analysis = analysisOf([
    ...stockpile('coarse', 50, 2.6),
    ...stockpile('fine', 50, 2.8),
    reading('percent-passing', 40, { stockpile: 'coarse', sieve: 4.75 }),
    reading('percent-passing', 90, { stockpile: 'fine', sieve: 4.75 }),
    reading('percent-passing', 64.5, { sieve: 4.75 }),
    reading('percent-passing', 66, { trial: 'design', sieve: 4.75 }),
  ]);
  const blend = computed(analysis, 'percent-passing', { sieve: 4.75 });
  expect(blend?.value).toBe(65);
  expect(blend?.reported?.value).toBe(66);
});

it('recomputes a stated fineness modulus from the stockpile it is stated for', () => {
  const passing = [100, 98, 80, 60, 40, 20, 5];
  const sand = [9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15].map((sieve, place) =>
    reading(
      'percent-passing',
      passing[place]!,
      { stockpile: 'sand', sieve },
      { text: passing[place]!.toFixed(1) },
    ),
  );
  const analysis = analysisOf([...sand, reported('fineness-modulus', 2.5, { stockpile: 'sand' }, '2.50')]);
  // (0 + 2 + 20 + 40 + 60 + 80 + 95)/100 = 2.97.
  const modulus = computed(analysis, 'fineness-modulus', { stockpile: 'sand' });
  expect(modulus?.value).toBe(2.97);
  expect(modulus?.agrees).toBe(false);
});

describe('several blends', () => {
  const blends = [
    ...stockpile('coarse', 60, 2.6, { blend: '1' }),
    ...stockpile('fine', 40, 2.8, { blend: '1' }),
    reading('stockpile-share', 50, { stockpile: 'coarse', blend: '2' }),
    reading('stockpile-share', 50, { stockpile: 'fine', blend: '2' }),
  ];
  const design = (at: Conditions) => [
    reading('binder-content', 5.3, { trial: 'design', ...at }),
    reading('bulk-specific-gravity-mix', 2.392, { trial: 'design' }),
  ];

  it('uses the one that the job mix names', () => {
    const analysis = analysisOf([...blends, ...design({ blend: '2' })]);
    // Gsb of half and half 2.696296; 100 − 2.392·94.7/2.696296 = 15.9876.
    expect(computed(analysis, 'voids-in-mineral-aggregate', { trial: 'design' })?.value).toBeCloseTo(
      15.9876,
      3,
    );
  });

  it('computes nothing from the aggregate where the job mix names none', () => {
    const analysis = analysisOf([...blends, ...design({})]);
    expect(computed(analysis, 'voids-in-mineral-aggregate', { trial: 'design' })).toBeUndefined();
  });
});
