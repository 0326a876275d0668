import { describe, expect, it } from 'vitest';
import {
  complianceFromStrain,
  decadesBeyond,
  firstFall,
  logLogSlope,
  nonLinearityPercent,
  powerCompliance,
  pronyCompliance,
  sigmoidCompliance,
} from '#rules/calculations/creep-compliance';
import {
  correctionFactor,
  correctionLimits,
  fewFaces,
  indirectTensionCompliance,
  loadFromStress,
  poissonRatio,
  trimmedDeformation,
  trimmedRatio,
} from '#rules/calculations/creep-indirect-tension';
import {
  relaxationByInversion,
  relaxationModulus,
  voigtToMaxwell,
  whyNotConvertible,
} from '#rules/calculations/creep-relaxation';
import { strainUnderSteps } from '#rules/calculations/creep-superposition';

const NONE = Number.NaN;
const solid = { D0: 0.045, Dinf: 1.2, tau: 900, n: 0.55 };
const power = { D0: 0.05, D1: 0.0588, m: 0.2 };
const voigt = { D0: 1, terms: [{ D: 1, tau: 1 }], viscosity: null };
const tension = { dX: 0.004, D: 150, b: 50, P: 10, GL: 38, C: 1.2 };
const face = { deformation: 4, b: 50, D: 150, P: 10 };
const constant = () => ({ ok: true, value: 2 }) as const;

function sixWith(odd: object): (typeof face)[] {
  return [...Array(5).fill(face), { ...face, ...odd }];
}

