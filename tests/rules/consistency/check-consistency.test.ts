import { describe, expect, it } from 'vitest';
import { checkConsistency } from '#rules/consistency/check-consistency';
import { analyse } from '#rules/engine/analyse';
import { type MixRecordInput, mixRecordSchema, type Reading } from '#rules/record';
import { aggregateReadings, reading, reported, trialReadings } from '../engine/analysis-record';

function observe(readings: Reading[], rest: Omit<MixRecordInput, 'readings'> = {}) {
  const record = mixRecordSchema.parse({ readings, ...rest });
  return checkConsistency(record, analyse(record, { targetAirVoids: 4, fit: 'quadratic' }));
}

function names(readings: Reading[], rest: Omit<MixRecordInput, 'readings'> = {}) {
  return observe(readings, rest).map(({ name, severity }) => `${name} ${severity}`);
}

const sound = [...trialReadings('B'), ...aggregateReadings()];

it('reports nothing about data in order', () => {
  expect(observe([...sound, reading('apparent-specific-gravity-aggregate', 2.75)])).toEqual([]);
});

describe('gravities of the aggregate (the trial has Gse 2.707)', () => {
  const withGravity = (quantity: string, value: number) => [
    ...sound.filter((each) => each.quantity !== quantity),
    reading(quantity, value, {}, { text: value.toFixed(3) }),
  ];
  // Gse is 2.70705 by hand; 0.005 divides shown from held against.
  it.each([
    [2.72, 'effective-below-bulk-gravity required'],
    [2.713, 'effective-below-bulk-gravity required'],
    [2.711, 'effective-below-bulk-gravity advisory'],
  ])('Gsb %d is above Gse: %s', (gsb, expected) => {
    expect(names(withGravity('bulk-specific-gravity-aggregate', gsb))).toContain(expected);
  });

  it.each([
    [2.69, 'effective-above-apparent-gravity required'],
    [2.703, 'effective-above-apparent-gravity advisory'],
  ])('Gsa %d is below Gse: %s', (gsa, expected) => {
    expect(names(withGravity('apparent-specific-gravity-aggregate', gsa))).toContain(expected);
  });

  it('blames the trial, not the design that takes its values', () => {
    const found = observe([
      ...withGravity('bulk-specific-gravity-aggregate', 2.72),
      reading('binder-content', 5.3),
    ]);
    expect(found.map(({ subject }) => subject)).toEqual([
      'effective specific gravity of the aggregate of trial B',
    ]);
  });

  it('names quantity and trial', () => {
    const [found] = observe(withGravity('bulk-specific-gravity-aggregate', 2.72));
    expect(found).toMatchObject({
      subject: 'effective specific gravity of the aggregate of trial B',
      outcome: 'fail',
      quantity: 'effective-specific-gravity-aggregate',
      at: { trial: 'B' },
    });
    expect(found?.limit?.min).toBe(2.72);
    expect(found?.evidence.length).toBe(2);
  });

  it('shows a stockpile whose bulk gravity is above its apparent one', () => {
    const found = names([
      reading('bulk-specific-gravity-aggregate', 2.7, { stockpile: 'fine' }),
      reading('apparent-specific-gravity-aggregate', 2.65, { stockpile: 'fine' }),
      reading('apparent-specific-gravity-aggregate', 2.75, { stockpile: 'coarse' }),
    ]);
    expect(found).toEqual(['bulk-above-apparent-gravity advisory']);
  });

  it('shows a stated negative absorption where Gse cannot be had', () => {
    expect(names([reported('absorbed-binder', -0.2, { trial: 'B' })])).toEqual([
      'negative-absorption advisory',
    ]);
  });
});

