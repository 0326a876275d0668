import { describe, expect, it } from 'vitest';
import type { Evidence } from '#rules/engine/finding';
import { aggregateReadings, analysisOf, computed, reading, reported, trialReadings } from './analysis-record';

describe('one trial from its own raw readings', () => {
  const analysis = analysisOf([...trialReadings('B'), ...aggregateReadings()]);
  // Hand calculation of the set in `trialReadings`, to the digits it was carried to.
  it.each([
    ['effective-specific-gravity-aggregate', 2.707, 3],
    ['absorbed-binder', 0.97, 2],
    ['effective-binder-content', 4.38, 2],
    ['air-voids', 4.01, 2],
    ['voids-in-mineral-aggregate', 14.2, 2],
    ['voids-filled-with-asphalt', 71.7, 1],
    ['effective-binder-volume', 10.18, 2],
    ['dust-proportion', 1.14, 2],
  ])('computes %s as %d', (quantity, expected, digits) => {
    expect(computed(analysis, quantity, { trial: 'B' })?.value).toBeCloseTo(expected, digits);
  });

  it('counts the fewest specimens of the inputs that rest on specimens', () => {
    expect(computed(analysis, 'voids-in-mineral-aggregate', { trial: 'B' })?.count).toBe(2);
    const single = analysisOf([
      ...trialReadings('B').map((each) =>
        each.quantity === 'maximum-specific-gravity'
          ? { ...each, at: { trial: 'B', specimen: 'Rice 1' } }
          : each,
      ),
      ...aggregateReadings(),
    ]);
    expect(computed(single, 'air-voids', { trial: 'B' })?.count).toBe(1);
    expect(computed(single, 'voids-in-mineral-aggregate', { trial: 'B' })?.count).toBe(2);
  });

  it("gives each specimen its own value with the trial's Gmm", () => {
    const voids = computed(analysis, 'air-voids', { trial: 'B' });
    // 100·(2.492 − 2.390)/2.492 and 100·(2.492 − 2.394)/2.492.
    expect(voids?.specimens.map(({ specimen }) => specimen)).toEqual(['1', '2']);
    expect(voids?.specimens[0]?.value).toBeCloseTo(4.0931, 4);
    expect(voids?.specimens[1]?.value).toBeCloseTo(3.9326, 4);
  });

  it('leads every number down to its cell', () => {
    const ratio = computed(analysis, 'dust-proportion', { trial: 'B' });
    expect(ratio?.formula).toBe('P0.075/Pbe');
    const leaves = (evidence: Evidence): Evidence[] =>
      evidence.inputs ? evidence.inputs.flatMap(leaves) : [evidence];
    const ends = ratio!.inputs.flatMap(leaves);
    expect(ends.every(({ source }) => source !== null && source.sheet === 'Trials')).toBe(true);
    expect(new Set(ends.map(({ quantity }) => quantity))).toEqual(
      new Set([
        'percent-passing',
        'binder-content',
        'binder-specific-gravity',
        'maximum-specific-gravity',
        'bulk-specific-gravity-aggregate',
      ]),
    );
  });

  it('computes nothing for which a raw reading is missing', () => {
    const withoutGravity = aggregateReadings().filter(
      ({ quantity }) => quantity !== 'bulk-specific-gravity-aggregate',
    );
    const partial = analysisOf([...trialReadings('B'), ...withoutGravity]);
    expect(computed(partial, 'air-voids', { trial: 'B' })).toBeDefined();
    expect(computed(partial, 'voids-in-mineral-aggregate', { trial: 'B' })).toBeUndefined();
    expect(computed(partial, 'voids-filled-with-asphalt', { trial: 'B' })).toBeUndefined();
  });

  it('never computes one reported value from others', () => {
    const derivedOnly = analysisOf([
      reported('air-voids', 4, { trial: 'B' }),
      reported('voids-in-mineral-aggregate', 14, { trial: 'B' }),
      reported('effective-binder-content', 4.4, { trial: 'B' }),
      ...aggregateReadings(),
    ]);
    expect(derivedOnly.recomputed.filter(({ at }) => at.trial !== undefined)).toEqual([]);
  });

  it('converts a reading that is in another unit of its kind, and takes none of another kind', () => {
    const inches = { ...reading('specimen-diameter', 4, {}), unit: 'in' };
    const strength = (diameter: typeof inches) =>
      computed(
        analysisOf([
          reading('failure-load', 11.2, { specimen: '1', variant: 'dry' }),
          reading('specimen-thickness', 63.4, { specimen: '1', variant: 'dry' }),
          diameter,
        ]),
        'tensile-strength-dry',
        { trial: 'design' },
      );
    // 4 in is 101.6 mm: 1106.92 kPa (reference record MAR-12).
    expect(strength(inches)?.value).toBeCloseTo(1106.92, 2);
    expect(strength({ ...inches, unit: '%' })).toBeUndefined();
  });

  it('takes no number from a censored reading', () => {
    const readings = trialReadings('B').map((each) =>
      each.quantity === 'maximum-specific-gravity' ? { ...each, qualifier: '>' as const } : each,
    );
    expect(computed(analysisOf(readings), 'air-voids', { trial: 'B' })).toBeUndefined();
  });
});

