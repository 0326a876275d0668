import { describe, expect, it } from 'vitest';
import type { Reading } from '#rules/record';
import { aggregateReadings, analysisOf, computed, reading, reported } from './analysis-record';

/** Trials whose air voids are exactly the given ones: Gmb = Gmm·(1 − Va/100) with Gmm 2.500. */
function trials(points: [string, number, number][], specimens = 2): Reading[] {
  return points.flatMap(([trial, binder, voids]) => [
    reading('binder-content', binder, { trial }),
    reading('maximum-specific-gravity', 2.5, { trial }),
    ...Array.from({ length: specimens }, (_, place) =>
      reading('bulk-specific-gravity-mix', 2.5 - 0.025 * voids, { trial, specimen: String(place + 1) }),
    ),
  ]);
}

const five: [string, number, number][] = [
  ['A', 4, 6.4],
  ['B', 4.5, 5.1],
  ['C', 5, 3.9],
  ['D', 5.5, 2.9],
  ['E', 6, 2.1],
];

describe('the design without raw readings of its own', () => {
  it('takes the trial whose binder content is within 0.05, the limit included', () => {
    for (const declared of [4.95, 5, 5.05]) {
      const analysis = analysisOf([...trials(five), reading('binder-content', declared)]);
      expect(analysis.designPoint.trial).toBe('C');
      const voids = computed(analysis, 'air-voids', { trial: 'design' });
      expect(voids).toMatchObject({ origin: 'recomputed', count: 2 });
      expect(voids?.value).toBeCloseTo(3.9, 9);
    }
  });

  it('interpolates beyond 0.05, by least squares from four binder contents on', () => {
    const analysis = analysisOf([...trials(five), reading('binder-content', 4.94)]);
    // 23.28 − 5.588571·4.94 + 0.342857·4.94² (parabola by numpy over the same five points) = 4.0394.
    const voids = computed(analysis, 'air-voids', { trial: 'design' });
    expect(voids?.origin).toBe('interpolated');
    expect(voids?.value).toBeCloseTo(4.0394, 4);
    expect(analysis.designPoint.trial).toBeNull();
  });

  it('interpolates on the line between the neighbours with three contents', () => {
    const analysis = analysisOf([...trials(five.slice(1, 4)), reading('binder-content', 5.2)]);
    // 3.9 + (2.9 − 3.9)·0.2/0.5 = 3.5.
    expect(computed(analysis, 'air-voids', { trial: 'design' })?.value).toBeCloseTo(3.5, 9);
    expect(analysis.designPoint.fit).toBe('linear');
  });

  it('counts the fewest specimens of the trials used', () => {
    const uneven = [...trials(five.slice(0, 2), 3), ...trials(five.slice(2), 2)];
    const analysis = analysisOf([...uneven, reading('binder-content', 4.75)]);
    expect(computed(analysis, 'air-voids', { trial: 'design' })?.count).toBe(2);
  });

  it('never reaches beyond the trials', () => {
    const analysis = analysisOf([...trials(five), reading('binder-content', 6.1)]);
    expect(computed(analysis, 'air-voids', { trial: 'design' })).toBeUndefined();
  });

  it('uses only values that were themselves recomputed', () => {
    const analysis = analysisOf([
      ...five.flatMap(([trial, binder, voids]) => [
        reading('binder-content', binder, { trial }),
        reported('air-voids', voids, { trial }),
      ]),
      reading('binder-content', 4.75),
    ]);
    expect(computed(analysis, 'air-voids', { trial: 'design' })).toBeUndefined();
  });

  it('fits neither relative density nor strength ratios nor index tests', () => {
    const extra = five.flatMap(([trial], place) => [
      reading('tensile-strength-dry', 1000, { trial }),
      reading('tensile-strength-conditioned', 800 + place, { trial }),
      reading('fracture-energy', 1800 + place, { trial, specimen: '1' }),
      reading('post-peak-slope', -2, { trial, specimen: '1' }),
    ]);
    const analysis = analysisOf([
      ...trials(five),
      ...extra,
      reading('gyrations-design', 100),
      reading('binder-content', 4.75),
    ]);
    const ofDesign = analysis.recomputed
      .filter(({ at }) => at.trial === 'design')
      .map(({ quantity }) => quantity);
    expect(ofDesign).toContain('air-voids');
    expect(ofDesign).not.toContain('relative-density');
    expect(ofDesign).not.toContain('tensile-strength-ratio');
    expect(ofDesign).not.toContain('flexibility-index');
  });

  it('never takes a measured quantity from a trial', () => {
    const analysis = analysisOf([
      reading('mass-in-air', 4800, { trial: 'C', specimen: '1' }),
      reading('mass-saturated-surface-dry', 4810, { trial: 'C', specimen: '1' }),
      reading('mass-in-water', 2810, { trial: 'C', specimen: '1' }),
      reading('maximum-specific-gravity', 2.5, { trial: 'C' }),
      reading('binder-content', 5, { trial: 'C' }),
      reading('binder-content', 5),
    ]);
    expect(computed(analysis, 'bulk-specific-gravity-mix', { trial: 'C' })).toBeDefined();
    expect(computed(analysis, 'bulk-specific-gravity-mix', { trial: 'design' })).toBeUndefined();
    expect(computed(analysis, 'air-voids', { trial: 'design' })?.value).toBeCloseTo(4, 9);
  });
});

describe('the design with raw readings of its own', () => {
  it('uses them before any trial', () => {
    const analysis = analysisOf([
      ...trials(five),
      reading('binder-content', 5, { trial: 'design' }),
      reading('maximum-specific-gravity', 2.5, { trial: 'design' }),
      reading('bulk-specific-gravity-mix', 2.41, { trial: 'design', specimen: '1' }),
    ]);
    // 100·(2.5 − 2.41)/2.5 = 3.6, not trial C's 3.9.
    expect(computed(analysis, 'air-voids', { trial: 'design' })?.value).toBeCloseTo(3.6, 9);
  });

  it('takes a mix reading without a trial as its own', () => {
    const analysis = analysisOf([
      reading('maximum-specific-gravity', 2.5),
      reading('bulk-specific-gravity-mix', 2.41, { specimen: '1' }),
    ]);
    expect(computed(analysis, 'air-voids', { trial: 'design' })?.value).toBeCloseTo(3.6, 9);
  });
});

describe('the computed design point', () => {
  it('is the content at which the trials reach the target air voids', () => {
    const analysis = analysisOf([...trials(five), reading('binder-content', 5)]);
    // 4.95795 by least squares (numpy, same points).
    expect(analysis.designPoint.computedBinderContent).toBeCloseTo(4.95795, 5);
    expect(analysis.designPoint.declaredBinderContent).toBe(5);
    expect(computed(analysis, 'design-binder-content', { trial: 'design' })?.origin).toBe('interpolated');
  });

  it('is null where the trials do not reach the target', () => {
    const analysis = analysisOf(trials(five.slice(0, 2)));
    expect(analysis.designPoint.computedBinderContent).toBeNull();
    expect(analysis.designPoint.declaredBinderContent).toBeNull();
  });
});

it('gives the same values whatever the order of the readings', () => {
  const readings = [...trials(five), ...aggregateReadings(), reading('binder-content', 4.75)];
  const sorted = (all: Reading[]) =>
    analysisOf(all)
      .recomputed.map(({ quantity, at, value }) => `${quantity} ${at.trial} ${value}`)
      .toSorted();
  expect(sorted(readings.toReversed())).toEqual(sorted(readings));
});