describe('specimens', () => {
  it.each([2.492, 2.5])('Gmb %d is not below Gmm 2.492', (gmb) => {
    const found = observe([
      ...sound,
      reading('bulk-specific-gravity-mix', gmb, { trial: 'B', specimen: '3' }),
    ]);
    expect(found.map(({ name, severity, subject }) => [name, severity, subject])).toContainEqual([
      'bulk-not-below-maximum-gravity',
      'required',
      'bulk specific gravity of the compacted mix of trial B, specimen 3',
    ]);
  });

  it('Gmb just below Gmm is possible', () => {
    const found = names([
      ...sound,
      reading('bulk-specific-gravity-mix', 2.491, { trial: 'B', specimen: '3' }),
    ]);
    expect(found.filter((name) => name.startsWith('bulk-not'))).toEqual([]);
  });

  it('VFA above 100 cannot be, 100 can', () => {
    expect(names([reported('voids-filled-with-asphalt', 100, { trial: 'B' })])).toEqual([]);
    expect(names([reported('voids-filled-with-asphalt', 100.4, { trial: 'B' })])).toEqual([
      'voids-filled-above-100 required',
    ]);
  });

  it('shows masses that give no volume', () => {
    const masses = (a: number, b: number, c: number) => [
      reading('mass-in-air', a, { trial: 'B', specimen: '1' }),
      reading('mass-saturated-surface-dry', b, { trial: 'B', specimen: '1' }),
      reading('mass-in-water', c, { trial: 'B', specimen: '1' }),
    ];
    expect(names(masses(4800, 4790, 2800))).toEqual(['masses-out-of-order advisory']);
    expect(names(masses(4800, 4810, 4820))).toEqual(['masses-out-of-order advisory']);
    expect(names(masses(4800, 4800, 2800))).toEqual([]);
  });

  it('shows a specimen that grows under compaction', () => {
    const heights = (design: number) => [
      reading('specimen-height', 120, { trial: 'B', specimen: '1', gyrations: 'initial' }),
      reading('specimen-height', design, { trial: 'B', specimen: '1', gyrations: 'design' }),
    ];
    expect(names(heights(121))).toEqual(['heights-rise advisory']);
    expect(names(heights(115))).toEqual([]);
  });
});

describe('gradations and blends', () => {
  const sieves = (values: [number, number][], at = {}) =>
    values.map(([sieve, passing]) => reading('percent-passing', passing, { ...at, sieve }));

  it('a gradation that rises is required, once, with the sieves named', () => {
    // 85.0 to 86.1 at a smaller sieve (invented gradation of the reference record GRD-09).
    const found = observe(
      sieves(
        [
          [19, 100],
          [12.5, 98.2],
          [9.5, 85],
          [4.75, 86.1],
          [2.36, 60],
        ],
        { stockpile: 'fine' },
      ),
    );
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({
      name: 'gradation-rises',
      severity: 'required',
      subject: 'percent passing of stockpile fine',
    });
    expect(found[0]?.sentence).toBe(
      'Percent passing of stockpile fine rises from 85 at 9.5 mm to 86.1 at 4.75 mm.',
    );
  });

  it('equal neighbours do not rise, and two stockpiles are not one gradation', () => {
    expect(
      names(
        sieves([
          [9.5, 85],
          [4.75, 85],
        ]),
      ),
    ).toEqual([]);
    expect(
      names([...sieves([[9.5, 60]], { stockpile: 'a' }), ...sieves([[4.75, 90]], { stockpile: 'b' })]),
    ).toEqual([]);
  });

  it.each([
    [100, []],
    [100.1, ['shares-not-100 advisory']],
    [99.9, ['shares-not-100 advisory']],
    [100.2, ['shares-not-100 required']],
    [95, ['shares-not-100 required']],
  ])('shares that sum to %d', (total, expected) => {
    const shares = [60, total - 60].map((share, place) =>
      reading('stockpile-share', share, { stockpile: `${place}` }),
    );
    expect(names(shares)).toEqual(expected);
  });

  it('a blend that is not what its stockpiles make is advisory, once', () => {
    const found = observe([
      reading('stockpile-share', 50, { stockpile: 'a' }, { text: '50.00' }),
      reading('stockpile-share', 50, { stockpile: 'b' }, { text: '50.00' }),
      ...sieves(
        [
          [9.5, 80.1],
          [4.75, 40.1],
        ],
        { stockpile: 'a' },
      ),
      ...sieves(
        [
          [9.5, 100],
          [4.75, 90.1],
        ],
        { stockpile: 'b' },
      ),
      ...sieves([
        [9.5, 95.1],
        [4.75, 68.1],
      ]),
    ]);
    expect(found.map(({ name, severity }) => [name, severity])).toEqual([
      ['blend-differs-from-stockpiles', 'advisory'],
    ]);
    // 90.05 against 95.1 is the larger of the two differences.
    expect(found[0]?.observed).toBe(95.1);
    expect(found[0]?.evidence).toHaveLength(2);
  });

  it('a nominal size that the job-mix gradation does not have is advisory', () => {
    const gradation = sieves(
      [
        [19, 100],
        [12.5, 95],
        [9.5, 80],
      ],
      { trial: 'design' },
    );
    const size = (value: number) => ({
      attributes: { nominalMaximumSize: { value, origin: 'reported' as const } },
    });
    expect(names(gradation, size(12.5))).toEqual([]);
    expect(names(gradation, size(19))).toEqual(['nominal-size-differs-from-gradation advisory']);
  });

  it('more particles with two fractured faces than with one is advisory', () => {
    const faces = (two: number) => [
      reading('coarse-aggregate-angularity-one-face', 90),
      reading('coarse-aggregate-angularity-two-faces', two),
    ];
    expect(names(faces(90))).toEqual([]);
    expect(names(faces(95))).toEqual(['two-faces-above-one-face advisory']);
  });
});

