import { describe, expect, it } from 'vitest';
import { bulkSpecificGravity, specimenAbsorption } from '#rules/calculations/bulk-specific-gravity';
import { combinedAbsorption, combinedGravity } from '#rules/calculations/combined-gravity';
import { crackingToleranceIndex, flexibilityIndex } from '#rules/calculations/cracking-indices';
import { designBinderContent, propertyAt, propertyCurve } from '#rules/calculations/design-point';
import {
  combinedPassing,
  finenessModulus,
  maximumDensityLine,
  nominalMaximumSize,
} from '#rules/calculations/gradation';
import {
  inPlaceVoidsFromLaboratory,
  inPlaceVoidsFromMaximum,
  pointForPointVoids,
} from '#rules/calculations/in-place-voids';
import { recycledBinderRatio } from '#rules/calculations/recycled-binder-ratio';
import { relativeDensity } from '#rules/calculations/relative-density';
import { surfaceArea } from '#rules/calculations/surface-area';
import { tensileStrength, tensileStrengthRatio } from '#rules/calculations/tensile-strength';
import {
  absorbedBinder,
  airVoids,
  dustProportion,
  effectiveBinderContent,
  effectiveBinderVolume,
  effectiveGravity,
  filmThickness,
  maximumGravityAt,
  voidsFilledWithAsphalt,
  voidsInMineralAggregate,
} from '#rules/calculations/volumetrics';

const NONE = Number.NaN;
const PB = /Pb must be at least 0 and below 100/;
const trials = [6.4, 5.1, 3.9, 2.9, 2.1].map((value, place) => ({ Pb: 4 + place / 2, value }));
const sieves = [4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075];

function passing(percent: number): { openingMm: number; passingPercent: number }[] {
  return sieves.map((openingMm) => ({ openingMm, passingPercent: percent }));
}

