import { describe, expect, it } from 'vitest';
import { causes } from '#rules/engine/analysis-cause-table';
import type { Conditions, Reading } from '#rules/record';
import { aggregateReadings, analysisOf, computed, reading, reported, trialReadings } from './analysis-record';

/**
 * Every wrong value is worked out by hand from `trialReadings`: Pb 5.3, Gb 1.030, Gmm 2.492, Gmb 2.392, Gsb 2.640,
 * P0.075 5.0 give Gse 2.70705, Pba 0.96630, Pbe 4.38491, Va 4.01284, VMA 14.19606, VFA 71.7327, Vbe 10.18322.
 */
const base = [...trialReadings('B'), ...aggregateReadings()];

function causeOf(readings: Reading[], quantity: string, at: Conditions) {
  const value = computed(analysisOf(readings), quantity, at);
  expect(value?.agrees).toBe(false);
  return value?.cause?.id ?? null;
}

const inTrial = (quantity: string, text: string, ...others: Reading[]) =>
  causeOf([...base, ...others, reported(quantity, Number(text), { trial: 'B' }, text)], quantity, {
    trial: 'B',
  });

/** The same readings to so many digits that a difference in the third is no rounding. */
const precise = (readings: Reading[]) =>
  readings.map((each) => ({
    ...each,
    source: each.source && { ...each.source, text: (each.value ?? 0).toFixed(8) },
  }));