describe('suspicious data', () => {
  it('replicates that agree in every digit are advisory', () => {
    const same = ['1', '2', '3'].map((specimen) =>
      reading('bulk-specific-gravity-mix', 2.392, { trial: 'B', specimen }),
    );
    const [found] = observe(same);
    expect(found).toMatchObject({ name: 'identical-replicates', severity: 'advisory' });
    expect(found?.sentence).toContain('All 3 specimens of trial B');
    expect(
      names([...same, reading('bulk-specific-gravity-mix', 2.393, { trial: 'B', specimen: '4' })]),
    ).toEqual([]);
  });

  it('two equal rut depths say nothing, three do, and whole percentages never', () => {
    const ruts = (count: number) =>
      Array.from({ length: count }, (_, place) =>
        reading('wheel-track-rut-depth', 10.4, { specimen: String(place), passes: 20000 }),
      );
    const saturations = ['1', '2', '3'].map((specimen) => reading('degree-of-saturation', 75, { specimen }));
    expect(names(ruts(2))).toEqual([]);
    expect(names(ruts(3))).toEqual(['identical-replicates advisory']);
    expect(names(saturations)).toEqual([]);
  });

  it('dimensions and binder contents agree by nature', () => {
    const alike = ['1', '2'].flatMap((specimen) => [
      reading('specimen-diameter', 150, { specimen }),
      reading('binder-content', 5, { specimen }),
    ]);
    expect(names(alike)).toEqual([]);
  });

  it('a stated optimum off the computed one by more than 0.1 is advisory', () => {
    // Va 6.4, 5.1, 3.9, 2.9, 2.1 reach 4.0 at 4.958 % (least squares, numpy).
    const trials = [6.4, 5.1, 3.9, 2.9, 2.1].flatMap((voids, place) => [
      reading('binder-content', 4 + place / 2, { trial: `T${place}` }),
      reading('maximum-specific-gravity', 2.5, { trial: `T${place}` }),
      reading('bulk-specific-gravity-mix', 2.5 - 0.025 * voids, { trial: `T${place}` }),
    ]);
    expect(names([...trials, reading('binder-content', 5.05)])).toEqual([]);
    expect(names([...trials, reading('binder-content', 5.1)])).toEqual([
      'design-binder-content-differs advisory',
    ]);
  });

  it('dates that cannot follow one another are advisory', () => {
    const certificate = { type: 'binder-certificate', date: '2026-02-11', validTo: '2026-02-10' };
    const report = { type: 'mix-design-report', date: '2026-03-01' };
    const late = reading('sand-equivalent', 60, {}, { testedOn: '2026-03-02' });
    expect(names([late], { documents: [certificate, report] })).toEqual([
      'dates-out-of-order advisory',
      'dates-out-of-order advisory',
    ]);
    const inTime = reading('sand-equivalent', 60, {}, { testedOn: '2026-03-01' });
    expect(names([inTime], { documents: [{ ...certificate, validTo: '2026-02-11' }, report] })).toEqual([]);
  });
});

describe('reported against recomputed', () => {
  it('says so with the named cause', () => {
    const found = observe([...sound, reported('dust-proportion', 0.94, { trial: 'B' })]);
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({
      name: 'reported-differs',
      severity: 'advisory',
      subject: 'dust proportion of trial B',
      observed: 0.94,
      reason: 'The workbook divides by total, not effective, binder.',
    });
    expect(found[0]?.sentence).toBe(
      "Dust proportion of trial B is reported as 0.94 and comes to 1.140 from the workbook's own readings.",
    );
  });

  it('shows a single specimen that differs where the mean agrees', () => {
    const found = observe([
      ...sound,
      reported('air-voids', 4.5, { trial: 'B', specimen: '1' }, '4.5'),
      reported('air-voids', 3.6, { trial: 'B', specimen: '2' }, '3.6'),
    ]);
    expect(found.map(({ subject }) => subject)).toEqual([
      'air voids of trial B, specimen 1',
      'air voids of trial B, specimen 2',
    ]);
  });

  it('gives each name and subject once', () => {
    const found = observe([
      ...sound,
      reported('air-voids', 9, { trial: 'B', specimen: '1' }),
      reported('air-voids', 9, { trial: 'B', specimen: '2' }),
      reported('voids-in-mineral-aggregate', 9, { trial: 'B' }),
    ]);
    const keys = found.map(({ name, subject }) => `${name}~${subject}`);
    expect(new Set(keys).size).toBe(keys.length);
  });
});