/** Each refusal names its own cause: a reader who is told another one repairs the wrong thing. */
describe('what cannot be calculated names the cause', () => {
  it.each([
    ['Gmb without a dry mass', bulkSpecificGravity({ A: 0, B: 2, C: 1 }), /A must be above zero/],
    ['Gmb without a mass in water', bulkSpecificGravity({ A: 1, B: 2, C: NONE }), /C is not a number/],
    ['Gmb of a specimen that floats', bulkSpecificGravity({ A: 2, B: 2, C: 2 }), /above the mass in water/],
    ['Gmb of a dry mass above', bulkSpecificGravity({ A: 3, B: 2, C: 1 }), /not be below the dry mass/],
    ['absorption of a dry mass above', specimenAbsorption({ A: 3, B: 2, C: 1 }), /not be below the dry mass/],
    ['Gse at Pb of 100', effectiveGravity({ Pb: 100, Gb: 1, Gmm: 2.5 }), PB],
    ['Gse below a Pb of 0', effectiveGravity({ Pb: -0.1, Gb: 1, Gmm: 2.5 }), PB],
    ['Gse without Pb', effectiveGravity({ Pb: NONE, Gb: 1, Gmm: 2.5 }), PB],
    ['Gse without Gb', effectiveGravity({ Pb: 5, Gb: 0, Gmm: 2.5 }), /Gb must be above zero/],
    ['Gse without Gmm', effectiveGravity({ Pb: 5, Gb: 1, Gmm: NONE }), /Gmm is not a number/],
    // 100/4 is 25, as much as 25/1.
    ['Gse of binder alone', effectiveGravity({ Pb: 25, Gb: 1, Gmm: 4 }), /no volume for the aggregate/],
    ['Gmm at Pb of 100', maximumGravityAt({ Pb: 100, Gb: 1, Gse: 2.7 }), PB],
    ['Gmm without Gse', maximumGravityAt({ Pb: 5, Gb: 1, Gse: 0 }), /Gse must be above zero/],
    ['Pba without Gse', absorbedBinder({ Gb: 1, Gse: 0, Gsb: 2.6 }), /Gse must be above zero/],
    ['Pba without Gsb', absorbedBinder({ Gb: 1, Gse: 2.7, Gsb: -1 }), /Gsb must be above zero/],
    ['Pbe at Pb of 100', effectiveBinderContent({ Pb: 100, Pba: 1 }), PB],
    ['Pbe without Pba', effectiveBinderContent({ Pb: 5, Pba: NONE }), /Pba is not a number/],
    ['Va without Gmm', airVoids({ Gmm: 0, Gmb: 2.4 }), /Gmm must be above zero/],
    ['VMA at Pb of 100', voidsInMineralAggregate({ Gmb: 2.4, Pb: 100, Gsb: 2.6 }), PB],
    ['VMA without Gsb', voidsInMineralAggregate({ Gmb: 2.4, Pb: 5, Gsb: 0 }), /Gsb must be above zero/],
    ['VFA without Va', voidsFilledWithAsphalt({ VMA: 14, Va: NONE }), /Va is not a number/],
    ['VFA without VMA', voidsFilledWithAsphalt({ VMA: 0, Va: 4 }), /VMA must be above zero/],
    ['Vbe without Pbe', effectiveBinderVolume({ Pbe: NONE, Gmb: 2.4, Gb: 1 }), /Pbe is not a number/],
    ['Vbe without Gb', effectiveBinderVolume({ Pbe: 5, Gmb: 2.4, Gb: 0 }), /Gb must be above zero/],
    ['dust without fines', dustProportion({ P0075: NONE, Pbe: 4 }), /P0075 is not a number/],
    ['dust over nothing', dustProportion({ P0075: 5, Pbe: 0 }), /Pbe must be above zero/],
    ['dust below zero', dustProportion({ P0075: -0.1, Pbe: 4 }), /0.075 mm is below zero/],
    ['film at Pb of 100', filmThickness({ Pbe: 4, Pb: 100, Gb: 1, SA: 6 }), PB],
    ['film without Pbe', filmThickness({ Pbe: NONE, Pb: 5, Gb: 1, SA: 6 }), /Pbe is not a number/],
    ['film without SA', filmThickness({ Pbe: 4, Pb: 5, Gb: 1, SA: 0 }), /SA must be above zero/],
    ['density without hN', relativeDensity({ Gmb: 2.4, Gmm: 2.5, hRef: 115, hN: 0 }), /hN must be above/],
    ['voids of no density', inPlaceVoidsFromMaximum(0), /%Gmm must be above zero/],
    ['voids of no compaction', inPlaceVoidsFromLaboratory({ C: 0, Va: 4 }), /C must be above zero/],
    ['voids without Va', inPlaceVoidsFromLaboratory({ C: 98, Va: NONE }), /Va is not a number/],
    ['voids of nothing else', inPlaceVoidsFromLaboratory({ C: 98, Va: 100 }), /Va must be below 100/],
    ['point for point without C', pointForPointVoids({ C: 0, Va: 4 }), /C must be above zero/],
    ['point for point without Va', pointForPointVoids({ C: 98, Va: NONE }), /Va is not a number/],
    ['a strength without load', tensileStrength({ P: 0, t: 63, D: 100 }), /P must be above zero/],
    ['a ratio to nothing', tensileStrengthRatio({ S1: 0, S2: 700 }), /S1 must be above zero/],
    ['a ratio of what is no number', tensileStrengthRatio({ S1: 900, S2: NONE }), /S2 is not a number/],
    ['a ratio below zero', tensileStrengthRatio({ S1: 900, S2: -1 }), /strength is below zero/],
    ['a share that is no number', combinedGravity([{ share: NONE, value: 2.6 }]), /not a number/],
    ['a gravity that is no number', combinedGravity([{ share: 50, value: NONE }]), /not a number/],
    ['a share below zero', combinedGravity([{ share: -1, value: 2.6 }]), /not be below zero/],
    [
      'one share below zero',
      combinedAbsorption([
        { share: 5, value: 1 },
        { share: -1, value: 1 },
      ]),
      /below zero/,
    ],
    ['no share', combinedAbsorption([{ share: 0, value: 2.6 }]), /no share is above zero/],
    [
      'a gravity of zero',
      combinedGravity([
        { share: 50, value: 0 },
        { share: 50, value: 2.6 },
      ]),
      /gravity must/,
    ],
    ['a blend without a share', combinedPassing([{ share: NONE, value: 50 }]), /not a number/],
    ['a blend without a value', combinedPassing([{ share: 100, value: NONE }]), /not a number/],
    ['a blend that does not close', combinedPassing([{ share: 99, value: 50 }]), /do not sum to 100/],
    ['a size of nothing coarse', nominalMaximumSize(passing(95)), /no sieve retains more than 10/],
    ['a size coarser than all', nominalMaximumSize(passing(50)), /coarsest sieve given already/],
    ['a modulus of nothing', finenessModulus([]), /the 150 mm sieve is missing/],
    ['a line to no size', maximumDensityLine(4.75, 0), /opening must be above zero/],
    ['a line from no opening', maximumDensityLine(0, 19), /opening must be above zero/],
    ['an area without 4.75', surfaceArea(passing(50).slice(1)), /passing 4.75 mm is missing/],
    ['an area without 0.075', surfaceArea(passing(50).slice(0, -1)), /passing 0.075 mm is missing/],
    ['an area of more than all', surfaceArea(passing(100.1)), /4.75 mm is not between 0 and 100/],
    ['an area of less than nothing', surfaceArea(passing(-0.1)), /4.75 mm is not between 0 and 100/],
    ['no recycled material', recycledBinderRatio([], 5), /no recycled material/],
    [
      'recycled over no binder',
      recycledBinderRatio([{ contentPercent: 20, binderPercent: 5 }], 0),
      /Pb must/,
    ],
    ['recycled over 100', recycledBinderRatio([{ contentPercent: 20, binderPercent: 5 }], 100), /Pb must/],
    ['recycled below zero', recycledBinderRatio([{ contentPercent: -1, binderPercent: 5 }], 5), /content is/],
    [
      'its binder below zero',
      recycledBinderRatio([{ contentPercent: 1, binderPercent: -5 }], 5),
      /content is/,
    ],
    ['no energy', crackingToleranceIndex({ t: 62, D: 150, Gf: 0, l75: 3, m75: -2 }), /Gf must be above/],
    [
      'no slope at 75 %',
      crackingToleranceIndex({ t: 62, D: 150, Gf: 6, l75: 3, m75: 0 }),
      /m75 without its sign/,
    ],
    ['no slope', flexibilityIndex({ Gf: 1800, m: 0 }), /m without its sign must be above/],
    ['no fracture energy', flexibilityIndex({ Gf: 0, m: 2 }), /Gf must be above zero/],
    [
      'a design of one trial',
      designBinderContent([trials[0]!, trials[0]!], 4, 'quadratic'),
      /fewer than two/,
    ],
    ['a design beyond the trials', designBinderContent(trials, 1, 'quadratic'), /do not reach the target/],
    ['a design beyond the line', designBinderContent(trials, 1, 'linear'), /do not reach the target/],
    ['a curve of one trial', propertyCurve([trials[0]!, trials[0]!], 'linear'), /fewer than two/],
    ['a property of one trial', propertyAt(trials.slice(0, 1), 4, 'linear'), /fewer than two/],
    ['a property before the trials', propertyAt(trials, 3.99, 'quadratic'), /beyond the trials/],
    ['a property after the trials', propertyAt(trials, 6.01, 'linear'), /beyond the trials/],
    [
      'a curve through what is no number',
      propertyCurve([...trials, { Pb: 5.2, value: NONE }], 'quadratic'),
      /not a number/,
    ],
  ])('%s', (_, result, reason) => {
    expect(result).toEqual({ ok: false, reason: expect.stringMatching(reason) });
  });
});