describe('gravity of the specimens', () => {
  const masses = (trial: string, specimen: string, [A, B, C]: [number, number, number]) => [
    reading('mass-in-air', A, { trial, specimen }, { text: A.toFixed(1) }),
    reading('mass-saturated-surface-dry', B, { trial, specimen }, { text: B.toFixed(1) }),
    reading('mass-in-water', C, { trial, specimen }, { text: C.toFixed(1) }),
  ];

  it('comes from the masses where they are given, and the stated gravity is compared with it', () => {
    const analysis = analysisOf([
      ...masses('B', '1', [4835.2, 4841.6, 2820]),
      reported('bulk-specific-gravity-mix', 2.392, { trial: 'B', specimen: '1' }),
    ]);
    // 4835.2/(4841.6 − 2820.0) = 2.391769.
    const specimen = computed(analysis, 'bulk-specific-gravity-mix', { trial: 'B', specimen: '1' });
    expect(specimen?.value).toBeCloseTo(2.391769, 6);
    expect(specimen?.agrees).toBe(true);
  });

  it('takes specimens with masses and specimens with a stated gravity together', () => {
    const analysis = analysisOf([
      ...masses('B', '1', [4800, 4810, 2810]),
      reading('bulk-specific-gravity-mix', 2.41, { trial: 'B', specimen: '2' }),
    ]);
    // Mean of 4800/2000 = 2.400 and 2.410.
    const mean = computed(analysis, 'bulk-specific-gravity-mix', { trial: 'B' });
    expect(mean?.value).toBeCloseTo(2.405, 9);
    expect(mean?.count).toBe(2);
  });

  it('keeps the subsets of a moisture test apart from the volumetric specimens', () => {
    const analysis = analysisOf([
      ...trialReadings('design'),
      reading('bulk-specific-gravity-mix', 2.31, { trial: 'design', specimen: 'D1', variant: 'dry' }),
      reading('bulk-specific-gravity-mix', 2.32, { trial: 'design', specimen: 'D2', variant: 'dry' }),
    ]);
    expect(computed(analysis, 'air-voids', { trial: 'design' })?.value).toBeCloseTo(4.01, 2);
    // 100·(2.492 − 2.315)/2.492 = 7.103.
    expect(computed(analysis, 'air-voids', { trial: 'design', variant: 'dry' })?.value).toBeCloseTo(7.103, 3);
  });

  it('leaves specimens that were broken for their strength out, where no condition keeps them apart', () => {
    const analysis = analysisOf([
      ...trialReadings('design'),
      reading('bulk-specific-gravity-mix', 2.31, { trial: 'design', specimen: 'D1' }),
      reading('tensile-strength-dry', 900, { trial: 'design', specimen: 'D1' }),
    ]);
    expect(computed(analysis, 'air-voids', { trial: 'design' })?.value).toBeCloseTo(4.01, 2);
  });
});

