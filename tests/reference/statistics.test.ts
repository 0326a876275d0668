import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { mean, trimmedMean } from '#rules/numerics/mean';
import { percentOneSided, percentWithinLimits } from '#rules/numerics/percent-within-limits';
import { coefficientOfVariation, range, sampleStandardDeviation } from '#rules/numerics/spread';
import { numberOf, referenceRecord } from './reference-record';
import records from './statistics.json';

const numbers = z.array(z.number());

describe('percent within limits against the federal table (FHWA T 5080.12, table 1B)', () => {
  const { inputs, expected } = referenceRecord(records, 'QA-02', {
    inputs: z.object({ percent_within_limits: numbers }),
    expected: z.object({ Q_table_by_n: z.record(z.string(), numbers) }),
  });
  const cells = Object.entries(expected.Q_table_by_n)
    .filter(([count]) => /^\d$/.test(count))
    .flatMap(([count, row]) =>
      row.map((q, place) => ({ count: Number(count), q, percent: inputs.percent_within_limits[place]! })),
    );
  const misprint = (cell: { count: number; percent: number }) => cell.count === 5 && cell.percent === 67;

  it.each(cells.filter((cell) => !misprint(cell)))(
    'n = $count, Q = $q gives $percent within half a unit of Q',
    ({ count, q, percent }) => {
      // The table prints Q to 0.01: the exact Q for the percentage lies within 0.005 of it.
      expect(percentOneSided(q - 0.005, count)).toBeLessThanOrEqual(percent + 1e-9);
      expect(percentOneSided(q + 0.005, count)).toBeGreaterThanOrEqual(percent - 1e-9);
    },
  );

  it('differs from the printed 0.47 at n = 5 and 67 percent, which is a misprint for 0.48', () => {
    const printed = cells.find(misprint)!;
    expect(printed.q).toBe(0.47);
    expect(percentOneSided(printed.q + 0.005, 5)).toBeLessThan(67);
    expect(percentOneSided(0.475, 5)).toBeLessThan(67);
    expect(percentOneSided(0.485, 5)).toBeGreaterThan(67);
  });
});

describe('percent within limits against other figures', () => {
  it('agrees with the Florida table at Q 2.0 for n = 3 to 6 (section 334, table 334-8)', () => {
    const { inputs, expected } = referenceRecord(records, 'QA-04', {
      inputs: z.object({ Q: z.number(), n: numbers }),
      expected: z.object({ PWL: numbers }),
    });
    inputs.n.forEach((count, place) => {
      expect(Math.abs(percentOneSided(inputs.Q, count) - expected.PWL[place]!)).toBeLessThanOrEqual(0.005);
    });
  });

  it('gives 88.98 where a table look-up gives 90 and full pay (AC 150/5370-10, section 110, example B)', () => {
    const sides = z.object({ values: numbers, L: z.number(), U: z.number().optional() });
    const { inputs, expected } = referenceRecord(records, 'QA-08', {
      inputs: z.object({ A: sides, B: sides }),
      expected: z.object({
        A: z.object({ mean: z.number(), s: z.number(), P: z.number() }),
        B: z.object({ mean: z.number(), s: z.number(), PWL: z.number() }),
      }),
    });
    expect(numberOf(mean(inputs.B.values))).toBeCloseTo(expected.B.mean, 4);
    expect(numberOf(sampleStandardDeviation(inputs.A.values))).toBeCloseTo(expected.A.s, 5);
    expect(numberOf(sampleStandardDeviation(inputs.B.values))).toBeCloseTo(expected.B.s, 5);
    const one = percentWithinLimits({ values: inputs.A.values, lower: inputs.A.L, upper: null });
    const two = percentWithinLimits({ values: inputs.B.values, lower: inputs.B.L, upper: inputs.B.U! });
    expect(Math.abs(numberOf(one) - expected.A.P)).toBeLessThanOrEqual(0.0005);
    // The record prints this one to 0.01.
    expect(Math.abs(numberOf(two) - expected.B.PWL)).toBeLessThanOrEqual(0.005);
  });

  it('takes equal results as all in or all out, and needs three (edge cases)', () => {
    const { inputs, expected } = referenceRecord(records, 'QA-18', {
      inputs: z.object({ edge_cases: z.array(z.object({ x: numbers, L: z.number(), U: z.number() })) }),
      expected: z.object({ results: z.array(z.looseObject({ PWL: z.number().nullable() })) }),
    });
    inputs.edge_cases.forEach(({ x, L, U }, place) => {
      const result = percentWithinLimits({ values: x, lower: L, upper: U });
      const published = expected.results[place]!.PWL;
      if (published === null)
        expect(result).toEqual({ ok: false, reason: 'percent within limits needs at least three values' });
      else expect(Math.abs(numberOf(result) - published)).toBeLessThanOrEqual(0.0051);
    });
  });
});

it('describes six results as computed by hand (n − 1 divisor)', () => {
  const { inputs, expected } = referenceRecord(records, 'QA-20', {
    inputs: z.object({ x: numbers }),
    expected: z.object({
      mean: z.number(),
      s: z.number(),
      cv_percent: z.number(),
      range: z.number(),
      trimmed_mean_drop_high_low: z.number(),
    }),
  });
  const within = 5e-5;
  expect(Math.abs(numberOf(mean(inputs.x)) - expected.mean)).toBeLessThanOrEqual(within);
  expect(Math.abs(numberOf(sampleStandardDeviation(inputs.x)) - expected.s)).toBeLessThanOrEqual(within);
  expect(Math.abs(numberOf(coefficientOfVariation(inputs.x)) - expected.cv_percent)).toBeLessThanOrEqual(
    within,
  );
  expect(numberOf(range(inputs.x))).toBe(expected.range);
  expect(numberOf(trimmedMean(inputs.x))).toBe(expected.trimmed_mean_drop_high_low);
});