describe('the ends of each domain belong to it', () => {
  it.each([
    ['a specimen that takes up no water: 4/(4 − 2)', bulkSpecificGravity({ A: 4, B: 4, C: 2 }), 2],
    ['water taken up by it', specimenAbsorption({ A: 4, B: 4, C: 2 }), 0],
    ['Gse of aggregate alone is Gmm', effectiveGravity({ Pb: 0, Gb: 1, Gmm: 2.7 }), 2.7],
    ['no fines', dustProportion({ P0075: 0, Pbe: 4 }), 0],
    ['no strength left', tensileStrengthRatio({ S1: 900, S2: 0 }), 0],
    ['binder that absorbs nothing', effectiveBinderContent({ Pb: 5, Pba: 0 }), 5],
    [
      'Gse below Gsb comes out below zero: 100·1·(2.5 − 2.6)/(2.5·2.6)',
      absorbedBinder({ Gb: 1, Gse: 2.5, Gsb: 2.6 }),
      -1.53846153846,
    ],
    [
      'a share of zero with no gravity',
      combinedGravity([
        { share: 0, value: 0 },
        { share: 100, value: 2.6 },
      ]),
      2.6,
    ],
    ['recycled material of none', recycledBinderRatio([{ contentPercent: 0, binderPercent: 0 }], 5), 0],
    [
      'two recycled materials: (20·5 + 5·20)/(100·5)',
      recycledBinderRatio(
        [
          { contentPercent: 20, binderPercent: 5 },
          { contentPercent: 5, binderPercent: 20 },
        ],
        5,
      ),
      0.4,
    ],
    // Σ of the seven factors is 0.41 + 0.82 + 1.64 + 2.87 + 6.14 + 12.29 + 32.77 = 56.94, and 0.41 beside them.
    ['an area where everything passes', surfaceArea(passing(100)), 57.35],
    ['an area where nothing passes', surfaceArea(passing(0)), 0.41],
    ['the density line at its size', maximumDensityLine(19, 19), 100],
    ['the density line above its size', maximumDensityLine(25, 19), 100],
    [
      'the cracking index of a thinner specimen: (31/62)·(3/150)·(6000/2)',
      crackingToleranceIndex({ t: 31, D: 150, Gf: 6000, l75: 3, m75: 2 }),
      30,
    ],
    ['a design content on the lowest trial', designBinderContent(trials, 6.4, 'linear'), 4],
    ['a design content on the highest trial', designBinderContent(trials, 2.1, 'linear'), 6],
    ['a design content on a trial between', designBinderContent(trials.toReversed(), 3.9, 'linear'), 5],
    // From 5.1 to 3.9 over half a percent: 4.5 + 0.5·(5.1 − 4.5)/1.2.
    ['a design content between two trials', designBinderContent(trials.toReversed(), 4.5, 'linear'), 4.75],
    ['a property at the first trial', propertyAt(trials, 4, 'linear'), 6.4],
    ['a property at the last trial', propertyAt(trials, 6, 'linear'), 2.1],
  ])('%s', (_, result, expected) => {
    expect(result).toEqual({ ok: true, value: expect.closeTo(expected, 9) });
  });

  it('the nominal maximum is one sieve above the first that retains more than 10, in any order', () => {
    const gradation = [
      { openingMm: 9.5, passingPercent: 89 },
      { openingMm: 19, passingPercent: 100 },
      { openingMm: 4.75, passingPercent: 60 },
      { openingMm: 12.5, passingPercent: 95 },
    ];
    expect(nominalMaximumSize(gradation)).toEqual({ ok: true, value: 12.5 });
  });

  it('the fineness modulus counts the sieves of its series only, and coarser ones as retaining nothing', () => {
    const fine = [
      [4.75, 100],
      [3.35, 99],
      [2.36, 90],
      [1.18, 70],
      [0.6, 50],
      [0.3, 20],
      [0.15, 5],
      [0.075, 2],
    ].map(([openingMm, passingPercent]) => ({ openingMm: openingMm!, passingPercent: passingPercent! }));
    // Retained: 0 + 10 + 30 + 50 + 80 + 95 = 265.
    expect(finenessModulus(fine)).toEqual({ ok: true, value: 2.65 });
    expect(finenessModulus(fine.filter(({ openingMm }) => openingMm !== 0.6))).toEqual({
      ok: false,
      reason: expect.stringMatching(/0.6 mm sieve is missing/),
    });
    const coarsestRetains = fine.map((point) =>
      point.openingMm === 4.75 ? { ...point, passingPercent: 98 } : point,
    );
    expect(finenessModulus(coarsestRetains)).toEqual({
      ok: false,
      reason: expect.stringMatching(/150 mm sieve is missing/),
    });
  });

  it('a parabola needs four different binder contents, and the linear method draws none', () => {
    const method = (count: number, asked: 'quadratic' | 'linear') => {
      const curve = propertyCurve([...trials.slice(0, count), trials[0]!], asked);
      return curve.ok ? curve.method : curve.reason;
    };
    expect([method(3, 'quadratic'), method(4, 'quadratic'), method(5, 'linear')]).toEqual([
      'linear',
      'quadratic',
      'linear',
    ]);
  });

  it('a parabola that turns outside the trials, or on the last of them, turns nowhere between', () => {
    const along = (vertex: number) =>
      propertyCurve(
        [4, 4.5, 5, 5.5, 6].map((Pb) => ({ Pb, value: 14 + (Pb - vertex) ** 2 })),
        'quadratic',
      );
    expect(along(7)).toMatchObject({ ok: true, turns: [], from: 4, to: 6 });
    expect(along(3)).toMatchObject({ ok: true, turns: [] });
    expect(along(5.25)).toMatchObject({ ok: true, turns: [expect.closeTo(5.25, 9)] });
  });

  it('the design content of a line is where the voids fall through the target, not where they rise', () => {
    const wavy = [
      { Pb: 4, value: 3 },
      { Pb: 4.5, value: 5 },
      { Pb: 5, value: 5 },
      { Pb: 5.5, value: 3 },
    ];
    // Linear by method: it falls from 5 to 3 between 5 and 5.5, and is 4 halfway.
    expect(designBinderContent(wavy, 4, 'linear')).toEqual({ ok: true, value: 5.25 });
    expect(designBinderContent(wavy, 5, 'linear')).toEqual({ ok: true, value: 5 });
  });
});