describe('relative density', () => {
  const heights = [
    reading('specimen-height', 127.4, { trial: 'B', specimen: '1', gyrations: 8 }),
    reading('specimen-height', 111.3, { trial: 'B', specimen: '1', gyrations: 100 }),
  ];
  const specimen = [
    reading('bulk-specific-gravity-mix', 2.445, { trial: 'B', specimen: '1' }),
    reading('maximum-specific-gravity', 2.563, { trial: 'B' }),
  ];
  const levels = [reading('gyrations-initial', 8), reading('gyrations-design', 100)];

  it('goes from the design gyrations to others by heights, under their names', () => {
    const analysis = analysisOf([...heights, ...specimen, ...levels]);
    // 100·2.445·111.3/(2.563·127.4) = 83.3405 (AASHTO T 312 formula, inputs invented).
    expect(computed(analysis, 'relative-density', { trial: 'B', gyrations: 'initial' })?.value).toBeCloseTo(
      83.3405,
      4,
    );
    // 100·2.445/2.563 = 95.3960.
    expect(computed(analysis, 'relative-density', { trial: 'B', gyrations: 'design' })?.value).toBeCloseTo(
      95.396,
      4,
    );
  });

  it('is left out where a number of gyrations cannot be told to be the design number', () => {
    const analysis = analysisOf([...heights, ...specimen]);
    expect(computed(analysis, 'relative-density', { trial: 'B', gyrations: 'initial' })).toBeUndefined();
    expect(computed(analysis, 'relative-density', { trial: 'B', gyrations: 8 })).toBeUndefined();
  });

  it('uses specimens compacted to the maximum before heights of others', () => {
    const analysis = analysisOf([
      ...specimen,
      ...levels,
      reading('specimen-height', 111.3, { trial: 'B', specimen: '1', gyrations: 'design' }),
      reading('specimen-height', 110, { trial: 'B', specimen: '1', gyrations: 'maximum' }),
      reading('bulk-specific-gravity-mix', 2.49, { trial: 'B', specimen: '3', gyrations: 'maximum' }),
    ]);
    // 100·2.490/2.563 = 97.1518.
    const maximum = computed(analysis, 'relative-density', { trial: 'B', gyrations: 'maximum' });
    expect(maximum?.value).toBeCloseTo(97.1518, 4);
    expect(computed(analysis, 'air-voids', { trial: 'B' })?.value).toBeCloseTo(100 - 95.396, 3);
  });

  it('is not invented for a mix without gyrations', () => {
    const analysis = analysisOf([...trialReadings('B'), ...aggregateReadings()]);
    expect(analysis.recomputed.filter(({ quantity }) => quantity === 'relative-density')).toEqual([]);
  });
});

describe('laboratories', () => {
  it("never mixes the agency's specimens with the contractor's", () => {
    const analysis = analysisOf([
      ...trialReadings('design'),
      reading('bulk-specific-gravity-mix', 2.35, { trial: 'design', specimen: '1', laboratory: 'agency' }),
      reading('maximum-specific-gravity', 2.5, { trial: 'design', laboratory: 'agency' }),
    ]);
    expect(computed(analysis, 'air-voids', { trial: 'design' })?.value).toBeCloseTo(4.01, 2);
    // 100·(2.500 − 2.350)/2.500 = 6.
    expect(computed(analysis, 'air-voids', { trial: 'design', laboratory: 'agency' })?.value).toBeCloseTo(
      6,
      9,
    );
  });
});

