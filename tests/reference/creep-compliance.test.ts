import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { creepBandAt } from '#rules/calculations/creep-band';
import {
  complianceFromStrain,
  decadesBeyond,
  logLogSlope,
  nonLinearityPercent,
  powerCompliance,
  pronyCompliance,
  sigmoidCompliance,
} from '#rules/calculations/creep-compliance';
import { type CreepFit, fitCreep } from '#rules/calculations/creep-fit';
import {
  correctionFactor,
  correctionLimits,
  indirectTensionCompliance,
  poissonRatio,
  trimmedDeformation,
} from '#rules/calculations/creep-indirect-tension';
import { masterCurve } from '#rules/calculations/creep-master-curve';
import type { CreepModelName } from '#rules/calculations/creep-model';
import { relaxationByInversion } from '#rules/calculations/creep-relaxation';
import { strainUnderSteps } from '#rules/calculations/creep-superposition';
import { convert } from '#rules/quantities/units';
import records from './creep-compliance.json';
import { numberOf, referenceRecord } from './reference-record';

const numbers = z.array(z.number());

function fitted(model: CreepModelName, t: readonly number[], D: readonly number[]): CreepFit {
  const result = fitCreep(
    model,
    t.map((time, i) => ({ t: time, D: D[i]! })),
  );
  if (!result.ok) throw new Error(result.reason);
  return result.fit;
}

function parameter({ parameters }: CreepFit, symbol: string): number {
  return parameters.find((each) => each.symbol === symbol)!.value;
}

describe('indirect tension (AASHTO T 322; formulas from memory, verify)', () => {
  it.each(['CRP-01a', 'CRP-01c'])(
    '%s: correction factor, its limits, Poisson’s ratio and compliance',
    (id) => {
      const { inputs, expected } = referenceRecord(records, id, {
        inputs: z.object({
          dX_mm: z.number(),
          X_over_Y: z.number(),
          D_mm: z.number(),
          b_mm: z.number(),
          P_kN: z.number(),
          GL_mm: z.number(),
        }),
        expected: z.object({
          C: z.number(),
          C_lower: z.number(),
          C_upper: z.number(),
          Poisson: z.number(),
          D_t_per_GPa: z.number(),
          D_t_per_psi: z.number(),
        }),
      });
      const disc = { b: inputs.b_mm, D: inputs.D_mm };
      const C = numberOf(correctionFactor({ ratio: inputs.X_over_Y, ...disc }));
      expect(C).toBeCloseTo(expected.C, 4);
      expect(correctionLimits(disc).least).toBeCloseTo(expected.C_lower, 4);
      expect(correctionLimits(disc).most).toBeCloseTo(expected.C_upper, 4);
      expect(numberOf(poissonRatio({ ratio: inputs.X_over_Y, ...disc }))).toBeCloseTo(expected.Poisson, 4);
      const D = numberOf(
        indirectTensionCompliance({ dX: inputs.dX_mm, ...disc, P: inputs.P_kN, GL: inputs.GL_mm, C }),
      );
      // Printed to five significant digits.
      expect(D / expected.D_t_per_GPa).toBeCloseTo(1, 4);
      expect(numberOf(convert(D, '1/GPa', '1/psi')) / expected.D_t_per_psi).toBeCloseTo(1, 4);
    },
  );

  const six = referenceRecord(records, 'CRP-02', {
    inputs: z.object({ six_face_values_mm: numbers }),
    expected: z.object({ trimmed_mean: z.number(), plain_mean: z.number() }),
  });
  const faces = six.inputs.six_face_values_mm.map((deformation) => ({ deformation, b: 50, D: 150, P: 10 }));

  it('CRP-02: drops one highest and one lowest of six faces', () => {
    const trimmed = numberOf(trimmedDeformation(faces));
    expect(trimmed).toBeCloseTo(six.expected.trimmed_mean, 8);
    expect(trimmed).not.toBeCloseTo(six.expected.plain_mean, 6);
  });

  it('CRP-02, note: with five faces gives nothing, not a mean of what is left', () => {
    expect(trimmedDeformation(faces.slice(1))).toEqual({
      ok: false,
      reason: expect.stringContaining('there are 5'),
    });
  });
});