describe('a cause is named where it alone gives the reported digits', () => {
  it.each([
    // 94.7/(100/2.492 − 5.3)
    ['effective-specific-gravity-aggregate', '2.719', 'binder-gravity-left-out'],
    // 94.7/(100/2.392 − 5.3/1.03)
    ['effective-specific-gravity-aggregate', '2.583', 'bulk-for-maximum-gravity'],
    // 0.96630/1.03
    ['absorbed-binder', '0.938', 'binder-gravity-left-out'],
    // 5.3 − 0.96630
    ['effective-binder-content', '4.334', 'aggregate-share-left-out'],
    ['effective-binder-content', '5.30', 'total-for-effective-binder'],
    // 100·(2.492 − 2.392)/2.392
    ['air-voids', '4.18', 'voids-over-bulk-gravity'],
    // 100 − 2.392·(10000/105.3)/2.640
    ['voids-in-mineral-aggregate', '13.95', 'binder-by-mass-of-aggregate'],
    // 100 − 2.492·94.7/2.640
    ['voids-in-mineral-aggregate', '10.6', 'maximum-for-bulk-gravity'],
    // VMA over Gse 16.3214: 100·(16.3214 − 4.01284)/16.3214
    ['voids-filled-with-asphalt', '75.4', 'effective-for-bulk-gravity'],
    // VMA without Ps 9.3939
    ['voids-filled-with-asphalt', '57.3', 'aggregate-content-left-out'],
    // 100·5.3·2.392/(1.03·14.19606)
    ['voids-filled-with-asphalt', '86.7', 'total-for-effective-binder'],
    // (5.3 − 0.96630)·2.392/1.03
    ['effective-binder-volume', '10.06', 'aggregate-share-left-out'],
    // 4.38491·2.392
    ['effective-binder-volume', '10.49', 'binder-gravity-left-out'],
    // 4.01284, ten times
    ['air-voids', '40.1', 'decimal-point-moved'],
    ['voids-in-mineral-aggregate', '1.42', 'decimal-point-moved'],
    // 14.2 with its first digits the other way round: 41.2; with the last two: 12.4
    ['voids-in-mineral-aggregate', '41.2', 'digits-swapped'],
    ['voids-in-mineral-aggregate', '12.4', 'digits-swapped'],
  ])('%s reported as %s: %s', (quantity, text, cause) => {
    expect(inTrial(quantity, text)).toBe(cause);
  });

  it('knows the apparent for the bulk gravity', () => {
    // 100 − 2.392·94.7/2.750 = 17.628.
    const apparent = reading('apparent-specific-gravity-aggregate', 2.75, {}, { text: '2.750' });
    expect(inTrial('voids-in-mineral-aggregate', '17.6', apparent)).toBe('apparent-for-bulk-gravity');
  });

  it('knows gravities, effective binder and voids that were rounded first', () => {
    const exact = precise([
      ...base.filter(({ quantity }) => !/specific-gravity-mix|maximum/.test(quantity)),
      reading('maximum-specific-gravity', 2.4924, { trial: 'B' }),
      reading('bulk-specific-gravity-mix', 2.3916, { trial: 'B', specimen: '1' }),
    ]);
    const of = (quantity: string, text: string) =>
      causeOf([...exact, reported(quantity, Number(text), { trial: 'B' }, text)], quantity, { trial: 'B' });
    // Unrounded 4.0443; of 2.492 and 2.392 4.0128. VMA unrounded 14.2104; of 2.392 14.1961.
    expect(of('air-voids', '4.013')).toBe('rounded-gravities');
    expect(of('voids-in-mineral-aggregate', '14.196')).toBe('rounded-gravities');
    const whole = (quantity: string, text: string) =>
      causeOf([...precise(base), reported(quantity, Number(text), { trial: 'B' }, text)], quantity, {
        trial: 'B',
      });
    // 5.0/4.4 = 1.1364, unrounded 1.1403; 14.2 − 4.0 = 10.2, unrounded 10.183.
    expect(whole('dust-proportion', '1.136')).toBe('rounded-effective-binder');
    expect(whole('effective-binder-volume', '10.200')).toBe('rounded-voids');
  });

  it('knows the masses of a specimen taken for one another', () => {
    const masses = [
      reading('mass-in-air', 4711.7, { specimen: '1' }),
      reading('mass-saturated-surface-dry', 4719.5, { specimen: '1' }),
      reading('mass-in-water', 2743.9, { specimen: '1' }),
    ];
    const of = (text: string) =>
      causeOf(
        [...masses, reported('bulk-specific-gravity-mix', Number(text), { specimen: '1' }, text)],
        'bulk-specific-gravity-mix',
        { trial: 'design', specimen: '1' },
      );
    // 4711.7/1975.6 = 2.3849; 4711.7/(4711.7 − 2743.9) = 2.3944; 4719.5/1975.6 = 2.3889.
    expect(of('2.394')).toBe('dry-for-surface-dry-mass');
    expect(of('2.389')).toBe('surface-dry-for-dry-mass');
  });

  it('knows means over stockpiles without or with the wrong weights', () => {
    const piles = (quantity: string, values: [number, number]) =>
      (['coarse', 'fine'] as const).flatMap((stockpile, place) => [
        reading('stockpile-share', [30, 70][place]!, { stockpile }, { text: `${[30, 70][place]}.0` }),
        reading(quantity, values[place]!, { stockpile }, { text: values[place]!.toFixed(3) }),
      ]);
    const of = (quantity: string, values: [number, number], text: string) =>
      causeOf([...piles(quantity, values), reported(quantity, Number(text), {}, text)], quantity, {});
    // Shares 30 and 70: 100/(30/2.4 + 70/3) = 2.7907; arithmetic 2.820.
    expect(of('bulk-specific-gravity-aggregate', [2.4, 3], '2.820')).toBe('arithmetic-for-harmonic-mean');
    expect(of('apparent-specific-gravity-aggregate', [2.4, 3], '2.820')).toBe('arithmetic-for-harmonic-mean');
    // 0.3·1 + 0.7·2 = 1.7; without shares 1.5.
    expect(of('water-absorption', [1, 2], '1.50')).toBe('shares-left-out');
  });

  it('knows a strength without the factor 2, and one without π', () => {
    const broken = [
      reading('failure-load', 10, { specimen: '1', variant: 'dry' }, { text: '10.000' }),
      reading('specimen-thickness', 63, { specimen: '1' }, { text: '63.00' }),
      reading('specimen-diameter', 101.6, { specimen: '1' }, { text: '101.60' }),
    ];
    const of = (text: string) =>
      causeOf(
        [...broken, reported('tensile-strength-dry', Number(text), { specimen: '1' }, text)],
        'tensile-strength-dry',
        { trial: 'design', specimen: '1' },
      );
    // 2·10⁶·10/(π·63·101.6) = 994.6; half of it 497.3; without π 3124.6.
    expect(of('497.3')).toBe('factor-two-left-out');
    expect(of('3124.6')).toBe('pi-left-out');
  });

  it('knows heights left out, and their ratio turned round', () => {
    const compacted = [
      ...trialReadings('design'),
      reading('gyrations-initial', 8),
      reading('gyrations-design', 100),
      ...['1', '2'].flatMap((specimen) => [
        reading(
          'specimen-height',
          120,
          { trial: 'design', specimen, gyrations: 'initial' },
          { text: '120.0' },
        ),
        reading(
          'specimen-height',
          110,
          { trial: 'design', specimen, gyrations: 'design' },
          { text: '110.0' },
        ),
      ]),
    ];
    const at = { trial: 'design', gyrations: 'initial' as const };
    const of = (text: string) =>
      causeOf([...compacted, reported('relative-density', Number(text), at, text)], 'relative-density', at);
    // 100·2.392/2.492 = 95.987; times 110/120 87.99; times 120/110 104.71.
    expect(of('96.0')).toBe('heights-left-out');
    expect(of('104.7')).toBe('heights-turned-round');
  });

  it('knows film thickness over total binder, and over the mass of mix', () => {
    // The gradation of `surfaceArea`: 5.9054 m²/kg. 1000·Pbe/(1.03·5.9054·94.7) with P0.075 6.3: Pbe stays 4.38491.
    const sieves = (
      [
        [4.75, 70.1],
        [2.36, 42.4],
        [1.18, 27.2],
        [0.6, 19.8],
        [0.3, 12.4],
        [0.15, 8.3],
        [0.075, 6.3],
      ] as const
    ).map(([sieve, passing]) => reading('percent-passing', passing, { sieve }, { text: passing.toFixed(1) }));
    const readings = [...base.filter(({ quantity }) => quantity !== 'percent-passing'), ...sieves];
    const of = (text: string) =>
      causeOf(
        [...readings, reported('film-thickness', Number(text), { trial: 'B' }, text)],
        'film-thickness',
        {
          trial: 'B',
        },
      );
    // 7.612; of total binder 9.201; over mix 7.209.
    expect(of('9.20')).toBe('total-for-effective-binder');
    expect(of('7.21')).toBe('mix-for-aggregate-mass');
  });

  it('knows recycled content for its share of the binder, and virgin for total binder', () => {
    const readings = [
      reading('binder-content', 6, {}, { text: '6.00' }),
      reading('rap-content', 40, {}, { text: '40.00' }),
      reading('rap-binder-content', 5, {}, { text: '5.000' }),
    ];
    const of = (text: string) =>
      causeOf(
        [...readings, reported('recycled-binder-ratio', Number(text), {}, text)],
        'recycled-binder-ratio',
        {
          trial: 'design',
        },
      );
    // 40·5/(100·6) = 0.333; 40/100; 2/(6 − 2).
    expect(of('0.400')).toBe('recycled-content-for-ratio');
    expect(of('0.500')).toBe('over-virgin-binder');
  });
});

it('leaves a percentage that may be written as a fraction to the reader', () => {
  // 0.142 for 14.2 %.
  expect(inTrial('voids-in-mineral-aggregate', '0.142')).toBeNull();
});

it('names none where a second one fits the digits as well', () => {
  // To one decimal 5.0/5.3 = 0.943 and 4.38491/5.0 = 0.877 are both 0.9.
  expect(inTrial('dust-proportion', '0.9')).toBeNull();
});

it('knows thirty causes or more by name', () => {
  const ids = new Set(Object.values(causes).flatMap((each) => each.map(({ id }) => id)));
  expect(ids.size).toBeGreaterThanOrEqual(30);
});
