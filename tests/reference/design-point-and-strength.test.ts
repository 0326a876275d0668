import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { designBinderContent, propertyAt } from '#rules/calculations/design-point';
import { tensileStrength, tensileStrengthRatio } from '#rules/calculations/tensile-strength';
import { leastSquares } from '#rules/numerics/least-squares';
import { mean } from '#rules/numerics/mean';
import records from './design-point-and-strength.json';
import { numberOf, referenceRecord } from './reference-record';

const numbers = z.array(z.number());

describe('design binder content from five trials (MS-2, voids at the target)', () => {
  const { inputs, expected } = referenceRecord(records, 'MAR-07', {
    inputs: z.looseObject({ Pb: numbers, Va: numbers, VMA: numbers, target_Va: z.number() }),
    expected: z.looseObject({
      Pb_linear_interpolation: z.number(),
      Pb_least_squares_quadratic: z.number(),
      quadratic_Va_coefficients_c2_c1_c0: numbers,
      VMA_at_Pb_quadratic: z.number(),
    }),
  });
  const points = (values: number[]) => inputs.Pb.map((Pb, place) => ({ Pb, value: values[place]! }));
  const within = 0.0005;

  it('fits the published parabola through the air voids', () => {
    const fit = leastSquares(inputs.Pb, inputs.Va, 2);
    if (!fit.ok) throw new Error(fit.reason);
    expected.quadratic_Va_coefficients_c2_c1_c0.toReversed().forEach((coefficient, power) => {
      expect(fit.coefficients[power]).toBeCloseTo(coefficient, 6);
    });
  });

  it('finds the content at 4.0 % by the parabola and by the line', () => {
    const quadratic = numberOf(designBinderContent(points(inputs.Va), inputs.target_Va, 'quadratic'));
    const linear = numberOf(designBinderContent(points(inputs.Va), inputs.target_Va, 'linear'));
    expect(Math.abs(quadratic - expected.Pb_least_squares_quadratic)).toBeLessThanOrEqual(within);
    expect(Math.abs(linear - expected.Pb_linear_interpolation)).toBeLessThanOrEqual(within);
  });

  it('reads VMA from its own parabola at that content', () => {
    const vma = numberOf(propertyAt(points(inputs.VMA), expected.Pb_least_squares_quadratic, 'quadratic'));
    expect(Math.abs(vma - expected.VMA_at_Pb_quadratic)).toBeLessThanOrEqual(within);
  });
});

it('turns six loads into strengths and their ratio of means (AASHTO T 283)', () => {
  const { inputs, expected } = referenceRecord(records, 'MAR-12', {
    inputs: z.object({
      dry_load_kN: numbers,
      dry_thickness_mm: numbers,
      conditioned_load_kN: numbers,
      conditioned_thickness_mm: numbers,
      diameter_mm: z.number(),
    }),
    expected: z.looseObject({
      S_dry_MPa: numbers,
      S_cond_MPa: numbers,
      mean_dry: z.number(),
      mean_cond: z.number(),
      TSR: z.number(),
    }),
  });
  const strengths = (loads: number[], thicknesses: number[]) =>
    loads.map(
      (P, place) => numberOf(tensileStrength({ P, t: thicknesses[place]!, D: inputs.diameter_mm })) / 1000,
    );
  const dry = strengths(inputs.dry_load_kN, inputs.dry_thickness_mm);
  const conditioned = strengths(inputs.conditioned_load_kN, inputs.conditioned_thickness_mm);
  const within = 5.5e-6;
  dry.forEach((strength, place) => {
    expect(Math.abs(strength - expected.S_dry_MPa[place]!)).toBeLessThanOrEqual(within);
  });
  conditioned.forEach((strength, place) => {
    expect(Math.abs(strength - expected.S_cond_MPa[place]!)).toBeLessThanOrEqual(within);
  });
  const ratio = tensileStrengthRatio({ S1: numberOf(mean(dry)), S2: numberOf(mean(conditioned)) });
  expect(Math.abs(numberOf(ratio) / 100 - expected.TSR)).toBeLessThanOrEqual(within);
  // The mean of the three ratios would be 0.84275 (same record): another number.
  expect(Math.abs(numberOf(ratio) / 100 - 0.84275)).toBeGreaterThan(0.0002);
});