describe('the power law', () => {
  const series = z.object({
    D1_per_psi: z.number(),
    m: z.number(),
    t_s: numbers,
    D_per_psi: numbers,
    D_per_GPa: numbers,
  });
  const { expected } = referenceRecord(records, 'CRP-03a', {
    inputs: z.object({}),
    expected: z.object({ by_temperature_C: z.record(z.string(), series) }),
  });

  it.each(Object.entries(expected.by_temperature_C))(
    'CRP-03a at %s °C: the fit gives back D1 and m',
    (_, own) => {
      const D = own.D_per_psi.map((value) => numberOf(convert(value, '1/psi', '1/GPa')));
      // Printed to five significant digits.
      D.forEach((value, i) => {
        expect(value / own.D_per_GPa[i]!).toBeCloseTo(1, 4);
      });
      const fit = fitted('power', own.t_s, D);
      expect(fit.rejected).toBeNull();
      expect(fit.rSquared).toBeCloseTo(1, 7);
      const at = (time: number) => {
        const band = creepBandAt(fit, time, 0.95);
        if (!band.ok) throw new Error(band.reason);
        return band.band.estimate;
      };
      own.t_s.forEach((time, i) => {
        expect(at(time) / own.D_per_GPa[i]!).toBeCloseTo(1, 4);
      });
      expect(numberOf(logLogSlope({ t: 10, D: at(10) }, { t: 100, D: at(100) }))).toBeCloseTo(own.m, 3);
    },
  );

  it('CRP-03a: D1·t^m at each time', () => {
    for (const { D1_per_psi, m, t_s, D_per_psi } of Object.values(expected.by_temperature_C)) {
      t_s.forEach((t, i) => {
        const D = numberOf(powerCompliance({ D0: 0, D1: D1_per_psi, m }, t));
        expect(D / D_per_psi[i]!).toBeCloseTo(1, 4);
      });
    }
  });

  const published = referenceRecord(records, 'CRP-04', {
    inputs: z.object({}),
    expected: z.object({
      mixture: z.array(z.string()),
      D_1000s_per_GPa: numbers,
      D1_per_MPa: numbers,
      m: numbers,
    }),
  }).expected;
  const rows = published.mixture.map((mixture, i) => ({
    mixture,
    D1: published.D1_per_MPa[i]! * 1000,
    m: published.m[i]!,
    D: published.D_1000s_per_GPa[i]!,
  }));
  const misprint = ({ mixture }: { mixture: string }) => mixture === 'WRC3';

  it.each(rows.filter((row) => !misprint(row)))(
    'CRP-04, published parameters of $mixture: D(1000 s) as printed',
    ({ D1, m, D }) => {
      // D1 and m are printed to three significant digits: together they carry D within half a percent.
      expect(Math.abs(numberOf(powerCompliance({ D0: 0, D1, m }, 1000)) / D - 1)).toBeLessThan(0.005);
    },
  );

  it('CRP-04: the printed D1 of WRC3 is ten times what its compliance needs, a misplaced decimal point', () => {
    const { D1, m, D } = rows.find(misprint)!;
    expect(numberOf(powerCompliance({ D0: 0, D1, m }, 1000)) / D).toBeGreaterThan(9);
    expect(Math.abs(numberOf(powerCompliance({ D0: 0, D1: D1 / 10, m }, 1000)) / D - 1)).toBeLessThan(0.01);
  });
});

describe('the Prony series', () => {
  it('CRP-14: four terms and a flow term', () => {
    const { inputs, expected } = referenceRecord(records, 'CRP-14', {
      inputs: z.object({
        D0: z.number(),
        D: numbers,
        tau: numbers,
        eta_flow_GPa_s: z.number(),
        t_s: numbers,
      }),
      expected: z.object({
        D_per_GPa: numbers,
        'D(0)': z.number(),
        limit_without_flow_term: z.number(),
      }),
    });
    const terms = inputs.D.map((D, i) => ({ D, tau: inputs.tau[i]! }));
    const series = { D0: inputs.D0, terms, viscosity: inputs.eta_flow_GPa_s };
    inputs.t_s.forEach((t, i) => {
      expect(numberOf(pronyCompliance(series, t))).toBeCloseTo(expected.D_per_GPa[i]!, 6);
    });
    expect(numberOf(pronyCompliance(series, 0))).toBe(expected['D(0)']);
    const solid = { ...series, viscosity: null };
    expect(numberOf(pronyCompliance(solid, 1e9))).toBeCloseTo(expected.limit_without_flow_term, 9);
  });
});

