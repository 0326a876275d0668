import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { comparePairs, compareSamples } from '#rules/numerics/compare-samples';
import { rangeMultiplier } from '#rules/numerics/difference-limit';
import { criticalOutlier } from '#rules/numerics/outlier-test';
import { numberOf, referenceRecord } from './reference-record';
import records from './statistics.json';

const number = z.number();
const numbers = z.array(number);

describe('two laboratories (FHWA-RD-02-095, appendix F; data invented)', () => {
  const { inputs, expected } = referenceRecord(records, 'QA-14', {
    inputs: z.object({ contractor_binder: numbers, agency_binder: numbers }),
    expected: z.looseObject({
      F: number,
      df: z.tuple([number, number]),
      p_F_two_sided: number,
      t_pooled: number,
      df_pooled: number,
      p_pooled: number,
    }),
  });
  const compared = (significance: number) => {
    const result = compareSamples(inputs.contractor_binder, inputs.agency_binder, significance);
    if (!result.ok) throw new Error(result.reason);
    return result.comparison;
  };

  it('gives F, t and their probabilities', () => {
    const { F, degreesOfF, probabilityF, t, degreesOfT, probabilityT } = compared(0.01);
    expect(F).toBeCloseTo(expected.F, 4);
    expect(degreesOfF).toEqual(expected.df);
    expect(probabilityF).toBeCloseTo(expected.p_F_two_sided, 4);
    expect(t).toBeCloseTo(expected.t_pooled, 4);
    expect(degreesOfT).toBe(expected.df_pooled);
    expect(probabilityT).toBeCloseTo(expected.p_pooled, 4);
  });

  it('takes the means for the same at 1 %, for different at 5 %, the variances for the same at both', () => {
    expect(compared(0.01)).toMatchObject({ sameVariance: true, sameMean: true });
    expect(compared(0.05)).toMatchObject({ sameVariance: true, sameMean: false });
  });

  it('compares split samples by their differences', () => {
    const split = referenceRecord(records, 'QA-15', {
      inputs: z.object({ lab_1: numbers, lab_2: numbers }),
      expected: z.looseObject({ mean_d: number, t: number, df: number, p: number }),
    });
    const result = comparePairs(split.inputs.lab_1, split.inputs.lab_2, 0.01);
    if (!result.ok) throw new Error(result.reason);
    const { comparison } = result;
    expect(comparison.meanDifference).toBe(split.expected.mean_d);
    expect(comparison.t).toBeCloseTo(split.expected.t, 3);
    expect(comparison.degreesOfT).toBe(split.expected.df);
    expect(comparison.probabilityT).toBeCloseTo(split.expected.p, 4);
    expect(comparison.sameMean).toBe(true);
  });
});

describe('critical values of a single outlier (ASTM E178)', () => {
  const { inputs, expected } = referenceRecord(records, 'QA-09', {
    inputs: z.object({ one_sided_alpha: numbers }),
    expected: z.object({ T_critical_rows_by_n: z.record(z.string(), numbers) }),
  });

  it.each(Object.entries(expected.T_critical_rows_by_n))('n = %s', (count, row) => {
    row.forEach((critical, place) => {
      const value = numberOf(criticalOutlier(Number(count), inputs.one_sided_alpha[place]!));
      expect(Math.abs(value - critical)).toBeLessThanOrEqual(0.0015);
    });
  });

  it('agrees with an independent print of the table to 0.01 (hand-out on DIN 32645)', () => {
    const print = referenceRecord(records, 'QA-10', {
      inputs: z.object({ n: numbers }),
      expected: z.record(z.string(), numbers),
    });
    for (const [significance, row] of Object.entries(print.expected)) {
      row.forEach((critical, place) => {
        const value = numberOf(criticalOutlier(print.inputs.n[place]!, Number(significance)));
        expect(Math.abs(value - critical)).toBeLessThanOrEqual(0.01);
      });
    }
  });

  it('differs from a widely copied table in its two misprinted cells', () => {
    const misprints = referenceRecord(records, 'QA-11', {
      inputs: z.unknown(),
      expected: z.looseObject({
        printed_errors: z.array(z.object({ n: number, alpha: number, printed: number, exact: number })),
      }),
    });
    for (const { n, alpha, printed, exact } of misprints.expected.printed_errors) {
      // Two-sided there, one-sided here.
      const value = numberOf(criticalOutlier(n, alpha / 2));
      expect(Math.abs(value - exact)).toBeLessThanOrEqual(0.0015);
      expect(Math.abs(value - printed)).toBeGreaterThan(0.01);
    }
  });
});

it('multiplies a one-sigma limit for 2 to 10 results (ASTM C670, studentised range)', () => {
  const { inputs, expected } = referenceRecord(records, 'PRC-F1', {
    inputs: z.object({ n_results: numbers }),
    expected: z.looseObject({ 'range_multiplier_0.95': numbers }),
  });
  inputs.n_results.forEach((count, place) => {
    const multiplier = numberOf(rangeMultiplier(count));
    expect(Math.abs(multiplier - expected['range_multiplier_0.95'][place]!)).toBeLessThanOrEqual(0.0005);
  });
});