/** Each refusal names its own cause: a reader who is told another one repairs the wrong thing. */
describe('what cannot be calculated of creep names the cause', () => {
  it.each([
    ['strain of none', complianceFromStrain({ strain: NONE, stress: 400 }), /ε is not a number/],
    ['strain over nothing', complianceFromStrain({ strain: 4, stress: 0 }), /σ0 must be above zero/],
    ['a sigmoid from nothing', sigmoidCompliance({ ...solid, D0: 0 }, 1), /D0 must be above zero/],
    ['a sigmoid to nothing', sigmoidCompliance({ ...solid, Dinf: 0 }, 1), /D∞ must be above zero/],
    ['a sigmoid without τ', sigmoidCompliance({ ...solid, tau: 0 }, 1), /τ must be above zero/],
    ['a sigmoid without n', sigmoidCompliance({ ...solid, n: -1 }, 1), /n must be above zero/],
    ['a sigmoid that falls', sigmoidCompliance({ ...solid, Dinf: 0.04 }, 1), /D∞ is below D0/],
    ['a sigmoid before the load', sigmoidCompliance(solid, -1), /t is below zero/],
    ['a sigmoid at no time', sigmoidCompliance(solid, NONE), /t is not a number/],
    ['a power law below zero', powerCompliance({ ...power, D0: -0.1 }, 1), /D0 is below zero/],
    ['a power law of none', powerCompliance({ ...power, D0: NONE }, 1), /D0 is not a number/],
    ['a power law without D1', powerCompliance({ ...power, D1: 0 }, 1), /D1 must be above zero/],
    ['a power law without m', powerCompliance({ ...power, m: 0 }, 1), /m must be above zero/],
    ['a power law before the load', powerCompliance(power, -1), /t is below zero/],
    ['a series below zero', pronyCompliance({ ...voigt, D0: -1 }, 1), /D0 is below zero/],
    ['a series of none', pronyCompliance({ ...voigt, D0: NONE }, 1), /D0 is not a number/],
    ['a series before the load', pronyCompliance(voigt, -1), /t is below zero/],
    ['a term below zero', pronyCompliance({ ...voigt, terms: [{ D: -1, tau: 1 }] }, 1), /Di is below zero/],
    ['a term of none', pronyCompliance({ ...voigt, terms: [{ D: NONE, tau: 1 }] }, 1), /Di is not a number/],
    [
      'a term at no time',
      pronyCompliance({ ...voigt, terms: [{ D: 1, tau: 0 }] }, 1),
      /τi must be above zero/,
    ],
    ['a flow without resistance', pronyCompliance({ ...voigt, viscosity: 0 }, 1), /η must be above zero/],
    ['a slope from no time', logLogSlope({ t: 0, D: 1 }, { t: 2, D: 1 }), /t1 must be above zero/],
    ['a slope to nothing', logLogSlope({ t: 1, D: 1 }, { t: 2, D: 0 }), /D2 must be above zero/],
    [
      'a slope between equal times',
      logLogSlope({ t: 1, D: 1 }, { t: 1, D: 2 }),
      /two different loading times/,
    ],
    ['decades to no time', decadesBeyond(0, { from: 1, to: 10 }), /time must be above zero/],
    ['decades from no time', decadesBeyond(1, { from: 0, to: 10 }), /from must be above zero/],
    ['a difference to nothing', nonLinearityPercent(0.1, 0), /D2 must be above zero/],
    ['five faces', trimmedDeformation(Array(5).fill(face)), /needs six faces.* there are 5/],
    ['one face', trimmedDeformation([face]), /there is 1/],
    ['a face of none', trimmedDeformation(sixWith({ deformation: NONE })), /ΔX is not a number/],
    ['a face without load', trimmedDeformation(sixWith({ P: 0 })), /P must be above zero/],
    ['a face without thickness', trimmedDeformation(sixWith({ b: 0 })), /b must be above zero/],
    ['five ratios', trimmedRatio(Array(5).fill({ horizontal: 4, vertical: 9 })), /there are 5/],
    [
      'a ratio to nothing',
      trimmedRatio([...Array(5).fill({ horizontal: 4, vertical: 9 }), { horizontal: 4, vertical: 0 }]),
      /vertical deformation is zero or missing/,
    ],
    [
      'a ratio of none',
      trimmedRatio([...Array(5).fill({ horizontal: 4, vertical: 9 }), { horizontal: NONE, vertical: 9 }]),
      /zero or missing/,
    ],
    ['a factor without ratio', correctionFactor({ ratio: 0, b: 50, D: 150 }), /X\/Y must be above zero/],
    ['a factor beyond the method', correctionFactor({ ratio: 0.2, b: 50, D: 150 }), /outside the limits/],
    ['a factor short of the method', correctionFactor({ ratio: 0.9, b: 50, D: 150 }), /outside the limits/],
    ['a Poisson ratio without D', poissonRatio({ ratio: 0.4, b: 50, D: 0 }), /D must be above zero/],
    ['a compliance without ΔX', indirectTensionCompliance({ ...tension, dX: NONE }), /ΔX is not a number/],
    ['a compliance without GL', indirectTensionCompliance({ ...tension, GL: 0 }), /GL must be above zero/],
    ['a load without stress', loadFromStress({ stress: 0, b: 50, D: 150 }), /σ must be above zero/],
    ['a modulus of a fluid', voigtToMaxwell({ ...voigt, viscosity: 100 }), /flow term is no solid/],
    ['a modulus of no stiffness', voigtToMaxwell({ ...voigt, D0: 0 }), /D0 must be above zero/],
    [
      'a modulus of an empty term',
      voigtToMaxwell({ ...voigt, terms: [{ D: 0, tau: 1 }] }),
      /Di must be above/,
    ],
    [
      'a modulus of two like terms',
      voigtToMaxwell({
        ...voigt,
        terms: [
          { D: 1, tau: 1 },
          { D: 1, tau: 2 },
          { D: 2, tau: 1 },
        ],
      }),
      /same retardation time/,
    ],
    ['a modulus before the load', relaxationModulus({ Einf: 1, terms: [] }, -1), /t is below zero/],
    ['a modulus at no time', relaxationModulus({ Einf: 1, terms: [] }, NONE), /t is not a number/],
    ['an inversion from nothing', relaxationByInversion(constant, { from: 0, to: 10 }), /from must be above/],
    ['an inversion backwards', relaxationByInversion(constant, { from: 10, to: 1 }), /after the first/],
    ['an inversion of one time', relaxationByInversion(constant, { from: 10, to: 10 }), /after the first/],
    [
      'an inversion of an unknown',
      relaxationByInversion((t) => (t > 5 ? { ok: false, reason: 'no' } : constant()), { from: 1, to: 10 }),
      /not known at every time/,
    ],
    [
      'an inversion of nothing',
      relaxationByInversion(() => ({ ok: true, value: 0 }), { from: 1, to: 10 }),
      /does not hold/,
    ],
    ['a strain at no time', strainUnderSteps([], NONE, constant), /t is not a number/],
    [
      'a step at no time',
      strainUnderSteps([{ time: NONE, stress: 1 }], 1, constant),
      /time of a step is not/,
    ],
    ['a step of none', strainUnderSteps([{ time: 0, stress: NONE }], 1, constant), /stress of a step is not/],
    [
      'a step at an unknown compliance',
      strainUnderSteps([{ time: 0, stress: 1 }], 1, () => ({ ok: false, reason: 'nobody knows' })),
      /nobody knows/,
    ],
  ])('%s', (_, result, reason) => {
    expect(result).toEqual({ ok: false, reason: expect.stringMatching(reason) });
  });

  it('why a model has no modulus: n or m above 1, or no D0', () => {
    expect(whyNotConvertible({ model: 'sigmoid', n: 1 })).toBeNull();
    expect(whyNotConvertible({ model: 'sigmoid', n: 1.01 })).toMatch(/n is above 1/);
    expect(whyNotConvertible({ model: 'power', D0: 0.1, m: 1 })).toBeNull();
    expect(whyNotConvertible({ model: 'power', D0: 0.1, m: 1.01 })).toMatch(/m is above 1/);
    expect(whyNotConvertible({ model: 'power', D0: 0, m: 0.5 })).toMatch(/D0 is not above zero/);
    expect(whyNotConvertible({ model: 'prony' })).toBeNull();
    expect(fewFaces(1)).toMatch(/there is 1$/);
    expect(fewFaces(0)).toMatch(/there are 0$/);
  });
});