describe('the sigmoid D∞ + (D0 − D∞)/(1 + (t/τ)^n)', () => {
  const { inputs, expected } = referenceRecord(records, 'CRP-15', {
    inputs: z.object({
      D0: z.number(),
      Dinf: z.number(),
      tau_s_at_0C: z.number(),
      n: z.number(),
      log10_tau_by_T: z.record(z.string(), z.number()),
      t_s: numbers,
    }),
    expected: z.record(z.string(), numbers),
  });
  const { D0, Dinf, n, t_s: times } = inputs;
  const tauAt = (temperature: string) => 10 ** inputs.log10_tau_by_T[temperature]!;

  it.each(Object.entries(expected))('CRP-15 at %s °C: its values', (temperature, D) => {
    times.forEach((t, i) => {
      const value = numberOf(sigmoidCompliance({ D0, Dinf, tau: tauAt(temperature), n }, t));
      expect(value).toBeCloseTo(D[i]!, 8);
    });
  });

  it('CRP-15 at 0 °C: the fit gives back every parameter', () => {
    const fit = fitted('sigmoid', times, expected['0']!);
    expect(fit).toMatchObject({ converged: true, rejected: null });
    // The values carry seven digits, and D∞ is asked for a decade beyond them.
    expect(parameter(fit, 'D0')).toBeCloseTo(D0, 6);
    expect(parameter(fit, 'D∞')).toBeCloseTo(Dinf, 3);
    expect(parameter(fit, 'τ') / tauAt('0')).toBeCloseTo(1, 3);
    expect(parameter(fit, 'n')).toBeCloseTo(n, 5);
  });

  it('CRP-15 at −20 °C: says that neither D∞ nor τ is held, and gives D within the test all the same', () => {
    const fit = fitted('sigmoid', times, expected['-20']!);
    const held = (symbol: string) => fit.parameters.find((each) => each.symbol === symbol)!.held;
    expect([held('D0'), held('D∞'), held('τ')]).toEqual([true, false, false]);
    const within = creepBandAt(fit, 70, 0.95);
    const beyond = creepBandAt(fit, 10_000, 0.95);
    if (!within.ok || !beyond.ok) throw new Error('There is a curve.');
    const exact = numberOf(sigmoidCompliance({ D0, Dinf, tau: tauAt('-20'), n }, 70));
    expect(within.band.estimate).toBeCloseTo(exact, 6);
    expect(within.band.upper! / within.band.lower!).toBeLessThan(1.02);
    expect(beyond.band.upper! / beyond.band.lower!).toBeGreaterThan(10);
  });

  it('CRP-15: shifts the three temperatures by 1.15 and 2.40 decades to one curve', () => {
    const result = masterCurve(
      Object.entries(expected).map(([temperature, D]) => ({
        temperature: Number(temperature),
        points: times.map((t, i) => ({ t, D: D[i]! })),
      })),
    );
    if (!result.ok) throw new Error(result.reason);
    const { shifts, referenceTemperature, fit } = result.master;
    expect(referenceTemperature).toBe(-10);
    // log τ is 2.954, 4.104 and 5.354: the distances from −10 °C are 1.25 and −1.15.
    expect(shifts.map(({ temperature, logShift }) => [temperature, Number(logShift.toFixed(4))])).toEqual([
      [-20, 1.25],
      [-10, 0],
      [0, -1.15],
    ]);
    expect(parameter(fit, 'D∞')).toBeCloseTo(Dinf, 4);
    expect(parameter(fit, 'τ') / tauAt('-10')).toBeCloseTo(1, 4);
  });
});