describe('strength', () => {
  const broken = (variant: string, specimen: string, load: number, thickness: number) => [
    reading('failure-load', load, { specimen, variant }),
    reading('specimen-thickness', thickness, { specimen, variant }),
  ];
  const subset = (variant: string, loads: number[], thicknesses: number[]) =>
    loads.flatMap((load, place) => broken(variant, `${variant}${place}`, load, thicknesses[place]!));

  it('comes from load and dimensions, and its ratio is of means', () => {
    const analysis = analysisOf([
      ...subset('dry', [11.2, 10.8, 11.5], [63.4, 62.9, 63.8]),
      ...subset('conditioned', [9.4, 9, 9.9], [63.1, 63.5, 63.9]),
      reading('specimen-diameter', 101.6),
    ]);
    // AASHTO T 283 formulas on invented loads: means 1104.08 and 930.77 kPa, ratio 84.303 %.
    expect(computed(analysis, 'tensile-strength-dry', { trial: 'design' })?.value).toBeCloseTo(1104.08, 2);
    expect(computed(analysis, 'tensile-strength-conditioned', { trial: 'design' })?.value).toBeCloseTo(
      930.77,
      2,
    );
    const ratio = computed(analysis, 'tensile-strength-ratio', { trial: 'design' });
    expect(ratio?.value).toBeCloseTo(84.303, 3);
    expect(ratio?.count).toBe(3);
    expect(ratio?.specimens).toEqual([]);
  });

  it('counts stated strengths as raw where no load is given', () => {
    const analysis = analysisOf([
      reading('tensile-strength-dry', 1000, { specimen: '1' }),
      reading('tensile-strength-dry', 1100, { specimen: '2' }),
      reading('tensile-strength-conditioned', 840, { specimen: '3' }),
    ]);
    // 100·840/1050 = 80.
    expect(computed(analysis, 'tensile-strength-ratio', { trial: 'design' })?.value).toBe(80);
    expect(computed(analysis, 'tensile-strength-dry', { trial: 'design' })).toBeUndefined();
  });

  it('computes cracking indices specimen by specimen', () => {
    const analysis = analysisOf(
      ['1', '2'].flatMap((specimen) => [
        reading('fracture-energy', 6000, { specimen, temperature: 25 }),
        reading('post-peak-slope', specimen === '1' ? -2 : -3, { specimen, temperature: 25 }),
        reading('post-peak-displacement', 3, { specimen, temperature: 25 }),
        reading('specimen-thickness', 62, { specimen }),
        reading('specimen-diameter', 150, { specimen }),
      ]),
    );
    // (62/62)·(3/150)·(6000/2) = 60 and (3/150)·(6000/3) = 40.
    const index = computed(analysis, 'cracking-tolerance-index', { trial: 'design', temperature: 25 });
    expect(index?.specimens.map(({ value }) => value)).toEqual([60, 40]);
    expect(index?.value).toBe(50);
    expect(analysis.recomputed.some(({ quantity }) => quantity === 'flexibility-index')).toBe(false);
  });
});

describe('recycled binder ratio', () => {
  it('takes only what is stated, and shows it', () => {
    const analysis = analysisOf([
      reading('binder-content', 5),
      reading('rap-content', 20),
      reading('rap-binder-content', 4.9, { specimen: '1' }),
      reading('rap-binder-content', 5.1, { specimen: '2' }),
    ]);
    // 20·5.0/(100·5) = 0.2.
    const ratio = computed(analysis, 'recycled-binder-ratio', { trial: 'design' });
    expect(ratio?.value).toBe(0.2);
    expect(ratio?.formula).toBe('(RAP·Pb,RAP)/(100·Pb)');
  });

  it('is left out where shingles are in the mix and their binder is not stated', () => {
    const analysis = analysisOf([
      reading('binder-content', 5),
      reading('rap-content', 20),
      reading('rap-binder-content', 5),
      reading('ras-content', 3),
    ]);
    expect(computed(analysis, 'recycled-binder-ratio', { trial: 'design' })).toBeUndefined();
  });
});

describe('field density', () => {
  it('gives in-place voids by what it is a percentage of, and none where that is not said', () => {
    const analysis = analysisOf([
      reading('maximum-specific-gravity', 2.5),
      reading('bulk-specific-gravity-mix', 2.4),
      reading('field-density', 92, { variant: 'maximum', specimen: 'core 1' }),
      reading('field-density', 98, { variant: 'laboratory', specimen: 'core 2' }),
      reading('field-density', 95, { specimen: 'core 3' }),
    ]);
    const voids = (variant: string) =>
      computed(analysis, 'in-place-air-voids', { trial: 'design', variant })?.value;
    // 100 − 92; 100 − 98·(100 − 4)/100 (reference records DEN-01, DEN-04a).
    expect(voids('maximum')).toBe(8);
    expect(voids('laboratory')).toBe(5.92);
    expect(analysis.recomputed.filter(({ quantity }) => quantity === 'in-place-air-voids')).toHaveLength(2);
  });
});

it('states the water that each specimen took up', () => {
  const analysis = analysisOf([
    reading('mass-in-air', 4835.2, { trial: 'B', specimen: '1' }),
    reading('mass-saturated-surface-dry', 4841.6, { trial: 'B', specimen: '1' }),
    reading('mass-in-water', 2820, { trial: 'B', specimen: '1' }),
  ]);
  // 100·6.4/2021.6 = 0.31658.
  expect(computed(analysis, 'specimen-absorption', { trial: 'B' })?.value).toBeCloseTo(0.31658, 5);
});
