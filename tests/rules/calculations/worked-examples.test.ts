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

const trials = [6.4, 5.1, 3.9, 2.9, 2.1].map((value, place) => ({ Pb: 4 + place / 2, value }));

/** The example of each docstring, by hand or from the reference record that its digits come from. */
describe('worked examples', () => {
  it.each([
    [
      'Gmb of three masses: 4835.2/2021.6',
      bulkSpecificGravity({ A: 4835.2, B: 4841.6, C: 2820 }),
      2.39177,
      5,
    ],
    ['water in the specimen: 640/2021.6', specimenAbsorption({ A: 4835.2, B: 4841.6, C: 2820 }), 0.31658, 5],
    [
      'combined gravity (VOL-12)',
      combinedGravity([
        { share: 47.4, value: 2.716 },
        { share: 47.3, value: 2.689 },
      ]),
      2.70245,
      5,
    ],
    [
      'combined absorption: (60·1 + 40·2)/100',
      combinedAbsorption([
        { share: 60, value: 1 },
        { share: 40, value: 2 },
      ]),
      1.4,
      9,
    ],
    ['Gse (VOL-06)', effectiveGravity({ Pb: 5.5, Gb: 1.03, Gmm: 2.47 }), 2.68878, 5],
    ['Gmm at another content (VOL-03)', maximumGravityAt({ Pb: 6, Gb: 1.05, Gse: 2.7172 }), 2.4809, 4],
    ['absorbed binder (VOL-03)', absorbedBinder({ Gb: 1.05, Gse: 2.7172, Gsb: 2.683 }), 0.4926, 4],
    ['effective binder (VOL-12)', effectiveBinderContent({ Pb: 5.3, Pba: 0.8051 }), 4.5376, 4],
    ['air voids (VOL-12)', airVoids({ Gmm: 2.535, Gmb: 2.442 }), 3.669, 3],
    ['VMA (VOL-12)', voidsInMineralAggregate({ Gmb: 2.442, Pb: 5.3, Gsb: 2.70245 }), 14.427, 3],
    ['VFA (VOL-12)', voidsFilledWithAsphalt({ VMA: 14.427, Va: 3.669 }), 74.57, 2],
    ['Vbe: 5.035·2.348/1.05', effectiveBinderVolume({ Pbe: 5.035, Gmb: 2.348, Gb: 1.05 }), 11.259, 3],
    ['dust proportion: 5.5/3.9507', dustProportion({ P0075: 5.5, Pbe: 3.9507 }), 1.3922, 4],
    ['film thickness (VOL-15)', filmThickness({ Pbe: 4.6, Pb: 5.4, Gb: 1.03, SA: 5.9054 }), 7.994, 3],
    [
      'relative density (VOL-17a)',
      relativeDensity({ Gmb: 2.445, Gmm: 2.563, hRef: 111.3, hN: 127.4 }),
      83.3405,
      4,
    ],
    ['in-place voids from Gmm (DEN-01)', inPlaceVoidsFromMaximum(92), 8, 9],
    [
      'in-place voids from laboratory density (DEN-04a)',
      inPlaceVoidsFromLaboratory({ C: 98, Va: 4 }),
      5.92,
      9,
    ],
    ['point-for-point voids (DEN-04a)', pointForPointVoids({ C: 98, Va: 4 }), 6, 9],
    ['tensile strength (MAR-12)', tensileStrength({ P: 11.2, t: 63.4, D: 101.6 }), 1106.92, 2],
    ['strength ratio (MAR-12)', tensileStrengthRatio({ S1: 1104.08, S2: 930.77 }), 84.303, 3],
    [
      'recycled binder: 20·5/(100·5)',
      recycledBinderRatio([{ contentPercent: 20, binderPercent: 5 }], 5),
      0.2,
      9,
    ],
    [
      'cracking tolerance: (3/150)·(6000/2)',
      crackingToleranceIndex({ t: 62, D: 150, Gf: 6000, l75: 3, m75: -2 }),
      60,
      9,
    ],
    ['flexibility: 0.01·1800/2', flexibilityIndex({ Gf: 1800, m: -2 }), 9, 9],
    ['design content (MAR-07)', designBinderContent(trials, 4, 'quadratic'), 4.95795, 5],
    ['property on the line: halfway from 5.1 to 3.9', propertyAt(trials, 4.75, 'linear'), 4.5, 9],
    ['density line (GRD-02-19.0)', maximumDensityLine(4.75, 19), 53.589, 3],
  ] as const)('%s', (_, result, expected, digits) => {
    expect(result.ok).toBe(true);
    expect(result.ok && result.value).toBeCloseTo(expected, digits);
  });
});