describe('the ends of each domain of creep belong to it', () => {
  it.each([
    ['a sigmoid at once', sigmoidCompliance(solid, 0), 0.045],
    ['a sigmoid that does not grow', sigmoidCompliance({ ...solid, Dinf: 0.045 }, 50), 0.045],
    ['a sigmoid after all time', sigmoidCompliance({ ...solid, n: 5 }, 1e300), 1.2],
    ['a power law at once', powerCompliance(power, 0), 0.05],
    ['a power law without D0: 0.0588·1', powerCompliance({ ...power, D0: 0 }, 1), 0.0588],
    // 0.05 + 0.0588·32^0.2, and 32^0.2 is 2.
    ['a power law later on', powerCompliance(power, 32), 0.1676],
    ['a series at once', pronyCompliance({ ...voigt, viscosity: 4 }, 0), 1],
    // 1 + (1 − 1/e) + 2/4 at t = τ = 2: 1 + 0.632120558829 + 0.5.
    [
      'a series with flow at τ',
      pronyCompliance({ D0: 1, terms: [{ D: 1, tau: 2 }], viscosity: 4 }, 2),
      2.132120558829,
    ],
    ['a series without D0', pronyCompliance({ D0: 0, terms: [{ D: 0, tau: 2 }], viscosity: null }, 2), 0],
    ['a slope of 1', logLogSlope({ t: 1, D: 2 }, { t: 10, D: 20 }), 1],
    ['decades at the first time', decadesBeyond(1, { from: 1, to: 100 }), 0],
    ['decades at the last time', decadesBeyond(100, { from: 1, to: 100 }), 0],
    ['decades before the first', decadesBeyond(0.01, { from: 1, to: 100 }), 2],
    ['non-linearity downwards: 100·0.05/0.1', nonLinearityPercent(0.15, 0.1), 50],
    // −0.10 + (1.480 − 0.778/9)·0.16 = 0.122968888889.
    ['Poisson’s ratio', poissonRatio({ ratio: 0.4, b: 50, D: 150 }), 0.122968888889],
    ['Poisson’s ratio at its least', poissonRatio({ ratio: 0.1, b: 50, D: 150 }), 0.05],
    ['Poisson’s ratio at its most', poissonRatio({ ratio: 1, b: 50, D: 150 }), 0.5],
    // Diameters and loads weigh in: D̄ = 160, P̄ = 11 with one specimen of 210 mm and one of 16 kN.
    [
      'a face normalised by diameter and load: 4·(150/160)·(11/10)',
      trimmedDeformation([...Array(4).fill(face), { ...face, D: 210 }, { ...face, P: 16 }]),
      4.125,
    ],
    ['a modulus at once: 0.5 + 0.5', relaxationModulus({ Einf: 0.5, terms: [{ E: 0.5, rho: 0.5 }] }, 0), 1],
    // 0.5 + 0.5/e at t = ρ.
    ['a modulus at ρ', relaxationModulus({ Einf: 0.5, terms: [{ E: 0.5, rho: 0.5 }] }, 0.5), 0.683939720586],
    ['a strain of a step now', strainUnderSteps([{ time: 1, stress: 3 }], 1, constant), 6],
    ['a strain before its step', strainUnderSteps([{ time: 1.01, stress: 3 }], 1, constant), 0],
    [
      'a strain of a load taken off: 3·2 − 1·2',
      strainUnderSteps(
        [
          { time: 0.5, stress: -1 },
          { time: 0, stress: 3 },
        ],
        1,
        constant,
      ),
      4,
    ],
  ])('%s', (_, result, expected) => {
    expect(result).toEqual({ ok: true, value: expect.closeTo(expected, 9) });
  });

  it('the limits of the correction factor are 0.704 − 0.213·b/D and 1.566 − 0.195·b/D', () => {
    // b/D = 1/2.
    expect(correctionLimits({ b: 75, D: 150 })).toEqual({
      least: expect.closeTo(0.5975, 12),
      most: expect.closeTo(1.4685, 12),
    });
  });

  it('one Voigt element is the standard linear solid: E∞ 1/2, E1 1/2, ρ 1/2', () => {
    expect(voigtToMaxwell(voigt)).toEqual({
      ok: true,
      maxwell: { Einf: 0.5, terms: [{ E: expect.closeTo(0.5, 9), rho: expect.closeTo(0.5, 9) }] },
    });
    // D0 = 1, D1 = 2 at τ = 3: E∞ = 1/3, E1 = 1 − 1/3, ρ = τ·D0/(D0 + D1) = 1.
    expect(voigtToMaxwell({ D0: 1, terms: [{ D: 2, tau: 3 }], viscosity: null })).toEqual({
      ok: true,
      maxwell: {
        Einf: expect.closeTo(1 / 3, 12),
        terms: [{ E: expect.closeTo(2 / 3, 9), rho: expect.closeTo(1, 9) }],
      },
    });
  });

  it('the inversion of a constant compliance is its reciprocal, at times within those asked for', () => {
    const inverted = relaxationByInversion(constant, { from: 1, to: 100 });
    if (!inverted.ok) throw new Error(inverted.reason);
    const times = inverted.points.map(({ time }) => time);
    expect(times.length).toBeGreaterThan(70);
    expect(Math.min(...times)).toBeGreaterThanOrEqual(1);
    expect(Math.min(...times)).toBeLessThan(1.1);
    expect(Math.max(...times)).toBeLessThanOrEqual(100);
    expect(Math.max(...times)).toBeGreaterThan(90);
    for (const { E } of inverted.points) expect(E).toBeCloseTo(0.5, 9);
  });

  it('equal compliances and equal times are no fall', () => {
    expect(
      firstFall([
        { t: 1, D: 2 },
        { t: 1, D: 1 },
      ]),
    ).toBeNull();
    expect(
      firstFall([
        { t: 1, D: 2 },
        { t: 2, D: 2 },
      ]),
    ).toBeNull();
    expect(firstFall([])).toBeNull();
    expect(
      firstFall([
        { t: 2, D: 1 },
        { t: 1, D: 2 },
      ]),
    ).toEqual([
      { t: 1, D: 2 },
      { t: 2, D: 1 },
    ]);
  });
});