describe('superposition', () => {
  // The record names its material only by its strains: D0 + D1·(1 − exp(−t/τ)). Under 400 kPa the first strain gives
  // D0 = 0.05; the two that follow give exp(−30/τ) = 0.4724 and so D1 = 0.15 and τ = 40 s.
  const voigt = (t: number) =>
    pronyCompliance({ D0: 0.05, terms: [{ D: 0.15, tau: 40 }], viscosity: null }, t);

  it('CRP-12: creep under 400 kPa for 60 s and recovery', () => {
    const { inputs, expected } = referenceRecord(records, 'CRP-12', {
      inputs: z.object({
        stress_kPa: z.number(),
        on_at_s: z.number(),
        off_at_s: z.number(),
        t_s: numbers,
      }),
      expected: z.object({ strain_microstrain: numbers }),
    });
    const { stress_kPa: stress, on_at_s: on, off_at_s: off } = inputs;
    const steps = [
      { time: on, stress },
      { time: off, stress: -stress },
    ];
    inputs.t_s.forEach((t, i) => {
      expect(numberOf(strainUnderSteps(steps, t, voigt))).toBeCloseTo(expected.strain_microstrain[i]!, 3);
    });
  });

  it('CRP-13: three steps, in any order', () => {
    const { inputs, expected } = referenceRecord(records, 'CRP-13', {
      inputs: z.object({ steps_kPa: z.array(z.tuple([z.number(), z.number()])), t_s: numbers }),
      expected: z.object({ strain_microstrain: numbers }),
    });
    const steps = inputs.steps_kPa.map(([time, stress]) => ({ time, stress }));
    inputs.t_s.forEach((t, i) => {
      const strain = numberOf(strainUnderSteps(steps, t, voigt));
      expect(strain).toBeCloseTo(expected.strain_microstrain[i]!, 3);
      expect(numberOf(strainUnderSteps(steps.toReversed(), t, voigt))).toBeCloseTo(strain, 9);
    });
  });
});

describe('times and stresses', () => {
  it('CRP-18: decades beyond the tested times, on either side', () => {
    const { inputs, expected } = referenceRecord(records, 'CRP-18', {
      inputs: z.object({ tested_times_s: z.tuple([z.number(), z.number()]), asked_s: numbers }),
      expected: z.object({ extrapolation_decades: numbers }),
    });
    const [from, to] = inputs.tested_times_s;
    const decades = inputs.asked_s.map((time) => numberOf(decadesBeyond(time, { from, to })));
    decades.forEach((value, i) => {
      expect(value).toBeCloseTo(expected.extrapolation_decades[i]!, 4);
    });
  });

  it('CRP-19: compliance at two stresses, and how far they lie apart', () => {
    const { inputs, expected } = referenceRecord(records, 'CRP-19', {
      inputs: z.object({ stress_kPa: numbers, strain_microstrain_at_50s: numbers }),
      expected: z.object({ D_per_GPa: z.tuple([z.number(), z.number()]), difference_percent: z.number() }),
    });
    const [low, high] = inputs.stress_kPa.map((stress, i) =>
      numberOf(complianceFromStrain({ strain: inputs.strain_microstrain_at_50s[i]!, stress })),
    ) as [number, number];
    expect([low, high]).toEqual(expected.D_per_GPa);
    expect(numberOf(nonLinearityPercent(low, high))).toBeCloseTo(expected.difference_percent, 3);
  });
});

describe('interconversion', () => {
  it('CRP-09: of a power law with slope n, E(t)·D(t) is 1/(Γ(1 − n)·Γ(1 + n)) = sin(nπ)/(nπ)', () => {
    const n = 0.3;
    const powerLaw = (t: number) => powerCompliance({ D0: 1e-6, D1: 0.1, m: n }, t);
    const relaxation = relaxationByInversion(powerLaw, { from: 1, to: 100 });
    if (!relaxation.ok) throw new Error(relaxation.reason);
    const exact = Math.sin(n * Math.PI) / (n * Math.PI);
    for (const { time, E } of relaxation.points) {
      expect(Math.abs((E * numberOf(powerLaw(time))) / exact - 1)).toBeLessThan(0.005);
    }
  });
});