describe('what cannot be had says why', () => {
  it.each([
    ['surface-dry mass not above the mass in water', bulkSpecificGravity({ A: 4800, B: 2800, C: 2800 })],
    ['surface-dry below dry mass', bulkSpecificGravity({ A: 4800, B: 4790, C: 2800 })],
    ['a mass of zero', specimenAbsorption({ A: 0, B: 4800, C: 2800 })],
    ['shares below zero', combinedGravity([{ share: -1, value: 2.6 }])],
    ['no share', combinedGravity([{ share: 0, value: 2.6 }])],
    ['a gravity of zero', combinedGravity([{ share: 100, value: 0 }])],
    ['an absorption that is no number', combinedAbsorption([{ share: 100, value: Number.NaN }])],
    ['shares that do not close', combinedPassing([{ share: 99.8, value: 50 }])],
    ['binder of all the mix', effectiveGravity({ Pb: 100, Gb: 1.03, Gmm: 2.5 })],
    ['binder without room for aggregate', effectiveGravity({ Pb: 50, Gb: 1.03, Gmm: 3 })],
    ['VMA of zero', voidsFilledWithAsphalt({ VMA: 0, Va: 4 })],
    ['effective binder of zero', dustProportion({ P0075: 5, Pbe: 0 })],
    ['fines below zero', dustProportion({ P0075: -1, Pbe: 4 })],
    ['a height of zero', relativeDensity({ Gmb: 2.4, Gmm: 2.5, hRef: 115, hN: 0 })],
    ['voids of the whole', inPlaceVoidsFromLaboratory({ C: 98, Va: 100 })],
    ['a diameter of zero', tensileStrength({ P: 10, t: 63, D: 0 })],
    ['no dry strength', tensileStrengthRatio({ S1: 0, S2: 700 })],
    ['a strength below zero', tensileStrengthRatio({ S1: 900, S2: -1 })],
    ['no recycled material', recycledBinderRatio([], 5)],
    [
      'a recycled content that is no number',
      recycledBinderRatio([{ contentPercent: Number.NaN, binderPercent: 5 }], 5),
    ],
    ['a slope of zero', flexibilityIndex({ Gf: 1800, m: 0 })],
    ['no slope at 75 %', crackingToleranceIndex({ t: 62, D: 150, Gf: 6000, l75: 3, m75: 0 })],
    ['one trial', designBinderContent(trials.slice(0, 1), 4, 'quadratic')],
    ['a target that the trials do not reach', designBinderContent(trials, 1, 'quadratic')],
    ['a target that the line does not reach', designBinderContent(trials.slice(0, 2), 4, 'quadratic')],
    ['a content beyond the trials', propertyAt(trials, 6.01, 'quadratic')],
    ['no sieve that retains more than 10', nominalMaximumSize([{ openingMm: 9.5, passingPercent: 90 }])],
    [
      'a coarsest sieve that retains more than 10',
      nominalMaximumSize([{ openingMm: 9.5, passingPercent: 80 }]),
    ],
    ['no gradation', finenessModulus([])],
    ['a missing sieve', surfaceArea([{ openingMm: 4.75, passingPercent: 60 }])],
    ['a sieve of zero', maximumDensityLine(0, 19)],
  ])('%s', (_, result) => {
    expect(result).toEqual({ ok: false, reason: expect.stringMatching(/\w/) });
  });
});

describe('edges', () => {
  it('shares may be off 100 by 0.1 and no more', () => {
    expect(combinedPassing([{ share: 99.9, value: 50 }]).ok).toBe(true);
    expect(combinedPassing([{ share: 100.1, value: 50 }]).ok).toBe(true);
    expect(combinedPassing([{ share: 100.11, value: 50 }]).ok).toBe(false);
  });

  it('10 percent retained is not more than 10', () => {
    const gradation = [19, 12.5, 9.5].map((openingMm, place) => ({
      openingMm,
      passingPercent: [100, 90, 78][place]!,
    }));
    expect(nominalMaximumSize(gradation)).toEqual({ ok: true, value: 12.5 });
  });

  it('a declared content at the outermost trial is not beyond the trials', () => {
    expect(propertyAt(trials, 4, 'linear')).toEqual({ ok: true, value: 6.4 });
    expect(propertyAt(trials, 6, 'quadratic').ok).toBe(true);
  });

  it('a curve over trials turns at the foot of its parabola, on a line at the trials between the ends', () => {
    const vma = [14.9, 14.6, 14.5, 14.7, 15.1].map((value, place) => ({ Pb: 4 + place / 2, value }));
    // Least squares (numpy): 26.16 − 4.757143·Pb + 0.485714·Pb², flat at 4.757143/(2·0.485714).
    const parabola = propertyCurve(vma, 'quadratic');
    expect(parabola.ok && parabola.turns).toEqual([expect.closeTo(4.89706, 5)]);
    const line = propertyCurve(vma, 'linear');
    expect(line.ok && line.turns).toEqual([4.5, 5, 5.5]);
  });

  it('impossible data comes out as the impossible number', () => {
    expect(airVoids({ Gmm: 2.48, Gmb: 2.5 })).toMatchObject({ ok: true });
    const voids = airVoids({ Gmm: 2.5, Gmb: 2.5 });
    expect(voids).toEqual({ ok: true, value: 0 });
  });

  it('carries no binary noise: 100·(2.5 − 2.4)/2.5 is 4', () => {
    expect(airVoids({ Gmm: 2.5, Gmb: 2.4 })).toEqual({ ok: true, value: 4 });
  });
});
